// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/substance_cards.h"

namespace vialkeeper::app {

Checked<std::vector<SubstanceRecord>> suggestSubstances(Notebook&, std::string_view, std::size_t) {
  return std::vector<SubstanceRecord>{};
}

}  // namespace vialkeeper::app
