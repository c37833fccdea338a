// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "exports/page_parts.h"

namespace vialkeeper::exports {

/// Puts the rows on the pages, in the given order: a row stays whole where a page can hold it,
/// and every page that the table reaches begins with the table's head.
void addWeighingTable(PageFlow& flow, const Setting& setting,
                      const std::vector<app::SheetRow>& rows);

}  // namespace vialkeeper::exports
