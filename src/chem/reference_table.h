// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "text/csv.h"
#include "text/fault.h"

namespace vialkeeper::chem {

/// A table of published values in which every row names its source.
/// The files are `templates/reference/*.csv`, linked into the program.
class ReferenceTable {
 public:
  /// One row; cells are reached by the name of their column.
  class Row {
   public:
    /// The cell's text; empty where the value is unknown. The column must exist.
    [[nodiscard]] const std::string& text(std::string_view column) const;
    /// The cell's number, or nothing where the cell is empty.
    [[nodiscard]] std::optional<double> number(std::string_view column) const;
    /// The cell's number; a logic_error where it is empty: for columns that are always filled.
    [[nodiscard]] double required(std::string_view column) const;
    [[nodiscard]] const std::string& source() const { return text("source"); }

   private:
    friend class ReferenceTable;
    Row(const ReferenceTable& table, std::size_t index) : m_table(&table), m_index(index) {}
    const ReferenceTable* m_table;
    std::size_t m_index;
  };

  /// Reads a table. Refused, all told at once: a first line that is not
  /// `# vialkeeper-reference/1 …`, a missing `source` column, a row without a source, and all that
  /// readCsv refuses.
  [[nodiscard]] static text::Checked<ReferenceTable> read(std::string_view bytes,
                                                          const std::string& file);

  /// A table that is linked into the program, read on first use and kept.
  /// logic_error where there is none of that name or it is refused: the build was wrong.
  [[nodiscard]] static const ReferenceTable& builtIn(std::string_view file);

  /// Names of all tables that are linked in.
  [[nodiscard]] static std::vector<std::string_view> builtInNames();

  [[nodiscard]] std::vector<Row> rows() const;

 private:
  explicit ReferenceTable(std::string file, text::CsvTable table)
      : m_file(std::move(file)), m_csv(std::move(table)) {}
  [[nodiscard]] std::size_t columnIndex(std::string_view column) const;

  std::string m_file;
  text::CsvTable m_csv;
};

}  // namespace vialkeeper::chem
