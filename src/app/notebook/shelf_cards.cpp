// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/shelf_cards.h"

#include <fmt/format.h>

#include <algorithm>

#include "app/notebook/substance_cards.h"
#include "text/csv.h"
#include "text/text_fault.h"
#include "text/utf8.h"
#include "units/quantity_text.h"
#include "units/shown.h"
#include "units/toml_section.h"

namespace vialkeeper::app {
namespace {

using text::Faults;

void note(Faults& faults, std::string_view field, std::string what, std::string mend) {
  faults.push_back({.field = std::string(field), .what = std::move(what), .mend = std::move(mend)});
}

std::optional<FieldValue> readField(const ShelfField& field, const std::string& typed,
                                    Faults& faults) {
  if (field.type == ShelfField::Type::kText) {
    if (!text::firstInvalidUtf8(typed) && text::oneLine(typed) == typed) return FieldValue{typed};
    note(faults, field.name, "the text holds invisible control characters",
         "type it again in one plain line");
    return std::nullopt;
  }
  const auto unreadable = [&](const text::TextFault& fault) {
    note(faults, field.name,
         fmt::format("{}: {}", text::quoted(typed), whatWithPosition(fault, typed)), fault.mend);
    return std::nullopt;
  };
  if (field.type == ShelfField::Type::kNumber) {
    const auto number = units::readNumber(typed, units::Dialect::kPerson);
    if (!number) return unreadable(number.error());
    if (*number > 0.0 && *number <= 1.0) return FieldValue{*number};
    note(faults, field.name, fmt::format("{} lies outside the range", *number),
         "give a number above 0 and at most 1");
    return std::nullopt;
  }
  const auto read = units::readQuantityOf({field.kind}, typed, units::Dialect::kPerson);
  if (!read) return unreadable(read.error());
  return FieldValue{read->si * field.perSi};
}

/// The number of the substance that a lot or stock is of.
Checked<RowNumber> substanceNumber(Notebook& notebook, const std::string& name) {
  const auto match = lookUpSubstance(notebook, name);
  if (!match) return std::unexpected(match.error());
  if (match->same.size() == 1) return match->same.front().n;
  if (match->same.size() > 1) {
    return askedFault("substance",
                      fmt::format("{} means several substances of the shelf", text::quoted(name)),
                      "give its CAS number");
  }
  return askedFault("substance", fmt::format("{} is not on the shelf", text::quoted(name)),
                    match->nearMisses.empty()
                        ? "add the substance first"
                        : fmt::format("did you mean {}?", match->nearMisses.front()));
}

/// A row of a table as typed fields, empty cells left out.
struct NamedFields {
  std::string name;
  TypedFields fields;
};

NamedFields fieldsOfRow(const text::CsvTable& table, const text::CsvRow& row) {
  NamedFields named;
  for (std::size_t i = 0; i < row.cells.size(); ++i) {
    if (row.cells[i].empty()) continue;
    if (table.header.cells[i] == "name") {
      named.name = row.cells[i];
    } else {
      named.fields.emplace_back(table.header.cells[i], row.cells[i]);
    }
  }
  return named;
}

std::vector<std::string> split(const std::string& list, char separator) {
  std::vector<std::string> parts;
  for (std::size_t at = 0; at <= list.size();) {
    const std::size_t end = std::min(list.find(separator, at), list.size());
    const std::string_view part = text::trimmed(std::string_view(list).substr(at, end - at));
    if (!part.empty()) parts.emplace_back(part);
    at = end + 1;
  }
  return parts;
}

Checked<SubstanceDraft> draftOf(const NamedFields& named) {
  SubstanceDraft draft{.name = named.name};
  Faults faults;
  for (const auto& [field, typed] : named.fields) {
    if (field == "synonyms")
      draft.synonyms = split(typed, ';');
    else if (field == "formula")
      draft.formula = typed;
    else if (field == "smiles")
      draft.smiles = typed;
    else if (field == "cas")
      draft.cas = typed;
    else if (field == "molar_mass")
      draft.molarMass = typed;
    else if (field == "hazards")
      draft.hazards = split(typed, ' ');
    else if (field == "note")
      draft.note = typed;
    else
      note(faults, field, "this field is not known here",
           "known here are synonyms, formula, smiles, cas, molar_mass, hazards, note");
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return draft;
}

void placeAt(Faults& faults, const std::string& file, int line) {
  for (text::Fault& fault : faults) {
    fault.file = file;
    fault.line = line;
  }
}

}  // namespace

Checked<ShelfCard> readCard(Notebook& notebook, ShelfKind kind, const std::string& name,
                            const TypedFields& fields) {
  const ShelfKindInfo& info = shelfKind(kind);
  ShelfCard card{.kind = kind, .name = std::string(text::trimmed(name)), .fields = {}};
  Faults faults;
  if (card.name.empty())
    note(faults, "name", "the card has no name", "give the name you call it by");
  std::vector<std::string> known{"name"};
  if (info.ofSubstance) known.emplace_back("substance");
  for (const ShelfField& field : info.fields) known.emplace_back(field.name);
  bool substanceGiven = false;
  for (const auto& [name_, typed] : fields) {
    if (info.ofSubstance && name_ == "substance") {
      substanceGiven = true;
      const auto n = substanceNumber(notebook, typed);
      if (n) {
        card.substance = *n;
      } else {
        faults.insert(faults.end(), n.error().begin(), n.error().end());
      }
      continue;
    }
    const auto* field = std::ranges::find(info.fields, name_, &ShelfField::name).base();
    if (field == info.fields.data() + info.fields.size()) {
      const auto nearest = units::nearestName(name_, known);
      note(faults, name_, fmt::format("a {} has no such field", info.word),
           nearest ? fmt::format("did you mean {}?", *nearest)
                   : fmt::format("its fields are {}", fmt::join(known, ", ")));
    } else if (auto value = readField(*field, typed, faults)) {
      card.fields[name_] = *std::move(value);
    }
  }
  const auto given = [&fields](std::string_view field) {
    return std::ranges::any_of(fields, [field](const auto& entry) { return entry.first == field; });
  };
  if (info.ofSubstance && !substanceGiven)
    note(faults, "substance", "this is missing", "name the substance it is of");
  for (const ShelfField& field : info.fields) {
    if (field.required && !given(field.name)) {
      note(faults, field.name, "this is missing",
           fmt::format("give it, such as \"{} {}\"", 1, field.shownUnit));
    }
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return card;
}

Checked<ShelfCard> addShelfCard(const Desk& desk, ShelfKind kind, const std::string& name,
                                const TypedFields& fields) {
  auto card = readCard(desk.notebook, kind, name, fields);
  if (!card) return card;
  const auto done =
      desk.notebook.act(desk.action("shelf add"), [&](Writing& writing) -> Checked<void> {
        const auto n = writing.addCard(*card);
        if (!n) return std::unexpected(n.error());
        card->n = *n;
        card->version = 1;
        return {};
      });
  if (!done) return std::unexpected(done.error());
  return card;
}

std::string shownField(const ShelfCard& card, const ShelfField& field) {
  const auto found = card.fields.find(std::string(field.name));
  if (found == card.fields.end()) return {};
  if (const auto* content = std::get_if<std::string>(&found->second)) return *content;
  const std::string number = fmt::format("{:.6g}", std::get<double>(found->second));
  return field.shownUnit.empty() ? number : fmt::format("{} {}", number, field.shownUnit);
}

Checked<ShelfImport> importShelf(const Desk& desk, std::string_view kindWord,
                                 std::string_view bytes, const std::string& file) {
  const bool substances = kindWord == "substance" || kindWord == "substances";
  const ShelfKindInfo* info = findShelfKind(kindWord);
  if (!substances && info == nullptr) {
    return askedFault("--as", fmt::format("{} is no kind of card", text::quoted(kindWord)),
                      "choose substance, lot, stock, vial, lamp, balance or pipette");
  }
  const auto table = text::readCsv(bytes, file);
  if (!table) return std::unexpected(table.error());
  ShelfImport result;
  Faults faults;
  std::vector<SubstanceRecord> newSubstances;
  std::vector<ShelfCard> newCards;
  for (const text::CsvRow& row : table->rows) {
    const NamedFields named = fieldsOfRow(*table, row);
    Faults here;
    if (substances) {
      const auto draft = draftOf(named);
      auto record = draft ? describeSubstance(*draft) : std::unexpected(draft.error());
      const auto match =
          record ? matchSubstance(desk.notebook, *record) : std::unexpected(record.error());
      if (!match) {
        here = match.error();
      } else if (!match->same.empty()) {
        ++result.known;
      } else {
        newSubstances.push_back(*std::move(record));
      }
    } else {
      auto card = readCard(desk.notebook, info->kind, named.name, named.fields);
      const auto present = desk.notebook.findCard(info->kind, named.name);
      if (!present) return std::unexpected(present.error());
      if (!card) {
        here = card.error();
      } else if (*present) {
        ++result.known;
      } else {
        newCards.push_back(*std::move(card));
      }
    }
    placeAt(here, file, row.line);
    faults.insert(faults.end(), here.begin(), here.end());
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  const auto done =
      desk.notebook.act(desk.action("shelf import"), [&](Writing& writing) -> Checked<void> {
        for (const SubstanceRecord& substance : newSubstances) {
          if (const auto n = writing.addSubstance(substance); !n) return std::unexpected(n.error());
          ++result.added;
        }
        for (const ShelfCard& card : newCards) {
          if (const auto n = writing.addCard(card); !n) return std::unexpected(n.error());
          ++result.added;
        }
        return {};
      });
  if (!done) return std::unexpected(done.error());
  return result;
}

}  // namespace vialkeeper::app
