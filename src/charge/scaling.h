// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "charge/plan.h"
#include "units/quantity.h"

namespace vialkeeper::charge {

/// The plan for `factor` times as much: amounts, masses, volumes and the total liquid grow by the
/// factor; concentrations, equiv, mol% and shares stay. The vial stays as it is.
/// The factor must be positive and finite (logic_error).
[[nodiscard]] Plan scaled(const Plan& plan, double factor);

/// The plan moved to a vial of another size at the same fill, with all amounts in proportion.
/// The stir bar keeps its volume, the rating is left out: it belongs to the vessel.
/// The plan must have a vial (logic_error).
[[nodiscard]] Plan scaledToVial(const Plan& plan, units::Volume volume);

}  // namespace vialkeeper::charge
