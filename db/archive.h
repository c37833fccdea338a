// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "db/connection.h"
#include "text/fault.h"

/// The whole notebook as a folder of plain files, readable for as long as there are text editors:
/// `notebook.json` says what it is, `tables/NAME.jsonl` hold the rows, a JSON object a line, and
/// `blobs/SHA256` the longer binary values, raw files among them, byte for byte.
namespace vialkeeper::db {

/// Writes the archive into a new folder. Fault: the folder is there already or cannot be made.
[[nodiscard]] text::Checked<void> writeArchive(Connection& connection, const std::string& folder);

/// Fills an empty notebook from an archive, in one transaction. Fault: the notebook is not empty,
/// the archive is of another form, a line or file is damaged.
[[nodiscard]] text::Checked<void> readArchive(Connection& connection, const std::string& folder);

}  // namespace vialkeeper::db
