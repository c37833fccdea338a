// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QCoreApplication>
#include <algorithm>
#include <catch2/catch.hpp>

#include "ui/models/qt_text.h"
#include "ui/models/weigh_steps.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;

namespace {

struct Bench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link = fixture.link();
  ui::ActionHistory history;
  ui::OpenRun run{*link, history};
  ui::ChangeReason reason{run};
  ui::WeighSteps steps{run, reason};

  Bench() {
    REQUIRE(run.open(fixture.addRun(*link)));
    steps.start();
  }

  std::string actual(const std::string& key) const {
    for (const auto& each : run.sheet().components)
      if (each.key == key) return each.actualText;
    return "none of that key";
  }
};

}  // namespace

TEST_CASE("weighing goes from one component to the next in the order of addition",
          "[ui][identity]") {
  Bench bench;
  const std::vector<std::string> order = app::weighingOrder(bench.run.sheet());
  REQUIRE(bench.steps.count() == static_cast<int>(order.size()));
  for (const std::string& key : order) {
    CHECK(bench.steps.key() == key);
    CHECK(bench.steps.progress().endsWith(QStringLiteral("of 6")));
    bench.steps.setTyped(bench.steps.row().target);
    CHECK(bench.steps.tone() == ui::Tone::kGood);
    CHECK(bench.steps.deviation().contains(QStringLiteral("within tolerance")));
    bench.steps.record();
  }
  CHECK(bench.steps.recorded() == QStringLiteral("all recorded"));
  for (const std::string& key : order) CHECK_FALSE(bench.actual(key).empty());
}

TEST_CASE("a bare number from a balance gets the unit of the target and says so",
          "[ui][identity]") {
  Bench bench;
  bench.steps.startAt("nickel");
  bench.steps.setTyped(QStringLiteral("N +003.20\r"));
  CHECK(bench.steps.understood().contains(QStringLiteral("read as 3.20 mg")));
  CHECK(bench.steps.understood().contains(QStringLiteral("no unit came")));
  bench.steps.record();
  CHECK(bench.actual("nickel") == "3.20 mg");
}

TEST_CASE("what cannot be recorded stays in the field with its sentence", "[ui][identity]") {
  Bench bench;
  bench.steps.startAt("nickel");
  for (const auto* typed : {"abc", "3.2 bar", "-3.2 mg", "S D 3.2 mg"}) {
    bench.steps.setTyped(QString::fromUtf8(typed));
    bench.steps.record();
    CHECK(bench.steps.key() == "nickel");
    CHECK(bench.steps.tone() == ui::Tone::kFault);
    CHECK_FALSE(bench.steps.understood().isEmpty());
    CHECK(bench.actual("nickel").empty());
  }
}

TEST_CASE("a slip is asked about and answered in place", "[ui][identity]") {
  Bench bench;
  bench.steps.startAt("nickel");
  bench.steps.setTyped(QStringLiteral("32 mg"));
  bench.steps.record();
  CHECK(bench.steps.question().contains(QStringLiteral("did you mean 3.2 mg?")));
  CHECK(bench.actual("nickel").empty());
  SECTION("it was meant") {
    bench.steps.accept();
    CHECK(bench.actual("nickel") == "32 mg");
  }
  SECTION("the likely one was meant") {
    bench.steps.takeLikely();
    CHECK(bench.actual("nickel") == "3.2 mg");
  }
  SECTION("it is typed again") {
    bench.steps.setTyped(QStringLiteral("3.3 mg"));
    CHECK(bench.steps.question().isEmpty());
    bench.steps.record();
    CHECK(bench.actual("nickel") == "3.3 mg");
  }
}

TEST_CASE("after a re-target the targets follow the limiting component as weighed",
          "[ui][identity]") {
  Bench bench;
  bench.steps.retarget();
  CHECK_FALSE(bench.steps.isRetargeted());
  CHECK_FALSE(bench.steps.retargetFault().isEmpty());
  tests::requireDone(bench.run.weigh("amine", QStringLiteral("25 µL"), {.accepted = true}));
  bench.steps.startAt("nickel");
  const QString before = bench.steps.row().target;
  bench.steps.retarget();
  REQUIRE(bench.steps.isRetargeted());
  CHECK(bench.steps.retargetFault().isEmpty());
  const auto& changes = bench.steps.targetChanges();
  const auto nickel = std::ranges::find(changes, QStringLiteral("nickel(II) bromide glyme"),
                                        &ui::TargetChange::name);
  REQUIRE(nickel != changes.end());
  CHECK(nickel->before == before);
  CHECK(nickel->after == bench.steps.row().target);
  CHECK(nickel->after != before);
}

TEST_CASE("the steps go back and forth and stop at the ends", "[ui][identity]") {
  Bench bench;
  bench.steps.previous();
  CHECK(bench.steps.position() == 0);
  bench.steps.next();
  CHECK(bench.steps.position() == 1);
  for (int i = 0; i < 20; ++i) bench.steps.next();
  CHECK(bench.steps.position() == bench.steps.count() - 1);
  CHECK(bench.steps.nextName().isEmpty());
}
