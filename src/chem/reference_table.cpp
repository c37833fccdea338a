// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/reference_table.h"

#include <fmt/format.h>

#include <algorithm>
#include <map>
#include <mutex>
#include <stdexcept>

#include "text/embedded_file.h"
#include "units/quantity_text.h"

namespace vialkeeper::text {
// Defined in the file that the build generates from templates/reference.
extern const EmbeddedFile referenceFiles[];
extern const std::size_t referenceFilesCount;
}  // namespace vialkeeper::text

namespace vialkeeper::chem {

const std::string& ReferenceTable::Row::text(std::string_view column) const {
  return m_table->m_csv.rows[m_index].cells[m_table->columnIndex(column)];
}

std::optional<double> ReferenceTable::Row::number(std::string_view column) const {
  const std::string& cell = text(column);
  if (cell.empty()) return std::nullopt;
  const auto value = units::readNumber(cell, units::Dialect::kFile);
  if (!value) {
    throw std::logic_error(fmt::format("{}:{}:{}: {} is no number", m_table->m_file,
                                       m_table->m_csv.rows[m_index].line, column, cell));
  }
  return *value;
}

double ReferenceTable::Row::required(std::string_view column) const {
  if (const auto value = number(column)) return *value;
  throw std::logic_error(fmt::format("{}:{}:{}: the cell is empty", m_table->m_file,
                                     m_table->m_csv.rows[m_index].line, column));
}

text::Checked<ReferenceTable> ReferenceTable::read(std::string_view bytes,
                                                   const std::string& file) {
  constexpr std::string_view kFormat = "vialkeeper-reference/1 ";
  auto table = text::readCsv(bytes, file, text::CsvComments::kBeforeHeader);
  if (!table) return std::unexpected(table.error());
  text::Faults faults;
  if (table->comments.empty() || !table->comments.front().starts_with(kFormat)) {
    faults.push_back({.file = file,
                      .line = 1,
                      .what = "this is no reference table",
                      .mend = fmt::format("begin with the line '# {}TITLE'", kFormat)});
  }
  const auto source = std::ranges::find(table->header.cells, "source");
  if (source == table->header.cells.end()) {
    faults.push_back({.file = file,
                      .line = table->header.line,
                      .field = "source",
                      .what = "the column is missing",
                      .mend = "add it and name the source of every row"});
    return std::unexpected(std::move(faults));
  }
  const auto column = source - table->header.cells.begin();
  for (const text::CsvRow& row : table->rows) {
    if (!row.cells[static_cast<std::size_t>(column)].empty()) continue;
    faults.push_back({.file = file,
                      .line = row.line,
                      .field = "source",
                      .what = "a row without a source",
                      .mend = "say where its numbers were published"});
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return ReferenceTable(file, *std::move(table));
}

const ReferenceTable& ReferenceTable::builtIn(std::string_view file) {
  static std::mutex mutex;
  static std::map<std::string, ReferenceTable, std::less<>> tables;
  const std::lock_guard lock(mutex);
  if (const auto known = tables.find(file); known != tables.end()) return known->second;
  for (std::size_t i = 0; i < text::referenceFilesCount; ++i) {
    const text::EmbeddedFile& embedded = text::referenceFiles[i];
    if (embedded.name != file) continue;
    auto table = read(embedded.contents, std::string(file));
    if (!table) throw std::logic_error(text::toLine(table.error().front()));
    return tables.emplace(std::string(file), *std::move(table)).first->second;
  }
  throw std::logic_error(fmt::format("no reference table {} in this build", file));
}

std::vector<std::string_view> ReferenceTable::builtInNames() {
  std::vector<std::string_view> names;
  for (std::size_t i = 0; i < text::referenceFilesCount; ++i) {
    names.push_back(text::referenceFiles[i].name);
  }
  return names;
}

std::vector<ReferenceTable::Row> ReferenceTable::rows() const {
  std::vector<Row> rows;
  rows.reserve(m_csv.rows.size());
  for (std::size_t i = 0; i < m_csv.rows.size(); ++i) rows.push_back(Row(*this, i));
  return rows;
}

std::size_t ReferenceTable::columnIndex(std::string_view column) const {
  const auto found = std::ranges::find(m_csv.header.cells, column);
  if (found == m_csv.header.cells.end()) {
    throw std::logic_error(fmt::format("{} has no column {}", m_file, column));
  }
  return static_cast<std::size_t>(found - m_csv.header.cells.begin());
}

}  // namespace vialkeeper::chem
