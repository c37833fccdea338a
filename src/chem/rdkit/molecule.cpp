// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/molecule.h"

#include <GraphMol/MolOps.h>
#include <GraphMol/PeriodicTable.h>
#include <GraphMol/SanitException.h>
#include <GraphMol/SmilesParse/SmilesParse.h>
#include <RDGeneral/RDLog.h>

#include <optional>
#include <string>

#include "chem/rdkit/smiles_scan.h"

namespace vialkeeper::chem {
namespace {

using RDKit::RWMol;

void silenceLogs() {
  static const bool silenced = [] {
    boost::logging::disable_logs("rdApp.*");
    return true;
  }();
  static_cast<void>(silenced);
}

RDKit::SmilesParserParams parserSettings(bool sanitize) {
  RDKit::SmilesParserParams settings;
  settings.parseName = false;
  settings.allowCXSMILES = false;
  settings.sanitize = sanitize;
  settings.removeHs = sanitize;
  return settings;
}

std::string described(const AtomPlace& place) {
  return place.text + " at position " + std::to_string(place.position);
}

StructureFault valenceFault(const AtomPlace& place) {
  return {"the atom " + described(place) + " has more bonds than its element and charge allow",
          "check its bonds, charge and hydrogens; a quaternary nitrogen is written [N+]"};
}

StructureFault aromaticFault(const AtomPlace& place) {
  return {"the aromatic (lower-case) ring with " + described(place) +
              " has no arrangement of alternating double bonds",
          "write the hydrogen of a pyrrole-type nitrogen as [nH], or write the ring with capital "
          "letters and = bonds"};
}

/// Why RDKit refused a SMILES of good syntax. Parses again without sanitising, so that the atoms
/// stand in the order of writing.
StructureFault explainChemistry(std::string_view smiles) {
  const std::unique_ptr<RWMol> mol(
      RDKit::SmilesToMol(std::string(smiles), parserSettings(false)));
  if (mol) {
    for (const auto& problem : RDKit::MolOps::detectChemistryProblems(*mol)) {
      if (const auto* ring = dynamic_cast<const RDKit::KekulizeException*>(problem.get())) {
        if (ring->getAtomIndices().empty()) continue;
        return aromaticFault(placeOfAtom(smiles, ring->getAtomIndices().front()));
      }
      if (const auto* atom = dynamic_cast<const RDKit::AtomSanitizeException*>(problem.get())) {
        const AtomPlace place = placeOfAtom(smiles, atom->getAtomIdx());
        if (atom->getType() == "AtomValenceException") return valenceFault(place);
        if (atom->getType() == "AtomKekulizeException") {
          return {"the atom " + described(place) + " is aromatic (lower-case) outside of a ring",
                  "write it with a capital letter, or close its ring"};
        }
        return aromaticFault(place);
      }
    }
  }
  return {"the bonds and charges of the SMILES do not add up to a structure",
          "compare it with the drawing it came from, or export the SMILES again"};
}

/// What RDKit accepts although no substance is meant by it.
std::optional<StructureFault> refuseAtoms(const RWMol& mol) {
  if (mol.getNumAtoms() == 0) {
    return StructureFault{"the SMILES has no atoms", "give the SMILES of a substance"};
  }
  for (const RDKit::Atom* atom : mol.atoms()) {
    if (atom->getAtomicNum() == 0 || atom->hasQuery()) {
      return StructureFault{
          "one atom of the SMILES stands for any atom, so the substance has no molar mass",
          "write the atom or group that is really there"};
    }
    const unsigned int isotope = atom->getIsotope();
    if (isotope == 0) continue;
    const auto element = static_cast<unsigned int>(atom->getAtomicNum());
    if (!(RDKit::PeriodicTable::getTable()->getMassForIsotope(element, isotope) > 0.0)) {
      return StructureFault{
          "there is no nuclide [" + std::to_string(isotope) + atom->getSymbol() + "]",
          "correct the mass number, or leave it out for the natural mixture"};
    }
  }
  for (const RDKit::Bond* bond : mol.bonds()) {
    if (bond->hasQuery()) {
      return StructureFault{"one bond of the SMILES stands for any bond",
                            "write every bond as what it is"};
    }
  }
  return std::nullopt;
}

}  // namespace

std::expected<std::unique_ptr<RWMol>, StructureFault> parseMolecule(std::string_view text) {
  silenceLogs();
  const std::string_view smiles = withoutOuterBlanks(text);
  if (auto refused = refuseNotation(smiles)) return std::unexpected(*refused);
  std::unique_ptr<RWMol> mol;
  try {
    mol.reset(RDKit::SmilesToMol(std::string(smiles), parserSettings(true)));
  } catch (const RDKit::MolSanitizeException&) {
    return std::unexpected(explainChemistry(smiles));
  } catch (const RDKit::SmilesParseException&) {
    return std::unexpected(explainSyntax(smiles));
  }
  if (!mol) return std::unexpected(explainSyntax(smiles));
  if (auto refused = refuseAtoms(*mol)) return std::unexpected(*refused);
  return mol;
}

StructureFault unexpectedFault() {
  return {"the structure module failed on this SMILES",
          "give a formula or molar mass in its place, and report the SMILES to Vialkeeper's "
          "developers"};
}

}  // namespace vialkeeper::chem
