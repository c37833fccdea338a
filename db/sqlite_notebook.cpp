// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/sqlite_notebook.h"

#include <fmt/format.h>
#include <sqlite3.h>

#include <algorithm>
#include <array>
#include <filesystem>
#include <fstream>
#include <map>
#include <optional>

#include "app/notebook/shelf_fields.h"
#include "db/archive.h"
#include "db/audited_writer.h"
#include "db/canonical_run.h"
#include "db/connection.h"
#include "db/find_sql.h"
#include "db/migrations.h"
#include "db/record_rows.h"
#include "db/sqlite_writing.h"
#include "db/verifier.h"
#include "db/vocabulary_sql.h"
#include "db/writer_mark.h"

namespace vialkeeper::db {
namespace {

namespace fs = std::filesystem;
using text::Checked;
using text::Faults;

std::unexpected<Faults> notebookFault(const std::string& file, std::string what, std::string mend) {
  return std::unexpected(Faults{{.kind = text::FaultKind::kNotebook,
                                 .file = file,
                                 .what = std::move(what),
                                 .mend = std::move(mend)}});
}

class SqliteNotebook final : public app::Notebook {
 public:
  SqliteNotebook(std::unique_ptr<Connection> connection, std::string readOnlyReason)
      : m_connection(std::move(connection)), m_readOnlyReason(std::move(readOnlyReason)) {}

  Checked<void> act(const app::Action& action,
                    const std::function<Checked<void>(app::Writing&)>& work) override {
    if (!m_readOnlyReason.empty()) {
      return notebookFault(m_connection->file(),
                           "the notebook is open for reading only: " + m_readOnlyReason,
                           "nothing was changed");
    }
    return guarded(m_connection->file(), [&]() -> Checked<void> {
      SQLite::Transaction transaction(m_connection->database(),
                                      SQLite::TransactionBehavior::IMMEDIATE);
      const WriterMark mark(m_connection->file());
      AuditedWriter writer(*m_connection, action);
      SqliteWriting writing(*m_connection, writer);
      if (auto done = work(writing); !done) return done;
      writer.finish();
      transaction.commit();
      m_people.clear();
      return {};
    });
  }

  Checked<std::vector<app::Person>> people() override {
    return read<app::Person>("SELECT * FROM person ORDER BY code", {}, personOf);
  }

  Checked<std::optional<app::Person>> findPerson(std::string_view code) override {
    return readOne<app::Person>("SELECT * FROM person WHERE code = ?", {Cell{std::string(code)}},
                                personOf);
  }

  Checked<std::vector<app::SubstanceRecord>> substances() override {
    return readSubstances("SELECT * FROM substance ORDER BY name COLLATE NOCASE", {});
  }

  Checked<app::SubstanceRecord> substance(app::RowNumber n) override {
    auto found = readSubstances("SELECT * FROM substance WHERE n = ?", {Cell{n}});
    if (!found) return std::unexpected(found.error());
    if (!found->empty()) return std::move(found->front());
    return notebookFault(m_connection->file(), fmt::format("substance {} is not there", n),
                         "run verify");
  }

  Checked<std::optional<app::SubstanceRecord>> substanceByCas(std::string_view cas) override {
    return firstSubstance("SELECT * FROM substance WHERE cas = ? ORDER BY n",
                          {Cell{std::string(cas)}});
  }

  Checked<std::optional<app::SubstanceRecord>> substanceByStructure(
      std::string_view canonicalSmiles) override {
    return firstSubstance("SELECT * FROM substance WHERE canonical_smiles = ? ORDER BY n",
                          {Cell{std::string(canonicalSmiles)}});
  }

  Checked<std::vector<app::SubstanceRecord>> substancesByName(
      std::string_view foldedName) override {
    return readSubstances(
        "SELECT * FROM substance WHERE n IN (SELECT substance_n FROM substance_name WHERE folded = "
        "?) ORDER BY n",
        {Cell{std::string(foldedName)}});
  }

