// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/charts/plot_chart.h"

#include <QFontMetricsF>
#include <QGraphicsLayout>
#include <QGraphicsScene>
#include <QLegend>
#include <algorithm>
#include <cmath>

#include "ui/charts/plot_decimation.h"
#include "ui/charts/plot_scale.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

// Between the plot's ground and the grid of Qt Charts, and above everything of it.
constexpr double kBehindGrid = 0.5;
constexpr double kInFront = 100.0;
constexpr int kMostMarkers = 2000;
constexpr double kFingerWidth_px = 10.0;
constexpr int kColumnsBeforeShown = 400;

bool hasLine(const PlotSeries& series) { return series.look != PlotSeries::Look::kPoints; }
bool hasPoints(const PlotSeries& series) {
  return series.look == PlotSeries::Look::kPoints ||
         series.look == PlotSeries::Look::kLineAndPoints;
}

/// The end of a curve's x that is no gap.
void extendOver(std::optional<std::pair<double, double>>& extent, const std::vector<double>& x) {
  if (x.empty()) return;
  extend(extent, x.front());
  extend(extent, x.back());
}

}  // namespace

PlotWidget::Chart::Chart(PlotWidget& widget)
    : m_chart(new QChart),
      m_view(new QChartView(m_chart, &widget)),
      m_x(new QValueAxis),
      m_y(new QValueAxis),
      m_right(new QValueAxis),
      m_behind(new PlotOverlay(PlotOverlay::Layer::kBehind, m_chart)),
      m_front(new PlotOverlay(PlotOverlay::Layer::kInFront, m_chart)) {
  m_view->setFocusPolicy(Qt::NoFocus);
  m_view->setFrameShape(QFrame::NoFrame);
  m_view->setRenderHint(QPainter::Antialiasing);
  m_view->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  m_view->setVerticalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  m_chart->setAnimationOptions(QChart::NoAnimation);
  m_chart->layout()->setContentsMargins(0, 0, 0, 0);
  m_chart->setBackgroundRoundness(0.0);
  m_chart->addAxis(m_x, Qt::AlignBottom);
  m_chart->addAxis(m_y, Qt::AlignLeft);
  m_chart->addAxis(m_right, Qt::AlignRight);
  m_right->setGridLineVisible(false);
  // Qt Charts cuts words off where it has little room: all words are painted by the overlay.
  m_chart->legend()->hide();
  for (QValueAxis* axis : {m_x, m_y, m_right}) {
    axis->setTickType(QValueAxis::TicksDynamic);
    axis->setLabelsVisible(false);
  }
  m_behind->setZValue(kBehindGrid);
  m_front->setZValue(kInFront);
  QObject::connect(m_chart, &QGraphicsWidget::geometryChanged, m_chart, [this] { refresh(); });
  dress();
}

void PlotWidget::Chart::dress() {
  m_chart->setBackgroundBrush(colour("panel"));
  m_chart->setBackgroundPen(Qt::NoPen);
  m_view->setBackgroundBrush(colour("panel"));
  m_chart->setPlotAreaBackgroundVisible(false);
  for (QValueAxis* axis : {m_x, m_y, m_right}) {
    axis->setGridLineColor(colour("line"));
    axis->setLinePen(QPen(colour("line"), 1.0));
  }
}

void PlotWidget::Chart::addSeries(const PlotSeries& series) {
  Drawn drawn;
  QAbstractAxis* up = series.onRight ? m_right : m_y;
  const auto join = [&](QXYSeries* added) {
    added->setName(series.name);
    m_chart->addSeries(added);
    added->attachAxis(m_x);
    added->attachAxis(up);
  };
  if (hasLine(series)) {
    drawn.line = new QLineSeries;
    QPen pen(series.colour, 2.0);
    pen.setJoinStyle(Qt::BevelJoin);
    if (series.look == PlotSeries::Look::kDashed) pen.setDashPattern({3.0, 2.0});
    drawn.line->setPen(pen);
    join(drawn.line);
  }
  if (hasPoints(series)) {
    drawn.points = new QScatterSeries;
    drawn.points->setPen(Qt::NoPen);
    drawn.points->setBorderColor(Qt::transparent);
    drawn.points->setBrush(series.colour);
    drawn.points->setMarkerSize(Theme::instance().scaled(7));
    drawn.points->setMarkerShape(series.onRight ? QScatterSeries::MarkerShapeRectangle
                                                : QScatterSeries::MarkerShapeCircle);
    join(drawn.points);
  }
  m_drawn.push_back(drawn);
}

