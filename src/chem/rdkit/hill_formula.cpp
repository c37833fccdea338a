// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/rdkit/hill_formula.h"

#include <fmt/format.h>

#include <compare>
#include <cstdlib>
#include <map>

namespace vialkeeper::chem {
namespace {

/// One term of the formula; the members' order is the order of the formula.
struct Term {
  int rank = 0;  ///< 0 carbon, 1 hydrogen, 2 all others; 2 for all without carbon
  std::string symbol;
  unsigned int isotope = 0;  ///< 0 for the natural mixture
  auto operator<=>(const Term&) const = default;
};

Term termOf(std::string symbol, unsigned int isotope, bool hasCarbon) {
  int rank = 2;
  if (hasCarbon && symbol == "C") rank = 0;
  if (hasCarbon && symbol == "H") rank = 1;
  return {rank, std::move(symbol), isotope};
}

std::string termText(const Term& term) {
  if (term.isotope == 0) return term.symbol;
  if (term.symbol == "H" && term.isotope == 2) return "D";
  if (term.symbol == "H" && term.isotope == 3) return "T";
  return fmt::format("[{}{}]", term.isotope, term.symbol);
}

/// Whether a sign behind these terms would take the last count for its own number: behind a lone
/// element (`N3-` is the nitride), a nuclide's bracket (`[18O]2-`) or two digits (`SO42-`), but
/// those of carbon and hydrogen, which are counts (`C8H12+`).
bool endsInDoubtfulCount(const std::map<Term, unsigned int>& counts, const Term& last) {
  const unsigned int count = counts.at(last);
  if (count > 9 && last.symbol != "C" && last.symbol != "H") return true;
  return count > 1 && (counts.size() == 1 || termText(last).ends_with(']'));
}

std::string chargeText(int charge, bool afterDoubtfulCount) {
  if (charge == 0) return {};
  const char sign = charge > 0 ? '+' : '-';
  const int size = std::abs(charge);
  if (size > 1) return fmt::format("^{}{}", size, sign);
  return fmt::format("{}{}", afterDoubtfulCount ? "^" : "", sign);
}

}  // namespace

std::string hillFormula(const RDKit::ROMol& mol) {
  bool hasCarbon = false;
  for (const RDKit::Atom* atom : mol.atoms()) hasCarbon |= atom->getAtomicNum() == 6;
  std::map<Term, unsigned int> counts;
  int charge = 0;
  for (const RDKit::Atom* atom : mol.atoms()) {
    ++counts[termOf(atom->getSymbol(), atom->getIsotope(), hasCarbon)];
    // Hydrogens that are atoms of their own are met in this loop; these are the others.
    if (const unsigned int hydrogens = atom->getTotalNumHs(); hydrogens > 0) {
      counts[termOf("H", 0, hasCarbon)] += hydrogens;
    }
    charge += atom->getFormalCharge();
  }
  if (counts.empty()) return {};
  std::string formula;
  for (const auto& [term, count] : counts) {
    formula += termText(term);
    if (count > 1) formula += fmt::to_string(count);
  }
  return formula + chargeText(charge, endsInDoubtfulCount(counts, counts.rbegin()->first));
}

}  // namespace vialkeeper::chem
