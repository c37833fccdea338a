// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <string>
#include <string_view>

#include "chem/formula.h"
#include "text/fault.h"

namespace vialkeeper::app {

/// A formula in Hill's order with its molar mass.
struct MolarMassAnswer {
  std::string formula;
  chem::MolarMassEstimate molarMass;
};

/// Molar mass of a formula, `CuSO4·5H2O`; blanks at its ends do not count.
/// Fault: what parseFormula and molarMass refuse.
[[nodiscard]] std::expected<MolarMassAnswer, text::Fault> massOfFormula(std::string_view formula);

/// Molar mass of a structure given as SMILES.
/// Fault: what the structure engine refuses; an element without a standard atomic weight.
[[nodiscard]] std::expected<MolarMassAnswer, text::Fault> massOfSmiles(std::string_view smiles);

}  // namespace vialkeeper::app
