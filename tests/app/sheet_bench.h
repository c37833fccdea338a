// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "app/plan_charge.h"
#include "app/sheet_content.h"

namespace vialkeeper::tests {

/// A plan with a solid, a stock, a neat liquid by pipette and one by balance, and two solvents.
[[nodiscard]] const std::string& sheetPlan();

/// The text with the one place where `what` stands changed into `by`; it must stand there once.
[[nodiscard]] std::string replaced(const std::string& text, std::string_view what,
                                   std::string_view by);

/// The charge of a plan's text, which must be sound.
[[nodiscard]] app::PlannedRun planned(const std::string& planText,
                                      const app::ChargeRequest& request = {});

/// The sheet's row of that substance.
[[nodiscard]] app::SheetRow rowOf(const app::SheetContent& sheet, std::string_view name);

/// Whether one of the texts holds the words.
[[nodiscard]] bool anyHolds(const std::vector<std::string>& texts, std::string_view words);

}  // namespace vialkeeper::tests
