// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <string>
#include <vector>

#include "app/notebook/demo_campaign.h"
#include "app/notebook/demo_clock.h"
#include "app/notebook/demo_log.h"

namespace vialkeeper::app {

/// One run of the campaign on its way into the notebook.
struct DemoRun {
  DemoRunSpec spec;
  DemoOutcome outcome;
  DemoLog log;
  DemoRandom random;               ///< for what is decided at the bench
  const DemoRun* frame = nullptr;  ///< an earlier run whose plan is cloned
  RowNumber n = 0;                 ///< once it is added
  std::string code = {};
  std::string yield = {};  ///< as it was recorded; empty before
};

/// Something that somebody does at some time.
struct DemoStep {
  units::Moment at;
  std::string person;
  std::function<Checked<void>(const Desk&)> work;
};

/// The campaign's first runs with their logs and outcomes worked out. Pure.
[[nodiscard]] std::vector<DemoRun> demoRuns(const DemoOptions& options);

/// All steps of one run, until the story ends. `runs` must stay where they are.
[[nodiscard]] std::vector<DemoStep> demoSteps(DemoRun& run, const std::vector<DemoRun>& runs,
                                              bool withStructures, DemoSummary& summary);

}  // namespace vialkeeper::app
