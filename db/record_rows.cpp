// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/record_rows.h"

#include <fmt/format.h>

#include <nlohmann/json.hpp>

#include "app/notebook/shelf_fields.h"
#include "db/canonical_json.h"

namespace vialkeeper::db {
namespace {

std::string joined(const std::vector<std::string>& words) {
  std::string text;
  for (const std::string& word : words) text += (text.empty() ? "" : " ") + word;
  return text;
}

std::vector<std::string> splitAtBlanks(const std::string& text) {
  std::vector<std::string> words;
  for (std::size_t at = 0; at < text.size();) {
    const std::size_t end = std::min(text.find(' ', at), text.size());
    if (end > at) words.push_back(text.substr(at, end - at));
    at = end + 1;
  }
  return words;
}

}  // namespace

units::Moment momentOf(const Row& row, const std::string& name) {
  return {std::chrono::sys_time<std::chrono::milliseconds>{
              std::chrono::milliseconds{row.integer(name + "_ms")}},
          std::chrono::minutes{row.integer(name + "_offset_min")}};
}

void setMoment(Row& row, const std::string& name, const units::Moment& moment) {
  row.set(name + "_ms", std::int64_t{moment.utc.time_since_epoch().count()});
  row.set(name + "_offset_min", std::int64_t{moment.offset.count()});
}

app::Person personOf(const Row& row) {
  return {row.integer("n"), row.integer("version"), row.text("code"), row.text("name")};
}

Row rowOf(const app::Person& person) {
  return {{"code", person.code}, {"name", textOrNull(person.name)}};
}

app::SubstanceRecord substanceOf(const Row& row) {
  return {.n = row.integer("n"),
          .version = row.integer("version"),
          .name = row.text("name"),
          .synonyms = {},
          .formula = row.text("formula"),
          .smiles = row.text("smiles"),
          .canonicalSmiles = row.text("canonical_smiles"),
          .inchiKey = row.text("inchi_key"),
          .cas = row.text("cas"),
          .molarMass_g_mol = row.maybeReal("molar_mass_g_mol"),
          .uMolarMass_g_mol = row.maybeReal("u_molar_mass_g_mol"),
          .fingerprint = row.bytes("fingerprint"),
          .hazards = splitAtBlanks(row.text("hazards")),
          .note = row.text("note")};
}

Row rowOf(const app::SubstanceRecord& substance) {
  Row row;
  row.set("name", substance.name);
  row.set("formula", textOrNull(substance.formula));
  row.set("smiles", textOrNull(substance.smiles));
  row.set("canonical_smiles", textOrNull(substance.canonicalSmiles));
  row.set("inchi_key", textOrNull(substance.inchiKey));
  row.set("cas", textOrNull(substance.cas));
  row.set("molar_mass_g_mol", numberOrNull(substance.molarMass_g_mol));
  row.set("u_molar_mass_g_mol", numberOrNull(substance.uMolarMass_g_mol));
  if (substance.fingerprint.empty()) {
    row.set("fingerprint", Cell{});
  } else {
    row.set("fingerprint", Blob{substance.fingerprint});
  }
  row.set("hazards", textOrNull(joined(substance.hazards)));
  row.set("note", textOrNull(substance.note));
  return row;
}

app::ShelfCard cardOf(app::ShelfKind kind, const Row& row) {
  app::ShelfCard card{.kind = kind,
                      .n = row.integer("n"),
                      .version = row.integer("version"),
                      .name = row.text("name"),
                      .substance = row.integer("substance_n"),
                      .fields = {}};
  for (const app::ShelfField& field : app::shelfKind(kind).fields) {
    const std::string column(field.column);
    if (row.isNull(column)) continue;
    if (field.type == app::ShelfField::Type::kText) {
      card.fields[std::string(field.name)] = row.text(column);
    } else {
      card.fields[std::string(field.name)] = row.real(column);
    }
  }
  return card;
}

Row rowOf(const app::ShelfCard& card) {
  const app::ShelfKindInfo& info = app::shelfKind(card.kind);
  Row row;
  row.set("name", card.name);
  if (info.ofSubstance) row.set("substance_n", card.substance);
  for (const app::ShelfField& field : info.fields) {
    const auto found = card.fields.find(std::string(field.name));
    Cell cell;
    if (found != card.fields.end()) {
      if (const auto* text = std::get_if<std::string>(&found->second)) {
        cell = textOrNull(*text);
      } else {
        cell = std::get<double>(found->second);
      }
    }
    row.set(std::string(field.column), std::move(cell));
  }
  return row;
}

app::RunRecord runOf(const Row& row, const PersonCode& code) {
  return {.n = row.integer("n"),
          .version = row.integer("version"),
          .code = row.text("code"),
          .person = code(row.integer("person_n")),
          .state = app::runStateFromText(row.text("state")).value_or(app::RunState::kPlanned),
          .title = row.text("title"),
          .series = row.text("series"),
          .aim = row.text("aim"),
          .conclusion = row.text("conclusion"),
          .created = momentOf(row, "created"),
          .plan = row.integer("plan_n"),
          .clonedFrom = row.integer("cloned_from_n"),
          .vial = row.text("vial"),
          .lamp = row.text("lamp"),
          .atmosphere = row.text("atmosphere"),
          .wavelength_nm = row.maybeReal("wavelength_nm"),
          .temperature_C = row.maybeReal("temperature_c"),
          .duration_h = row.maybeReal("duration_h"),
          .limitingKey = row.text("limiting_key"),
          .limiting_mmol = row.real("limiting_mmol"),
          .liquid_mL = row.real("liquid_ml"),
          .yield_percent = row.maybeReal("yield_percent"),
          .uYield_percent = row.maybeReal("u_yield_percent"),
          .conversion_percent = row.maybeReal("conversion_percent"),
          .uConversion_percent = row.maybeReal("u_conversion_percent")};
}

Row rowOf(const app::RunRecord& run, const PersonNumber& number) {
  Row row;
  row.set("code", run.code);
  row.set("person_n", number(run.person));
  row.set("state", std::string(toText(run.state)));
  row.set("title", textOrNull(run.title));
  row.set("series", textOrNull(run.series));
  row.set("aim", textOrNull(run.aim));
  row.set("conclusion", textOrNull(run.conclusion));
  setMoment(row, "created", run.created);
  row.set("plan_n", run.plan);
  row.set("cloned_from_n", referenceOrNull(run.clonedFrom));
  row.set("vial", textOrNull(run.vial));
  row.set("lamp", textOrNull(run.lamp));
  row.set("atmosphere", textOrNull(run.atmosphere));
  row.set("wavelength_nm", numberOrNull(run.wavelength_nm));
  row.set("temperature_c", numberOrNull(run.temperature_C));
  row.set("duration_h", numberOrNull(run.duration_h));
  row.set("limiting_key", run.limitingKey);
  row.set("limiting_mmol", run.limiting_mmol);
  row.set("liquid_ml", run.liquid_mL);
  row.set("yield_percent", numberOrNull(run.yield_percent));
  row.set("u_yield_percent", numberOrNull(run.uYield_percent));
  row.set("conversion_percent", numberOrNull(run.conversion_percent));
  row.set("u_conversion_percent", numberOrNull(run.uConversion_percent));
  return row;
}

app::ComponentRecord componentOf(const Row& row, const PersonCode& code) {
  app::ComponentRecord component{
      .n = row.integer("n"),
      .version = row.integer("version"),
      .run = row.integer("run_n"),
      .position = static_cast<int>(row.integer("position")),
      .key = row.text("key"),
      .role = row.text("role"),
      .name = row.text("name"),
      .substance = row.integer("substance_n"),
      .lot = row.integer("lot_n"),
      .stock = row.integer("stock_n"),
      .planned_mmol = row.maybeReal("planned_mmol"),
      .planned_molPercent = row.maybeReal("planned_mol_percent"),
      .planned_mol_L = row.maybeReal("planned_mol_l"),
      .target_mg = row.maybeReal("target_mg"),
      .target_uL = row.maybeReal("target_ul"),
      .actualText = row.text("actual_text"),
      .actual_mg = row.maybeReal("actual_mg"),
      .actual_uL = row.maybeReal("actual_ul"),
      .weighed = {},
      .weighedBy = row.isNull("weighed_by_n") ? "" : code(row.integer("weighed_by_n")),
      .charged_mmol = row.maybeReal("charged_mmol"),
      .uCharged_mmol = row.maybeReal("u_charged_mmol"),
      .charged_molPercent = row.maybeReal("charged_mol_percent"),
      .charged_mol_L = row.maybeReal("charged_mol_l")};
  if (!row.isNull("weighed_ms")) component.weighed = momentOf(row, "weighed");
  return component;
}

Row rowOf(const app::ComponentRecord& component, const PersonNumber& number) {
  Row row;
  row.set("run_n", component.run);
  row.set("position", std::int64_t{component.position});
  row.set("key", component.key);
  row.set("role", component.role);
  row.set("name", component.name);
  row.set("substance_n", component.substance);
  row.set("lot_n", referenceOrNull(component.lot));
  row.set("stock_n", referenceOrNull(component.stock));
  row.set("planned_mmol", numberOrNull(component.planned_mmol));
  row.set("planned_mol_percent", numberOrNull(component.planned_molPercent));
  row.set("planned_mol_l", numberOrNull(component.planned_mol_L));
  row.set("target_mg", numberOrNull(component.target_mg));
  row.set("target_ul", numberOrNull(component.target_uL));
  row.set("actual_text", textOrNull(component.actualText));
  row.set("actual_mg", numberOrNull(component.actual_mg));
  row.set("actual_ul", numberOrNull(component.actual_uL));
  row.set("weighed_ms", Cell{});
  row.set("weighed_offset_min", Cell{});
  if (component.weighed) setMoment(row, "weighed", *component.weighed);
  row.set("weighed_by_n", component.weighedBy.empty()
                              ? referenceOrNull(0)
                              : referenceOrNull(number(component.weighedBy)));
  row.set("charged_mmol", numberOrNull(component.charged_mmol));
  row.set("u_charged_mmol", numberOrNull(component.uCharged_mmol));
  row.set("charged_mol_percent", numberOrNull(component.charged_molPercent));
  row.set("charged_mol_l", numberOrNull(component.charged_mol_L));
  row.set("loading_mol_percent", numberOrNull(component.loading_molPercent()));
  return row;
}

app::EventRecord eventOf(const Row& row, const PersonCode& code) {
  return {.n = row.integer("n"),
          .run = row.integer("run_n"),
          .kind = row.text("kind"),
          .raw = row.text("raw"),
          .at = momentOf(row, "at"),
          .logged = momentOf(row, "logged"),
          .person = code(row.integer("person_n")),
          .supersedes = row.integer("supersedes_n"),
          .supersededBy = row.integer("superseded_by"),
          .pressure_bar = row.maybeReal("pressure_bar"),
          .pressureKind = row.text("pressure_kind"),
          .temperature_C = row.maybeReal("temperature_c"),
          .volume_uL = row.maybeReal("volume_ul"),
          .gas = row.text("gas"),
          .amount_mmol = row.maybeReal("amount_mmol"),
          .fraction = row.maybeReal("fraction"),
          .note = row.text("note"),
          .attachment = row.integer("attachment_n"),
          .attachmentName = row.text("attachment_name")};
}

Row rowOf(const app::EventRecord& event, const PersonNumber& number) {
  Row row;
  row.set("run_n", event.run);
  row.set("kind", event.kind);
  row.set("raw", event.raw);
  setMoment(row, "at", event.at);
  setMoment(row, "logged", event.logged);
  row.set("person_n", number(event.person));
  row.set("supersedes_n", referenceOrNull(event.supersedes));
  row.set("pressure_bar", numberOrNull(event.pressure_bar));
  row.set("pressure_kind", textOrNull(event.pressureKind));
  row.set("temperature_c", numberOrNull(event.temperature_C));
  row.set("volume_ul", numberOrNull(event.volume_uL));
  row.set("gas", textOrNull(event.gas));
  row.set("amount_mmol", numberOrNull(event.amount_mmol));
  row.set("fraction", numberOrNull(event.fraction));
  row.set("note", textOrNull(event.note));
  row.set("attachment_n", referenceOrNull(event.attachment));
  row.set("attachment_name", textOrNull(event.attachmentName));
  return row;
}

app::DatasetRecord datasetOf(const Row& row) {
  app::DatasetRecord dataset{.n = row.integer("n"),
                             .code = row.text("code"),
                             .kind = row.text("kind"),
                             .title = row.text("title"),
                             .columns = {},
                             .rows = row.integer("row_count"),
                             .raw = row.integer("raw_n"),
                             .rawName = row.text("raw_name"),
                             .recipe = row.text("recipe")};
  const auto columns = nlohmann::json::parse(row.text("columns"), nullptr, false);
  if (!columns.is_array()) return dataset;  // verify finds and tells it
  const auto textIn = [](const nlohmann::json& column, const char* name) {
    const bool there = column.is_object() && column.contains(name) && column[name].is_string();
    return there ? column[name].get<std::string>() : std::string{};
  };
  for (const auto& column : columns)
    dataset.columns.push_back({textIn(column, "name"), textIn(column, "unit")});
  return dataset;
}

Row rowOf(const app::DatasetRecord& dataset) {
  std::string columns;
  for (const app::DatasetColumn& column : dataset.columns) {
    columns += fmt::format(R"({}{{"name":{},"unit":{}}})", columns.empty() ? "" : ",",
                           canonicalText(column.name), canonicalText(column.unit));
  }
  return {{"code", dataset.code},
          {"kind", dataset.kind},
          {"title", textOrNull(dataset.title)},
          {"columns", "[" + columns + "]"},
          {"row_count", dataset.rows},
          {"raw_n", dataset.raw},
          {"raw_name", dataset.rawName},
          {"recipe", textOrNull(dataset.recipe)}};
}

app::RevisionRecord revisionOf(const Row& row) {
  return {.seq = row.integer("seq"),
          .at = momentOf(row, "at"),
          .person = row.text("person"),
          .action = row.text("action"),
          .run = row.integer("run_n"),
          .reason = row.text("reason"),
          .changes = row.text("changes")};
}

}  // namespace vialkeeper::db
