// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>
#include <signal.h>
#include <sys/resource.h>
#include <sys/wait.h>
#include <unistd.h>

#include <catch2/catch.hpp>
#include <filesystem>
#include <map>
#include <random>
#include <set>

#include "app/notebook/log_run.h"
#include "db/notebook_fixture.h"
#include "db/sqlite_notebook.h"
#include "support/scratch_folder.h"

using namespace vialkeeper;
using tests::ScratchFolder;

namespace {

/// In a process of its own: logs `entry FIRST`, `entry FIRST+1`, … and acknowledges each on the
/// pipe once it is accepted. Ends with `_exit`, so that nothing of the test framework runs in it.
[[noreturn]] void logAndAcknowledge(const std::string& file, int first, int count, int pipe) {
  auto notebook = db::openNotebook(file, db::OpenFor::kWriting, "child");
  if (!notebook) ::_exit(2);
  tests::SteppingClock clock;
  const app::Desk desk{**notebook, clock, "KW"};
  for (int i = first; i < first + count; ++i) {
    const auto run = app::runOfCode(**notebook, "KW-0001");
    if (!run) ::_exit(3);
    // A writer who had to wait too long for the other is told so, and tries again as a person would.
    bool logged = false;
    for (int attempt = 0; attempt < 5 && !logged; ++attempt) {
      logged = app::logLine(desk, *run, {.line = fmt::format("note entry {}", i)}).has_value();
    }
    if (!logged) ::_exit(4);
    if (::write(pipe, &i, sizeof i) != sizeof i) ::_exit(5);
  }
  ::_exit(0);
}

struct Child {
  pid_t pid;
  int pipe;
};

Child started(const std::string& file, int first, int count) {
  int ends[2];
  REQUIRE(::pipe(ends) == 0);
  const pid_t pid = ::fork();
  if (pid == 0) {
    ::close(ends[0]);
    logAndAcknowledge(file, first, count, ends[1]);
  }
  ::close(ends[1]);
  return {pid, ends[0]};
}

std::vector<int> acknowledged(int pipe) {
  std::vector<int> numbers;
  int number = 0;
  while (::read(pipe, &number, sizeof number) == sizeof number) numbers.push_back(number);
  ::close(pipe);
  return numbers;
}

int statusOf(pid_t pid) {
  int status = 0;
  ::waitpid(pid, &status, 0);
  return status;
}

std::vector<int> entriesIn(app::Notebook& notebook) {
  std::vector<int> numbers;
  const auto events = notebook.events(tests::runOf(notebook).n);
  REQUIRE(events);
  for (const app::EventRecord& event : *events) {
    int number = 0;
    if (std::sscanf(event.raw.c_str(), "note entry %d", &number) == 1) numbers.push_back(number);
  }
  return numbers;
}

}  // namespace

TEST_CASE("after 200 kills in mid-write every acknowledged entry is there and the chain is whole",
          "[db][safety][identity]") {
  std::mt19937_64 random(20260304);
  int kills = 0;
  int survivors = 0;
  for (int round = 0; round < 10; ++round) {
    const ScratchFolder folder;
    const std::string file = folder.path("crash.vialbook");
    tests::makeSmallNotebook(file, 0);
    std::set<int> promised;
    for (int attempt = 0; attempt < 20; ++attempt) {
      const Child child = started(file, attempt * 100000, 100000);
      // Not before it writes: the first acknowledgement starts the clock.
      int first = 0;
      REQUIRE(::read(child.pipe, &first, sizeof first) == sizeof first);
      promised.insert(first);
      ::usleep(static_cast<useconds_t>(random() % 30000));
      REQUIRE(::kill(child.pid, SIGKILL) == 0);
      const int status = statusOf(child.pid);
      REQUIRE(WIFSIGNALED(status));
      ++kills;
      for (const int number : acknowledged(child.pipe)) promised.insert(number);
      const auto notebook = tests::opened(file);
      const std::vector<int> kept = entriesIn(*notebook);
      for (const int number : promised)
        REQUIRE(std::find(kept.begin(), kept.end(), number) != kept.end());
      // At most the one entry in flight may be there without its acknowledgement, for each kill.
      REQUIRE(kept.size() <= promised.size() + static_cast<std::size_t>(attempt) + 1);
      REQUIRE(tests::findings(*notebook).empty());
    }
    survivors += static_cast<int>(promised.size());
  }
  CHECK(kills == 200);
  CHECK(survivors > 200);  // the kills came while it was writing, not before
}

