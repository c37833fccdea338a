// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/trail.h"

#include <fmt/format.h>

#include "units/shown.h"

namespace vialkeeper::charge {
namespace {

using units::shown;

std::string basisStep(const Plan& plan, const Charge& charge, const ComponentPlan& component,
                      const std::string& amount) {
  const std::string limiting = fmt::format("{} ({}, limiting)", shown(charge.limitingAmount),
                                           charge.find(charge.limiting)->name);
  const std::string& written = component.amount.asWritten;
  switch (component.amount.basis) {
    case Basis::kEquiv:
      return fmt::format("{} = {} equiv × {}", amount, written, limiting);
    case Basis::kMolPercent:
      return fmt::format("{} = {} mol% × {}", amount, written, limiting);
    case Basis::kConcentration:
      return fmt::format("{} = {} × {} (liquid)", amount, written, shown(charge.totalLiquid));
    case Basis::kShare: {
      double parts = 0.0;
      for (const ComponentPlan& other : plan.components) {
        if (other.amount.basis == Basis::kShare) parts += other.amount.value;
      }
      return fmt::format(
          "{} of {} parts of the liquid ({}) less neat liquids and stocks in other solvents; what "
          "stocks "
          "bring of it is taken off",
          written, parts, shown(charge.totalLiquid));
    }
    default:
      return fmt::format("{} as planned ({})", amount.empty() ? written : amount, written);
  }
}

std::string assayFactor(double assay) {
  return assay == 1.0 ? "" : fmt::format(" ÷ {} (assay)", assay);
}

/// The target from the amount; empty where the target was given itself.
std::string targetStep(const ComponentPlan& component, const ComponentCharge& charge,
                       const std::string& amount) {
  const Basis basis = component.amount.basis;
  if (basis == Basis::kMass || basis == Basis::kVolume || basis == Basis::kShare || amount.empty())
    return {};
  const std::string M =
      charge.substance.molarMass
          ? fmt::format("{:.2f} g/mol", charge.substance.molarMass->value.gramsPerMole())
          : "";
  if (std::holds_alternative<SolidSupply>(component.supply)) {
    return fmt::format("{} = {} × {}{}", shown(*charge.targetMass), amount, M,
                       assayFactor(std::get<SolidSupply>(component.supply).assay));
  }
  if (const auto* liquid = std::get_if<LiquidSupply>(&component.supply)) {
    const std::string mass = shown(*charge.targetMass);
    return fmt::format("{} = {} × {}{}; {} = {} ÷ {:.4g} g/mL", mass, amount, M,
                       assayFactor(liquid->assay), shown(*charge.targetVolume), mass,
                       charge.density->gramsPerMillilitre());
  }
  if (const auto* stock = std::get_if<StockSupply>(&component.supply)) {
    if (stock->concentration) {
      return fmt::format("{} = {} ÷ {}", shown(*charge.targetVolume), amount,
                         shown(*stock->concentration));
    }
    return fmt::format("{} = {} × {} ÷ ({} × {:.4g} g/mL)", shown(*charge.targetVolume), amount, M,
                       *stock->massFraction, stock->density->gramsPerMillilitre());
  }
  const auto& gas = std::get<GasSupply>(component.supply);
  return fmt::format("{} = {} × R × {} ÷ {}", shown(*charge.targetVolume), amount,
                     shown(gas.temperature), shown(gas.pressure));
}

std::string deviceStep(const ComponentPlan& component, const ComponentCharge& charge) {
  if (!component.device || !charge.amount_mol) return {};
  const auto u = charge.amount_mol->standardUncertainty();
  if (!u) return {};
  const std::string amount = shown(units::Amount::fromMoles(*u), 2);
  if (const Balance* balance = component.device->balance()) {
    return fmt::format("u = {}: {}, repeatability {:g} mg, readability {:g} mg", amount,
                       component.device->name, balance->repeatability.milligrams(),
                       balance->readability.milligrams());
  }
  const Pipette* pipette = component.device->pipette();
  return fmt::format("u = {}: {}, ISO 8655 limits {} systematic, {} random", amount,
                     component.device->name, shown(pipette->systematicLimit),
                     shown(pipette->randomLimit));
}

std::string molarMassOf(const ComponentCharge& charge) {
  return charge.substance.molarMass
             ? fmt::format("{:.2f} g/mol", charge.substance.molarMass->value.gramsPerMole())
             : "M";
}

std::string densityOf(const ComponentCharge& charge) {
  return charge.density ? fmt::format(" × {:.4g} g/mL", charge.density->gramsPerMillilitre()) : "";
}

/// The amount from what was recorded; `amount` is what it came to.
std::string recordedStep(const ComponentPlan& component, const ComponentCharge& charge,
                         const std::string& amount) {
  const bool byVolume = charge.charged->volume.has_value();
  const std::string recorded =
      byVolume ? shown(*charge.charged->volume) : shown(*charge.charged->mass);
  if (amount.empty()) return fmt::format("{} as recorded; the molar mass is not known", recorded);
  const std::string density = byVolume ? densityOf(charge) : "";
  if (const auto* solid = std::get_if<SolidSupply>(&component.supply)) {
    const std::string assay = solid->assay == 1.0 ? "" : fmt::format(" × {} (assay)", solid->assay);
    return fmt::format("{} = {}{} ÷ {}", amount, recorded, assay, molarMassOf(charge));
  }
  if (const auto* liquid = std::get_if<LiquidSupply>(&component.supply)) {
    const std::string assay =
        liquid->assay == 1.0 ? "" : fmt::format(" × {} (assay)", liquid->assay);
    return fmt::format("{} = {}{}{} ÷ {}", amount, recorded, density, assay, molarMassOf(charge));
  }
  if (const auto* stock = std::get_if<StockSupply>(&component.supply)) {
    const std::string volume =
        byVolume ? recorded : fmt::format("{} ÷ density of the stock", recorded);
    if (stock->concentration)
      return fmt::format("{} = {} × {}", amount, volume, shown(*stock->concentration));
    return fmt::format("{} = {}{} × {} ÷ {}", amount, recorded, density, *stock->massFraction,
                       molarMassOf(charge));
  }
  const auto& gas = std::get<GasSupply>(component.supply);
  return fmt::format("{} = {} × {} ÷ (R × {})", amount, shown(gas.pressure), recorded,
                     shown(gas.temperature));
}

/// The ratio from the amount: against the limiting component as weighed, or as planned where it was
/// not.
std::string chargedRatioStep(const Plan& plan, const Charge& charge, const ComponentPlan& component,
                             const AsCharged& charged, const std::string& amount) {
  if (!charged.equiv || component.isSolvent() || component.key == plan.limiting) return {};
  const ComponentCharge& limiting = *charge.find(plan.limiting);
  const bool weighed = limiting.charged && limiting.charged->amount_mol;
  const units::Amount base = weighed
                                 ? units::Amount::fromMoles(limiting.charged->amount_mol->value())
                                 : charge.limitingAmount;
  return fmt::format("{} equiv = {} ÷ {} ({}, {})", units::toSignificant(charged.equiv->value(), 3),
                     amount, shown(base), limiting.name, weighed ? "as weighed" : "as planned");
}

std::string percentText(double fraction) { return fmt::format("{:.4g} %", 100.0 * fraction); }

}  // namespace

std::vector<std::string> trailOf(const Plan& plan, const Charge& charge, std::string_view key) {
  const ComponentPlan& component = *plan.find(key);
  const ComponentCharge& result = *charge.find(key);
  const std::string amount = result.amount_mol
                                 ? shown(units::Amount::fromMoles(result.amount_mol->value()))
                                 : std::string{};
  std::vector<std::string> steps{basisStep(plan, charge, component, amount)};
  const auto add = [&steps](std::string step) {
    if (!step.empty()) steps.push_back(std::move(step));
  };
  add(targetStep(component, result, amount));
  add(deviceStep(component, result));
  if (!result.substance.molarMassSource.empty())
    add("molar mass: " + result.substance.molarMassSource);
  if (!result.densitySource.empty()) add("density: " + result.densitySource);
  return steps;
}

std::vector<std::string> chargedTrailOf(const Plan& plan, const Charge& charge,
                                        std::string_view key) {
  const ComponentPlan& component = *plan.find(key);
  const ComponentCharge& result = *charge.find(key);
  if (!result.charged) return {};
  const AsCharged& charged = *result.charged;
  const std::string amount =
      charged.amount_mol ? shown(units::Amount::fromMoles(charged.amount_mol->value())) : "";
  std::vector<std::string> steps{recordedStep(component, result, amount)};
  const auto add = [&steps](std::string step) {
    if (!step.empty()) steps.push_back(std::move(step));
  };
  add(chargedRatioStep(plan, charge, component, charged, amount));
  const auto u = charged.amount_mol ? charged.amount_mol->standardUncertainty() : std::nullopt;
  if (u) add(fmt::format("u = {}", shown(units::Amount::fromMoles(*u), 2)));
  if (!result.substance.molarMassSource.empty())
    add("molar mass: " + result.substance.molarMassSource);
  if (!result.densitySource.empty()) add("density: " + result.densitySource);
  return steps;
}

std::string supplyText(const Plan& plan, const ComponentPlan& component) {
  if (const auto* solid = std::get_if<SolidSupply>(&component.supply)) {
    return solid->assay == 1.0 ? "solid" : "solid, " + percentText(solid->assay);
  }
  if (const auto* liquid = std::get_if<LiquidSupply>(&component.supply)) {
    return liquid->assay == 1.0 ? "liquid" : "liquid, " + percentText(liquid->assay);
  }
  if (const auto* stock = std::get_if<StockSupply>(&component.supply)) {
    const auto solvent = plan.solventOf(*stock);
    const std::string name = solvent ? plan.components[*solvent].name : stock->solvent;
    return fmt::format("stock {} in {}",
                       stock->concentration ? shown(*stock->concentration)
                                            : percentText(*stock->massFraction) + " w/w",
                       name);
  }
  const auto& gas = std::get<GasSupply>(component.supply);
  return fmt::format("gas, {} at {}", shown(gas.pressure), shown(gas.temperature));
}

std::string ratioText(const ComponentPlan& component, const ComponentCharge& charge) {
  if (component.amount.basis == Basis::kShare) {
    return fmt::format("{} {}", component.amount.asWritten,
                       component.amount.value == 1.0 ? "part" : "parts");
  }
  if (component.isSolvent() || !charge.equiv) return {};
  const bool catalytic = component.role == Role::kPhotocatalyst ||
                         component.role == Role::kCocatalyst ||
                         component.amount.basis == Basis::kMolPercent;
  if (catalytic && *charge.molPercent < 100.0) {
    return units::toSignificant(*charge.molPercent, 3) + " mol%";
  }
  return units::toSignificant(*charge.equiv, 3) + " equiv";
}

}  // namespace vialkeeper::charge
