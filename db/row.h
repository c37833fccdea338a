// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <optional>
#include <string>
#include <string_view>
#include <utility>
#include <variant>
#include <vector>

namespace vialkeeper::db {

/// Bytes of a BLOB, told apart from text.
struct Blob {
  std::string bytes;
  bool operator==(const Blob&) const = default;
};

/// One cell as SQLite holds it; monostate is NULL.
using Cell = std::variant<std::monostate, std::int64_t, double, std::string, Blob>;

/// Cells by their columns' names.
class Row {
 public:
  Row() = default;
  Row(std::initializer_list<std::pair<std::string, Cell>> cells) : m_cells(cells) {}

  void set(std::string column, Cell cell);
  /// The cell; monostate where the row lacks the column.
  [[nodiscard]] const Cell& operator[](std::string_view column) const;
  [[nodiscard]] const std::vector<std::pair<std::string, Cell>>& cells() const { return m_cells; }

  // Reads of one type; NULL and other types give the empty value.
  [[nodiscard]] std::int64_t integer(std::string_view column) const;
  [[nodiscard]] double real(std::string_view column) const;
  [[nodiscard]] std::string text(std::string_view column) const;
  [[nodiscard]] std::string bytes(std::string_view column) const;
  [[nodiscard]] std::optional<double> maybeReal(std::string_view column) const;
  [[nodiscard]] bool isNull(std::string_view column) const;

 private:
  std::vector<std::pair<std::string, Cell>> m_cells;
};

// How records' empty values are stored.
[[nodiscard]] Cell textOrNull(const std::string& text);                ///< NULL for an empty text
[[nodiscard]] Cell referenceOrNull(std::int64_t n);                    ///< NULL for 0
[[nodiscard]] Cell numberOrNull(const std::optional<double>& number);  ///< NULL for nothing

/// Whether two cells hold the same, an integral double and its integer among them (a REAL column
/// gives back a double for what was bound as an integer).
[[nodiscard]] bool isSame(const Cell& a, const Cell& b);

}  // namespace vialkeeper::db
