// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "app/notebook/notebook.h"

namespace vialkeeper::app {

/// Writes runs into a new folder, one folder each: `plan.toml` as it was typed, `record.json`
/// (canonical), `log.csv` and `weighed.csv` as the command line reads them, and every raw file byte
/// for byte. Fault: a code that is not there (all of them are told), the folder is there already.
[[nodiscard]] Checked<void> exportRuns(Notebook& notebook, const std::vector<std::string>& codes,
                                       const std::string& folder);

}  // namespace vialkeeper::app
