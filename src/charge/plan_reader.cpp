// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/plan_reader.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <cmath>
#include <limits>

#include "charge/component_reader.h"
#include "charge/plan_checks.h"
#include "text/text_fault.h"
#include "text/toml_tree.h"
#include "text/utf8.h"
#include "units/iso_time.h"

namespace vialkeeper::charge {
namespace {

using text::Faults;
using units::Bounds;
using units::Pressure;
using units::Range;
using units::TomlSection;
using units::Volume;

constexpr std::string_view kFormat = "vialkeeper-plan/1";
constexpr std::size_t kLargestFile = std::size_t{1} << 20U;
constexpr double kInfinity = std::numeric_limits<double>::infinity();
constexpr auto kSpecies = {"H2", "N2", "O2", "Ar", "CO2", "CO", "CH4"};

bool isSpecies(std::string_view species) {
  return std::ranges::find(kSpecies, species) != std::ranges::end(kSpecies);
}

std::string speciesAdvice() { return fmt::format("choose among {}", fmt::join(kSpecies, ", ")); }

void readFormat(TomlSection& root) {
  const auto format = root.text("format");
  if (!format) {
    root.missing("format", fmt::format("begin the file with format = \"{}\"", kFormat));
  } else if (*format != kFormat) {
    const bool newer = format->starts_with("vialkeeper-plan/");
    root.fault("format",
               newer
                   ? fmt::format("{} is another version of the plan format than this program knows",
                                 text::quoted(*format))
                   : fmt::format("{} is no plan format", text::quoted(*format)),
               newer ? fmt::format("use a newer program, or write the plan as {}", kFormat)
                     : fmt::format("write format = \"{}\"", kFormat));
  }
}

void readHead(TomlSection& root, Plan& plan) {
  readFormat(root);
  plan.title = root.text("title").value_or("");
  plan.series = root.text("series").value_or("");
  plan.code = root.text("code").value_or("");
  plan.chemist = root.text("chemist").value_or("");
  if (const auto date = root.text("date")) {
    if (const auto day = units::readIsoDate(*date); day) {
      plan.date = *date;
    } else {
      root.fault("date",
                 fmt::format("{}: {}", text::quoted(*date), whatWithPosition(day.error(), *date)),
                 day.error().mend);
    }
  }
  plan.additionOrder = root.texts("addition_order").value_or(std::vector<std::string>{});
  plan.additionOrderLine = root.place().lineOf("addition_order");
}

void readEvolvedGases(TomlSection& reaction, Plan& plan) {
  for (TomlSection& entry : reaction.sections("gases")) {
    const auto species = entry.text("species");
    const auto perLimiting =
        entry.number("per_limiting", {.least = 0.0, .most = kInfinity, .leastExcluded = true});
    if (!species) {
      entry.missing("species", "name the gas, for example species = \"H2\"");
    } else if (!isSpecies(*species)) {
      entry.fault("species", fmt::format("{} is no gas of the table", text::quoted(*species)),
                  speciesAdvice());
    } else if (std::ranges::find(plan.gases, *species, &EvolvedGas::species) != plan.gases.end()) {
      entry.fault("species", fmt::format("{} is listed twice", *species), "list every gas once");
    } else {
      plan.gases.push_back({*species, perLimiting.value_or(1.0)});
    }
    entry.finish();
  }
}

void readReaction(TomlSection& root, Plan& plan, std::vector<WrittenKey>& keys) {
  auto reaction = root.section("reaction");
  if (!reaction) {
    root.missing("reaction", "add [reaction] with limiting = \"KEY\"");
    return;
  }
  plan.limiting = reaction->text("limiting").value_or("");
  if (plan.limiting.empty())
    reaction->missing("limiting", "name the key of the limiting component");
  for (TomlSection& entry : reaction->sections("products")) {
    keys.push_back({entry.asWritten("key"), entry.place().path, entry.place().lineOf("key"), true});
    if (auto product = readProduct(entry)) plan.products.push_back(*std::move(product));
  }
  readEvolvedGases(*reaction, plan);
  reaction->finish();
  plan.reactionPlace = reaction->place();
}

void readVial(TomlSection& root, Plan& plan) {
  auto vial = root.section("vial");
  if (!vial) return;
  const auto name = vial->text("name");
  const auto volume = vial->quantity<Volume>("volume");
  const auto uncertainty = vial->quantity<Volume>("u_volume", Range::kNonNegative);
  const auto displaced = vial->quantity<Volume>("displaced", Range::kNonNegative);
  const auto rated = vial->quantity<Pressure>("rated_gauge");
  const auto derating =
      vial->number("derating", {.least = 0.0, .most = 1.0, .leastExcluded = true});
  if (!volume) vial->missing("volume", "give the brim-full volume of the closed vial");
  if (volume && displaced && *displaced >= *volume) {
    vial->fault("displaced", "stir bar and probe displace more than the vial holds",
                "check both volumes");
  }
  vial->finish();
  if (!volume) return;
  plan.vial = VialPlan{.name = name.value_or(""),
                       .volume = *volume,
                       .volumeUncertainty = uncertainty.value_or(0.01 * *volume),
                       .displaced = displaced.value_or(Volume::fromMillilitres(0.0)),
                       .ratedGauge = rated,
                       .derating = derating.value_or(0.5)};
}

using Mixture = std::vector<std::pair<std::string, double>>;

/// A table of gas species and numbers, `{ N2 = 0.9, O2 = 0.1 }`.
Mixture readSpeciesNumbers(TomlSection table, Bounds bounds) {
  Mixture mixture;
  for (const char* species : kSpecies) {
    if (const auto number = table.number(species, bounds)) mixture.emplace_back(species, *number);
  }
  table.finish();
  return mixture;
}

Mixture readAtmosphere(TomlSection& seal) {
  const text::TomlValue* value = seal.value("atmosphere");
  if (value == nullptr) {
    seal.missing("atmosphere",
                 "write \"N2\", \"Ar\", \"air\" or fractions such as { N2 = 0.9, O2 = 0.1 }");
    return {};
  }
  if (std::holds_alternative<text::TomlTable>(value->data)) {
    Mixture mixture = readSpeciesNumbers(*seal.section("atmosphere"), {.least = 0.0, .most = 1.0});
    double sum = 0.0;
    for (const auto& [species, fraction] : mixture) sum += fraction;
    const bool allRead = mixture.size() == std::get<text::TomlTable>(value->data).size();
    if (allRead && std::abs(sum - 1.0) > 1e-6) {
      seal.fault("atmosphere", fmt::format("the fractions sum to {:.6g}", sum),
                 "make them sum to 1");
    }
    return mixture;
  }
  const auto name = seal.text("atmosphere");
  if (!name) return {};
  if (*name == "N2" || *name == "Ar") return {{*name, 1.0}};
  // Dry air without its traces; US Standard Atmosphere 1976 to four digits.
  if (*name == "air") return {{"N2", 0.7808}, {"O2", 0.2095}, {"Ar", 0.0097}};
  seal.fault("atmosphere", fmt::format("{} is no atmosphere", text::quoted(*name)),
             "write \"N2\", \"Ar\", \"air\" or fractions such as { N2 = 0.9, O2 = 0.1 }");
  return {};
}

void readSeal(TomlSection& root, Plan& plan) {
  auto seal = root.section("seal");
  if (!seal) return;
  auto atmosphere = readAtmosphere(*seal);
  const auto temperature = seal->quantity<units::Temperature>("temperature");
  const auto pressure = seal->quantity<Pressure>("pressure");
  const auto saturated = seal->truth("saturated");
  const auto ambient = seal->quantity<Pressure>("ambient");
  if (!temperature) seal->missing("temperature", "give the temperature at sealing");
  if (!pressure) seal->missing("pressure", "give the absolute pressure at sealing");
  seal->finish();
  if (!temperature || !pressure) return;
  plan.seal = SealPlan{.atmosphere = std::move(atmosphere),
                       .atmosphereAsWritten = seal->asWritten("atmosphere"),
                       .temperature = *temperature,
                       .pressure = *pressure,
                       .saturated = saturated.value_or(true),
                       .ambient = ambient.value_or(Pressure::fromPascals(101325.0))};
}

void readIrradiation(TomlSection& root, Plan& plan) {
  auto irradiation = root.section("irradiation");
  if (!irradiation) return;
  plan.irradiation = {
      .lamp = irradiation->text("lamp").value_or(""),
      .wavelength = irradiation->quantity<units::Length>("wavelength"),
      .temperature = irradiation->quantity<units::Temperature>("temperature"),
      .duration = irradiation->quantity<units::Duration>("duration", Range::kNonNegative)};
  irradiation->finish();
}

void readLiquid(TomlSection& root, Plan& plan) {
  auto liquid = root.section("liquid");
  if (!liquid) {
    root.missing("liquid",
                 "add [liquid] with total = \"2.0 mL\" or limiting_concentration = \"0.1 mol/L\"");
    return;
  }
  plan.liquid.total = liquid->quantity<Volume>("total");
  plan.liquid.limitingConcentration =
      liquid->quantity<units::Concentration>("limiting_concentration");
  const bool both = liquid->has("total") && liquid->has("limiting_concentration");
  const bool neither = !liquid->has("total") && !liquid->has("limiting_concentration");
  if (both) {
    liquid->fault("limiting_concentration", "the volume of the liquid is fixed twice",
                  "keep total or limiting_concentration");
  } else if (neither) {
    liquid->fault("", "nothing fixes the volume of the liquid",
                  "give total or limiting_concentration");
  }
  for (TomlSection& point : liquid->sections("vapour_pressure")) {
    const auto temperature = point.quantity<units::Temperature>("temperature");
    const auto pressure = point.quantity<Pressure>("pressure", Range::kNonNegative);
    if (!temperature) point.missing("temperature", "give the temperature of the value");
    if (!pressure) point.missing("pressure", "give the vapour pressure");
    if (temperature && pressure) plan.liquid.vapourPressure.push_back({*temperature, *pressure});
    point.finish();
  }
  if (auto ostwald = liquid->section("ostwald")) {
    plan.liquid.ostwaldGiven = true;
    plan.liquid.ostwald =
        readSpeciesNumbers(*std::move(ostwald), {.least = 0.0, .most = kInfinity});
  }
  liquid->finish();
  plan.liquid.place = liquid->place();
}

void readInstruments(TomlSection& root, Plan& plan) {
  auto instruments = root.section("instruments");
  if (!instruments) return;
  InstrumentsPlan& given = plan.instruments;
  given.pressure =
      instruments->quantity<Pressure>("u_pressure", Range::kNonNegative).value_or(given.pressure);
  given.pressureShared = instruments->quantity<Pressure>("u_pressure_shared", Range::kNonNegative)
                             .value_or(given.pressureShared);
  given.temperature_K = instruments->kelvinDifference("u_temperature", Range::kNonNegative)
                            .value_or(given.temperature_K);
  instruments->finish();
}

void readComponents(TomlSection& root, Plan& plan, std::vector<WrittenKey>& keys) {
  if (!root.has("component"))
    root.missing("component", "add a [[component]] for everything that goes in");
  for (TomlSection& entry : root.sections("component")) {
    keys.push_back(
        {entry.asWritten("key"), entry.place().path, entry.place().lineOf("key"), false});
    if (auto component = readComponent(std::move(entry)))
      plan.components.push_back(*std::move(component));
  }
}

}  // namespace

text::Checked<Plan> readPlan(std::string_view bytes, const std::string& file) {
  if (bytes.size() > kLargestFile) {
    return std::unexpected(
        Faults{{.file = file,
                .what = "the file is larger than 1 MiB",
                .mend = "a plan is a short text; check that this is the right file"}});
  }
  text::TomlDocument document = text::readToml(bytes, file);
  Faults faults = std::move(document.faults);
  Plan plan;
  plan.file = file;
  if (document.complete) {
    std::vector<WrittenKey> keys;
    TomlSection root(document.root, file, {}, faults);
    readHead(root, plan);
    readReaction(root, plan, keys);
    readVial(root, plan);
    readSeal(root, plan);
    readIrradiation(root, plan);
    readLiquid(root, plan);
    readInstruments(root, plan);
    readComponents(root, plan, keys);
    root.finish();
    std::erase_if(keys, [](const WrittenKey& k) { return k.key.empty(); });
    checkPlan(plan, keys, faults);
  }
  if (faults.empty()) return plan;
  std::ranges::stable_sort(faults, {}, &text::Fault::line);
  return std::unexpected(std::move(faults));
}

}  // namespace vialkeeper::charge
