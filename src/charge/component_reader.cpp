// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/component_reader.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <limits>

#include "chem/cas_number.h"
#include "text/text_fault.h"
#include "text/utf8.h"

namespace vialkeeper::charge {
namespace {

using units::Bounds;
using units::Range;
using units::TomlSection;

constexpr double kInfinity = std::numeric_limits<double>::infinity();
constexpr Bounds kAssay{.least = 0.0, .most = 1.0, .leastExcluded = true};
constexpr Bounds kPositive{.least = 0.0, .most = kInfinity, .leastExcluded = true};
constexpr Bounds kNonNegative{.least = 0.0, .most = kInfinity};

/// Keys are typed on the command line, in `--set component.acid.mol_percent=10` and as CSV cells.
std::optional<std::string> readKey(TomlSection& section) {
  const auto key = section.text("key");
  if (!key) {
    section.missing("key", "give the entry a short name of its own, such as key = \"acid\"");
    return std::nullopt;
  }
  const bool plain = std::ranges::all_of(*key, [](char c) {
    return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || (c >= '0' && c <= '9') || c == '_' ||
           c == '-' || (c & '\x80') != 0;
  });
  if (plain && key->size() <= 64) return key;
  section.fault("key", fmt::format("{} cannot be a key", text::quoted(*key)),
                "use up to 64 letters, digits, - and _");
  return std::nullopt;
}

/// One unit of the last digit written, [g/mol]: how exactly the author knew the molar mass.
units::MolarMass lastDigit(std::string_view written) {
  const std::size_t point = written.find('.');
  if (point == std::string_view::npos) return units::MolarMass::fromGramsPerMole(1.0);
  std::size_t places = 0;
  for (std::size_t i = point + 1; i < written.size() && written[i] >= '0' && written[i] <= '9'; ++i)
    ++places;
  return units::MolarMass::fromGramsPerMole(std::pow(10.0, -static_cast<double>(places)));
}

Identity readIdentity(TomlSection& section) {
  Identity identity;
  identity.smiles = section.text("smiles").value_or("");
  identity.formula = section.text("formula").value_or("");
  identity.molarMass = section.quantity<units::MolarMass>("molar_mass");
  if (identity.molarMass) identity.molarMassLastDigit = lastDigit(section.asWritten("molar_mass"));
  if (auto cas = section.text("cas")) {
    if (const auto checked = chem::checkCasNumber(*cas); !checked) {
      section.fault(
          "cas", fmt::format("{}: {}", text::quoted(*cas), whatWithPosition(checked.error(), *cas)),
          checked.error().mend);
    } else {
      identity.cas = *cas;
    }
  }
  return identity;
}

/// The basis fields that stand in the section; exactly one must.
std::optional<AmountPlan> readAmount(TomlSection& section) {
  std::vector<AmountPlan> found;
  std::vector<std::string> present;
  const auto note = [&](Basis basis, std::optional<double> value) {
    const std::string field(toText(basis));
    if (section.has(field)) present.push_back(field);
    if (value) found.push_back({basis, *value, section.asWritten(field)});
  };
  const auto si = [](const auto& quantity) {
    return quantity ? std::optional(quantity->si()) : std::nullopt;
  };
  note(Basis::kAmount, si(section.quantity<units::Amount>("amount")));
  note(Basis::kMass, si(section.quantity<units::Mass>("mass")));
  note(Basis::kVolume, si(section.quantity<units::Volume>("volume")));
  note(Basis::kEquiv, section.number("equiv", kPositive));
  note(Basis::kMolPercent, section.number("mol_percent", kPositive));
  note(Basis::kConcentration, si(section.quantity<units::Concentration>("concentration")));
  note(Basis::kShare, section.number("share", kPositive));
  if (present.size() > 1) {
    section.fault(present[1],
                  fmt::format("the amount is fixed twice, by {} and {}", present[0], present[1]),
                  "keep one of them");
    return std::nullopt;
  }
  if (present.empty()) {
    section.fault("", "nothing fixes the amount",
                  "give one of amount, mass, volume, equiv, mol_percent, concentration, or share "
                  "for a solvent");
  }
  return found.empty() ? std::nullopt : std::optional(found.front());
}

SolidSupply readSolid(TomlSection& section) {
  return {.assay = section.number("assay", kAssay).value_or(1.0),
          .assayUncertainty = section.number("u_assay", kNonNegative),
          .density = section.quantity<units::Density>("density")};
}

LiquidSupply readLiquid(TomlSection& section) {
  return {.assay = section.number("assay", kAssay).value_or(1.0),
          .assayUncertainty = section.number("u_assay", kNonNegative),
          .density = section.quantity<units::Density>("density"),
          .densityUncertainty = section.quantity<units::Density>("u_density", Range::kNonNegative),
          .densityTemperature = section.quantity<units::Temperature>("density_temperature")};
}

StockSupply readStock(TomlSection& section) {
  StockSupply stock{.concentration = section.quantity<units::Concentration>("concentration"),
                    .concentrationUncertainty = section.quantity<units::Concentration>(
                        "u_concentration", Range::kNonNegative),
                    .massFraction = section.number("mass_fraction", kAssay),
                    .density = section.quantity<units::Density>("density"),
                    .solvent = section.text("solvent").value_or("")};
  const bool concentration = section.has("concentration");
  const bool massFraction = section.has("mass_fraction");
  if (concentration && massFraction) {
    section.fault("mass_fraction", "the stock's strength is given twice",
                  "keep concentration or mass_fraction");
  } else if (!concentration && !massFraction) {
    section.fault("", "the stock's strength is not given",
                  "give concentration = \"2.0 mM\", or mass_fraction with density");
  }
  if (massFraction && !section.has("density")) {
    section.missing("density", "a stock by mass_fraction needs the density of the solution");
  }
  if (stock.solvent.empty())
    section.missing("solvent", "name the solvent component the stock is made in");
  return stock;
}

std::optional<GasSupply> readGas(TomlSection& section) {
  const auto pressure = section.quantity<units::Pressure>("pressure");
  const auto temperature = section.quantity<units::Temperature>("temperature");
  if (!pressure)
    section.missing("pressure", "give the gas's absolute pressure, such as \"1.0 bar\"");
  if (!temperature)
    section.missing("temperature", "give the gas's temperature, such as \"21 degC\"");
  if (!pressure || !temperature) return std::nullopt;
  return GasSupply{*pressure, *temperature};
}

std::optional<Supply> readGivenSupply(TomlSection section) {
  const auto kind = section.choice("kind", {"solid", "liquid", "stock", "gas"});
  std::optional<Supply> supply;
  if (!kind) {
    section.missing("kind", "choose among solid, liquid, stock, gas");
    return supply;  // which other fields are right depends on it
  }
  switch (*kind) {
    case 0:
      supply = readSolid(section);
      break;
    case 1:
      supply = readLiquid(section);
      break;
    case 2:
      supply = readStock(section);
      break;
    default:
      if (const auto gas = readGas(section)) supply = *gas;
      break;
  }
  section.finish();
  return supply;
}

std::optional<Balance> readBalance(TomlSection& section) {
  const auto readability = section.quantity<units::Mass>("readability");
  const auto repeatability = section.quantity<units::Mass>("repeatability");
  if (!readability) section.missing("readability", "give the last digit, such as \"0.01 mg\"");
  if (!repeatability)
    section.missing("repeatability",
                    "give the standard deviation of a reading, such as \"0.02 mg\"");
  if (!readability || !repeatability) return std::nullopt;
  return Balance{*readability, *repeatability};
}

std::optional<Pipette> readPipette(TomlSection& section) {
  const auto nominal = section.quantity<units::Volume>("nominal");
  const auto smallest = section.quantity<units::Volume>("smallest");
  const auto systematic = section.quantity<units::Volume>("systematic", Range::kNonNegative);
  const auto random = section.quantity<units::Volume>("random", Range::kNonNegative);
  if (!nominal) section.missing("nominal", "give the nominal volume, such as \"100 uL\"");
  if (!systematic)
    section.missing("systematic", "give the limit of the systematic error, such as \"0.8 uL\"");
  if (!random) section.missing("random", "give the limit of the random error, such as \"0.3 uL\"");
  if (!nominal || !systematic || !random) return std::nullopt;
  return Pipette{*nominal, smallest.value_or(0.1 * *nominal), *systematic, *random};
}

std::optional<Device> readInlineDevice(TomlSection section) {
  const auto kind = section.choice("kind", {"balance", "pipette"});
  const auto name = section.text("name");
  if (!kind) {
    section.missing("kind", "choose balance or pipette");
    return std::nullopt;
  }
  std::optional<Device> device;
  if (*kind == 0) {
    if (const auto balance = readBalance(section))
      device = Device{name.value_or("balance"), *balance};
  } else {
    if (const auto pipette = readPipette(section))
      device = Device{name.value_or("pipette"), *pipette};
  }
  section.finish();
  return device;
}

std::optional<Device> readDevice(TomlSection& section) {
  const text::TomlValue* value = section.value("device");
  if (value == nullptr) return std::nullopt;
  if (std::holds_alternative<text::TomlTable>(value->data)) {
    return readInlineDevice(*section.section("device"));
  }
  const auto name = section.text("device");
  if (!name) return std::nullopt;
  if (const Device* device = findDevice(*name)) return *device;
  std::string known;
  for (const Device& device : builtInDevices()) known += (known.empty() ? "" : ", ") + device.name;
  section.fault(
      "device", fmt::format("no device is called {}", text::quoted(*name)),
      fmt::format("choose among {}, or describe one as {{ kind = \"balance\", … }}", known));
  return std::nullopt;
}

std::vector<std::string> readHazards(TomlSection& section) {
  const auto codes = section.texts("hazards");
  if (!codes) return {};
  for (const std::string& code : *codes) {
    // H302, H360FD, EUH066, H300+H310
    const bool plausible = !code.empty() && (code.starts_with('H') || code.starts_with("EUH")) &&
                           std::ranges::any_of(code, [](char c) { return c >= '0' && c <= '9'; }) &&
                           std::ranges::all_of(code, [](char c) {
                             return (c >= '0' && c <= '9') || (c >= 'A' && c <= 'Z') ||
                                    (c >= 'a' && c <= 'z') || c == '+';
                           });
    if (!plausible) {
      section.fault("hazards", fmt::format("{} is no hazard statement code", text::quoted(code)),
                    "write codes such as H302 or EUH066");
    }
  }
  return *codes;
}

/// Left out, a supply is a solid of assay 1, and of a solvent or gas what its role says.
Supply defaultSupply(Role role) {
  if (role == Role::kSolvent) return LiquidSupply{};
  return SolidSupply{};
}

std::optional<Role> readRole(TomlSection& section) {
  const auto role =
      section.choice("role", {"substrate", "partner", "photocatalyst", "cocatalyst", "additive",
                              "acid", "base", "oxidant", "reductant", "quencher", "standard",
                              "product", "solvent", "gas", "other"});
  if (!role) section.missing("role", "say what it does, for example role = \"acid\"");
  return role ? std::optional(static_cast<Role>(*role)) : std::nullopt;
}

}  // namespace

std::optional<ComponentPlan> readComponent(TomlSection section) {
  const auto key = readKey(section);
  if (key) section.rename("component." + *key);
  const auto role = readRole(section);
  const auto name = section.text("name");
  if (!name) section.missing("name", "name the substance");
  Identity identity = readIdentity(section);
  const auto amount = readAmount(section);
  std::optional<Supply> supply;
  const bool supplyGiven = section.has("supply");
  if (auto given = section.section("supply")) {
    supply = readGivenSupply(*std::move(given));
  } else if (!supplyGiven && role) {
    supply = defaultSupply(*role);
    if (*role == Role::kGas)
      section.missing("supply", "a gas needs supply = { kind = \"gas\", pressure, temperature }");
  }
  const auto perLimiting = section.number("per_limiting", kNonNegative);
  auto device = readDevice(section);
  const auto tolerance =
      section.number("tolerance_percent", {.least = 0.0, .most = 100.0, .leastExcluded = true});
  auto hazards = readHazards(section);
  section.finish();
  if (!key || !role || !name || !amount || !supply) return std::nullopt;
  return ComponentPlan{.key = *key,
                       .role = *role,
                       .name = *name,
                       .identity = std::move(identity),
                       .amount = *amount,
                       .supply = *supply,
                       .supplyGiven = supplyGiven,
                       .perLimiting = perLimiting.value_or(*role == Role::kPartner ? 1.0 : 0.0),
                       .device = std::move(device),
                       .tolerancePercent = tolerance,
                       .hazards = std::move(hazards),
                       .place = section.place()};
}

std::optional<ProductPlan> readProduct(TomlSection section) {
  const auto key = readKey(section);
  const auto name = section.text("name");
  Identity identity = readIdentity(section);
  const auto perLimiting = section.number("per_limiting", kPositive);
  section.finish();
  if (!key) return std::nullopt;
  return ProductPlan{.key = *key,
                     .name = name.value_or(*key),
                     .identity = std::move(identity),
                     .perLimiting = perLimiting.value_or(1.0),
                     .place = section.place()};
}

}  // namespace vialkeeper::charge
