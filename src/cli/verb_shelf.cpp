// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>
#include <fmt/ranges.h>

#include <CLI/CLI.hpp>
#include <algorithm>
#include <memory>
#include <nlohmann/json.hpp>

#include "app/notebook/shelf_cards.h"
#include "app/notebook/substance_cards.h"
#include "app/text_files.h"
#include "cli/json_text.h"
#include "cli/notebook_session.h"
#include "cli/record_json.h"
#include "cli/text_table.h"
#include "cli/verb.h"
#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

using Json = nlohmann::ordered_json;

struct ShelfOptions {
  std::string kind;
  std::string name;
  std::string file;
  std::vector<std::string> set;
  app::SubstanceDraft draft;
};

bool isSubstance(const std::string& kind) { return kind == "substance" || kind == "substances"; }

text::Checked<const app::ShelfKindInfo*> kindOf(const std::string& word) {
  if (const app::ShelfKindInfo* info = app::findShelfKind(word)) return info;
  return std::unexpected(
      text::Faults{usageFault("KIND", fmt::format("{} is no kind of card", text::quoted(word)),
                              "choose substance, lot, stock, vial, lamp, balance or pipette")});
}

text::Checked<app::TypedFields> fieldsOf(const std::vector<std::string>& set) {
  app::TypedFields fields;
  for (const std::string& each : set) {
    const std::size_t equals = each.find('=');
    if (equals == std::string::npos || equals == 0) {
      return std::unexpected(
          text::Faults{usageFault("--set", fmt::format("{} sets nothing", text::quoted(each)),
                                  "write for example --set \"volume=11.6 mL\"")});
    }
    fields.emplace_back(each.substr(0, equals), each.substr(equals + 1));
  }
  return fields;
}

Json cardJson(const app::ShelfCard& card) {
  Json json{{"kind", app::shelfKind(card.kind).word}, {"name", card.name}};
  for (const app::ShelfField& field : app::shelfKind(card.kind).fields) {
    const auto found = card.fields.find(std::string(field.name));
    Json value = nullptr;
    if (found != card.fields.end()) {
      if (const auto* number = std::get_if<double>(&found->second)) value = *number;
      if (const auto* content = std::get_if<std::string>(&found->second)) value = *content;
    }
    json[std::string(field.column)] = value;
  }
  return json;
}

VerbResult addCardOrSubstance(ShelfOptions options, const CommonOptions& common) {
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  if (isSubstance(options.kind)) {
    options.draft.name = options.name;
    const auto added = app::addSubstanceCard(session->desk(), options.draft);
    if (!added) return std::unexpected(added.error());
    const app::SubstanceRecord& substance = added->substance;
    if (common.json) {
      return toJsonText(
          {{"substance", toJson(substance)}, {"notices", noticesJson(added->notices)}});
    }
    std::string answer =
        fmt::format("on the shelf: {} {}\n", text::oneLine(substance.name), substance.formula);
    for (const text::Notice& notice : added->notices)
      answer += fmt::format("! {}\n", text::oneLine(notice.text));
    return answer;
  }
  const auto kind = kindOf(options.kind);
  if (!kind) return std::unexpected(kind.error());
  const auto fields = fieldsOf(options.set);
  if (!fields) return std::unexpected(fields.error());
  const auto card = app::addShelfCard(session->desk(), (*kind)->kind, options.name, *fields);
  if (!card) return std::unexpected(card.error());
  if (common.json) return toJsonText({{"card", cardJson(*card)}, {"notices", Json::array()}});
  return fmt::format("on the shelf: {} {}\n", (*kind)->word, text::oneLine(card->name));
}

VerbResult listSubstances(app::Notebook& notebook, const CommonOptions& common) {
  const auto substances = notebook.substances();
  if (!substances) return std::unexpected(substances.error());
  Json list = Json::array();
  TextTable table;
  using enum TextTable::Align;
  for (const char* title : {"name", "formula", "CAS", "also called"}) table.addColumn(title, kLeft);
  table.addColumn("g/mol", kRight);
  for (const app::SubstanceRecord& substance : *substances) {
    list.push_back(toJson(substance));
    table.addRow(
        {substance.name, substance.formula, substance.cas,
         fmt::format("{}", fmt::join(substance.synonyms, "; ")),
         substance.molarMass_g_mol ? fmt::format("{:.2f}", *substance.molarMass_g_mol) : ""});
  }
  return common.json ? toJsonText({{"substances", std::move(list)}, {"notices", Json::array()}})
                     : table.toText();
}

VerbResult listCards(const std::string& word, const CommonOptions& common) {
  auto session = NotebookSession::forReading(common);
  if (!session) return std::unexpected(session.error());
  if (isSubstance(word)) return listSubstances(session->notebook(), common);
  const auto kind = kindOf(word);
  if (!kind) return std::unexpected(kind.error());
  const auto cards = session->notebook().cards((*kind)->kind);
  if (!cards) return std::unexpected(cards.error());
  Json list = Json::array();
  TextTable table;
  table.addColumn("name", TextTable::Align::kLeft);
  for (const app::ShelfField& field : (*kind)->fields)
    table.addColumn(std::string(field.name), TextTable::Align::kLeft);
  for (const app::ShelfCard& card : *cards) {
    list.push_back(cardJson(card));
    std::vector<std::string> cells{card.name};
    for (const app::ShelfField& field : (*kind)->fields)
      cells.push_back(app::shownField(card, field));
    table.addRow(std::move(cells));
  }
  return common.json ? toJsonText({{"cards", std::move(list)}, {"notices", Json::array()}})
                     : table.toText();
}

