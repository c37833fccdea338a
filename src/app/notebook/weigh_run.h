// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "app/notebook/desk.h"
#include "app/notebook/run_plan.h"
#include "app/notebook/weighing_slip.h"

namespace vialkeeper::app {

/// What recording a weighing led to.
struct WeighedComponent {
  std::vector<SlipQuestion> questions;  ///< if there are any, nothing was recorded
  RunSheet sheet;                       ///< the run with what is recorded now
  std::string before = {};              ///< what was recorded before, as typed; empty: nothing
};

/// Records what the balance or pipette gave for one component, in place of what was recorded before
/// (the trail keeps that). All weighed components are judged anew, for they may follow the limiting
/// one. A quantity that looks like a slip is questioned unless `accepted`. Faults: no such
/// component, a quantity that cannot be read or is of the wrong kind, a run whose state forbids it
/// or wants a reason.
[[nodiscard]] Checked<WeighedComponent> weighComponent(const Desk& desk, const RunRecord& run,
                                                       const std::string& key,
                                                       const std::string& quantity, bool accepted,
                                                       const std::string& reason);

/// What a quantity would mean for a component, without recording it: for a field that is read with
/// every key.
struct WeighingPreview {
  std::optional<double> offTargetPercent = {};  ///< 100 (actual/target − 1)
  bool withinTolerance = false;
  std::string asCharged = {};  ///< `0.198 mmol, 9.9 mol%`; empty where it cannot be said
  std::vector<SlipQuestion> questions = {};
};

/// Faults as weighComponent's, but for the run's state.
[[nodiscard]] Checked<WeighingPreview> previewWeighing(const RunSheet& sheet,
                                                       const std::string& key,
                                                       const std::string& quantity);

/// Takes a recorded quantity out again, or puts an earlier one back, as a new change: how a
/// weighing is undone. `quantity` is the earlier text; empty: nothing is recorded any more. The run
/// stays in its state.
[[nodiscard]] Checked<RunSheet> restoreWeighing(const Desk& desk, const RunRecord& run,
                                                const std::string& key, const std::string& quantity,
                                                const std::string& reason);

/// The components' keys in the order in which they are weighed and pipetted.
[[nodiscard]] std::vector<std::string> weighingOrder(const RunSheet& sheet);

}  // namespace vialkeeper::app
