// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "app/plan_charge.h"

namespace vialkeeper::cli {

/// The charge for people: a head line, the table, the notices, and on demand where each number is
/// from.
[[nodiscard]] std::string chargeTable(const app::PlannedRun& run, bool withWeighed, bool withTrail);

}  // namespace vialkeeper::cli
