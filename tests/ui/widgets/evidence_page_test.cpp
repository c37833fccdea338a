// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/evidence_page.h"

#include <QComboBox>
#include <QLabel>
#include <QTableView>
#include <QTest>
#include <catch2/catch.hpp>

#include "ui/widgets/main_window.h"
#include "ui/widgets/workspace.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;

namespace {

const std::string kTable = "# cat = 0.002 mol/L\r\ntime [h],amine [mol/L]\r\n0,0.1\r\n2,0.05";

struct Desktop {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::MainWindow> window;
  ui::EvidencePage* page = nullptr;

  Desktop() {
    fixture.addRun(*fixture.link());
    window = std::make_unique<ui::MainWindow>(fixture.workplace());
    window->openNotebook(fixture.bookFile());
    window->workspace()->link().setPerson(QStringLiteral("KW"));
    window->workspace()->showRun(1);
    window->workspace()->showPage(ui::RunPage::Page::kEvidence);
    window->setVisible(true);
    page = window->findChild<ui::EvidencePage*>();
    REQUIRE(page != nullptr);
  }
  std::string message() const {
    return page->findChild<QLabel*>(QStringLiteral("evidenceMessage"))->text().toStdString();
  }
};

}  // namespace

TEST_CASE("an imported dataset is shown and saved out again byte for byte", "[ui][identity]") {
  Desktop desktop;
  const std::string file = desktop.fixture.folder().write("course.csv", kTable);
  desktop.page->kind().setCurrentText(QStringLiteral("course"));
  desktop.page->importFile(QString::fromStdString(file));
  REQUIRE(QTest::qWaitFor([&] { return desktop.page->shown() != nullptr; }, 15'000));
  CHECK(desktop.page->shown()->values.size() == 2);
  CHECK(desktop.message().find("is kept") != std::string::npos);
  const std::string out = desktop.fixture.folder().path("out.csv");
  REQUIRE(desktop.page->saveRaw(QString::fromStdString(out)));
  CHECK(tests::bytesOf(out) == kTable);
}

TEST_CASE("a table of another kind is refused with a sentence", "[ui][identity]") {
  Desktop desktop;
  const std::string file = desktop.fixture.folder().write("course.csv", kTable);
  desktop.page->kind().setCurrentText(QStringLiteral("quench"));
  desktop.page->importFile(QString::fromStdString(file));
  REQUIRE(QTest::qWaitFor([&] { return !desktop.page->import().isRunning(); }, 15'000));
  CHECK(desktop.message().find("quencher") != std::string::npos);
  CHECK(desktop.page->model().rowCount() == 0);
}
