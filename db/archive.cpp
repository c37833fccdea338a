// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/archive.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <filesystem>
#include <fstream>
#include <nlohmann/json.hpp>
#include <set>

#include "app/text_files.h"
#include "db/audited_writer.h"
#include "db/canonical_json.h"
#include "db/migrations.h"
#include "db/verifier.h"

namespace vialkeeper::db {
namespace {

namespace fs = std::filesystem;
using nlohmann::json;
using text::Checked;
using text::Faults;

constexpr const char* kFormat = "vialkeeper-archive/1";
constexpr std::size_t kLongestInline = 64;

std::unexpected<Faults> fault(const std::string& file, int line, std::string what,
                              std::string mend) {
  return std::unexpected(
      Faults{{.file = file, .line = line, .what = std::move(what), .mend = std::move(mend)}});
}

/// Tables in the order in which they are filled: events and components before their runs, so that
/// the guards of sealed runs, which look at the run, let them in; references are checked at the
/// end.
std::vector<std::string> archivedTables() {
  std::vector<std::string> tables = auditedTables();
  std::erase(tables, "run");
  tables.emplace_back("run");
  for (const char* table : {"setting", "revision", "run_words"}) tables.emplace_back(table);
  return tables;
}

/// One row as a line: texts and numbers as they are, short binary values in hexadecimal, longer
/// ones as files of their own.
class ArchiveWriter {
 public:
  ArchiveWriter(Connection& connection, fs::path folder)
      : m_connection(connection), m_folder(std::move(folder)) {}

  Checked<void> write() {
    std::error_code error;
    if (fs::exists(m_folder, error))
      return fault(m_folder.string(), 0, "this folder is there already", "name a new one");
    fs::create_directories(m_folder / "tables", error);
    if (!error) fs::create_directories(m_folder / "blobs", error);
    if (error)
      return fault(m_folder.string(), 0, "the folder cannot be made: " + error.message(),
                   "name another place");
    // One transaction, so that the archive is the notebook of one moment.
    SQLite::Transaction transaction(m_connection.database());
    std::string counts;
    for (const std::string& table : archivedTables()) {
      const auto rows = writeTable(table);
      if (!rows) return std::unexpected(rows.error());
      counts +=
          fmt::format("{}\n    {}: {}", counts.empty() ? "" : ",", canonicalText(table), *rows);
    }
    return app::writeFile(
        (m_folder / "notebook.json").string(),
        fmt::format("{{\n  \"format\": \"{}\",\n  \"schema\": {},\n  \"rows\": {{{}\n  }}\n}}\n",
                    kFormat, schemaOf(m_connection), counts));
  }

 private:
  Checked<std::int64_t> writeTable(const std::string& table) {
    const fs::path file = m_folder / "tables" / (table + ".jsonl");
    std::ofstream stream(file, std::ios::binary);
    SQLite::Statement statement(m_connection.database(),
                                fmt::format("SELECT * FROM {} ORDER BY 1", table));
    std::int64_t count = 0;
    while (statement.executeStep()) {
      const auto line = lineOf(rowOf(statement));
      if (!line) return std::unexpected(line.error());
      stream << *line << '\n';
      ++count;
    }
    stream.flush();
    if (!stream) return fault(file.string(), 0, "the file cannot be written", "check the disk");
    return count;
  }

  Checked<std::string> lineOf(const Row& row) {
    std::string line = "{";
    for (const auto& [column, cell] : row.cells()) {
      if (std::holds_alternative<std::monostate>(cell)) continue;
      line += (line.size() > 1 ? "," : "") + canonicalText(column) + ":";
      if (const auto* blob = std::get_if<Blob>(&cell);
          blob != nullptr && blob->bytes.size() > kLongestInline) {
        const std::string digest = toHex(sha256(blob->bytes));
        const fs::path file = m_folder / "blobs" / digest;
        if (m_blobs.insert(digest).second) {
          if (const auto written = app::writeFile(file.string(), blob->bytes); !written) {
            return std::unexpected(written.error());
          }
        }
        line += fmt::format(R"({{"file":"{}"}})", digest);
      } else {
        const std::string single = canonicalRow({{"v", cell}});  // {"v":…}
        line += single.substr(5, single.size() - 6);
      }
    }
    return line + "}";
  }

  Connection& m_connection;
  fs::path m_folder;
  std::set<std::string> m_blobs;
};

class ArchiveReader {
 public:
  ArchiveReader(Connection& connection, fs::path folder)
      : m_connection(connection), m_folder(std::move(folder)) {}

