// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/material.h"

#include <fmt/format.h>

#include "chem/solvents.h"
#include "units/constants.h"
#include "units/shown.h"

namespace vialkeeper::charge {

using stats::Uncertain;

Material::Material(const Plan& plan, const ComponentPlan& component, const Substance& substance,
                   stats::Causes& causes, text::Notices& notices)
    : m_supply(component.supply) {
  if (substance.molarMass) {
    m_molarMass = Uncertain(substance.molarMass->value.si(),
                            substance.molarMass->standardUncertainty.si(), causes.add());
  }
  if (const auto* solid = std::get_if<SolidSupply>(&m_supply)) takeSolid(*solid, causes);
  if (const auto* liquid = std::get_if<LiquidSupply>(&m_supply)) {
    takeLiquid(plan, component, *liquid, causes, notices);
  }
  if (const auto* stock = std::get_if<StockSupply>(&m_supply)) takeStock(*stock, causes);
}

void Material::takeAssay(double assay, std::optional<double> u, stats::Causes& causes) {
  m_assay = u ? Uncertain(assay, *u, causes.add()) : Uncertain(assay);
  if (!u && assay != 1.0) m_takenAsExact.emplace_back("assay");
}

void Material::takeSolid(const SolidSupply& solid, stats::Causes& causes) {
  takeAssay(solid.assay, solid.assayUncertainty, causes);
  if (solid.density) {
    m_density = Uncertain(solid.density->si());
    m_densitySource = "as given in the plan";
  }
}

void Material::takeLiquid(const Plan& plan, const ComponentPlan& component,
                          const LiquidSupply& liquid, stats::Causes& causes,
                          text::Notices& notices) {
  takeAssay(liquid.assay, liquid.assayUncertainty, causes);
  if (!liquid.density) {
    takeTableDensity(plan, component, notices);
    return;
  }
  m_density = liquid.densityUncertainty
                  ? Uncertain(liquid.density->si(), liquid.densityUncertainty->si(), causes.add())
                  : Uncertain(liquid.density->si());
  if (!liquid.densityUncertainty) m_takenAsExact.emplace_back("density");
  m_densitySource = "as given in the plan";
  if (liquid.densityTemperature)
    m_densitySource += ", at " + units::shown(*liquid.densityTemperature);
}

void Material::takeTableDensity(const Plan& plan, const ComponentPlan& component,
                                text::Notices& notices) {
  const chem::Solvent* solvent = chem::findSolvent(component.name);
  if (solvent == nullptr) return;
  // Volumes are measured where the vial is closed.
  const auto temperature =
      plan.seal ? plan.seal->temperature : units::Temperature::fromCelsius(20.0);
  const auto density = chem::densityAt(*solvent, temperature);
  if (!density) return;
  m_density = Uncertain(density->value.si());
  m_densitySource =
      fmt::format("{} at {}: {}", solvent->name, units::shown(temperature), solvent->source);
  const std::string at = "component." + component.key;
  if (solvent->recalled) {
    notices.push_back(
        {"recalled-value",
         fmt::format("the density of {} in the solvent table is from memory: check it",
                     solvent->name),
         at});
  }
  if (!density->withinValidity) {
    notices.push_back(
        {"outside-validity",
         fmt::format("the density of {} is used at {}, outside the range of the solvent table",
                     solvent->name, units::shown(temperature)),
         at});
  }
}

void Material::takeStock(const StockSupply& stock, stats::Causes& causes) {
  if (stock.density) {
    m_density = Uncertain(stock.density->si());
    m_densitySource = "as given in the plan";
  }
  if (stock.massFraction) {
    takeAssay(*stock.massFraction, std::nullopt, causes);
    m_takenAsExact.emplace_back("density");
    return;
  }
  m_concentration =
      stock.concentrationUncertainty
          ? Uncertain(stock.concentration->si(), stock.concentrationUncertainty->si(), causes.add())
          : Uncertain(stock.concentration->si());
  if (!stock.concentrationUncertainty) m_takenAsExact.emplace_back("concentration");
}

std::optional<Uncertain> Material::amountInMass(const Uncertain& mass_kg) const {
  if (m_concentration) {
    return m_density ? std::optional(*m_concentration * mass_kg / *m_density) : std::nullopt;
  }
  if (!m_molarMass) return std::nullopt;
  return mass_kg * m_assay / *m_molarMass;
}

std::optional<Uncertain> Material::amountInVolume(const Uncertain& volume_m3) const {
  if (const auto* gas = std::get_if<GasSupply>(&m_supply)) {
    return volume_m3 *
           (gas->pressure.pascals() / (units::kMolarGas_J_mol_K * gas->temperature.kelvin()));
  }
  if (m_concentration) return *m_concentration * volume_m3;
  if (!m_density || !m_molarMass) return std::nullopt;
  return *m_density * volume_m3 * m_assay / *m_molarMass;
}

std::optional<double> Material::massFor(double amount_mol) const {
  if (isGas() || !m_molarMass) return std::nullopt;
  if (m_concentration) {
    return m_density ? std::optional(amount_mol / m_concentration->value() * m_density->value())
                     : std::nullopt;
  }
  return amount_mol * m_molarMass->value() / m_assay.value();
}

std::optional<double> Material::volumeFor(double amount_mol) const {
  if (const auto* gas = std::get_if<GasSupply>(&m_supply)) {
    return amount_mol * units::kMolarGas_J_mol_K * gas->temperature.kelvin() /
           gas->pressure.pascals();
  }
  if (isSolid()) return std::nullopt;
  if (m_concentration) return amount_mol / m_concentration->value();
  if (!m_molarMass || !m_density) return std::nullopt;
  return amount_mol * m_molarMass->value() / (m_assay.value() * m_density->value());
}

std::optional<double> Material::volumeOfMass(double mass_kg) const {
  return m_density ? std::optional(mass_kg / m_density->value()) : std::nullopt;
}

std::optional<double> Material::massOfVolume(double volume_m3) const {
  return m_density ? std::optional(volume_m3 * m_density->value()) : std::nullopt;
}

bool Material::isSolid() const { return std::holds_alternative<SolidSupply>(m_supply); }
bool Material::isNeatLiquid() const { return std::holds_alternative<LiquidSupply>(m_supply); }
bool Material::isStock() const { return std::holds_alternative<StockSupply>(m_supply); }
bool Material::isGas() const { return std::holds_alternative<GasSupply>(m_supply); }

}  // namespace vialkeeper::charge
