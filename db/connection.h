// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <SQLiteCpp/SQLiteCpp.h>

#include <memory>
#include <span>
#include <string>
#include <string_view>
#include <unordered_map>
#include <vector>

#include "db/open_files.h"
#include "db/row.h"
#include "text/fault.h"

namespace vialkeeper::db {

/// `VLKP`: marks a file as a notebook.
inline constexpr std::int32_t kApplicationId = 0x564C4B50;

enum class Access { kReadOnly, kReadWrite };

/// One connection to a notebook file, set up as tech-facts B asks: every pragma's answer is read
/// back. SQLite's exceptions do not leave `db`; use guarded() at its doors.
class Connection {
 public:
  /// Opens an existing file, or creates it where `create` says so. Throws SQLite::Exception.
  Connection(const std::string& file, Access access, bool create);

  void run(const std::string& sql, std::span<const Cell> cells = {});
  void run(const std::string& sql, std::initializer_list<Cell> cells) {
    run(sql, std::span(cells.begin(), cells.size()));
  }
  [[nodiscard]] std::vector<Row> rows(const std::string& sql, std::span<const Cell> cells = {});
  [[nodiscard]] std::vector<Row> rows(const std::string& sql, std::initializer_list<Cell> cells) {
    return rows(sql, std::span(cells.begin(), cells.size()));
  }
  /// The first cell of the first row; monostate without one.
  [[nodiscard]] Cell cell(const std::string& sql, std::initializer_list<Cell> cells = {});
  [[nodiscard]] std::int64_t integer(const std::string& sql,
                                     std::initializer_list<Cell> cells = {});

  [[nodiscard]] SQLite::Database& database() { return *m_database; }
  [[nodiscard]] const std::string& file() const { return m_file; }

 private:
  void configure();
  /// A prepared statement, kept for the next time, with its cells bound. Good until the next one.
  [[nodiscard]] SQLite::Statement& prepared(const std::string& sql, std::span<const Cell> cells);

  std::string m_file;
  Access m_access;
  OpenFile m_open;  ///< before the database opens, after it closes
  std::unique_ptr<SQLite::Database> m_database;
  std::unordered_map<std::string, std::unique_ptr<SQLite::Statement>> m_statements;
};

/// The row under a statement that has stepped onto one.
[[nodiscard]] Row rowOf(const SQLite::Statement& statement);
void bind(SQLite::Statement& statement, std::span<const Cell> cells);

/// The fault that a person is told for an exception of SQLite, or of damage found on the way.
[[nodiscard]] text::Fault toFault(const SQLite::Exception& error, const std::string& file);

/// Calls `work`, which gives a Checked, and turns what SQLite throws into a fault.
template <class Work>
auto guarded(const std::string& file, Work&& work) -> decltype(work()) {
  try {
    return work();
  } catch (const SQLite::Exception& error) {
    return std::unexpected(text::Faults{toFault(error, file)});
  }
}

}  // namespace vialkeeper::db
