// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

namespace vialkeeper::cli {

/// A table for the terminal: columns as wide as their widest cell, two blanks between them.
class TextTable {
 public:
  enum class Align { kLeft, kRight };

  void addColumn(std::string title, Align align);
  /// One cell for every column.
  void addRow(std::vector<std::string> cells);
  [[nodiscard]] std::string toText() const;

 private:
  struct Column {
    std::string title;
    Align align;
  };
  std::vector<Column> m_columns;
  std::vector<std::vector<std::string>> m_rows;
};

}  // namespace vialkeeper::cli
