// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <GraphMol/SmilesParse/SmilesWrite.h>

#include "chem/rdkit/hill_formula.h"
#include "chem/rdkit/inchi.h"
#include "chem/rdkit/molecule.h"
#include "chem/rdkit/structure_module.h"

namespace vialkeeper::chem {
namespace {

int countHeavyAtoms(const RDKit::ROMol& mol) {
  int count = 0;
  for (const RDKit::Atom* atom : mol.atoms()) count += atom->getAtomicNum() > 1 ? 1 : 0;
  return count;
}

class RdkitReader final : public StructureReader {
 public:
  std::expected<Structure, StructureFault> read(std::string_view smiles) override {
    return guarded([&]() -> std::expected<Structure, StructureFault> {
      const auto mol = parseMolecule(smiles);
      if (!mol) return std::unexpected(mol.error());
      return Structure{RDKit::MolToSmiles(**mol), hillFormula(**mol), countHeavyAtoms(**mol)};
    });
  }

  std::expected<Identity, StructureFault> identify(std::string_view smiles) override {
    return guarded([&]() -> std::expected<Identity, StructureFault> {
      const auto mol = parseMolecule(smiles);
      if (!mol) return std::unexpected(mol.error());
      return standardInchi(**mol);
    });
  }
};

}  // namespace
}  // namespace vialkeeper::chem

/// The module's one export; the object is kept by the module and never destroyed.
extern "C" __attribute__((visibility("default"))) void* vialkeeper_open_structure_reader(
    int abiVersion) {
  using namespace vialkeeper::chem;
  if (abiVersion != kStructureModuleAbi) return nullptr;
  static StructureReader* reader = new RdkitReader;
  return reader;
}
