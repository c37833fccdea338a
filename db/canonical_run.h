// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <string>

#include "db/connection.h"

namespace vialkeeper::db {

/// Canonical JSON of a run's own records: run, components, events but addenda, datasets with their
/// blocks, attachments by hash.
[[nodiscard]] std::string ownRecordsText(Connection& connection, std::int64_t run);

/// `{"format","links","own"}`: the own records, and the people, substances, lots and stocks that
/// they name, as these are now.
[[nodiscard]] std::string canonicalRunText(Connection& connection, std::int64_t run);

}  // namespace vialkeeper::db
