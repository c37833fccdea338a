// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <DataStructs/ExplicitBitVect.h>
#include <GraphMol/Fingerprints/Fingerprints.h>
#include <GraphMol/MolOps.h>
#include <GraphMol/Substruct/SubstructMatch.h>
#include <RDGeneral/versions.h>

#include <algorithm>
#include <map>
#include <memory>
#include <string>
#include <utility>
#include <vector>

#include "chem/fingerprint.h"
#include "chem/rdkit/molecule.h"
#include "chem/rdkit/search_query.h"
#include "chem/rdkit/structure_module.h"

namespace vialkeeper::chem {
namespace {

std::string patternFingerprint(const RDKit::ROMol& mol) {
  constexpr auto kBits = static_cast<unsigned int>(8 * kFingerprintBytes);
  const std::unique_ptr<ExplicitBitVect> bits(RDKit::PatternFingerprintMol(mol, kBits));
  std::string bytes(kBits / 8, '\0');
  for (unsigned int i = 0; i < kBits; ++i) {
    if (bits->getBit(i)) bytes[i / 8] = static_cast<char>(bytes[i / 8] | (1 << (i % 8)));
  }
  return bytes + RDKit::rdkitVersion;
}

using ElementCounts = std::map<int, int>;  // atoms by atomic number

ElementCounts countElements(const RDKit::ROMol& mol) {
  ElementCounts counts;
  for (const RDKit::Atom* atom : mol.atoms()) ++counts[atom->getAtomicNum()];
  return counts;
}

class RdkitPattern final : public Pattern {
 public:
  explicit RdkitPattern(SearchQuery query)
      : m_query(std::move(query)),
        m_fingerprint(patternFingerprint(*m_query.mol)),
        m_elements(countElements(*m_query.mol)) {
    // With ring information at hand, RDKit asks each atom to be in as many smallest rings of the
    // structure as of the part; but a bond more can make other rings the smallest.
    m_query.mol->getRingInfo()->reset();
    auto fragments = RDKit::MolOps::getMolFrags(*m_query.mol, false);
    for (const auto& fragment : fragments) fragment->getRingInfo()->reset();
    if (fragments.size() > 1) m_fragments = std::move(fragments);
    m_settings.maxMatches = 1;
    m_settings.uniquify = false;
    m_settings.recursionPossible = false;
    if (m_query.leastHydrogens.empty()) return;
    m_settings.extraFinalCheck = [this](const RDKit::ROMol& mol,
                                        const std::vector<unsigned int>& match) {
      return hasHydrogens(mol, match);
    };
  }

  std::string fingerprint() const override { return m_fingerprint; }

  bool isIn(std::string_view smiles) const override {
    const auto found = guarded([&]() -> std::expected<bool, StructureFault> {
      const auto mol = parseMolecule(smiles);
      if (!mol) return std::unexpected(mol.error());
      return isIn(**mol);
    });
    return found.value_or(false);
  }

 private:
  bool isIn(const RDKit::ROMol& mol) const {
    // Both are for speed only: a search for what is missing would first try all places for
    // everything else, in all combinations for parts that are not bonded to each other.
    const ElementCounts present = countElements(mol);
    for (const auto& [element, count] : m_elements) {
      const auto found = present.find(element);
      if (found == present.end() || found->second < count) return false;
    }
    RDKit::SubstructMatchParameters alone = m_settings;
    alone.extraFinalCheck = nullptr;
    const bool hasAll = std::ranges::all_of(m_fragments, [&](const auto& fragment) {
      return !RDKit::SubstructMatch(mol, *fragment, alone).empty();
    });
    return hasAll && !RDKit::SubstructMatch(mol, *m_query.mol, m_settings).empty();
  }

  bool hasHydrogens(const RDKit::ROMol& mol, const std::vector<unsigned int>& match) const {
    for (std::size_t i = 0; i < match.size(); ++i) {
      if (mol.getAtomWithIdx(match[i])->getTotalNumHs(true) < m_query.leastHydrogens[i]) {
        return false;
      }
    }
    return true;
  }

  SearchQuery m_query;
  std::string m_fingerprint;
  ElementCounts m_elements;
  std::vector<RDKit::ROMOL_SPTR> m_fragments;  ///< empty where all is one
  RDKit::SubstructMatchParameters m_settings;
};

class RdkitSearcher final : public StructureSearcher {
 public:
  std::expected<std::string, StructureFault> fingerprint(std::string_view smiles) override {
    return guarded([&]() -> std::expected<std::string, StructureFault> {
      const auto mol = parseMolecule(smiles);
      if (!mol) return std::unexpected(mol.error());
      return patternFingerprint(**mol);
    });
  }

  std::expected<std::unique_ptr<Pattern>, StructureFault> readPattern(
      std::string_view smiles) override {
    return guarded([&]() -> std::expected<std::unique_ptr<Pattern>, StructureFault> {
      auto query = readSearchQuery(smiles);
      if (!query) return std::unexpected(query.error());
      return std::make_unique<RdkitPattern>(std::move(*query));
    });
  }
};

}  // namespace
}  // namespace vialkeeper::chem

/// The module's one export; the object is kept by the module and never destroyed.
extern "C" __attribute__((visibility("default"))) void* vialkeeper_open_structure_searcher(
    int abiVersion) {
  using namespace vialkeeper::chem;
  if (abiVersion != kStructureModuleAbi) return nullptr;
  static StructureSearcher* searcher = new RdkitSearcher;
  return searcher;
}
