// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/reading_series.h"

#include <algorithm>
#include <limits>

#include "app/notebook/log_line_kinds.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

bool opensVial(const std::string& kind) {
  return kind == app::event_kind::kVent || kind == app::event_kind::kPurge;
}

/// Lamp-on time at a place on the clock.
double lampOnAt(const app::VialStrip& strip, double clock_h) {
  double sum_h = 0.0;
  for (const app::TimelineInterval& each : strip.lamp)
    sum_h += std::max(0.0, std::min(clock_h, each.to_h) - each.from_h);
  return sum_h;
}

double placeOf(const app::ReadingPoint& point, ReadingAxis axis) {
  return axis == ReadingAxis::kClock ? point.clock_h : point.lampOn_h;
}

void addPoint(ReadingCurve& curve, double x_h, double y, int entry) {
  curve.x_h.push_back(x_h);
  curve.y.push_back(y);
  curve.entries.push_back(entry);
}

/// Points and openings merged by the clock: each opening between two points makes a gap.
ReadingCurve pressureCurve(const app::VialStrip& strip, ReadingAxis axis) {
  ReadingCurve curve;
  auto mark = strip.marks.begin();
  for (const app::ReadingPoint& point : strip.pressures) {
    bool opened = false;
    for (; mark != strip.marks.end() && mark->hours < point.clock_h; ++mark)
      opened = opened || opensVial(mark->kind);
    if (opened && !curve.x_h.empty())
      addPoint(curve, curve.x_h.back(), std::numeric_limits<double>::quiet_NaN(), 0);
    addPoint(curve, placeOf(point, axis), point.value, point.entry);
  }
  return curve;
}

}  // namespace

ReadingSeries readingSeries(const app::VialStrip& strip, ReadingAxis axis) {
  ReadingSeries series{.axis = axis, .pressure = pressureCurve(strip, axis)};
  for (const app::ReadingPoint& point : strip.temperatures)
    addPoint(series.temperature, placeOf(point, axis), point.value, point.entry);
  for (const app::TimelineMark& mark : strip.marks) {
    if (!opensVial(mark.kind)) continue;
    const double x_h = axis == ReadingAxis::kClock ? mark.hours : lampOnAt(strip, mark.hours);
    series.openings.push_back({x_h, toQt(mark.kind)});
  }
  if (axis == ReadingAxis::kClock) {
    for (const app::TimelineInterval& each : strip.lamp)
      series.lampOn_h.emplace_back(each.from_h, each.to_h);
  }
  series.limit_bar = strip.limit_bar;
  return series;
}

}  // namespace vialkeeper::ui
