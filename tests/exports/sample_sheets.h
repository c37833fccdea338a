// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "app/sheet_content.h"

/// Invented content for the printed pages.
namespace vialkeeper::exports::samples {

/// A typical run: six components, structures, hazards, two of them with notices.
[[nodiscard]] app::SheetContent typicalSheet();

/// As full as sheets of templates/runs are: 6 rows, 3 notices of theirs and 2 of the charge,
/// hazards of 4 substances, 4 cautions.
[[nodiscard]] app::SheetContent templateSheet();

/// The least that a sheet can hold: a title, a mark and one row with a name and a target.
[[nodiscard]] app::SheetContent bareSheet();

/// 25 components with names of 200 characters, one of them with twelve notices, and long texts
/// everywhere. Each row's name begins with a word of its own, `row07`.
[[nodiscard]] app::SheetContent hugeSheet();

[[nodiscard]] app::StockSheetContent typicalStock();
[[nodiscard]] app::StockSheetContent hugeStock();

[[nodiscard]] app::LabelContent typicalLabel();

/// Every text of it too long for its place; what may not be cut just fits.
[[nodiscard]] app::LabelContent hugeLabel();

}  // namespace vialkeeper::exports::samples
