// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QColor>
#include <QString>
#include <QWidget>
#include <memory>
#include <optional>
#include <vector>

namespace vialkeeper::ui {

/// One curve or set of points; times strictly or weakly increase. A NaN is a gap.
struct PlotSeries {
  enum class Look { kLine, kDashed, kPoints, kLineAndPoints };
  QString name = {};
  QColor colour = {};
  Look look = Look::kLine;
  std::vector<double> x = {};
  std::vector<double> y = {};
};

/// A stretch of the x axis with a meaning: the lamp was on.
struct PlotSpan {
  double from = 0.0;
  double to = 0.0;
  QColor colour = {};
  QString name = {};
};

/// A level or an instant that is drawn across, with its word.
struct PlotLine {
  enum class Across { kHorizontal, kVertical } across = Across::kHorizontal;
  double at = 0.0;
  QColor colour = {};
  QString name = {};
};

/// A band between two curves: an interval of confidence.
struct PlotBand {
  QString name = {};
  QColor colour = {};
  std::vector<double> x = {};
  std::vector<double> low = {};
  std::vector<double> high = {};
};

/// What a plot shows; values only, so that models can be tested without one.
struct PlotContent {
  QString xTitle = {};
  QString yTitle = {};
  std::vector<PlotSeries> series = {};
  std::vector<PlotSpan> spans = {};
  std::vector<PlotLine> lines = {};
  std::vector<PlotBand> bands = {};
  std::optional<std::pair<double, double>> xRange = {};  ///< else all data
  std::optional<std::pair<double, double>> yRange = {};  ///< else all data in view
};

/// Axes with curves, bands, spans and lines; pan with the mouse or arrows, zoom with the wheel or
/// `+` and `-`, `0` shows all. Long curves are drawn with four points for every pixel column at
/// most. The one place that knows Qt Charts.
class PlotWidget : public QWidget {
  Q_OBJECT

 public:
  explicit PlotWidget(QWidget* parent = nullptr);
  ~PlotWidget() override;

  /// Shows this. A view that was zoomed stays as it is unless `showAll`.
  void setContent(PlotContent content, bool showAll = false);
  [[nodiscard]] const PlotContent& content() const;
  void showAll();
  /// The part of the x axis in view.
  [[nodiscard]] std::pair<double, double> xView() const;
  void setXView(double from, double to);

 signals:
  /// A point of a series was clicked: its place in the series.
  void pointClicked(int series, int point);

 protected:
  void resizeEvent(QResizeEvent* event) override;
  void keyPressEvent(QKeyEvent* event) override;
  bool eventFilter(QObject* watched, QEvent* event) override;

 private:
  class Chart;
  std::unique_ptr<Chart> m_chart;
};

}  // namespace vialkeeper::ui
