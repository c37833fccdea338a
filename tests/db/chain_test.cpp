// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <catch2/catch.hpp>
#include <filesystem>
#include <fstream>
#include <functional>

#include "app/notebook/log_run.h"
#include "app/notebook/run_results.h"
#include "app/notebook/seal_run.h"
#include "db/audited_writer.h"
#include "db/connection.h"
#include "db/notebook_fixture.h"
#include "db/signing.h"
#include "db/sqlite_notebook.h"
#include "support/scratch_folder.h"

using namespace vialkeeper;
using tests::ScratchFolder;

namespace {

constexpr const char* kPassphrase = "an invented passphrase";

/// What another tool does that knows of the guards: takes them off, and puts them back.
void tamper(const std::string& file, const std::function<void(SQLite::Database&)>& work) {
  SQLite::Database database(file, SQLite::OPEN_READWRITE);
  std::vector<std::string> guards;
  std::vector<std::string> names;
  {
    SQLite::Statement statement(database,
                                "SELECT name, sql FROM sqlite_master WHERE type = 'trigger'");
    while (statement.executeStep()) {
      names.push_back(statement.getColumn(0).getString());
      guards.push_back(statement.getColumn(1).getString());
    }
  }
  for (const std::string& name : names) database.exec("DROP TRIGGER " + name);
  work(database);
  for (const std::string& sql : guards) database.exec(sql);
}

/// The newest entries gone without a trace: their revisions, rows and words.
void cutOff(const std::string& file, int entries) {
  tamper(file, [entries](SQLite::Database& database) {
    database.exec(
        fmt::format("DELETE FROM revision WHERE seq > (SELECT max(seq) - {0} FROM revision);"
                    "DELETE FROM event WHERE n > (SELECT max(n) - {0} FROM event)",
                    entries));
  });
}

/// Another person in the first revision, and all hashes made anew as the program would make them.
void rewriteChain(const std::string& file) {
  std::vector<db::Row> revisions;
  {
    db::Connection connection(file, db::Access::kReadOnly, false);
    revisions = connection.rows("SELECT * FROM revision ORDER BY seq");
  }
  REQUIRE_FALSE(revisions.empty());
  revisions.front().set("person", std::string("XX"));
  tamper(file, [&](SQLite::Database& database) {
    std::string previous(32, '\0');
    for (db::Row& revision : revisions) {
      revision.set("previous", db::Blob{previous});
      previous = db::revisionHash(revision);
      SQLite::Statement statement(
          database, "UPDATE revision SET person = ?, previous = ?, hash = ? WHERE seq = ?");
      const std::vector<db::Cell> cells{revision["person"], revision["previous"],
                                        db::Blob{previous}, revision["seq"]};
      db::bind(statement, cells);
      statement.exec();
    }
  });
}

app::VerifyReport verified(const std::string& file, const app::VerifyRequest& request = {}) {
  const auto report = tests::opened(file)->verify(request);
  if (!report) FAIL(toLine(report.error().front()));
  return *report;
}

std::string told(const app::VerifyReport& report) {
  std::string lines;
  for (const app::Finding& finding : report.findings)
    lines += finding.where + ": " + finding.what + "\n";
  return lines;
}

void log(const std::string& file, const std::string& line) {
  const auto notebook = tests::opened(file);
  tests::SteppingClock clock;
  REQUIRE(app::logLine({*notebook, clock, "KW"}, tests::runOf(*notebook), {.line = line}));
}

/// Closes and seals the run of a small notebook.
void seal(const std::string& file) {
  const auto notebook = tests::opened(file);
  tests::SteppingClock clock;
  const app::Desk desk{*notebook, clock, "KW"};
  db::SodiumSigner signer;
  REQUIRE(app::makeSigningKey(desk, signer, kPassphrase, app::OldKey::kKept));
  REQUIRE(
      app::recordResult(desk, tests::runOf(*notebook), {.state = "closed", .reason = "invented"}));
  REQUIRE(app::sealRun(desk, signer, tests::runOf(*notebook), kPassphrase));
}

}  // namespace

