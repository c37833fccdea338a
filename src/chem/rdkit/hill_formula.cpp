// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/hill_formula.h"

#include <compare>
#include <cstdlib>
#include <map>

namespace vialkeeper::chem {
namespace {

/// One symbol of the formula; the members' order is the order of the formula.
struct Term {
  int rank = 0;  ///< 0 C, 1 H, 2 D, 3 T, 4 all others; 4 for all without carbon
  std::string symbol;
  unsigned int isotope = 0;  ///< 0 for the natural mixture, and for D and T
  auto operator<=>(const Term&) const = default;
};

int hillRank(const std::string& symbol) {
  if (symbol == "C") return 0;
  if (symbol == "H") return 1;
  if (symbol == "D") return 2;
  return symbol == "T" ? 3 : 4;
}

Term termOf(const RDKit::Atom& atom, bool hasCarbon) {
  Term term{4, atom.getSymbol(), atom.getIsotope()};
  if (term.symbol == "H" && (term.isotope == 2 || term.isotope == 3)) {
    term.symbol = term.isotope == 2 ? "D" : "T";
    term.isotope = 0;
  }
  if (hasCarbon) term.rank = hillRank(term.symbol);
  return term;
}

std::string chargeSuffix(int charge) {
  if (charge == 0) return {};
  const char sign = charge > 0 ? '+' : '-';
  const int size = std::abs(charge);
  return size == 1 ? std::string(1, sign) : "^" + std::to_string(size) + sign;
}

}  // namespace

std::string hillFormula(const RDKit::ROMol& mol) {
  bool hasCarbon = false;
  for (const RDKit::Atom* atom : mol.atoms()) hasCarbon |= atom->getAtomicNum() == 6;
  std::map<Term, unsigned int> counts;
  int charge = 0;
  for (const RDKit::Atom* atom : mol.atoms()) {
    ++counts[termOf(*atom, hasCarbon)];
    // Hydrogens that are atoms of their own are met in this loop; these are the others.
    if (const unsigned int hydrogens = atom->getTotalNumHs(); hydrogens > 0) {
      counts[Term{hasCarbon ? 1 : 4, "H", 0}] += hydrogens;
    }
    charge += atom->getFormalCharge();
  }
  std::string formula;
  for (const auto& [term, count] : counts) {
    formula += term.isotope == 0
                   ? term.symbol
                   : "[" + std::to_string(term.isotope) + term.symbol + "]";
    if (count > 1) formula += std::to_string(count);
  }
  return formula + chargeSuffix(charge);
}

}  // namespace vialkeeper::chem
