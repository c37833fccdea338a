// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <GraphMol/RWMol.h>

#include <expected>
#include <memory>
#include <string_view>
#include <vector>

#include "chem/structure.h"

namespace vialkeeper::chem {

/// What a pattern asks of a structure.
struct SearchQuery {
  std::unique_ptr<RDKit::RWMol> mol;         ///< without the hydrogens that are counted here
  std::vector<unsigned int> leastHydrogens;  ///< for each atom; empty where none are asked for
};

/// The query of a SMILES, as chem/structure.h describes a Pattern.
/// Fault: SMARTS, or what parseMolecule() refuses. Passes RDKit's invariant failures through.
[[nodiscard]] std::expected<SearchQuery, StructureFault> readSearchQuery(std::string_view smiles);

}  // namespace vialkeeper::chem
