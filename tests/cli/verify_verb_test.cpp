// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>
#include <fstream>

#include "cli/command_bench.h"
#include "support/scratch_folder.h"

using namespace vialkeeper::tests;

namespace {

/// A notebook of KW with one run.
std::string bookIn(const ScratchFolder& folder) {
  const std::string file = folder.path("book.vialbook");
  REQUIRE(run({"--book", file, "--person", "KW", "create"}).status == 0);
  REQUIRE(run({"--book", file, "add", folder.write("plan.toml", soundPlan())}).status == 0);
  return file;
}

}  // namespace

TEST_CASE("verify prints the head, and takes it back", "[cli][safety]") {
  const ScratchFolder folder;
  const std::string file = bookIn(folder);
  const auto json = run({"--book", file, "verify", "--json"}).json();
  CHECK(json["sound"] == true);
  CHECK(json["head"]["revision"] == json["revisions"]);
  CHECK(json["compared_revisions"].is_null());
  CHECK(json["notices"].empty());
  const std::string head = std::to_string(json["head"]["revision"].get<int>()) + ":" +
                           json["head"]["hash"].get<std::string>();
  CHECK(run({"--book", file, "verify"}).out.find("\nhead " + head + "\n") != std::string::npos);
  REQUIRE(run({"--book", file, "log", "KW-0001", "lamp on"}).status == 0);
  CHECK(run({"--book", file, "verify", "--head", head}).status == 0);
  const Ran wrong = run({"--book", file, "verify", "--head", "2:0123456789abcdef"});
  CHECK(wrong.status == 3);
  CHECK(wrong.err.find(":revision 2: its hash is ") != std::string::npos);
  const Ran beyond = run({"--book", file, "verify", "--head", "99:0123456789abcdef"});
  CHECK(beyond.status == 3);
  CHECK(beyond.err.find(":revision 99: it is not in the trail") != std::string::npos);
  for (const char* bad : {"2", "2:", "2:0123", "x:0123456789abcdef", "0:0123456789abcdef",
                          "2:0123456789abcdeg", ":0123456789abcdef"}) {
    const Ran ran = run({"--book", file, "verify", "--head", bad});
    INFO(bad << ": " << ran.err);
    CHECK(ran.status == 2);
    CHECK(ran.err.starts_with("--head: "));
  }
}

TEST_CASE("verify compares with an earlier copy", "[cli][safety]") {
  const ScratchFolder folder;
  const std::string file = bookIn(folder);
  const std::string copy = folder.path("copy.vialbook");
  REQUIRE(run({"--book", file, "backup", copy}).status == 0);
  REQUIRE(run({"--book", file, "log", "KW-0001", "lamp on"}).status == 0);
  const auto json = run({"--book", file, "verify", "--against", copy, "--json"}).json();
  CHECK(json["compared_revisions"].get<int>() == json["revisions"].get<int>() - 1);
  const Ran text = run({"--book", file, "verify", "--against", copy});
  CHECK(text.out.find("are in it unchanged") != std::string::npos);
  // The copy lacks what the notebook has: seen from there, the end is cut off.
  const Ran reversed = run({"--book", copy, "verify", "--against", file});
  CHECK(reversed.status == 3);
  CHECK(reversed.err.find("the end of the trail was cut off") != std::string::npos);
  CHECK(run({"--book", file, "verify", "--against", folder.path("none")}).status == 3);
}

TEST_CASE("of a file of a newer form verify does not say that it is sound", "[cli][safety]") {
  const ScratchFolder folder;
  const std::string file = bookIn(folder);
  std::fstream stream(file, std::ios::in | std::ios::out | std::ios::binary);
  stream.seekp(63);  // the last byte of SQLite's user_version
  stream.put(99);
  stream.close();
  const Ran text = run({"--book", file, "verify"});
  CHECK(text.status == 0);
  CHECK(text.out.find("sound") == std::string::npos);
  CHECK(text.out.starts_with("nothing wrong was found in what could be checked: "));
  CHECK(text.out.find("! the form of the file, 99, is newer than this program's") !=
        std::string::npos);
  const auto json = run({"--book", file, "verify", "--json"}).json();
  CHECK(json["sound"].is_null());
  CHECK(json["notices"][0]["code"] == "not-checked");
}
