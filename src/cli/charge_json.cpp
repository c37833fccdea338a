// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/charge_json.h"

#include <nlohmann/json.hpp>

#include "charge/trail.h"
#include "cli/json_text.h"

namespace vialkeeper::cli {
namespace {

using Json = nlohmann::ordered_json;
using stats::Uncertain;

/// The value in a unit that is `perSi` times smaller than the SI unit; null where there is none.
Json valueOf(const std::optional<Uncertain>& number, double perSi = 1.0) {
  return number ? Json(number->value() * perSi) : Json(nullptr);
}

Json uncertaintyOf(const std::optional<Uncertain>& number, double perSi = 1.0) {
  if (!number) return nullptr;
  const auto u = number->standardUncertainty();
  return u ? Json(*u * perSi) : Json(nullptr);
}

constexpr double kMillimolesPerMole = 1e3;

Json chargedJson(const charge::AsCharged& charged) {
  Json json;
  json["mass_mg"] = charged.mass ? Json(charged.mass->milligrams()) : Json(nullptr);
  json["volume_uL"] = charged.volume ? Json(charged.volume->microlitres()) : Json(nullptr);
  json["amount_mmol"] = valueOf(charged.amount_mol, kMillimolesPerMole);
  json["u_amount_mmol"] = uncertaintyOf(charged.amount_mol, kMillimolesPerMole);
  json["equiv"] = valueOf(charged.equiv);
  json["u_equiv"] = uncertaintyOf(charged.equiv);
  json["mol_percent"] = valueOf(charged.molPercent);
  json["u_mol_percent"] = uncertaintyOf(charged.molPercent);
  json["concentration_mol_L"] = valueOf(charged.concentration_mol_m3, 1e-3);
  json["u_concentration_mol_L"] = uncertaintyOf(charged.concentration_mol_m3, 1e-3);
  json["off_target_percent"] = orNull(charged.offTargetPercent);
  return json;
}

Json proposalJson(const charge::StockProposal& proposal) {
  return {{"solvent", proposal.solventKey},
          {"concentration_mol_L", proposal.concentration.molPerLitre()},
          {"flask_mL", proposal.flask.millilitres()},
          {"stock_mass_mg", proposal.stockMass.milligrams()},
          {"transfer_uL", proposal.transfer.microlitres()},
          {"pipette", proposal.pipette}};
}

Json componentJson(const app::PlannedRun& run, const charge::ComponentCharge& component,
                   bool withWeighed) {
  const auto& mass = component.substance.molarMass;
  Json json;
  json["key"] = component.key;
  json["role"] = toText(component.role);
  json["name"] = component.name;
  json["formula"] =
      component.substance.formula.empty() ? Json(nullptr) : Json(component.substance.formula);
  json["molar_mass_g_mol"] = mass ? Json(mass->value.gramsPerMole()) : Json(nullptr);
  json["amount_mmol"] = valueOf(component.amount_mol, kMillimolesPerMole);
  json["u_amount_mmol"] = uncertaintyOf(component.amount_mol, kMillimolesPerMole);
  json["equiv"] = orNull(component.equiv);
  json["mol_percent"] = orNull(component.molPercent);
  json["concentration_mol_L"] =
      component.concentration ? Json(component.concentration->molPerLitre()) : Json(nullptr);
  json["target_mass_mg"] =
      component.targetMass ? Json(component.targetMass->milligrams()) : Json(nullptr);
  json["target_volume_uL"] =
      component.targetVolume ? Json(component.targetVolume->microlitres()) : Json(nullptr);
  json["tolerance_percent"] = component.tolerancePercent;
  if (component.proposal) json["proposed_stock"] = proposalJson(*component.proposal);
  if (withWeighed)
    json["charged"] = component.charged ? chargedJson(*component.charged) : Json(nullptr);
  json["trail"] = charge::trailOf(run.plan, run.charge, component.key);
  json["notices"] = noticesJson(component.notices);
  return json;
}

}  // namespace

Json toJson(const app::PlannedRun& run, bool withWeighed) {
  Json components = Json::array();
  for (const charge::ComponentCharge& component : run.charge.components) {
    components.push_back(componentJson(run, component, withWeighed));
  }
  return {{"limiting", run.charge.limiting},
          {"limiting_amount_mmol", run.charge.limitingAmount.millimoles()},
          {"total_liquid_mL", run.charge.totalLiquid.millilitres()},
          {"fill_fraction", orNull(run.charge.fill)},
          {"components", std::move(components)},
          {"notices", noticesJson(run.charge.notices)}};
}

}  // namespace vialkeeper::cli
