// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <string>

namespace vialkeeper::tests {

/// A plan drawn at random, always sound: one to three shared solvents, up to six other components
/// of every supply and basis, stocks that stay within their solvent's share. The same seed gives
/// the same numbers, written in small units (`spelling` 0: mg, uL, mM …) or large ones (1: g, mL,
/// mol/L …) with all their digits.
[[nodiscard]] std::string randomPlanText(std::uint64_t seed, int spelling = 0);

}  // namespace vialkeeper::tests
