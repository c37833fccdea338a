// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <initializer_list>
#include <string_view>

#include "text/text_fault.h"
#include "units/quantity.h"
#include "units/unit_table.h"

/// The one reader of quantities, for every text that a person or a file gives.
namespace vialkeeper::units {

/// A quantity as it was understood.
struct ReadQuantity {
  Kind kind;
  double si;                ///< coherent SI; for the ratios the bare number (5 for `5 mol%`)
  double number;            ///< as written
  std::string_view symbol;  ///< of the unit as the table spells it
};

/// Which values make sense where the quantity stands.
enum class Range { kPositive, kNonNegative, kAny };

/// Reads a number. Files: decimal point, an optional exponent, no group separators, no `nan`,
/// `inf` or hexadecimal. People may write a decimal comma; a comma beside a point is refused.
[[nodiscard]] std::expected<double, text::TextFault> readNumber(std::string_view text,
                                                                Dialect dialect);

/// Reads a number with its unit (`12.3 mg`, `12.3mg`); people may add up time (`1 h 20 min`).
/// Faults: no number, no unit, an unknown unit, anything left over; each points at the place.
[[nodiscard]] std::expected<ReadQuantity, text::TextFault> readAnyQuantity(std::string_view text,
                                                                           Dialect dialect);

/// As above, and one of the kinds that are expected here, and within the range.
/// Temperatures must lie above absolute zero whatever the range.
[[nodiscard]] std::expected<ReadQuantity, text::TextFault> readQuantityOf(
    std::initializer_list<Kind> kinds, std::string_view text, Dialect dialect,
    Range range = Range::kPositive);

/// As above, as a quantity type.
template <class Quantity>
[[nodiscard]] std::expected<Quantity, text::TextFault> readQuantity(
    std::string_view text, Dialect dialect, Range range = Range::kPositive) {
  const auto read = readQuantityOf({Quantity::kKind}, text, dialect, range);
  if (!read) return std::unexpected(read.error());
  return Quantity::fromSi(read->si);
}

/// A difference of temperature [K]; written in K only, for a degree Celsius would be ambiguous.
[[nodiscard]] std::expected<double, text::TextFault> readKelvinDifference(std::string_view text,
                                                                          Range range);

}  // namespace vialkeeper::units
