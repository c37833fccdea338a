// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/charge.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "charge/charge_notices.h"
#include "charge/material.h"
#include "units/shown.h"

namespace vialkeeper::charge {
namespace {

using stats::Uncertain;
using text::Faults;
using units::Amount;
using units::Concentration;
using units::Mass;
using units::Volume;

/// Volumes closer than this are equal but for rounding [m3]: 1 nL.
constexpr double kVolumeRounding_m3 = 1e-12;

/// Solves one plan, step by step; each step needs what the one before has found.
class ChargeSolver {
 public:
  ChargeSolver(const Plan& plan, const Substances& substances) : m_plan(plan) {
    for (std::size_t i = 0; i < plan.components.size(); ++i) {
      ComponentCharge component{.key = plan.components[i].key,
                                .role = plan.components[i].role,
                                .name = plan.components[i].name,
                                .substance = substances.components[i]};
      m_materials.emplace_back(plan, plan.components[i], substances.components[i], m_causes,
                               component.notices);
      m_components.push_back(std::move(component));
    }
    m_planned_mol.resize(plan.components.size());
  }

  text::Checked<Amount> limitingAmount() {
    const auto amount = absoluteAmount(m_plan.indexOf(m_plan.limiting));
    if (!m_faults.empty()) return std::unexpected(m_faults);
    return Amount::fromMoles(*amount);
  }

  text::Checked<Charge> solve(std::optional<Amount> limitingAmount) {
    const std::size_t limiting = m_plan.indexOf(m_plan.limiting);
    const auto planned = absoluteAmount(limiting);
    if (!planned) return std::unexpected(m_faults);
    m_limiting_mol = limitingAmount ? limitingAmount->moles() : *planned;
    m_total_m3 = m_plan.liquid.total ? m_plan.liquid.total->si()
                                     : m_limiting_mol / m_plan.liquid.limitingConcentration->si();
    for (std::size_t i = 0; i < m_components.size(); ++i) fixTarget(i);
    if (!m_faults.empty()) return std::unexpected(m_faults);
    shareOutSolvents();
    checkVolumes();
    if (!m_faults.empty()) return std::unexpected(m_faults);
    for (std::size_t i = 0; i < m_components.size(); ++i) finishComponent(i);
    return assemble(limitingAmount.has_value());
  }

 private:
  [[nodiscard]] const ComponentPlan& plan(std::size_t i) const { return m_plan.components[i]; }

  void fault(std::size_t i, std::string_view field, std::string what, std::string mend) {
    const units::SectionPlace& place = plan(i).place;
    m_faults.push_back({.file = m_plan.file,
                        .line = place.lineOf(field),
                        .field = place.path + (field.empty() ? "" : "." + std::string(field)),
                        .what = std::move(what),
                        .mend = std::move(mend)});
  }

  /// Why an amount cannot be turned into a mass or volume, or back.
  void faultUnknown(std::size_t i) {
    const std::string_view basis = toText(plan(i).amount.basis);
    const bool wantsDensity = m_materials[i].isNeatLiquid() && !m_materials[i].density();
    if (wantsDensity) {
      fault(i, "supply", fmt::format("the density of {} is not known", plan(i).name),
            "give it, supply = { kind = \"liquid\", density = \"0.95 g/mL\" }; the solvent table "
            "does not hold it");
    }
    if (!m_materials[i].molarMass() && !(wantsDensity && plan(i).isSolvent())) {
      fault(i, basis, fmt::format("the molar mass of {} is not known", plan(i).name),
            "give smiles, formula or molar_mass");
    }
  }

  /// Amount [mol] of a component whose basis stands on its own; nothing, with a fault, where it
  /// does not.
  std::optional<double> absoluteAmount(std::size_t i) {
    const AmountPlan& amount = plan(i).amount;
    std::optional<double> mol;
    switch (amount.basis) {
      case Basis::kAmount:
        mol = amount.value;
        break;
      case Basis::kMass:
        mol = valueOf(m_materials[i].amountInMass(amount.value));
        break;
      case Basis::kVolume:
        mol = valueOf(m_materials[i].amountInVolume(amount.value));
        break;
      case Basis::kConcentration:
        if (m_plan.liquid.total) mol = amount.value * m_plan.liquid.total->si();
        break;
      default:
        break;
    }
    if (!mol) faultUnknown(i);
    return mol;
  }

