// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/atomic_weights.h"

#include <algorithm>
#include <array>
#include <map>
#include <string>
#include <utility>

#include "chem/reference_table.h"
#include "stats/uncertain.h"

namespace vialkeeper::chem {
namespace {

using Weights = std::map<std::string, AtomicWeight, std::less<>>;
using Nuclides = std::map<std::pair<std::string, int>, AtomicWeight>;

Weights readWeights() {
  Weights weights;
  for (const auto& row : ReferenceTable::builtIn("atomic-weights.csv").rows()) {
    weights[row.text("symbol")] = {row.required("atomic_weight"),
                                   stats::rectangular(row.required("half_width"))};
  }
  return weights;
}

Nuclides readNuclides() {
  Nuclides nuclides;
  for (const auto& row : ReferenceTable::builtIn("isotopes.csv").rows()) {
    nuclides[{row.text("symbol"), static_cast<int>(row.required("mass_number"))}] = {
        row.required("relative_mass"), row.required("u_relative_mass")};
  }
  return nuclides;
}

/// Elements without a standard atomic weight: known symbols, so that the message can say why.
constexpr auto kUnweighted = std::to_array<std::string_view>(
    {"Tc", "Pm", "Po", "At", "Rn", "Fr", "Ra", "Ac", "Np", "Pu", "Am", "Cm",
     "Bk", "Cf", "Es", "Fm", "Md", "No", "Lr", "Rf", "Db", "Sg", "Bh", "Hs",
     "Mt", "Ds", "Rg", "Cn", "Nh", "Fl", "Mc", "Lv", "Ts", "Og"});

}  // namespace

std::optional<AtomicWeight> standardAtomicWeight(std::string_view symbol) {
  static const Weights weights = readWeights();
  const auto found = weights.find(symbol);
  return found == weights.end() ? std::nullopt : std::optional(found->second);
}

std::optional<AtomicWeight> nuclideMass(std::string_view symbol, int massNumber) {
  static const Nuclides nuclides = readNuclides();
  const auto found = nuclides.find({std::string(symbol), massNumber});
  return found == nuclides.end() ? std::nullopt : std::optional(found->second);
}

bool isElement(std::string_view symbol) {
  return standardAtomicWeight(symbol).has_value() ||
         std::ranges::find(kUnweighted, symbol) != kUnweighted.end();
}

}  // namespace vialkeeper::chem
