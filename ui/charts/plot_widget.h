// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QColor>
#include <QImage>
#include <QString>
#include <QWidget>
#include <memory>
#include <optional>
#include <vector>

#include "text/fault.h"

namespace vialkeeper::ui {

/// One curve or set of points; times strictly or weakly increase. A NaN is a gap.
struct PlotSeries {
  enum class Look { kLine, kDashed, kPoints, kLineAndPoints };
  QString name = {};
  QColor colour = {};
  Look look = Look::kLine;
  std::vector<double> x = {};
  std::vector<double> y = {};
  bool onRight = false;  ///< drawn against the axis on the right
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
  QString rightTitle = {};  ///< of the axis on the right, if a series wants it
  std::vector<PlotSeries> series = {};
  std::vector<PlotSpan> spans = {};
  std::vector<PlotLine> lines = {};
  std::vector<PlotBand> bands = {};
  std::optional<std::pair<double, double>> xRange = {};  ///< else all data
  std::optional<std::pair<double, double>> yRange = {};  ///< else all data in view
};

/// Axes with curves, bands, spans and lines; pan with the mouse or arrows, zoom with the wheel or
/// `+` and `-`, `0` shows all. Long curves are drawn with four points for every pixel column at
/// most. The one place that knows Qt Charts. A click on a point tells of it; the context menu saves
/// the picture.
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
  /// Shows this part of the x axis, moved and cut to what there is.
  void setXView(double from, double to);

  /// The picture as it is shown, `scale` times as large in pixels.
  [[nodiscard]] QImage picture(double scale = 2.0) const;
  /// The picture as SVG; no curve leaves the axes in it.
  [[nodiscard]] QByteArray svg() const;
  /// Writes the picture: SVG where the name ends so, else PNG.
  [[nodiscard]] text::Checked<void> savePicture(const QString& file) const;
  /// Asks for a file and writes the picture.
  void choosePictureFile();

 signals:
  /// A point of a series was clicked: its place in the series.
  void pointClicked(int series, int point);
  /// The picture was written, or why it could not be.
  void pictureSaved(const QString& file);
  void refused(const vialkeeper::text::Faults& faults);

 protected:
  void keyPressEvent(QKeyEvent* event) override;
  void contextMenuEvent(QContextMenuEvent* event) override;
  void focusInEvent(QFocusEvent* event) override;
  void focusOutEvent(QFocusEvent* event) override;
  void paintEvent(QPaintEvent* event) override;
  void changeEvent(QEvent* event) override;
  bool eventFilter(QObject* watched, QEvent* event) override;

 private:
  class Chart;
  void zoom(double factor, double around);
  void pan(double share);
  void tellClick(const QPointF& at);

  std::unique_ptr<Chart> m_chart;
  std::optional<double> m_draggedFrom;  ///< x in pixels where the mouse went down
  std::pair<double, double> m_viewBefore{0.0, 1.0};
  bool m_moved = false;
};

}  // namespace vialkeeper::ui
