// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <signal.h>
#include <sys/wait.h>
#include <unistd.h>

#include <catch2/catch.hpp>
#include <chrono>
#include <filesystem>
#include <fstream>

#include "cli/command_bench.h"
#include "support/scratch_folder.h"
#include "support/stranger.h"

using namespace vialkeeper::tests;
namespace fs = std::filesystem;

namespace {

/// The names in the folder that begin like the file's.
std::size_t filesNamedLike(const std::string& file) {
  std::size_t count = 0;
  for (const auto& entry : fs::directory_iterator(fs::path(file).parent_path()))
    count += entry.path().string().starts_with(file) ? 1U : 0U;
  return count;
}

/// An archive of a notebook with one run.
std::string archiveIn(const ScratchFolder& folder) {
  const std::string file = folder.path("source.vialbook");
  REQUIRE(run({"--book", file, "--person", "KW", "create"}).status == 0);
  REQUIRE(run({"--book", file, "add", folder.write("plan.toml", soundPlan())}).status == 0);
  REQUIRE(run({"--book", file, "export", "--all", "--to", folder.path("archive")}).status == 0);
  return folder.path("archive");
}

}  // namespace

TEST_CASE("a demonstration that is killed leaves nothing under the name that was asked for",
          "[cli][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("demo.vialbook");
  const pid_t pid = ::fork();
  if (pid == 0) {
    (void)run({"--book", file, "demo", "--runs", "100000"});
    ::_exit(0);
  }
  // Once there is a file of any such name it is being filled, and 100,000 runs take minutes.
  for (int i = 0; i < 2000 && filesNamedLike(file) == 0; ++i) ::usleep(5000);
  CHECK(filesNamedLike(file) > 0);
  ::usleep(50000);
  REQUIRE(::kill(pid, SIGKILL) == 0);
  int status = 0;
  ::waitpid(pid, &status, 0);
  REQUIRE(WIFSIGNALED(status));
  CHECK_FALSE(fs::exists(file));
  // What was begun is in nobody's way.
  CHECK(run({"--book", file, "demo", "--runs", "3"}).status == 0);
  CHECK(run({"--book", file, "verify"}).status == 0);
}

TEST_CASE("an import that fails leaves no notebook behind", "[cli][safety]") {
  const ScratchFolder folder;
  const std::string archive = archiveIn(folder);
  const std::string file = folder.path("new.vialbook");
  SECTION("altered") {
    const std::string people = archive + "/tables/person.jsonl";
    std::ofstream(people, std::ios::app) << "no line of it\n";
    const Ran ran = run({"--book", file, "import", archive});
    CHECK(ran.status == 1);
    CHECK(folder.withoutPath(ran.err).starts_with("archive/tables/person.jsonl:2: "));
  }
  SECTION("a raw file is gone") {
    for (const auto& entry : fs::directory_iterator(archive + "/blobs")) {
      fs::remove(entry.path());
      break;
    }
    const Ran ran = run({"--book", file, "import", archive});
    CHECK(ran.status == 1);
    CHECK(ran.err.find(": the file blobs/") != std::string::npos);
    CHECK(ran.err.find(" is missing: export it again") != std::string::npos);
  }
  SECTION("a raw file was changed") {
    for (const auto& entry : fs::directory_iterator(archive + "/blobs"))
      std::ofstream(entry.path(), std::ios::app) << "x";
    const Ran ran = run({"--book", file, "import", archive});
    CHECK(ran.status == 1);
    CHECK(ran.err.find(" was changed or cut short: export it again") != std::string::npos);
  }
  CHECK(filesNamedLike(file) == 0);
}

TEST_CASE("a sound archive becomes a notebook, in a new file or an empty one", "[cli]") {
  const ScratchFolder folder;
  const std::string archive = archiveIn(folder);
  const std::string file = folder.path("new.vialbook");
  REQUIRE(run({"--book", file, "import", archive}).status == 0);
  CHECK(run({"--book", file, "verify"}).status == 0);
  CHECK(filesNamedLike(file) == 1);
  const std::string before = bytesOf(file);
  CHECK(run({"--book", file, "import", archive}).status != 0);
  CHECK(bytesOf(file) == before);
}

TEST_CASE("import says of a folder what is wrong with the folder", "[cli]") {
  const ScratchFolder folder;
  const std::string file = folder.path("new.vialbook");
  folder.makeFolder("empty");
  const auto told = [&](const std::string& name) {
    const Ran ran = run({"--book", file, "import", folder.path(name)});
    CHECK(ran.status == 1);
    CHECK_FALSE(fs::exists(file));
    return folder.withoutPath(ran.err);
  };
  CHECK(told("none") == "none: there is no such file or folder: check the path\n");
  CHECK(told("empty").starts_with("empty: this folder is no archive: it holds no notebook.json: "));
}

TEST_CASE("create and backup leave nothing half made and replace nothing", "[cli][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("book.vialbook");
  REQUIRE(run({"--book", file, "--person", "KW", "create"}).status == 0);
  CHECK(filesNamedLike(file) == 1);
  const std::string taken = folder.write("taken.vialbook", "years of work");
  CHECK(run({"--book", taken, "--person", "KW", "create"}).status == 3);
  CHECK(run({"--book", file, "backup", taken}).status == 3);
  CHECK(bytesOf(taken) == "years of work");
  CHECK(filesNamedLike(taken) == 1);
}

TEST_CASE("a backup into a folder that may not be written says so", "[cli][safety]") {
  const ScratchFolder folder;
  fs::permissions(folder.path(""), fs::perms{0755});
  const std::string file = folder.path("book.vialbook");
  REQUIRE(run({"--book", file, "--person", "KW", "create"}).status == 0);
  folder.makeFolder("locked");
  fs::permissions(folder.path("locked"), fs::perms{0555});
  const std::string told = asStranger([&] {
    return run({"--book", file, "backup", folder.path("locked/copy")}).err;
  });
  CHECK(folder.withoutPath(told) ==
        "locked/copy: the folder may not be written: name another folder, or get permission to "
        "write in this one\n");
  const Ran missing = run({"--book", file, "backup", folder.path("none/copy")});
  CHECK(missing.status == 3);
  CHECK(folder.withoutPath(missing.err) == "none/copy: the folder does not exist: make it first\n");
}
