// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/log_table_model.h"

#include <QAbstractItemModelTester>
#include <catch2/catch.hpp>

#include "ui/models/qt_text.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;
using namespace std::chrono_literals;

namespace {

struct Bench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link = fixture.link();
  ui::ActionHistory history;
  ui::OpenRun run{*link, history};
  ui::LogTableModel model{run};
  QAbstractItemModelTester tester{&model, QAbstractItemModelTester::FailureReportingMode::Fatal};

  Bench() { REQUIRE(run.open(fixture.addRun(*link))); }

  std::string cell(int row, int column) const {
    return ui::toUtf8(model.index(row, column).data().toString());
  }
  bool isStruck(int row) const {
    return model.index(row, 0).data(ui::LogTableModel::kStruckRole).toBool();
  }
};

using Column = ui::LogTableModel;

}  // namespace

TEST_CASE("the newest entry stands first, with the kind once", "[ui][identity]") {
  Bench bench;
  tests::requireDone(bench.run.log(QStringLiteral("lamp on")));
  bench.fixture.clock().advance(20min);
  tests::requireDone(bench.run.log(QStringLiteral("p 0.42 bar 35 C")));
  tests::requireDone(bench.run.log(QStringLiteral("clear yellow, first bubbles")));
  REQUIRE(bench.model.rowCount() == 3);
  CHECK(bench.cell(0, Column::kKind) == "note");
  CHECK(bench.cell(0, Column::kReading) == "clear yellow, first bubbles");
  CHECK(bench.cell(1, Column::kKind) == "pressure");
  CHECK(bench.cell(1, Column::kReading) == "0.42 bar gauge at 35 °C");
  CHECK(bench.cell(1, Column::kWhen) == "09:20");
  CHECK(bench.cell(2, Column::kKind) == "lamp on");
  CHECK(bench.cell(2, Column::kReading).empty());
  CHECK(bench.cell(2, Column::kWho) == "KW");
}

TEST_CASE("the day stands where it changes, and a late entry says when it was written",
          "[ui][identity]") {
  Bench bench;
  tests::requireDone(
      bench.run.log(QStringLiteral("vent"), QStringLiteral("2026-03-01T17:05+01:00")));
  tests::requireDone(bench.run.log(QStringLiteral("p 0.1 bar"), QStringLiteral("20 min ago")));
  CHECK(bench.cell(0, Column::kWhen) == "08:40");
  CHECK(bench.cell(0, Column::kRemark) == "written 09:00");
  CHECK(bench.cell(1, Column::kWhen) == "1 Mar 17:05");
  CHECK(bench.cell(1, Column::kRemark) == "late: written 4 Mar 09:00");
}

TEST_CASE("a corrected entry stays, struck through, with a word for it", "[ui][identity]") {
  Bench bench;
  tests::requireDone(bench.run.log(QStringLiteral("p 4.2 bar 35 C"), {}, {.accepted = true}));
  tests::requireDone(bench.run.correct(1, QStringLiteral("p 0.42 bar 35 C"), {}));
  REQUIRE(bench.model.rowCount() == 2);
  const int original = bench.model.rowOf(1);
  const int corrected = bench.model.rowOf(2);
  CHECK(bench.isStruck(original));
  CHECK_FALSE(bench.isStruck(corrected));
  CHECK(bench.cell(original, Column::kRemark) == "corrected at 09:00");
  CHECK(bench.cell(corrected, Column::kRemark) == "corrects “p 4.2 bar 35 C”");
  CHECK_FALSE(bench.model.stands(1));
  CHECK(bench.model.stands(2));
}

TEST_CASE("a withdrawn entry stays visible, and undo puts it back as a new one", "[ui][identity]") {
  Bench bench;
  tests::requireDone(bench.run.log(QStringLiteral("p 0.42 bar 35 C")));
  tests::requireDone(bench.run.withdraw(1));
  CHECK(bench.isStruck(bench.model.rowOf(1)));
  CHECK(bench.cell(bench.model.rowOf(1), Column::kRemark) == "withdrawn at 09:00");
  bench.history.undo();
  REQUIRE(bench.model.rowCount() == 3);
  CHECK(bench.model.stands(3));
  CHECK(bench.cell(bench.model.rowOf(3), Column::kReading) == "0.42 bar gauge at 35 °C");
}

TEST_CASE("any text of a person's is a row as it is, and the model stays sound", "[ui][identity]") {
  Bench bench;
  for (const auto* text : {"<b>not bold</b>", "50 % gone & \"quoted\"", "深い琥珀色", "a\tb",
                           "%1 %2 %n", "note p 0.42 bar looks too low"})
    tests::requireDone(bench.run.log(QString::fromUtf8(text)));
  tests::requireDone(bench.run.log(QString(5000, QLatin1Char('x'))));
  CHECK(bench.model.rowCount() == 7);
  CHECK(bench.cell(6, Column::kReading) == "<b>not bold</b>");
  CHECK(bench.cell(1, Column::kReading) == "p 0.42 bar looks too low");
  CHECK(bench.cell(0, Column::kReading).ends_with("(5000 characters in all)"));
  bench.run.close();
  CHECK(bench.model.rowCount() == 0);
}
