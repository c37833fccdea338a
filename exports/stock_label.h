// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "exports/page_parts.h"

namespace vialkeeper::exports {

inline constexpr double kStockLabelWidth_mm = 82.0;

/// A label to cut out for the bottle: what is in it, when and by whom, and the codes of its
/// hazards.
[[nodiscard]] Block stockLabelBlock(const Setting& setting, const app::StockSheetContent& stock);

}  // namespace vialkeeper::exports
