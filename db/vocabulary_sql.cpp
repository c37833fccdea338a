// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/vocabulary_sql.h"

#include <fmt/format.h>

namespace vialkeeper::db {
namespace {

std::vector<app::VocabularyEntry> entries(Connection& connection, const std::string& sql) {
  std::vector<app::VocabularyEntry> list;
  for (const Row& row : connection.rows(sql))
    list.push_back({.name = row.text("name"), .uses = row.integer("uses")});
  return list;
}

/// The values of a column of runs, and names of cards that no run has yet.
std::string ofRuns(const char* column, const char* shelf = nullptr) {
  const std::string cards =
      shelf != nullptr ? fmt::format(" UNION ALL SELECT name, 0 FROM {}", shelf) : "";
  return fmt::format(
      "SELECT name, sum(uses) AS uses FROM (SELECT {0} AS name, 1 AS uses FROM run WHERE {0} IS "
      "NOT "
      "NULL{1}) GROUP BY name ORDER BY name",
      column, cards);
}

}  // namespace

app::FindVocabulary readVocabulary(Connection& connection) {
  return {
      .substances = entries(
          connection,
          "SELECT name, coalesce(uses, 0) AS uses FROM substance_name LEFT JOIN (SELECT "
          "substance_n AS s, count(DISTINCT run_n) AS uses FROM component GROUP BY substance_n) ON "
          "s = substance_n ORDER BY name, substance_name.n"),
      .series = entries(connection, ofRuns("series")),
      .people = entries(connection,
                        "SELECT code AS name, (SELECT count(*) FROM run WHERE person_n = person.n) "
                        "AS uses FROM person ORDER BY code"),
      .vials = entries(connection, ofRuns("vial", "vial_type")),
      .lamps = entries(connection, ofRuns("lamp", "lamp")),
      .atmospheres = entries(connection, ofRuns("atmosphere"))};
}

}  // namespace vialkeeper::db
