// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <optional>
#include <string_view>
#include <vector>

#include "app/notebook/find_query.h"
#include "app/notebook/find_scan.h"
#include "text/text_fault.h"
#include "units/quantity.h"

/// Ranges of numbers and of days within a search: `5..20 mol%`, `>60`, `2026-03-01..2026-03-15`.
namespace vialkeeper::app {

/// What may stand at a place.
struct RangeForm {
  std::vector<units::Kind> kinds;
  std::string_view unitIfNone;  ///< taken where none is written; empty: one must be written
  std::string_view example;     ///< `5..20 mol%`, for messages
  /// Text that is no range is left for others; a lone number then needs a unit, and a known one.
  bool mayBeAbsent = false;
};

struct FoundRange {
  units::Kind kind;  ///< never equivalents: they are given as mol%
  Interval
      interval;  ///< in the unit of the notebook's columns: mol%, mol/L, %, nm, °C, h, mL, mmol
};

template <class T>
using ScanResult = std::expected<std::optional<T>, text::TextFault>;

/// Reads a range here; the scanner then stands behind it, or where it stood if there is none.
/// The ends written belong to the range, but for `>` and `<`; they are met within 1e-9 of their
/// value, for what is stored was computed. A lone value means half a unit of its last digit to
/// either side, or 5 % of it where that is less (`5 mol%` is 4.75 to 5.25 mol%, `440 nm` is 439.5
/// to 440.5 nm). Faults: no number, an unknown or unwanted unit, a range that runs backwards or
/// uses a dash.
[[nodiscard]] ScanResult<FoundRange> scanRange(FindScanner& scanner, const RangeForm& form);

/// The place of a loading that stands by itself, as a range or comparison (`5..20 mol%`, `5-20
/// mol%`,
/// `>5 mol%`), or nothing. A lone `5 mol%` may be anybody's text.
[[nodiscard]] std::optional<TextRange> strayLoading(const FindScanner& scanner);

/// Reads days, months or years and ranges of them as milliseconds of the local clock.
/// With `mayBeAbsent` only what looks like a month or day is taken.
[[nodiscard]] ScanResult<Interval> scanDates(FindScanner& scanner, bool mayBeAbsent);

/// What may stand behind a measure, the date apart.
[[nodiscard]] RangeForm rangeOf(MeasureCondition::Measure measure);

/// What may stand behind a substance.
[[nodiscard]] RangeForm loadingRange();

/// Whether from here to the end stands nothing but what a range is made of, and perhaps one word
/// that may become a unit: somebody may still be typing it.
[[nodiscard]] bool endsWithinRange(FindScanner scanner);

}  // namespace vialkeeper::app
