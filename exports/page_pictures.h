// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <vector>

#include "exports/page_flow.h"
#include "exports/pages.h"

namespace vialkeeper::exports {

/// The pages as pictures on white, for a preview and for printers; measured as they are for the
/// PDF, so that every line breaks at the same place. Fault: no memory for a page of that size.
[[nodiscard]] text::Checked<std::vector<PagePicture>> paintPages(const std::vector<PageFlow>& flows,
                                                                 const Typesetter& typesetter,
                                                                 const PageGeometry& geometry,
                                                                 double resolution_dpi);

}  // namespace vialkeeper::exports
