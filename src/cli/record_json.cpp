// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/record_json.h"

#include <algorithm>
#include <nlohmann/json.hpp>

#include "cli/json_text.h"

namespace vialkeeper::cli {
namespace {

using Json = nlohmann::ordered_json;

/// The number of the entry with that row number, or null.
Json numberJson(std::span<const app::NumberedEvent> all, app::RowNumber n) {
  const auto found = std::ranges::find_if(
      all, [n](const app::NumberedEvent& entry) { return entry.event.n == n; });
  return n == 0 || found == all.end() ? Json(nullptr) : Json(found->number);
}

}  // namespace

Json textOrNullJson(const std::string& text) { return text.empty() ? Json(nullptr) : Json(text); }

Json toJson(const app::RunRecord& run) {
  return {{"code", run.code},
          {"state", toText(run.state)},
          {"person", run.person},
          {"created", toIsoText(run.created)},
          {"title", textOrNullJson(run.title)},
          {"series", textOrNullJson(run.series)},
          {"aim", textOrNullJson(run.aim)},
          {"conclusion", textOrNullJson(run.conclusion)},
          {"vial", textOrNullJson(run.vial)},
          {"lamp", textOrNullJson(run.lamp)},
          {"atmosphere", textOrNullJson(run.atmosphere)},
          {"wavelength_nm", orNull(run.wavelength_nm)},
          {"temperature_degC", orNull(run.temperature_C)},
          {"duration_h", orNull(run.duration_h)},
          {"limiting", run.limitingKey},
          {"limiting_amount_mmol", run.limiting_mmol},
          {"total_liquid_mL", run.liquid_mL},
          {"yield_percent", orNull(run.yield_percent)},
          {"u_yield_percent", orNull(run.uYield_percent)},
          {"conversion_percent", orNull(run.conversion_percent)},
          {"u_conversion_percent", orNull(run.uConversion_percent)}};
}

Json toJson(const app::ComponentRecord& component) {
  return {{"key", component.key},
          {"role", component.role},
          {"name", component.name},
          {"amount_mmol", orNull(component.planned_mmol)},
          {"mol_percent", orNull(component.planned_molPercent)},
          {"concentration_mol_L", orNull(component.planned_mol_L)},
          {"target_mass_mg", orNull(component.target_mg)},
          {"target_volume_uL", orNull(component.target_uL)},
          {"recorded", textOrNullJson(component.actualText)},
          {"recorded_at", component.weighed ? Json(toIsoText(*component.weighed)) : Json(nullptr)},
          {"recorded_by", textOrNullJson(component.weighedBy)},
          {"charged_amount_mmol", orNull(component.charged_mmol)},
          {"u_charged_amount_mmol", orNull(component.uCharged_mmol)},
          {"charged_mol_percent", orNull(component.charged_molPercent)},
          {"charged_concentration_mol_L", orNull(component.charged_mol_L)}};
}

Json toJson(const app::NumberedEvent& entry, std::span<const app::NumberedEvent> all) {
  const app::EventRecord& event = entry.event;
  return {{"number", entry.number},
          {"event", event.kind},
          {"at", toIsoText(event.at)},
          {"logged", toIsoText(event.logged)},
          {"person", event.person},
          {"raw", event.raw},
          {"pressure_bar", orNull(event.pressure_bar)},
          {"pressure_kind", textOrNullJson(event.pressureKind)},
          {"temperature_degC", orNull(event.temperature_C)},
          {"volume_uL", orNull(event.volume_uL)},
          {"gas", textOrNullJson(event.gas)},
          {"amount_mmol", orNull(event.amount_mmol)},
          {"fraction", orNull(event.fraction)},
          {"note", textOrNullJson(event.note)},
          {"file", textOrNullJson(event.attachmentName)},
          {"supersedes", numberJson(all, event.supersedes)},
          {"superseded_by", numberJson(all, event.supersededBy)}};
}

Json toJson(const app::DatasetRecord& dataset) {
  Json columns = Json::array();
  for (const app::DatasetColumn& column : dataset.columns) {
    columns.push_back({{"name", column.name}, {"unit", textOrNullJson(column.unit)}});
  }
  return {{"code", dataset.code},
          {"kind", dataset.kind},
          {"file", dataset.rawName},
          {"rows", dataset.rows},
          {"columns", columns}};
}

Json toJson(const app::SubstanceRecord& substance) {
  return {{"name", substance.name},
          {"synonyms", substance.synonyms},
          {"formula", textOrNullJson(substance.formula)},
          {"smiles", textOrNullJson(substance.canonicalSmiles)},
          {"inchi_key", textOrNullJson(substance.inchiKey)},
          {"cas", textOrNullJson(substance.cas)},
          {"molar_mass_g_mol", orNull(substance.molarMass_g_mol)},
          {"u_molar_mass_g_mol", orNull(substance.uMolarMass_g_mol)},
          {"hazards", substance.hazards},
          {"note", textOrNullJson(substance.note)}};
}

}  // namespace vialkeeper::cli
