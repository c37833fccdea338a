// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <GraphMol/FileParsers/FileParsers.h>
#include <GraphMol/MolOps.h>
#include <GraphMol/SanitException.h>
#include <GraphMol/SmilesParse/SmilesWrite.h>
#include <RDGeneral/FileParseException.h>
#include <RDGeneral/RDLog.h>
#include <fmt/format.h>

#include <charconv>
#include <memory>
#include <optional>

#include "chem/rdkit/molecule.h"
#include "chem/rdkit/smiles_scan.h"
#include "chem/rdkit/structure_module.h"

namespace vialkeeper::chem {
namespace {

constexpr std::size_t kLongestMolfile = std::size_t{1} << 20U;

StructureFault unreadable() {
  return {"the molfile is no structure that can be read", "export it again as V2000 or V3000"};
}

/// V2000 ends at 999 atoms by itself; V3000 says in its own line how many there are.
bool hasTooManyAtoms(std::string_view molfile) {
  constexpr std::string_view kCounts = "M  V30 COUNTS ";
  const std::size_t at = molfile.find(kCounts);
  if (at == std::string_view::npos) return false;
  std::size_t atoms = 0;
  const char* begin = molfile.data() + at + kCounts.size();
  std::from_chars(begin, molfile.data() + molfile.size(), atoms);
  return atoms > kMostAtoms;
}

std::optional<StructureFault> refuseQueries(const RDKit::ROMol& mol) {
  for (const RDKit::Atom* atom : mol.atoms()) {
    if (atom->getAtomicNum() == 0 || atom->hasQuery()) {
      return StructureFault{fmt::format("atom {} stands for any of several", atom->getIdx() + 1),
                            "draw the atom or group that is really there"};
    }
  }
  for (const RDKit::Bond* bond : mol.bonds()) {
    if (bond->hasQuery()) {
      return StructureFault{fmt::format("bond {} stands for any of several", bond->getIdx() + 1),
                            "draw the bond that is really there"};
    }
  }
  return std::nullopt;
}

StructureFault explained(const RDKit::MolSanitizeException& problem) {
  if (const auto* atom = dynamic_cast<const RDKit::AtomSanitizeException*>(&problem)) {
    return {fmt::format("atom {} of the molfile has more bonds than its element and charge allow",
                        atom->getAtomIdx() + 1),
            "check its bonds, charge and hydrogens"};
  }
  return {"a ring of the molfile has no arrangement of alternating double bonds",
          "draw it with single and double bonds"};
}

std::expected<std::string, StructureFault> smilesOf(std::string_view molfile) {
  if (molfile.size() > kLongestMolfile || hasTooManyAtoms(molfile)) {
    return std::unexpected(StructureFault{
        fmt::format("the structure has more than {} atoms", kMostAtoms), "give a formula instead"});
  }
  std::unique_ptr<RDKit::RWMol> mol;
  try {
    mol.reset(RDKit::MolBlockToMol(std::string(molfile), true, true, true));
  } catch (const RDKit::MolSanitizeException& problem) {
    return std::unexpected(explained(problem));
  } catch (const std::exception&) {
    return std::unexpected(unreadable());
  }
  if (!mol) return std::unexpected(unreadable());
  if (mol->getNumAtoms() == 0) {
    return std::unexpected(
        StructureFault{"the molfile has no atoms", "draw the structure, or leave the record out"});
  }
  if (auto refused = refuseQueries(*mol)) return std::unexpected(*refused);
  // By way of the reader of SMILES, so that it is the text that read() gives.
  const auto again = parseMolecule(RDKit::MolToSmiles(*mol));
  if (!again) return std::unexpected(again.error());
  return RDKit::MolToSmiles(**again);
}

class RdkitFileReader final : public StructureFileReader {
 public:
  RdkitFileReader() { boost::logging::disable_logs("rdApp.*"); }

  std::expected<std::string, StructureFault> readMolfile(std::string_view molfile) override {
    return guarded([&]() { return smilesOf(molfile); });
  }
};

}  // namespace
}  // namespace vialkeeper::chem

/// The module's one export; the object is kept by the module and never destroyed.
extern "C" __attribute__((visibility("default"))) void* vialkeeper_open_structure_file_reader(
    int abiVersion) {
  using namespace vialkeeper::chem;
  if (abiVersion != kStructureModuleAbi) return nullptr;
  static StructureFileReader* reader = new RdkitFileReader;
  return reader;
}
