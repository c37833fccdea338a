// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/search_query.h"

#include <GraphMol/MolOps.h>
#include <fmt/format.h>

#include <optional>
#include <string>

#include "chem/rdkit/molecule.h"
#include "chem/rdkit/open_nitrogens.h"
#include "chem/rdkit/smiles_scan.h"

namespace vialkeeper::chem {
namespace {

constexpr const char* kHydrogens = "vialkeeperLeastHydrogens";

/// The reading of a substance refuses these as well, but for reasons that are none in a search.
std::optional<StructureFault> refuseSmarts(std::string_view smiles) {
  std::size_t found = smiles.find_first_of("*~!&,;?");
  if (const std::size_t number = smiles.find("[#"); number < found) found = number + 1;
  if (found == std::string_view::npos) return std::nullopt;
  return StructureFault{
      fmt::format("\"{}\" at position {} is SMARTS, and parts are given in SMILES", smiles[found],
                  found + 1),
      "leave out what may be anything: where a part is open, anything may follow"};
}

std::expected<std::unique_ptr<RDKit::RWMol>, StructureFault> parsePart(std::string_view smiles) {
  auto mol = parseMolecule(smiles, Hydrogens::AsWritten);
  if (mol || refuseNotation(smiles)) return mol;
  const std::string closed = closeOpenNitrogens(smiles);
  if (closed == smiles) return mol;
  auto closedMol = parseMolecule(closed, Hydrogens::AsWritten);
  return closedMol ? std::move(closedMol) : std::move(mol);
}

bool isPlainHydrogen(const RDKit::Atom& atom) {
  return atom.getAtomicNum() == 1 && atom.getIsotope() == 0 && atom.getFormalCharge() == 0;
}

/// Turns hydrogens that are atoms into counts that stay with those atoms.
void countHydrogens(RDKit::RWMol& mol) {
  for (const RDKit::Atom* atom : mol.atoms()) {
    if (!isPlainHydrogen(*atom) || atom->getDegree() != 1) continue;
    for (RDKit::Atom* bearer : mol.atomNeighbors(atom)) {
      unsigned int count = 0;
      bearer->getPropIfPresent(kHydrogens, count);
      bearer->setProp(kHydrogens, count + 1);
    }
  }
  RDKit::MolOps::RemoveHsParameters removal;
  removal.removeDefiningBondStereo = true;
  removal.removeHydrides = false;
  removal.showWarnings = false;
  RDKit::MolOps::removeHs(mol, removal);
}

}  // namespace

std::expected<SearchQuery, StructureFault> readSearchQuery(std::string_view text) {
  const std::string_view smiles = withoutOuterBlanks(text);
  if (auto refused = refuseSmarts(smiles)) return std::unexpected(*refused);
  auto mol = parsePart(smiles);
  if (!mol) return std::unexpected(mol.error());
  SearchQuery query{std::move(*mol), {}};
  countHydrogens(*query.mol);
  for (RDKit::Atom* atom : query.mol->atoms()) {
    // A bracket without its hydrogens, as in `[Pd]` or `[CH2]c1ccccc1`, is an open place.
    atom->setNumRadicalElectrons(0);
    unsigned int hydrogens = 0;
    if (!atom->getPropIfPresent(kHydrogens, hydrogens)) continue;
    query.leastHydrogens.resize(query.mol->getNumAtoms());
    query.leastHydrogens[atom->getIdx()] = hydrogens;
  }
  return query;
}

}  // namespace vialkeeper::chem
