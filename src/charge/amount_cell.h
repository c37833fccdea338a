// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <string>
#include <string_view>

#include "charge/plan.h"
#include "text/text_fault.h"

namespace vialkeeper::charge {

/// What somebody wrote into the one cell that takes an amount, as the plan's field for it.
struct AmountCell {
  Basis basis = Basis::kAmount;
  std::string field;  ///< of the component's section: `mol_percent`
  std::string value;  ///< as the plan file writes it: `5`, `26.6 mg`
  std::string shown;  ///< the same as a person reads it back: `5 mol%`
};

/// Reads an amount as people write it and takes its basis from the unit: `5 mol%`, `1.2 equiv`
/// (also `eq`), `26.6 mg`, `50 µL`, `0.2 mmol`, `0.1 M`, `9 parts` (also `part`, `parts`; solvents
/// only). A decimal comma is read where it cannot be a thousands sign. A bare number keeps
/// `present`, the basis that the cell has, where that one is a bare number too.
/// Faults point at the place: no number, a negative or zero amount, no unit, a unit of something
/// else (`5 bar`), parts of something that is no solvent, mol% of the limiting component is not
/// known here and left to readPlan.
[[nodiscard]] std::expected<AmountCell, text::TextFault> readAmountCell(std::string_view text,
                                                                        Role role, Basis present);

/// The amount of a component as its cell shows it: `5 mol%`, `26.6 mg`, `9 parts`.
[[nodiscard]] std::string amountCellText(const ComponentPlan& component);

}  // namespace vialkeeper::charge
