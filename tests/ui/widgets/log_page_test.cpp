// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/log_page.h"

#include <QAction>
#include <QApplication>
#include <QHeaderView>
#include <QLabel>
#include <QPushButton>
#include <QSet>
#include <QTest>
#include <catch2/catch.hpp>

#include "ui/models/qt_text.h"
#include "ui/widgets/entries_table.h"
#include "ui/widgets/entry_line.h"
#include "ui/widgets/main_window.h"
#include "ui/widgets/photo_strip.h"
#include "ui/widgets/reading_chart.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/timeline_widget.h"
#include "ui/widgets/vial_strip_widget.h"
#include "ui/widgets/workspace.h"
#include "ui/workplace_fixture.h"

// Everything with the keyboard alone, in the real window.
using namespace vialkeeper;
using namespace std::chrono_literals;

namespace {

struct Desktop {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::MainWindow> window;

  explicit Desktop(bool demo = false) {
    QString file = fixture.bookFile();
    if (demo)
      file = fixture.demoFile();
    else
      fixture.addRun(*fixture.link());
    window = std::make_unique<ui::MainWindow>(fixture.workplace());
    window->openNotebook(file);
    REQUIRE(window->workspace() != nullptr);
    workspace().link().setPerson(QStringLiteral("KW"));
    workspace().showRun(1);
    window->resize(1280, 800);
    window->setVisible(true);
    window->activateWindow();
    QTest::qWait(50);
  }

  ui::Workspace& workspace() { return *window->workspace(); }
  ui::OpenRun& run() { return workspace().openRun(); }
  ui::LogPage& page() { return workspace().runPage().logPage(); }
  QWidget* focus() { return QApplication::focusWidget(); }
  void keys(const QString& text) { QTest::keyClicks(focus(), text); }
  void key(Qt::Key which, Qt::KeyboardModifiers with = {}) {
    QTest::keyClick(focus() != nullptr ? focus() : window.get(), which, with);
    QTest::qWait(1);
  }
  std::string kindOf(int number) {
    for (const auto& each : run().events())
      if (each.number == number) return each.event.kind;
    return {};
  }
};

}  // namespace

TEST_CASE("five events are logged, one corrected and one taken back, by keys alone",
          "[ui][identity]") {
  Desktop desktop;
  desktop.key(Qt::Key_L, Qt::ControlModifier);
  REQUIRE(desktop.focus() == &desktop.page().entryLine().field());
  desktop.key(Qt::Key_1, Qt::AltModifier);  // lamp on
  desktop.fixture.clock().advance(30min);
  desktop.key(Qt::Key_2, Qt::AltModifier);  // p ▮ bar
  desktop.keys(QStringLiteral("0.38"));
  CHECK(desktop.page().entryLine().reading().startsWith(
      QStringLiteral("reads as: pressure 0.38 bar gauge")));
  desktop.key(Qt::Key_Return);
  desktop.key(Qt::Key_4, Qt::AltModifier);  // aliquot ▮ uL
  desktop.keys(QStringLiteral("50"));
  desktop.key(Qt::Key_Return);
  desktop.key(Qt::Key_6, Qt::AltModifier);  // vent
  desktop.keys(QStringLiteral("deep amber, no solid"));
  desktop.key(Qt::Key_Return);
  REQUIRE(desktop.run().events().size() == 5);
  CHECK(desktop.kindOf(1) == "lamp on");
  CHECK(desktop.kindOf(2) == "pressure");
  CHECK(desktop.kindOf(3) == "liquid sample");
  CHECK(desktop.kindOf(4) == "vent");
  CHECK(desktop.kindOf(5) == "observation");
  CHECK(desktop.run().run().state == app::RunState::kIrradiating);
  CHECK(desktop.page().stamps().button(ui::Stamp::kLamp).word() == QStringLiteral("Lamp off"));

  // Down to the entries, to the pressure, F2, and the line is filled.
  desktop.key(Qt::Key_Down);
  REQUIRE(desktop.focus() == &desktop.page().entries());
  while (desktop.page().entries().currentEntry() != 2) desktop.key(Qt::Key_Down);
  desktop.key(Qt::Key_F2);
  REQUIRE(desktop.focus() == &desktop.page().entryLine().field());
  CHECK(desktop.page().entryLine().field().text() == QStringLiteral("p 0.38 bar"));
  desktop.key(Qt::Key_A, Qt::ControlModifier);
  desktop.keys(QStringLiteral("p 0.83 bar 35 C"));
  desktop.key(Qt::Key_Return);
  REQUIRE(desktop.run().events().size() == 6);
  CHECK(desktop.kindOf(6) == "pressure");

  // Delete takes the note back; undo brings it again as a new entry.
  desktop.page().goToEntry(5);
  desktop.key(Qt::Key_Delete);
  REQUIRE(desktop.run().events().size() == 7);
  CHECK(desktop.kindOf(7) == "withdrawn");
  desktop.key(Qt::Key_Z, Qt::ControlModifier);
  REQUIRE(desktop.run().events().size() == 8);
  CHECK(desktop.kindOf(8) == "observation");
}

