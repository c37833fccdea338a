// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "app/notebook/notebook.h"
#include "db/connection.h"

namespace vialkeeper::db {

/// Looks at everything that can be checked: SQLite's pages and indexes, references, the full-text
/// index, the chain of revisions, every record against the last revision that told it, attachments
/// against their hashes, seals against their signatures and the records they cover. Damage is
/// reported, never thrown, so far as the file can be read at all.
[[nodiscard]] app::VerifyReport verifyNotebook(Connection& connection);

}  // namespace vialkeeper::db
