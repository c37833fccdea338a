// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/find_completion.h"

#include <fmt/format.h>

#include <algorithm>
#include <initializer_list>
#include <optional>
#include <utility>

#include "app/notebook/find_language.h"
#include "app/notebook/fold_name.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

/// The term in which the cursor stands.
struct TermAtCursor {
  const FindField* field = nullptr;  ///< nullptr: no field is written before it
  std::string typed = {};            ///< of the value or word, up to the cursor
  TextRange value = {};              ///< all of it, also behind the cursor
  bool isQuoted = false;
};

/// The field and colon that begin here; the scanner then stands behind the blanks that follow them.
const FindField* skipField(FindScanner& scanner) {
  const std::string_view name = scanner.letters();
  FindScanner behind{scanner.text, scanner.at + name.size()};
  if (name.empty() || !behind.rest().starts_with(':')) return nullptr;
  const FindField* field = findField(name);
  if (field == nullptr) return nullptr;
  ++behind.at;
  behind.skipBlanks();
  scanner.at = behind.at;
  return field;
}

/// Reads term after term up to the one that holds the cursor; nothing where no word can stand.
std::optional<TermAtCursor> termAt(std::string_view text, std::size_t cursor) {
  FindScanner scanner{text};
  while (true) {
    scanner.skipBlanks();
    while (!scanner.atEnd() && (text[scanner.at] == '(' || text[scanner.at] == ')')) {
      ++scanner.at;
      scanner.skipBlanks();
    }
    if (scanner.at >= cursor) return TermAtCursor{.value = {cursor, 0}};
    const FindField* field = skipField(scanner);
    if (scanner.at > cursor) {
      // Before the value, within the blanks or the field's own name.
      const bool behindColon = text.substr(0, cursor).find_last_not_of(" \t:") != cursor - 1;
      return behindColon ? std::optional(TermAtCursor{.field = field, .value = {cursor, 0}})
                         : std::nullopt;
    }
    const std::size_t begin = scanner.at;
    const std::size_t mark = scanner.quoteLength();
    const auto value = scanner.value(true);
    if (scanner.at < cursor) {
      if (scanner.at == begin && !scanner.atEnd()) ++scanner.at;
      continue;
    }
    TermAtCursor term{.field = field, .value = {begin, scanner.at - begin}, .isQuoted = mark > 0};
    term.typed = text.substr(begin, cursor - begin);
    if (mark > 0)
      term.typed =
          cursor < begin + mark ? std::string() : FindScanner{term.typed}.value(true)->text;
    // Behind a finished quotation there is nothing left to complete.
    if (mark > 0 && value->isFinished && cursor == scanner.at) return std::nullopt;
    return term;
  }
}

/// How well a name meets what was typed, least is best; nothing if it does not.
std::optional<int> match(std::string_view folded, std::string_view name, std::string_view typed) {
  const std::size_t at = folded.find(typed);
  if (at == std::string_view::npos) return std::nullopt;
  if (at == 0) return folded.size() == typed.size() ? 0 : 1;
  // A word of the name begins so: fold what follows each of its separators.
  for (std::size_t i = 1; i < name.size(); ++i) {
    const char before = name[i - 1];
    const bool isSeparator =
        before == ' ' || before == '-' || before == '(' || before == ',' || before == ')';
    if (isSeparator && foldName(name.substr(i)).starts_with(typed)) return 2;
  }
  return 3;
}

struct Candidate {
  int rank;
  std::int64_t uses;
  const VocabularyEntry* entry;

  friend bool operator<(const Candidate& a, const Candidate& b) {
    const auto key = [](const Candidate& c) {
      return std::tuple(c.rank, -c.uses, c.entry->name.size(), std::string_view(c.entry->name));
    };
    return key(a) < key(b);
  }
};

