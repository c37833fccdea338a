// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <SQLiteCpp/SQLiteCpp.h>

#include <cstdint>
#include <random>
#include <string>
#include <vector>

#include "app/notebook/find_query.h"
#include "db/find_condition_sql.h"

/// An invented notebook in memory and, beside it, the plainest possible evaluation of a search over
/// the same runs, which knows nothing of SQL.
namespace vialkeeper::testing {

/// A run with its components and the texts that are searched.
struct SampleRun {
  app::RunRecord run;
  std::vector<app::ComponentRecord> components;
  std::vector<std::string> texts;  ///< title, aim, conclusion, observations
  std::vector<std::vector<std::string>> tokens =
      {};  ///< of the code and each text, as they are compared
};

class SampleNotebook {
 public:
  SampleNotebook(std::size_t runs, std::uint64_t seed);

  [[nodiscard]] SQLite::Database& database() { return m_database; }
  [[nodiscard]] const std::vector<SampleRun>& runs() const { return m_runs; }

  /// The first column of every row.
  [[nodiscard]] std::vector<std::int64_t> numbers(const db::SqlText& sql);
  /// What EXPLAIN QUERY PLAN says, line by line.
  [[nodiscard]] std::vector<std::string> plan(const db::SqlText& sql);
  /// Runs that meet the query, in the notebook's order.
  [[nodiscard]] std::vector<const SampleRun*> matches(const app::FindQuery& query) const;

 private:
  void write(const SampleRun& sample);

  SQLite::Database m_database;
  std::vector<SampleRun> m_runs;
};

/// Runs of letters and digits, lowered and without accents.
[[nodiscard]] std::vector<std::string> tokensOf(std::string_view text);

[[nodiscard]] bool meets(const SampleRun& sample, const app::FindCondition& condition);

/// Queries of every kind, nested up to `depth`.
class RandomQueries {
 public:
  explicit RandomQueries(std::uint64_t seed) : m_random(seed) {}
  [[nodiscard]] app::FindQuery query();
  [[nodiscard]] app::FindCondition condition(int depth);

 private:
  [[nodiscard]] std::uint64_t below(std::uint64_t n) { return m_random() % n; }
  [[nodiscard]] app::FindCondition substance();
  [[nodiscard]] app::FindCondition words();
  [[nodiscard]] app::FindCondition textField();
  [[nodiscard]] app::FindCondition measure();
  [[nodiscard]] app::Interval interval(double least, double most);

  std::mt19937_64 m_random;
};

}  // namespace vialkeeper::testing