  Checked<std::vector<std::pair<std::string, app::RowNumber>>> substanceNames() override {
    using Entry = std::pair<std::string, app::RowNumber>;
    return read<Entry>(
        "SELECT name, substance_n FROM substance_name ORDER BY name COLLATE NOCASE, n", {},
        [](const Row& row) {
          return Entry{row.text("name"), row.integer("substance_n")};
        });
  }

  Checked<std::vector<app::ShelfCard>> cards(app::ShelfKind kind) override {
    return read<app::ShelfCard>(
        fmt::format("SELECT * FROM {} ORDER BY name COLLATE NOCASE", app::shelfKind(kind).table),
        {}, [kind](const Row& row) { return cardOf(kind, row); });
  }

  Checked<std::optional<app::ShelfCard>> findCard(app::ShelfKind kind,
                                                  std::string_view name) override {
    return readOne<app::ShelfCard>(
        fmt::format("SELECT * FROM {} WHERE name = ? COLLATE NOCASE", app::shelfKind(kind).table),
        {Cell{std::string(name)}}, [kind](const Row& row) { return cardOf(kind, row); });
  }

  Checked<std::optional<app::RunRecord>> findRun(std::string_view code) override {
    return readOne<app::RunRecord>("SELECT * FROM run WHERE code = ? COLLATE NOCASE",
                                   {Cell{std::string(code)}},
                                   [this](const Row& row) { return runOf(row, personCode()); });
  }

  Checked<app::RunRecord> run(app::RowNumber n) override {
    auto found =
        readOne<app::RunRecord>("SELECT * FROM run WHERE n = ?", {Cell{n}},
                                [this](const Row& row) { return runOf(row, personCode()); });
    if (!found) return std::unexpected(found.error());
    if (*found) return **std::move(found);
    return notebookFault(m_connection->file(), fmt::format("run {} is not there", n), "run verify");
  }

  Checked<std::vector<app::ComponentRecord>> components(app::RowNumber run) override {
    return read<app::ComponentRecord>(
        "SELECT * FROM component WHERE run_n = ? ORDER BY position", {Cell{run}},
        [this](const Row& row) { return componentOf(row, personCode()); });
  }

  Checked<std::vector<app::EventRecord>> events(app::RowNumber run) override {
    return read<app::EventRecord>(
        "SELECT event.*, later.n AS superseded_by FROM event LEFT JOIN event AS later ON "
        "later.supersedes_n = event.n "
        "WHERE event.run_n = ? ORDER BY event.at_ms, event.n",
        {Cell{run}}, [this](const Row& row) { return eventOf(row, personCode()); });
  }

  Checked<std::string> attachment(app::RowNumber n) override {
    auto found = readOne<std::string>("SELECT data FROM attachment WHERE n = ?", {Cell{n}},
                                      [](const Row& row) { return row.bytes("data"); });
    if (!found) return std::unexpected(found.error());
    if (*found) return **std::move(found);
    return notebookFault(m_connection->file(), fmt::format("attachment {} is not there", n),
                         "run verify");
  }

  Checked<std::vector<app::DatasetRecord>> datasetsOf(app::RowNumber run) override {
    return read<app::DatasetRecord>(
        "SELECT dataset.* FROM dataset JOIN run_dataset ON dataset_n = dataset.n WHERE run_n = ? "
        "ORDER BY dataset.n",
        {Cell{run}}, datasetOf);
  }

  Checked<std::optional<app::DatasetRecord>> findDataset(std::string_view code) override {
    return readOne<app::DatasetRecord>("SELECT * FROM dataset WHERE code = ? COLLATE NOCASE",
                                       {Cell{std::string(code)}}, datasetOf);
  }

  Checked<std::vector<std::vector<double>>> datasetValues(
      const app::DatasetRecord& record) override {
    return guarded(m_connection->file(), [&]() -> Checked<std::vector<std::vector<double>>> {
      std::vector<std::vector<double>> values(record.columns.size());
      for (const Row& row : m_connection->rows("SELECT column_index, data FROM dataset_block WHERE "
                                               "dataset_n = ? ORDER BY column_index, block_index",
                                               {Cell{record.n}})) {
        const auto column = static_cast<std::size_t>(row.integer("column_index"));
        if (column >= values.size()) continue;  // verify tells it
        const auto block = unpacked(row.bytes("data"));
        values[column].insert(values[column].end(), block.begin(), block.end());
      }
      return values;
    });
  }

