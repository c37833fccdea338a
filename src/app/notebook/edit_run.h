// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <variant>
#include <vector>

#include "app/notebook/desk.h"
#include "app/notebook/run_plan.h"

/// Changes of a run's plan after the run was added. The plan stays a text: every change is a new
/// text, kept beside the earlier ones, so that any of them can be put back.
namespace vialkeeper::app {

/// One amount, as typed into its cell.
struct AmountEdit {
  std::string key;
  std::string typed;
};

/// A component more.
struct ComponentAddition {
  std::string name;
  std::string role = {};    ///< as in a plan file; empty: `additive`
  std::string amount = {};  ///< as typed into its cell; empty: 1 equiv, a solvent 1 part
  RowNumber substance = 0;  ///< of the shelf; its structure, formula and CAS number are taken
  SubstanceRecord description = {};  ///< without a card: what is known of it, smiles or formula
  std::string supply = {};           ///< `solid`, `liquid`, or empty: by the rule of the role
};

struct ComponentRemoval {
  std::string key;
};

/// The whole text anew.
struct WholePlan {
  std::string text;
};

using PlanEdit =
    std::variant<PlanOverride, AmountEdit, ComponentAddition, ComponentRemoval, WholePlan>;

/// The run as it would be with the edits; nothing is written. The faults are those that editRun
/// would give; the field names the edit's place: `component.acid.amount`.
[[nodiscard]] Checked<RunSheet> previewEdit(Notebook& notebook, const RunRecord& run,
                                            const std::vector<PlanEdit>& edits);

/// What an edit led to.
struct EditedRun {
  RunSheet sheet;
  RowNumber planBefore = 0;  ///< attachment of the plan's text before, for restorePlan
  std::vector<std::string> newSubstances;
  text::Notices notices;  ///< near misses on the shelf
};

/// Changes the plan of a run in one action: the text, the planned amounts and targets, components
/// that come or go, and what of the run's headings the plan says (vial, lamp, temperature…). What
/// was weighed is judged anew. All faults together, and nothing is written then: those of the
/// edits, all that readPlan and computeCharge refuse, a component to be removed that was weighed, a
/// run whose state forbids it or wants a reason.
[[nodiscard]] Checked<EditedRun> editRun(const Desk& desk, const RunRecord& run,
                                         const std::vector<PlanEdit>& edits,
                                         const std::string& reason);

/// Puts an earlier text of the plan back, as a new change: how an edit is undone. `reason` as in
/// editRun.
[[nodiscard]] Checked<EditedRun> restorePlan(const Desk& desk, const RunRecord& run, RowNumber plan,
                                             const std::string& reason);

}  // namespace vialkeeper::app
