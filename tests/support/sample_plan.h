// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <random>
#include <string>

namespace vialkeeper::tests {

/// A full plan with one component of every supply but gas.
[[nodiscard]] std::string samplePlanText();

/// Some bytes, words or lines of the text changed, dropped, doubled or swapped.
[[nodiscard]] std::string mutated(const std::string& text, std::mt19937_64& random);

}  // namespace vialkeeper::tests
