// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <expected>
#include <initializer_list>
#include <optional>
#include <string_view>
#include <vector>

#include "text/text_fault.h"
#include "units/quantity_text.h"
#include "units/unit_table.h"

/// A log line taken to pieces: numbers with their units, and words. Used by log_line alone.
namespace vialkeeper::app {

/// A unit as people spell it in a log, and what its spelling says of a pressure.
struct LogUnit {
  const units::Unit* unit = nullptr;
  std::string_view pressureKind;  ///< `gauge` of `barg`, `abs` of `psia`, else empty
};

/// A piece of the line, by byte offsets. A number has the word behind it as its unit, whether that
/// is known or not, unless it is a word of the log itself.
struct LogToken {
  bool isNumber = false;
  std::size_t begin = 0;
  std::size_t end = 0;
  std::size_t numberEnd = 0;  ///< numbers only, as are the next two
  std::size_t unitBegin = 0;
  std::size_t unitEnd = 0;      ///< equal to unitBegin where there is no unit
  std::optional<LogUnit> unit;  ///< where it is known

  [[nodiscard]] bool hasUnit() const { return unitEnd > unitBegin; }
  /// Whether the number stands alone: `21 drops`, not `2-propanol`.
  [[nodiscard]] bool standsFree() const {
    return isNumber && (!hasUnit() || unitBegin > numberEnd);
  }
  [[nodiscard]] std::string_view of(std::string_view line) const {
    return line.substr(begin, end - begin);
  }
};

struct LogTokens {
  std::vector<LogToken> tokens;
  std::string_view remark;  ///< behind the first semicolon, without blanks round it
  std::size_t end = 0;      ///< behind the last token, or where they would begin
};

/// Bytes of the blank at this place: space, tab, the no-break and thin spaces and what is invisible
/// beside them; 0 where there is none.
[[nodiscard]] std::size_t blankLength(std::string_view text, std::size_t at);

/// Where the next thing that is no blank begins.
[[nodiscard]] std::size_t skipBlanks(std::string_view text, std::size_t at);

/// The end of the line without blanks and line breaks.
[[nodiscard]] std::size_t trimmedEnd(std::string_view text);

/// End of the number that begins here, or `at` where none does.
[[nodiscard]] std::size_t numberEnd(std::string_view text, std::size_t at);

/// The pieces of a line from a place on.
[[nodiscard]] LogTokens logTokens(std::string_view line, std::size_t from);

/// The unit, with more spellings than the unit table: any case where only one unit can be meant and
/// no mega is written, `barg`, `bar(a)`, `oC`, `vol%`, a full stop behind.
[[nodiscard]] std::optional<LogUnit> logUnit(std::string_view symbol);

/// The quantity by the one reader of quantities; a fault points into the line.
[[nodiscard]] std::expected<units::ReadQuantity, text::TextFault> readToken(
    std::string_view line, const LogToken& token, std::initializer_list<units::Kind> kinds,
    units::Range range);

/// The number in a unit of the same kind, by integers of the unit table: `50 uL` is 50 µL exactly.
[[nodiscard]] double inUnit(const units::ReadQuantity& read, std::string_view target);

/// `H2`, `Ar`, … of a formula in any case, with subscripts, or a name; `air` too.
[[nodiscard]] std::optional<std::string_view> gasNamed(std::string_view word);

/// `gauge` or `abs` of one of the words for them.
[[nodiscard]] std::optional<std::string_view> pressureKindNamed(std::string_view word);

/// Words that join quantities and mean nothing by themselves: `at`, `with`, `T`.
[[nodiscard]] bool isJoint(std::string_view word);

}  // namespace vialkeeper::app
