// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/smiles_scan.h"

#include <fmt/format.h>

#include <algorithm>
#include <charconv>

namespace vialkeeper::chem {
namespace {

constexpr std::string_view kBlanks = " \t\r\n\v\f";
constexpr const char* kMendPolymer =
    "give a polymer by its repeating unit, or by its formula or molar mass";

/// A fault of what stands behind the first blank, which is where the notation ends.
StructureFault behindNotation(std::string_view smiles, std::size_t blank) {
  const std::size_t next = smiles.find_first_not_of(kBlanks, blank);
  if (smiles[next] == '|') {
    return {fmt::format("there is an extension of SMILES (|...|) at position {}", next + 1),
            "leave out everything from the blank on"};
  }
  return {fmt::format("there is more text behind the SMILES at position {}", next + 1),
          "give the SMILES alone, without a name and without blanks"};
}

/// `->` and `<-` are RDKit's bonds from a donor to a metal; any other `>` makes a reaction.
bool isDativeArrow(std::string_view smiles, std::size_t index) {
  return index > 0 && smiles[index - 1] == '-' && !smiles.substr(index + 1).starts_with('>');
}

/// What is wrong with the one character, which is no blank.
std::optional<StructureFault> refuseCharacter(std::string_view smiles, std::size_t index,
                                              bool inBracket) {
  const char c = smiles[index];
  const std::size_t position = index + 1;
  if (c < '!' || c > '~') {
    return StructureFault{
        fmt::format("a character outside printable ASCII stands at position {}", position),
        "type the SMILES with plain letters, digits and - = # ( ) [ ]"};
  }
  if (c == '>' && !isDativeArrow(smiles, index)) {
    return StructureFault{fmt::format("there is a reaction arrow at position {}", position),
                          "give each substance of the reaction its own SMILES"};
  }
  if (c == '|' || c == '{' || c == '}') {
    return StructureFault{fmt::format("there is an extension of SMILES at position {}", position),
                          "give the plain SMILES alone"};
  }
  if (c == '*') {
    return StructureFault{
        fmt::format("\"*\" at position {} stands for any atom, so the substance has no molar mass",
                    position),
        "write the atom or group that is really there"};
  }
  if (std::string_view("~!&,;?").find(c) != std::string_view::npos || (inBracket && c == '#')) {
    return StructureFault{
        fmt::format("\"{}\" at position {} belongs to a search pattern", c, position),
        "give the SMILES of one substance, with every atom and bond as what it is"};
  }
  return std::nullopt;
}

/// The number of characters of `wanted` that follow each other from `start` on.
std::size_t runLength(std::string_view text, std::size_t start, std::string_view wanted) {
  const std::size_t end = std::min(text.find_first_not_of(wanted, start), text.size());
  return end - std::min(start, end);
}

/// Counts in square brackets that RDKit would cut down to a byte or two and take for smaller ones.
/// Source of the limits: OpenSMILES, "bracket atoms"; the heaviest nuclides have three digits.
std::optional<StructureFault> refuseCounts(std::string_view atom, std::size_t position) {
  constexpr std::string_view kDigits = "0123456789";
  constexpr int kLargestCharge = 15;
  const auto refused = [&](const char* count, const char* mend) {
    return StructureFault{
        fmt::format("the {} of {} at position {} is impossible", count, atom, position), mend};
  };
  if (runLength(atom, 1, kDigits) > 3) {
    return refused("mass number", "correct it, or leave it out for the natural mixture");
  }
  // `@OH12` is the arrangement of an octahedral centre, not twelve hydrogens.
  const std::size_t arrangement = atom.find("@OH");
  const std::size_t counts = arrangement == std::string_view::npos ? 1 : arrangement + 3;
  const std::size_t hydrogen = atom.find('H', counts);
  if (hydrogen != std::string_view::npos && runLength(atom, hydrogen + 1, kDigits) > 1) {
    return refused("number of hydrogens", "correct it; one atom bears at most 9");
  }
  const std::size_t sign = atom.find_first_of("+-");
  if (sign == std::string_view::npos) return std::nullopt;
  const std::size_t signs = runLength(atom, sign, "+-");
  const std::size_t digits = runLength(atom, sign + signs, kDigits);
  int charge = 0;
  std::from_chars(atom.data() + sign + signs, atom.data() + sign + signs + digits, charge);
  if (signs <= static_cast<std::size_t>(kLargestCharge) && digits <= 2 &&
      charge <= kLargestCharge) {
    return std::nullopt;
  }
  return refused("charge", "correct it; one atom bears at most 15");
}

std::optional<StructureFault> refuseAtoms(std::string_view smiles) {
  std::size_t atoms = 0;
  std::optional<StructureFault> refused;
  forEachAtom(smiles, [&](std::size_t index, std::string_view atom) {
    if (atom.front() == '[') refused = refuseCounts(atom, index + 1);
    return ++atoms <= kMostAtoms && !refused;
  });
  if (refused || atoms <= kMostAtoms) return refused;
  return StructureFault{fmt::format("the SMILES has more than {} atoms", kMostAtoms), kMendPolymer};
}

}  // namespace

std::string_view withoutOuterBlanks(std::string_view text) {
  const std::size_t first = text.find_first_not_of(kBlanks);
  if (first == std::string_view::npos) return {};
  return text.substr(first, text.find_last_not_of(kBlanks) - first + 1);
}

std::optional<StructureFault> refuseNotation(std::string_view smiles) {
  if (smiles.empty()) {
    return StructureFault{"the SMILES is empty", "give a SMILES, or leave the field out"};
  }
  if (smiles.size() > kLongestSmiles) {
    return StructureFault{fmt::format("the SMILES has {} characters; at most {} are read",
                                      smiles.size(), kLongestSmiles),
                          kMendPolymer};
  }
  bool inBracket = false;
  for (std::size_t i = 0; i < smiles.size(); ++i) {
    const char c = smiles[i];
    if (c == '[' || c == ']') inBracket = c == '[';
    if (kBlanks.find(c) != std::string_view::npos) return behindNotation(smiles, i);
    if (auto refused = refuseCharacter(smiles, i, inBracket)) return refused;
  }
  return refuseAtoms(smiles);
}

std::size_t atomLength(std::string_view rest) {
  if (rest.front() == '[') {
    const std::size_t end = rest.find(']');
    return end == std::string_view::npos ? 0 : end + 1;
  }
  if (rest.starts_with("Cl") || rest.starts_with("Br")) return 2;
  return std::string_view("BCNOPSFIbcnops").find(rest.front()) != std::string_view::npos ? 1 : 0;
}

std::string describedAtom(std::string_view smiles, std::size_t index) {
  std::string described = "that is not written";
  forEachAtom(smiles, [&](std::size_t start, std::string_view text) {
    if (index-- > 0) return true;
    described = fmt::format("{} at position {}", text, start + 1);
    return false;
  });
  return described;
}

}  // namespace vialkeeper::chem
