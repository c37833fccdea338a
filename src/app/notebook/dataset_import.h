// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>

#include "app/notebook/desk.h"
#include "text/notice.h"

namespace vialkeeper::app {

/// A table of numbers as it was read from a file.
struct ReadTable {
  DatasetRecord record;  ///< kind, columns, rows, recipe; no numbers of the notebook yet
  std::vector<std::vector<double>> values;
  text::Notices notices;  ///< cells without a number, by line
};

/// Reads a CSV whose header names columns with their units, `time [h],amine [mol/L]`; lines
/// `# cat = 0.002 mol/L` before it are constants and go into the recipe. A cell that holds no
/// number is kept as a gap and told; an empty one is a gap. Faults: what readCsv refuses, no row, a
/// kind whose columns are not there (`time` of a course, decay, pressure or headspace; `quencher`
/// of a quench).
[[nodiscard]] Checked<ReadTable> readDataTable(std::string_view bytes, const std::string& file,
                                               const std::string& kind);

struct ImportedDataset {
  DatasetRecord record;
  text::Notices notices;
};

/// Keeps the file byte for byte, its numbers, and the link to the run, in one action.
[[nodiscard]] Checked<ImportedDataset> importDataset(const Desk& desk, const RunRecord& run,
                                                     std::string_view bytes,
                                                     const std::string& file,
                                                     const std::string& kind);

}  // namespace vialkeeper::app