/// The best entries, best first.
std::vector<const VocabularyEntry*> best(const std::vector<VocabularyEntry>& entries,
                                         std::string_view typed, std::size_t most) {
  std::vector<Candidate> candidates;
  for (const VocabularyEntry& entry : entries) {
    if (const auto rank = match(entry.folded, entry.name, typed))
      candidates.push_back({*rank, entry.uses, &entry});
  }
  const auto last =
      candidates.begin() + static_cast<std::ptrdiff_t>(std::min(candidates.size(), most));
  std::partial_sort(candidates.begin(), last, candidates.end());
  std::vector<const VocabularyEntry*> found;
  for (auto each = candidates.begin(); each != last; ++each) found.push_back(each->entry);
  return found;
}

std::vector<VocabularyEntry> states() {
  std::vector<VocabularyEntry> entries;
  for (int state = 0; state <= static_cast<int>(RunState::kSealed); ++state) {
    const std::string name(toText(static_cast<RunState>(state)));
    // In the order of a run's life.
    entries.push_back({name, static_cast<int>(RunState::kSealed) - state, foldName(name)});
  }
  return entries;
}

/// What may stand behind `field:`; nullptr where nothing can be proposed.
const std::vector<VocabularyEntry>* valuesOf(const FindField& field,
                                             const FindVocabulary& vocabulary) {
  static const std::vector<VocabularyEntry> kStates = states();
  if (field.kind == FindField::Kind::kRole) return &vocabulary.substances;
  if (field.kind != FindField::Kind::kText) return nullptr;
  using Field = TextFieldCondition::Field;
  switch (field.text) {
    case Field::kSeries:
      return &vocabulary.series;
    case Field::kPerson:
      return &vocabulary.people;
    case Field::kVial:
      return &vocabulary.vials;
    case Field::kLamp:
      return &vocabulary.lamps;
    case Field::kAtmosphere:
      return &vocabulary.atmospheres;
    case Field::kState:
      return &kStates;
    case Field::kCode:
      break;
  }
  return nullptr;
}

std::vector<Completion> fieldsFor(const TermAtCursor& term, std::size_t most) {
  std::vector<Completion> found;
  const std::string typed = text::asciiLowered(term.typed);
  for (const FindField& field : findFields()) {
    if (found.size() == most) break;
    if (!field.name.starts_with(typed)) continue;
    found.push_back({fmt::format("{}:", field.name), term.value,
                     fmt::format("{}: {}", field.name, field.meaning)});
  }
  return found;
}

}  // namespace

void prepareVocabulary(FindVocabulary& vocabulary) {
  for (auto* entries : {&vocabulary.substances, &vocabulary.series, &vocabulary.people,
                        &vocabulary.vials, &vocabulary.lamps, &vocabulary.atmospheres}) {
    for (VocabularyEntry& entry : *entries) entry.folded = foldName(entry.name);
  }
}

std::vector<Completion> completeFind(std::string_view text, std::size_t cursor,
                                     const FindVocabulary& vocabulary, std::size_t most) {
  if (cursor > text.size() || text.size() > 10'000 || text::firstInvalidUtf8(text)) return {};
  const auto term = termAt(text, cursor);
  if (!term) return {};
  const std::string typed = foldName(term->typed);
  std::vector<Completion> found;
  if (term->field != nullptr) {
    const auto* values = valuesOf(*term->field, vocabulary);
    if (values == nullptr) return {};
    for (const VocabularyEntry* entry : best(*values, typed, most)) {
      found.push_back({asFindValue(entry->name) + " ", term->value, entry->name});
    }
    return found;
  }
  if (!term->isQuoted) found = fieldsFor(*term, most);
  // One letter is in too many names to be of help.
  if (typed.size() < 2 || found.size() >= most) return found;
  for (const VocabularyEntry* entry : best(vocabulary.substances, typed, most - found.size())) {
    found.push_back({fmt::format("any:{} ", asFindValue(entry->name)), term->value,
                     fmt::format("{}, in any role", entry->name)});
  }
  return found;
}

}  // namespace vialkeeper::app
