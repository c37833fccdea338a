// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <sys/wait.h>
#include <unistd.h>

#include <catch2/catch.hpp>
#include <filesystem>

#include "app/notebook/log_run.h"
#include "db/connection.h"
#include "db/notebook_fixture.h"
#include "db/sqlite_notebook.h"
#include "support/scratch_folder.h"
#include "support/stranger.h"

using namespace vialkeeper;
using tests::ScratchFolder;
namespace fs = std::filesystem;

namespace {

/// Modes of the folder and the file for everybody; with root in the parent, the child is a stranger
/// to both.
void setModes(const std::string& file, unsigned folder, unsigned self) {
  fs::permissions(file, fs::perms{self});
  fs::permissions(fs::path(file).parent_path(), fs::perms{folder});
}

/// What a person is told who reads a notebook, then writes to it.
std::string readThenWrite(const std::string& file) {
  auto reading = db::openNotebook(file, db::OpenFor::kReading, "test");
  if (!reading) return "not read: " + toLine(reading.error().front());
  const auto events = (*reading)->events(app::runOfCode(**reading, "KW-0001")->n);
  if (!events || events->size() != 3) return "not read to the end";
  auto writing = db::openNotebook(file, db::OpenFor::kWriting, "test");
  if (!writing) return "not opened: " + toLine(writing.error().front());
  if (!(*writing)->verify({})->findings.empty()) return "not sound";
  tests::SteppingClock clock;
  const auto logged = app::logLine({**writing, clock, "KW"}, *app::runOfCode(**writing, "KW-0001"),
                                   {.line = "note a"});
  return logged ? "written" : toLine(logged.error().front());
}

}  // namespace

TEST_CASE("a stranger who may write both file and folder writes", "[db][safety]") {
  // The other cases mean something only if rights alone make the difference.
  const ScratchFolder folder;
  const std::string file = folder.path("open.vialbook");
  tests::makeSmallNotebook(file, 3);
  setModes(file, 0777, 0666);
  CHECK(tests::asStranger([&] { return readThenWrite(file); }) == "written");
}

TEST_CASE("a notebook in a folder that may not be written is read, and a write is told why not",
          "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("shown.vialbook");
  tests::makeSmallNotebook(file, 3);
  setModes(file, 0555, 0666);
  const std::string before = tests::bytesOf(file);
  const std::string told = tests::asStranger([&] { return readThenWrite(file); });
  CHECK(
      folder.withoutPath(told) ==
      "shown.vialbook: the notebook is open for reading only: its folder may not be written, where "
      "a change keeps its journal: get permission to write in the folder, or work on a copy in a "
      "folder of yours; nothing was changed");
  CHECK(tests::bytesOf(file) == before);
  CHECK(folder.contents().size() == 1);
}

TEST_CASE("a notebook file that may not be written is read, and a write is told why not",
          "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("kept.vialbook");
  tests::makeSmallNotebook(file, 3);
  setModes(file, 0777, 0444);
  const std::string before = tests::bytesOf(file);
  const std::string told = tests::asStranger([&] { return readThenWrite(file); });
  CHECK(folder.withoutPath(told) ==
        "kept.vialbook: the notebook is open for reading only: the file may not be written: get "
        "permission to write the file, or work on a copy of yours; nothing was changed");
  CHECK(tests::bytesOf(file) == before);
  CHECK(folder.contents().size() == 1);
}

TEST_CASE("a notebook that may not be read is told as that", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("secret.vialbook");
  tests::makeSmallNotebook(file, 3);
  setModes(file, 0755, 0);
  const std::string told = tests::asStranger([&] { return readThenWrite(file); });
  CHECK(folder.withoutPath(told) ==
        "not read: secret.vialbook: there is no permission to read the notebook: ask its owner for "
        "it, or name another");
}

TEST_CASE("a journal that a killed writer left keeps no reader out", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("killed.vialbook");
  tests::makeSmallNotebook(file, 3);
  const std::string content = tests::contentOf(file);
  const pid_t pid = ::fork();
  if (pid == 0) {
    db::Connection connection(file, db::Access::kReadWrite, false);
    // With a cache of one page the changed pages are in the file before the commit.
    connection.run("PRAGMA cache_size = 1");
    connection.run("BEGIN IMMEDIATE");
    connection.run("UPDATE run SET title = 'half written'");
    connection.run(
        "WITH RECURSIVE i(n) AS (SELECT 1 UNION ALL SELECT n + 1 FROM i WHERE n < 500) INSERT INTO "
        "setting SELECT 'filler ' || n, hex(zeroblob(500)) FROM i");
    ::_exit(0);  // as a kill would: nothing is rolled back
  }
  int status = 0;
  ::waitpid(pid, &status, 0);
  REQUIRE(status == 0);
  REQUIRE(fs::exists(file + "-journal"));
  REQUIRE(fs::file_size(file + "-journal") > 512);

  SECTION("where the folder may be written, it is rolled back") {
    auto notebook = db::openNotebook(file, db::OpenFor::kReading, "test");
    REQUIRE(notebook);
    CHECK_FALSE((*notebook)->mayWrite());
    CHECK(tests::contentOf(file) == content);
  }
  SECTION("where it may not, that is told") {
    setModes(file, 0555, 0444);
    const std::string told = tests::asStranger([&] { return readThenWrite(file); });
    CHECK(folder.withoutPath(told) ==
          "not read: killed.vialbook: a change that was broken off must be taken back first, and "
          "that needs permission to write file and folder: open it once from where both may be "
          "written; nothing is lost");
  }
}
