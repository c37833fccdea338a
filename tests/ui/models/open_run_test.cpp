// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QCoreApplication>
#include <catch2/catch.hpp>

#include "ui/models/open_run.h"
#include "ui/models/qt_text.h"
#include "ui/workplace_fixture.h"

// What the desktop does with a run, against the notebook file itself: the trail and a second
// connection say what really was written.
using namespace vialkeeper;

namespace {

struct Bench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link = fixture.link();
  ui::ActionHistory history;
  ui::OpenRun run{*link, history};

  Bench() { REQUIRE(run.open(fixture.addRun(*link))); }

  const app::ComponentRecord& component(const std::string& key) const {
    for (const auto& each : run.sheet().components)
      if (each.key == key) return each;
    throw std::logic_error("no component " + key);
  }
};

}  // namespace

TEST_CASE("undoing a weighing takes it out and redoing puts it back, each as a new change",
          "[ui][identity]") {
  Bench bench;
  const std::size_t before = bench.link->notebook().history(bench.run.run().n)->size();
  tests::requireDone(bench.run.weigh("nickel", QStringLiteral("3.1 mg"), {.accepted = true}));
  CHECK(bench.component("nickel").actualText == "3.1 mg");
  bench.history.undo();
  CHECK(bench.component("nickel").actualText.empty());
  bench.history.redo();
  CHECK(bench.component("nickel").actualText == "3.1 mg");
  CHECK(bench.link->notebook().history(bench.run.run().n)->size() == before + 3);
}

TEST_CASE("undoing an amount brings the earlier plan back word for word", "[ui][identity]") {
  Bench bench;
  const std::string before = bench.run.sheet().planned.planText;
  tests::requireDone(bench.run.edit(QStringLiteral("acid"), {app::AmountEdit{"acid", "7 mol%"}}));
  CHECK(bench.component("acid").planned_molPercent == Approx(7.0));
  bench.history.undo();
  CHECK(bench.run.sheet().planned.planText == before);
  bench.history.redo();
  CHECK(bench.component("acid").planned_molPercent == Approx(7.0));
}

TEST_CASE("an entry that is undone stays visible and is withdrawn", "[ui][identity]") {
  Bench bench;
  tests::requireDone(bench.run.log(QStringLiteral("p 0.42 bar 35 C")));
  REQUIRE(bench.run.strip().pressures.size() == 1);
  bench.history.undo();
  CHECK(bench.run.events().size() == 2);
  CHECK(bench.run.strip().pressures.empty());
  bench.history.redo();
  CHECK(bench.run.events().size() == 3);
  CHECK(bench.run.strip().pressures.size() == 1);
}

TEST_CASE("a weighing that somebody else changed meanwhile is a conflict that shows both",
          "[ui][identity]") {
  Bench bench;
  tests::requireDone(bench.run.weigh("nickel", QStringLiteral("3.1 mg"), {.accepted = true}));
  {
    const auto other = bench.fixture.other();
    app::Desk desk{*other, bench.fixture.clock(), "MR"};
    REQUIRE(app::weighComponent(desk, *other->run(bench.run.run().n), "nickel", "3.4 mg", true, ""));
  }
  QString mine;
  QString theirs;
  std::function<void()> takeMine;
  QObject::connect(&bench.run, &ui::OpenRun::conflictFound, [&](const ui::Conflict& conflict) {
    mine = conflict.mine;
    theirs = conflict.theirs;
    takeMine = conflict.takeMine;
  });
  const auto outcome = bench.run.weigh("nickel", QStringLiteral("3.2 mg"), {.accepted = true});
  CHECK(outcome.conflict);
  CHECK(mine == QStringLiteral("3.2 mg"));
  CHECK(theirs == QStringLiteral("3.4 mg"));
  CHECK(bench.component("nickel").actualText == "3.4 mg");
  REQUIRE(takeMine);
  takeMine();
  CHECK(bench.component("nickel").actualText == "3.2 mg");
}

TEST_CASE("a change from another process appears without a restart", "[ui][identity]") {
  Bench bench;
  {
    const auto other = bench.fixture.other();
    app::Desk desk{*other, bench.fixture.clock(), "MR"};
    REQUIRE(app::logLine(desk, *other->run(bench.run.run().n), {.line = "deep amber"}));
  }
  CHECK(bench.run.events().empty());
  bench.link->lookForChanges();
  CHECK(bench.run.events().size() == 1);
}

TEST_CASE("a refused command leaves the run, the trail and the history as they were",
          "[ui][identity]") {
  Bench bench;
  const std::size_t before = bench.link->notebook().history(bench.run.run().n)->size();
  for (const auto* typed : {"", "3.1", "three mg", "3.1 bar", "-2 mg", "1e999 mg", "\xF0\x9F\x92\xA7"}) {
    const auto outcome =
        bench.run.weigh("nickel", QString::fromUtf8(typed), {.accepted = true});
    CHECK_FALSE(outcome.done);
    CHECK_FALSE(outcome.faults.empty());
  }
  CHECK_FALSE(bench.run.edit(QStringLiteral("x"), {app::AmountEdit{"acid", "5 bar"}}).done);
  CHECK_FALSE(bench.run.edit(QStringLiteral("x"), {app::ComponentRemoval{"amine"}}).done);
  CHECK(bench.link->notebook().history(bench.run.run().n)->size() == before);
  CHECK_FALSE(bench.history.canUndo());
}
