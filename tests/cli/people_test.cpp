// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/notebook_bench.h"
#include "db/sqlite_notebook.h"

using namespace vialkeeper;
using namespace vialkeeper::tests;
using Catch::Matchers::Contains;

namespace {

std::vector<std::string> peopleOf(app::Notebook& notebook) {
  const auto people = notebook.people();
  REQUIRE(people);
  std::vector<std::string> codes;
  for (const app::Person& person : *people) codes.push_back(person.code);
  return codes;
}

}  // namespace

TEST_CASE("initials that the notebook does not know are questioned by every verb that writes",
          "[cli][people]") {
  Book book;
  const std::string plan = book.folder().write("plan.toml", soundPlan());
  for (const std::vector<std::string>& verb : std::vector<std::vector<std::string>>{
           {"add", plan},
           {"clone", "KW-0001"},
           {"weigh", "KW-0001", "amine", "24.3 mg", "--yes"},
           {"log", "KW-0001", "lamp on", "--yes"},
           {"result", "KW-0001", "--title", "x"},
           {"shelf", "add", "vial", "v", "--set", "volume=11.6 mL"}}) {
    INFO(verb.front());
    const auto before = book.folder().contents();
    const Ran ran = book.verbAs("KV", verb);
    CHECK(ran.status == 2);
    CHECK(ran.out.empty());
    CHECK(ran.err ==
          "--person: KV has not worked in this notebook: did you mean KW? Somebody new is let in "
          "with --new-person\n");
    CHECK(book.folder().contents() == before);
  }
}

TEST_CASE("somebody new is let in once, and is known from then on", "[cli][people]") {
  Book book;
  REQUIRE(book.verbAs("TS", {"log", "KW-0001", "note hello", "--new-person"}).status == 0);
  CHECK(book.verbAs("TS", {"log", "KW-0001", "note again"}).status == 0);
  // Those most like the mistyped initials come first.
  CHECK_THAT(book.verbAs("TX", {"log", "KW-0001", "note late"}).err,
             Contains("did you mean TS or KW?"));
  CHECK(book.verbAs("KW", {"log", "KW-0001", "note late", "--new-person"}).status == 0);
}

TEST_CASE("a notebook that knows nobody takes the first initials without question",
          "[cli][people]") {
  const ScratchFolder folder;
  const std::string file = folder.path("empty.vialbook");
  REQUIRE(db::createNotebook(file));
  REQUIRE(run({"--book", file, "--person", "MR", "add", folder.write("plan.toml", soundPlan())})
              .status == 0);
  auto notebook = db::openNotebook(file, db::OpenFor::kReading, "test");
  REQUIRE(notebook);
  CHECK(peopleOf(**notebook) == std::vector<std::string>{"MR"});
  CHECK(app::whoWorks(**notebook, "MR"));
  CHECK_FALSE(app::whoWorks(**notebook, "MS"));
  CHECK(app::whoWorks(**notebook, "MS", app::Newcomer::kWelcome));
}
