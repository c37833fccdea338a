// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/log_entry_model.h"

#include <QSignalSpy>
#include <catch2/catch.hpp>

#include "ui/models/log_stamps.h"
#include "ui/models/qt_text.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;
using Standing = ui::LogEntryModel::Standing;

namespace {

struct Bench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link = fixture.link();
  ui::ActionHistory history;
  ui::OpenRun run{*link, history};
  ui::LogEntryModel entry{run};

  Bench() { REQUIRE(run.open(fixture.addRun(*link))); }

  Standing type(const char* line) {
    entry.setLine(QString::fromUtf8(line));
    return entry.standing();
  }
  std::string sentence() const { return ui::toUtf8(entry.sentence()); }
};

}  // namespace

TEST_CASE("a line is read with every key and says how it reads", "[ui][identity]") {
  Bench bench;
  CHECK(bench.type("") == Standing::kEmpty);
  CHECK(bench.sentence().empty());
  CHECK(bench.type("p 0.38 bar 35 C") == Standing::kReads);
  CHECK(bench.sentence() == "reads as: pressure 0.38 bar gauge at 35 °C, now (09:00)");
  CHECK(bench.type("p ") == Standing::kUnfinished);
  CHECK(bench.type("p 0.38") == Standing::kUnfinished);
  CHECK(bench.type("deep amber") == Standing::kReads);
}

TEST_CASE("a doubtful line points at the place, is not logged, and can be kept as it is",
          "[ui][identity]") {
  Bench bench;
  CHECK(bench.type("p 0.42 bra") == Standing::kDoubtful);
  REQUIRE(bench.entry.doubtPlace());
  CHECK(bench.entry.doubtPlace()->first == 7);
  CHECK(bench.entry.doubtPlace()->second == 3);
  CHECK(bench.sentence().starts_with("looks like pressure, but "));
  CHECK(bench.entry.canKeepAsText());
  CHECK_FALSE(bench.entry.commit().done);
  CHECK(bench.entry.line() == QStringLiteral("p 0.42 bra"));
  CHECK(bench.run.events().empty());
  CHECK(bench.entry.commit(true).done);
  CHECK(bench.entry.line().isEmpty());
  REQUIRE(bench.run.events().size() == 1);
  CHECK(bench.run.events().front().event.kind == "observation");
}

TEST_CASE("the place of a doubt counts characters, not bytes", "[ui][identity]") {
  Bench bench;
  CHECK(bench.type("h2 12,3 % µµ") != Standing::kEmpty);
  CHECK(bench.type("aliquot 50 µL µ 35") != Standing::kEmpty);
  if (bench.entry.doubtPlace()) {
    const auto [at, length] = *bench.entry.doubtPlace();
    CHECK(at + length <= bench.entry.line().size());
  }
}

TEST_CASE("a line that was not finished waits while another run is open", "[ui][identity]") {
  Bench bench;
  const app::RowNumber first = bench.run.run().n;
  bench.type("p 0.4");
  REQUIRE(bench.run.open(bench.fixture.addRun(*bench.link)));
  CHECK(bench.entry.line().isEmpty());
  bench.type("deep");
  REQUIRE(bench.run.open(first));
  CHECK(bench.entry.line() == QStringLiteral("p 0.4"));
}

TEST_CASE("a line that a stamp began is unfinished, not in doubt", "[ui][identity]") {
  Bench bench;
  bench.entry.begin(QStringLiteral("p  bar 35 C"));
  CHECK(bench.entry.standing() == Standing::kUnfinished);
  CHECK(bench.type("p 0.38 bar 35 C") == Standing::kReads);
  CHECK(bench.type("p x bar 35 C") == Standing::kDoubtful);
}

TEST_CASE("the time field is read too", "[ui][identity]") {
  Bench bench;
  bench.type("vent");
  bench.entry.setAt(QStringLiteral("20 min ago"));
  CHECK(bench.entry.standing() == Standing::kReads);
  CHECK(bench.sentence().find("08:40") != std::string::npos);
  for (const auto* bad : {"23:59", "25:00", "tomorrow", "20 min", "-", "\xF0\x9F\x92\xA7"}) {
    INFO(bad);
    bench.entry.setAt(QString::fromUtf8(bad));
    CHECK(bench.entry.standing() == Standing::kBadTime);
    CHECK_FALSE(bench.entry.commit().done);
    CHECK(bench.entry.at() == QString::fromUtf8(bad));
  }
  CHECK(bench.run.events().empty());
  bench.entry.setAt(QStringLiteral("20 min ago"));
  CHECK(bench.entry.commit().done);
  CHECK(bench.entry.at().isEmpty());
  REQUIRE(bench.run.events().size() == 1);
}

