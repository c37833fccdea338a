// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <cstdint>
#include <string>
#include <string_view>
#include <vector>

#include "app/notebook/find_scan.h"

/// What the filter line proposes while a search is typed.
namespace vialkeeper::app {

/// Something the notebook holds, by name.
struct VocabularyEntry {
  std::string name;
  std::int64_t uses = 0;    ///< runs that hold it: what is used more is proposed first
  std::string folded = {};  ///< filled by prepareVocabulary
};

/// What a notebook holds, to complete from.
struct FindVocabulary {
  std::vector<VocabularyEntry> substances;  ///< names and synonyms
  std::vector<VocabularyEntry> series;
  std::vector<VocabularyEntry> people;  ///< initials
  std::vector<VocabularyEntry> vials;
  std::vector<VocabularyEntry> lamps;
  std::vector<VocabularyEntry> atmospheres;
};

/// Folds every name once, so that each keystroke only compares.
void prepareVocabulary(FindVocabulary& vocabulary);

struct Completion {
  std::string insert;  ///< replaces `replace`; a value is followed by a blank, a field by its `:`
  TextRange replace;   ///< bytes of the text
  std::string label;   ///< for the list: `pivalic acid`, `additive: a substance in this role`
};

/// Proposals for the word that the cursor, a byte's place in the text, stands in or behind: values
/// behind `field:`; else fields, and substances in any role. Names that begin with what is typed
/// come before those of which a word begins so, and these before those that hold it; then what is
/// used more, then shorter names. The vocabulary must be prepared. Cost: one comparison with each
/// name of one kind.
[[nodiscard]] std::vector<Completion> completeFind(std::string_view text, std::size_t cursor,
                                                   const FindVocabulary& vocabulary,
                                                   std::size_t most = 12);

}  // namespace vialkeeper::app
