// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>

#include "app/notebook/find_language.h"
#include "app/notebook/find_range.h"
#include "charge/plan.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

using units::Kind;
using Field = TextFieldCondition::Field;
using Measure = MeasureCondition::Measure;

std::vector<FindField> makeFields() {
  std::vector<FindField> fields;
  for (int role = 0; role <= static_cast<int>(charge::Role::kOther); ++role) {
    fields.push_back({FindField::Kind::kRole, charge::toText(static_cast<charge::Role>(role)),
                      "a substance in this role"});
  }
  fields.push_back({FindField::Kind::kRole, "catalyst", "a photocatalyst or cocatalyst"});
  fields.push_back({FindField::Kind::kRole, "any", "a substance in any role"});
  fields.push_back({FindField::Kind::kStructure, "structure", "substances that hold a SMILES"});
  const auto text = [&fields](std::string_view name, std::string_view meaning, Field field) {
    fields.push_back(
        {.kind = FindField::Kind::kText, .name = name, .meaning = meaning, .text = field});
  };
  text("code", "the run's code", Field::kCode);
  text("series", "the run's series", Field::kSeries);
  text("person", "initials", Field::kPerson);
  text("state", "planned to sealed", Field::kState);
  text("vial", "the vial's name", Field::kVial);
  text("lamp", "the lamp's name", Field::kLamp);
  text("atmosphere", "the gas it was closed under", Field::kAtmosphere);
  const auto measure = [&fields](std::string_view name, std::string_view meaning, Measure which) {
    fields.push_back(
        {.kind = FindField::Kind::kMeasure, .name = name, .meaning = meaning, .measure = which});
  };
  measure("yield", "%", Measure::kYield);
  measure("conversion", "%", Measure::kConversion);
  measure("wavelength", "nm", Measure::kWavelength);
  measure("temperature", "C or K", Measure::kTemperature);
  measure("duration", "of irradiation, h or min", Measure::kDuration);
  measure("liquid", "volume, mL", Measure::kLiquid);
  measure("limiting", "amount of the limiting reagent, mmol", Measure::kLimiting);
  measure("date", "of the run, 2026-03 or 2026-03-01..2026-03-15", Measure::kDate);
  return fields;
}

/// Marks that are safe within a word: none of them begins or ends anything.
bool isPlain(char c) {
  const auto byte = static_cast<unsigned char>(c);
  return (byte >= '0' && byte <= '9') || (byte >= 'A' && byte <= 'Z') ||
         (byte >= 'a' && byte <= 'z') || c == '-' || c == ',' || c == '\'' || c == '_' ||
         c == '+' || c == '/';
}

}  // namespace

const std::vector<FindField>& findFields() {
  static const std::vector<FindField> fields = makeFields();
  return fields;
}

const FindField* findField(std::string_view name) {
  const auto& fields = findFields();
  const auto found = std::ranges::find(fields, text::asciiLowered(name), &FindField::name);
  return found == fields.end() ? nullptr : &*found;
}

RangeForm rangeOf(MeasureCondition::Measure measure) {
  switch (measure) {
    case Measure::kYield:
      return {{Kind::kPercent}, "%", "60..80 %"};
    case Measure::kConversion:
      return {{Kind::kPercent}, "%", "60..80 %"};
    case Measure::kWavelength:
      return {{Kind::kLength}, "nm", "430..460 nm"};
    case Measure::kTemperature:
      return {{Kind::kTemperature}, "", "25..35 C"};
    case Measure::kDuration:
      return {{Kind::kDuration}, "", "12..24 h"};
    case Measure::kLiquid:
      return {{Kind::kVolume}, "", "1..2 mL"};
    case Measure::kLimiting:
      return {{Kind::kAmount}, "", "0.1..0.2 mmol"};
    case Measure::kDate:
      break;
  }
  return {};
}

RangeForm loadingRange() {
  return {{Kind::kMolPercent, Kind::kEquivalents, Kind::kConcentration}, "", "5..20 mol%", true};
}

std::string asFindValue(std::string_view value) {
  if (!value.empty() && std::ranges::all_of(value, isPlain)) return std::string(value);
  std::string quoted = "\"";
  for (const char c : value) {
    if (c == '"') quoted += '"';
    quoted += c;
  }
  return quoted + '"';
}

}  // namespace vialkeeper::app
