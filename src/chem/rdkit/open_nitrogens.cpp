// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/open_nitrogens.h"

#include <GraphMol/MolOps.h>
#include <GraphMol/RWMol.h>
#include <GraphMol/SanitException.h>
#include <GraphMol/SmilesParse/SmilesParse.h>

#include <memory>
#include <optional>
#include <vector>

#include "chem/rdkit/smiles_scan.h"

namespace vialkeeper::chem {
namespace {

using AtomIndices = std::vector<unsigned int>;  // in the order of writing, from 0

/// The atoms of the first ring system without alternating double bonds; empty where all have
/// them, nothing where something else is wrong.
std::optional<AtomIndices> firstUnsettledRing(const std::string& smiles) {
  try {
    RDKit::SmilesParserParams settings;
    settings.parseName = false;
    settings.allowCXSMILES = false;
    settings.sanitize = false;
    settings.removeHs = false;
    const std::unique_ptr<RDKit::RWMol> mol(RDKit::SmilesToMol(smiles, settings));
    if (!mol) return std::nullopt;
    RDKit::MolOps::sanitizeMol(*mol);
    return AtomIndices{};
  } catch (const RDKit::KekulizeException& problem) {
    return problem.getAtomIndices();
  } catch (const std::exception&) {
    return std::nullopt;
  }
}

/// The SMILES with `[nH]` for the atom of this index, or nothing if that is no bare `n`.
std::optional<std::string> withHydrogenAt(std::string_view smiles, unsigned int index) {
  std::optional<std::string> changed;
  forEachAtom(smiles, [&](std::size_t start, std::string_view atom) {
    if (index-- > 0) return true;
    if (atom == "n") changed = std::string(smiles).replace(start, 1, "[nH]");
    return false;
  });
  return changed;
}

}  // namespace

std::string closeOpenNitrogens(std::string_view smiles) {
  std::string text(smiles);
  std::optional<AtomIndices> unsettled = firstUnsettledRing(text);
  while (unsettled && !unsettled->empty()) {
    const AtomIndices ring = *unsettled;
    for (const unsigned int index : ring) {
      const auto changed = withHydrogenAt(text, index);
      if (!changed) continue;
      const auto left = firstUnsettledRing(*changed);
      if (!left || *left == ring) continue;
      text = *changed;
      unsettled = left;
      break;
    }
    if (unsettled == ring) break;
  }
  return text;
}

}  // namespace vialkeeper::chem
