// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/connection.h"

#include <fmt/format.h>
#include <sqlite3.h>

#include <cstdint>
#include <filesystem>

#include "db/lock_holder.h"
#include "db/open_files.h"
#include "db/writer_mark.h"

namespace vialkeeper::db {
namespace {

constexpr int kBusyTimeout_ms = 5000;
constexpr std::size_t kMostStatements = 200;

int openFlags(Access access, bool create) {
  if (access == Access::kReadOnly) return SQLite::OPEN_READONLY;
  return SQLite::OPEN_READWRITE | (create ? SQLite::OPEN_CREATE : 0);
}

void require(bool ok, const char* what) {
  if (!ok) throw SQLite::Exception(what, SQLITE_MISUSE);
}

/// What a person does with a damaged file, however it came about.
constexpr const char* kDamagedMend =
    "copy the file as it is to a safe place, and go on with the newest backup; verify tells "
    "whether "
    "that one is sound";

/// A file that ends before its first page says it does is told as that.
text::Fault damagedFault(const std::string& file) {
  std::string header = firstBytes(file, 100).value_or("");
  const bool isWhole = header.size() == 100;
  header.resize(100);
  const auto number = [&header](std::size_t at, std::size_t bytes) {
    std::uint64_t value = 0;
    for (std::size_t i = at; i < at + bytes; ++i)
      value = (value << 8U) | static_cast<unsigned char>(header[i]);
    return value;
  };
  const std::uint64_t page = number(16, 2) == 1 ? 65536 : number(16, 2);
  const std::uint64_t whole = page * number(28, 4);
  std::error_code unknown;
  const std::uint64_t there = std::filesystem::file_size(file, unknown);
  const bool isCut = isWhole && !unknown && there < whole;
  return {.kind = text::FaultKind::kNotebook,
          .file = file,
          .what = isCut ? fmt::format("the notebook file is cut short: {} of {} bytes are there",
                                      there, whole)
                        : "the notebook file is damaged or is no notebook",
          .mend = kDamagedMend};
}

/// Who keeps us out: the system's list of locks knows programs of this computer, the writer's mark
/// our own on any.
text::Fault lockedFault(const std::string& file) {
  const LockHolder holder = lockHolderOf(file);
  const std::string marked = writerOf(file);
  std::string who = marked.empty() ? "" : ": " + marked;
  if (holder.process != 0) {
    who = fmt::format(": {} (process {})", holder.program.empty() ? "unnamed" : holder.program,
                      holder.process);
  }
  const bool reads = holder.process != 0 && !holder.writing;
  return {.kind = text::FaultKind::kNotebook,
          .file = file,
          .what = (reads ? "another program is reading the notebook and lets nobody write"
                         : "another program is writing to the notebook") +
                  who,
          .mend = holder.process == 0
                      ? "wait a moment and try again; nothing was changed"
                      : "wait a moment and try again, or close that program; nothing was changed"};
}

}  // namespace

Connection::Connection(const std::string& file, Access access, bool create)
    : m_file(file),
      m_access(access),
      m_open(file),
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
  // Searches are written anew each time: without a bound a long session would keep them all.
  if (m_statements.size() >= kMostStatements && !m_statements.contains(sql)) m_statements.clear();
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
      return lockedFault(file);
    }
    case SQLITE_CORRUPT:
    case SQLITE_NOTADB:
      return damagedFault(file);
    case SQLITE_FULL:
      return fault("the disk is full", "free some room; nothing was changed");
    case SQLITE_READONLY:
      if (error.getExtendedErrorCode() == SQLITE_READONLY_ROLLBACK) {
        return fault(
            "a change that was broken off must be taken back first, and that needs permission to "
            "write file and folder",
            "open it once from where both may be written; nothing is lost");
      }
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