  static std::optional<double> valueOf(const std::optional<Uncertain>& number) {
    return number ? std::optional(number->value()) : std::nullopt;
  }

  /// The target of everything but share solvents, from its basis.
  void fixTarget(std::size_t i) {
    const AmountPlan& amount = plan(i).amount;
    switch (amount.basis) {
      case Basis::kAmount:
        targetFromAmount(i, amount.value);
        break;
      case Basis::kEquiv:
        targetFromAmount(i, amount.value * m_limiting_mol);
        break;
      case Basis::kMolPercent:
        targetFromAmount(i, amount.value / 100.0 * m_limiting_mol);
        break;
      case Basis::kConcentration:
        targetFromAmount(i, amount.value * m_total_m3);
        break;
      case Basis::kMass:
        targetFromMass(i, amount.value);
        break;
      case Basis::kVolume:
        targetFromVolume(i, amount.value);
        break;
      case Basis::kShare:
        break;  // once all else is known
    }
  }

  void targetFromAmount(std::size_t i, double mol) {
    const Material& material = m_materials[i];
    m_planned_mol[i] = mol;
    const auto mass = material.massFor(mol);
    const auto volume = material.volumeFor(mol);
    if (material.isSolid() ? !mass : !volume) return faultUnknown(i);
    setTarget(i, mass, volume);
  }

  void targetFromMass(std::size_t i, double mass_kg) {
    const Material& material = m_materials[i];
    m_planned_mol[i] = valueOf(material.amountInMass(mass_kg));
    if (material.isGas()) {
      const auto volume = m_materials[i].molarMass()
                              ? material.volumeFor(mass_kg / material.molarMass()->value())
                              : std::nullopt;
      if (!volume) return faultUnknown(i);
      m_planned_mol[i] = mass_kg / material.molarMass()->value();
      return setTarget(i, std::nullopt, volume);
    }
    const auto volume = material.volumeOfMass(mass_kg);
    if (!material.isSolid() && !volume) return faultUnknown(i);
    setTarget(i, mass_kg, volume);
  }

  void targetFromVolume(std::size_t i, double volume_m3) {
    const Material& material = m_materials[i];
    m_planned_mol[i] = valueOf(material.amountInVolume(volume_m3));
    const auto mass = material.massOfVolume(volume_m3);
    if (material.isNeatLiquid() && !mass) return faultUnknown(i);
    setTarget(i, mass, volume_m3);
  }

  /// Keeps of the target what is measured out, and the room it takes in the liquid.
  void setTarget(std::size_t i, std::optional<double> mass_kg, std::optional<double> volume_m3) {
    ComponentCharge& component = m_components[i];
    const Material& material = m_materials[i];
    if (mass_kg && (material.isSolid() || material.isNeatLiquid()))
      component.targetMass = Mass::fromSi(*mass_kg);
    if (volume_m3 && !material.isSolid()) component.targetVolume = Volume::fromSi(*volume_m3);
    if (material.isGas()) return;
    const auto room = material.isSolid() ? material.volumeOfMass(mass_kg.value_or(0.0)) : volume_m3;
    component.liquidVolume = Volume::fromSi(room.value_or(0.0));
  }

