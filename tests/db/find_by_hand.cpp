// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>
#include <array>

#include "app/notebook/fold_name.h"
#include "db/find_fixture.h"
#include "text/utf8.h"

/// A search evaluated by hand, run by run, straight from the definitions in find_query.h.
namespace vialkeeper::testing {
namespace {

bool isWithin(const std::optional<double>& value, const app::Interval& interval) {
  if (!value) return false;
  return (!interval.least || *value >= *interval.least) &&
         (!interval.most || *value <= *interval.most);
}

bool hasRole(const std::string& role, const std::string& wanted) {
  if (wanted == "catalyst") return role == "photocatalyst" || role == "cocatalyst";
  if (wanted == "additive") return role == "additive" || role == "acid" || role == "base";
  return wanted.empty() || role == wanted;
}

bool meets(const SampleRun& sample, const app::SubstanceCondition& condition) {
  return std::ranges::any_of(sample.components, [&](const app::ComponentRecord& component) {
    const bool isOne =
        condition.anySubstance ||
        std::ranges::find(condition.substances, component.substance) != condition.substances.end();
    const auto concentration =
        component.charged_mol_L ? component.charged_mol_L : component.planned_mol_L;
    return isOne && hasRole(component.role, condition.role) &&
           (!condition.loading_molPercent ||
            isWithin(component.loading_molPercent(), *condition.loading_molPercent)) &&
           (!condition.concentration_mol_L ||
            isWithin(concentration, *condition.concentration_mol_L));
  });
}

bool holdsPhrase(const std::vector<std::string>& text, const std::vector<std::string>& phrase,
                 bool isPrefix) {
  for (std::size_t from = 0; from + phrase.size() <= text.size(); ++from) {
    bool isHere = true;
    for (std::size_t i = 0; isHere && i < phrase.size(); ++i) {
      const bool mayBeLonger = isPrefix && i + 1 == phrase.size();
      isHere = mayBeLonger ? text[from + i].starts_with(phrase[i]) : text[from + i] == phrase[i];
    }
    if (isHere) return true;
  }
  return false;
}

bool meets(const SampleRun& sample, const app::WordsCondition& condition) {
  for (std::size_t i = 0; i < condition.words.size(); ++i) {
    const std::vector<std::string> phrase = tokensOf(condition.words[i]);
    if (phrase.empty()) continue;
    const bool isPrefix = (i < condition.prefix.size() && condition.prefix[i]) ||
                          (condition.lastIsPrefix && i + 1 == condition.words.size());
    const bool isThere = std::ranges::any_of(
        sample.tokens, [&](const auto& text) { return holdsPhrase(text, phrase, isPrefix); });
    if (!isThere) return false;
  }
  return true;
}

bool meets(const SampleRun& sample, const app::TextFieldCondition& condition) {
  using Field = app::TextFieldCondition::Field;
  constexpr std::array<const char*, 6> kStates = {"planned",   "charged", "irradiating",
                                                  "worked-up", "closed",  "sealed"};
  const std::string held = [&]() -> std::string {
    switch (condition.field) {
      case Field::kCode:
        return sample.run.code;
      case Field::kSeries:
        return sample.run.series;
      case Field::kPerson:
        return sample.run.person;
      case Field::kState:
        return kStates[static_cast<std::size_t>(sample.run.state)];
      case Field::kVial:
        return sample.run.vial;
      case Field::kLamp:
        return sample.run.lamp;
      case Field::kAtmosphere:
        return sample.run.atmosphere;
    }
    return {};
  }();
  const std::string lowered = text::asciiLowered(held);
  const std::string value = text::asciiLowered(condition.value);
  return condition.isPrefix ? lowered.starts_with(value) : lowered == value;
}

bool meets(const SampleRun& sample, const app::MeasureCondition& condition) {
  using Measure = app::MeasureCondition::Measure;
  const app::RunRecord& run = sample.run;
  switch (condition.measure) {
    case Measure::kYield:
      return isWithin(run.yield_percent, condition.interval);
    case Measure::kConversion:
      return isWithin(run.conversion_percent, condition.interval);
    case Measure::kWavelength:
      return isWithin(run.wavelength_nm, condition.interval);
    case Measure::kTemperature:
      return isWithin(run.temperature_C, condition.interval);
    case Measure::kDuration:
      return isWithin(run.duration_h, condition.interval);
    case Measure::kLiquid:
      return isWithin(run.liquid_mL, condition.interval);
    case Measure::kLimiting:
      return isWithin(run.limiting_mmol, condition.interval);
    case Measure::kDate:
      break;
  }
  const auto local = run.created.utc + run.created.offset;
  return isWithin(static_cast<double>(local.time_since_epoch().count()), condition.interval);
}

bool meets(const SampleRun& sample, const app::AllOf& all) {
  return std::ranges::all_of(
      all.conditions, [&](const app::FindCondition& each) { return testing::meets(sample, each); });
}

bool meets(const SampleRun& sample, const app::AnyOf& any) {
  return std::ranges::any_of(
      any.conditions, [&](const app::FindCondition& each) { return testing::meets(sample, each); });
}

bool meets(const SampleRun& sample, const app::NoneOf& none) {
  return !std::ranges::all_of(none.conditions, [&](const app::FindCondition& each) {
    return testing::meets(sample, each);
  });
}

}  // namespace

// The sample's letters beyond ASCII all have accents.
std::vector<std::string> tokensOf(std::string_view text) {
  std::vector<std::string> found;
  bool isOpen = false;
  for (std::size_t at = 0; at < text.size();) {
    const auto [value, length] = text::codePointAt(text, at);
    const char c = text[at];
    const bool isPart =
        value >= 0x80 || (c >= '0' && c <= '9') || (c >= 'A' && c <= 'Z') || (c >= 'a' && c <= 'z');
    if (isPart && !isOpen) found.emplace_back();
    if (isPart) found.back() += app::foldName(text.substr(at, length));
    isOpen = isPart;
    at += length;
  }
  return found;
}

bool meets(const SampleRun& sample, const app::FindCondition& condition) {
  return std::visit([&sample](const auto& data) { return meets(sample, data); }, condition.data);
}

}  // namespace vialkeeper::testing
