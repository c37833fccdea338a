// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/charts/plot_decimation.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>

namespace vialkeeper::ui {
namespace {

constexpr double kGap = std::numeric_limits<double>::quiet_NaN();
constexpr std::size_t kPointsInColumn = 4;

/// What is kept of one column of pixels.
class Column {
 public:
  void take(std::size_t at, double y) {
    if (std::isnan(y)) {
      m_gap = true;
      return;
    }
    if (m_empty) {
      m_first = m_least = m_greatest = m_last = at;
      m_leastValue = m_greatestValue = y;
      m_empty = false;
      return;
    }
    m_last = at;
    if (y < m_leastValue) {
      m_least = at;
      m_leastValue = y;
    }
    if (y > m_greatestValue) {
      m_greatest = at;
      m_greatestValue = y;
    }
  }

  void putInto(QList<QPointF>& points, std::span<const double> x, std::span<const double> y) {
    if (!m_empty) {
      std::array<std::size_t, kPointsInColumn> kept{m_first, m_least, m_greatest, m_last};
      std::ranges::sort(kept);
      const auto end = std::unique(kept.begin(), kept.end());
      const auto count = std::min<std::ptrdiff_t>(end - kept.begin(), m_gap ? 3 : 4);
      for (auto at = kept.begin(); at != kept.begin() + count; ++at)
        points.push_back({x[*at], y[*at]});
    }
    if (m_gap && !points.isEmpty() && !std::isnan(points.back().y()))
      points.push_back({points.back().x(), kGap});
    *this = {};
  }

 private:
  std::size_t m_first = 0;
  std::size_t m_least = 0;
  std::size_t m_greatest = 0;
  std::size_t m_last = 0;
  double m_leastValue = 0.0;
  double m_greatestValue = 0.0;
  bool m_empty = true;
  bool m_gap = false;
};

/// The part of a segment within a rectangle (Liang and Barsky's way); false where there is none.
bool clipSegment(QPointF& a, QPointF& b, const QRectF& inside) {
  const QPointF d = b - a;
  const std::array<std::pair<double, double>, 4> edges{
      std::pair{-d.x(), a.x() - inside.left()}, std::pair{d.x(), inside.right() - a.x()},
      std::pair{-d.y(), a.y() - inside.top()}, std::pair{d.y(), inside.bottom() - a.y()}};
  double enters = 0.0;
  double leaves = 1.0;
  for (const auto& [step, room] : edges) {
    if (step == 0.0) {
      if (room < 0.0) return false;
    } else if (step < 0.0) {
      enters = std::max(enters, room / step);
    } else {
      leaves = std::min(leaves, room / step);
    }
  }
  if (enters > leaves) return false;
  const QPointF start = a;
  if (enters > 0.0) a = start + enters * d;
  if (leaves < 1.0) b = start + leaves * d;
  return true;
}

}  // namespace

std::pair<std::size_t, std::size_t> placesInView(std::span<const double> x, double from,
                                                 double to) {
  auto begin = std::ranges::lower_bound(x, from);
  auto end = std::ranges::upper_bound(x, to);
  if (begin != x.begin()) --begin;
  if (end != x.end()) ++end;
  if (begin > end) begin = end;
  return {static_cast<std::size_t>(begin - x.begin()), static_cast<std::size_t>(end - x.begin())};
}

QList<QPointF> decimated(std::span<const double> x, std::span<const double> y, double from,
                         double to, int columns) {
  const auto [begin, end] = placesInView(x, from, to);
  const std::size_t most = kPointsInColumn * static_cast<std::size_t>(std::max(columns, 1));
  QList<QPointF> points;
  if (end - begin <= most) {
    points.reserve(static_cast<qsizetype>(end - begin));
    for (std::size_t at = begin; at < end; ++at) points.push_back({x[at], y[at]});
    return points;
  }
  points.reserve(static_cast<qsizetype>(most) + 8);
  const double perColumn = (to - from) / std::max(columns, 1);
  Column column;
  double present = 0.0;
  for (std::size_t at = begin; at < end; ++at) {
    const double place = std::floor((x[at] - from) / perColumn);
    if (at == begin || place != present) {
      column.putInto(points, x, y);
      present = place;
    }
    column.take(at, y[at]);
  }
  column.putInto(points, x, y);
  return points;
}

std::optional<std::pair<double, double>> extentOf(const QList<QPointF>& points, double from,
                                                  double to) {
  std::optional<std::pair<double, double>> extent;
  for (const QPointF& point : points) {
    if (std::isnan(point.y()) || point.x() < from || point.x() > to) continue;
    if (!extent) extent = {point.y(), point.y()};
    extent->first = std::min(extent->first, point.y());
    extent->second = std::max(extent->second, point.y());
  }
  return extent;
}

QList<QPointF> clippedLine(const QList<QPointF>& points, const QRectF& inside) {
  QList<QPointF> line;
  line.reserve(points.size());
  for (qsizetype i = 1; i < points.size(); ++i) {
    QPointF a = points[i - 1];
    QPointF b = points[i];
    if (std::isnan(a.y()) || std::isnan(b.y()) || !clipSegment(a, b, inside)) continue;
    if (line.isEmpty() || line.back() != a) {
      if (!line.isEmpty()) line.push_back({line.back().x(), kGap});
      line.push_back(a);
    }
    line.push_back(b);
  }
  return line;
}

QList<QPointF> pointsInside(const QList<QPointF>& points, const QRectF& inside) {
  QList<QPointF> kept;
  for (const QPointF& point : points) {
    // QRectF::contains leaves out what has no height.
    if (point.x() >= inside.left() && point.x() <= inside.right() && point.y() >= inside.top() &&
        point.y() <= inside.bottom())
      kept.push_back(point);
  }
  return kept;
}

}  // namespace vialkeeper::ui
