// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <GraphMol/ROMol.h>

#include <string>

namespace vialkeeper::chem {

/// The formula of all fragments together, counted from the atoms and their hydrogens, in the order
/// of toHillFormula() in chem/formula.h: carbon, hydrogen with D and T, then by symbol; by symbol
/// throughout where there is no carbon. A labelled nuclide follows its element as `[13C]`.
/// A net charge ends it as `+`, `-`, `^2+` or `^2-`; a single one as `^-` where the count before it
/// could be taken for the charge (`N3^-`), so that parseFormula() reads back what is meant.
/// Source: Hill, J. Am. Chem. Soc. 22 (1900) 478. RDKit's own formula is not used, as it writes D as H.
[[nodiscard]] std::string hillFormula(const RDKit::ROMol& mol);

}  // namespace vialkeeper::chem
