// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <SQLiteCpp/SQLiteCpp.h>
#include <fmt/format.h>
#include <signal.h>
#include <sqlite3.h>
#include <sys/prctl.h>
#include <sys/wait.h>
#include <unistd.h>

#include <array>
#include <catch2/catch.hpp>
#include <filesystem>

#include "app/notebook/log_run.h"
#include "db/lock_holder.h"
#include "db/notebook_fixture.h"
#include "db/sqlite_notebook.h"
#include "support/scratch_folder.h"
#include "support/stranger.h"

using namespace vialkeeper;
using tests::ScratchFolder;

namespace {

/// A program that is not ours, called `othertool`, and holds what `sql` takes until it is ended.
class OtherTool {
 public:
  OtherTool(const std::string& file, const std::string& sql) {
    std::array<int, 2> ends{};
    REQUIRE(::pipe(ends.data()) == 0);
    m_pid = ::fork();
    if (m_pid == 0) {
      ::prctl(PR_SET_NAME, "othertool");
      SQLite::Database database(file, SQLite::OPEN_READWRITE);
      database.exec("BEGIN");
      SQLite::Statement statement(database, sql);
      (void)statement.executeStep();
      (void)!::write(ends[1], "x", 1);
      ::pause();
      ::_exit(0);
    }
    ::close(ends[1]);
    char ready = 0;
    REQUIRE(::read(ends[0], &ready, 1) == 1);
    ::close(ends[0]);
  }
  OtherTool(const OtherTool&) = delete;
  OtherTool& operator=(const OtherTool&) = delete;
  ~OtherTool() {
    ::kill(m_pid, SIGKILL);
    ::waitpid(m_pid, nullptr, 0);
  }
  [[nodiscard]] pid_t pid() const { return m_pid; }

 private:
  pid_t m_pid = 0;
};

std::string toldWhenLogging(const std::string& file) {
  const auto notebook = tests::opened(file);
  tests::SteppingClock clock;
  const auto logged =
      app::logLine({*notebook, clock, "KW"}, tests::runOf(*notebook), {.line = "note a"});
  return logged ? "written" : toLine(logged.error().front());
}

/// Whether this system lists the locks that processes hold, as some containers do not.
bool locksAreListed(const std::string& file, pid_t pid) {
  return db::lockHolderOf(file).process == pid;
}

}  // namespace

TEST_CASE("who keeps a writer out is named by program and process, though it is not ours",
          "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("held.vialbook");
  tests::makeSmallNotebook(file, 3);
  const OtherTool tool(file, "UPDATE run SET title = 'another'");
  const std::string told = toldWhenLogging(file);
  INFO(told);
  CHECK(told.find("another program is writing to the notebook") != std::string::npos);
  CHECK(told.find("nothing was changed") != std::string::npos);
  if (!locksAreListed(file, tool.pid())) {
    WARN("the system does not list locks here: the name is not checked");
    return;
  }
  CHECK(told.find(fmt::format("notebook: othertool (process {}): ", tool.pid())) !=
        std::string::npos);
}

TEST_CASE("a program that only reads and keeps a writer out is told as a reader", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("read.vialbook");
  tests::makeSmallNotebook(file, 3);
  const OtherTool tool(file, "SELECT n FROM event");
  const std::string told = toldWhenLogging(file);
  INFO(told);
  CHECK(told != "written");
  if (!locksAreListed(file, tool.pid())) return;
  CHECK(told.find(fmt::format(
            "another program is reading the notebook and lets nobody write: othertool (process {})",
            tool.pid())) != std::string::npos);
}

TEST_CASE("a lock that keeps verify from the index is told, and is no damage", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("held.vialbook");
  tests::makeSmallNotebook(file, 3);
  const OtherTool tool(file, "UPDATE run SET title = 'another'");
  const auto report = tests::opened(file)->verify({});
  REQUIRE(report);
  CHECK(report->findings.empty());
  REQUIRE(report->notChecked.size() == 1);
  CHECK(report->notChecked.front().find("another program was writing") != std::string::npos);
}

TEST_CASE("asking who holds a lock gives none of our own up", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("ours.vialbook");
  tests::makeSmallNotebook(file, 3);
  SQLite::Database ours(file, SQLite::OPEN_READWRITE);
  ours.exec("BEGIN IMMEDIATE");
  CHECK(db::lockHolderOf(file).process == 0);
  const pid_t pid = ::fork();
  if (pid == 0) {
    SQLite::Database theirs(file, SQLite::OPEN_READWRITE);
    ::_exit(theirs.tryExec("BEGIN IMMEDIATE") == SQLITE_BUSY ? 0 : 1);
  }
  int status = 0;
  ::waitpid(pid, &status, 0);
  CHECK(status == 0);
}

TEST_CASE("opening the notebook again in one process takes no lock from a transaction under way",
          "[db][safety]") {
  // The desktop writes in one thread and searches in another; the system drops all locks of a file
  // when a process closes any handle to it.
  const ScratchFolder folder;
  const std::string file = folder.path("twice.vialbook");
  tests::makeSmallNotebook(file, 1);
  const auto notebook = tests::opened(file);
  std::string other;
  const auto done = notebook->act(
      {.author = {"KW", tests::SteppingClock().now()}, .name = "test"},
      [&](app::Writing&) -> app::Checked<void> {
        { const auto again = db::openNotebook(file, db::OpenFor::kReading, "test"); }
        other = tests::inChild([&file]() -> std::string {
          try {
            SQLite::Database database(file, SQLite::OPEN_READWRITE, 0);
            database.exec("BEGIN IMMEDIATE");
            return "got in";
          } catch (const SQLite::Exception&) {
            return "kept out";
          }
        });
        return {};
      });
  CHECK(other == "kept out");
  (void)done;
}
