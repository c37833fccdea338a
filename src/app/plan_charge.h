// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>

#include "charge/charge.h"
#include "charge/plan.h"
#include "charge/substances.h"
#include "charge/weighing.h"
#include "text/fault.h"
#include "units/quantity.h"

/// Use cases: what a person asks for, the same from the desktop and from the command line.
namespace vialkeeper::app {

/// What to work out from a plan file.
struct ChargeRequest {
  std::string planFile = {};
  std::optional<std::string> weighedFile = {};
  charge::Retarget retarget = charge::Retarget::kNo;
  std::optional<units::Amount> scaleToAmount = {};  ///< of the limiting component
  std::optional<units::Mass> scaleToMass =
      {};  ///< of the limiting component's material as supplied
  std::optional<units::Volume> scaleToVial = {};  ///< brim-full volume of another vial
};

/// A plan with its charge.
struct PlannedRun {
  std::string planText;  ///< the file's bytes
  charge::Plan plan;     ///< after scaling
  charge::Substances substances;
  charge::Charge charge;
};

/// Reads a plan, scales it if asked, works out the charge, and sets against it what was weighed.
/// All faults of the plan and of the weighed file come back together.
[[nodiscard]] text::Checked<PlannedRun> planCharge(const ChargeRequest& request);

/// The same from a text that is already in memory; `file` is named in faults.
[[nodiscard]] text::Checked<PlannedRun> planCharge(std::string planText, const std::string& file,
                                                   const ChargeRequest& request);

}  // namespace vialkeeper::app
