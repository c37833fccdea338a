// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <map>
#include <string>
#include <string_view>

#include "text/text_fault.h"
#include "units/quantity.h"

namespace vialkeeper::chem {

/// A kind of atom: an element as it occurs in nature (massNumber 0) or one nuclide of it.
struct AtomKind {
  std::string symbol;
  int massNumber = 0;

  auto operator<=>(const AtomKind&) const = default;
};

/// What a formula says: how many atoms of each kind, and the charge.
struct Composition {
  std::map<AtomKind, double> atoms;  ///< counts above zero; a hemihydrate's are not whole
  int charge = 0;

  bool operator==(const Composition&) const = default;
};

/// Reads a formula: nested brackets `( ) [ ] { }`, hydrates and other adducts joined by `·`, `*` or
/// `.` with a factor in front (`CaSO4·0.5H2O`), isotopes `D`, `T`, `[13C]` (also `[13CH3]`),
/// subscript and superscript digits, and a trailing charge `+`, `-`, `2+`, `^2-`.
/// Without `^` one digit before the sign is the charge behind a lone element or a square bracket
/// (`Ca2+`, `[Fe(CN)6]4-`) and counts atoms elsewhere (`NH4+`, `PF6-`); of two digits the second is
/// the charge (`SO42-`) unless it is not 2 to 4, or carbon or hydrogen stands before (`C8H12+`).
/// Faults point at the character: an unknown element, an open or stray bracket, a count of zero or
/// above 10^6, nesting deeper than 64, a text longer than 1000 bytes.
[[nodiscard]] std::expected<Composition, text::TextFault> parseFormula(std::string_view formula);

/// The composition in Hill's order: carbon, hydrogen (with D and T), then by symbol; by symbol
/// alone without carbon. Nuclides other than D and T stand in brackets behind their element.
/// Source: Hill, J. Am. Chem. Soc. 22 (1900) 478.
[[nodiscard]] std::string toHillFormula(const Composition& composition);

/// A molar mass with its standard uncertainty.
struct MolarMassEstimate {
  units::MolarMass value;
  units::MolarMass standardUncertainty;
};

/// Molar mass [g/mol]: the atoms' standard atomic weights or nuclide masses, summed.
/// Atoms of one kind share their weight's error, kinds are independent. The electrons that a charge
/// adds or takes (0.00055 g/mol each) are left out: what is weighed is neutral.
/// Fault: an element without a standard atomic weight, a nuclide that the table does not hold.
[[nodiscard]] std::expected<MolarMassEstimate, text::TextFault> molarMass(
    const Composition& composition);

}  // namespace vialkeeper::chem
