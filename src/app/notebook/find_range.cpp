// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/find_range.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <limits>
#include <string>

#include "text/utf8.h"
#include "units/quantity_text.h"
#include "units/unit_table.h"

namespace vialkeeper::app {
namespace {

using text::textFault;
using text::TextFault;
using units::Kind;

template <class T>
using Reading = std::expected<T, TextFault>;

bool isDigit(char c) { return c >= '0' && c <= '9'; }

std::string_view dash(const FindScanner& scanner) {
  for (const std::string_view dash :
       {"-", "\u2010", "\u2011", "\u2012", "\u2013", "\u2014", "\u2212"}) {
    if (scanner.rest().starts_with(dash)) return dash;
  }
  return {};
}

/// One end of a range as it stands in the text.
struct WrittenEnd {
  TextRange number = {};
  std::string_view unit = {};  ///< known or not; empty where none stands there
  std::size_t unitAt = 0;
  const units::Unit* known = nullptr;
  bool unitTouches = false;   ///< no blank between number and unit
  TextRange lastNumber = {};  ///< of a time span that is added up
  const units::Unit* lastUnit = nullptr;
  std::size_t end = 0;

  bool isThere() const { return number.length > 0; }
};

std::size_t digitsFrom(std::string_view text, std::size_t at) {
  const std::size_t begin = at;
  while (at < text.size() && isDigit(text[at])) ++at;
  return at - begin;
}

/// Length of the number here: a sign, digits, one decimal sign that is not the first of `..`, an
/// exponent.
std::size_t numberLength(const FindScanner& scanner) {
  const std::string_view text = scanner.text;
  std::size_t at = scanner.at;
  for (const std::string_view sign : {"-", "+", "\u2212"}) {
    if (text.substr(at).starts_with(sign)) {
      at += sign.size();
      break;
    }
  }
  std::size_t digits = digitsFrom(text, at);
  at += digits;
  if (at < text.size() && (text[at] == '.' || text[at] == ',') && digitsFrom(text, at + 1) > 0) {
    digits += digitsFrom(text, at + 1);
    at += 1 + digitsFrom(text, at + 1);
  }
  if (digits == 0) return 0;
  if (at < text.size() && (text[at] == 'e' || text[at] == 'E')) {
    const std::size_t sign =
        at + 1 < text.size() && (text[at + 1] == '-' || text[at + 1] == '+') ? 1 : 0;
    if (const std::size_t power = digitsFrom(text, at + 1 + sign)) at += 1 + sign + power;
  }
  return at - scanner.at;
}

/// The text up to a blank, `..` or a parenthesis that closes; `mol %` is one unit.
std::string_view unitText(const FindScanner& scanner) {
  FindScanner ahead = scanner;
  if (ahead.rest().starts_with("mol")) {
    FindScanner percent{ahead.text, ahead.at + 3};
    percent.skipBlanks();
    if (percent.rest().starts_with('%'))
      return ahead.text.substr(ahead.at, percent.at + 1 - ahead.at);
  }
  while (!ahead.atBoundary() && !ahead.rest().starts_with("..")) ++ahead.at;
  return scanner.text.substr(scanner.at, ahead.at - scanner.at);
}

const units::Unit* knownUnit(std::string_view written) {
  const bool isSpacedMolPercent =
      written.starts_with("mol") && written.ends_with('%') && written != "mol-%";
  return units::findUnit(isSpacedMolPercent ? "mol%" : written, units::Dialect::kPerson);
}

WrittenEnd scanEnd(const FindScanner& scanner) {
  WrittenEnd end{.number = {scanner.at, numberLength(scanner)}};
  end.lastNumber = end.number;
  end.end = scanner.at + end.number.length;
  if (!end.isThere()) return end;
  FindScanner behind{scanner.text, end.end};
  behind.skipBlanks();
  end.unitTouches = behind.at == end.end;
  end.unitAt = behind.at;
  end.unit = unitText(behind);
  end.known = knownUnit(end.unit);
  if (end.known == nullptr) return end;
  end.lastUnit = end.known;
  end.end = behind.at + end.unit.size();
  // `1 h 20 min`: more of the same span.
  if (end.known->kind == Kind::kDuration) {
    FindScanner more{scanner.text, end.end};
    more.skipBlanks();
    if (!more.atEnd() && isDigit(more.text[more.at])) {
      const WrittenEnd next = scanEnd(more);
      if (next.known != nullptr && next.known->kind == Kind::kDuration) {
        end.unit = scanner.text.substr(end.unitAt, next.end - end.unitAt);
        end.lastNumber = next.lastNumber;
        end.lastUnit = next.lastUnit;
        end.end = next.end;
      }
    }
  }
  return end;
}

/// A number and unit understood.
struct ReadEnd {
  Kind kind;
  double si;
  double tolerance;  ///< how far to either side a lone value reaches
  double rounding;   ///< within which computed values count as the same
};

/// Half a unit of the last digit written, as a number.
double halfDigit(std::string_view number) {
  const std::size_t mantissa = std::min(number.find_first_of("eE"), number.size());
  const std::size_t point = std::min(number.find_first_of(".,"), mantissa);
  const double places = point == mantissa ? 0.0 : static_cast<double>(mantissa - point - 1);
  const double power =
      mantissa == number.size()
          ? 1.0
          : units::readNumber("1" + std::string(number.substr(mantissa)), units::Dialect::kPerson)
                .value_or(1.0);
  return 0.5 * std::pow(10.0, -places) * power;
}

/// The fault of a text that was put together from number and unit, moved to where these stand.
std::unexpected<TextFault> placed(TextFault fault, const WrittenEnd& end, const RangeForm& form) {
  const bool inUnit = fault.offset > end.number.length && !end.unit.empty();
  const TextRange place = inUnit ? TextRange{end.unitAt, end.unit.size()} : end.number;
  return textFault(place.offset, place.length, std::move(fault.what),
                   fmt::format("write for example {}", form.example));
}

/// Understands one end; `unit` may have been written at the other.
Reading<ReadEnd> readEnd(std::string_view text, const WrittenEnd& end, std::string_view unit,
                         const RangeForm& form) {
  const std::string_view number = text.substr(end.number.offset, end.number.length);
  if (unit.empty()) {
    return textFault(end.number.offset + end.number.length, 0, "the unit is missing",
                     fmt::format("write for example {}", form.example));
  }
  const bool isSpaced =
      unit.starts_with("mol") && knownUnit(unit) != nullptr && unit.ends_with('%');
  const std::string written = fmt::format("{} {}", number, isSpaced ? "mol%" : unit);
  const auto read = units::readAnyQuantity(written, units::Dialect::kPerson);
  if (!read) return placed(read.error(), end, form);
  if (std::ranges::find(form.kinds, read->kind) == form.kinds.end()) {
    return textFault(end.number.offset, end.end - end.number.offset,
                     fmt::format("{} is {}, which is not compared here", read->symbol,
                                 units::nameOf(read->kind)),
                     fmt::format("write for example {}", form.example));
  }
  if (!std::isfinite(read->si)) {
    return textFault(end.number.offset, end.number.length, "a value too large to hold",
                     "give a smaller one");
  }
  const units::Unit* last = end.lastUnit != nullptr ? end.lastUnit : knownUnit(unit);
  const double factor = last == nullptr ? 1.0 : last->numerator / last->denominator;
  // On the scale as written, for 5 % of 298 K is no small share of 25 °C.
  const double share = 0.05 * std::abs(read->kind == Kind::kTemperature ? read->number : read->si);
  const double digit =
      halfDigit(text.substr(end.lastNumber.offset, end.lastNumber.length)) * factor;
  return ReadEnd{read->kind, read->si, share > 0.0 ? std::min(digit, share) : digit,
                 1e-9 * std::abs(read->si)};
}

/// From coherent SI to the unit of the notebook's columns.
double inColumnUnit(Kind kind, double si) {
  switch (kind) {
    case Kind::kEquivalents:
      return si * 100.0;
    case Kind::kConcentration:
      return si / 1000.0;
    case Kind::kLength:
      return si * 1e9;
    case Kind::kTemperature:
      return si - 273.15;
    case Kind::kDuration:
      return si / 3600.0;
    case Kind::kVolume:
      return si * 1e6;
    case Kind::kAmount:
      return si * 1e3;
    default:
      return si;
  }
}

FoundRange inColumns(Kind kind, Interval si) {
  if (si.least) si.least = inColumnUnit(kind, *si.least);
  if (si.most) si.most = inColumnUnit(kind, *si.most);
  return {kind == Kind::kEquivalents ? Kind::kMolPercent : kind, si};
}

Interval compared(Comparison comparison, const ReadEnd& end) {
  // Even at zero an excluded end is excluded.
  const double step = std::max(end.rounding, std::numeric_limits<double>::min());
  switch (comparison) {
    case Comparison::kMore:
      return {end.si + step, std::nullopt};
    case Comparison::kAtLeast:
      return {end.si - end.rounding, std::nullopt};
    case Comparison::kLess:
      return {std::nullopt, end.si - step};
    case Comparison::kAtMost:
      return {std::nullopt, end.si + end.rounding};
    default:
      break;
  }
  const double reach = end.tolerance + end.rounding;
  return {end.si - reach, end.si + reach};
}

/// A dash between two numbers: `5-20 mol%`, which might be a name's beginning as well.
bool isDashedRange(std::string_view text, const WrittenEnd& end, bool needsUnit) {
  FindScanner behind{text, end.number.offset + end.number.length};
  behind.skipBlanks();
  const std::string_view sign = dash(behind);
  if (sign.empty()) return false;
  behind.at += sign.size();
  behind.skipBlanks();
  if (behind.atEnd() || !isDigit(text[behind.at])) return false;
  return !needsUnit || scanEnd(behind).known != nullptr;
}

std::unexpected<TextFault> runsBackwards(std::size_t begin, std::size_t end) {
  return textFault(begin, end - begin, "the range runs backwards", "write the smaller end first");
}

/// Which unit a lone end or the later end of a range is read with.
std::string_view unitFor(const WrittenEnd& end, std::string_view otherwise) {
  // What stands apart and is no unit is the next word, unless a unit must be here.
  const bool isAttempt =
      !end.unit.empty() && (end.unitTouches || end.known != nullptr || otherwise.empty());
  return isAttempt ? end.unit : otherwise;
}

/// A range whose unit is optional takes a unit of its own kind only: `yield>60 C` is followed by a
/// word.
void leaveForeignUnit(WrittenEnd& end, const RangeForm& form) {
  const bool isForeign =
      end.known != nullptr && std::ranges::find(form.kinds, end.known->kind) == form.kinds.end();
  if (!isForeign || form.unitIfNone.empty() || end.unitTouches) return;
  end.unit = {};
  end.known = nullptr;
  end.lastUnit = nullptr;
  end.end = end.number.offset + end.number.length;
}

/// Where reading went on to: behind the unit, if one was taken.
std::size_t endOf(const WrittenEnd& end, std::string_view unit) {
  return unit.data() == end.unit.data() && !unit.empty() ? end.unitAt + unit.size() : end.end;
}

/// A range of which at least one end is there; the scanner stands behind the dots.
Reading<FoundRange> readBetween(FindScanner& scanner, const WrittenEnd& first, std::size_t begin,
                                const RangeForm& form) {
  WrittenEnd second = scanEnd(scanner);
  leaveForeignUnit(second, form);
  const std::string_view inherited = first.known != nullptr ? first.unit : form.unitIfNone;
  // `5.. mol%`: the unit of an end that is left out.
  const std::string_view alone = unitText(scanner);
  const bool standsAlone = !second.isThere() && knownUnit(alone) != nullptr;
  const std::string_view unit = second.isThere() ? unitFor(second, inherited)
                                : standsAlone    ? alone
                                                 : inherited;
  if (second.isThere()) scanner.at = endOf(second, unit);
  if (standsAlone) scanner.at += alone.size();
  Interval si;
  std::optional<Kind> kind;
  for (const bool isFirst : {true, false}) {
    const WrittenEnd& end = isFirst ? first : second;
    if (!end.isThere()) continue;
    const auto read =
        readEnd(scanner.text, end, isFirst && !first.unit.empty() ? first.unit : unit, form);
    if (!read) return std::unexpected(read.error());
    if (kind && *kind != read->kind) {
      return textFault(begin, scanner.at - begin, "the two ends are not of one kind",
                       "give both in the same unit");
    }
    kind = read->kind;
    (isFirst ? si.least : si.most) =
        isFirst ? read->si - read->rounding : read->si + read->rounding;
  }
  if (si.least && si.most && *si.least > *si.most) return runsBackwards(begin, scanner.at);
  return inColumns(*kind, si);
}

Reading<FoundRange> readLone(FindScanner& scanner, WrittenEnd end, Comparison comparison,
                             const RangeForm& form) {
  leaveForeignUnit(end, form);
  const std::string_view unit = unitFor(end, form.unitIfNone);
  const auto read = readEnd(scanner.text, end, unit, form);
  if (!read) return std::unexpected(read.error());
  scanner.at = endOf(end, unit);
  return inColumns(read->kind, compared(comparison, *read));
}

/// A range or comparison that has to be here: `first` is what stands behind the sign of comparison.
Reading<FoundRange> readRange(FindScanner& scanner, const WrittenEnd& first, Comparison comparison,
                              std::size_t begin, const RangeForm& form) {
  FindScanner behind{scanner.text,
                     first.known == nullptr && !first.unit.empty() && first.unitTouches
                         ? first.unitAt + first.unit.size()
                         : first.end};
  const bool isRange = behind.skipDots();
  const bool holdsNumber = first.isThere() || (isRange && numberLength(behind) > 0);
  if (!holdsNumber) {
    return textFault(begin, scanner.at - begin, "no number follows",
                     fmt::format("write for example {}", form.example));
  }
  if (isRange && comparison != Comparison::kNone && comparison != Comparison::kEqual) {
    return textFault(begin, behind.at - begin, "a comparison and a range at once",
                     fmt::format("write for example {}", form.example));
  }
  if (isRange) scanner = behind;
  auto read = isRange ? readBetween(scanner, first, begin, form)
                      : readLone(scanner, first, comparison, form);
  if (read && !scanner.standsApart()) {
    return textFault(scanner.at, scanner.text.size() - scanner.at, "more follows after the value",
                     fmt::format("write for example {}, then a blank", form.example));
  }
  return read;
}

}  // namespace

ScanResult<FoundRange> scanRange(FindScanner& scanner, const RangeForm& form) {
  const FindScanner before = scanner;
  scanner.skipBlanks();
  const std::size_t begin = scanner.at;
  const Comparison comparison = scanner.comparison();
  const WrittenEnd first = scanEnd(scanner);
  const bool mayBeOther = form.mayBeAbsent && comparison == Comparison::kNone;
  if (first.isThere() && isDashedRange(scanner.text, first, mayBeOther)) {
    return textFault(begin, first.end - begin, "a range is written with two dots",
                     fmt::format("write for example {}", form.example));
  }
  if (mayBeOther && first.known == nullptr) {
    FindScanner dots{scanner.text, first.end};
    const bool isRange =
        dots.skipDots() && (numberLength(dots) > 0 || (first.isThere() && dots.atBoundary()) ||
                            knownUnit(unitText(dots)) != nullptr);
    if (!isRange || (!first.isThere() && numberLength(dots) == 0)) {
      scanner = before;
      return std::nullopt;
    }
  }
  const auto read = readRange(scanner, first, comparison, begin, form);
  if (!read) return std::unexpected(read.error());
  return *read;
}

std::optional<TextRange> strayLoading(const FindScanner& scanner) {
  FindScanner behind = scanner;
  const bool isCompared = behind.comparison() != Comparison::kNone;
  const WrittenEnd first = scanEnd(behind);
  behind.at = first.end;
  bool isBetween = behind.skipDots();
  if (!isBetween && first.isThere()) {
    behind.skipBlanks();
    const std::size_t sign = dash(behind).size();
    behind.at += sign;
    behind.skipBlanks();
    isBetween = sign > 0 && !behind.atEnd() && isDigit(behind.text[behind.at]);
  }
  if (!isCompared && !isBetween) return std::nullopt;
  const WrittenEnd last = isBetween ? scanEnd(behind) : first;
  const units::Unit* unit = last.known != nullptr ? last.known : first.known;
  const std::vector<Kind> kinds = loadingRange().kinds;
  if (unit == nullptr || std::ranges::find(kinds, unit->kind) == kinds.end()) return std::nullopt;
  return TextRange{scanner.at, std::max(first.end, last.end) - scanner.at};
}

bool endsWithinRange(FindScanner scanner) {
  while (true) {
    scanner.skipBlanks();
    if (scanner.atEnd()) return true;
    const std::size_t before = scanner.at;
    (void)scanner.comparison();
    (void)scanner.skipDots();
    scanner.at += numberLength(scanner);
    scanner.skipBlanks();
    const std::string_view unit = unitText(scanner);
    if (knownUnit(unit) != nullptr) scanner.at += unit.size();
    if (scanner.at > before) continue;
    // A word, which may be the beginning of a unit if nothing follows.
    while (!scanner.atBoundary()) ++scanner.at;
    return scanner.atEnd();
  }
}

}  // namespace vialkeeper::app
