// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <algorithm>
#include <fstream>
#include <iterator>
#include <stdexcept>
#include <string>
#include <string_view>
#include <utility>

#include "text/csv.h"
#include "text/fault.h"

namespace vialkeeper::tests {

/// A table of tests/reference. Its head names the source of the numbers.
class ReferenceData {
 public:
  explicit ReferenceData(const std::string& name) : m_table(read(name)) {}

  [[nodiscard]] const std::vector<text::CsvRow>& rows() const { return m_table.rows; }

  [[nodiscard]] const std::string& cell(const text::CsvRow& row, std::string_view column) const {
    const auto& names = m_table.header.cells;
    const auto found = std::ranges::find(names, column);
    if (found == names.end()) throw std::runtime_error("no column " + std::string(column));
    return row.cells.at(static_cast<std::size_t>(found - names.begin()));
  }

  [[nodiscard]] double number(const text::CsvRow& row, std::string_view column) const {
    return std::stod(cell(row, column));
  }

 private:
  static text::CsvTable read(const std::string& name) {
    std::ifstream stream(std::string(VIALKEEPER_SOURCE_DIR "/tests/reference/") + name,
                         std::ios::binary);
    if (!stream) throw std::runtime_error("cannot open " + name);
    const std::string bytes{std::istreambuf_iterator<char>(stream), {}};
    auto table = text::readCsv(bytes, name, text::CsvComments::kBeforeHeader);
    if (!table) throw std::runtime_error(text::toLine(table.error().front()));
    return *std::move(table);
  }

  text::CsvTable m_table;
};

}  // namespace vialkeeper::tests
