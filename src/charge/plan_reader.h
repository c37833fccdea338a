// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>

#include "charge/plan.h"
#include "text/fault.h"

namespace vialkeeper::charge {

/// Reads a plan file, `vialkeeper-plan/1`.
/// All of its faults come back together in the order of lines: spelling, unknown and repeated
/// fields, wrong units, values out of range, and what does not fit together (a limiting component
/// that is not there or not absolute, two bases, a stock without its solvent).
/// `file` is only named in the faults.
[[nodiscard]] text::Checked<Plan> readPlan(std::string_view bytes, const std::string& file);

}  // namespace vialkeeper::charge
