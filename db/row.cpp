// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/row.h"

#include <algorithm>
#include <bit>

namespace vialkeeper::db {

void Row::set(std::string column, Cell cell) {
  const auto found = std::ranges::find(m_cells, column, &std::pair<std::string, Cell>::first);
  if (found != m_cells.end()) {
    found->second = std::move(cell);
  } else {
    m_cells.emplace_back(std::move(column), std::move(cell));
  }
}

const Cell& Row::operator[](std::string_view column) const {
  static const Cell null;
  const auto found = std::ranges::find(m_cells, column, &std::pair<std::string, Cell>::first);
  return found == m_cells.end() ? null : found->second;
}

std::int64_t Row::integer(std::string_view column) const {
  const auto* value = std::get_if<std::int64_t>(&(*this)[column]);
  return value != nullptr ? *value : 0;
}

double Row::real(std::string_view column) const {
  const Cell& cell = (*this)[column];
  if (const auto* value = std::get_if<double>(&cell)) return *value;
  const auto* whole = std::get_if<std::int64_t>(&cell);
  return whole != nullptr ? static_cast<double>(*whole) : 0.0;
}

std::string Row::text(std::string_view column) const {
  const auto* value = std::get_if<std::string>(&(*this)[column]);
  return value != nullptr ? *value : std::string{};
}

std::string Row::bytes(std::string_view column) const {
  const auto* value = std::get_if<Blob>(&(*this)[column]);
  return value != nullptr ? value->bytes : std::string{};
}

bool Row::isNull(std::string_view column) const {
  return std::holds_alternative<std::monostate>((*this)[column]);
}

std::optional<double> Row::maybeReal(std::string_view column) const {
  return isNull(column) ? std::nullopt : std::optional(real(column));
}

Cell textOrNull(const std::string& text) {
  Cell cell;
  if (!text.empty()) cell = text;
  return cell;
}

Cell referenceOrNull(std::int64_t n) {
  Cell cell;
  if (n != 0) cell = n;
  return cell;
}

Cell numberOrNull(const std::optional<double>& number) {
  Cell cell;
  if (number) cell = *number;
  return cell;
}

bool isSame(const Cell& a, const Cell& b) {
  if (a.index() == b.index()) {
    // Bit by bit, so that a changed sign of zero or a NaN is a change.
    const auto* x = std::get_if<double>(&a);
    return x != nullptr ? std::bit_cast<std::uint64_t>(*x) ==
                              std::bit_cast<std::uint64_t>(std::get<double>(b))
                        : a == b;
  }
  const auto* real = std::get_if<double>(&a);
  const auto* whole = std::get_if<std::int64_t>(&b);
  if (real != nullptr && whole != nullptr) return *real == static_cast<double>(*whole);
  const auto* otherReal = std::get_if<double>(&b);
  const auto* otherWhole = std::get_if<std::int64_t>(&a);
  return otherReal != nullptr && otherWhole != nullptr &&
         *otherReal == static_cast<double>(*otherWhole);
}

}  // namespace vialkeeper::db
