// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <span>

#include "charge/charge.h"
#include "charge/material.h"

namespace vialkeeper::charge {

/// Adds what a chemist should know of a charge before weighing: targets below the minimum weight
/// with the stock that would do, pipettes out of range, a vial more than half full, what was
/// assumed. `missing` is the part of the total that no component fills.
void addNotices(const Plan& plan, std::span<const Material> materials, units::Volume missing,
                Charge& charge);

}  // namespace vialkeeper::charge