  Checked<std::vector<app::RevisionRecord>> history(app::RowNumber run) override {
    return read<app::RevisionRecord>("SELECT * FROM revision WHERE run_n = ? ORDER BY seq",
                                     {Cell{run}}, revisionOf);
  }

  Checked<app::FindResult> find(const app::FindQuery& query,
                                const app::FindOptions& options) override;

  Checked<std::optional<app::SigningKey>> signingKey(std::string_view person) override {
    return readOne<app::SigningKey>(
        "SELECT signing_key.*, person.code AS person FROM signing_key JOIN person ON person.n = "
        "person_n "
        "WHERE person.code = ? ORDER BY signing_key.n DESC LIMIT 1",
        {Cell{std::string(person)}}, [](const Row& row) {
          return app::SigningKey{.n = row.integer("n"),
                                 .person = row.text("person"),
                                 .publicKey = row.bytes("public_key"),
                                 .sealedSecret = row.bytes("sealed_secret"),
                                 .salt = row.bytes("salt"),
                                 .nonce = row.bytes("nonce"),
                                 .operations = row.integer("operations"),
                                 .memory_bytes = row.integer("memory_bytes")};
        });
  }

  Checked<std::vector<app::SealRecord>> seals(app::RowNumber run) override {
    return read<app::SealRecord>(
        "SELECT seal.*, signing_key.public_key AS public_key, person.code AS person FROM seal "
        "JOIN signing_key ON signing_key.n = signing_key_n JOIN person ON person.n = person_n "
        "WHERE seal.run_n = ? ORDER BY seal.n",
        {Cell{run}}, [](const Row& row) {
          return app::SealRecord{.n = row.integer("n"),
                                 .run = row.integer("run_n"),
                                 .meaning = row.text("meaning"),
                                 .key = row.integer("signing_key_n"),
                                 .person = row.text("person"),
                                 .publicKey = row.bytes("public_key"),
                                 .canonical = row.text("canonical"),
                                 .sha256 = row.bytes("sha256"),
                                 .signature = row.bytes("signature"),
                                 .signedAt = momentOf(row, "signed")};
        });
  }

  Checked<std::string> canonicalRun(app::RowNumber run) override {
    return guarded(m_connection->file(),
                   [&]() -> Checked<std::string> { return canonicalRunText(*m_connection, run); });
  }

  Checked<app::NotebookSummary> summary() override {
    return guarded(m_connection->file(), [&]() -> Checked<app::NotebookSummary> {
      const auto count = [this](const char* table) {
        return m_connection->integer(fmt::format("SELECT count(*) FROM {}", table));
      };
      return app::NotebookSummary{count("run"), count("substance"), count("event"),
                                  count("dataset"), count("revision")};
    });
  }

  Checked<std::int64_t> changeMark() override {
    return guarded(m_connection->file(), [&]() -> Checked<std::int64_t> {
      // The pragma tells what others wrote; what this connection wrote, it counts itself.
      return m_connection->integer("PRAGMA data_version") +
             m_connection->database().getTotalChanges();
    });
  }

  Checked<app::FindVocabulary> vocabulary() override {
    return guarded(m_connection->file(),
                   [&]() -> Checked<app::FindVocabulary> { return readVocabulary(*m_connection); });
  }

  void interrupt() noexcept override { sqlite3_interrupt(m_connection->database().getHandle()); }

  Checked<app::VerifyReport> verify() override {
    return guarded(m_connection->file(),
                   [&]() -> Checked<app::VerifyReport> { return verifyNotebook(*m_connection); });
  }

  Checked<void> backup(const std::string& file) override {
    return guarded(m_connection->file(),
                   [&]() -> Checked<void> { return copyTo(*m_connection, file); });
  }

