// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/edit_run.h"

namespace vialkeeper::app {

Checked<RunSheet> previewEdit(Notebook&, const RunRecord&, const std::vector<PlanEdit>&) {
  return askedFault("", "this does not work yet", "wait");
}
Checked<EditedRun> editRun(const Desk&, const RunRecord&, const std::vector<PlanEdit>&,
                           const std::string&) {
  return askedFault("", "this does not work yet", "wait");
}
Checked<EditedRun> restorePlan(const Desk&, const RunRecord&, RowNumber, const std::string&) {
  return askedFault("", "this does not work yet", "wait");
}

}  // namespace vialkeeper::app
