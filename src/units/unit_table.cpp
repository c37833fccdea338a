// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "units/unit_table.h"

#include <algorithm>
#include <array>

namespace vialkeeper::units {
namespace {

using enum Kind;

// psi: 0.45359237 kg × 9.80665 m/s2 ÷ (0.0254 m)2; mmHg: the conventional 133.322387415 Pa.
// Both exact by definition (NIST SP 811, appendix B.8).
constexpr auto kUnits = std::to_array<Unit>({
    {"mg", kMass, 1, 1e6},
    {"g", kMass, 1, 1e3},
    {"kg", kMass, 1, 1},
    {"ug", kMass, 1, 1e9},
    {"mmol", kAmount, 1, 1e3},
    {"umol", kAmount, 1, 1e6},
    {"nmol", kAmount, 1, 1e9},
    {"mol", kAmount, 1, 1},
    {"mL", kVolume, 1, 1e6},
    {"uL", kVolume, 1, 1e9},
    {"L", kVolume, 1, 1e3},
    {"ml", kVolume, 1, 1e6, 0, true},
    {"ul", kVolume, 1, 1e9, 0, true},
    {"l", kVolume, 1, 1e3, 0, true},
    {"bar", kPressure, 1e5, 1},
    {"mbar", kPressure, 100, 1},
    {"Pa", kPressure, 1, 1},
    {"kPa", kPressure, 1000, 1},
    {"atm", kPressure, 101325, 1},
    {"psi", kPressure, 6894.757293168361, 1},
    {"mmHg", kPressure, 133.322387415, 1},
    {"degC", kTemperature, 1, 1, 273.15},
    {"C", kTemperature, 1, 1, 273.15, true},
    {"K", kTemperature, 1, 1},
    {"mol/L", kConcentration, 1000, 1},
    {"mmol/L", kConcentration, 1, 1},
    {"umol/L", kConcentration, 1, 1000},
    {"M", kConcentration, 1000, 1},
    {"mM", kConcentration, 1, 1},
    {"uM", kConcentration, 1, 1000},
    {"g/mL", kDensity, 1000, 1},
    {"g/L", kDensity, 1, 1},
    {"g/ml", kDensity, 1000, 1, 0, true},
    {"g/l", kDensity, 1, 1, 0, true},
    {"s", kDuration, 1, 1},
    {"min", kDuration, 60, 1},
    {"h", kDuration, 3600, 1},
    {"d", kDuration, 86400, 1},
    {"ms", kDuration, 1, 1e3},
    {"us", kDuration, 1, 1e6},
    {"ns", kDuration, 1, 1e9},
    {"nm", kLength, 1, 1e9},
    {"cm", kLength, 1, 100},
    {"g/mol", kMolarMass, 1, 1e3},
    {"L/mol/s", kSecondOrderRate, 1, 1e3},
    {"L/mol/cm", kMolarAbsorptivity, 1, 10},
    {"W", kPower, 1, 1},
    {"mW", kPower, 1, 1e3},
    {"W/m2", kIrradiance, 1, 1},
    {"mW/cm2", kIrradiance, 10, 1},
    {"equiv", kEquivalents, 1, 1, 0, true},
    {"eq", kEquivalents, 1, 1, 0, true},
    {"mol%", kMolPercent, 1, 1, 0, true},
    {"mol-%", kMolPercent, 1, 1, 0, true},
    {"mol %", kMolPercent, 1, 1, 0, true},
    {"parts", kParts, 1, 1, 0, true},
    {"part", kParts, 1, 1, 0, true},
    {"%", kPercent, 1, 1, 0, true},
});

/// `µ` (either code point) as u, `°C` as degC: what people and keyboards mix.
std::string folded(std::string_view symbol) {
  std::string plain;
  while (!symbol.empty()) {
    const auto eat = [&](std::string_view written, std::string_view meant) {
      if (!symbol.starts_with(written)) return false;
      plain += meant;
      symbol.remove_prefix(written.size());
      return true;
    };
    if (eat("µ", "u") || eat("μ", "u") || eat("°", "deg") || eat("℃", "degC")) continue;
    plain += symbol.front();
    symbol.remove_prefix(1);
  }
  return plain;
}

bool isAllowed(const Unit& unit, Dialect dialect) {
  return dialect == Dialect::kPerson || !unit.peopleOnly;
}

}  // namespace

const Unit* findUnit(std::string_view symbol, Dialect dialect) {
  const std::string plain = folded(symbol);
  const auto found = std::ranges::find_if(
      kUnits, [&](const Unit& unit) { return unit.symbol == plain && isAllowed(unit, dialect); });
  return found == kUnits.end() ? nullptr : &*found;
}

std::string unitsOf(Kind kind, Dialect dialect) {
  std::string list;
  for (const Unit& unit : kUnits) {
    // Of the spellings only people use, the first of a kind of its own is the one to recommend.
    const bool spelling = unit.peopleOnly && kind < kEquivalents;
    if (unit.kind != kind || !isAllowed(unit, dialect) || spelling) continue;
    if (!list.empty()) list += ", ";
    list += unit.symbol;
  }
  return list;
}

std::string_view nameOf(Kind kind) {
  switch (kind) {
    case kMass:
      return "a mass";
    case kAmount:
      return "an amount of substance";
    case kVolume:
      return "a volume";
    case kPressure:
      return "a pressure";
    case kTemperature:
      return "a temperature";
    case kConcentration:
      return "a concentration";
    case kDensity:
      return "a density";
    case kDuration:
      return "a time span";
    case kLength:
      return "a length";
    case kMolarMass:
      return "a molar mass";
    case kSecondOrderRate:
      return "a second-order rate constant";
    case kMolarAbsorptivity:
      return "a molar absorption coefficient";
    case kPower:
      return "a power";
    case kIrradiance:
      return "an irradiance";
    case kEquivalents:
      return "equivalents";
    case kMolPercent:
      return "mol%";
    case kParts:
      return "parts by volume";
    case kPercent:
      return "a percentage";
  }
  return "a quantity";
}

std::span<const Unit> allUnits() { return kUnits; }

}  // namespace vialkeeper::units