  Checked<void> exportAll(const std::string& folder) override {
    return guarded(m_connection->file(),
                   [&]() -> Checked<void> { return writeArchive(*m_connection, folder); });
  }

  Checked<void> importAll(const std::string& folder) override {
    if (!m_readOnlyReason.empty())
      return notebookFault(m_connection->file(), m_readOnlyReason, "nothing was changed");
    return guarded(m_connection->file(),
                   [&]() -> Checked<void> { return readArchive(*m_connection, folder); });
  }

  [[nodiscard]] std::string readOnlyReason() const override { return m_readOnlyReason; }

 private:
  template <class T, class Make>
  Checked<std::vector<T>> read(const std::string& sql, std::initializer_list<Cell> cells,
                               Make make) {
    return guarded(m_connection->file(), [&]() -> Checked<std::vector<T>> {
      std::vector<T> list;
      for (const Row& row : m_connection->rows(sql, cells)) list.push_back(make(row));
      return list;
    });
  }

  template <class T, class Make>
  Checked<std::optional<T>> readOne(const std::string& sql, std::initializer_list<Cell> cells,
                                    Make make) {
    auto list = read<T>(sql, cells, make);
    if (!list) return std::unexpected(list.error());
    if (list->empty()) return std::optional<T>{};
    return std::optional<T>(std::move(list->front()));
  }

  Checked<std::vector<app::SubstanceRecord>> readSubstances(const std::string& sql,
                                                            std::initializer_list<Cell> cells) {
    auto list = read<app::SubstanceRecord>(sql, cells, substanceOf);
    if (!list) return list;
    return guarded(m_connection->file(), [&]() -> Checked<std::vector<app::SubstanceRecord>> {
      for (app::SubstanceRecord& substance : *list) {
        for (const Row& row :
             m_connection->rows("SELECT name FROM substance_name WHERE substance_n = ? ORDER BY n",
                                {Cell{substance.n}})) {
          if (row.text("name") != substance.name) substance.synonyms.push_back(row.text("name"));
        }
      }
      return *std::move(list);
    });
  }

  Checked<std::optional<app::SubstanceRecord>> firstSubstance(const std::string& sql,
                                                              std::initializer_list<Cell> cells) {
    auto list = readSubstances(sql, cells);
    if (!list) return std::unexpected(list.error());
    if (list->empty()) return std::optional<app::SubstanceRecord>{};
    return std::optional(std::move(list->front()));
  }

  /// Initials by number; people are few and their initials do not change.
  PersonCode personCode() {
    if (m_people.empty()) {
      for (const Row& row : m_connection->rows("SELECT n, code FROM person"))
        m_people[row.integer("n")] = row.text("code");
    }
    return [this](std::int64_t n) {
      const auto found = m_people.find(n);
      if (found != m_people.end()) return found->second;
      const auto rows = m_connection->rows("SELECT code FROM person WHERE n = ?", {Cell{n}});
      return rows.empty() ? std::string("?") : rows.front().text("code");
    };
  }

