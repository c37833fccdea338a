// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string_view>

#include "app/notebook/notebook.h"

namespace vialkeeper::app {

/// Searches a notebook with a text of the find language (docs/find.md). An empty text finds all
/// runs. Fault: the text cannot be read, or names a substance that is not on the shelf; it points
/// at the character.
[[nodiscard]] Checked<FindResult> findRuns(Notebook& notebook, std::string_view text,
                                           const FindOptions& options, bool asYouType = false);

}  // namespace vialkeeper::app
