// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/solvents.h"

#include <algorithm>
#include <cmath>
#include <limits>

#include "chem/reference_table.h"
#include "text/utf8.h"

namespace vialkeeper::chem {
namespace {

std::optional<units::Density> density(const ReferenceTable::Row& row, std::string_view column) {
  const auto value = row.number(column);
  return value ? std::optional(units::Density::fromGramsPerMillilitre(*value)) : std::nullopt;
}

std::vector<std::string> splitSynonyms(std::string_view list) {
  std::vector<std::string> names;
  while (!list.empty()) {
    const std::size_t end = std::min(list.find(';'), list.size());
    names.emplace_back(text::trimmed(list.substr(0, end)));
    list.remove_prefix(std::min(end + 1, list.size()));
  }
  return names;
}

std::vector<Solvent> readSolvents() {
  std::vector<Solvent> table;
  for (const auto& row : ReferenceTable::builtIn("solvents.csv").rows()) {
    table.push_back({.name = row.text("name"),
                     .synonyms = splitSynonyms(row.text("synonyms")),
                     .cas = row.text("cas"),
                     .formula = row.text("formula"),
                     .smiles = row.text("smiles"),
                     .densityAt20C = density(row, "density_20C_g_mL"),
                     .densityAt25C = density(row, "density_25C_g_mL"),
                     .viscosityAt25C_mPa_s = row.number("viscosity_25C_mPa_s"),
                     .recalled = row.text("recalled") == "1",
                     .source = row.source()});
  }
  return table;
}

struct AntoineSet {
  std::string cas;
  std::string name;
  double a, b, c;
  double from_K, to_K;
  double preference;
  bool recalled;
  std::string source;

  double pressure_bar(double temperature_K) const {
    return std::pow(10.0, a - b / (temperature_K + c));
  }
  /// How far outside its range the temperature lies [K]; 0 inside.
  double distance_K(double temperature_K) const {
    return std::max({from_K - temperature_K, temperature_K - to_K, 0.0});
  }
};

std::vector<AntoineSet> readAntoineSets() {
  std::vector<AntoineSet> sets;
  for (const auto& row : ReferenceTable::builtIn("antoine.csv").rows()) {
    sets.push_back({row.text("cas"), row.text("set"), row.required("a"), row.required("b"),
                    row.required("c"), row.required("t_min_K"), row.required("t_max_K"),
                    row.required("preference"), row.text("recalled") == "1", row.source()});
  }
  return sets;
}

}  // namespace

std::span<const Solvent> solvents() {
  static const std::vector<Solvent> table = readSolvents();
  return table;
}

const Solvent* findSolvent(std::string_view nameOrCas) {
  const std::string wanted = text::asciiLowered(text::trimmed(nameOrCas));
  const auto matches = [&](const Solvent& solvent) {
    const auto same = [&](const std::string& name) { return text::asciiLowered(name) == wanted; };
    return same(solvent.name) || solvent.cas == wanted ||
           std::ranges::any_of(solvent.synonyms, same);
  };
  const auto found = std::ranges::find_if(solvents(), matches);
  return found == solvents().end() ? nullptr : &*found;
}

std::optional<DensityAt> densityAt(const Solvent& solvent, units::Temperature temperature) {
  const double t_C = temperature.celsius();
  if (solvent.densityAt20C && solvent.densityAt25C) {
    const double at20 = solvent.densityAt20C->si();
    const double at25 = solvent.densityAt25C->si();
    const double value = at20 + (at25 - at20) * (t_C - 20.0) / 5.0;
    return DensityAt{units::Density::fromSi(value), t_C >= 15.0 && t_C <= 30.0};
  }
  if (solvent.densityAt20C) return DensityAt{*solvent.densityAt20C, std::abs(t_C - 20.0) <= 3.0};
  if (solvent.densityAt25C) return DensityAt{*solvent.densityAt25C, std::abs(t_C - 25.0) <= 3.0};
  return std::nullopt;
}

std::optional<VapourPressure> vapourPressure(const Solvent& solvent,
                                             units::Temperature temperature) {
  static const std::vector<AntoineSet> sets = readAntoineSets();
  const double T = temperature.kelvin();
  const AntoineSet* best = nullptr;
  for (const AntoineSet& set : sets) {
    if (set.cas != solvent.cas) continue;
    const auto rank = [T](const AntoineSet& s) { return std::pair(s.distance_K(T), s.preference); };
    if (best == nullptr || rank(set) < rank(*best)) best = &set;
  }
  if (best == nullptr) return std::nullopt;
  return VapourPressure{units::Pressure::fromBar(best->pressure_bar(T)), best->name, best->source,
                        best->distance_K(T) == 0.0, best->recalled};
}

}  // namespace vialkeeper::chem