TEST_CASE("entries cut off with their revisions are found by a head that was written down",
          "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("cut.vialbook");
  tests::makeSmallNotebook(file, 6);
  const app::ChainHead head = verified(file).head;
  CHECK(head.seq == 7);
  CHECK(head.hash.size() == 64);
  CHECK(told(verified(file, {.head = head})).empty());
  cutOff(file, 2);
  // What remains is a whole notebook of an earlier day: the file alone cannot tell.
  CHECK(told(verified(file)).empty());
  CHECK(
      told(verified(file, {.head = head})) ==
      "revision 7: it is not in the trail, which ends with revision 5: what was written later was "
      "cut off\n");
  // Filled up again, it has a revision of that number, but not that hash.
  log(file, "note in place of the sixth");
  log(file, "note in place of the seventh");
  const std::string rewritten = told(verified(file, {.head = head}));
  CHECK(rewritten.starts_with("revision 7: its hash is "));
  // The beginning of the hash does as well.
  CHECK(told(verified(file, {.head = app::ChainHead{7, head.hash.substr(0, 16)}})).size() ==
        rewritten.size() - 48);
}

TEST_CASE("entries cut off with their revisions are found by an earlier copy", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("cut.vialbook");
  const std::string copy = folder.path("copy.vialbook");
  tests::makeSmallNotebook(file, 6);
  REQUIRE(tests::opened(file)->backup(copy));
  log(file, "note later than the copy");
  const app::VerifyReport grown = verified(file, {.against = copy});
  CHECK(told(grown).empty());
  CHECK(grown.compared == 7);
  cutOff(file, 1);
  CHECK(told(verified(file, {.against = copy})).empty());
  cutOff(file, 2);
  const app::VerifyReport cut = verified(file, {.against = copy});
  CHECK(told(cut) ==
        fmt::format("revision 6: it is in {}, as all up to 7, but not here: the end of "
                    "the trail was cut off\n",
                    copy));
  CHECK_FALSE(cut.compared);
}

TEST_CASE("where two copies part, the first revision that differs is told", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("one.vialbook");
  const std::string copy = folder.path("two.vialbook");
  tests::makeSmallNotebook(file, 3);
  REQUIRE(tests::opened(file)->backup(copy));
  log(file, "note here");
  log(copy, "note there");
  CHECK(told(verified(file, {.against = copy})) ==
        fmt::format("revision 5: from this one on the trail differs from that of {}\n", copy));
  const std::string other = folder.path("other.vialbook");
  tests::makeSmallNotebook(other, 3);
  CHECK(told(verified(file, {.against = other})).find("is no copy of this notebook") !=
        std::string::npos);
}

TEST_CASE("what cannot be compared with is a fault that names it", "[db]") {
  const ScratchFolder folder;
  const std::string file = folder.path("one.vialbook");
  tests::makeSmallNotebook(file, 1);
  const auto toldOf = [&](const std::string& against) {
    const auto report = tests::opened(file)->verify({.against = against});
    REQUIRE_FALSE(report);
    return folder.withoutPath(toLine(report.error().front()));
  };
  CHECK(toldOf(folder.path("none.vialbook")).starts_with("none.vialbook: there is no such"));
  CHECK(toldOf(folder.write("text.txt", "no notebook")) ==
        "text.txt: this is no notebook: name a .vialbook file");
  CHECK(toldOf(file).starts_with("one.vialbook: this is the notebook itself"));
}

TEST_CASE("a seal vouches for the whole trail before it", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("sealed.vialbook");
  tests::makeSmallNotebook(file, 3);
  seal(file);
  CHECK(told(verified(file)).empty());
  rewriteChain(file);
  const std::string found = told(verified(file));
  CHECK(found ==
        "seal of KW-0001 as author: it was signed after a revision 6 that is not in the trail: the "
        "trail was rewritten or cut off before that\n");
}

TEST_CASE("without a seal a trail that was rewritten from its beginning looks whole",
          "[db][safety]") {
  // The other side of the case before: it is the seal that tells, and a head or a copy.
  const ScratchFolder folder;
  const std::string file = folder.path("open.vialbook");
  tests::makeSmallNotebook(file, 3);
  const app::ChainHead head = verified(file).head;
  rewriteChain(file);
  CHECK(told(verified(file)).empty());
  CHECK_FALSE(told(verified(file, {.head = head})).empty());
}

