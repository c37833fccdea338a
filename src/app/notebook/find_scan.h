// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <expected>
#include <string>
#include <string_view>

#include "text/text_fault.h"

/// The small parts of a search's text, from which the find language is put together.
namespace vialkeeper::app {

/// A stretch of the text, in bytes.
struct TextRange {
  std::size_t offset = 0;
  std::size_t length = 0;
};

/// A word or what stands between quotation marks.
struct FindValue {
  std::string text;       ///< without quotation marks and without the `*`
  bool isPrefix = false;  ///< a `*` follows
  bool isQuoted = false;
  bool isFinished = false;  ///< something follows, so that nobody is typing at its end
  TextRange place = {};
};

/// `>`, `>=`, `<`, `<=`, `=`.
enum class Comparison { kNone, kEqual, kMore, kAtLeast, kLess, kAtMost };

/// A place in the text, which must be valid UTF-8, that is read from left to right.
/// Controls and characters without a shape (NUL, bidirectional marks, zero widths) count as blanks.
struct FindScanner {
  std::string_view text;
  std::size_t at = 0;

  [[nodiscard]] bool atEnd() const { return at >= text.size(); }
  [[nodiscard]] std::string_view rest() const { return text.substr(at); }
  void skipBlanks();
  /// The text ends here, or a blank or closing parenthesis follows.
  [[nodiscard]] bool atBoundary() const;
  /// At a boundary, or just behind a blank.
  [[nodiscard]] bool standsApart() const;
  /// Length of the quotation mark here, straight or curled; 0 where there is none.
  [[nodiscard]] std::size_t quoteLength() const;
  /// The ASCII letters that begin here.
  [[nodiscard]] std::string_view letters() const;
  /// `and`, `or` or `not` in lower case if that word stands here by itself; else empty.
  [[nodiscard]] std::string_view keyword() const;
  /// Takes a sign of comparison and the blanks behind it, if one stands here.
  Comparison comparison();
  /// Takes the two dots of a range with the blanks around them; false, and nothing taken, without
  /// them.
  bool skipDots();
  /// Reads one value; a word goes up to a blank or to a closing parenthesis that it did not open.
  /// Fault: a quotation mark that is never closed, unless `mayBeUnclosed`.
  [[nodiscard]] std::expected<FindValue, text::TextFault> value(bool mayBeUnclosed);

 private:
  [[nodiscard]] std::size_t blankLength() const;
  [[nodiscard]] std::expected<FindValue, text::TextFault> quotedValue(bool mayBeUnclosed);
  void skipWord();
};

/// Whether the word holds a letter or digit, or may: marks alone are in no text's index.
[[nodiscard]] bool isSearchable(std::string_view word);

}  // namespace vialkeeper::app
