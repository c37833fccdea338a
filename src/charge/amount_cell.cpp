// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/amount_cell.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <optional>

#include "text/utf8.h"
#include "units/quantity_text.h"
#include "units/unit_table.h"

namespace vialkeeper::charge {
namespace {

using text::TextFault;
using text::textFault;
using units::Dialect;
using units::Kind;

struct BasisUnit {
  Basis basis;
  Kind kind;
  std::string_view
      bareUnit;  ///< how a person reads a bare number of the basis; empty: it has units
};

constexpr auto kBasisUnits =
    std::to_array<BasisUnit>({{Basis::kAmount, Kind::kAmount, ""},
                              {Basis::kMass, Kind::kMass, ""},
                              {Basis::kVolume, Kind::kVolume, ""},
                              {Basis::kEquiv, Kind::kEquivalents, "equiv"},
                              {Basis::kMolPercent, Kind::kMolPercent, "mol%"},
                              {Basis::kConcentration, Kind::kConcentration, ""},
                              {Basis::kShare, Kind::kParts, "parts"}});

const BasisUnit& unitOf(Basis basis) {
  return *std::ranges::find(kBasisUnits, basis, &BasisUnit::basis);
}

bool isDigit(char c) { return c >= '0' && c <= '9'; }

std::size_t blanksBefore(std::string_view text) {
  return std::min(text.find_first_not_of(" \t"), text.size());
}

/// `1,000 mg` may be a thousand or one: a comma with three figures behind it and one to three, no
/// leading zero, before it.
std::optional<TextFault> thousandsFault(std::string_view text) {
  const std::size_t begin = blanksBefore(text);
  std::size_t comma = begin;
  while (comma < text.size() && isDigit(text[comma])) ++comma;
  const std::size_t before = comma - begin;
  if (comma >= text.size() || text[comma] != ',' || before == 0 || before > 3 ||
      text[begin] == '0') {
    return std::nullopt;
  }
  std::size_t end = comma + 1;
  while (end < text.size() && isDigit(text[end])) ++end;
  if (end - comma != 4) return std::nullopt;
  const std::string_view whole = text.substr(begin, before);
  const std::string_view rest = text.substr(comma + 1, 3);
  return TextFault{begin, end - begin, "the comma may be a decimal or a thousands sign",
                   fmt::format("write {}.{} or {}{}", whole, rest, whole, rest)};
}

/// The figures as typed, spelled as TOML takes a bare number: `.50` is `0.50`, `05` is `5`.
std::string figuresOf(std::string_view text) {
  text = text::trimmed(text);
  if (text.starts_with('+')) text.remove_prefix(1);
  std::size_t end = 0;
  while (end < text.size() && (isDigit(text[end]) || text[end] == '.' || text[end] == ',')) ++end;
  const std::size_t mantissaEnd = end;
  if (end < text.size() && (text[end] == 'e' || text[end] == 'E')) {
    std::size_t digits = end + 1;
    if (digits < text.size() && (text[digits] == '+' || text[digits] == '-')) ++digits;
    const std::size_t first = digits;
    while (digits < text.size() && isDigit(text[digits])) ++digits;
    if (digits > first) end = digits;
  }
  std::string mantissa(text.substr(0, mantissaEnd));
  std::ranges::replace(mantissa, ',', '.');
  const std::size_t zeros = std::min(mantissa.find_first_not_of('0'), mantissa.size());
  mantissa.erase(0, zeros);
  if (mantissa.empty() || mantissa.front() == '.') mantissa.insert(0, "0");
  if (mantissa.back() == '.') mantissa.pop_back();
  return mantissa + std::string(text.substr(mantissaEnd, end - mantissaEnd));
}

/// The unit as a plan file takes it: people may also write `ml`.
std::string_view inFile(std::string_view symbol) {
  if (units::findUnit(symbol, Dialect::kFile) != nullptr) return symbol;
  for (const units::Unit& unit : units::allUnits()) {
    if (!unit.peopleOnly && text::asciiLowered(unit.symbol) == text::asciiLowered(symbol))
      return unit.symbol;
  }
  return symbol;
}

/// `50 uL` as `50 µL`.
std::string withMicro(std::string written) {
  const std::size_t at = written.find_first_not_of("0123456789.,eE+- ");
  if (at != std::string::npos && written[at] == 'u' && at + 1 < written.size())
    written.replace(at, 1, "µ");
  return written;
}

std::string bareText(std::string_view figures, Basis basis) {
  const bool one = basis == Basis::kShare && figures == "1";
  return fmt::format("{} {}", figures, one ? "part" : unitOf(basis).bareUnit);
}

AmountCell cellOf(Basis basis, const std::string& figures, std::string_view symbol) {
  AmountCell cell{.basis = basis, .field = std::string(toText(basis)), .value = {}, .shown = {}};
  if (!unitOf(basis).bareUnit.empty()) {
    cell.value = figures;
    cell.shown = bareText(figures, basis);
  } else {
    cell.value = fmt::format("{} {}", figures, inFile(symbol));
    cell.shown = withMicro(cell.value);
  }
  return cell;
}

/// A number without unit: it keeps the basis of the cell where that one has no unit either.
std::expected<AmountCell, TextFault> bareCell(std::string_view text, double number, Basis present) {
  const std::size_t begin = blanksBefore(text);
  const std::size_t length = text::trimmed(text).size();
  if (unitOf(present).bareUnit.empty()) {
    return textFault(begin + length, 0, "the unit is missing",
                     "write the amount with its unit, such as 5 mol%, 1.2 equiv, 26.6 mg or 50 µL");
  }
  if (!(number > 0.0)) {
    return textFault(begin, length, number < 0.0 ? "a negative amount" : "an amount of zero",
                     "give an amount above zero");
  }
  return cellOf(present, figuresOf(text), {});
}

}  // namespace

std::expected<AmountCell, TextFault> readAmountCell(std::string_view text, Role role,
                                                    Basis present) {
  if (const auto invalid = text::firstInvalidUtf8(text)) {
    return textFault(*invalid, 1, "bytes that are no text", "type the amount again");
  }
  if (text::trimmed(text).empty())
    return textFault(0, text.size(), "no amount here", "write for example 5 mol% or 26.6 mg");
  if (auto fault = thousandsFault(text)) return std::unexpected(*std::move(fault));
  if (const auto number = units::readNumber(text, Dialect::kPerson)) {
    auto cell = bareCell(text, *number, present);
    if (!cell || present != Basis::kShare || role == Role::kSolvent) return cell;
    return bareCell(text, *number, Basis::kAmount);
  }
  const auto read =
      units::readQuantityOf({Kind::kMolPercent, Kind::kEquivalents, Kind::kMass, Kind::kVolume,
                             Kind::kAmount, Kind::kConcentration, Kind::kParts},
                            text, Dialect::kPerson);
  if (!read) return std::unexpected(read.error());
  const Basis basis = std::ranges::find(kBasisUnits, read->kind, &BasisUnit::kind)->basis;
  if (basis == Basis::kShare && role != Role::kSolvent) {
    return textFault(blanksBefore(text), text::trimmed(text).size(), "parts are for solvents only",
                     "write mol%, equiv, or an amount with its unit");
  }
  return cellOf(basis, figuresOf(text), read->symbol);
}

std::string amountCellText(const ComponentPlan& component) {
  const AmountPlan& amount = component.amount;
  if (unitOf(amount.basis).bareUnit.empty()) return withMicro(amount.asWritten);
  const auto written = units::readNumber(amount.asWritten, Dialect::kFile);
  const bool keepsFigures = written && *written == amount.value;
  return bareText(keepsFigures ? amount.asWritten : fmt::format("{:.6g}", amount.value),
                  amount.basis);
}

}  // namespace vialkeeper::charge
