// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/charts/plot_overlay.h"

#include <QFontMetricsF>
#include <QPainter>
#include <QPolygonF>
#include <algorithm>
#include <cmath>
#include <limits>
#include <vector>

#include "ui/charts/plot_decimation.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr double kWordGap_px = 4.0;
constexpr double kSample_px = 22.0;  // of a curve's look, before its name

bool isWithin(double value, std::pair<double, double> range) {
  return value >= range.first && value <= range.second;
}

QPen dashed(const QColor& colour) {
  QPen pen(colour, 1.5);
  pen.setDashPattern({4.0, 3.0});
  return pen;
}

/// Numbers of an axis with as many digits as its step needs.
QString numberText(double value, double step, std::pair<double, double> range) {
  const bool huge = std::max(std::abs(range.first), std::abs(range.second)) >= 1e6;
  if (huge || step < 1e-6) return QString::number(value, 'g', 4);
  const int decimals = std::clamp(static_cast<int>(-std::floor(std::log10(step) + 1e-9)), 0, 8);
  const QString text = QString::number(value, 'f', decimals);
  return text.startsWith(QLatin1Char('-')) && text.toDouble() == 0.0 ? text.mid(1) : text;
}

/// The multiples of a step within a range.
std::vector<double> ticksOf(std::pair<double, double> range, double step) {
  std::vector<double> ticks;
  const double slack = 1e-9 * step;
  for (double n = std::ceil((range.first - slack) / step); n * step <= range.second + slack; ++n)
    ticks.push_back(n * step);
  return ticks;
}

double widestNumber(std::pair<double, double> range, double step, const QFontMetricsF& metrics) {
  double widest = 0.0;
  for (const double tick : ticksOf(range, step))
    widest = std::max(widest, metrics.horizontalAdvance(numberText(tick, step, range)));
  return widest;
}

}  // namespace

QMargins wordRoom(const PlotContent&, const PlotFrame& frame, const QFont& font) {
  const QFontMetricsF metrics(font);
  const double row = std::ceil(metrics.height() + kWordGap_px);
  const double left = widestNumber(frame.y, frame.yStep, metrics) + 2.0 * kWordGap_px;
  const double right = frame.hasRight
                           ? widestNumber(frame.right, frame.rightStep, metrics) + 2.0 * kWordGap_px
                           : 3.0 * kWordGap_px;
  return {static_cast<int>(left), static_cast<int>(row), static_cast<int>(right),
          static_cast<int>(row)};
}

double PlotFrame::xPixel(double value) const {
  return area.left() + (value - x.first) / (x.second - x.first) * area.width();
}

double PlotFrame::yPixel(double value) const {
  return area.bottom() - (value - y.first) / (y.second - y.first) * area.height();
}

void PlotOverlay::show(const PlotContent* content, const PlotFrame& frame, const QFont& font) {
  prepareGeometryChange();
  m_content = content;
  m_frame = frame;
  m_font = font;
  update();
}

void PlotOverlay::paint(QPainter* painter, const QStyleOptionGraphicsItem*, QWidget*) {
  if (m_content == nullptr || m_frame.area.isEmpty()) return;
  painter->setFont(m_font);
  if (m_layer == Layer::kBehind) {
    paintSpans(*painter);
    paintBands(*painter);
  } else {
    paintSpanWords(*painter);
    paintLines(*painter);
    paintNumbers(*painter);
    paintTitles(*painter);
  }
}

void PlotOverlay::paintSpans(QPainter& painter) const {
  for (const PlotSpan& span : m_content->spans) {
    const double from = std::max(span.from, m_frame.x.first);
    const double to = std::min(span.to, m_frame.x.second);
    if (from >= to) continue;
    painter.fillRect(QRectF(QPointF(m_frame.xPixel(from), m_frame.area.top()),
                            QPointF(m_frame.xPixel(to), m_frame.area.bottom())),
                     span.colour);
  }
}

void PlotOverlay::paintBands(QPainter& painter) const {
  for (const PlotBand& band : m_content->bands) {
    const int columns = std::max(1, static_cast<int>(m_frame.area.width()));
    const auto [from, to] = m_frame.x;
    const auto low = decimated(band.x, band.low, from, to, columns);
    const auto high = decimated(band.x, band.high, from, to, columns);
    QPolygonF outline;
    for (const QPointF& at : low)
      outline << QPointF(m_frame.xPixel(at.x()), m_frame.yPixel(at.y()));
    for (auto at = high.rbegin(); at != high.rend(); ++at)
      outline << QPointF(m_frame.xPixel(at->x()), m_frame.yPixel(at->y()));
    painter.setPen(Qt::NoPen);
    QColor fill = band.colour;
    fill.setAlphaF(0.25F);
    painter.setBrush(fill);
    painter.drawPolygon(outline.intersected(QPolygonF(m_frame.area)));
  }
}

void PlotOverlay::paintSpanWords(QPainter& painter) const {
  const QFontMetricsF metrics(m_font);
  painter.setPen(colour("quiet"));
  for (const PlotSpan& span : m_content->spans) {
    const double from = m_frame.xPixel(std::max(span.from, m_frame.x.first));
    const double to = m_frame.xPixel(std::min(span.to, m_frame.x.second));
    if (span.name.isEmpty() || to - from < metrics.horizontalAdvance(span.name) + 2 * kWordGap_px)
      continue;
    painter.drawText(QPointF(from + kWordGap_px, m_frame.area.bottom() - metrics.descent() - 2.0),
                     span.name);
  }
}

