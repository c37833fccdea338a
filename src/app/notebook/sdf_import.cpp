// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/shelf_cards.h"

namespace vialkeeper::app {

Checked<ShelfImport> importSubstancesFromSdf(const Desk&, std::string_view, const std::string&) {
  return askedFault("", "this does not work yet", "wait");
}

}  // namespace vialkeeper::app
