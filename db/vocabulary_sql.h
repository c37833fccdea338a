// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "app/notebook/find_completion.h"
#include "db/connection.h"

namespace vialkeeper::db {

/// What the notebook holds to complete a search from, with the number of runs that hold each; what
/// stands on the shelf only is there with none.
[[nodiscard]] app::FindVocabulary readVocabulary(Connection& connection);

}  // namespace vialkeeper::db
