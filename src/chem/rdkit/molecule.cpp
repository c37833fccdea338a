// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/molecule.h"

#include <GraphMol/MolOps.h>
#include <GraphMol/PeriodicTable.h>
#include <GraphMol/SanitException.h>
#include <GraphMol/SmilesParse/SmilesParse.h>
#include <RDGeneral/RDLog.h>
#include <fmt/format.h>

#include <optional>
#include <string>

#include "chem/rdkit/smiles_scan.h"
#include "chem/rdkit/smiles_syntax.h"

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

StructureFault valenceFault(const std::string& atom) {
  return {fmt::format("the atom {} has more bonds than its element and charge allow", atom),
          "check its bonds, charge and hydrogens; a quaternary nitrogen is written "
          "[N+], the bond from a donor to a metal ->, and ions stand apart with ."};
}

StructureFault aromaticFault(const std::string& atom) {
  return {
      fmt::format("the aromatic (lower-case) ring with {} has no arrangement of alternating double "
                  "bonds",
                  atom),
      "write the hydrogen of a pyrrole-type nitrogen as [nH], or write the ring with capital "
      "letters and = bonds"};
}

/// RDKit's problem in our words, with the place of the first atom that it names.
std::optional<StructureFault> explained(const RDKit::MolSanitizeException& problem,
                                        std::string_view smiles) {
  if (const auto* ring = dynamic_cast<const RDKit::KekulizeException*>(&problem)) {
    if (ring->getAtomIndices().empty()) return std::nullopt;
    return aromaticFault(describedAtom(smiles, ring->getAtomIndices().front()));
  }
  const auto* atom = dynamic_cast<const RDKit::AtomSanitizeException*>(&problem);
  if (atom == nullptr) return std::nullopt;
  const std::string place = describedAtom(smiles, atom->getAtomIdx());
  if (atom->getType() == "AtomValenceException") return valenceFault(place);
  if (atom->getType() != "AtomKekulizeException") return aromaticFault(place);
  return StructureFault{
      fmt::format("the atom {} is aromatic (lower-case) outside of a ring", place),
      "write it with a capital letter, or close its ring"};
}

/// Why RDKit refused a SMILES of good syntax. Parses it again with all hydrogens left where they
/// are, so that the atoms stand in the order of writing when the problem is met.
StructureFault explainChemistry(std::string_view smiles) {
  try {
    const std::unique_ptr<RWMol> mol(
        RDKit::SmilesToMol(std::string(smiles), parserSettings(false)));
    if (mol) {
      RDKit::MolOps::sanitizeMol(*mol);
      mol->updatePropertyCache(true);
    }
  } catch (const RDKit::MolSanitizeException& problem) {
    if (auto found = explained(problem, smiles)) return *found;
  } catch (const std::exception&) {
    // RDKit cannot say more about it: the general sentence has to do.
  }
  return {"the bonds, hydrogens and charges of the SMILES do not add up to a structure",
          "compare it with the drawing it came from, or export the SMILES again"};
}

std::optional<StructureFault> refuseAtom(const RDKit::Atom& atom) {
  const int element = atom.getAtomicNum();
  if (element == 0 || atom.hasQuery()) {
    return StructureFault{
        "one atom of the SMILES stands for any atom, so the substance has no molar mass",
        "write the atom or group that is really there"};
  }
  if (atom.getFormalCharge() > element) {
    return StructureFault{
        fmt::format("an atom {} has a larger charge than it has electrons", atom.getSymbol()),
        "correct its charge"};
  }
  const unsigned int isotope = atom.getIsotope();
  if (isotope == 0) return std::nullopt;
  const auto* table = RDKit::PeriodicTable::getTable();
  if (table->getMassForIsotope(static_cast<unsigned int>(element), isotope) > 0.0) {
    return std::nullopt;
  }
  return StructureFault{fmt::format("there is no nuclide [{}{}]", isotope, atom.getSymbol()),
                        "correct the mass number, or leave it out for the natural mixture"};
}

std::optional<StructureFault> refuseBond(const RDKit::Bond& bond) {
  if (bond.hasQuery()) {
    return StructureFault{"one bond of the SMILES stands for any bond",
                          "write every bond as what it is"};
  }
  const bool betweenAromatic =
      bond.getBeginAtom()->getIsAromatic() && bond.getEndAtom()->getIsAromatic();
  if (bond.getBondType() == RDKit::Bond::AROMATIC && !betweenAromatic) {
    return StructureFault{
        "an aromatic bond (:) of the SMILES is between atoms that are not aromatic",
        "write it as a single or double bond, or its atoms in lower case"};
  }
  return std::nullopt;
}

/// What RDKit accepts although no substance is meant by it.
std::optional<StructureFault> refuseMolecule(const RWMol& mol) {
  if (mol.getNumAtoms() == 0) {
    return StructureFault{"the SMILES has no atoms", "give the SMILES of a substance"};
  }
  for (const RDKit::Atom* atom : mol.atoms()) {
    if (auto refused = refuseAtom(*atom)) return refused;
  }
  for (const RDKit::Bond* bond : mol.bonds()) {
    if (auto refused = refuseBond(*bond)) return refused;
  }
  return std::nullopt;
}

}  // namespace

std::expected<std::unique_ptr<RWMol>, StructureFault> parseMolecule(std::string_view text,
                                                                    Hydrogens hydrogens) {
  silenceLogs();
  const std::string_view smiles = withoutOuterBlanks(text);
  if (auto refused = refuseNotation(smiles)) return std::unexpected(*refused);
  std::unique_ptr<RWMol> mol;
  try {
    RDKit::SmilesParserParams settings = parserSettings(true);
    // A hydride or proton that is bonded would be counted as a hydrogen and its charge be lost.
    settings.removeHs = hydrogens == Hydrogens::Counted &&
                        smiles.find("[H-") == std::string_view::npos &&
                        smiles.find("[H+") == std::string_view::npos;
    mol.reset(RDKit::SmilesToMol(std::string(smiles), settings));
    // Once more after aromaticity is settled: RDKit lets a lower-case atom of a ring that is not
    // aromatic after all pass with any number of bonds, such as the o of an unbracketed `Co`.
    if (mol) mol->updatePropertyCache(true);
  } catch (const RDKit::SmilesParseException&) {
    return std::unexpected(explainSyntax(smiles));
  } catch (const std::exception&) {  // sanitising, and invariants that absurd counts break
    return std::unexpected(explainChemistry(smiles));
  }
  if (!mol) return std::unexpected(explainSyntax(smiles));
  if (auto refused = refuseMolecule(*mol)) return std::unexpected(*refused);
  return mol;
}

StructureFault unexpectedFault() {
  return {"the structure module failed on this SMILES",
          "give a formula or molar mass in its place, and report the SMILES to Vialkeeper's "
          "developers"};
}

}  // namespace vialkeeper::chem
