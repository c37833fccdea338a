// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/smiles_syntax.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <map>
#include <optional>
#include <string>
#include <vector>

#include "chem/rdkit/smiles_scan.h"

namespace vialkeeper::chem {
namespace {

using Found = std::optional<StructureFault>;

constexpr const char* kMendSyntax =
    "compare it with the drawing it came from, or export the SMILES again";

bool isDigit(char c) { return c >= '0' && c <= '9'; }
bool isLetter(char c) { return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z'); }

bool isBond(std::string_view smiles, std::size_t index) {
  return index < smiles.size() &&
         std::string_view("-=#$:/\\.").find(smiles[index]) != std::string_view::npos;
}

/// `what` holds {} where the position of the character with this index belongs.
StructureFault faultAt(std::size_t index, const char* what, const char* mend) {
  return {fmt::format(fmt::runtime(what), index + 1), mend};
}

Found openSquareBracket(std::string_view smiles) {
  for (std::size_t i = 0; i < smiles.size(); ++i) {
    if (smiles[i] == ']') {
      return faultAt(i, "the square bracket at position {} closes nothing",
                     "write [ before its atom");
    }
    if (smiles[i] != '[') continue;
    const std::size_t end = smiles.find_first_of("[]", i + 1);
    if (end == std::string_view::npos || smiles[end] == '[') {
      return faultAt(i, "the square bracket at position {} is never closed",
                     "write ] behind its atom");
    }
    if (end == i + 1) {
      return faultAt(i, "the square brackets at position {} are empty", kMendSyntax);
    }
    i = end;
  }
  return std::nullopt;
}

Found openBranch(std::string_view smiles) {
  if (smiles.starts_with('(')) {
    return StructureFault{"the SMILES starts with a branch", "start with an atom"};
  }
  std::vector<std::size_t> open;
  for (std::size_t i = 0; i < smiles.size();
       i += std::max<std::size_t>(atomLength(smiles.substr(i)), 1)) {
    if (smiles[i] == '(') open.push_back(i);
    if (smiles[i] != ')') continue;
    if (open.empty()) {
      return faultAt(i, "the parenthesis at position {} closes no branch",
                     "remove it or write ( where its branch starts");
    }
    if (open.back() + 1 == i) {
      return faultAt(open.back(), "the branch at position {} is empty", "remove the parentheses");
    }
    open.pop_back();
  }
  if (open.empty()) return std::nullopt;
  return faultAt(open.back(), "the parenthesis at position {} is never closed",
                 "write ) where its branch ends");
}

/// A character outside of brackets that is neither atom, bond, ring number nor branch.
Found strangeCharacter(std::string_view smiles) {
  constexpr std::string_view kMarks = "-=#$:/\\.()%0123456789<>";
  for (std::size_t i = 0; i < smiles.size();) {
    const char c = smiles[i];
    if (const std::size_t length = atomLength(smiles.substr(i)); length > 0) {
      i += length;
    } else if (kMarks.find(c) != std::string_view::npos) {
      ++i;
    } else if (isLetter(c)) {
      return StructureFault{
          fmt::format("\"{}\" at position {} is no atom that stands without brackets", c, i + 1),
          "write elements other than B C N O P S F Cl Br I in square brackets, such as [Na+] or "
          "[Ir], and names and formulas in their own fields"};
    } else {
      return StructureFault{
          fmt::format("\"{}\" at position {} has no meaning in a SMILES", c, i + 1), kMendSyntax};
    }
  }
  return std::nullopt;
}

/// The length of the element symbol that starts here, aromatic ones included; 0 if none does.
std::size_t symbolLength(std::string_view rest) {
  constexpr std::string_view kSymbols =
      " H He Li Be B C N O F Ne Na Mg Al Si P S Cl Ar K Ca Sc Ti V Cr Mn Fe Co Ni Cu Zn Ga Ge As "
      "Se Br Kr Rb Sr Y Zr Nb Mo Tc Ru Rh Pd Ag Cd In Sn Sb Te I Xe Cs Ba La Ce Pr Nd Pm Sm Eu "
      "Gd Tb Dy Ho Er Tm Yb Lu Hf Ta W Re Os Ir Pt Au Hg Tl Pb Bi Po At Rn Fr Ra Ac Th Pa U Np "
      "Pu Am Cm Bk Cf Es Fm Md No Lr Rf Db Sg Bh Hs Mt Ds Rg Cn Nh Fl Mc Lv Ts Og "
      "b c n o p s si as se te ";
  for (const std::size_t length : {std::size_t{2}, std::size_t{1}}) {
    if (rest.size() < length || !isLetter(rest[length - 1])) continue;
    const std::string wanted = fmt::format(" {} ", rest.substr(0, length));
    if (kSymbols.find(wanted) != std::string_view::npos) return length;
  }
  return 0;
}

/// Square brackets in which no element is named, or in which something else is out of order.
Found strangeBracket(std::string_view smiles) {
  Found found;
  forEachAtom(smiles, [&](std::size_t start, std::string_view atom) {
    if (atom.front() != '[') return true;
    const std::size_t symbol = std::min(atom.find_first_not_of("0123456789", 1), atom.size() - 1);
    const std::size_t length = symbolLength(atom.substr(symbol));
    const std::size_t rest = atom.find_first_not_of("@ABHLOPSTY0123456789+-:]", symbol + length);
    if (length == 0) {
      found =
          StructureFault{fmt::format("no element is named in {} at position {}", atom, start + 1),
                         "write an element's symbol; deuterium is [2H], tritium [3H]"};
    } else if (rest != std::string_view::npos) {
      found = StructureFault{fmt::format("\"{}\" at position {} has no meaning in the brackets",
                                         atom[rest], start + rest + 1),
                             "inside brackets write mass number, element, hydrogens and charge, in "
                             "this order, and every other atom outside"};
    }
    return !found;
  });
  return found;
}

/// Skips a ring number (`1`, `%12`, `%(123)`) and returns it; empty if none is here.
std::string_view takeRingNumber(std::string_view smiles, std::size_t& i) {
  if (isDigit(smiles[i])) return smiles.substr(i++, 1);
  if (smiles[i] != '%') return {};
  const std::size_t start = ++i;
  if (i < smiles.size() && smiles[i] == '(') {
    const std::size_t end = std::min(smiles.find(')', i), smiles.size() - 1);
    i = end + 1;
    return smiles.substr(start + 1, end - start - 1);
  }
  while (i < smiles.size() && i < start + 2 && isDigit(smiles[i])) ++i;
  const std::string_view number = smiles.substr(start, i - start);
  return number.size() == 2 && number.front() == '0' ? number.substr(1) : number;
}

/// The first ring number that has no second end, or both ends at one atom.
Found openRing(std::string_view smiles) {
  struct End {
    std::size_t index;
    std::size_t atom;
  };
  std::map<std::string_view, End> open;
  std::size_t atoms = 0;
  for (std::size_t i = 0; i < smiles.size();) {
    if (const std::size_t length = atomLength(smiles.substr(i)); length > 0) {
      i += length;
      ++atoms;
      continue;
    }
    const std::size_t start = i;
    const std::string_view number = takeRingNumber(smiles, i);
    const auto other = open.find(number);
    if (i == start) {
      ++i;
    } else if (number.empty()) {
      return faultAt(start, "the % at position {} has no ring number",
                     "write two digits behind it, such as %12");
    } else if (other == open.end()) {
      open.emplace(number, End{start, atoms});
    } else if (other->second.atom == atoms) {
      return faultAt(other->second.index, "the ring at position {} is closed at its own atom",
                     "write the second number behind another atom");
    } else {
      open.erase(other);
    }
  }
  if (open.empty()) return std::nullopt;
  const auto first = std::min_element(open.begin(), open.end(), [](const auto& a, const auto& b) {
    return a.second.index < b.second.index;
  });
  return StructureFault{fmt::format("ring {} at position {} is opened and never closed",
                                    first->first, first->second.index + 1),
                        "write the same number behind the atom at the other end of the ring bond"};
}

/// A bond sign that has no atom on one of its sides, or a second bond sign.
Found looseBond(std::string_view smiles) {
  for (std::size_t i = 0; i < smiles.size();
       i += std::max<std::size_t>(atomLength(smiles.substr(i)), 1)) {
    if (!isBond(smiles, i)) continue;
    if (i == 0 || i + 1 == smiles.size() || smiles[i + 1] == ')') {
      return StructureFault{
          fmt::format("the bond \"{}\" at position {} has an atom on one side only", smiles[i],
                      i + 1),
          "remove it or add the missing atom"};
    }
    if (isBond(smiles, i + 1)) {
      return faultAt(i, "two bond signs follow each other at position {}", "remove one of them");
    }
  }
  return std::nullopt;
}

}  // namespace

StructureFault explainSyntax(std::string_view smiles) {
  constexpr std::array kReasons = {openSquareBracket, openBranch, strangeCharacter,
                                   strangeBracket,    openRing,   looseBond};
  for (const auto& reason : kReasons) {
    if (auto found = reason(smiles)) return *found;
  }
  return {"the text is not a SMILES", kMendSyntax};
}

}  // namespace vialkeeper::chem
