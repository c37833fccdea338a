// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>

#include "charge/plan.h"
#include "charge/substances.h"
#include "stats/uncertain.h"
#include "text/fault.h"
#include "text/notice.h"
#include "units/quantity.h"

namespace vialkeeper::charge {

/// A component's material as it is supplied, with all that turns a mass or a volume of it into an
/// amount and back. Doubles and Uncertains are in coherent SI.
class Material {
 public:
  /// Gathers what the plan, the substance and the solvent table know.
  /// Notices: a density from memory or outside its validity.
  Material(const Plan& plan, const ComponentPlan& component, const Substance& substance,
           stats::Causes& causes, text::Notices& notices);

  /// Amount [mol] in a mass [kg] of the material as supplied, impurity included; nothing where the
  /// molar mass is not known, or for a stock its density.
  [[nodiscard]] std::optional<stats::Uncertain> amountInMass(const stats::Uncertain& mass_kg) const;
  /// Amount [mol] in a volume [m3]: of the liquid, the stock, or the gas at its own p and T.
  [[nodiscard]] std::optional<stats::Uncertain> amountInVolume(
      const stats::Uncertain& volume_m3) const;

  /// Mass [kg] of a neat material that holds the amount [mol].
  [[nodiscard]] std::optional<double> massFor(double amount_mol) const;
  /// Volume [m3] of a liquid, stock or gas that holds the amount [mol].
  [[nodiscard]] std::optional<double> volumeFor(double amount_mol) const;

  /// Volume [m3] that a mass [kg] takes up, where the density is known.
  [[nodiscard]] std::optional<double> volumeOfMass(double mass_kg) const;
  /// Mass [kg] of a volume [m3], where the density is known.
  [[nodiscard]] std::optional<double> massOfVolume(double volume_m3) const;

  [[nodiscard]] bool isSolid() const;
  [[nodiscard]] bool isNeatLiquid() const;
  [[nodiscard]] bool isStock() const;
  [[nodiscard]] bool isGas() const;

  [[nodiscard]] const std::optional<stats::Uncertain>& molarMass() const { return m_molarMass; }
  [[nodiscard]] const std::optional<stats::Uncertain>& density() const { return m_density; }
  [[nodiscard]] const std::string& densitySource() const { return m_densitySource; }
  [[nodiscard]] double assay() const { return m_assay.value(); }

  /// What was taken as exact for want of a stated uncertainty: `assay`, `density`, `concentration`.
  [[nodiscard]] const std::vector<std::string>& takenAsExact() const { return m_takenAsExact; }

 private:
  void takeSolid(const SolidSupply& solid, stats::Causes& causes);
  void takeLiquid(const Plan& plan, const ComponentPlan& component, const LiquidSupply& liquid,
                  stats::Causes& causes, text::Notices& notices);
  void takeTableDensity(const Plan& plan, const ComponentPlan& component, text::Notices& notices);
  void takeStock(const StockSupply& stock, stats::Causes& causes);
  void takeAssay(double assay, std::optional<double> u, stats::Causes& causes);

  Supply m_supply;
  std::optional<stats::Uncertain> m_molarMass;  ///< kg/mol
  stats::Uncertain m_assay = 1.0;               ///< w/w; of a stock by mass fraction that fraction
  std::optional<stats::Uncertain> m_density;    ///< kg/m3
  std::optional<stats::Uncertain> m_concentration;  ///< mol/m3, of stocks
  std::string m_densitySource;
  std::vector<std::string> m_takenAsExact;
};

}  // namespace vialkeeper::charge
