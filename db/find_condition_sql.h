// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "app/notebook/find_query.h"
#include "db/row.h"

/// The single conditions of a search as SQL. An expression may be NULL where a run lacks the value:
/// that counts as not met, also within a negation.
namespace vialkeeper::db {

/// A piece of SQL with the values of its `?`, in their order.
struct SqlText {
  std::string sql;
  std::vector<Cell> cells = {};

  SqlText& operator+=(std::string_view text) {
    sql += text;
    return *this;
  }
  SqlText& operator+=(const SqlText& other) {
    sql += other.sql;
    cells.insert(cells.end(), other.cells.begin(), other.cells.end());
    return *this;
  }
};

/// Where an expression stands.
struct SqlPlace {
  std::string_view run;  ///< the run's number there: `r.n`, `c.run_n`
  bool isLed = false;    ///< another table leads; SQLite is kept from turning that round
  bool isProbed =
      false;  ///< few runs are asked: look each up, instead of gathering all that meet it
};

/// The condition as an expression; measures and text fields are read from `run r`.
[[nodiscard]] SqlText conditionSql(const app::FindCondition& condition, const SqlPlace& place);

/// All of them, as an expression; `1` where there are none.
[[nodiscard]] SqlText allOfSql(std::span<const app::FindCondition* const> conditions,
                               const SqlPlace& place);

/// Whether the condition reads columns of the run itself.
[[nodiscard]] bool readsRun(const app::FindCondition& condition);

/// What the component `alias` has to be, as an expression over its own columns. The condition names
/// a role or substances.
[[nodiscard]] SqlText componentSql(const app::SubstanceCondition& condition,
                                   const std::string& alias);

/// The words in the language of FTS5's MATCH, each within quotation marks; empty where no word
/// holds a letter or digit.
[[nodiscard]] std::string matchText(const app::WordsCondition& words);

}  // namespace vialkeeper::db
