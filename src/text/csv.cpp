// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/csv.h"

#include <fmt/format.h>

#include <algorithm>
#include <set>

#include "text/encoding.h"
#include "text/utf8.h"

namespace vialkeeper::text {
namespace {

/// Splits the bytes into records and notes what is wrong with the quoting on the way.
class CsvScanner {
 public:
  CsvScanner(std::string_view bytes, const std::string& file, Faults& faults)
      : m_bytes(bytes), m_file(file), m_faults(faults) {}

  [[nodiscard]] bool atEnd() const { return m_at >= m_bytes.size(); }

  /// The next record, or one with no cells for an empty line.
  CsvRow next() {
    CsvRow row{m_line, {}};
    const std::size_t begin = m_at;
    while (true) {
      row.cells.push_back(nextCell());
      if (!atEnd() && m_bytes[m_at] == ',') {
        ++m_at;
        continue;
      }
      const bool empty = trimmed(m_bytes.substr(begin, m_at - begin)).empty();
      skipLineEnd();
      if (empty) row.cells.clear();
      return row;
    }
  }

  /// The rest of the line, for a comment.
  std::string_view nextLine() {
    const std::size_t end = std::min(m_bytes.find_first_of("\r\n", m_at), m_bytes.size());
    const std::string_view line = m_bytes.substr(m_at, end - m_at);
    m_at = end;
    skipLineEnd();
    return line;
  }

  /// Whether an open quotation mark swallowed the rest of the file.
  [[nodiscard]] bool isCutShort() const { return m_cutShort; }

  [[nodiscard]] char peek() const { return atEnd() ? '\0' : m_bytes[m_at]; }

 private:
  void skipLineEnd() {
    if (!atEnd() && m_bytes[m_at] == '\r') ++m_at;
    if (!atEnd() && m_bytes[m_at] == '\n') ++m_at;
    ++m_line;
  }

  void skipBlanks() {
    while (!atEnd() && (m_bytes[m_at] == ' ' || m_bytes[m_at] == '\t')) ++m_at;
  }

  std::string nextCell() {
    skipBlanks();
    if (peek() == '"') return nextQuotedCell();
    const std::size_t end = std::min(m_bytes.find_first_of(",\r\n", m_at), m_bytes.size());
    const std::string_view cell = trimmed(m_bytes.substr(m_at, end - m_at));
    m_at = end;
    if (cell.find('"') != std::string_view::npos) {
      fault("a quotation mark inside a cell that is not quoted",
            "put the whole cell in quotation marks and double those inside");
    }
    return std::string(cell);
  }

  std::string nextQuotedCell() {
    const int openedOn = m_line;
    std::string cell;
    ++m_at;
    while (!atEnd()) {
      const char c = m_bytes[m_at++];
      if (c == '"' && peek() == '"') {
        cell += '"';
        ++m_at;
      } else if (c == '"') {
        finishQuotedCell();
        return cell;
      } else {
        if (c == '\n') ++m_line;
        cell += c;
      }
    }
    m_cutShort = true;
    m_faults.push_back({.file = m_file,
                        .line = openedOn,
                        .what = "a quotation mark is never closed",
                        .mend = "close it at the end of its cell"});
    return cell;
  }

  void finishQuotedCell() {
    skipBlanks();
    if (atEnd() || peek() == ',' || peek() == '\r' || peek() == '\n') return;
    fault("text follows a quoted cell", "put the whole cell in quotation marks");
    m_at = std::min(m_bytes.find_first_of(",\r\n", m_at), m_bytes.size());
  }

  void fault(std::string what, std::string mend) {
    m_faults.push_back(
        {.file = m_file, .line = m_line, .what = std::move(what), .mend = std::move(mend)});
  }

  std::string_view m_bytes;
  const std::string& m_file;
  Faults& m_faults;
  std::size_t m_at = 0;
  int m_line = 1;
  bool m_cutShort = false;
};

void checkHeader(const CsvRow& header, const std::string& file, Faults& faults) {
  std::set<std::string_view> seen;
  for (const std::string& name : header.cells) {
    if (name.empty()) {
      faults.push_back({.file = file,
                        .line = header.line,
                        .what = "a column without a name",
                        .mend = "name every column in the first row"});
    } else if (!seen.insert(name).second) {
      faults.push_back({.file = file,
                        .line = header.line,
                        .field = name,
                        .what = "this column stands twice",
                        .mend = "keep one of them"});
    }
  }
}

void checkCellCounts(const CsvTable& table, const std::string& file, Faults& faults) {
  const std::size_t wanted = table.header.cells.size();
  for (const CsvRow& row : table.rows) {
    if (row.cells.size() == wanted) continue;
    faults.push_back({.file = file,
                      .line = row.line,
                      .what = fmt::format("{} {} where the header has {}", row.cells.size(),
                                          row.cells.size() == 1 ? "cell" : "cells", wanted),
                      .mend = row.cells.size() < wanted
                                  ? "add the missing cells, empty ones too"
                                  : "quote a cell that holds a comma, or remove the surplus"});
  }
}

}  // namespace

Checked<CsvTable> readCsv(std::string_view bytes, const std::string& file, CsvComments comments) {
  Faults faults = encodingFaults(bytes, file);
  if (!faults.empty()) return std::unexpected(std::move(faults));

  CsvTable table;
  CsvScanner scanner(withoutByteOrderMark(bytes), file, faults);
  while (!scanner.atEnd()) {
    const bool beforeHeader = table.header.cells.empty();
    if (comments == CsvComments::kBeforeHeader && beforeHeader && scanner.peek() == '#') {
      table.comments.emplace_back(trimmed(scanner.nextLine().substr(1)));
      continue;
    }
    CsvRow row = scanner.next();
    if (row.cells.empty()) continue;
    if (beforeHeader) {
      table.header = std::move(row);
    } else {
      table.rows.push_back(std::move(row));
    }
  }
  if (table.header.cells.empty()) {
    faults.push_back({.file = file,
                      .what = "the file holds no table",
                      .mend = "begin with a row of column names"});
  }
  checkHeader(table.header, file, faults);
  if (!scanner.isCutShort()) checkCellCounts(table, file, faults);
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return table;
}

std::string toCsvCell(std::string_view cell) {
  const bool blanksAtEnds = trimmed(cell).size() != cell.size();
  if (cell.find_first_of(",\"\r\n") == std::string_view::npos && !blanksAtEnds) {
    return std::string(cell);
  }
  std::string quotedCell = "\"";
  for (const char c : cell) {
    if (c == '"') quotedCell += '"';
    quotedCell += c;
  }
  return quotedCell + '"';
}

}  // namespace vialkeeper::text
