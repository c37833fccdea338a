// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>
#include <filesystem>
#include <string>
#include <vector>

#include "cli/command_bench.h"
#include "support/scratch_folder.h"
#include "support/stranger.h"

using namespace vialkeeper::tests;
namespace fs = std::filesystem;

TEST_CASE("on a notebook that may only be read every writing verb says so before anything else",
          "[cli][safety]") {
  const ScratchFolder folder;
  fs::permissions(folder.path(""), fs::perms{0755});
  folder.makeFolder("shown");
  const std::string file = folder.path("shown/book.vialbook");
  const std::string plan = folder.write("plan.toml", soundPlan());
  REQUIRE(run({"--book", file, "--person", "KW", "create"}).status == 0);
  REQUIRE(run({"--book", file, "add", plan}).status == 0);
  fs::permissions(file, fs::perms{0444});
  fs::permissions(folder.path("shown"), fs::perms{0555});
  const auto before = folder.contents();
  // Most of these are wrong besides: the run's state forbids it, or it is not there.
  for (const std::vector<std::string>& verb :
       {std::vector<std::string>{"add", plan},
        {"clone", "KW-0099"},
        {"weigh", "KW-0001", "none", "3 mg"},
        {"log", "KW-0099", "lamp on"},
        {"correct", "KW-0001", "7", "lamp on"},
        {"result", "KW-0001", "--state", "sealed"},
        {"result", "KW-0001", "--yield", "50"},
        {"shelf", "add", "lamp", "LED 440"},
        {"import", plan, "--as", "course", "--run", "KW-0099"},
        {"seal", "KW-0001", "--passphrase-file", plan},
        {"countersign", "KW-0001", "--passphrase-file", plan}}) {
    std::vector<std::string> all{"--book", file, "--person", "KW"};
    all.insert(all.end(), verb.begin(), verb.end());
    const std::string told = asStranger([&] {
      const Ran ran = run(all);
      return std::to_string(ran.status) + " " + ran.err;
    });
    INFO(verb.front() << " said " << told);
    CHECK(folder.withoutPath(told).starts_with(
        "3 shown/book.vialbook: the notebook is open for reading only: its folder may not be "
        "written"));
  }
  CHECK(folder.contents() == before);
  const std::string read = asStranger([&] {
    return std::to_string(run({"--book", file, "show", "KW-0001"}).status);
  });
  CHECK(read == "0");
  fs::permissions(folder.path("shown"), fs::perms::owner_all);
}
