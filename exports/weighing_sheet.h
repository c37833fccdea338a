// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "exports/page_parts.h"
#include "exports/pages_module.h"

namespace vialkeeper::exports {

/// The weighing sheet, laid out: as loose as it can be on the fewest pages that it can have.
[[nodiscard]] PageFlow layOutWeighingSheet(const Typesetter& typesetter, const PageGeometry& page,
                                           const app::SheetContent& content,
                                           const SchemePictures& pictures,
                                           const std::optional<QrCode>& qr);

}  // namespace vialkeeper::exports
