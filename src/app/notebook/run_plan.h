// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "app/notebook/desk.h"
#include "app/plan_charge.h"

namespace vialkeeper::app {

/// A run as the notebook holds it, with its charge worked out from the plan and what was recorded.
struct RunSheet {
  RunRecord run;
  std::vector<ComponentRecord> components;  ///< in the plan's order
  PlannedRun planned;                       ///< its plan carries the run's code, chemist and date
  bool weighed = false;                     ///< something is recorded
};

/// Loads a run and works out its charge; recorded masses and volumes are set against it.
[[nodiscard]] Checked<RunSheet> loadRun(Notebook& notebook, const RunRecord& run,
                                        charge::Retarget retarget = charge::Retarget::kNo);

/// What the plan says of a run's headings; person, code and the like are left for the caller.
[[nodiscard]] RunRecord runRecord(const PlannedRun& planned);

/// Gives a plan the run's title and code, and its chemist and date where it names none.
void headPlan(charge::Plan& plan, const RunRecord& run);

/// The recorded quantities of a run's components, as readings of its plan.
[[nodiscard]] charge::Weighings recordedWeighings(const std::vector<ComponentRecord>& components);

/// A field of a plan that is set otherwise than its text says.
struct PlanOverride {
  std::string path;
  std::string value;
};

/// A run to be added.
struct NewRun {
  std::string planText;
  std::string planFile;  ///< named in faults
  std::vector<PlanOverride> overrides = {};
  std::string title = {};  ///< in place of the plan's
  std::string aim = {};
  RowNumber clonedFrom = 0;
};

/// What adding a run did.
struct AddedRun {
  RunRecord run;
  std::vector<std::string> newSubstances;  ///< put on the shelf
  text::Notices notices;                   ///< near misses on the shelf, and those of the charge
};

/// Adds a run from a plan: sets the overrides, works out the charge, matches every substance with
/// the shelf or puts it there, gives the next code of the person.
[[nodiscard]] Checked<AddedRun> addRun(const Desk& desk, const NewRun& wanted);

/// Adds a run with the plan of another, as it is now.
[[nodiscard]] Checked<AddedRun> cloneRun(const Desk& desk, const RunRecord& original,
                                         const std::vector<PlanOverride>& overrides,
                                         const std::string& title);

}  // namespace vialkeeper::app