TEST_CASE("seals of the first form, which name no revision, stay valid", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("old.vialbook");
  tests::makeSmallNotebook(file, 2);
  const auto notebook = tests::opened(file);
  tests::SteppingClock clock;
  const app::Desk desk{*notebook, clock, "KW"};
  db::SodiumSigner signer;
  REQUIRE(app::makeSigningKey(desk, signer, kPassphrase, app::OldKey::kKept));
  const auto run = tests::runOf(*notebook);
  std::string canonical = *notebook->canonicalRun(run.n);
  REQUIRE(canonical.starts_with("{\"chain\":{"));
  canonical = "{" + canonical.substr(canonical.find("\"format\""));
  const std::size_t form = canonical.find("sealed-run/2");
  REQUIRE(form != std::string::npos);
  canonical[form + 11] = '1';
  auto old =
      signer.sign(**notebook->signingKey("KW"), kPassphrase, "author", clock.now(), canonical);
  REQUIRE(old);
  old->run = run.n;
  REQUIRE(notebook->act(desk.action("seal"), [&](app::Writing& writing) -> text::Checked<void> {
    REQUIRE(writing.addSeal(*old));
    return {};
  }));
  const auto report = notebook->verify({});
  REQUIRE(report);
  CHECK(report->seals == 1);
  CHECK(told(*report).empty());
}

TEST_CASE("findings name what a person knows: entries, components, substances", "[db]") {
  struct Case {
    const char* sql;
    const char* found;
  };
  const auto [sql, found] = GENERATE(values<Case>({
      {"UPDATE event SET raw = 'note nothing' WHERE n = 2",
       "entry 2 of KW-0001: differs from what the trail tells\n"},
      {"DELETE FROM event WHERE n = 2",
       "entry 2 of KW-0001 (row 2): the trail tells of it, but it is not there\n"},
      {"UPDATE component SET planned_mmol = 0.3",
       "component amine of KW-0001: differs from what the trail tells\n"},
      {"UPDATE substance SET cas = NULL",
       "substance indoline: differs from what the trail tells\n"},
      {"UPDATE run SET yield_percent = 99", "run KW-0001: differs from what the trail tells\n"},
      {"INSERT INTO lamp (n, id, name) VALUES (7, x'01', 'LED')",
       "lamp LED: is there, but the trail does not tell of it\n"},
      {"INSERT INTO setting VALUES ('language', 'none')",
       "setting language: is there, but the trail does not tell of it\n"},
      {"UPDATE run_words SET title = 'other'", "words of run KW-0001: differ from the run\n"},
      {"UPDATE attachment SET data = x'00', size = 1",
       "plan of KW-0001: differs from what the trail tells\n"
       "plan of KW-0001: its bytes do not match its hash\n"},
  }));
  const ScratchFolder folder;
  const std::string file = folder.path("named.vialbook");
  tests::makeSmallNotebook(file, 3);
  tamper(file, [&](SQLite::Database& database) {
    database.exec("PRAGMA foreign_keys = OFF");
    database.exec(sql);
  });
  INFO(sql);
  std::string lines = told(verified(file));
  // The index of words is a finding of its own where the words themselves were changed.
  if (const auto at = lines.find("full-text index: does not match the runs' words\n"); at == 0)
    lines.erase(0, lines.find('\n') + 1);
  CHECK(lines == found);
}

TEST_CASE("a file that was cut short is told as that, with what to do", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("short.vialbook");
  tests::makeSmallNotebook(file, 3);
  const auto whole = std::filesystem::file_size(file);
  std::filesystem::resize_file(file, 8192);
  const auto notebook = db::openNotebook(file, db::OpenFor::kWriting, "test");
  REQUIRE_FALSE(notebook);
  CHECK(folder.withoutPath(toLine(notebook.error().front())) ==
        fmt::format("short.vialbook: the notebook file is cut short: 8192 of {} bytes are there: "
                    "copy the file as it is to a safe place, and go on with the newest backup; "
                    "verify tells whether that one is sound",
                    whole));
}
