// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <memory>
#include <string>
#include <string_view>

namespace vialkeeper::chem {

/// What a line notation says about a substance.
struct Structure {
  std::string canonicalSmiles;
  std::string formula;   ///< Hill order with charge; isotopes as `D`, `T`, `[13C]`: readable by parseFormula
  std::string inchi;     ///< standard InChI
  std::string inchiKey;  ///< 27 characters; empty where InChI cannot describe the structure
  int heavyAtoms = 0;
};

/// Why a structure could not be read.
struct StructureFault {
  std::string what;
  std::string mend;
};

/// Reads and draws structures. Implemented by the structure module over RDKit and libinchi, which
/// is loaded on first use: most of a cold start would go into loading it.
/// Not safe for use from two threads at once.
class StructureEngine {
 public:
  StructureEngine() = default;
  StructureEngine(const StructureEngine&) = delete;
  StructureEngine& operator=(const StructureEngine&) = delete;
  virtual ~StructureEngine() = default;

  /// Reads a SMILES. The whole text must be the notation: nothing after it, no reaction arrow.
  [[nodiscard]] virtual std::expected<Structure, StructureFault> read(std::string_view smiles) = 0;

  /// A vector drawing of one structure, as SVG of the given size [px], black on transparent,
  /// fitted with the same bond length as the others of a scheme where that fits.
  [[nodiscard]] virtual std::expected<std::string, StructureFault> drawSvg(std::string_view smiles,
                                                                           int width_px,
                                                                           int height_px) = 0;

  /// The size [px] a structure takes when it is drawn with bonds of 28 px, so that a scheme can be
  /// laid out with all structures at one scale.
  struct Extent {
    int width_px = 0;
    int height_px = 0;
  };
  [[nodiscard]] virtual std::expected<Extent, StructureFault> extent(std::string_view smiles) = 0;
};

/// The engine, loaded on the first call and kept for the life of the process.
/// Fault: the module is missing from this installation or does not load; says where it was sought.
[[nodiscard]] std::expected<StructureEngine*, StructureFault> structureEngine();

}  // namespace vialkeeper::chem
