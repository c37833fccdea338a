// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

#include "chem/structure.h"

/// A look at the characters of a SMILES before it is parsed: RDKit would take some texts that
/// are no single structure. No RDKit here. All positions count characters from 1.
namespace vialkeeper::chem {

inline constexpr std::size_t kLongestSmiles = 10'000;
/// More written atoms than this are refused: RDKit's canonical order takes minutes for a chain of
/// ten thousand, and InChI ends at 1023.
inline constexpr std::size_t kMostAtoms = 1'000;

/// The text without the blanks around it.
[[nodiscard]] std::string_view withoutOuterBlanks(std::string_view text);

/// The reason to refuse a text before it is parsed: empty, too long, too many atoms, a character
/// that no SMILES has, something behind the notation, a reaction, a part that stands for "any",
/// a count that no atom can have.
[[nodiscard]] std::optional<StructureFault> refuseNotation(std::string_view smiles);

/// The length of the atom, bare or in brackets, that `rest` (not empty) starts with; 0 if it starts
/// with none or with a bracket that is never closed.
/// Source: OpenSMILES, "organic subset" and "aromatic organic" for those that stand bare.
[[nodiscard]] std::size_t atomLength(std::string_view rest);

/// Calls visit(index, text) for each atom in the order of writing until it returns false.
template <class Visit>
void forEachAtom(std::string_view smiles, Visit visit) {
  for (std::size_t i = 0; i < smiles.size();) {
    const std::size_t length = atomLength(smiles.substr(i));
    if (length > 0 && !visit(i, smiles.substr(i, length))) return;
    i += length > 0 ? length : 1;
  }
}

/// The atom with this index (from 0) in the order of writing, as `[nH] at position 5`.
[[nodiscard]] std::string describedAtom(std::string_view smiles, std::size_t index);

}  // namespace vialkeeper::chem
