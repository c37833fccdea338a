// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/verifier.h"

#include <fmt/format.h>
#include <sqlite3.h>

#include <charconv>
#include <map>
#include <nlohmann/json.hpp>
#include <unordered_map>

#include "db/audited_writer.h"
#include "db/canonical_json.h"
#include "db/canonical_run.h"
#include "db/migrations.h"
#include "db/raw_json.h"
#include "db/record_names.h"
#include "db/signing.h"

namespace vialkeeper::db {
namespace {

/// How a row is called in the trail: its table and its number, or a setting and its name, both as
/// they stand in the revision's JSON.
std::string keyOf(std::string_view table, std::string_view n) {
  return fmt::format("{} {}", table, n);
}

std::string_view unquoted(std::string_view text) {
  return text.size() < 2 ? std::string_view{} : text.substr(1, text.size() - 2);
}

/// The cells of a row as a revision tells it, as far as names need them: texts and whole numbers.
Row rowOfJson(std::string_view text) {
  Row row;
  const auto object = nlohmann::json::parse(text, nullptr, false);
  if (!object.is_object()) return row;
  for (const auto& [column, value] : object.items()) {
    if (value.is_string()) row.set(column, value.get<std::string>());
    if (value.is_number_integer()) row.set(column, value.get<std::int64_t>());
  }
  return row;
}

class Verifier {
 public:
  explicit Verifier(Connection& connection) : m_connection(connection) {}