TEST_CASE("a doubtful line stays, says why, and is kept as it is when that is meant",
          "[ui][identity]") {
  Desktop desktop;
  desktop.key(Qt::Key_L, Qt::ControlModifier);
  desktop.keys(QStringLiteral("p 0.42 bra"));
  desktop.key(Qt::Key_Return);
  CHECK(desktop.run().events().empty());
  CHECK(desktop.page().entryLine().field().text() == QStringLiteral("p 0.42 bra"));
  CHECK(desktop.page().entryLine().reading().startsWith(QStringLiteral("looks like pressure")));
  desktop.key(Qt::Key_K, Qt::AltModifier);
  REQUIRE(QTest::qWaitFor([&] { return desktop.run().events().size() == 1; }));
  CHECK(desktop.kindOf(1) == "observation");
}

TEST_CASE("bad input of any kind leaves the field as it was and the notebook alone",
          "[ui][identity]") {
  Desktop desktop;
  desktop.key(Qt::Key_L, Qt::ControlModifier);
  ui::EntryLine& line = desktop.page().entryLine();
  for (const auto* typed : {"p", "p 1e999 bar", "vent xenon", "add 5 mg TEMPO", "0.42 bar 35 C"}) {
    INFO(typed);
    line.field().setText(QString::fromUtf8(typed));
    desktop.key(Qt::Key_Return);
    CHECK(line.field().text() == QString::fromUtf8(typed));
    CHECK(desktop.run().events().empty());
    CHECK_FALSE(line.reading().isEmpty());
  }
  line.field().setText(QStringLiteral("vent"));
  line.time().setText(QStringLiteral("23:59"));
  desktop.key(Qt::Key_Return);
  CHECK(line.time().text() == QStringLiteral("23:59"));
  CHECK(desktop.run().events().empty());
  desktop.key(Qt::Key_Escape);
  CHECK(line.field().text().isEmpty());
  CHECK(line.time().text().isEmpty());
}

TEST_CASE("a mark of the strip goes to its entry, by mouse and by keys", "[ui][identity]") {
  Desktop desktop;
  for (const auto* each : {"lamp on", "p 0.2 bar", "p 0.3 bar", "vent"}) {
    tests::requireDone(desktop.run().log(QString::fromUtf8(each)));
    desktop.fixture.clock().advance(2h);
  }
  desktop.workspace().showPage(ui::RunPage::Page::kCharge);
  auto* strip = desktop.window->findChild<ui::VialStripWidget*>();
  REQUIRE(strip != nullptr);
  desktop.run().reload();
  QTest::qWait(20);
  CHECK(strip->isTicking());
  QTest::mouseClick(&strip->timeline(), Qt::LeftButton, {}, strip->timeline().placeOf(2));
  CHECK(desktop.page().isVisible());
  CHECK(desktop.page().entries().currentEntry() == 2);
  strip->timeline().setFocus(Qt::TabFocusReason);
  QTest::keyClick(&strip->timeline(), Qt::Key_End);
  QTest::keyClick(&strip->timeline(), Qt::Key_Left);
  QTest::keyClick(&strip->timeline(), Qt::Key_Return);
  CHECK(desktop.page().entries().currentEntry() == 3);
  tests::requireDone(desktop.run().log(QStringLiteral("lamp off")));
  QTest::qWait(20);
  CHECK_FALSE(strip->isTicking());
}

