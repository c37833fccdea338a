// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <optional>
#include <string>
#include <string_view>

#include "chem/structure.h"

/// A look at the characters of a SMILES: what RDKit would take although it is no single
/// structure, and where the mistake is in one that it refuses without a reason. No RDKit here.
/// All positions count characters from 1 in the text that was given.
namespace vialkeeper::chem {

inline constexpr std::size_t kLongestSmiles = 10'000;

/// The text without the blanks around it.
[[nodiscard]] std::string_view withoutOuterBlanks(std::string_view text);

/// The reason to refuse a text before it is parsed: empty, too long, a character that no SMILES
/// has, something behind the notation, a reaction, an atom or bond that stands for "any".
[[nodiscard]] std::optional<StructureFault> refuseNotation(std::string_view smiles);

/// The most likely mistake in a SMILES that the parser has refused.
[[nodiscard]] StructureFault explainSyntax(std::string_view smiles);

/// Where an atom is written.
struct AtomPlace {
  std::size_t position = 0;  ///< 0 where there is no such atom
  std::string text;          ///< as written: `C`, `Cl`, `[nH]`
};

/// The place of the atom with this index (from 0) in the order of writing.
[[nodiscard]] AtomPlace placeOfAtom(std::string_view smiles, std::size_t index);

}  // namespace vialkeeper::chem
