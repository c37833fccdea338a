// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/shelf_cards.h"

namespace vialkeeper::app {

Checked<ShelfCard> changeShelfCard(const Desk&, const ShelfCard&, const std::string&,
                                   const TypedFields&) {
  return askedFault("", "this does not work yet", "wait");
}
TypedFields typedFields(Notebook&, const ShelfCard&) { return {}; }

}  // namespace vialkeeper::app
