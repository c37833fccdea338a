// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string_view>

namespace vialkeeper::chem {

/// Relative atomic mass, numerically the molar mass [g/mol], with its standard uncertainty.
struct AtomicWeight {
  double value = 0.0;
  double standardUncertainty = 0.0;
};

/// Standard atomic weight of an element; nothing where it has none (Tc, Pm, Po and heavier but Th,
/// Pa, U). Where the standard weight is an interval the conventional value is used.
/// The published bounds are taken as a rectangular distribution, u = half width/√3.
/// Source: Prohaska et al., Pure Appl. Chem. 94 (2022) 573, doi 10.1515/pac-2019-0603; reading of
/// the bounds: Possolo et al., Pure Appl. Chem. 90 (2018) 395 (from memory).
[[nodiscard]] std::optional<AtomicWeight> standardAtomicWeight(std::string_view symbol);

/// Relative mass of a nuclide, `("C", 13)`; nothing where the table does not hold it.
/// Source: AME2020, Huang et al., Chin. Phys. C 45 (2021) 030002.
[[nodiscard]] std::optional<AtomicWeight> nuclideMass(std::string_view symbol, int massNumber);

/// Whether this is the symbol of a chemical element at all, with or without a standard weight.
[[nodiscard]] bool isElement(std::string_view symbol);

}  // namespace vialkeeper::chem