  Checked<void> read() {
    if (const auto head = checkHead(); !head) return head;
    if (m_connection.integer("SELECT count(*) FROM revision") != 0 ||
        m_connection.integer("SELECT count(*) FROM person") != 0) {
      return fault(m_connection.file(), 0, "the notebook is not empty",
                   "import into one that was just created");
    }
    SQLite::Transaction transaction(m_connection.database(),
                                    SQLite::TransactionBehavior::IMMEDIATE);
    m_connection.run("PRAGMA defer_foreign_keys = ON");
    for (const std::string& table : archivedTables()) {
      if (const auto done = readTable(table); !done) return done;
    }
    m_connection.run("INSERT INTO run_search(run_search) VALUES('rebuild')");
    if (!m_connection.rows("PRAGMA foreign_key_check").empty()) {
      return fault(m_folder.string(), 0, "rows of the archive refer to others that are not in it",
                   "export it again");
    }
    // An archive that was altered must not become a notebook that looks sound.
    if (const auto report = verifyNotebook(m_connection); !report.findings.empty()) {
      const app::Finding& first = report.findings.front();
      return fault(m_folder.string(), 0,
                   "the archive was altered: " + first.where + ": " + first.what,
                   "export it again from the notebook; nothing was imported");
    }
    transaction.commit();
    return {};
  }

 private:
  Checked<void> checkHead() {
    const std::string file = (m_folder / "notebook.json").string();
    const auto bytes = app::readFile(file);
    if (!bytes) return std::unexpected(bytes.error());
    const json head = json::parse(*bytes, nullptr, false);
    const bool known = head.is_object() && head.contains("format") && head["format"] == kFormat;
    if (!known)
      return fault(file, 0, "this is no archive of a notebook",
                   fmt::format("name a folder with {}", kFormat));
    if (!head.contains("schema") || head["schema"] != schemaOf(m_connection)) {
      return fault(file, 0, "the archive is of another form of the notebook",
                   "import it with the program that wrote it, then open that notebook here");
    }
    return {};
  }

  Checked<void> readTable(const std::string& table) {
    const std::string file = (m_folder / "tables" / (table + ".jsonl")).string();
    std::ifstream stream(file, std::ios::binary);
    if (!stream) return fault(file, 0, "the file is missing from the archive", "export it again");
    std::set<std::string> columns;
    for (const Row& row :
         m_connection.rows(fmt::format("SELECT name FROM pragma_table_info('{}')", table))) {
      columns.insert(row.text("name"));
    }
    std::string line;
    for (int number = 1; std::getline(stream, line); ++number) {
      const json object = json::parse(line, nullptr, false);
      if (!object.is_object())
        return fault(file, number, "this line cannot be read", "export it again");
      if (const auto done = insert(table, columns, object, file, number); !done) return done;
    }
    return {};
  }

  Checked<void> insert(const std::string& table, const std::set<std::string>& columns,
                       const json& object, const std::string& file, int number) {
    std::vector<std::string> names;
    std::vector<std::string> places;
    std::vector<Cell> cells;
    for (const auto& [column, value] : object.items()) {
      if (!columns.contains(column))
        return fault(file, number, "an unknown column " + column, "export it again");
      auto cell = cellOf(value);
      if (!cell)
        return fault(file, number, column + ": " + cell.error(),
                     "export it again from the notebook; nothing was imported");
      names.push_back(column);
      places.emplace_back("?");
      cells.push_back(*std::move(cell));
    }
    if (names.empty()) return fault(file, number, "an empty row", "export it again");
    m_connection.run(fmt::format("INSERT INTO {} ({}) VALUES ({})", table, fmt::join(names, ", "),
                                 fmt::join(places, ", ")),
                     std::span<const Cell>(cells));
    return {};
  }

  /// The cell, or what is wrong with it.
  std::expected<Cell, std::string> cellOf(const json& value) {
    if (value.is_string()) return Cell{value.get<std::string>()};
    if (value.is_number_integer()) return Cell{value.get<std::int64_t>()};
    if (value.is_number_float()) return Cell{value.get<double>()};
    const auto member = [&value](const char* name) {
      const bool there = value.is_object() && value.contains(name) && value[name].is_string();
      return there ? value[name].get<std::string>() : std::string{};
    };
    if (value.is_object() && value.contains("hex")) return Cell{Blob{fromHex(member("hex"))}};
    const std::string digest = member("file");
    if (digest.empty()) return std::unexpected("this is neither a text nor a number nor a file");
    if (digest.size() != 64 || fromHex(digest).size() != 32)
      return std::unexpected("this names no file of the archive");  // nothing but a hash does
    std::ifstream stream(m_folder / "blobs" / digest, std::ios::binary);
    if (!stream) return std::unexpected(fmt::format("the file blobs/{} is missing", digest));
    std::string bytes((std::istreambuf_iterator<char>(stream)), std::istreambuf_iterator<char>());
    if (toHex(sha256(bytes)) != digest)
      return std::unexpected(fmt::format("the file blobs/{} was changed or cut short", digest));
    return Cell{Blob{std::move(bytes)}};
  }

  Connection& m_connection;
  fs::path m_folder;
};

}  // namespace

Checked<void> writeArchive(Connection& connection, const std::string& folder) {
  return ArchiveWriter(connection, folder).write();
}

Checked<void> readArchive(Connection& connection, const std::string& folder) {
  return ArchiveReader(connection, folder).read();
}

}  // namespace vialkeeper::db
