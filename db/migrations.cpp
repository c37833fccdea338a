// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/migrations.h"

#include <SQLiteCpp/Backup.h>
#include <fmt/format.h>

#include <cstdlib>
#include <map>

#include "db/new_file.h"
#include "text/embedded_file.h"

namespace vialkeeper::text {
// Defined in the file that the build generates from db/migrations, in the order of their numbers.
extern const EmbeddedFile migrationFiles[];
extern const std::size_t migrationFilesCount;
}  // namespace vialkeeper::text

namespace vialkeeper::db {
namespace {

std::unexpected<text::Faults> fault(const std::string& file, std::string what, std::string mend) {
  return std::unexpected(text::Faults{{.kind = text::FaultKind::kNotebook,
                                       .file = file,
                                       .what = std::move(what),
                                       .mend = std::move(mend)}});
}

void step(Connection& connection, int to) {
  const text::EmbeddedFile& script = text::migrationFiles[to - 1];
  SQLite::Transaction transaction(connection.database(), SQLite::TransactionBehavior::IMMEDIATE);
  connection.database().exec(std::string(script.contents));
  connection.database().exec(fmt::format("PRAGMA application_id = {}", kApplicationId));
  connection.database().exec(fmt::format("PRAGMA user_version = {}", to));
  transaction.commit();
}

}  // namespace

int newestSchema() { return static_cast<int>(text::migrationFilesCount); }

int schemaOf(Connection& connection) {
  return static_cast<int>(connection.integer("PRAGMA user_version"));
}

text::Checked<void> migrate(Connection& connection, const std::string& stamp) {
  const int found = schemaOf(connection);
  if (found > 0 && found < newestSchema()) {
    const std::string copy =
        fmt::format("{}.before-form-{}-{}", connection.file(), newestSchema(), stamp);
    if (const auto copied = copyTo(connection, copy); !copied) {
      return fault(
          connection.file(),
          "the notebook was not brought to the newer form, because no copy of it could be made: " +
              copied.error().front().what,
          "make room beside the notebook or free the name, then open it again");
    }
  }
  for (int to = found + 1; to <= newestSchema(); ++to) step(connection, to);
  return {};
}

std::vector<std::string> schemaDifferences(Connection& connection) {
  constexpr const char* kSchema =
      "SELECT type || ' ' || name AS name, coalesce(sql, '') AS sql FROM sqlite_master";
  const int schema = schemaOf(connection);
  if (schema < 1 || schema > newestSchema()) return {};  // a form that this program does not know
  SQLite::Database fresh(":memory:", SQLite::OPEN_READWRITE | SQLite::OPEN_CREATE);
  for (int to = 1; to <= schema; ++to)
    fresh.exec(std::string(text::migrationFiles[to - 1].contents));
  std::map<std::string, std::string> expected;
  SQLite::Statement statement(fresh, kSchema);
  while (statement.executeStep())
    expected[statement.getColumn(0).getString()] = statement.getColumn(1).getString();
  std::vector<std::string> differences;
  for (const Row& row : connection.rows(kSchema)) {
    const auto known = expected.find(row.text("name"));
    if (known == expected.end()) {
      differences.push_back(row.text("name") + " does not belong to a notebook");
    } else {
      if (known->second != row.text("sql"))
        differences.push_back(row.text("name") + " was altered");
      expected.erase(known);
    }
  }
  for (const auto& [name, sql] : expected) differences.push_back(name + " is missing");
  return differences;
}

text::Checked<void> copyTo(Connection& connection, const std::string& file) {
  NewFile copy(file);
  if (const auto may = copy.check(); !may) return may;
  try {
    {
      SQLite::Database target(copy.temporary(), SQLite::OPEN_READWRITE | SQLite::OPEN_CREATE);
      SQLite::Backup(target, connection.database()).executeStep();
    }
    SQLite::Database reopened(copy.temporary(), SQLite::OPEN_READONLY);
    SQLite::Statement check(reopened, "PRAGMA integrity_check(1)");
    if (!check.executeStep() || check.getColumn(0).getString() != "ok") {
      return fault(connection.file(),
                   "the copy is not sound, so the notebook itself may be damaged", "run verify");
    }
  } catch (const SQLite::Exception& error) {
    return std::unexpected(text::Faults{toFault(error, file)});
  }
  return copy.giveName();
}

}  // namespace vialkeeper::db