TEST_CASE("no two keys of the log page and the window's commands are the same", "[ui][identity]") {
  Desktop desktop;
  QSet<QString> seen;
  for (const QAction* action : desktop.window->findChildren<QAction*>()) {
    const QString keys = action->shortcut().toString();
    if (keys.isEmpty()) continue;
    INFO(ui::toUtf8(keys));
    CHECK_FALSE(seen.contains(keys));
    seen.insert(keys);
  }
  CHECK(seen.contains(QStringLiteral("Alt+9")));
}

TEST_CASE("photos are kept byte for byte and shown as thumbnails", "[ui][identity]") {
  Desktop desktop;
  QImage picture(640, 480, QImage::Format_RGB32);
  picture.fill(Qt::darkCyan);
  const QString file = QString::fromStdString(desktop.fixture.folder().path("vial 3.png"));
  REQUIRE(picture.save(file));
  desktop.workspace().showPage(ui::RunPage::Page::kLog);
  desktop.page().addPhotos({file, QStringLiteral("/nowhere/no.png")});
  REQUIRE(desktop.run().events().size() == 1);
  const auto kept = desktop.workspace().link().notebook().attachment(
      desktop.run().events().front().event.attachment);
  CHECK(*kept == tests::bytesOf(file.toStdString()));
  CHECK(desktop.page().entryLine().reading().contains(QStringLiteral("no.png")));
  auto* strip = desktop.page().findChild<ui::PhotoStrip*>();
  REQUIRE(strip->photos().size() == 1);
  CHECK(strip->isVisible());
}

TEST_CASE("nothing is cut off in the entries of any demo run at 1280 by 800", "[ui][identity]") {
  Desktop desktop(true);
  desktop.workspace().showPage(ui::RunPage::Page::kLog);
  ui::EntriesTable& table = desktop.page().entries();
  int cells = 0;
  for (app::RowNumber n = 1; n <= 61; ++n) {
    desktop.workspace().showRun(n);
    desktop.workspace().showPage(ui::RunPage::Page::kLog);
    QCoreApplication::processEvents();
    const QAbstractItemModel& model = *table.model();
    for (int row = 0; row < model.rowCount(); ++row) {
      for (int column = 0; column < model.columnCount(); ++column) {
        QStyleOptionViewItem option;
        option.initFrom(&table);
        option.font = table.font();
        const QModelIndex index = model.index(row, column);
        const QSize wanted = table.itemDelegate()->sizeHint(option, index);
        INFO("run " << n << ", " << ui::toUtf8(index.data().toString()));
        CHECK(wanted.width() <= table.columnWidth(column) + 1);
        CHECK(wanted.height() <= table.rowHeight(row));
        ++cells;
      }
    }
    CHECK(table.horizontalHeader()->length() <= table.viewport()->width());
  }
  CHECK(cells > 1000);
}

TEST_CASE("in hood mode the page still fits the window", "[ui][identity]") {
  Desktop desktop;
  desktop.workspace().showPage(ui::RunPage::Page::kLog);
  ui::Theme::instance().setHoodMode(*qApp, true);
  QTest::qWait(50);
  CHECK(desktop.window->height() <= 800);
  CHECK(desktop.window->minimumSizeHint().height() <= 800);
  CHECK(desktop.page().minimumSizeHint().width() <= desktop.page().width());
  ui::Theme::instance().setHoodMode(*qApp, false);
}
