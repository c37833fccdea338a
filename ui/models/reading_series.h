// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <optional>
#include <vector>

#include "app/notebook/vial_strip.h"

namespace vialkeeper::ui {

/// What readings are shown against.
enum class ReadingAxis { kClock, kLampOn };

/// Readings of one kind; a NaN in `y` is a gap: the vial was opened there.
struct ReadingCurve {
  std::vector<double> x_h = {};
  std::vector<double> y = {};
  std::vector<int> entries = {};  ///< of each point; 0 at a gap
};

/// The chart of a log as plain values.
struct ReadingSeries {
  ReadingAxis axis = ReadingAxis::kClock;
  ReadingCurve pressure = {};                            ///< bar gauge
  ReadingCurve temperature = {};                         ///< °C
  std::vector<std::pair<double, double>> lampOn_h = {};  ///< against the clock only
  struct Opening {
    double x_h = 0.0;
    QString word = {};  ///< `vent`
  };
  std::vector<Opening> openings = {};
  std::optional<double> limit_bar = {};

  [[nodiscard]] bool isEmpty() const { return pressure.x_h.empty() && temperature.x_h.empty(); }
};

/// The strip's readings in the order of time; the pressure's curve breaks where gas was let out.
[[nodiscard]] ReadingSeries readingSeries(const app::VialStrip& strip, ReadingAxis axis);

}  // namespace vialkeeper::ui
