// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <GraphMol/ROMol.h>

#include "chem/structure.h"

namespace vialkeeper::chem {

/// The standard InChI of a molecule and its key; both empty where libinchi gives none.
/// Stereochemistry goes over as parities, not as a drawing with wedges: a crowded drawing can
/// be ambiguous, a parity cannot. Non-tetrahedral centres go over without their geometry.
/// Throws RDKit's exceptions if the molecule has not been sanitised.
[[nodiscard]] Identity standardInchi(const RDKit::ROMol& mol);

}  // namespace vialkeeper::chem
