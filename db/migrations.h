// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "db/connection.h"
#include "text/fault.h"

namespace vialkeeper::db {

/// The form of the file that this program writes.
[[nodiscard]] int newestSchema();

/// The form of the file that is open: 0 for an empty one.
[[nodiscard]] int schemaOf(Connection& connection);

/// Brings the file to the newest form, one transaction for each step. Before the first step of a
/// file that holds anything, a copy is made beside it, named by form and time; without it nothing
/// is done. `stamp` is part of that name: `20260304-142005`.
[[nodiscard]] text::Checked<void> migrate(Connection& connection, const std::string& stamp);

/// Tables, indexes and triggers that the file should have and has not, or has and should not.
[[nodiscard]] std::vector<std::string> schemaDifferences(Connection& connection);

/// A verified copy of the open database: written under a temporary name, opened again, checked page
/// by page, then renamed. Fault: a file of that name is there, the copy is not sound, the disk is
/// full.
[[nodiscard]] text::Checked<void> copyTo(Connection& connection, const std::string& file);

}  // namespace vialkeeper::db
