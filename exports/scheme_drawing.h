// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <vector>

#include "exports/page_flow.h"
#include "exports/pages_module.h"

namespace vialkeeper::exports {

/// How much room a scheme may take.
struct SchemeSize {
  double width_mm = 180.0;
  double bond_mm = 5.0;        ///< length of a bond where nothing is too large for it
  double structure_mm = 34.0;  ///< the highest that a structure may be
  bool conditionsOnArrow = true;
};

/// The reaction on one line: reactants, arrow with its conditions, products and gases, with all
/// structures at one scale, which shrinks until they fit; on more lines where even small
/// structures do not. Conditions that are too many for the arrow stand below, one a line.
/// Nothing for an empty scheme.
[[nodiscard]] Blocks schemeBlocks(const Typesetter& typesetter, const app::SchemeContent& scheme,
                                  const SchemePictures& pictures, SchemeSize size, double x_mm);

}  // namespace vialkeeper::exports
