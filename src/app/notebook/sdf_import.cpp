// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "app/notebook/shelf_cards.h"
#include "app/notebook/substance_cards.h"
#include "chem/sd_file.h"
#include "chem/structure.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

using text::Faults;

constexpr auto kCasItems =
    std::to_array<std::string_view>({"CAS", "CAS number", "CAS no", "CASRN"});
constexpr auto kSynonymItems = std::to_array<std::string_view>({"synonyms", "synonym"});

template <std::size_t count>
std::string itemOf(const chem::SdRecord& record, const std::array<std::string_view, count>& names) {
  for (const std::string_view name : names) {
    if (const std::string_view value = record.item(name); !value.empty())
      return std::string(text::trimmed(value));
  }
  return {};
}

/// Between semicolons or on lines of their own.
std::vector<std::string> namesIn(std::string_view list) {
  std::vector<std::string> names;
  while (!list.empty()) {
    const std::size_t end = std::min(list.find_first_of(";\n"), list.size());
    const std::string_view name = text::trimmed(list.substr(0, end));
    if (!name.empty()) names.emplace_back(name);
    list.remove_prefix(std::min(end + 1, list.size()));
  }
  return names;
}

Checked<SubstanceRecord> describe(const chem::SdRecord& record) {
  const auto engine = chem::structureEngine();
  const auto smiles =
      engine ? (*engine)->readMolfile(record.molfile) : std::unexpected(engine.error());
  SubstanceDraft draft{.name = std::string(text::trimmed(record.item("name"))),
                       .synonyms = namesIn(itemOf(record, kSynonymItems)),
                       .cas = itemOf(record, kCasItems)};
  if (draft.name.empty()) draft.name = record.title;
  if (smiles) draft.smiles = *smiles;
  auto described = describeSubstance(draft);
  if (smiles) return described;
  Faults faults;
  if (!described) faults = described.error();
  faults.push_back(
      {.field = "structure", .what = smiles.error().what, .mend = smiles.error().mend});
  return std::unexpected(std::move(faults));
}

bool isAmong(const std::vector<SubstanceRecord>& list, const SubstanceRecord& record) {
  return std::ranges::any_of(list, [&record](const SubstanceRecord& other) {
    return other.canonicalSmiles == record.canonicalSmiles;
  });
}

}  // namespace

Checked<ShelfImport> importSubstancesFromSdf(const Desk& desk, std::string_view bytes,
                                             const std::string& file) {
  const auto records = chem::readSdFile(bytes, file);
  if (!records) return std::unexpected(records.error());
  ShelfImport result;
  Faults faults;
  std::vector<SubstanceRecord> added;
  for (const chem::SdRecord& record : *records) {
    auto substance = describe(record);
    const auto match =
        substance ? matchSubstance(desk.notebook, *substance) : std::unexpected(substance.error());
    if (!match) {
      for (text::Fault fault : match.error()) {
        if (fault.kind == text::FaultKind::kNotebook) return std::unexpected(match.error());
        fault.field = fmt::format("record {}{}{}", record.number, fault.field.empty() ? "" : ".",
                                  fault.field);
        fault.file = file;
        fault.line = record.line;
        faults.push_back(std::move(fault));
      }
    } else if (!match->same.empty() || isAmong(added, *substance)) {
      ++result.known;
    } else {
      added.push_back(*std::move(substance));
    }
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  const auto done =
      desk.notebook.act(desk.action("shelf import"), [&](Writing& writing) -> Checked<void> {
        for (const SubstanceRecord& substance : added) {
          if (const auto n = writing.addSubstance(substance); !n) return std::unexpected(n.error());
          ++result.added;
        }
        return {};
      });
  if (!done) return std::unexpected(done.error());
  return result;
}

}  // namespace vialkeeper::app
