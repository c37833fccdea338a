// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <string>
#include <vector>

#include "app/notebook/notebook.h"
#include "charge/plan.h"
#include "text/notice.h"

/// Where the components of a plan stand on the shelf.
namespace vialkeeper::app {

/// A component's substance on the shelf, or a new card for it.
struct ShelfPlace {
  RowNumber n = 0;              ///< 0: to be added
  SubstanceRecord record = {};  ///< of a new card
};

/// The number of a component's substance where it is known already, else 0.
using KnownPlace = std::function<RowNumber(const charge::ComponentPlan&)>;

/// The shelf place of every component, in the plan's order; names that look like one of the shelf
/// are noticed. Faults, together: a substance that cannot be described, with its component's place.
[[nodiscard]] Checked<std::vector<ShelfPlace>> placeAll(Notebook& notebook,
                                                        const charge::Plan& plan,
                                                        const KnownPlace& known,
                                                        text::Notices& notices);

/// Adds the new cards, one for a substance that occurs twice; `added` gets their names.
[[nodiscard]] Checked<void> putOnShelf(Writing& writing, std::vector<ShelfPlace>& places,
                                       std::vector<std::string>& added);

}  // namespace vialkeeper::app