  app::VerifyReport run(const app::VerifyRequest& request, Connection* other) {
    step("pages", [this] { checkPages(); });
    step("schema", [this] { checkSchema(); });
    step("references", [this] { checkReferences(); });
    step("full-text index", [this] { checkWords(); });
    step("revisions", [this] { checkChain(); });
    for (const std::string& table : auditedTables()) {
      step(table, [this, &table] { checkRecords(table); });
    }
    step("settings", [this] { checkSettings(); });
    step("revisions", [this] { tellMissing(); });
    step("attachments", [this] { checkAttachments(); });
    step("seals", [this] { checkSeals(); });
    if (request.head) step("revisions", [&] { checkHead(*request.head); });
    if (other != nullptr) step("revisions", [&] { compareWith(*other); });
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

  void checkSchema() {
    for (const std::string& difference : schemaDifferences(m_connection))
      find("schema", difference);
    const int form = schemaOf(m_connection);
    if (form <= newestSchema()) return;
    m_report.isNewerForm = true;
    m_report.notChecked.push_back(fmt::format(
        "the form of the file, {}, is newer than this program's, {}: whether its tables, "
        "indexes and triggers are as they should be, and what it holds that form {} "
        "does not know, were not checked",
        form, newestSchema(), newestSchema()));
  }

  void checkReferences() {
    for (const Row& row : m_connection.rows("PRAGMA foreign_key_check")) {
      find(nameOf(m_connection, row.text("table"), row.integer("rowid")),
           fmt::format("refers to a row of {} that is not there", row.text("parent")));
    }
  }

  /// The index against its table, and the table against the records it is derived from.
  void checkWords() {
    try {
      m_connection.run("INSERT INTO run_search(run_search, rank) VALUES('integrity-check', 1)");
    } catch (const SQLite::Exception& error) {
      // The check is a write to SQLite: who may not write, or not now, cannot run it. That is no
      // damage.
      const int code = error.getErrorCode();
      if (code == SQLITE_READONLY || code == SQLITE_BUSY) {
        m_report.notChecked.emplace_back(
            std::string("the full-text index was not checked against the runs' words, because ") +
            (code == SQLITE_BUSY ? "another program was writing"
                                 : "the notebook is open for reading only"));
      } else if (code == SQLITE_CORRUPT) {
        find("full-text index", "does not match the runs' words");
      } else {
        throw;
      }
    }
    for (const Row& row :
         m_connection.rows("SELECT run.n AS n FROM run LEFT JOIN run_words ON run_n = run.n WHERE "
                           "run_words.code IS NOT run.code OR "
                           "run_words.title IS NOT coalesce(run.title, '') OR run_words.aim IS NOT "
                           "coalesce(run.aim, '') OR "
                           "run_words.conclusion IS NOT coalesce(run.conclusion, '')")) {
      find("words of " + nameOf(m_connection, "run", row.integer("n")), "differ from the run");
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
      m_report.head = {revision.integer("seq"), toHex(previous)};
      ++m_report.revisions;
      rememberChanges(where, revision.text("changes"));
    }
  }

  /// What each record must be now, by the last change that told it: the hash of its canonical text.
  void rememberChanges(const std::string& where, const std::string& changes) {
    const auto entries = rawElements(changes);
    if (entries.empty()) find(where, "tells no change");
    for (const std::string_view entry : entries) {
      const std::string_view table = unquoted(rawMember(entry, "table"));
      const std::string_view after = rawMember(entry, "after");
      if (table.empty() || after.empty()) {
        find(where, "holds a change that cannot be read");
        continue;
      }
      const std::string name = keyOf(table, rawMember(entry, "n"));
      if (after == "null") {
        const auto told = m_told.find(name);
        if (told == m_told.end() || told->second != sha256(rawMember(entry, "before")))
          find(where, "takes out another row than the trail tells");
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
      checkRecord(keyOf(table, fmt::format("{}", row.integer("n"))), row,
                  [&] { return nameOf(m_connection, table, row); });
    }
  }

  /// Settings have no number: the trail calls them by their name.
  void checkSettings() {
    for (const Row& row : m_connection.rows("SELECT * FROM setting ORDER BY name")) {
      checkRecord(keyOf("setting", canonicalText(row.text("name"))), row,
                  [&] { return "setting " + row.text("name"); });
    }
  }

  /// A row against the last change that told it.
  template <class Name>
  void checkRecord(const std::string& key, const Row& row, Name name) {
    ++m_report.records;
    const auto told = m_told.find(key);
    if (told == m_told.end()) {
      find(name(), "is there, but the trail does not tell of it");
      return;
    }
    if (told->second != sha256(canonicalRow(row)))
      find(name(), "differs from what the trail tells");
    m_told.erase(told);
  }

  /// What the trail tells of and the tables have not, by the last words that the trail has of it.
  void tellMissing() {
    if (m_told.empty()) return;
    std::map<std::string, std::pair<std::string, Row>> lost;
    SQLite::Statement statement(m_connection.database(),
                                "SELECT seq, changes FROM revision ORDER BY seq");
    while (statement.executeStep()) {
      const std::string changes = statement.getColumn(1).getString();
      for (const std::string_view entry : rawElements(changes)) {
        const std::string table(unquoted(rawMember(entry, "table")));
        const std::string key = keyOf(table, rawMember(entry, "n"));
        if (m_told.contains(key)) lost[key] = {table, rowOfJson(rawMember(entry, "after"))};
      }
    }
    for (const auto& [key, last] : lost) {
      const auto& [table, row] = last;
      // Of several that are gone the names may be those of their neighbours: the number is certain.
      const std::string number =
          table == "setting" ? "" : fmt::format(" (row {})", row.integer("n"));
      find((table == "setting" ? "setting " + row.text("name") : nameOf(m_connection, table, row)) +
               number,
           "the trail tells of it, but it is not there");
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
        find(nameOf(m_connection, "attachment", row), "its bytes do not match its hash");
      }
    }
  }

  void checkSeals() {
    for (const Row& seal :
         m_connection.rows("SELECT seal.*, public_key, run.code AS code FROM seal JOIN signing_key "
                           "ON signing_key.n = signing_key_n "
                           "JOIN run ON run.n = seal.run_n ORDER BY seal.n")) {
      ++m_report.seals;
      const std::string where = nameOf(m_connection, "seal", seal);
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
      checkAnchor(where, rawMember(canonical, "chain"));
    }
  }

  /// A seal names the last revision before it. One of the first form of seals names none.
  void checkAnchor(const std::string& where, std::string_view chain) {
    if (chain.empty()) return;
    std::int64_t seq = 0;
    const std::string_view number = rawMember(chain, "seq");
    std::from_chars(number.data(), number.data() + number.size(), seq);
    if (seq == 0 || hashOf(m_connection, seq) == unquoted(rawMember(chain, "hash"))) return;
    find(where, fmt::format("it was signed after a revision {} that is not in the trail: the trail "
                            "was rewritten or cut off before that",
                            seq));
  }

  /// In hexadecimal; empty where there is no such revision.
  static std::string hashOf(Connection& connection, std::int64_t seq) {
    const Cell cell = connection.cell("SELECT hash FROM revision WHERE seq = ?", {Cell{seq}});
    const auto* hash = std::get_if<Blob>(&cell);
    return hash != nullptr ? toHex(hash->bytes) : std::string{};
  }

  void checkHead(const app::ChainHead& noted) {
    const std::string where = fmt::format("revision {}", noted.seq);
    const std::string hash = hashOf(m_connection, noted.seq);
    if (hash.empty()) {
      find(where,
           fmt::format("it is not in the trail, which ends with revision {}: what was written "
                       "later was cut off",
                       m_report.head.seq));
    } else if (!hash.starts_with(noted.hash)) {
      find(where, fmt::format("its hash is {}, not {}: the trail up to it was rewritten", hash,
                              noted.hash));
    }
  }

  /// Every revision of an earlier copy must be in this trail unchanged.
  void compareWith(Connection& other) {
    SQLite::Statement theirs(other.database(), "SELECT seq, hash FROM revision ORDER BY seq");
    SQLite::Statement ours(m_connection.database(), "SELECT seq, hash FROM revision ORDER BY seq");
    std::int64_t compared = 0;
    std::int64_t last = 0;
    for (; theirs.executeStep(); ++compared) {
      last = theirs.getColumn(0).getInt64();
      if (!ours.executeStep()) break;
      if (ours.getColumn(0).getInt64() == last &&
          ours.getColumn(1).getString() == theirs.getColumn(1).getString())
        continue;
      find(fmt::format("revision {}", last),
           compared == 0
               ? fmt::format("the trails differ from the first revision on: {} is no copy "
                             "of this notebook",
                             other.file())
               : fmt::format("from this one on the trail differs from that of {}", other.file()));
      return;
    }
    if (last > m_report.head.seq) {
      const std::int64_t most = other.integer("SELECT max(seq) FROM revision");
      find(fmt::format("revision {}", last),
           fmt::format(
               "it is in {}, as all up to {}, but not here: the end of the trail was cut off",
               other.file(), most));
      return;
    }
    m_report.compared = compared;
  }

  Connection& m_connection;
  app::VerifyReport m_report;
  std::unordered_map<std::string, std::string> m_told;
};

}  // namespace

app::VerifyReport verifyNotebook(Connection& connection, const app::VerifyRequest& request,
                                 Connection* other) {
  return Verifier(connection).run(request, other);
}

}  // namespace vialkeeper::db