  /// Divides what the other liquids leave of the total among the solvents that have a share.
  void shareOutSolvents() {
    double shared_m3 = m_total_m3;
    double parts = 0.0;
    std::vector<double> brought_m3(m_components.size(), 0.0);
    for (std::size_t i = 0; i < m_components.size(); ++i) {
      if (plan(i).amount.basis == Basis::kShare) {
        parts += plan(i).amount.value;
        continue;
      }
      const double room = m_components[i].liquidVolume ? m_components[i].liquidVolume->si() : 0.0;
      const auto* stock = std::get_if<StockSupply>(&plan(i).supply);
      const auto solvent = stock != nullptr ? m_plan.solventOf(*stock) : std::nullopt;
      if (solvent && plan(*solvent).amount.basis == Basis::kShare) {
        brought_m3[*solvent] += room;
      } else {
        shared_m3 -= room;
      }
    }
    if (parts == 0.0) return;
    if (shared_m3 < -kVolumeRounding_m3) {
      faultTotal(-shared_m3);
      return;
    }
    for (std::size_t i = 0; i < m_components.size(); ++i) {
      if (plan(i).amount.basis != Basis::kShare) continue;
      const double share = shared_m3 * plan(i).amount.value / parts;
      fillShare(i, share - brought_m3[i], share);
    }
  }

  void fillShare(std::size_t i, double pure_m3, double share_m3) {
    if (pure_m3 < -kVolumeRounding_m3) {
      faultStocksExceedShare(i, -pure_m3, share_m3);
      return;
    }
    targetFromVolume(i, std::max(pure_m3, 0.0));
  }

  void faultStocksExceedShare(std::size_t solvent, double excess_m3, double share_m3) {
    std::string stocks;
    std::size_t largest = solvent;
    for (std::size_t i = 0; i < m_components.size(); ++i) {
      const auto* stock = std::get_if<StockSupply>(&plan(i).supply);
      if (stock == nullptr || m_plan.solventOf(*stock) != solvent) continue;
      stocks += (stocks.empty() ? "" : ", ") + plan(i).key;
      if (largest == solvent || m_components[i].liquidVolume > m_components[largest].liquidVolume)
        largest = i;
    }
    fault(largest, toText(plan(largest).amount.basis),
          fmt::format("the stock {} brings {} more of {} than its share of {}", stocks,
                      units::shown(Volume::fromSi(excess_m3)), plan(solvent).name,
                      units::shown(Volume::fromSi(share_m3))),
          "make the stock more concentrated, or the liquid's volume larger");
  }

  /// A fault of the liquid's volume, at the field that fixes it.
  void faultLiquid(std::string what, std::string mend) {
    const std::string field = m_plan.liquid.total ? "total" : "limiting_concentration";
    m_faults.push_back({.file = m_plan.file,
                        .line = m_plan.liquid.place.lineOf(field),
                        .field = "liquid." + field,
                        .what = std::move(what),
                        .mend = std::move(mend)});
  }

  void faultTotal(double excess_m3) {
    faultLiquid(fmt::format("the liquids come to {} more than the total of {}",
                            units::shown(Volume::fromSi(excess_m3)),
                            units::shown(Volume::fromSi(m_total_m3))),
                "raise the total or lower the volumes");
  }

  void checkVolumes() {
    double sum_m3 = 0.0;
    for (const ComponentCharge& component : m_components) {
      if (component.liquidVolume) sum_m3 += component.liquidVolume->si();
    }
    if (!m_faults.empty()) return;
    if (sum_m3 > m_total_m3 * (1.0 + 1e-9) + kVolumeRounding_m3)
      return faultTotal(sum_m3 - m_total_m3);
    m_missing_m3 = m_total_m3 - sum_m3;
    if (m_plan.vial &&
        m_plan.vial->displaced.si() + m_total_m3 > m_plan.vial->volume.si() - kVolumeRounding_m3) {
      faultLiquid(
          fmt::format("{} of liquid leave no headspace in a vial of {}",
                      units::shown(Volume::fromSi(m_total_m3)), units::shown(m_plan.vial->volume)),
          "take a larger vial or less liquid");
    }
  }

  /// What the balance would show [kg]; of a stock, which has a volume for its target, by its
  /// density.
  std::optional<double> weighedMass(std::size_t i) const {
    if (m_components[i].targetMass) return m_components[i].targetMass->si();
    const auto& volume = m_components[i].targetVolume;
    return volume ? m_materials[i].massOfVolume(volume->si()) : std::nullopt;
  }