void PlotWidget::Chart::rebuild() {
  m_chart->removeAllSeries();
  m_drawn.clear();
  dress();
  for (const PlotSeries& series : content.series) addSeries(series);
  m_right->setVisible(std::ranges::any_of(content.series, &PlotSeries::onRight));
  refresh();
}

std::pair<double, double> PlotWidget::Chart::all() const {
  if (content.xRange) return *content.xRange;
  std::optional<std::pair<double, double>> extent;
  for (const PlotSeries& series : content.series) extendOver(extent, series.x);
  for (const PlotBand& band : content.bands) extendOver(extent, band.x);
  for (const PlotSpan& span : content.spans) {
    extend(extent, span.from);
    extend(extent, span.to);
  }
  if (!extent) return {0.0, 1.0};
  if (extent->first == extent->second) return {extent->first - 0.5, extent->second + 0.5};
  return *extent;
}

std::pair<double, double> PlotWidget::Chart::yRange(const std::vector<QList<QPointF>>& curves,
                                                    bool onRight) const {
  if (content.yRange && !onRight) return *content.yRange;
  const auto [from, to] = inView();
  std::optional<std::pair<double, double>> extent;
  const auto take = [&](const QList<QPointF>& points) {
    if (const auto of = extentOf(points, from, to)) {
      extend(extent, of->first);
      extend(extent, of->second);
    }
  };
  for (std::size_t i = 0; i < curves.size(); ++i) {
    if (content.series[i].onRight == onRight) take(curves[i]);
  }
  if (onRight) return roomyRange(extent);
  for (const PlotBand& band : content.bands) {
    take(decimated(band.x, band.low, from, to, kColumnsBeforeShown));
    take(decimated(band.x, band.high, from, to, kColumnsBeforeShown));
  }
  for (const PlotLine& line : content.lines) {
    if (line.across == PlotLine::Across::kHorizontal) extend(extent, line.at);
  }
  return roomyRange(extent);
}

void PlotWidget::Chart::setAxes(const std::vector<QList<QPointF>>& curves) {
  const QFontMetricsF metrics(m_view->font());
  const QRectF whole(QPointF(), m_chart->size());
  const auto ticks = [](double length, double perTick) {
    return std::max(2, static_cast<int>(length / perTick));
  };
  const double rows = whole.height() - 2.0 * metrics.height();
  m_frame.whole = whole;
  m_frame.x = inView();
  m_frame.y = yRange(curves, false);
  m_frame.right = yRange(curves, true);
  m_frame.hasRight = std::ranges::any_of(content.series, &PlotSeries::onRight);
  m_frame.xStep = niceStep(m_frame.x.second - m_frame.x.first,
                           ticks(whole.width(), metrics.averageCharWidth() * 12.0));
  m_frame.yStep = niceStep(m_frame.y.second - m_frame.y.first, ticks(rows, metrics.height() * 1.8));
  m_frame.rightStep =
      niceStep(m_frame.right.second - m_frame.right.first, ticks(rows, metrics.height() * 1.8));
  const QMargins room = wordRoom(content, m_frame, m_view->font());
  m_frame.area = whole.marginsRemoved(QMarginsF(room));
  m_chart->setPlotArea(m_frame.area);
  const auto set = [](QValueAxis& axis, std::pair<double, double> range, double step) {
    axis.setTickAnchor(0.0);
    axis.setTickInterval(step);
    axis.setRange(range.first, range.second);
  };
  set(*m_x, m_frame.x, m_frame.xStep);
  set(*m_y, m_frame.y, m_frame.yStep);
  set(*m_right, m_frame.right, m_frame.rightStep);
}