TEST_CASE("two writers at once lose nothing and keep their order", "[db][safety][identity]") {
  constexpr int kEach = 1000;
  const ScratchFolder folder;
  const std::string file = folder.path("two.vialbook");
  tests::makeSmallNotebook(file, 0);
  const Child a = started(file, 0, kEach);
  const Child b = started(file, 1000000, kEach);
  const auto fromA = acknowledged(a.pipe);
  const auto fromB = acknowledged(b.pipe);
  CHECK(statusOf(a.pid) == 0);
  CHECK(statusOf(b.pid) == 0);
  CHECK(fromA.size() == kEach);
  CHECK(fromB.size() == kEach);
  const auto notebook = tests::opened(file);
  const auto events = notebook->events(tests::runOf(*notebook).n);
  REQUIRE(events);
  // In the order of writing, each writer's entries rise by one.
  std::map<app::RowNumber, int> byRow;
  for (const app::EventRecord& event : *events) {
    int number = 0;
    if (std::sscanf(event.raw.c_str(), "note entry %d", &number) == 1) byRow[event.n] = number;
  }
  CHECK(byRow.size() == 2 * kEach);
  int nextA = 0;
  int nextB = 1000000;
  for (const auto& [n, number] : byRow) {
    if (number < 1000000) {
      REQUIRE(number == nextA++);
    } else {
      REQUIRE(number == nextB++);
    }
  }
  CHECK(tests::findings(*notebook).empty());
}

TEST_CASE("a disk that takes no more bytes is told in a sentence and leaves the file whole",
          "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("full.vialbook");
  tests::makeSmallNotebook(file, 3);
  const auto size = std::filesystem::file_size(file);
  int ends[2];
  REQUIRE(::pipe(ends) == 0);
  const pid_t pid = ::fork();
  if (pid == 0) {
    // The kernel refuses every byte beyond the file's present size, in this process only.
    ::signal(SIGXFSZ, SIG_IGN);
    const rlimit limit{static_cast<rlim_t>(size + 4096), static_cast<rlim_t>(size + 4096)};
    ::setrlimit(RLIMIT_FSIZE, &limit);
    auto notebook = db::openNotebook(file, db::OpenFor::kWriting, "child");
    tests::SteppingClock clock;
    const app::Desk desk{**notebook, clock, "KW"};
    std::string told;
    for (int i = 0; i < 200 && told.empty(); ++i) {
      const auto run = app::runOfCode(**notebook, "KW-0001");
      const auto logged = app::logLine(desk, *run, {.line = "note " + std::string(2000, 'x')});
      if (!logged) told = toLine(logged.error().front());
    }
    const auto written = ::write(ends[1], told.data(), told.size());
    ::_exit(written > 0 ? 0 : 1);
  }
  ::close(ends[1]);
  std::string told(2000, '\0');
  const auto count = ::read(ends[0], told.data(), told.size());
  ::close(ends[0]);
  REQUIRE(count > 0);
  told.resize(static_cast<std::size_t>(count));
  CHECK(statusOf(pid) == 0);
  INFO(told);
  CHECK((told.find("the disk is full") != std::string::npos ||
         told.find("the disk reported an error") != std::string::npos));
  CHECK(told.find("nothing was changed") != std::string::npos);
  const auto notebook = tests::opened(file);
  CHECK(tests::findings(*notebook).empty());
}
