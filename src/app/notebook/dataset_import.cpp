// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/dataset_import.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <array>
#include <cmath>
#include <filesystem>
#include <limits>

#include "text/csv.h"
#include "text/utf8.h"
#include "units/quantity_text.h"

namespace vialkeeper::app {
namespace {

constexpr auto kKinds =
    std::to_array<std::string_view>({"course", "quench", "decay", "pressure", "headspace"});
constexpr std::size_t kMostNotices = 20;

/// `time [h]` as name and unit.
DatasetColumn columnOf(std::string_view header) {
  const std::size_t open = header.rfind('[');
  if (open == std::string_view::npos || !header.ends_with(']')) return {std::string(header), ""};
  return {std::string(text::trimmed(header.substr(0, open))),
          std::string(text::trimmed(header.substr(open + 1, header.size() - open - 2)))};
}

std::string_view firstColumnOf(std::string_view kind) {
  return kind == "quench" ? "quencher" : "time";
}

std::unexpected<text::Faults> fault(const std::string& file, int line, std::string field,
                                    std::string what, std::string mend) {
  return std::unexpected(text::Faults{{.file = file,
                                       .line = line,
                                       .field = std::move(field),
                                       .what = std::move(what),
                                       .mend = std::move(mend)}});
}

}  // namespace

Checked<ReadTable> readDataTable(std::string_view bytes, const std::string& file,
                                 const std::string& kind) {
  if (std::ranges::find(kKinds, kind) == kKinds.end()) {
    return askedFault("--as", fmt::format("{} is no kind of dataset", text::quoted(kind)),
                      fmt::format("choose among {}", fmt::join(kKinds, ", ")));
  }
  const auto table = text::readCsv(bytes, file, text::CsvComments::kBeforeHeader);
  if (!table) return std::unexpected(table.error());
  if (table->rows.empty())
    return fault(file, table->header.line, "", "the table has no rows",
                 "check that this is the right file");
  ReadTable read;
  read.record.kind = kind;
  for (const std::string& header : table->header.cells)
    read.record.columns.push_back(columnOf(header));
  const std::string_view wanted = firstColumnOf(kind);
  if (std::ranges::find(read.record.columns, wanted, &DatasetColumn::name) ==
      read.record.columns.end()) {
    return fault(file, table->header.line, std::string(wanted), "the column is missing",
                 fmt::format("a {} begins with a column such as {} [{}]", kind, wanted,
                             kind == "quench" ? "mol/L" : "h"));
  }
  read.record.rows = static_cast<std::int64_t>(table->rows.size());
  read.record.recipe =
      fmt::format("CSV, {} comment lines, numbers with a decimal point", table->comments.size());
  for (const std::string& comment : table->comments) read.record.recipe += "\n# " + comment;
  read.values.resize(read.record.columns.size());
  std::size_t gaps = 0;
  for (const text::CsvRow& row : table->rows) {
    for (std::size_t c = 0; c < row.cells.size(); ++c) {
      const auto number = units::readNumber(row.cells[c], units::Dialect::kFile);
      read.values[c].push_back(number ? *number : std::numeric_limits<double>::quiet_NaN());
      if (number || row.cells[c].empty()) continue;
      if (++gaps <= kMostNotices) {
        read.notices.push_back({"not-a-number",
                                fmt::format("line {}: {} is no number and counts as a gap",
                                            row.line, text::quoted(row.cells[c])),
                                read.record.columns[c].name});
      }
    }
  }
  if (gaps > kMostNotices) {
    read.notices.push_back(
        {"not-a-number",
         fmt::format("{} more cells are no numbers and count as gaps", gaps - kMostNotices), ""});
  }
  return read;
}

Checked<ImportedDataset> importDataset(const Desk& desk, const RunRecord& run,
                                       std::string_view bytes, const std::string& file,
                                       const std::string& kind) {
  auto read = readDataTable(bytes, file, kind);
  if (!read) return std::unexpected(read.error());
  if (run.state == RunState::kSealed) {
    return askedFault(run.code, "the run is sealed", "note it in an addendum, or add a new run");
  }
  read->record.rawName = std::filesystem::path(file).filename().string();
  read->record.title = read->record.rawName;
  const auto done =
      desk.notebook.act(desk.action("import"), [&](Writing& writing) -> Checked<void> {
        const auto raw = writing.addAttachment(bytes);
        if (!raw) return std::unexpected(raw.error());
        read->record.raw = *raw;
        const auto code = writing.nextDatasetCode();
        if (!code) return std::unexpected(code.error());
        read->record.code = *code;
        const auto n = writing.addDataset(read->record, read->values);
        if (!n) return std::unexpected(n.error());
        read->record.n = *n;
        return writing.linkDataset(run.n, *n);
      });
  if (!done) return std::unexpected(done.error());
  return ImportedDataset{std::move(read->record), std::move(read->notices)};
}

}  // namespace vialkeeper::app
