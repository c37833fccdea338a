// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "app/notebook/desk.h"
#include "app/notebook/shelf_fields.h"

namespace vialkeeper::app {

/// Fields as a person types them: `{"volume", "11.6 mL"}`.
using TypedFields = std::vector<std::pair<std::string, std::string>>;

/// Reads a card of one kind. Faults, together: an unknown field, a required one that is missing, a
/// quantity of the wrong kind, a substance that is not on the shelf.
[[nodiscard]] Checked<ShelfCard> readCard(Notebook& notebook, ShelfKind kind,
                                          const std::string& name, const TypedFields& fields);

/// Puts a card on the shelf. Fault: its name is taken.
[[nodiscard]] Checked<ShelfCard> addShelfCard(const Desk& desk, ShelfKind kind,
                                              const std::string& name, const TypedFields& fields);

/// One field of a card as it is shown, with its unit; empty where it is not given.
[[nodiscard]] std::string shownField(const ShelfCard& card, const ShelfField& field);

/// What an import of a table brought.
struct ShelfImport {
  int added = 0;
  int known = 0;  ///< were on the shelf already and are left as they are
};

/// Imports cards from CSV: the columns are `name` and the kind's fields (for substances `name`,
/// `synonyms` separated by semicolons, `formula`, `smiles`, `cas`, `molar_mass`, `hazards`,
/// `note`). All of the file's faults are told at once, and nothing is written then.
[[nodiscard]] Checked<ShelfImport> importShelf(const Desk& desk, std::string_view kindWord,
                                               std::string_view bytes, const std::string& file);

/// Changes a card as it was read (its version is checked): `fields` are all of its fields as typed,
/// what is left out is cleared. Faults as readCard's; a name that another card has.
[[nodiscard]] Checked<ShelfCard> changeShelfCard(const Desk& desk, const ShelfCard& read,
                                                 const std::string& name,
                                                 const TypedFields& fields);

/// The fields of a card as a person would type them, for a form.
[[nodiscard]] TypedFields typedFields(Notebook& notebook, const ShelfCard& card);

/// Imports substances from an SD file (records of MDL molfile V2000 or V3000 with data items): the
/// name from the first line or a data item NAME, CAS number and synonyms from items of that name.
/// All faults at once, with their record's number, and nothing is written then.
[[nodiscard]] Checked<ShelfImport> importSubstancesFromSdf(const Desk& desk, std::string_view bytes,
                                                           const std::string& file);

}  // namespace vialkeeper::app
