// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <chrono>
#include <string>

#include "app/notebook/find_range.h"
#include "units/iso_time.h"

namespace vialkeeper::app {
namespace {

using text::textFault;
using text::TextFault;
using namespace std::chrono;

constexpr const char* kForm = "write 2026-03-04, 2026-03, 2026-03-01..2026-03-15 or >2026-03-01";

/// From the first to the last millisecond of a day, month or year.
struct Span {
  double first;
  double last;
};

double millisecondsAt(year_month_day day) {
  return static_cast<double>(duration_cast<milliseconds>(sys_days{day}.time_since_epoch()).count());
}

bool isDigit(char c) { return c >= '0' && c <= '9'; }

/// Length of `2026`, `2026-03` or `2026-03-04` here; 0 where none of these stands by itself.
std::size_t dateLength(const FindScanner& scanner) {
  const std::string_view here = scanner.rest();
  const auto digits = [&](std::size_t from, std::size_t count) {
    for (std::size_t i = from; i < from + count; ++i) {
      if (i >= here.size() || !isDigit(here[i])) return false;
    }
    return true;
  };
  if (!digits(0, 4)) return 0;
  std::size_t length = 4;
  while (length <= 7 && here.substr(length).starts_with('-') && digits(length + 1, 2)) length += 3;
  const FindScanner behind{scanner.text, scanner.at + length};
  return behind.atBoundary() || behind.rest().starts_with("..") ? length : 0;
}

std::expected<Span, TextFault> readSpan(FindScanner& scanner, std::size_t length) {
  std::string written(scanner.rest().substr(0, length));
  while (written.size() < 10) written += "-01";
  const auto first = units::readIsoDate(written);
  if (!first) return textFault(scanner.at, length, first.error().what, kForm);
  scanner.at += length;
  const year_month_day next = length == 4   ? *first + years{1}
                              : length == 7 ? *first + months{1}
                                            : year_month_day{sys_days{*first} + days{1}};
  return Span{millisecondsAt(*first), millisecondsAt(next) - 1.0};
}

Interval compared(Comparison comparison, const Span& span) {
  switch (comparison) {
    case Comparison::kMore:
      return {span.last + 1.0, std::nullopt};
    case Comparison::kAtLeast:
      return {span.first, std::nullopt};
    case Comparison::kLess:
      return {std::nullopt, span.first - 1.0};
    case Comparison::kAtMost:
      return {std::nullopt, span.last};
    default:
      return {span.first, span.last};
  }
}

}  // namespace

ScanResult<Interval> scanDates(FindScanner& scanner, bool mayBeAbsent) {
  const FindScanner before = scanner;
  scanner.skipBlanks();
  const std::size_t begin = scanner.at;
  const Comparison comparison = scanner.comparison();
  const std::size_t firstLength = dateLength(scanner);
  // A number of four digits alone is a word; a month or day is not.
  if (mayBeAbsent && firstLength <= 4) {
    scanner = before;
    return std::nullopt;
  }
  Interval interval;
  if (firstLength > 0) {
    const auto first = readSpan(scanner, firstLength);
    if (!first) return std::unexpected(first.error());
    interval = compared(comparison, *first);
  }
  const bool isRange = scanner.skipDots();
  const std::size_t secondLength = isRange ? dateLength(scanner) : 0;
  if (firstLength + secondLength == 0) {
    return textFault(begin, scanner.text.size() - begin, "no date follows", kForm);
  }
  if (isRange && comparison != Comparison::kNone && comparison != Comparison::kEqual) {
    return textFault(begin, scanner.at - begin, "a comparison and a range at once", kForm);
  }
  if (isRange) interval.most = std::nullopt;
  if (secondLength > 0) {
    const auto second = readSpan(scanner, secondLength);
    if (!second) return std::unexpected(second.error());
    interval.most = second->last;
    if (interval.least && *interval.least > second->last) {
      return textFault(begin, scanner.at - begin, "the range runs backwards",
                       "write the earlier day first");
    }
  }
  if (!scanner.standsApart()) {
    return textFault(scanner.at, scanner.text.size() - scanner.at, "more follows after the date",
                     kForm);
  }
  return interval;
}

}  // namespace vialkeeper::app
