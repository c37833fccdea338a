// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>
#include <cctype>
#include <map>
#include <optional>
#include <tuple>

#include "app/notebook/fold_name.h"
#include "app/notebook/substance_cards.h"
#include "chem/structure.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

/// How well a card meets what was typed, least is best.
struct Rank {
  int how = 0;  ///< 0 begins so, 1 the structure, 2 a word begins so, 3 holds it
  std::string name;

  friend bool operator<(const Rank& a, const Rank& b) {
    return std::tuple(a.how, a.name.size(), std::string_view(a.name)) <
           std::tuple(b.how, b.name.size(), std::string_view(b.name));
  }
};

/// Between words; a hyphen does not count where names are compared, but it does end a word.
bool isSeparator(char c) {
  return c == ' ' || c == '-' || c == '(' || c == ')' || c == ',' || c == '[' || c == ']';
}

std::optional<int> match(const std::string& name, const std::string& wanted) {
  const std::string folded = foldName(name);
  const std::size_t at = folded.find(wanted);
  if (at == std::string::npos) return std::nullopt;
  if (at == 0) return 0;
  for (std::size_t i = 1; i < name.size(); ++i) {
    if (isSeparator(name[i - 1]) && foldName(std::string_view(name).substr(i)).starts_with(wanted))
      return 2;
  }
  return 3;
}

/// As typed the figures and hyphens of a CAS number may begin.
bool mayBeCas(std::string_view typed) {
  return std::ranges::all_of(typed, [](char c) { return (c >= '0' && c <= '9') || c == '-'; }) &&
         typed.front() != '-';
}

class Suggester {
 public:
  Suggester(Notebook& notebook, std::string_view typed)
      : m_notebook(notebook), m_typed(typed), m_wanted(foldName(typed)) {}

  Checked<std::vector<SubstanceRecord>> best(std::size_t most) {
    if (const auto done = rankNames(); !done) return std::unexpected(done.error());
    if (const auto done = rankCas(); !done) return std::unexpected(done.error());
    if (const auto done = rankStructure(); !done) return std::unexpected(done.error());
    std::vector<std::pair<Rank, RowNumber>> ordered;
    for (const auto& [n, rank] : m_ranks) ordered.emplace_back(rank, n);
    std::ranges::sort(ordered);
    std::vector<SubstanceRecord> found;
    for (const auto& [rank, n] : ordered) {
      if (found.size() == most) break;
      auto card = m_notebook.substance(n);
      if (!card) return std::unexpected(card.error());
      found.push_back(*std::move(card));
    }
    return found;
  }

 private:
  void take(RowNumber n, Rank rank) {
    const auto [place, isNew] = m_ranks.try_emplace(n, rank);
    if (!isNew && rank < place->second) place->second = std::move(rank);
  }

  Checked<void> rankNames() {
    if (m_wanted.empty()) return {};
    const auto names = m_notebook.substanceNames();
    if (!names) return std::unexpected(names.error());
    for (const auto& [name, n] : *names) {
      if (const auto how = match(name, m_wanted)) take(n, {*how, name});
    }
    return {};
  }

  Checked<void> rankCas() {
    if (!mayBeCas(m_typed)) return {};
    const auto cards = m_notebook.substances();
    if (!cards) return std::unexpected(cards.error());
    for (const SubstanceRecord& card : *cards) {
      const std::size_t at = card.cas.find(m_typed);
      if (!card.cas.empty() && at != std::string::npos) take(card.n, {at == 0 ? 0 : 3, card.name});
    }
    return {};
  }

  /// Only for what begins no name, so that nobody waits for the structure module at each letter.
  Checked<void> rankStructure() {
    const bool begun =
        std::ranges::any_of(m_ranks, [](const auto& entry) { return entry.second.how == 0; });
    if (begun || m_typed.find(' ') != std::string_view::npos) return {};
    const auto engine = chem::structureEngine();
    if (!engine) return {};
    const auto structure = (*engine)->read(m_typed);
    if (!structure) return {};
    const auto card = m_notebook.substanceByStructure(structure->canonicalSmiles);
    if (!card) return std::unexpected(card.error());
    if (*card) take((*card)->n, {1, (*card)->name});
    return {};
  }

  Notebook& m_notebook;
  std::string_view m_typed;
  std::string m_wanted;
  std::map<RowNumber, Rank> m_ranks;
};

}  // namespace

Checked<std::vector<SubstanceRecord>> suggestSubstances(Notebook& notebook, std::string_view typed,
                                                        std::size_t most) {
  const std::string_view wanted = text::trimmed(typed);
  if (wanted.empty() || text::firstInvalidUtf8(wanted)) return std::vector<SubstanceRecord>{};
  return Suggester(notebook, wanted).best(most);
}

}  // namespace vialkeeper::app
