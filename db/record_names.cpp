// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/record_names.h"

#include <fmt/format.h>

#include <algorithm>

#include "app/notebook/shelf_fields.h"
#include "db/audited_writer.h"

namespace vialkeeper::db {
namespace {

/// Names rows by what they say and by what refers to them.
class Namer {
 public:
  explicit Namer(Connection& connection) : m_connection(connection) {}

  [[nodiscard]] std::string name(const std::string& table, const Row& row) {
    if (table == "run") return "run " + row.text("code");
    if (table == "person") return "person " + row.text("code");
    if (table == "substance") return "substance " + row.text("name");
    if (table == "dataset") return "dataset " + row.text("code");
    if (table == "event") return entryName(row);
    if (table == "component") return fmt::format("component {} of {}", row.text("key"), runOf(row));
    if (table == "attachment") return fileName(row.integer("n"));
    if (table == "seal") return fmt::format("seal of {} as {}", runOf(row), row.text("meaning"));
    if (table == "signing_key")
      return "signing key of " + textOf("person", "code", row.integer("person_n"));
    if (table == "substance_name") {
      return fmt::format("name {} of substance {}", row.text("name"),
                         textOf("substance", "name", row.integer("substance_n")));
    }
    if (table == "dataset_block") {
      return fmt::format("numbers of column {} of dataset {}", row.integer("column_index") + 1,
                         textOf("dataset", "code", row.integer("dataset_n")));
    }
    if (table == "run_dataset") {
      return fmt::format("link of dataset {} to {}",
                         textOf("dataset", "code", row.integer("dataset_n")), runOf(row));
    }
    if (table == "analysis")
      return fmt::format("analysis {} of {} (row {})", row.text("kind"), runOf(row),
                         row.integer("n"));
    for (const app::ShelfKindInfo& kind : app::shelfKinds()) {
      if (kind.table == table) return fmt::format("{} {}", kind.word, row.text("name"));
    }
    return fmt::format("{} (row {})", table, row.integer("n"));
  }

 private:
  /// A column of another row; its number where that row is not there.
  std::string textOf(const std::string& table, const std::string& column, std::int64_t n) {
    const Cell cell =
        m_connection.cell(fmt::format("SELECT {} FROM {} WHERE n = ?", column, table), {Cell{n}});
    const auto* text = std::get_if<std::string>(&cell);
    return text != nullptr ? *text : fmt::format("(row {})", n);
  }

  std::string runOf(const Row& row) { return textOf("run", "code", row.integer("run_n")); }

  /// Entries of a run are numbered in the order in which they were written, as `show` numbers them.
  std::string entryName(const Row& row) {
    const std::int64_t before =
        m_connection.integer("SELECT count(*) FROM event WHERE run_n = ? AND n < ?",
                             {Cell{row.integer("run_n")}, Cell{row.integer("n")}});
    return fmt::format("entry {} of {}", before + 1, runOf(row));
  }

  /// A file by the first record that refers to it.
  std::string fileName(std::int64_t n) {
    for (const Row& run : m_connection.rows("SELECT code FROM run WHERE plan_n = ?", {Cell{n}}))
      return "plan of " + run.text("code");
    for (const Row& set : m_connection.rows("SELECT code FROM dataset WHERE raw_n = ?", {Cell{n}}))
      return "raw file of dataset " + set.text("code");
    for (const Row& event :
         m_connection.rows("SELECT * FROM event WHERE attachment_n = ?", {Cell{n}}))
      return "file of " + entryName(event);
    return fmt::format("file (row {})", n);
  }

  Connection& m_connection;
};

}  // namespace

std::string nameOf(Connection& connection, const std::string& table, const Row& row) {
  try {
    return Namer(connection).name(table, row);
  } catch (const SQLite::Exception&) {
    return fmt::format("{} (row {})", table, row.integer("n"));  // what names it is damaged too
  }
}

std::string nameOf(Connection& connection, const std::string& table, std::int64_t n) {
  const auto& known = auditedTables();
  try {
    if (std::ranges::find(known, table) != known.end()) {
      for (const Row& row :
           connection.rows(fmt::format("SELECT * FROM {} WHERE n = ?", table), {Cell{n}}))
        return nameOf(connection, table, row);
    }
  } catch (const SQLite::Exception&) {
    // The number alone, then.
  }
  return fmt::format("{} (row {})", table, n);
}

}  // namespace vialkeeper::db
