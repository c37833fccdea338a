// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "exports/page_parts.h"

namespace vialkeeper::exports {

/// How to make one stock solution: on one page, unless its texts need more.
[[nodiscard]] PageFlow layOutStockSheet(const Typesetter& typesetter, const PageGeometry& page,
                                        const app::StockSheetContent& content,
                                        const std::optional<QrCode>& qr);

}  // namespace vialkeeper::exports
