// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <functional>

#include "app/notebook/find_query.h"
#include "db/find_condition_sql.h"

namespace vialkeeper::db {

/// The two statements of a search.
struct FindSql {
  SqlText
      select;     ///< the runs' numbers, column `n`, in the order asked for, no more than the limit
  SqlText count;  ///< how many runs there are in all: one row, one column
};

/// Answers a short counting statement of one row and column; it never counts beyond 5,000.
using RowCounter = std::function<std::int64_t(const SqlText& counting)>;

/// Puts a search into SQL over the notebook's tables. Every value of the query is bound; a word
/// reaches the full-text index within quotation marks. Of the conditions that all have to hold, the
/// one that fewest runs meet leads, and the others are asked of its runs: `rowsOf` tells which that
/// is; without it the roles say what is likely. kNewest and kOldest follow the order in which runs
/// were written into the notebook. kRank weighs the newest 2,000 hits by their words and leaves
/// older ones behind them, newest first; a search without words that must stand in the run is
/// answered newest first.
[[nodiscard]] FindSql findSql(const app::FindQuery& query, const app::FindOptions& options,
                              const RowCounter& rowsOf = {});

}  // namespace vialkeeper::db
