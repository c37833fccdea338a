// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "app/notebook/desk.h"
#include "app/notebook/weighing_slip.h"
#include "charge/charge.h"
#include "charge/plan.h"
#include "charge/weighing.h"

/// What the components' records of a run take from its plan, its charge and what was recorded.
namespace vialkeeper::app {

/// What is planned of a component; nothing of what was recorded.
[[nodiscard]] ComponentRecord plannedRecord(const charge::ComponentPlan& plan,
                                            const charge::ComponentCharge& charge, int position);

/// The component of a plan. Fault: there is none of that key; the nearest is offered.
[[nodiscard]] Checked<const charge::ComponentPlan*> componentOfKey(const charge::Plan& plan,
                                                                   const std::string& key);

/// A mass or volume as typed, of a kind in which the component can be recorded.
[[nodiscard]] Checked<Recorded> readActual(const charge::ComponentPlan& component,
                                           const std::string& quantity);

void takeActual(ComponentRecord& record, const Recorded& actual, const std::string& typed,
                const Author& author);
/// Nothing is recorded any more.
void forgetActual(ComponentRecord& record);

/// Copies the judgement of the charge into the component's record.
void takeCharged(ComponentRecord& record, const charge::AsCharged& charged);

/// Judges all records anew: what is recorded against the plan, nothing where nothing is.
[[nodiscard]] Checked<void> judgeAll(const charge::Plan& plan, const charge::Substances& substances,
                                     std::vector<ComponentRecord>& records);

}  // namespace vialkeeper::app
