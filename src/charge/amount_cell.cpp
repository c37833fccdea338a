// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/amount_cell.h"

namespace vialkeeper::charge {

std::expected<AmountCell, text::TextFault> readAmountCell(std::string_view text, Role /*role*/,
                                                          Basis /*present*/) {
  return text::textFault(0, text.size(), "amounts are not read yet", "wait");
}

std::string amountCellText(const ComponentPlan& component) { return component.amount.asWritten; }

}  // namespace vialkeeper::charge