  /// Amount with the doubt of the device at the target; the value is the plan's to the last digit.
  std::optional<Uncertain> plannedAmount(std::size_t i) {
    if (!m_planned_mol[i]) return std::nullopt;
    const ComponentCharge& component = m_components[i];
    const Device* device = plan(i).device ? &*plan(i).device : nullptr;
    const bool weighed = device != nullptr && device->balance() != nullptr;
    std::optional<Uncertain> amount;
    if (const auto mass_kg = weighed ? weighedMass(i) : std::nullopt) {
      amount = m_materials[i].amountInMass(
          Uncertain(*mass_kg, device->balance()->standardUncertainty().si(), m_causes.add()));
    } else if (device != nullptr && device->pipette() != nullptr && component.targetVolume) {
      amount = m_materials[i].amountInVolume(Uncertain(
          component.targetVolume->si(),
          device->pipette()->standardUncertainty(*component.targetVolume).si(), m_causes.add()));
    }
    if (!amount) return Uncertain::unstated(*m_planned_mol[i], m_causes.addUnknown());
    return amount->mapped(*m_planned_mol[i], 1.0);
  }

  void finishComponent(std::size_t i) {
    ComponentCharge& component = m_components[i];
    component.amount_mol = plannedAmount(i);
    component.tolerancePercent = tolerance(i);
    if (const auto& density = m_materials[i].density()) {
      component.density = units::Density::fromSi(density->value());
      component.densitySource = m_materials[i].densitySource();
    }
    if (!component.amount_mol) return;
    const bool limiting = component.key == m_plan.limiting;
    const double ratio = limiting ? 1.0 : component.amount_mol->value() / m_limiting_mol;
    component.equiv = plan(i).amount.basis == Basis::kEquiv ? plan(i).amount.value : ratio;
    component.molPercent =
        plan(i).amount.basis == Basis::kMolPercent ? plan(i).amount.value : 100.0 * ratio;
    if (!m_materials[i].isGas()) {
      component.concentration = Concentration::fromSi(component.amount_mol->value() / m_total_m3);
    }
  }

  /// The component's own tolerance, but no finer than the last digit of its balance.
  [[nodiscard]] double tolerance(std::size_t i) const {
    const double own = plan(i).tolerancePercent.value_or(plan(i).isSolvent() ? 5.0 : 2.0);
    const Balance* balance = plan(i).device ? plan(i).device->balance() : nullptr;
    const auto& target = m_components[i].targetMass;
    if (balance == nullptr || !target || !(target->si() > 0.0)) return own;
    return std::max(own, 100.0 * (balance->readability / *target));
  }

  Charge assemble(bool retargeted) {
    Charge charge{
        .limiting = m_plan.limiting,
        .limitingAmount = Amount::fromMoles(m_limiting_mol),
        .totalLiquid = Volume::fromSi(m_total_m3),
        .fill = m_plan.vial ? std::optional(m_total_m3 / m_plan.vial->volume.si()) : std::nullopt,
        .retargeted = retargeted,
        .components = std::move(m_components),
        .notices = {}};
    addNotices(m_plan, m_materials, Volume::fromSi(m_missing_m3), charge);
    return charge;
  }

  const Plan& m_plan;
  stats::Causes m_causes;
  std::vector<Material> m_materials;
  std::vector<ComponentCharge> m_components;
  std::vector<std::optional<double>> m_planned_mol;
  double m_limiting_mol = 0.0;
  double m_total_m3 = 0.0;
  double m_missing_m3 = 0.0;
  Faults m_faults;
};

}  // namespace

const ComponentCharge* Charge::find(std::string_view key) const {
  const auto found = std::ranges::find(components, key, &ComponentCharge::key);
  return found == components.end() ? nullptr : &*found;
}

text::Checked<Charge> computeCharge(const Plan& plan, const Substances& substances,
                                    std::optional<units::Amount> limitingAmount) {
  return ChargeSolver(plan, substances).solve(limitingAmount);
}

text::Checked<units::Amount> plannedLimitingAmount(const Plan& plan, const Substances& substances) {
  return ChargeSolver(plan, substances).limitingAmount();
}

}  // namespace vialkeeper::charge
