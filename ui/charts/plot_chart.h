// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QChart>
#include <QChartView>
#include <QLineSeries>
#include <QScatterSeries>
#include <QValueAxis>
#include <optional>

#include "ui/charts/plot_overlay.h"
#include "ui/charts/plot_widget.h"

namespace vialkeeper::ui {

/// The chart behind a PlotWidget: holds the content, and shows of it what is in view.
class PlotWidget::Chart {
 public:
  explicit Chart(PlotWidget& widget);

  PlotContent content;
  /// The part of the x axis in view; nothing: all.
  std::optional<std::pair<double, double>> view;

  [[nodiscard]] QChartView& chartView() { return *m_view; }
  /// Follows the content: axes, series and their looks.
  void rebuild();
  /// Follows the view: what is drawn of each series.
  void refresh();
  [[nodiscard]] std::pair<double, double> all() const;
  [[nodiscard]] std::pair<double, double> inView() const { return view.value_or(all()); }
  [[nodiscard]] const PlotFrame& frame() const { return m_frame; }
  /// The point nearest to a place in pixels, within a finger's width: series and point.
  [[nodiscard]] std::optional<std::pair<int, int>> pointAt(const QPointF& at) const;
  /// Gives the chart its size where it was never shown.
  void settle();
  void render(QPainter& painter, const QRectF& target) const;
  [[nodiscard]] QString description() const;

 private:
  struct Drawn {
    QLineSeries* line = nullptr;
    QScatterSeries* points = nullptr;
  };
  void dress();
  void addSeries(const PlotSeries& series);
  void setAxes(const std::vector<QList<QPointF>>& curves);
  [[nodiscard]] std::pair<double, double> yRange(const std::vector<QList<QPointF>>& curves,
                                                 bool onRight) const;

  QChart* m_chart;
  QChartView* m_view;
  QValueAxis* m_x;
  QValueAxis* m_y;
  QValueAxis* m_right;
  PlotOverlay* m_behind;
  PlotOverlay* m_front;
  std::vector<Drawn> m_drawn;
  PlotFrame m_frame;
};

}  // namespace vialkeeper::ui
