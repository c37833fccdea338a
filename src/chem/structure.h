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
  std::string canonicalSmiles;  ///< isomeric; the same text for every way to write the structure
  std::string
      formula;  ///< Hill order with charge; isotopes as `D`, `T`, `[13C]`: readable by parseFormula
  int heavyAtoms = 0;  ///< atoms other than hydrogen
};

/// The names by which other people's databases know a structure; both are empty where InChI
/// cannot describe it.
struct Identity {
  std::string
      inchi;  ///< standard InChI; bonds to metals are left out of it, as the standard has it
  std::string inchiKey;  ///< 27 characters
};

/// Why a structure could not be read. Both parts without a full stop.
struct StructureFault {
  std::string what;  ///< with the position in the SMILES, counted from 1, where one is at fault
  std::string mend;
};

/// A part of a structure that is looked for in others. Every atom must be met by one of the same
/// element and every bond by one of the same kind, once aromaticity is settled on both sides; where
/// the part is open, anything may follow. A charge or an isotope must be met where the part names
/// one. Of hydrogens, only those written as atoms (`[H]n1cccc1`) must be met: they keep a place
/// free, while the count in `[nH]` does not. Stereochemistry and radicals do not count.
/// Not safe for use from two threads at once.
class Pattern {
 public:
  Pattern() = default;
  Pattern(const Pattern&) = delete;
  Pattern& operator=(const Pattern&) = delete;
  virtual ~Pattern() = default;

  /// For mayContain() in chem/fingerprint.h, which tells most structures without the part apart
  /// before isIn() has to read them.
  [[nodiscard]] virtual std::string fingerprint() const = 0;

  /// Whether the structure has the part; false also for a text that is no structure.
  /// Cost: reading the SMILES, about 0.1 ms; the search itself is exponential at worst.
  [[nodiscard]] virtual bool isIn(std::string_view smiles) const = 0;
};

/// Reads, draws and searches structures. Implemented by modules over RDKit and libinchi; the one
/// that reads is loaded by structureEngine(), those that draw (three times as slow to load), search
/// and read files by the first drawing, fingerprint or pattern, and molfile. A SMILES has at most
/// 10 000 characters and 1000 atoms; blanks around it do not count. Not safe for use from two
/// threads at once.
class StructureEngine {
 public:
  StructureEngine() = default;
  StructureEngine(const StructureEngine&) = delete;
  StructureEngine& operator=(const StructureEngine&) = delete;
  virtual ~StructureEngine() = default;

  /// Reads a SMILES. The whole text must be the notation: nothing after it, no reaction arrow, no
  /// atom or bond that stands for "any". Salts and hydrates written with `.` are one formula.
  [[nodiscard]] virtual std::expected<Structure, StructureFault> read(std::string_view smiles) = 0;

  /// The canonical SMILES of a molfile (V2000 or V3000, up to `M  END`), as read() gives it: what
  /// an SD file's record begins with. Explicit hydrogens become counted ones. Fault: no structure,
  /// one whose valences do not add up, atoms or bonds that stand for any of several, more than 1000
  /// atoms.
  [[nodiscard]] virtual std::expected<std::string, StructureFault> readMolfile(
      std::string_view molfile) = 0;

  /// The InChI and InChIKey of a SMILES. Apart from read(), because a charge does not need them.
  [[nodiscard]] virtual std::expected<Identity, StructureFault> identify(
      std::string_view smiles) = 0;

  /// A vector drawing of one structure, as SVG of the given size [px], black on transparent, with
  /// bonds of 28 px, shorter where the structure would not fit; paths only, no text and no fonts.
  /// Fault: also a size below 1 or above 10 000 px.
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

  /// The fingerprint of a whole structure, for mayContain() in chem/fingerprint.h: 256 bytes, bit i
  /// of 2048 as bit i % 8 (the lowest is 0) of byte i / 8. To be made anew with another release of
  /// RDKit, which may change its meaning.
  /// Source: RDKit, pattern fingerprint 1.0.0.
  [[nodiscard]] virtual std::expected<std::string, StructureFault> fingerprint(
      std::string_view smiles) = 0;

  /// The part that a SMILES describes, kept for any number of structures. Not SMARTS. A nitrogen
  /// of an aromatic ring may be left open (`n1cccc1`) as well as written with its hydrogen.
  [[nodiscard]] virtual std::expected<std::unique_ptr<Pattern>, StructureFault> readPattern(
      std::string_view smiles) = 0;
};

/// The engine, loaded on the first call and kept for the life of the process.
/// Fault: the module is missing from this installation or does not load; says where it was sought.
/// A fault is not kept: the next call tries again.
[[nodiscard]] std::expected<StructureEngine*, StructureFault> structureEngine();

}  // namespace vialkeeper::chem
