// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QFont>
#include <QGraphicsItem>
#include <QMargins>
#include <functional>

#include "ui/charts/plot_widget.h"

namespace vialkeeper::ui {

/// The axes as they are now, for what is painted by hand.
struct PlotFrame {
  QRectF area = {};   ///< within the axes, in pixels of the chart
  QRectF whole = {};  ///< the chart
  std::pair<double, double> x{0.0, 1.0};
  std::pair<double, double> y{0.0, 1.0};
  std::pair<double, double> right{0.0, 1.0};
  double xStep = 1.0;
  double yStep = 1.0;
  double rightStep = 1.0;
  bool hasRight = false;

  [[nodiscard]] double xPixel(double value) const;
  [[nodiscard]] double yPixel(double value) const;
};

/// Room that the words round the axes take: numbers, titles, names of curves.
[[nodiscard]] QMargins wordRoom(const PlotContent& content, const PlotFrame& frame,
                                const QFont& font);

/// What a plot shows besides its curves. Paints nothing outside the axes, by its own means: an SVG
/// keeps no clipping.
class PlotOverlay : public QGraphicsItem {
 public:
  enum class Layer { kBehind, kInFront };  ///< spans and bands; lines and all words

  PlotOverlay(Layer layer, QGraphicsItem* chart) : QGraphicsItem(chart), m_layer(layer) {}

  void show(const PlotContent* content, const PlotFrame& frame, const QFont& font);
  [[nodiscard]] QRectF boundingRect() const override { return m_frame.whole; }
  void paint(QPainter* painter, const QStyleOptionGraphicsItem* option, QWidget* widget) override;

 private:
  void paintSpans(QPainter& painter) const;
  void paintBands(QPainter& painter) const;
  void paintSpanWords(QPainter& painter) const;
  void paintLines(QPainter& painter) const;
  void paintNumbers(QPainter& painter) const;
  void paintTitles(QPainter& painter) const;
  /// Names of the curves between two places on the row above the axes.
  void paintNames(QPainter& painter, double from, double to) const;

  Layer m_layer;
  const PlotContent* m_content = nullptr;
  PlotFrame m_frame;
  QFont m_font;
};

}  // namespace vialkeeper::ui
