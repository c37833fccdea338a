// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <map>
#include <string>
#include <vector>

#include "app/notebook/edit_run.h"

namespace vialkeeper::app {

/// A plan's text with edits, as far as they could be made.
struct EditedText {
  std::string text;
  std::map<std::string, RowNumber> cards = {};  ///< the shelf's card of an added component, by key
  std::vector<std::string> amountKeys = {};     ///< components whose amount was typed into its cell
  text::Faults faults = {};                     ///< of the edits that could not be made
};

/// Makes the edits one after the other; an edit at fault is left out, and all faults are told.
/// Nothing is asked of the plan's sense: readPlan says that. Fault: the notebook cannot be read.
[[nodiscard]] Checked<EditedText> editPlanText(Notebook& notebook, std::string planText,
                                               const std::string& file,
                                               const std::vector<PlanEdit>& edits);

/// The fault with the field of the amount's cell, `component.acid.amount`, where it is of the basis
/// of such a component.
void nameAmountCell(text::Fault& fault, const std::vector<std::string>& amountKeys);

}  // namespace vialkeeper::app
