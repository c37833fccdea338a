// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/evidence_model.h"

#include <QAbstractItemModelTester>
#include <QElapsedTimer>
#include <QFile>
#include <QSignalSpy>
#include <QTest>
#include <catch2/catch.hpp>
#include <cmath>

#include "ui/models/dataset_preview.h"
#include "ui/models/evidence_import.h"
#include "ui/models/qt_text.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;

namespace {

constexpr auto kFatal = QAbstractItemModelTester::FailureReportingMode::Fatal;

// Byte for byte: with a comment, Windows line ends, a gap and no line end at the end.
const std::string kTable =
    "# cat = 0.002 mol/L\r\ntime [h],amine [mol/L]\r\n0,0.1\r\n2,\r\n1,0.08\r\n4,n/a\r\n3,0.05";

struct Bench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::NotebookLink> link = fixture.link();
  ui::ActionHistory history;
  ui::OpenRun run{*link, history};
  ui::EvidenceModel model{run};
  QAbstractItemModelTester tester{&model, kFatal};
  ui::EvidenceImport import{run};

  Bench() { REQUIRE(run.open(fixture.addRun(*link))); }

  ui::EvidenceContentPtr content(int row) {
    const auto read = ui::readEvidence(link->notebook(), *model.itemAt(row));
    REQUIRE(read);
    return *read;
  }
};

}  // namespace

TEST_CASE("an imported table is kept byte for byte and linked to the run", "[ui][identity]") {
  Bench bench;
  QSignalSpy imported(&bench.import, &ui::EvidenceImport::imported);
  const std::string file = bench.fixture.folder().write("course.csv", kTable);
  bench.import.start(ui::toQt(file), QStringLiteral("course"));
  CHECK(bench.import.isRunning());
  REQUIRE(QTest::qWaitFor([&] { return imported.size() == 1; }, 10'000));
  CHECK_FALSE(bench.import.isRunning());
  REQUIRE(bench.model.rowCount() == 1);
  const auto content = bench.content(0);
  CHECK(content->bytes == kTable);
  CHECK(content->sha256.size() == 64);
  CHECK(ui::recipeOf(*content).contains(QStringLiteral("cat = 0.002 mol/L")));
  // The cell that is no number is told with its line.
  const auto notices = imported.front().at(1).value<text::Notices>();
  REQUIRE(notices.size() == 1);
  CHECK(notices.front().text.find("line 6") != std::string::npos);
}

TEST_CASE("the preview shows every number, gaps by a word, and curves in the order of the first",
          "[ui][identity]") {
  Bench bench;
  QSignalSpy imported(&bench.import, &ui::EvidenceImport::imported);
  bench.import.start(ui::toQt(bench.fixture.folder().write("course.csv", kTable)),
                     QStringLiteral("course"));
  REQUIRE(QTest::qWaitFor([&] { return imported.size() == 1; }, 10'000));
  const auto content = bench.content(0);
  ui::DatasetTableModel table;
  QAbstractItemModelTester tester(&table, kFatal);
  table.show(content);
  CHECK(table.rowCount() == 5);
  CHECK(table.columnCount() == 2);
  CHECK(table.index(0, 1).data().toString() == QStringLiteral("0.1"));
  CHECK(table.index(1, 1).data().toString() == QStringLiteral("gap"));
  CHECK(table.headerData(1, Qt::Horizontal, Qt::DisplayRole).toString() ==
        QStringLiteral("amine [mol/L]"));
  const auto curves = ui::curvesOf(*content);
  REQUIRE(curves.size() == 1);
  CHECK(curves.front().x == std::vector<double>{0.0, 1.0, 2.0, 3.0, 4.0});
  CHECK(curves.front().y[1] == 0.08);
  CHECK(std::isnan(curves.front().y[2]));
}

TEST_CASE("a file that is no table is refused with a sentence and leaves nothing",
          "[ui][identity]") {
  Bench bench;
  QSignalSpy refused(&bench.import, &ui::EvidenceImport::refused);
  int expected = 0;
  for (const auto* text : {"", "time [h]\n", "amine [mol/L]\n0.1\n", "time [h],x\n1\n"}) {
    INFO(text);
    bench.import.start(ui::toQt(bench.fixture.folder().write("bad.csv", text)),
                       QStringLiteral("course"));
    ++expected;
    REQUIRE(QTest::qWaitFor([&] { return refused.size() == expected; }, 10'000));
  }
  bench.import.start(QStringLiteral("/nowhere/at/all.csv"), QStringLiteral("course"));
  REQUIRE(QTest::qWaitFor([&] { return refused.size() == expected + 1; }, 10'000));
  CHECK(bench.model.rowCount() == 0);
  CHECK(bench.link->notebook().datasetsOf(bench.run.run().n)->empty());
}

TEST_CASE("a photo of the log is evidence too, byte for byte", "[ui][identity]") {
  Bench bench;
  const std::string bytes("\x89PNG\r\n\x1a\n no picture really \0 at all", 35);
  const std::string file = bench.fixture.folder().write("vial 3.png", bytes);
  tests::requireDone(bench.run.log(QStringLiteral("photo ") + ui::toQt(file)));
  REQUIRE(bench.model.rowCount() == 1);
  CHECK(bench.content(0)->bytes == bytes);
  CHECK_FALSE(bench.content(0)->isDataset());
}