VerbResult showSubstance(const std::string& name, const CommonOptions& common) {
  auto session = NotebookSession::forReading(common);
  if (!session) return std::unexpected(session.error());
  const auto match = app::lookUpSubstance(session->notebook(), name);
  if (!match) return std::unexpected(match.error());
  if (match->same.empty()) {
    return app::askedFault(
        "name", fmt::format("{} is not on the shelf", text::quoted(name)),
        match->nearMisses.empty()
            ? "see shelf list substance"
            : fmt::format("did you mean {}?", fmt::join(match->nearMisses, ", ")));
  }
  if (common.json) {
    Json list = Json::array();
    for (const app::SubstanceRecord& substance : match->same) list.push_back(toJson(substance));
    return toJsonText({{"substances", std::move(list)}, {"notices", Json::array()}});
  }
  std::string text;
  for (const app::SubstanceRecord& substance : match->same) {
    text += fmt::format("{}  {}  {}\n", text::oneLine(substance.name), substance.formula,
                        substance.cas);
    if (!substance.synonyms.empty())
      text += fmt::format("  also {}\n",
                          text::oneLine(fmt::format("{}", fmt::join(substance.synonyms, "; "))));
    if (substance.molarMass_g_mol)
      text += fmt::format("  {:.3f} g/mol\n", *substance.molarMass_g_mol);
    if (!substance.canonicalSmiles.empty())
      text += fmt::format("  {}\n  {}\n", substance.canonicalSmiles, substance.inchiKey);
    if (!substance.hazards.empty())
      text += fmt::format("  {}\n", fmt::join(substance.hazards, " "));
    if (!substance.note.empty()) text += fmt::format("  {}\n", text::oneLine(substance.note));
  }
  return text;
}

VerbResult importCards(const ShelfOptions& options, const CommonOptions& common) {
  const auto bytes = app::readFile(options.file);
  if (!bytes) return std::unexpected(bytes.error());
  auto session = NotebookSession::forWriting(common);
  if (!session) return std::unexpected(session.error());
  const bool isSdf = text::asciiLowered(options.file).ends_with(".sdf");
  if (isSdf && !isSubstance(options.kind)) {
    return std::unexpected(text::Faults{
        usageFault("--as", "an SD file holds substances", "import it --as substance")});
  }
  const auto result = isSdf ? app::importSubstancesFromSdf(session->desk(), *bytes, options.file)
                            : app::importShelf(session->desk(), options.kind, *bytes, options.file);
  if (!result) return std::unexpected(result.error());
  if (common.json)
    return toJsonText(
        {{"added", result->added}, {"known", result->known}, {"notices", Json::array()}});
  return fmt::format("{} added, {} were on the shelf already\n", result->added, result->known);
}

}  // namespace

Verb shelfVerb(CLI::App& program) {
  auto options = std::make_shared<ShelfOptions>();
  CLI::App* parser =
      program.add_subcommand("shelf", "Substances, lots, stocks, vials, lamps, balances, pipettes");
  parser->require_subcommand(1);
  CLI::App* add = parser->add_subcommand("add", "Put a card on the shelf");
  add->add_option("KIND", options->kind, "substance, lot, stock, vial, lamp, balance, pipette")
      ->required();
  add->add_option("NAME", options->name, "the name you call it by")->required();
  add->add_option("--set", options->set, "a field: \"volume=11.6 mL\"")->take_all();
  app::SubstanceDraft& draft = options->draft;
  add->add_option("--synonym", draft.synonyms, "another name of a substance")->take_all();
  add->add_option("--formula", draft.formula, "of a substance");
  add->add_option("--smiles", draft.smiles, "of a substance");
  add->add_option("--cas", draft.cas, "of a substance");
  add->add_option("--molar-mass", draft.molarMass, "of a substance, \"119.17 g/mol\"");
  add->add_option("--hazard", draft.hazards, "a hazard statement code of a substance")->take_all();
  add->add_option("--note", draft.note, "of a substance");
  CLI::App* list = parser->add_subcommand("list", "The cards of one kind");
  list->add_option("KIND", options->kind, "as for add")->required();
  CLI::App* show = parser->add_subcommand("show", "A substance by name, synonym or CAS number");
  show->add_option("NAME", options->name, "name, synonym or CAS number")->required();
  CLI::App* import =
      parser->add_subcommand("import", "Cards from a CSV file, substances from an SD file too");
  import->add_option("FILE", options->file, "a CSV with a column name, or an .sdf")->required();
  import->add_option("--as", options->kind, "what the rows are")->required();
  for (CLI::App* verb : {add, list, show, import}) verb->fallthrough();
  return {parser, [=](const CommonOptions& common) -> VerbResult {
            if (add->parsed()) return addCardOrSubstance(*options, common);
            if (list->parsed()) return listCards(options->kind, common);
            return show->parsed() ? showSubstance(options->name, common)
                                  : importCards(*options, common);
          }};
}

}  // namespace vialkeeper::cli
