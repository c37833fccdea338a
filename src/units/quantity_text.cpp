// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "units/quantity_text.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <charconv>
#include <cmath>
#include <span>
#include <string>

#include "text/utf8.h"

namespace vialkeeper::units {
namespace {

using text::textFault;
using text::TextFault;
using Kinds = std::span<const Kind>;

template <class T>
using Reading = std::expected<T, TextFault>;

bool isDigit(char c) { return c >= '0' && c <= '9'; }

bool isBlank(char c) { return c == ' ' || c == '\t'; }

/// A place in the text that is read from left to right.
struct Cursor {
  std::string_view text;
  std::size_t at = 0;

  bool atEnd() const { return at >= text.size(); }
  char peek() const { return atEnd() ? '\0' : text[at]; }
  void skipBlanks() {
    while (!atEnd() && isBlank(text[at])) ++at;
    // A no-break space, as word processors put before a unit.
    while (text.substr(at).starts_with("\u00A0") || text.substr(at).starts_with("\u202F")) {
      at += text.substr(at).starts_with("\u00A0") ? 2 : 3;
    }
  }
  std::size_t skipDigits() {
    const std::size_t begin = at;
    while (isDigit(peek())) ++at;
    return at - begin;
  }
  bool skip(char c) {
    if (peek() != c) return false;
    ++at;
    return true;
  }
};

std::string kindList(Kinds kinds) {
  std::string list;
  for (std::size_t i = 0; i < kinds.size(); ++i) {
    if (i > 0) list += i + 1 == kinds.size() ? " or " : ", ";
    list += nameOf(kinds[i]);
  }
  return list;
}

std::string unitAdvice(Kinds kinds, Dialect dialect) {
  if (kinds.empty()) return "write a number and its unit, for example 12.3 mg";
  std::string list;
  for (const Kind kind : kinds) {
    if (!list.empty()) list += ", ";
    list += unitsOf(kind, dialect);
  }
  return "write a number with one of the units " + list;
}

/// The exponent is taken only if digits follow, so that `1 e` fails at the `e` as a unit.
void skipExponent(Cursor& cursor) {
  const std::size_t before = cursor.at;
  if (!cursor.skip('e') && !cursor.skip('E')) return;
  if (!cursor.skip('+')) (void)cursor.skip('-');
  if (cursor.skipDigits() == 0) cursor.at = before;
}

Reading<void> checkSeparators(const Cursor& cursor, std::size_t begin, Dialect dialect) {
  const std::string_view number = cursor.text.substr(begin, cursor.at - begin);
  const char next = cursor.peek();
  if (next != ',' && next != '.') {
    if (number.find(',') == std::string_view::npos || dialect == Dialect::kPerson) return {};
  }
  const std::size_t comma = number.find(',');
  const bool second = next == ',' || next == '.';
  const bool commaFirst = comma != std::string_view::npos && (dialect == Dialect::kFile || !second);
  const std::size_t place = commaFirst ? begin + comma : cursor.at;
  if (dialect == Dialect::kFile && cursor.text[place] == ',') {
    return textFault(place, 1, "a comma in a number",
                     "write a decimal point and no group separators");
  }
  return textFault(place, 1, "a second decimal sign in one number",
                   "write one decimal sign and no group separators");
}

/// Reads digits with at most one decimal sign; the cursor then stands behind the number.
Reading<double> scanNumber(Cursor& cursor, Dialect dialect) {
  const std::size_t begin = cursor.at;
  const bool plainSign = cursor.skip('-') || cursor.skip('+');
  // U+2212, the minus sign proper.
  const bool typographicMinus = !plainSign && cursor.text.substr(cursor.at).starts_with("\u2212");
  if (typographicMinus) cursor.at += 3;
  std::size_t digits = cursor.skipDigits();
  if (cursor.peek() == '.' || cursor.peek() == ',') {
    ++cursor.at;
    digits += cursor.skipDigits();
  }
  if (digits == 0) {
    cursor.at = begin;
    return textFault(begin, cursor.text.size() - begin, "no number here",
                     "begin with a number, such as 12.3");
  }
  skipExponent(cursor);
  if (auto separators = checkSeparators(cursor, begin, dialect); !separators) {
    return std::unexpected(separators.error());
  }
  std::string plain(cursor.text.substr(begin, cursor.at - begin));
  std::ranges::replace(plain, ',', '.');
  if (plain.starts_with('+')) plain.erase(0, 1);
  if (typographicMinus) plain.replace(0, 3, "-");
  double value = 0.0;
  const auto [end, error] = std::from_chars(plain.data(), plain.data() + plain.size(), value);
  if (error != std::errc{} || end != plain.data() + plain.size() || !std::isfinite(value)) {
    return textFault(begin, cursor.at - begin,
                     fmt::format("the number {} cannot be held", text::quoted(plain)),
                     "write a number between 1e-300 and 1e300");
  }
  return value;
}

/// The table's unit that differs from `symbol` by case alone, for a hint.
std::string caseHint(std::string_view symbol, Kinds kinds, Dialect dialect) {
  for (const Unit& unit : allUnits()) {
    const bool wanted = kinds.empty() || std::ranges::find(kinds, unit.kind) != kinds.end();
    if (wanted && (dialect == Dialect::kPerson || !unit.peopleOnly) &&
        text::asciiLowered(unit.symbol) == text::asciiLowered(symbol)) {
      return fmt::format("did you mean {}? ", unit.symbol);
    }
  }
  return {};
}

/// The unit from the cursor up to the next blank that is followed by a digit, or the end.
Reading<const Unit*> scanUnit(Cursor& cursor, Kinds kinds, Dialect dialect) {
  cursor.skipBlanks();
  const std::size_t begin = cursor.at;
  while (!cursor.atEnd()) {
    Cursor ahead = cursor;
    ahead.skipBlanks();
    if (ahead.at > cursor.at && (ahead.atEnd() || isDigit(ahead.peek()))) break;
    ++cursor.at;
  }
  const std::string_view symbol = text::trimmed(cursor.text.substr(begin, cursor.at - begin));
  if (symbol.empty()) {
    return textFault(begin, 0, "the unit is missing", unitAdvice(kinds, dialect));
  }
  if (const Unit* unit = findUnit(symbol, dialect)) return unit;
  return textFault(begin, symbol.size(),
                   fmt::format("unit {} is not known here", text::quoted(symbol)),
                   caseHint(symbol, kinds, dialect) + unitAdvice(kinds, dialect));
}

bool isWanted(Kind kind, Kinds kinds) {
  return kinds.empty() || std::ranges::find(kinds, kind) != kinds.end();
}

Reading<ReadQuantity> scanQuantity(Cursor& cursor, Kinds kinds, Dialect dialect) {
  cursor.skipBlanks();
  const std::size_t begin = cursor.at;
  const auto number = scanNumber(cursor, dialect);
  if (!number) return std::unexpected(number.error());
  cursor.skipBlanks();
  const std::size_t unitAt = cursor.at;
  const auto unit = scanUnit(cursor, kinds, dialect);
  if (!unit) return std::unexpected(unit.error());
  if (!isWanted((*unit)->kind, kinds)) {
    return textFault(unitAt, text::trimmed(cursor.text.substr(unitAt, cursor.at - unitAt)).size(),
                     fmt::format("{} is {}, but {} is wanted", (*unit)->symbol,
                                 nameOf((*unit)->kind), kindList(kinds)),
                     unitAdvice(kinds, dialect));
  }
  const double si = *number * (*unit)->numerator / (*unit)->denominator + (*unit)->offset;
  if (!std::isfinite(si))
    return textFault(begin, cursor.at - begin, "a value too large to hold", "give a smaller one");
  return ReadQuantity{(*unit)->kind, si, *number, (*unit)->symbol};
}

Reading<ReadQuantity> readWhole(std::string_view text, Kinds kinds, Dialect dialect) {
  Cursor cursor{text};
  auto read = scanQuantity(cursor, kinds, dialect);
  cursor.skipBlanks();
  while (read && !cursor.atEnd()) {
    if (dialect != Dialect::kPerson || read->kind != Kind::kDuration) {
      return textFault(cursor.at, text.size() - cursor.at, "more follows after the quantity",
                       "give one number with one unit");
    }
    const std::size_t begin = cursor.at;
    const auto more = scanQuantity(cursor, kinds, dialect);
    if (!more) return more;
    if (more->kind != Kind::kDuration) {
      return textFault(begin, cursor.at - begin, "only time spans are added up",
                       "give one quantity");
    }
    read->si += more->si;
    cursor.skipBlanks();
  }
  return read;
}

Reading<ReadQuantity> checkRange(const ReadQuantity& read, std::string_view text, Range range) {
  const std::size_t begin = std::min(text.find_first_not_of(" \t"), text.size());
  const std::size_t length = text.size() - begin;
  if (read.kind == Kind::kTemperature) {
    if (read.si > 0.0) return read;
    return textFault(begin, length, "a temperature at or below absolute zero",
                     "give one above 0 K");
  }
  if (range == Range::kPositive && !(read.si > 0.0)) {
    return textFault(begin, length,
                     read.number < 0.0 ? "a negative value" : "zero, or too small to hold",
                     "give a value above zero");
  }
  if (range == Range::kNonNegative && read.si < 0.0) {
    return textFault(begin, length, "a negative value", "give zero or a value above");
  }
  return read;
}

}  // namespace

std::expected<double, TextFault> readNumber(std::string_view text, Dialect dialect) {
  Cursor cursor{text};
  cursor.skipBlanks();
  auto number = scanNumber(cursor, dialect);
  cursor.skipBlanks();
  if (number && !cursor.atEnd()) {
    return textFault(cursor.at, text.size() - cursor.at, "more follows after the number",
                     "give a bare number");
  }
  return number;
}

std::expected<ReadQuantity, TextFault> readAnyQuantity(std::string_view text, Dialect dialect) {
  return readWhole(text, {}, dialect);
}

std::expected<ReadQuantity, TextFault> readQuantityOf(std::initializer_list<Kind> kinds,
                                                      std::string_view text, Dialect dialect,
                                                      Range range) {
  const auto read = readWhole(text, Kinds(kinds.begin(), kinds.size()), dialect);
  return read ? checkRange(*read, text, range) : read;
}

std::expected<double, TextFault> readKelvinDifference(std::string_view text, Range range) {
  const auto read = readWhole(text, std::array{Kind::kTemperature}, Dialect::kFile);
  if (!read) return std::unexpected(read.error());
  if (read->symbol != "K") {
    return textFault(0, text.size(), "a difference of temperature is given in K",
                     "write for example 0.5 K");
  }
  if (read->number < 0.0 || (range == Range::kPositive && read->number == 0.0)) {
    return textFault(0, text.size(), "a difference that is not above zero",
                     "write for example 0.5 K");
  }
  return read->number;
}

}  // namespace vialkeeper::units