void PlotOverlay::paintLines(QPainter& painter) const {
  const QFontMetricsF metrics(m_font);
  double wordsEnd = -std::numeric_limits<double>::infinity();
  for (const PlotLine& line : m_content->lines) {
    painter.setPen(dashed(line.colour));
    const double width = metrics.horizontalAdvance(line.name);
    if (line.across == PlotLine::Across::kHorizontal) {
      if (!isWithin(line.at, m_frame.y)) continue;
      const double y = m_frame.yPixel(line.at);
      painter.drawLine(QPointF(m_frame.area.left(), y), QPointF(m_frame.area.right(), y));
      const bool above = y - metrics.height() > m_frame.area.top();
      painter.drawText(QPointF(m_frame.area.right() - width - kWordGap_px,
                               above ? y - metrics.descent() - 1.0 : y + metrics.ascent() + 1.0),
                       line.name);
      continue;
    }
    if (!isWithin(line.at, m_frame.x)) continue;
    const double x = m_frame.xPixel(line.at);
    painter.drawLine(QPointF(x, m_frame.area.top()), QPointF(x, m_frame.area.bottom()));
    // A word that would run into its neighbour or out of the axes is left out; the line stays.
    const double left =
        x + width + kWordGap_px > m_frame.area.right() ? x - width - kWordGap_px : x + kWordGap_px;
    if (left < wordsEnd || left < m_frame.area.left()) continue;
    painter.drawText(QPointF(left, m_frame.area.top() + metrics.ascent()), line.name);
    wordsEnd = left + width + kWordGap_px;
  }
}

void PlotOverlay::paintNumbers(QPainter& painter) const {
  const QFontMetricsF metrics(m_font);
  painter.setPen(colour("quiet"));
  const double middle = (metrics.ascent() - metrics.descent()) / 2.0;
  const auto up = [&](std::pair<double, double> range, double step, bool onRight) {
    for (const double tick : ticksOf(range, step)) {
      const QString text = numberText(tick, step, range);
      const double share = (tick - range.first) / (range.second - range.first);
      const double y = m_frame.area.bottom() - share * m_frame.area.height() + middle;
      const double x = onRight
                           ? m_frame.area.right() + kWordGap_px
                           : m_frame.area.left() - kWordGap_px - metrics.horizontalAdvance(text);
      painter.drawText(QPointF(x, y), text);
    }
  };
  up(m_frame.y, m_frame.yStep, false);
  if (m_frame.hasRight) up(m_frame.right, m_frame.rightStep, true);
  // The title stands at the right end of its numbers' row.
  const double baseline = m_frame.area.bottom() + kWordGap_px + metrics.ascent();
  const double title = metrics.horizontalAdvance(m_content->xTitle);
  const double titleLeft = m_frame.whole.right() - title - kWordGap_px;
  painter.drawText(QPointF(titleLeft, baseline), m_content->xTitle);
  for (const double tick : ticksOf(m_frame.x, m_frame.xStep)) {
    const QString text = numberText(tick, m_frame.xStep, m_frame.x);
    const double width = metrics.horizontalAdvance(text);
    const double left = m_frame.xPixel(tick) - width / 2.0;
    if (left + width + 2.0 * kWordGap_px > titleLeft) break;
    painter.drawText(QPointF(left, baseline), text);
  }
}

void PlotOverlay::paintTitles(QPainter& painter) const {
  const QFontMetricsF metrics(m_font);
  painter.setPen(colour("quiet"));
  const double baseline = m_frame.area.top() - kWordGap_px - metrics.descent();
  painter.drawText(QPointF(m_frame.whole.left() + kWordGap_px, baseline), m_content->yTitle);
  const double right = m_frame.hasRight ? metrics.horizontalAdvance(m_content->rightTitle) : 0.0;
  const double rightLeft = m_frame.whole.right() - right - kWordGap_px;
  if (m_frame.hasRight) painter.drawText(QPointF(rightLeft, baseline), m_content->rightTitle);
  const double from = m_frame.whole.left() + metrics.horizontalAdvance(m_content->yTitle);
  if (m_content->series.size() > 1)
    paintNames(painter, from + 4.0 * kWordGap_px, rightLeft - 4.0 * kWordGap_px);
}

void PlotOverlay::paintNames(QPainter& painter, double from, double to) const {
  const QFontMetricsF metrics(m_font);
  const double baseline = m_frame.area.top() - kWordGap_px - metrics.descent();
  const double middle = baseline - metrics.xHeight() / 2.0;
  double x = from;
  for (const PlotSeries& series : m_content->series) {
    if (series.name.isEmpty()) continue;
    const double width = kSample_px + kWordGap_px + metrics.horizontalAdvance(series.name);
    if (x + width > to) return;
    QPen pen(series.colour, 2.0);
    if (series.look == PlotSeries::Look::kDashed) pen.setDashPattern({3.0, 2.0});
    painter.setPen(pen);
    if (series.look != PlotSeries::Look::kPoints)
      painter.drawLine(QPointF(x, middle), QPointF(x + kSample_px, middle));
    if (series.look == PlotSeries::Look::kPoints ||
        series.look == PlotSeries::Look::kLineAndPoints) {
      const QRectF marker(x + kSample_px / 2.0 - 3.5, middle - 3.5, 7.0, 7.0);
      painter.setPen(Qt::NoPen);
      painter.setBrush(series.colour);
      if (series.onRight)
        painter.drawRect(marker);
      else
        painter.drawEllipse(marker);
    }
    painter.setPen(colour("text"));
    painter.drawText(QPointF(x + kSample_px + kWordGap_px, baseline), series.name);
    x += width + 4.0 * kWordGap_px;
  }
}

}  // namespace vialkeeper::ui
