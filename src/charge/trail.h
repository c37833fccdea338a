// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "charge/charge.h"

namespace vialkeeper::charge {

/// Where a component's numbers are from, one sentence a step: the amount from its basis, the target
/// from the amount, the uncertainty from its device, the sources of molar mass and density.
[[nodiscard]] std::vector<std::string> trailOf(const Plan& plan, const Charge& charge,
                                               std::string_view key);

/// Where the numbers of a component as charged are from: the amount from what was recorded, its
/// ratio from the limiting component, the uncertainty. Empty where nothing is recorded.
[[nodiscard]] std::vector<std::string> chargedTrailOf(const Plan& plan, const Charge& charge,
                                                      std::string_view key);

/// How a component is supplied, for a table: `solid, 98 %`, `stock 2.0 mM in acetonitrile`.
[[nodiscard]] std::string supplyText(const Plan& plan, const ComponentPlan& component);

/// Its ratio to the limiting component in the unit a chemist would use: `1 equiv`, `5 mol%`, and of
/// a solvent its parts, `9 parts`. Empty where there is none.
[[nodiscard]] std::string ratioText(const ComponentPlan& component, const ComponentCharge& charge);

}  // namespace vialkeeper::charge
