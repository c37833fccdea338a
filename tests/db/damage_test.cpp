// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>
#include <sqlite3.h>

#include <catch2/catch.hpp>
#include <filesystem>
#include <fstream>
#include <random>

#include "app/notebook/log_run.h"
#include "app/notebook/run_results.h"
#include "app/text_files.h"
#include "db/connection.h"
#include "db/notebook_fixture.h"
#include "db/sqlite_notebook.h"
#include "support/scratch_folder.h"

using namespace vialkeeper;
using tests::ScratchFolder;

namespace {

using tests::bytesOf;

void write(const std::string& file, const std::string& bytes) {
  std::ofstream(file, std::ios::binary | std::ios::trunc) << bytes;
}

/// What a plain SQLite tool would do to the file.
void execute(const std::string& file, const std::string& sql) {
  SQLite::Database(file, SQLite::OPEN_READWRITE).exec(sql);
}

}  // namespace

TEST_CASE("600 flipped bytes never crash, and none that changes a record goes unnoticed",
          "[db][safety][identity]") {
  const ScratchFolder folder;
  const std::string good = folder.path("good.vialbook");
  tests::makeSmallNotebook(good, 40);
  const std::string bytes = bytesOf(good);
  const std::string content = tests::contentOf(good);
  std::mt19937_64 random(7);
  int changed = 0;
  for (int i = 0; i < 600; ++i) {
    const std::string copy = folder.path("copy.vialbook");
    std::string damaged = bytes;
    const std::size_t place = random() % damaged.size();
    damaged[place] = static_cast<char>(damaged[place] ^ static_cast<char>(1U << (random() % 8)));
    write(copy, damaged);
    std::string found;
    auto notebook = db::openNotebook(copy, db::OpenFor::kReading, "test");
    if (!notebook) {
      found = "does not open";
    } else if (const auto report = (*notebook)->verify({}); !report) {
      found = "verify refuses";
    } else if (!report->findings.empty()) {
      found = report->findings.front().what;
    }
    notebook = std::unexpected(text::Faults{});
    if (tests::contentOf(copy) != content) {
      ++changed;
      INFO("byte " << place);
      REQUIRE_FALSE(found.empty());
    }
    std::filesystem::remove(copy);
  }
  CHECK(changed > 40);  // most bytes of a small file are free space and indexes
}

TEST_CASE("verify finds what another SQLite tool did", "[db][safety]") {
  const auto tampering =
      GENERATE(as<std::string>{}, "UPDATE component SET planned_mmol = 0.3",
               "DROP TRIGGER event_is_kept; UPDATE event SET raw = 'note nothing seen' WHERE n = 1",
               "DROP TRIGGER event_stays; DELETE FROM event WHERE n = 2",
               "DROP TRIGGER revision_stays; DELETE FROM revision WHERE seq = 2",
               "DROP TRIGGER revision_stays; DELETE FROM revision WHERE seq = (SELECT max(seq) "
               "FROM revision)",
               "DROP TRIGGER revision_is_kept; UPDATE revision SET person = 'XX' WHERE seq = 1",
               "DROP TRIGGER attachment_is_kept; UPDATE attachment SET data = x'00'",
               "UPDATE run SET yield_percent = 99",
               "INSERT INTO lamp (n, id, name) VALUES (1, x'01', 'another')",
               "UPDATE run_words SET title = 'other words'");
  const ScratchFolder folder;
  const std::string file = folder.path("tampered.vialbook");
  tests::makeSmallNotebook(file, 3);
  REQUIRE(tests::findings(*tests::opened(file)).empty());
  execute(file, tampering);
  INFO(tampering);
  CHECK_FALSE(tests::findings(*tests::opened(file)).empty());
}

TEST_CASE("triggers refuse to change or delete the trail, events and raw files", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("kept.vialbook");
  tests::makeSmallNotebook(file, 2);
  const auto sql =
      GENERATE(as<std::string>{}, "UPDATE revision SET person = 'XX'", "DELETE FROM revision",
               "UPDATE event SET raw = ''", "DELETE FROM event",
               "UPDATE attachment SET data = x'00'", "DELETE FROM attachment", "DELETE FROM run",
               "DELETE FROM component", "REPLACE INTO revision SELECT * FROM revision");
  INFO(sql);
  CHECK_THROWS_AS(execute(file, "PRAGMA recursive_triggers = ON; " + sql), SQLite::Exception);
  CHECK(tests::findings(*tests::opened(file)).empty());
}

TEST_CASE("a second writer who read an older version is told both and overwrites nothing",
          "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("conflict.vialbook");
  tests::makeSmallNotebook(file, 0);
  const auto first = tests::opened(file);
  const auto second = tests::opened(file);
  tests::SteppingClock clock;
  const app::RunRecord read = tests::runOf(*second);
  REQUIRE(app::recordResult({*first, clock, "KW"}, tests::runOf(*first), {.title = "one title"}));
  const auto conflict = app::recordResult({*second, clock, "MR"}, read, {.title = "another title"});
  REQUIRE_FALSE(conflict);
  const std::string told = toLine(conflict.error().front());
  INFO(told);
  CHECK(told.find("one title") != std::string::npos);
  CHECK(told.find("another title") != std::string::npos);
  CHECK(tests::runOf(*second).title == "one title");
}

