// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <algorithm>

#include "app/notebook/substance_cards.h"

namespace vialkeeper::app {

Checked<SubstanceRecord> changeSubstanceCard(const Desk& desk, const SubstanceRecord& read,
                                             const SubstanceDraft& draft) {
  auto record = describeSubstance(draft);
  if (!record) return record;
  record->n = read.n;
  record->version = read.version;
  const auto match = matchSubstance(desk.notebook, *record);
  if (!match) return std::unexpected(match.error());
  const auto other = std::ranges::find_if(
      match->same, [&read](const SubstanceRecord& card) { return card.n != read.n; });
  if (other != match->same.end()) {
    return askedFault("name",
                      fmt::format("{} is on the shelf already, as {}", draft.name, other->name),
                      "keep one of the two cards");
  }
  const auto done = desk.notebook.act(desk.action("shelf change"), [&](Writing& writing) {
    return writing.changeSubstance(*record);
  });
  if (!done) return std::unexpected(done.error());
  return desk.notebook.substance(read.n);
}

SubstanceDraft draftOf(const SubstanceRecord& substance) {
  SubstanceDraft draft{.name = substance.name,
                       .synonyms = substance.synonyms,
                       .formula = substance.formula,
                       .smiles = substance.smiles,
                       .cas = substance.cas,
                       .molarMass = {},
                       .hazards = substance.hazards,
                       .note = substance.note};
  // Where the formula is known, the molar mass follows from it.
  if (draft.formula.empty() && draft.smiles.empty() && substance.molarMass_g_mol)
    draft.molarMass = fmt::format("{:.12g} g/mol", *substance.molarMass_g_mol);
  return draft;
}

}  // namespace vialkeeper::app
