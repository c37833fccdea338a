// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/verifier.h"

#include <fmt/format.h>

#include <charconv>
#include <unordered_map>

#include "db/audited_writer.h"
#include "db/canonical_json.h"
#include "db/canonical_run.h"
#include "db/migrations.h"
#include "db/raw_json.h"
#include "db/signing.h"

namespace vialkeeper::db {
namespace {

class Verifier {
 public:
  explicit Verifier(Connection& connection) : m_connection(connection) {}

  app::VerifyReport run() {
    step("pages", [this] { checkPages(); });
    step("schema", [this] {
      for (const std::string& difference : schemaDifferences(m_connection)) find("schema", difference);
    });
    step("references", [this] { checkReferences(); });
    step("full-text index", [this] { checkWords(); });
    step("revisions", [this] { checkChain(); });
    for (const std::string& table : auditedTables()) {
      step(table, [this, &table] { checkRecords(table); });
    }
    for (const auto& [name, digest] : m_told)
      find(name, "the trail tells of it, but it is not there");
    step("attachments", [this] { checkAttachments(); });
    step("seals", [this] { checkSeals(); });
    return std::move(m_report);
  }

 private:
  void find(std::string where, std::string what) {
    constexpr std::size_t kMost = 1000;
    if (m_report.findings.size() < kMost)
      m_report.findings.push_back({std::move(where), std::move(what)});
  }

  /// A step that damage cuts short is a finding; the next ones are still taken.
  template <class Work>
  void step(const std::string& name, Work work) {
    try {
      work();
    } catch (const SQLite::Exception& error) {
      find(name, fmt::format("could not be read to the end: {}", error.what()));
    }
  }

  void checkPages() {
    for (const Row& row : m_connection.rows("PRAGMA integrity_check(100)")) {
      const std::string answer = row.text("integrity_check");
      if (answer != "ok") find("pages", answer);
    }
  }

  void checkReferences() {
    for (const Row& row : m_connection.rows("PRAGMA foreign_key_check")) {
      find(fmt::format("{} {}", row.text("table"), row.integer("rowid")),
           fmt::format("refers to a row of {} that is not there", row.text("parent")));
    }
  }

  /// The index against its table, and the table against the records it is derived from.
  void checkWords() {
    try {
      m_connection.run("INSERT INTO run_search(run_search, rank) VALUES('integrity-check', 1)");
    } catch (const SQLite::Exception& error) {
      // A connection for reading cannot run the check; that is no damage.
      if (error.getErrorCode() != 8) find("full-text index", "does not match the runs' words");
    }
    for (const Row& row :
         m_connection.rows("SELECT run.n AS n FROM run LEFT JOIN run_words ON run_n = run.n WHERE "
                           "run_words.code IS NOT run.code OR "
                           "run_words.title IS NOT coalesce(run.title, '') OR run_words.aim IS NOT "
                           "coalesce(run.aim, '') OR "
                           "run_words.conclusion IS NOT coalesce(run.conclusion, '')")) {
      find(fmt::format("words of run {}", row.integer("n")), "differ from the run");
    }
  }

  void checkChain() {
    std::string previous(32, '\0');
    std::int64_t expected = 1;
    SQLite::Statement statement(m_connection.database(), "SELECT * FROM revision ORDER BY seq");
    while (statement.executeStep()) {
      const Row revision = rowOf(statement);
      const std::string where = fmt::format("revision {}", revision.integer("seq"));
      if (revision.integer("seq") != expected)
        find(where, fmt::format("revision {} is missing before it", expected));
      if (revision.bytes("previous") != previous) find(where, "does not follow the one before it");
      if (revision.bytes("hash") != revisionHash(revision))
        find(where, "was changed after it was written");
      previous = revision.bytes("hash");
      expected = revision.integer("seq") + 1;
      ++m_report.revisions;
      rememberChanges(where, revision.text("changes"));
    }
  }

  /// What each record must be now, by the last change that told it: the hash of its canonical text.
  void rememberChanges(const std::string& where, const std::string& changes) {
    const auto entries = rawElements(changes);
    if (entries.empty()) find(where, "tells no change");
    for (const std::string_view entry : entries) {
      const std::string_view table = rawMember(entry, "table");
      const std::string_view n = rawMember(entry, "n");
      const std::string_view after = rawMember(entry, "after");
      if (table.size() < 2 || after.empty()) {
        find(where, "holds a change that cannot be read");
        continue;
      }
      const std::string name = fmt::format("{} {}", table.substr(1, table.size() - 2), n);
      if (after == "null") {
        const auto told = m_told.find(name);
        if (told == m_told.end() || told->second != sha256(rawMember(entry, "before")))
          find(where, "takes out another " + name + " than the trail tells");
        m_told.erase(name);
        continue;
      }
      m_told[name] = sha256(after);
    }
  }

  void checkRecords(const std::string& table) {
    SQLite::Statement statement(m_connection.database(),
                                fmt::format("SELECT * FROM {} ORDER BY n", table));
    while (statement.executeStep()) {
      const Row row = rowOf(statement);
      const std::string name = fmt::format("{} {}", table, row.integer("n"));
      const auto told = m_told.find(name);
      if (told == m_told.end()) {
        find(name, "is there, but the trail does not tell of it");
      } else {
        if (told->second != sha256(canonicalRow(row)))
          find(name, "differs from what the trail tells");
        m_told.erase(told);
      }
      ++m_report.records;
    }
  }

  void checkAttachments() {
    SQLite::Statement statement(m_connection.database(),
                                "SELECT n, sha256, size, data FROM attachment ORDER BY n");
    while (statement.executeStep()) {
      const Row row = rowOf(statement);
      ++m_report.attachments;
      const std::string data = row.bytes("data");
      if (sha256(data) != row.bytes("sha256") ||
          static_cast<std::int64_t>(data.size()) != row.integer("size")) {
        find(fmt::format("attachment {}", row.integer("n")), "its bytes do not match its hash");
      }
    }
  }

  void checkSeals() {
    for (const Row& seal :
         m_connection.rows("SELECT seal.*, public_key, run.code AS code FROM seal JOIN signing_key "
                           "ON signing_key.n = signing_key_n "
                           "JOIN run ON run.n = seal.run_n ORDER BY seal.n")) {
      ++m_report.seals;
      const std::string where = fmt::format("seal {} of {}", seal.integer("n"), seal.text("code"));
      const std::string canonical = seal.text("canonical");
      if (sha256(canonical) != seal.bytes("sha256"))
        find(where, "its text does not match its hash");
      const auto message =
          sealMessage(seal.text("meaning"), seal.integer("signed_ms"), seal.bytes("sha256"));
      if (!isSignedBy(seal.bytes("public_key"), message, seal.bytes("signature")))
        find(where, "its signature is not valid");
      if (rawMember(canonical, "own") != ownRecordsText(m_connection, seal.integer("run_n"))) {
        find(where, "the run is not what was signed");
      }
    }
  }

  Connection& m_connection;
  app::VerifyReport m_report;
  std::unordered_map<std::string, std::string> m_told;
};

}  // namespace

app::VerifyReport verifyNotebook(Connection& connection) { return Verifier(connection).run(); }

}  // namespace vialkeeper::db
