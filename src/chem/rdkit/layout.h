// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <GraphMol/RWMol.h>

namespace vialkeeper::chem {

/// The median bond length of every layout [units].
inline constexpr double kLayoutBondLength = 1.5;

/// The molecule with 2D coordinates and wedges, in Kekulé form, ready to be drawn.
/// RDKit's own layout first, as it keeps to the angles that chemists draw; where it puts atoms
/// on top of each other (metal complexes, crowded arenes) CoordGen's, if that is less crowded.
/// Cost: quadratic in the number of atoms.
[[nodiscard]] RDKit::RWMol layOut(const RDKit::RWMol& mol);

}  // namespace vialkeeper::chem
