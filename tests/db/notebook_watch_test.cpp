// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <SQLiteCpp/SQLiteCpp.h>

#include <atomic>
#include <catch2/catch.hpp>
#include <chrono>
#include <set>
#include <thread>

#include "app/notebook/log_run.h"
#include "db/notebook_fixture.h"
#include "support/scratch_folder.h"

namespace vialkeeper {
namespace {

using tests::ScratchFolder;

std::int64_t markOf(app::Notebook& notebook) {
  const auto mark = notebook.changeMark();
  REQUIRE(mark);
  return *mark;
}

TEST_CASE("the mark of changes differs after any change, by whomever", "[db][change-mark]") {
  const ScratchFolder folder;
  const std::string file = folder.path("watched.vialbook");
  tests::makeSmallNotebook(file, 1);
  const auto mine = tests::opened(file);
  const auto other = tests::opened(file);
  tests::SteppingClock clock;
  std::set<std::int64_t> marks{markOf(*mine)};
  for (int round = 0; round < 20; ++round) {
    CHECK(marks.contains(markOf(*mine)));  // nothing happened
    app::Notebook& writer = round % 3 == 0 ? *mine : *other;
    REQUIRE(app::logLine({writer, clock, "KW"}, tests::runOf(writer), {.line = "note steady"}));
    CHECK(marks.insert(markOf(*mine)).second);
  }
  // Reading is no change.
  const auto before = markOf(*mine);
  (void)tests::findings(*other);
  CHECK(tests::runOf(*mine).code == "KW-0001");
  CHECK(markOf(*mine) == before);
}

TEST_CASE("the vocabulary counts the runs that hold each name", "[db][vocabulary]") {
  const ScratchFolder folder;
  const std::string file = folder.path("words.vialbook");
  tests::makeSmallNotebook(file, 0);
  const auto notebook = tests::opened(file);
  tests::SteppingClock clock;
  const app::Desk desk{*notebook, clock, "KW"};
  REQUIRE(notebook->act(desk.action("test"), [&](app::Writing& writing) -> text::Checked<void> {
    REQUIRE(writing.addSubstance(
        {.name = "pivalic acid", .synonyms = {"PivOH"}, .formula = "C5H10O2"}));
    REQUIRE(writing.addCard(
        {.kind = app::ShelfKind::kVial, .name = "10 mL crimp", .fields = {{"volume", 11.6}}}));
    app::RunRecord run = tests::runOf(*notebook);
    run.series = "acids";
    run.vial = "20 mL crimp";
    run.lamp = "LED 440";
    run.atmosphere = "N2";
    REQUIRE(writing.changeRun(run));
    run.code = "MR-0001";
    run.person = "MR";
    app::ComponentRecord component;
    component.key = "amine";
    component.role = "substrate";
    component.name = "indoline";
    component.substance = 1;
    std::vector<app::ComponentRecord> components{component};
    components.push_back(component);
    components.back().key = "again";
    components.back().position = 1;
    REQUIRE(writing.addRun(run, components));
    return {};
  }));
  const auto vocabulary = notebook->vocabulary();
  REQUIRE(vocabulary);
  const auto uses = [](const std::vector<app::VocabularyEntry>& entries) {
    std::string list;
    for (const auto& entry : entries) list += entry.name + "=" + std::to_string(entry.uses) + " ";
    return list;
  };
  CHECK(uses(vocabulary->substances) == "PivOH=0 indoline=2 pivalic acid=0 ");
  CHECK(uses(vocabulary->series) == "acids=2 ");
  CHECK(uses(vocabulary->people) == "KW=1 MR=1 ");
  CHECK(uses(vocabulary->vials) == "10 mL crimp=0 20 mL crimp=2 ");
  CHECK(uses(vocabulary->lamps) == "LED 440=2 ");
  CHECK(uses(vocabulary->atmospheres) == "N2=2 ");
}

TEST_CASE("a search in another thread is broken off soon, and the notebook goes on",
          "[db][interrupt]") {
  const ScratchFolder folder;
  const std::string file = folder.path("long.vialbook");
  tests::makeSmallNotebook(file, 1);
  {
    // Many runs like the first, through SQLite alone: only their number matters here.
    SQLite::Database database(file, SQLite::OPEN_READWRITE);
    database.exec(
        "WITH RECURSIVE i(k) AS (SELECT 2 UNION ALL SELECT k + 1 FROM i WHERE k < 30000) INSERT "
        "INTO "
        "run (n, id, code, person_n, state, created_ms, created_offset_min, plan_n, limiting_key, "
        "limiting_mmol, liquid_ml) SELECT k, randomblob(16), 'KW-' || k, 1, 'planned', k, 0, 1, "
        "'amine', 0.2, 2.0 FROM i");
  }
  const auto notebook = tests::opened(file);
  std::atomic<bool> isDone = false;
  text::Checked<app::FindResult> result;
  std::thread search([&] {
    // Again and again, so that one of them runs when the interruption comes.
    do {
      result = notebook->find({}, {.limit = 0});
    } while (result);
    isDone = true;
  });
  for (int i = 0; i < 10000 && !isDone; ++i) {
    notebook->interrupt();
    std::this_thread::sleep_for(std::chrono::milliseconds(1));
  }
  search.join();
  REQUIRE_FALSE(result);
  CHECK(result.error().front().field == "interrupted");
  CHECK(result.error().front().kind == text::FaultKind::kNotebook);
  CHECK(tests::runOf(*notebook).code == "KW-0001");
}

TEST_CASE("a component is deleted by nothing but the program, and never of a sealed run",
          "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("kept.vialbook");
  tests::makeSmallNotebook(file, 0);
  const auto notebook = tests::opened(file);
  tests::SteppingClock clock;
  const app::Desk desk{*notebook, clock, "KW"};
  const auto component = (*notebook->components(1)).front();
  REQUIRE(notebook->act(desk.action("test"), [&](app::Writing& writing) -> text::Checked<void> {
    app::RunRecord run = tests::runOf(*notebook);
    run.state = app::RunState::kSealed;
    return writing.changeRun(run);
  }));
  const auto removed = notebook->act(desk.action("test"), [&](app::Writing& writing) {
    return writing.removeComponent(component);
  });
  REQUIRE_FALSE(removed);
  CHECK(removed.error().front().what.find("never deleted") != std::string::npos);
  const auto added =
      notebook->act(desk.action("test"), [&](app::Writing& writing) -> text::Checked<void> {
        app::ComponentRecord more = component;
        more.key = "more";
        if (const auto n = writing.addComponent(more); !n) return std::unexpected(n.error());
        return {};
      });
  REQUIRE_FALSE(added);
  CHECK(tests::findings(*notebook).empty());
}

TEST_CASE("verify finds a component that was taken out behind the program's back", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("tampered.vialbook");
  tests::makeSmallNotebook(file, 0);
  {
    SQLite::Database database(file, SQLite::OPEN_READWRITE);
    database.exec(
        "INSERT INTO setting VALUES ('removing component', '1'); DELETE FROM component; DELETE "
        "FROM "
        "setting");
  }
  CHECK(tests::findings(*tests::opened(file)).find("the trail tells of it, but it is not there") !=
        std::string::npos);
}

TEST_CASE("a removal of what was changed elsewhere fails", "[db][safety]") {
  const ScratchFolder folder;
  const std::string file = folder.path("conflict.vialbook");
  tests::makeSmallNotebook(file, 0);
  const auto notebook = tests::opened(file);
  tests::SteppingClock clock;
  const app::Desk desk{*notebook, clock, "KW"};
  const auto read = (*notebook->components(1)).front();
  const auto act = [&](auto work) { return notebook->act(desk.action("test"), work); };
  REQUIRE(act([&](app::Writing& writing) {
    app::ComponentRecord changed = read;
    changed.planned_mmol = 0.3;
    return writing.changeComponent(changed);
  }));
  CHECK_FALSE(act([&](app::Writing& writing) { return writing.removeComponent(read); }));
  app::ComponentRecord now = (*notebook->components(1)).front();
  REQUIRE(act([&](app::Writing& writing) { return writing.removeComponent(now); }));
  CHECK_FALSE(act([&](app::Writing& writing) { return writing.removeComponent(now); }));
  CHECK_FALSE(act([&](app::Writing& writing) { return writing.changeComponent(now); }));
  CHECK(notebook->components(1)->empty());
  CHECK(tests::findings(*notebook).empty());
}

}  // namespace
}  // namespace vialkeeper
