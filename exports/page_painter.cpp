// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/page_painter.h"

#include <QPen>
#include <QTransform>

namespace vialkeeper::exports {

QRectF PagePainter::toUnits(const QRectF& rect_mm) const {
  return {rect_mm.x() * m_unitsPerMm, rect_mm.y() * m_unitsPerMm, rect_mm.width() * m_unitsPerMm,
          rect_mm.height() * m_unitsPerMm};
}

void PagePainter::rule(double x_mm, double y_mm, double width_mm, const QColor& colour,
                       double thickness_mm) {
  m_painter.setPen(QPen(colour, thickness_mm * m_unitsPerMm, Qt::SolidLine, Qt::FlatCap));
  m_painter.drawLine(QPointF(x_mm, y_mm) * m_unitsPerMm,
                     QPointF(x_mm + width_mm, y_mm) * m_unitsPerMm);
}

void PagePainter::box(const QRectF& rect_mm, double thickness_mm, const QColor& colour) {
  constexpr double kCorner_mm = 1.2;
  m_painter.setPen(QPen(colour, thickness_mm * m_unitsPerMm));
  m_painter.setBrush(Qt::NoBrush);
  m_painter.drawRoundedRect(toUnits(rect_mm), kCorner_mm * m_unitsPerMm, kCorner_mm * m_unitsPerMm);
}

void PagePainter::dashedBox(const QRectF& rect_mm) {
  QPen pen(colours::kBox, 0.25 * m_unitsPerMm);
  pen.setDashPattern({7.0, 5.0});
  m_painter.setPen(pen);
  m_painter.setBrush(Qt::NoBrush);
  m_painter.drawRect(toUnits(rect_mm));
}

void PagePainter::tickBox(double x_mm, double y_mm, double side_mm) {
  constexpr double kCorner_mm = 0.8;
  m_painter.setPen(QPen(colours::kInk, 0.4 * m_unitsPerMm));
  m_painter.setBrush(Qt::NoBrush);
  m_painter.drawRoundedRect(toUnits({x_mm, y_mm, side_mm, side_mm}), kCorner_mm * m_unitsPerMm,
                            kCorner_mm * m_unitsPerMm);
}

void PagePainter::warningSign(double x_mm, double y_mm, double size_mm, const QColor& colour) {
  QPainterPath sign;
  sign.setFillRule(Qt::OddEvenFill);
  sign.moveTo(0.50, 0.06);
  sign.lineTo(1.00, 0.94);
  sign.lineTo(0.00, 0.94);
  sign.closeSubpath();
  sign.addRect(0.455, 0.36, 0.09, 0.30);
  sign.addRect(0.455, 0.73, 0.09, 0.09);
  fill(sign, x_mm, y_mm, size_mm, colour);
}

void PagePainter::fill(const QPainterPath& path, double x_mm, double y_mm, double scale_mm,
                       const QColor& colour) {
  const double scale = scale_mm * m_unitsPerMm;
  const QTransform place =
      QTransform::fromTranslate(x_mm * m_unitsPerMm, y_mm * m_unitsPerMm).scale(scale, scale);
  m_painter.fillPath(place.map(path), colour);
}

void PagePainter::stroke(const QPainterPath& path, double x_mm, double y_mm, double scale_mm,
                         const QColor& colour, double thickness_mm) {
  const double scale = scale_mm * m_unitsPerMm;
  const QTransform place =
      QTransform::fromTranslate(x_mm * m_unitsPerMm, y_mm * m_unitsPerMm).scale(scale, scale);
  m_painter.strokePath(place.map(path), QPen(colour, thickness_mm * m_unitsPerMm, Qt::SolidLine,
                                             Qt::RoundCap, Qt::RoundJoin));
}

}  // namespace vialkeeper::exports
