// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QApplication>
#include <QLabel>
#include <QLineEdit>
#include <QListView>
#include <QMenu>
#include <QSettings>
#include <QTableView>
#include <QTest>
#include <QToolButton>
#include <catch2/catch.hpp>
#include <memory>

#include "ui/models/run_list_model.h"
#include "ui/models/saved_filters.h"
#include "ui/widgets/main_window.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/workspace.h"
#include "ui/workplace_fixture.h"

// Finding and opening runs with the keyboard alone.
using namespace vialkeeper;

namespace {

struct WindowBench {
  tests::WorkplaceFixture fixture;
  std::unique_ptr<ui::MainWindow> window;

  WindowBench() {
    QSettings().remove(QStringLiteral("runs/columns"));
    QSettings().remove(QStringLiteral("filters"));
    window = std::make_unique<ui::MainWindow>(fixture.workplace());
    window->resize(1280, 800);
    window->openNotebook(fixture.demoFile());
    REQUIRE(window->workspace() != nullptr);
    window->setVisible(true);
    window->activateWindow();
    REQUIRE(QTest::qWaitForWindowActive(window.get()));
    REQUIRE(rowsAre([](int rows) { return rows > 10; }));
  }
  template <class T>
  T* child(const char* name) const {
    T* found = window->findChild<T*>(QString::fromLatin1(name));
    REQUIRE(found != nullptr);
    return found;
  }
  [[nodiscard]] QTableView* table() const { return child<QTableView>("runsTable"); }
  [[nodiscard]] QLineEdit* filter() const { return child<QLineEdit>("filterLine"); }
  [[nodiscard]] QListView* proposals() const { return child<QListView>("completions"); }
  bool rowsAre(const std::function<bool(int)>& right) const {
    return QTest::qWaitFor([&] { return right(table()->model()->rowCount()); }, 10'000);
  }
  /// To whatever has the focus.
  static void press(Qt::Key key, Qt::KeyboardModifiers modifiers = Qt::NoModifier) {
    REQUIRE(QApplication::focusWidget() != nullptr);
    QTest::keyClick(QApplication::focusWidget(), key, modifiers);
  }
  static void type(const char* text) {
    REQUIRE(QApplication::focusWidget() != nullptr);
    QTest::keyClicks(QApplication::focusWidget(), QString::fromUtf8(text));
  }
};

}  // namespace

TEST_CASE("slash, words, Down and Enter find and open a run", "[ui][identity]") {
  WindowBench bench;
  bench.table()->setFocus();
  WindowBench::press(Qt::Key_Slash);
  CHECK(QApplication::focusWidget() == bench.filter());
  CHECK(bench.filter()->text().isEmpty());
  const int all = bench.table()->model()->rowCount();
  WindowBench::type("bubbles amber ");
  REQUIRE(bench.rowsAre([all](int rows) { return rows > 0 && rows < all; }));
  WindowBench::press(Qt::Key_Down);
  CHECK(QApplication::focusWidget() == bench.table());
  WindowBench::press(Qt::Key_Down);
  const QString code = bench.table()->model()->index(1, 0).data().toString();
  WindowBench::press(Qt::Key_Return);
  REQUIRE(bench.window->workspace()->openRun().isOpen());
  CHECK(bench.window->workspace()->openRun().run().code == code.toStdString());
}

TEST_CASE("a slash within a field of text is text", "[ui][identity]") {
  WindowBench bench;
  bench.filter()->setFocus();
  WindowBench::type("a/b");
  CHECK(bench.filter()->text() == QStringLiteral("a/b"));
}

TEST_CASE("Tab takes the first proposal, Down and Enter the chosen one", "[ui][identity]") {
  WindowBench bench;
  bench.filter()->setFocus();
  WindowBench::type("photoc");
  REQUIRE(bench.proposals()->isVisible());
  WindowBench::press(Qt::Key_Tab);
  CHECK(bench.filter()->text() == QStringLiteral("photocatalyst:"));
  CHECK(QApplication::focusWidget() == bench.filter());
  WindowBench::press(Qt::Key_Escape);
  CHECK_FALSE(bench.proposals()->isVisible());
  CHECK_FALSE(bench.filter()->text().isEmpty());
  WindowBench::press(Qt::Key_Escape);
  CHECK(bench.filter()->text().isEmpty());
  WindowBench::type("ser");
  WindowBench::press(Qt::Key_Down);
  WindowBench::press(Qt::Key_Return);
  CHECK(bench.filter()->text() == QStringLiteral("series:"));
}

TEST_CASE("a fault stands below the line, points, and keeps the focus there", "[ui][identity]") {
  WindowBench bench;
  bench.filter()->setFocus();
  WindowBench::type("yield>x ");
  auto* fault = bench.child<QLabel>("filterFault");
  REQUIRE(QTest::qWaitFor([&] { return fault->isVisible(); }, 5'000));
  CHECK_FALSE(fault->text().isEmpty());
  WindowBench::press(Qt::Key_Return);
  CHECK(QApplication::focusWidget() == bench.filter());
  WindowBench::press(Qt::Key_Escape);
  REQUIRE(QTest::qWaitFor([&] { return !fault->isVisible(); }, 5'000));
}

TEST_CASE("a filter is kept under a name and chosen again", "[ui][identity]") {
  WindowBench bench;
  bench.filter()->setFocus();
  WindowBench::type("state:closed ");
  auto* menu = bench.child<QMenu>("savedFiltersMenu");
  const auto act = [&](const QString& text) {
    emit menu->aboutToShow();
    for (QAction* action : menu->actions())
      if (action->text() == text) action->trigger();
  };
  act(QStringLiteral("Keep this filter…"));
  CHECK(QApplication::focusWidget() == bench.child<QLineEdit>("filterName"));
  WindowBench::type("done ones");
  WindowBench::press(Qt::Key_Return);
  CHECK(QApplication::focusWidget() == bench.filter());
  WindowBench::press(Qt::Key_Escape);
  CHECK(bench.filter()->text().isEmpty());
  act(QStringLiteral("done ones"));
  CHECK(bench.filter()->text() == QStringLiteral("state:closed"));
}

TEST_CASE("the selected run stays selected when the list is read again", "[ui][identity]") {
  WindowBench bench;
  bench.table()->setFocus();
  for (int i = 0; i < 4; ++i) WindowBench::press(Qt::Key_Down);
  const auto selected = [&] {
    return bench.table()->currentIndex().data(ui::RunListModel::kRunRole).toLongLong();
  };
  const auto before = selected();
  {
    auto other = bench.fixture.workplace().files.open(
        bench.window->workspace()->link().file().toStdString(), ui::NotebookFiles::Use::kWriting);
    REQUIRE(other);
    REQUIRE(app::cloneRun({**other, bench.fixture.clock(), "MR"}, *(*other)->run(1), {}, "Newest"));
  }
  const int rows = bench.table()->model()->rowCount();
  bench.window->workspace()->link().lookForChanges();
  REQUIRE(bench.rowsAre([rows](int now) { return now == rows + 1; }));
  CHECK(selected() == before);
  bench.filter()->setText(QStringLiteral("yield>60"));
  REQUIRE(bench.rowsAre([rows](int now) { return now < rows; }));
  bench.filter()->clear();
  REQUIRE(bench.rowsAre([rows](int now) { return now == rows + 1; }));
  CHECK(selected() == before);
}

TEST_CASE("no text of the usual columns is cut off", "[ui][identity]") {
  WindowBench bench;
  const double scale = GENERATE(1.0, 1.6);
  ui::Theme::instance().setHoodMode(*qApp, scale > 1.0);
  QTest::qWait(50);
  QTableView& table = *bench.table();
  const QFontMetrics metrics(table.font());
  for (int row = 0; row < table.model()->rowCount(); ++row) {
    for (int column = 0; column < table.model()->columnCount(); ++column) {
      const QString text = table.model()->index(row, column).data().toString();
      const QRect room = table.visualRect(table.model()->index(row, column)).adjusted(8, 2, -8, -2);
      const QRect taken =
          metrics.boundingRect(QRect(0, 0, room.width(), 10'000), Qt::TextWordWrap, text);
      INFO(text.toStdString());
      CHECK(taken.width() <= room.width());
      CHECK(taken.height() <= room.height());
    }
  }
  ui::Theme::instance().setHoodMode(*qApp, false);
}

TEST_CASE("pictures", "[.picture]") {
  WindowBench bench;
  auto save = [&](const char* name) {
    QTest::qWait(150);
    bench.window->grab().save(QString::fromLatin1("/tmp/u1-") + QString::fromLatin1(name) + QStringLiteral(".png"));
  };
  bench.table()->setFocus();
  WindowBench::press(Qt::Key_Down);
  save("light");
  bench.filter()->setFocus();
  WindowBench::type("acid:piv");
  save("complete");
  WindowBench::press(Qt::Key_Escape);
  WindowBench::press(Qt::Key_Escape);
  WindowBench::type("photoc");
  save("complete2");
  WindowBench::press(Qt::Key_Escape);
  WindowBench::press(Qt::Key_Escape);
  WindowBench::type("acid:\"pivalic acid\" yield>x ");
  save("fault");
  WindowBench::press(Qt::Key_Escape);
  WindowBench::press(Qt::Key_Escape);
  WindowBench::type("acid:pivalicc ");
  save("nothing");
  WindowBench::press(Qt::Key_Escape);
  WindowBench::press(Qt::Key_Escape);
  bench.table()->setFocus();
  WindowBench::press(Qt::Key_D, Qt::ControlModifier);
  QTest::qWait(800);
  save("new");
  ui::Theme::instance().apply(*qApp, ui::Theme::Choice::kDark);
  save("new-dark");
  WindowBench::press(Qt::Key_Escape);
  save("dark");
  ui::Theme::instance().setHoodMode(*qApp, true);
  save("hood");
  ui::Theme::instance().setHoodMode(*qApp, false);
  ui::Theme::instance().apply(*qApp, ui::Theme::Choice::kLight);
}
