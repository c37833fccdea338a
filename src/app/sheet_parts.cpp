// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/sheet_parts.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <cmath>
#include <filesystem>

#include "chem/hazard_statements.h"
#include "units/shown.h"

namespace vialkeeper::app {
namespace {

using charge::ComponentCharge;
using charge::ComponentPlan;
using units::shown;

/// Number and unit of a shown quantity, `26.6 mg`.
TargetText split(const std::string& text) {
  const std::size_t blank = text.find(' ');
  return {.number = text.substr(0, blank),
          .unit = text.substr(blank + 1),
          .alternative = {},
          .tolerance = {}};
}

/// Decimal places of the balance's last digit in mg.
int decimalsOf(const charge::Balance& balance) {
  return std::max(
      0, static_cast<int>(std::ceil(-std::log10(balance.readability.milligrams()) - 1e-9)));
}

/// Four digits, but no finer than 0.1 µL: nobody reads more off a pipette.
std::string volumeText(units::Volume volume) {
  const double uL = volume.microlitres();
  const int whole = uL >= 1.0 ? static_cast<int>(std::floor(std::log10(uL))) + 1 : 1;
  return shown(volume, std::clamp(whole + 1, 2, 4));
}

TargetText volumeTarget(units::Volume volume, double tolerancePercent) {
  TargetText target = split(volumeText(volume));
  const double inUnit = target.unit == "mL" ? volume.millilitres() : volume.microlitres();
  target.tolerance = fmt::format(
      "± {} {}", units::toSignificant(inUnit * tolerancePercent / 100.0, 2), target.unit);
  return target;
}

bool isMeasuredByVolume(const ComponentPlan& plan, const ComponentCharge& charge) {
  if (!charge.targetMass) return true;
  if (!charge.targetVolume) return false;
  if (plan.device) return plan.device->pipette() != nullptr;
  return plan.isSolvent() || plan.amount.basis == charge::Basis::kVolume;
}

}  // namespace

TargetText massTarget(units::Mass mass, double tolerancePercent, const charge::Balance* balance) {
  TargetText target = split(shown(mass, 4));
  if (balance != nullptr) {
    target = {.number = fmt::format("{:.{}f}", mass.milligrams(), decimalsOf(*balance)),
              .unit = "mg",
              .alternative = {},
              .tolerance = {}};
  }
  const double inUnit = target.unit == "mg"  ? mass.milligrams()
                        : target.unit == "g" ? mass.grams()
                                             : mass.milligrams() * 1e3;
  const double tolerance = inUnit * tolerancePercent / 100.0;
  // Rounded down to the last digit that the balance shows: a limit must not grow by rounding.
  const int places = balance != nullptr ? decimalsOf(*balance) : 0;
  const double scale = std::pow(10.0, places);
  target.tolerance =
      balance != nullptr
          ? fmt::format("± {:.{}f} {}", std::floor(tolerance * scale * (1.0 + 1e-9)) / scale,
                        places, target.unit)
          : fmt::format("± {} {}", units::toSignificant(tolerance, 2), target.unit);
  return target;
}

TargetText targetText(const ComponentPlan& plan, const ComponentCharge& charge) {
  const charge::Balance* balance = plan.device ? plan.device->balance() : nullptr;
  if (isMeasuredByVolume(plan, charge)) {
    TargetText target = volumeTarget(*charge.targetVolume, charge.tolerancePercent);
    if (charge.targetMass && !plan.isSolvent())
      target.alternative = "= " + shown(*charge.targetMass);
    return target;
  }
  TargetText target = massTarget(*charge.targetMass, charge.tolerancePercent, balance);
  if (charge.targetVolume) target.alternative = "= " + volumeText(*charge.targetVolume);
  return target;
}

std::string molarMassText(const charge::Substance& substance) {
  return substance.molarMass
             ? fmt::format("{:.2f} g/mol", substance.molarMass->value.gramsPerMole())
             : "";
}

std::string speciesText(const std::string& species) {
  std::string text;
  for (const char c : species) {
    switch (c) {
      case '2':
        text += "₂";
        break;
      case '4':
        text += "₄";
        break;
      default:
        text += c;
        break;
    }
  }
  return text;
}

std::string atmosphereText(const charge::SealPlan& seal) {
  if (seal.atmosphere.size() == 1) return speciesText(seal.atmosphere.front().first);
  if (!seal.atmosphereAsWritten.empty()) return seal.atmosphereAsWritten;
  std::vector<std::string> parts;
  for (const auto& [species, fraction] : seal.atmosphere) {
    parts.push_back(fmt::format("{:.4g} % {}", 100.0 * fraction, speciesText(species)));
  }
  return fmt::format("{}", fmt::join(parts, ", "));
}

std::string lightText(const charge::IrradiationPlan& irradiation) {
  std::vector<std::string> parts;
  if (irradiation.wavelength)
    parts.push_back(fmt::format("{:.4g} nm", irradiation.wavelength->nanometres()));
  if (irradiation.temperature) parts.push_back(shown(*irradiation.temperature));
  if (irradiation.duration) {
    parts.push_back(irradiation.duration->seconds() == 0.0 ? "no light"
                                                           : shown(*irradiation.duration));
  }
  return fmt::format("{}", fmt::join(parts, ", "));
}

std::string sheetCode(const PlannedRun& run) {
  return run.plan.code.empty() ? "plan " + planMark(run.planText) : run.plan.code;
}

std::string footerOf(const PlannedRun& run) {
  return fmt::format("Vialkeeper {} · {}", VIALKEEPER_VERSION,
                     std::filesystem::path(run.plan.file).filename().string());
}

HazardContent hazardOf(const ComponentPlan& component) {
  HazardContent hazard{.name = component.name, .statements = {}};
  for (const std::string& code : component.hazards) {
    const auto wording = chem::hazardStatement(code);
    hazard.statements.push_back(wording ? code + " " + *wording : code);
  }
  return hazard;
}

std::vector<HazardContent> hazardsOf(const PlannedRun& run) {
  std::vector<HazardContent> hazards;
  for (const std::size_t i : additionOrder(run)) {
    if (!run.plan.components[i].hazards.empty())
      hazards.push_back(hazardOf(run.plan.components[i]));
  }
  return hazards;
}

std::vector<std::string> cautionsOf(const charge::Plan& plan) {
  std::vector<std::string> cautions;
  const auto evolves = [&plan](std::string_view species) {
    return std::ranges::find(plan.gases, species, &charge::EvolvedGas::species) != plan.gases.end();
  };
  if (!plan.gases.empty()) {
    cautions.emplace_back(
        "A sealed vial that gives off gas builds up pressure: use a vial rated for it, a new "
        "septum and a "
        "shield.");
    if (plan.vial && !plan.vial->ratedGauge) {
      cautions.emplace_back(
          "No pressure rating is known for this vial: find it out before you close it.");
    }
  }
  if (evolves("H2")) {
    cautions.emplace_back(
        "Hydrogen burns in air from 4 to 77 vol% (IEC 60079-20-1): open the vial in a hood, away "
        "from "
        "ignition sources.");
  }
  if (evolves("CO"))
    cautions.emplace_back("Carbon monoxide is poisonous and has no smell: hood and CO alarm.");
  const bool oxygen = plan.seal && std::ranges::any_of(plan.seal->atmosphere, [](const auto& part) {
                        return part.first == "O2" && part.second > 0.0;
                      });
  if (evolves("H2") && oxygen) {
    cautions.emplace_back(
        "The headspace holds oxygen: with the hydrogen it can become flammable inside the vial.");
  }
  if (plan.irradiation.wavelength) {
    const bool ultraviolet = plan.irradiation.wavelength->nanometres() < 400.0;
    cautions.emplace_back(
        ultraviolet
            ? "UV harms eyes and skin: enclose the lamp, wear UV goggles and cover the skin."
            : "Bright light harms the eyes: shield the lamp, wear goggles that block its colour.");
  }
  cautions.emplace_back("The vessel maker's limits, local codes and your safety officer decide.");
  return cautions;
}

}  // namespace vialkeeper::app
