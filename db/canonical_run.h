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

/// `{"chain","format","links","own"}`: the last revision so far by number and hash, so that a seal
/// vouches for all that was written before it; the own records, and the people, substances, lots
/// and stocks that they name, as these are now. Form 1 of this text, which older seals hold, has no
/// `chain`.
[[nodiscard]] std::string canonicalRunText(Connection& connection, std::int64_t run);

}  // namespace vialkeeper::db
