// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/text_table.h"

#include <algorithm>

#include "text/utf8.h"

namespace vialkeeper::cli {
namespace {

std::size_t widthOf(const std::string& cell) { return text::characterIndex(cell, cell.size()); }

}  // namespace

void TextTable::addColumn(std::string title, Align align) {
  m_columns.push_back({std::move(title), align});
}

void TextTable::addRow(std::vector<std::string> cells) {
  for (std::string& cell : cells) cell = text::oneLine(cell);
  m_rows.push_back(std::move(cells));
}

std::string TextTable::toText() const {
  std::vector<std::string> titles;
  std::vector<std::size_t> widths;
  for (const Column& column : m_columns) {
    titles.push_back(column.title);
    widths.push_back(widthOf(column.title));
  }
  for (const auto& row : m_rows) {
    for (std::size_t i = 0; i < row.size(); ++i) widths[i] = std::max(widths[i], widthOf(row[i]));
  }
  std::string text;
  const auto appendRow = [&](const std::vector<std::string>& row) {
    std::string line;
    for (std::size_t i = 0; i < row.size(); ++i) {
      const std::string padding(widths[i] - widthOf(row[i]), ' ');
      if (i > 0) line += "  ";
      line += m_columns[i].align == Align::kRight ? padding + row[i] : row[i] + padding;
    }
    text += line.substr(0, line.find_last_not_of(' ') + 1) + '\n';
  };
  appendRow(titles);
  for (const auto& row : m_rows) appendRow(row);
  return text;
}

}  // namespace vialkeeper::cli
