// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include "app/notebook/shelf_cards.h"
#include "app/notebook/substance_cards.h"

namespace vialkeeper::app {
namespace {

/// The name by which the card's substance is found again, else its CAS number.
std::string nameOfSubstance(Notebook& notebook, RowNumber n) {
  const auto substance = notebook.substance(n);
  if (!substance) return {};
  const auto match = lookUpSubstance(notebook, substance->name);
  const bool alone = match && match->same.size() == 1;
  return alone || substance->cas.empty() ? substance->name : substance->cas;
}

/// As typed it is read back to the value that the card has.
std::string typedValue(const ShelfField& field, const FieldValue& value) {
  if (const auto* content = std::get_if<std::string>(&value)) return *content;
  const std::string number = fmt::format("{:.12g}", std::get<double>(value));
  return field.shownUnit.empty() ? number : fmt::format("{} {}", number, field.shownUnit);
}

}  // namespace

Checked<ShelfCard> changeShelfCard(const Desk& desk, const ShelfCard& read, const std::string& name,
                                   const TypedFields& fields) {
  auto card = readCard(desk.notebook, read.kind, name, fields);
  if (!card) return card;
  const auto present = desk.notebook.findCard(read.kind, card->name);
  if (!present) return std::unexpected(present.error());
  if (*present && (*present)->n != read.n) {
    return askedFault(
        "name",
        fmt::format("there is a {} called {} already", shelfKind(read.kind).word, card->name),
        "choose another name");
  }
  card->n = read.n;
  card->version = read.version;
  const auto done = desk.notebook.act(desk.action("shelf change"),
                                      [&](Writing& writing) { return writing.changeCard(*card); });
  if (!done) return std::unexpected(done.error());
  auto changed = desk.notebook.findCard(read.kind, card->name);
  if (!changed) return std::unexpected(changed.error());
  if (*changed) return **std::move(changed);
  return card;
}

TypedFields typedFields(Notebook& notebook, const ShelfCard& card) {
  TypedFields fields;
  const ShelfKindInfo& info = shelfKind(card.kind);
  if (info.ofSubstance) {
    if (std::string name = nameOfSubstance(notebook, card.substance); !name.empty())
      fields.emplace_back("substance", std::move(name));
  }
  for (const ShelfField& field : info.fields) {
    const auto found = card.fields.find(std::string(field.name));
    if (found == card.fields.end()) continue;
    std::string typed = typedValue(field, found->second);
    if (!typed.empty()) fields.emplace_back(field.name, std::move(typed));
  }
  return fields;
}

}  // namespace vialkeeper::app