TEST_CASE("a pressure that the vial cannot hold is questioned, and kept when that was meant",
          "[ui][identity]") {
  Bench bench;
  QSignalSpy failed(&bench.entry, &ui::LogEntryModel::failed);
  bench.entry.setLine(QStringLiteral("p 420 bar"));
  CHECK_FALSE(bench.entry.commit().done);
  CHECK(bench.entry.isQuestioned());
  REQUIRE(failed.count() == 1);
  CHECK(failed.front().front().toString().contains(QStringLiteral("420 mbar")));
  CHECK(bench.run.events().empty());
  CHECK(bench.entry.line() == QStringLiteral("p 420 bar"));
  CHECK(bench.entry.commit(true).done);
  CHECK(bench.run.events().size() == 1);
  CHECK_FALSE(bench.entry.isQuestioned());
}

TEST_CASE("a correction fills the line and keeps the original's time", "[ui][identity]") {
  Bench bench;
  tests::requireDone(bench.run.log(QStringLiteral("p 4.2 bar 35 C"), QStringLiteral("20 min ago"), {.accepted = true}));
  const auto before = bench.run.events().front().event.at;
  bench.entry.startCorrection(1);
  CHECK(bench.entry.task() == ui::LogEntryModel::Task::kCorrection);
  CHECK(bench.entry.line() == QStringLiteral("p 4.2 bar 35 C"));
  CHECK_FALSE(bench.entry.taskSentence().isEmpty());
  bench.entry.setLine(QStringLiteral("p 0.42 bar 35 C"));
  CHECK(bench.entry.commit().done);
  CHECK(bench.entry.task() == ui::LogEntryModel::Task::kNew);
  REQUIRE(bench.run.events().size() == 2);
  for (const auto& each : bench.run.events()) CHECK(each.event.at == before);
  // What was corrected cannot be corrected again: the new one can.
  QSignalSpy failed(&bench.entry, &ui::LogEntryModel::failed);
  bench.entry.startCorrection(1);
  CHECK(bench.entry.task() == ui::LogEntryModel::Task::kNew);
  CHECK(failed.size() == 1);
}

TEST_CASE("where the state wants a reason a withdrawal asks for it first", "[ui][identity]") {
  Bench bench;
  tests::requireDone(bench.run.log(QStringLiteral("lamp on")));
  tests::requireDone(bench.run.log(QStringLiteral("p 0.42 bar 35 C")));
  tests::requireDone(bench.run.record({.yield = "60 %"}));
  bench.entry.startWithdrawal(2);
  CHECK(bench.entry.task() == ui::LogEntryModel::Task::kWithdrawal);
  CHECK(bench.entry.wantsReason());
  CHECK_FALSE(bench.entry.commit().done);
  CHECK(bench.run.events().size() == 2);
  bench.entry.setReason(QStringLiteral("read from the wrong gauge"));
  CHECK(bench.entry.commit().done);
  CHECK(bench.run.events().size() == 3);
  CHECK(bench.entry.task() == ui::LogEntryModel::Task::kNew);
}

TEST_CASE("stamps log at once or begin a line with the cursor at the value", "[ui][identity]") {
  app::VialStrip strip;
  CHECK(ui::stampDeed(ui::Stamp::kLamp, strip, {}).line == QStringLiteral("lamp on"));
  CHECK(ui::stampWord(ui::Stamp::kLamp, true) == QStringLiteral("Lamp off"));
  strip.lampIsOn = true;
  strip.temperature = app::LastReading{.value = 35.0};
  CHECK(ui::stampDeed(ui::Stamp::kLamp, strip, {}).line == QStringLiteral("lamp off"));
  const auto pressure = ui::stampDeed(ui::Stamp::kPressure, strip, {});
  CHECK(pressure.line == QStringLiteral("p  bar 35 C"));
  CHECK(pressure.cursor == 2);
  CHECK(ui::stampDeed(ui::Stamp::kPressure, strip, QStringLiteral("0.4 bar")).line ==
        QStringLiteral("p 0.4 bar"));
  // What a stamp begins is what the log reads once the figure is there.
  for (const ui::Stamp stamp : ui::kStamps) {
    const auto deed = ui::stampDeed(stamp, strip, {});
    if (deed.how == ui::StampDeed::How::kChooseFile) continue;
    QString line = deed.line;
    if (deed.how == ui::StampDeed::How::kBegin) line.insert(deed.cursor, QStringLiteral("12"));
    INFO(ui::toUtf8(line));
    CHECK_FALSE(app::readLogLine(ui::toUtf8(line)).doubt);
  }
}
