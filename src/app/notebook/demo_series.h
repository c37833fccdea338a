// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "app/notebook/demo_outcome.h"
#include "app/notebook/records.h"

namespace vialkeeper::app {

/// One run of the invented campaign: who does what when, and how it ends.
struct DemoRunSpec {
  int day = 0;        ///< from Monday 2 March 2026
  double hour = 0.0;  ///< by the clock on the wall, when the run is set up
  std::string person = {};
  DemoRecipe recipe = {};
  DemoFate fate = DemoFate::kSound;
  RunState state = RunState::kClosed;  ///< in which the campaign leaves it
  std::string aim = {};
  std::string conclusion = {};  ///< what its author concludes besides the figures
  bool course = false;          ///< several aliquots, and a course of concentrations
  bool trace = false;           ///< the pressure was also recorded
  bool vents = false;           ///< enough gas to vent it underway
};

/// What every aim of the campaign begins with, so that nobody takes it for work that was done.
inline constexpr std::string_view kDemoMark = "Invented demonstration data.";

/// When the campaign's story ends: Friday 29 May 2026, 17:00.
inline constexpr int kDemoLastDay = 88;
inline constexpr double kDemoLastHour = 17.0;

/// All runs of the campaign in the order in which they are set up.
[[nodiscard]] std::vector<DemoRunSpec> demoCampaign();

}  // namespace vialkeeper::app
