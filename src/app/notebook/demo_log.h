// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "app/notebook/demo_outcome.h"
#include "app/notebook/demo_series.h"

namespace vialkeeper::app {

/// One line of an invented log. Hours count from the lamp, or in the dark from when it would have
/// come on.
struct DemoEntry {
  double happened_h = 0.0;
  double written_h = 0.0;
  std::string line = {};
  bool accepted = false;                     ///< kept as text although it looks like an event
  std::optional<std::size_t> corrects = {};  ///< place in the list of the entry that it supersedes
  std::string reason = {};
};

/// A reading of the pressure recorder.
struct DemoTracePoint {
  double time_h = 0.0;
  double pressure_bar = 0.0;  ///< absolute
  double celsius = 0.0;
};

struct DemoLog {
  std::vector<DemoEntry> entries;     ///< in the order in which they are written down
  std::vector<double> aliquots_h;     ///< when liquid was taken for the course
  std::vector<DemoTracePoint> trace;  ///< every four minutes
};

/// From setting up to the lamp [h].
inline constexpr double kDemoSetUp_h = 0.55;

/// The log of one run in its author's shorthand: readings that follow from the outcome by the gas
/// in the headspace, samples, vents, what was seen, slips and their corrections.
[[nodiscard]] DemoLog demoLog(const DemoRunSpec& run, const DemoOutcome& outcome,
                              DemoRandom& random);

}  // namespace vialkeeper::app
