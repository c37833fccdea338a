// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <optional>
#include <string_view>

#include "app/notebook/notebook.h"
#include "text/text_fault.h"

namespace vialkeeper::app {

/// Searches a notebook with a text of the find language (docs/find.md). An empty text finds all
/// runs. Fault: the text cannot be read, or names a substance that is not on the shelf; it points
/// at the character.
[[nodiscard]] Checked<FindResult> findRuns(Notebook& notebook, std::string_view text,
                                           const FindOptions& options, bool asYouType = false);

/// Why a search was not answered.
struct FindRefusal {
  std::optional<text::TextFault> place;  ///< within the text; nothing where the notebook failed
  text::Faults faults;                   ///< as findRuns gives them
};

/// The same for those who show the fault within the text.
[[nodiscard]] std::expected<FindResult, FindRefusal> findRunsPointing(Notebook& notebook,
                                                                      std::string_view text,
                                                                      const FindOptions& options,
                                                                      bool asYouType = false);

}  // namespace vialkeeper::app
