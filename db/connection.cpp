// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/connection.h"

#include <fmt/format.h>
#include <sqlite3.h>

#include "db/writer_mark.h"

namespace vialkeeper::db {
namespace {

constexpr int kBusyTimeout_ms = 5000;

int openFlags(Access access, bool create) {
  if (access == Access::kReadOnly) return SQLite::OPEN_READONLY;
  return SQLite::OPEN_READWRITE | (create ? SQLite::OPEN_CREATE : 0);
}

void require(bool ok, const char* what) {
  if (!ok) throw SQLite::Exception(what, SQLITE_MISUSE);
}

}  // namespace

Connection::Connection(const std::string& file, Access access, bool create)
    : m_file(file),
      m_access(access),
      m_database(
          std::make_unique<SQLite::Database>(file, openFlags(access, create), kBusyTimeout_ms)) {
  configure();
}

void Connection::configure() {
  sqlite3* handle = m_database->getHandle();
  int answer = 0;
  const auto config = [&](int option, int value) {
    require(sqlite3_db_config(handle, option, value, &answer) == SQLITE_OK && answer == value,
            "a safety setting was refused");
  };
  config(SQLITE_DBCONFIG_DEFENSIVE, 1);
  config(SQLITE_DBCONFIG_DQS_DML, 0);
  config(SQLITE_DBCONFIG_DQS_DDL, 0);
  config(SQLITE_DBCONFIG_TRUSTED_SCHEMA, 0);
  config(SQLITE_DBCONFIG_ENABLE_FKEY, 1);
  sqlite3_limit(handle, SQLITE_LIMIT_ATTACHED, 0);
  const auto pragma = [&](const char* name, const char* value, std::int64_t expected) {
    m_database->exec(fmt::format("PRAGMA {} = {}", name, value));
    require(integer(fmt::format("PRAGMA {}", name)) == expected, "a pragma was refused");
  };
  pragma("recursive_triggers", "ON", 1);
  pragma("cell_size_check", "ON", 1);
  pragma("synchronous", "EXTRA", 3);
  pragma("mmap_size", "0", 0);
  pragma("temp_store", "MEMORY", 2);
  if (m_access == Access::kReadWrite) {
    const Cell mode = cell("PRAGMA journal_mode = DELETE");
    require(std::get_if<std::string>(&mode) != nullptr, "the journal mode was refused");
  }
}

SQLite::Statement& Connection::prepared(const std::string& sql, std::span<const Cell> cells) {
  auto& statement = m_statements[sql];
  if (!statement) statement = std::make_unique<SQLite::Statement>(*m_database, sql);
  statement->reset();
  statement->clearBindings();
  bind(*statement, cells);
  return *statement;
}

void Connection::run(const std::string& sql, std::span<const Cell> cells) {
  SQLite::Statement& statement = prepared(sql, cells);
  while (statement.executeStep()) {
  }
  statement.reset();
}

std::vector<Row> Connection::rows(const std::string& sql, std::span<const Cell> cells) {
  SQLite::Statement& statement = prepared(sql, cells);
  std::vector<Row> rows;
  while (statement.executeStep()) rows.push_back(rowOf(statement));
  statement.reset();
  return rows;
}

Cell Connection::cell(const std::string& sql, std::initializer_list<Cell> cells) {
  const auto found = rows(sql, cells);
  return found.empty() || found.front().cells().empty() ? Cell{}
                                                        : found.front().cells().front().second;
}

std::int64_t Connection::integer(const std::string& sql, std::initializer_list<Cell> cells) {
  const Cell found = cell(sql, cells);
  const auto* value = std::get_if<std::int64_t>(&found);
  return value != nullptr ? *value : 0;
}

Row rowOf(const SQLite::Statement& statement) {
  Row row;
  for (int i = 0; i < statement.getColumnCount(); ++i) {
    const SQLite::Column column = const_cast<SQLite::Statement&>(statement).getColumn(i);
    Cell cell;
    switch (column.getType()) {
      case SQLITE_INTEGER:
        cell = static_cast<std::int64_t>(column.getInt64());
        break;
      case SQLITE_FLOAT:
        cell = column.getDouble();
        break;
      case SQLITE_TEXT:
        cell = column.getString();
        break;
      case SQLITE_BLOB:
        cell = Blob{column.getString()};
        break;
      default:
        break;
    }
    row.set(column.getName(), std::move(cell));
  }
  return row;
}

void bind(SQLite::Statement& statement, std::span<const Cell> cells) {
  int index = 1;
  for (const Cell& cell : cells) {
    if (const auto* whole = std::get_if<std::int64_t>(&cell)) {
      statement.bind(index, *whole);
    } else if (const auto* real = std::get_if<double>(&cell)) {
      statement.bind(index, *real);
    } else if (const auto* text = std::get_if<std::string>(&cell)) {
      statement.bind(index, *text);
    } else if (const auto* blob = std::get_if<Blob>(&cell)) {
      statement.bind(index, static_cast<const void*>(blob->bytes.data()),
                     static_cast<int>(blob->bytes.size()));
    } else {
      statement.bind(index);
    }
    ++index;
  }
}

text::Fault toFault(const SQLite::Exception& error, const std::string& file) {
  const auto fault = [&file](std::string what, std::string mend) {
    return text::Fault{.kind = text::FaultKind::kNotebook,
                       .file = file,
                       .what = std::move(what),
                       .mend = std::move(mend)};
  };
  switch (error.getErrorCode()) {
    case SQLITE_BUSY:
    case SQLITE_LOCKED: {
      const std::string holder = writerOf(file);
      return fault(
          "another program is writing to the notebook" + (holder.empty() ? "" : ": " + holder),
          "wait a moment and try again; nothing was changed");
    }
    case SQLITE_CORRUPT:
    case SQLITE_NOTADB:
      return fault("the notebook file is damaged or is no notebook",
                   "keep it as it is, run verify, and go back to a backup");
    case SQLITE_FULL:
      return fault("the disk is full", "free some room; nothing was changed");
    case SQLITE_READONLY:
      return fault("the notebook may not be written here",
                   "check the permissions of file and folder");
    case SQLITE_CANTOPEN:
      return fault("the notebook cannot be opened",
                   "check that file and folder exist and may be read");
    case SQLITE_IOERR:
      return fault("the disk reported an error", "check disk and share; nothing was changed");
    case SQLITE_TOOBIG:
      return fault("a text or file is too large for the notebook", "keep it under 900 MB");
    case SQLITE_INTERRUPT:
      return {.kind = text::FaultKind::kNotebook,
              .file = file,
              .field = "interrupted",
              .what = "the search was broken off",
              .mend = "nothing is to be done"};
    case SQLITE_CONSTRAINT:
      return fault(std::string("the notebook refuses this: ") + error.what(),
                   "nothing was changed");
    default:
      return fault(std::string("the notebook reported: ") + error.what(),
                   "nothing was changed; run verify");
  }
}

}  // namespace vialkeeper::db
