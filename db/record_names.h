// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "db/connection.h"
#include "db/row.h"

namespace vialkeeper::db {

/// What a person calls a row: `entry 4 of KW-0042`, `component acid of KW-0042`, `lot A-17`. Row
/// numbers stand where there is nothing better: `lamp (row 3)`. The row may be one that is no
/// longer in the file, as the trail tells it.
[[nodiscard]] std::string nameOf(Connection& connection, const std::string& table, const Row& row);

/// The same for a row of which only the number is known, and which is in the file.
[[nodiscard]] std::string nameOf(Connection& connection, const std::string& table, std::int64_t n);

}  // namespace vialkeeper::db
