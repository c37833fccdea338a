// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/smiles_scan.h"

#include <algorithm>
#include <array>
#include <map>
#include <vector>

namespace vialkeeper::chem {
namespace {

constexpr std::string_view kBlanks = " \t\r\n\v\f";
constexpr std::string_view kMendSyntax =
    "compare it with the drawing it came from, or export the SMILES again";

bool isDigit(char c) { return c >= '0' && c <= '9'; }
bool isLetter(char c) { return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z'); }

std::string at(std::size_t index) { return " at position " + std::to_string(index + 1); }

StructureFault fault(std::string what, std::string_view mend) {
  return {std::move(what), std::string(mend)};
}

/// The length of the atom that starts here outside of square brackets; 0 if none does.
/// Source: OpenSMILES, "organic subset" and "aromatic organic".
std::size_t bareAtomLength(std::string_view rest) {
  if (rest.starts_with("Cl") || rest.starts_with("Br")) return 2;
  return std::string_view("BCNOPSFIbcnops").find(rest.front()) != std::string_view::npos ? 1 : 0;
}

/// The length of the atom that starts here, bare or in brackets; 0 if none does or if its bracket
/// is never closed.
std::size_t atomLength(std::string_view rest) {
  if (rest.front() != '[') return bareAtomLength(rest);
  const std::size_t end = rest.find(']');
  return end == std::string_view::npos ? 0 : end + 1;
}

/// A fault of what stands behind the first blank, which is where the notation ends.
StructureFault behindNotation(std::string_view smiles, std::size_t blank) {
  const std::size_t next = smiles.find_first_not_of(kBlanks, blank);
  if (smiles[next] == '|') {
    return fault("there is an extension of SMILES (|...|)" + at(next),
                 "leave out everything from the blank on");
  }
  return fault("there is more text behind the SMILES" + at(next),
               "give the SMILES alone, without a name and without blanks");
}

/// `->` and `<-` are RDKit's bonds from a donor to a metal; any other `>` makes a reaction.
bool isDativeArrow(std::string_view smiles, std::size_t index) {
  return smiles[index] == '>' && index > 0 && smiles[index - 1] == '-' &&
         !smiles.substr(index + 1).starts_with('>');
}

/// Brackets and parentheses that do not pair, outside in.
std::optional<StructureFault> unpairedBracket(std::string_view smiles) {
  std::vector<std::size_t> branches;
  for (std::size_t i = 0; i < smiles.size(); ++i) {
    const char c = smiles[i];
    if (c == '[') {
      const std::size_t end = smiles.find_first_of("[]", i + 1);
      if (end == std::string_view::npos || smiles[end] == '[') {
        return fault("the square bracket" + at(i) + " is never closed",
                     "write ] behind its atom");
      }
      if (end == i + 1) return fault("the square brackets" + at(i) + " are empty", kMendSyntax);
      i = end;
    } else if (c == ']') {
      return fault("the square bracket" + at(i) + " closes nothing", "write [ before its atom");
    } else if (c == '(') {
      if (i == 0) return fault("the SMILES starts with a branch", "start with an atom");
      branches.push_back(i);
    } else if (c == ')') {
      if (branches.empty()) {
        return fault("the parenthesis" + at(i) + " closes no branch",
                     "remove it or write ( where its branch starts");
      }
      if (branches.back() + 1 == i) {
        return fault("the branch" + at(branches.back()) + " is empty", "remove the parentheses");
      }
      branches.pop_back();
    }
  }
  if (branches.empty()) return std::nullopt;
  return fault("the parenthesis" + at(branches.back()) + " is never closed",
               "write ) where its branch ends");
}

/// A character outside of brackets that is neither atom, bond, ring number nor branch.
std::optional<StructureFault> strangeCharacter(std::string_view smiles) {
  constexpr std::string_view kMarks = "-=#$:/\\.()%0123456789<>";
  for (std::size_t i = 0; i < smiles.size();) {
    const std::string_view rest = smiles.substr(i);
    if (const std::size_t length = atomLength(rest); length > 0) {
      i += length;
    } else if (kMarks.find(rest.front()) != std::string_view::npos) {
      ++i;
    } else {
      const std::string shown(1, rest.front());
      if (isLetter(rest.front())) {
        return fault("\"" + shown + "\"" + at(i) + " is no atom that stands without brackets",
                     "write elements other than B C N O P S F Cl Br I in square brackets, such as "
                     "[Na+] or [Ir], and names and formulas in their own fields");
      }
      return fault("\"" + shown + "\"" + at(i) + " has no meaning in a SMILES", kMendSyntax);
    }
  }
  return std::nullopt;
}

/// Skips a ring number (`1`, `%12`, `%(123)`), and returns it as text; empty if none is here.
std::string takeRingNumber(std::string_view smiles, std::size_t& i) {
  if (isDigit(smiles[i])) return std::string(1, smiles[i++]);
  if (smiles[i] != '%') return {};
  const std::size_t start = ++i;
  if (i < smiles.size() && smiles[i] == '(') {
    const std::size_t end = std::min(smiles.find(')', i), smiles.size() - 1);
    i = end + 1;
    return std::string(smiles.substr(start + 1, end - start - 1));
  }
  while (i < smiles.size() && i < start + 2 && isDigit(smiles[i])) ++i;
  std::string number(smiles.substr(start, i - start));
  if (number.size() == 2 && number.front() == '0') number.erase(0, 1);
  return number;
}

/// The first ring number that has no second end.
std::optional<StructureFault> openRing(std::string_view smiles) {
  std::map<std::string, std::size_t> open;
  for (std::size_t i = 0; i < smiles.size();) {
    if (const std::size_t length = atomLength(smiles.substr(i)); length > 0) {
      i += length;
      continue;
    }
    const std::size_t start = i;
    const std::string number = takeRingNumber(smiles, i);
    if (i == start) {
      ++i;
    } else if (!open.erase(number)) {
      open.emplace(number, start);
    }
  }
  if (open.empty()) return std::nullopt;
  const auto first = std::min_element(open.begin(), open.end(), [](const auto& a, const auto& b) {
    return a.second < b.second;
  });
  return fault("ring " + first->first + at(first->second) + " is opened and never closed",
               "write the same number behind the atom at the other end of the ring bond");
}

/// A bond sign that has no atom on one of its sides.
std::optional<StructureFault> looseBond(std::string_view smiles) {
  constexpr std::string_view kBonds = "-=#$:/\\.";
  for (std::size_t i = 0; i < smiles.size();) {
    if (const std::size_t length = atomLength(smiles.substr(i)); length > 0) {
      i += length;
      continue;
    }
    const bool isBond = kBonds.find(smiles[i]) != std::string_view::npos;
    const bool atEnd = i + 1 == smiles.size() || smiles[i + 1] == ')';
    if (isBond && (i == 0 || atEnd)) {
      return fault("the bond \"" + std::string(1, smiles[i]) + "\"" + at(i) +
                       " has an atom on one side only",
                   "remove it or add the missing atom");
    }
    ++i;
  }
  return std::nullopt;
}

}  // namespace

std::string_view withoutOuterBlanks(std::string_view text) {
  const std::size_t first = text.find_first_not_of(kBlanks);
  if (first == std::string_view::npos) return {};
  return text.substr(first, text.find_last_not_of(kBlanks) - first + 1);
}

std::optional<StructureFault> refuseNotation(std::string_view smiles) {
  if (smiles.empty()) {
    return fault("the SMILES is empty", "give a SMILES, or leave the field out");
  }
  if (smiles.size() > kLongestSmiles) {
    return fault("the SMILES has " + std::to_string(smiles.size()) + " characters; at most " +
                     std::to_string(kLongestSmiles) + " are read",
                 "give a polymer by its repeating unit, or by its formula or molar mass");
  }
  bool inBracket = false;
  for (std::size_t i = 0; i < smiles.size(); ++i) {
    const char c = smiles[i];
    if (c == '[' || c == ']') inBracket = c == '[';
    if (kBlanks.find(c) != std::string_view::npos) return behindNotation(smiles, i);
    if (c < '!' || c > '~') {
      return fault("a character outside printable ASCII stands" + at(i),
                   "type the SMILES with plain letters, digits and - = # ( ) [ ]");
    }
    if (c == '>' && !isDativeArrow(smiles, i)) {
      return fault("there is a reaction arrow" + at(i),
                   "give each substance of the reaction its own SMILES");
    }
    if (c == '|' || c == '{' || c == '}') {
      return fault("there is an extension of SMILES" + at(i), "give the plain SMILES alone");
    }
    if (c == '*') {
      return fault("\"*\"" + at(i) + " stands for any atom, so the substance has no molar mass",
                   "write the atom or group that is really there");
    }
    if (c == '~' || (!inBracket && (c == '!' || c == '&' || c == ',' || c == ';' || c == '?'))) {
      return fault("\"" + std::string(1, c) + "\"" + at(i) + " belongs to a search pattern",
                   "give the SMILES of one substance, with every bond written as what it is");
    }
  }
  return std::nullopt;
}

StructureFault explainSyntax(std::string_view smiles) {
  constexpr std::array kReasons = {unpairedBracket, strangeCharacter, openRing, looseBond};
  for (const auto& reason : kReasons) {
    if (auto found = reason(smiles)) return *found;
  }
  return fault("the text is not a SMILES", kMendSyntax);
}

AtomPlace placeOfAtom(std::string_view smiles, std::size_t index) {
  for (std::size_t i = 0; i < smiles.size();) {
    const std::size_t length = atomLength(smiles.substr(i));
    if (length > 0 && index-- == 0) return {i + 1, std::string(smiles.substr(i, length))};
    i += std::max<std::size_t>(length, 1);
  }
  return {};
}

}  // namespace vialkeeper::chem
