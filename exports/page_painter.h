// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QColor>
#include <QPainter>
#include <QPainterPath>
#include <QRectF>

#include "exports/page_text.h"

namespace vialkeeper::exports {

/// The shapes of the pages, in millimetres from the paper's top left corner.
class PagePainter {
 public:
  PagePainter(QPainter& painter, const Typesetter& typesetter)
      : m_painter(painter), m_unitsPerMm(typesetter.unitsPerMm) {}

  void text(const TextBlock& block, double x_mm, double y_mm) { block.draw(m_painter, x_mm, y_mm); }
  void rule(double x_mm, double y_mm, double width_mm, const QColor& colour = colours::kHairline,
            double thickness_mm = 0.2);
  /// An empty box with rounded corners, to write in.
  void box(const QRectF& rect_mm, double thickness_mm = 0.3, const QColor& colour = colours::kBox);
  void dashedBox(const QRectF& rect_mm);
  void tickBox(double x_mm, double y_mm, double side_mm);
  /// A triangle with an exclamation mark, as a shape: fonts without the character have it too.
  void warningSign(double x_mm, double y_mm, double size_mm,
                   const QColor& colour = colours::kWarning);
  /// A path in units of its own, `scale_mm` each, with its origin at the given place.
  void fill(const QPainterPath& path, double x_mm, double y_mm, double scale_mm,
            const QColor& colour);
  void stroke(const QPainterPath& path, double x_mm, double y_mm, double scale_mm,
              const QColor& colour, double thickness_mm);

  /// Device coordinates, for what Qt draws by itself.
  [[nodiscard]] QRectF toUnits(const QRectF& rect_mm) const;
  [[nodiscard]] QPainter& device() { return m_painter; }

 private:
  QPainter& m_painter;
  double m_unitsPerMm;
};

}  // namespace vialkeeper::exports
