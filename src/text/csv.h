// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "text/fault.h"

namespace vialkeeper::text {

/// One record with the line of the file on which it begins, counted from 1.
struct CsvRow {
  int line = 0;
  std::vector<std::string> cells;
};

/// A table as it stood in the file; every row has as many cells as the header.
struct CsvTable {
  std::vector<std::string> comments;  ///< lines that begin with # before the header, without the #
  CsvRow header;
  std::vector<CsvRow> rows;
};

/// Which lines that begin with # are comments.
enum class CsvComments { kNone, kBeforeHeader };

/// Reads a comma-separated table: RFC 4180 quotes (a quoted cell may hold line breaks), blanks
/// round unquoted cells ignored, CRLF, LF and a UTF-8 byte-order mark accepted, empty lines
/// skipped. Faults, all told at once: NUL, other encodings, an open quote, text beside a quoted
/// cell, a row with too few or too many cells, a repeated or empty column name, no header.
[[nodiscard]] Checked<CsvTable> readCsv(std::string_view bytes, const std::string& file,
                                        CsvComments comments = CsvComments::kNone);

/// One cell as RFC 4180 writes it, quoted where it must be.
[[nodiscard]] std::string toCsvCell(std::string_view cell);

}  // namespace vialkeeper::text