void PlotWidget::Chart::refresh() {
  const auto [from, to] = inView();
  const double width = m_chart->size().width();
  const int columns = width > 1.0 ? static_cast<int>(std::ceil(width)) : kColumnsBeforeShown;
  std::vector<QList<QPointF>> curves;
  curves.reserve(content.series.size());
  for (const PlotSeries& series : content.series)
    curves.push_back(decimated(series.x, series.y, from, to, columns));
  setAxes(curves);
  for (std::size_t i = 0; i < curves.size(); ++i) {
    const auto [low, high] = content.series[i].onRight ? m_frame.right : m_frame.y;
    const QRectF inside(QPointF(from, low), QPointF(to, high));
    if (m_drawn[i].line != nullptr) m_drawn[i].line->replace(clippedLine(curves[i], inside));
    if (m_drawn[i].points == nullptr) continue;
    QList<QPointF> markers = pointsInside(curves[i], inside);
    // Qt Charts keeps one item for every marker: of very many, evenly chosen ones are drawn.
    if (markers.size() > kMostMarkers) {
      const qsizetype every = markers.size() / kMostMarkers + 1;
      QList<QPointF> fewer;
      for (qsizetype at = 0; at < markers.size(); at += every) fewer.push_back(markers[at]);
      markers = fewer;
    }
    m_drawn[i].points->replace(markers);
  }
  m_behind->show(&content, m_frame, m_view->font());
  m_front->show(&content, m_frame, m_view->font());
}

std::optional<std::pair<int, int>> PlotWidget::Chart::pointAt(const QPointF& at) const {
  std::optional<std::pair<int, int>> nearest;
  double least = kFingerWidth_px;
  const double perPixel =
      (m_frame.x.second - m_frame.x.first) / std::max(m_frame.area.width(), 1.0);
  const double x = m_frame.x.first + (at.x() - m_frame.area.left()) * perPixel;
  for (std::size_t s = 0; s < content.series.size(); ++s) {
    const PlotSeries& series = content.series[s];
    PlotFrame frame = m_frame;
    if (series.onRight) frame.y = m_frame.right;
    const double reach = kFingerWidth_px * perPixel;
    const auto [begin, end] = placesInView(series.x, x - reach, x + reach);
    for (std::size_t i = begin; i < end; ++i) {
      const double distance =
          std::hypot(frame.xPixel(series.x[i]) - at.x(), frame.yPixel(series.y[i]) - at.y());
      if (!(distance < least)) continue;
      least = distance;
      nearest = {static_cast<int>(s), static_cast<int>(i)};
    }
  }
  return nearest;
}

void PlotWidget::Chart::settle() {
  if (m_chart->size() != m_view->size()) m_chart->resize(m_view->size());
}

void PlotWidget::Chart::render(QPainter& painter, const QRectF& target) const {
  m_view->scene()->render(&painter, target, m_view->scene()->sceneRect());
}

QString PlotWidget::Chart::description() const {
  QStringList parts;
  for (const PlotSeries& series : content.series) {
    if (series.x.empty()) continue;
    parts +=
        PlotWidget::tr("%1: %n points from %2 to %3", nullptr, static_cast<int>(series.x.size()))
            .arg(series.name)
            .arg(series.x.front(), 0, 'g', 4)
            .arg(series.x.back(), 0, 'g', 4);
  }
  for (const PlotLine& line : content.lines)
    parts += QStringLiteral("%1: %2").arg(line.name).arg(line.at, 0, 'g', 4);
  if (parts.isEmpty()) return PlotWidget::tr("There is nothing to show yet.");
  return parts.join(QStringLiteral("; "));
}

}  // namespace vialkeeper::ui
