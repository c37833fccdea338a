// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "app/notebook/notebook.h"
#include "db/connection.h"

namespace vialkeeper::db {

/// Looks at everything that can be checked: SQLite's pages and indexes, references, the full-text
/// index, the chain of revisions, every record and setting against the last revision that told it,
/// attachments against their hashes, seals against their signatures, the records they cover and the
/// revision after which they were signed; where asked for, the chain against a head that was
/// written down and against an earlier copy of the file. Damage is reported, never thrown, so far
/// as the file can be read at all.
[[nodiscard]] app::VerifyReport verifyNotebook(Connection& connection,
                                               const app::VerifyRequest& request = {},
                                               Connection* other = nullptr);

}  // namespace vialkeeper::db