TEST_CASE("makes the stored notebook of the first form", "[.make-v0001]") {
  // Run once when the form was released; the file is kept and never made again.
  tests::makeSmallNotebook(std::string(VIALKEEPER_SOURCE_DIR) + "/tests/data/schema/v0001.vialbook",
                           3);
}

TEST_CASE("a notebook of the first form still opens and is sound", "[db][migration]") {
  const ScratchFolder folder;
  const std::string file = folder.path("v0001.vialbook");
  std::filesystem::copy_file(
      std::string(VIALKEEPER_SOURCE_DIR) + "/tests/data/schema/v0001.vialbook", file);
  const auto notebook = tests::opened(file);
  CHECK(notebook->readOnlyReason().empty());
  CHECK(tests::findings(*notebook).empty());
  const auto events = notebook->events(tests::runOf(*notebook).n);
  REQUIRE(events);
  CHECK(events->size() == 3);
}

TEST_CASE("a notebook of a future form opens for reading only and says why", "[db][migration]") {
  const ScratchFolder folder;
  const std::string file = folder.path("future.vialbook");
  tests::makeSmallNotebook(file, 1);
  execute(file, "PRAGMA user_version = 99");
  const auto notebook = tests::opened(file);
  CHECK(notebook->readOnlyReason().find("newer Vialkeeper") != std::string::npos);
  tests::SteppingClock clock;
  const auto logged =
      app::logLine({*notebook, clock, "KW"}, tests::runOf(*notebook), {.line = "note too late"});
  REQUIRE_FALSE(logged);
  CHECK(logged.error().front().kind == text::FaultKind::kNotebook);
}

TEST_CASE("what is no notebook is refused with a sentence", "[db]") {
  const ScratchFolder folder;
  const auto told = [&](const std::string& name) {
    const auto notebook = db::openNotebook(folder.path(name), db::OpenFor::kWriting, "test");
    REQUIRE_FALSE(notebook);
    CHECK(notebook.error().front().kind == text::FaultKind::kNotebook);
    return notebook.error().front().what;
  };
  write(folder.path("empty"), "");
  write(folder.path("text"), std::string(500, 'a'));
  SQLite::Database(folder.path("other"), SQLite::OPEN_READWRITE | SQLite::OPEN_CREATE)
      .exec("CREATE TABLE t(x)");
  std::filesystem::create_directory(std::filesystem::path(folder.path("")) / "folder");
  CHECK(told("missing") == "there is no such notebook");
  CHECK(told("empty") == "the file is empty");
  CHECK(told("text") == "this is no notebook");
  CHECK(told("other") == "this is a database, but no notebook");
  CHECK(told("folder") == "this is a folder, not a notebook");
}

TEST_CASE("an archive rebuilds the notebook to the last revision and record", "[db][identity]") {
  const ScratchFolder folder;
  const std::string file = folder.path("whole.vialbook");
  tests::makeSmallNotebook(file, 12);
  REQUIRE(tests::opened(file)->exportAll(folder.path("archive")));
  const std::string rebuilt = folder.path("rebuilt.vialbook");
  {
    auto notebook = db::createNotebook(rebuilt);
    REQUIRE(notebook);
    REQUIRE((*notebook)->importAll(folder.path("archive")));
    CHECK(tests::findings(**notebook).empty());
  }
  CHECK(tests::contentOf(rebuilt) == tests::contentOf(file));
  REQUIRE(tests::opened(rebuilt)->exportAll(folder.path("again")));
  for (const auto& entry : std::filesystem::recursive_directory_iterator(folder.path("archive"))) {
    if (!entry.is_regular_file()) continue;
    const auto twin = std::filesystem::path(folder.path("")) / "again" /
                      std::filesystem::relative(entry.path(), folder.path("archive"));
    INFO(twin);
    CHECK(bytesOf(twin.string()) == bytesOf(entry.path().string()));
  }
}

TEST_CASE("a backup is a sound notebook and never takes the place of a file", "[db]") {
  const ScratchFolder folder;
  const std::string file = folder.path("book.vialbook");
  tests::makeSmallNotebook(file, 2);
  const auto notebook = tests::opened(file);
  REQUIRE(notebook->backup(folder.path("copy.vialbook")));
  CHECK_FALSE(notebook->backup(folder.path("copy.vialbook")));
  CHECK(tests::contentOf(folder.path("copy.vialbook")) == tests::contentOf(file));
  CHECK(tests::findings(*tests::opened(folder.path("copy.vialbook"))).empty());
}