  std::unique_ptr<Connection> m_connection;
  std::string m_readOnlyReason;
  std::map<std::int64_t, std::string> m_people;
};

Checked<app::FindResult> SqliteNotebook::find(const app::FindQuery& query,
                                              const app::FindOptions& options) {
  return guarded(m_connection->file(), [&]() -> Checked<app::FindResult> {
    const FindSql sql = findSql(query, options);
    app::FindResult result;
    for (const Row& row :
         m_connection->rows(sql.select.sql, std::span<const Cell>(sql.select.cells))) {
      auto found = run(row.integer("n"));
      if (!found) return std::unexpected(found.error());
      auto parts = components(found->n);
      if (!parts) return std::unexpected(parts.error());
      result.runs.push_back({*std::move(found), *std::move(parts)});
    }
    result.matches = static_cast<std::int64_t>(result.runs.size());
    if (options.count && options.limit != 0 && result.runs.size() >= options.limit) {
      const auto counted =
          m_connection->rows(sql.count.sql, std::span<const Cell>(sql.count.cells));
      result.matches =
          counted.empty() ? 0 : std::get<std::int64_t>(counted.front().cells().front().second);
    }
    return result;
  });
}

/// What the first bytes of a file say it is: SQLite's magic and our application id.
std::optional<std::string> headerFault(const std::string& file) {
  std::ifstream stream(file, std::ios::binary);
  std::array<char, 100> header{};
  stream.read(header.data(), header.size());
  const auto count = stream.gcount();
  if (count == 0) return "the file is empty";
  if (count < 100 ||
      std::string_view(header.data(), 16) != std::string_view("SQLite format 3\0", 16)) {
    return "this is no notebook";
  }
  std::uint32_t id = 0;
  for (int i = 68; i < 72; ++i)
    id = (id << 8U) | static_cast<unsigned char>(header[static_cast<std::size_t>(i)]);
  if (id != static_cast<std::uint32_t>(kApplicationId))
    return "this is a database, but no notebook";
  return std::nullopt;
}

/// Why the file may only be read, or nothing.
std::string writingObstacle(const std::string& file) {
  std::error_code ignored;
  const fs::path folder = fs::absolute(file, ignored).parent_path();
  if (const std::string locking = lockingFault(file); !locking.empty()) return locking;
  std::fstream probe(file, std::ios::in | std::ios::out | std::ios::binary);
  return probe ? "" : "the file may not be written";
}

}  // namespace

Checked<std::unique_ptr<app::Notebook>> createNotebook(const std::string& file) {
  std::error_code ignored;
  if (fs::exists(file, ignored)) {
    return notebookFault(file, "there is a file of this name already",
                         "name another; nothing was changed");
  }
  const fs::path folder = fs::absolute(file, ignored).parent_path();
  if (!fs::is_directory(folder, ignored))
    return notebookFault(file, "the folder does not exist", "make it first");
  if (const std::string locking = lockingFault(file); !locking.empty()) {
    return notebookFault(file, locking, "keep the notebook in a folder of this computer");
  }
  return guarded(file, [&]() -> Checked<std::unique_ptr<app::Notebook>> {
    auto connection = std::make_unique<Connection>(file, Access::kReadWrite, true);
    if (const auto made = migrate(*connection, ""); !made) return std::unexpected(made.error());
    return std::make_unique<SqliteNotebook>(std::move(connection), "");
  });
}

Checked<std::unique_ptr<app::Notebook>> openNotebook(const std::string& file, OpenFor use,
                                                     const std::string& stamp) {
  std::error_code ignored;
  if (!fs::exists(file, ignored))
    return notebookFault(file, "there is no such notebook",
                         "check the path, or make one with create");
  if (fs::is_directory(file, ignored))
    return notebookFault(file, "this is a folder, not a notebook", "name the .vialbook file");
  if (const auto wrong = headerFault(file))
    return notebookFault(file, *wrong, "name a .vialbook file");
  return guarded(file, [&]() -> Checked<std::unique_ptr<app::Notebook>> {
    std::string reason = use == OpenFor::kReading ? "it was opened so" : writingObstacle(file);
    auto connection = std::make_unique<Connection>(
        file, reason.empty() ? Access::kReadWrite : Access::kReadOnly, false);
    const int schema = schemaOf(*connection);
    if (schema > newestSchema()) {
      reason = fmt::format("it was written by a newer Vialkeeper (form {}, this program knows {})",
                           schema, newestSchema());
      connection = std::make_unique<Connection>(file, Access::kReadOnly, false);
    } else if (schema < newestSchema()) {
      if (!reason.empty()) {
        return notebookFault(
            file,
            fmt::format("the notebook is of an older form ({}) and must be written to be read",
                        schema),
            "open it from a place where it may be written");
      }
      if (const auto moved = migrate(*connection, stamp); !moved)
        return std::unexpected(moved.error());
    }
    return std::make_unique<SqliteNotebook>(std::move(connection), reason);
  });
}

}  // namespace vialkeeper::db
