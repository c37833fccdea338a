// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/vial_drawing.h"

#include <algorithm>
#include <cmath>

namespace vialkeeper::exports {
namespace {

// The glass in units of the whole vial's height, from the top: cap, neck, shoulder, body.
constexpr double kCapBottom = 0.10;
constexpr double kNeckBottom = 0.19;
constexpr double kShoulderBottom = 0.36;
constexpr double kBottom = 0.99;
constexpr double kNeckHalf = 0.125;
constexpr double kBodyHalf = kVialAspect / 2.0 - 0.01;
constexpr double kCorner = 0.06;
constexpr double kMiddle = kVialAspect / 2.0;

/// Half the width inside, at a depth below the top of the cap.
double halfWidth(double y) {
  if (y <= kNeckBottom) return kNeckHalf;
  if (y >= kShoulderBottom) return kBodyHalf;
  const double t = (y - kNeckBottom) / (kShoulderBottom - kNeckBottom);
  return kNeckHalf + (kBodyHalf - kNeckHalf) * t * t * (3.0 - 2.0 * t);
}

QPainterPath glass() {
  constexpr int kSteps = 24;
  QPainterPath path;
  path.moveTo(kMiddle - kNeckHalf, kCapBottom);
  const auto depth = [](int step) {
    return kNeckBottom + (kShoulderBottom - kNeckBottom) * step / kSteps;
  };
  for (int i = 0; i <= kSteps; ++i) path.lineTo(kMiddle - halfWidth(depth(i)), depth(i));
  path.lineTo(kMiddle - kBodyHalf, kBottom - kCorner);
  path.quadTo(kMiddle - kBodyHalf, kBottom, kMiddle - kBodyHalf + kCorner, kBottom);
  path.lineTo(kMiddle + kBodyHalf - kCorner, kBottom);
  path.quadTo(kMiddle + kBodyHalf, kBottom, kMiddle + kBodyHalf, kBottom - kCorner);
  for (int i = kSteps; i >= 0; --i) path.lineTo(kMiddle + halfWidth(depth(i)), depth(i));
  path.lineTo(kMiddle + kNeckHalf, kCapBottom);
  path.closeSubpath();
  return path;
}

/// The depth of the surface: slices from the bottom up, until they hold the share.
double surface(double fill) {
  constexpr int kSlices = 400;
  const auto slice = [](int i) {
    const double half = halfWidth(kBottom - (kBottom - kCapBottom) * (i + 0.5) / kSlices);
    return half * half;
  };
  double whole = 0.0;
  for (int i = 0; i < kSlices; ++i) whole += slice(i);
  double held = 0.0;
  int full = 0;
  while (full < kSlices && held + slice(full) <= fill * whole) held += slice(full++);
  return kBottom - (kBottom - kCapBottom) * full / kSlices;
}

}  // namespace

void drawVial(PagePainter& painter, double x_mm, double y_mm, double height_mm, double fill) {
  const QPainterPath vial = glass();
  const double share = std::isfinite(fill) ? std::clamp(fill, 0.0, 1.0) : 0.0;
  if (share > 0.0) {
    const double level = surface(share);
    QPainterPath below;
    below.addRect(0.0, level, kVialAspect, 1.0 - level);
    painter.fill(vial.intersected(below), x_mm, y_mm, height_mm, colours::kLiquid);
    QPainterPath line;
    line.moveTo(kMiddle - halfWidth(level), level);
    line.lineTo(kMiddle + halfWidth(level), level);
    painter.stroke(line, x_mm, y_mm, height_mm, colours::kBox, 0.25);
  }
  QPainterPath bar;
  bar.addRoundedRect(QRectF(kMiddle - 0.085, kBottom - 0.065, 0.17, 0.045), 0.022, 0.022);
  painter.fill(bar, x_mm, y_mm, height_mm, QColor(Qt::white));
  painter.stroke(bar, x_mm, y_mm, height_mm, colours::kInk, 0.25);
  painter.stroke(vial, x_mm, y_mm, height_mm, colours::kInk, 0.35);
  QPainterPath cap;
  cap.addRoundedRect(QRectF(kMiddle - 0.15, 0.015, 0.30, kCapBottom - 0.015), 0.015, 0.015);
  painter.fill(cap, x_mm, y_mm, height_mm, colours::kBox);
  QPainterPath septum;
  septum.addRect(kMiddle - 0.06, 0.0, 0.12, 0.02);
  painter.fill(septum, x_mm, y_mm, height_mm, colours::kInk);
}

}  // namespace vialkeeper::exports
