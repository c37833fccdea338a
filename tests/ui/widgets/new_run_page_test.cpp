// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QApplication>
#include <QLabel>
#include <QLineEdit>
#include <QTableView>
#include <QTest>
#include <catch2/catch.hpp>
#include <memory>

#include "ui/models/run_list_model.h"
#include "ui/widgets/main_window.h"
#include "ui/widgets/workspace.h"
#include "ui/workplace_fixture.h"

// Setting up a run with the keyboard alone.
using namespace vialkeeper;

namespace {

struct EmptyBench {
  tests::WorkplaceFixture fixture;
  ui::MainWindow window{fixture.workplace()};

  EmptyBench() {
    window.createNotebook(fixture.bookFile());
    REQUIRE(window.workspace() != nullptr);
    window.workspace()->link().setPerson(QStringLiteral("KW"));
    window.setVisible(true);
    window.activateWindow();
    REQUIRE(QTest::qWaitForWindowActive(&window));
  }
  template <class T>
  T* child(const char* name) const {
    T* found = window.findChild<T*>(QString::fromLatin1(name));
    REQUIRE(found != nullptr);
    return found;
  }
  static void press(Qt::Key key, Qt::KeyboardModifiers modifiers = Qt::NoModifier) {
    REQUIRE(QApplication::focusWidget() != nullptr);
    QTest::keyClick(QApplication::focusWidget(), key, modifiers);
  }
  static void type(const char* text) {
    QTest::keyClicks(QApplication::focusWidget(), QString::fromUtf8(text));
  }
  [[nodiscard]] std::int64_t runs() const {
    return window.findChild<ui::Workspace*>()->link().notebook().summary()->runs;
  }
};

}  // namespace

TEST_CASE("a run is set up from a template by keyboard alone", "[ui][identity]") {
  EmptyBench bench;
  EmptyBench::press(Qt::Key_N, Qt::ControlModifier);
  CHECK(QApplication::focusWidget() == bench.child<QLineEdit>("newRunSource"));
  EmptyBench::type("screen pivalic");
  EmptyBench::press(Qt::Key_Return);
  auto* title = bench.child<QLineEdit>("newRunTitle");
  CHECK(QApplication::focusWidget() == title);
  CHECK(title->text() == QStringLiteral("Acid screen 2 of 4, pivalic acid 20 mol%"));
  EmptyBench::type("Pivalic acid again");
  EmptyBench::press(Qt::Key_Tab);
  EmptyBench::press(Qt::Key_Tab);
  EmptyBench::type("whether the screen repeats");
  EmptyBench::press(Qt::Key_Return);
  REQUIRE(bench.runs() == 1);
  REQUIRE(bench.window.workspace()->openRun().isOpen());
  const app::RunRecord& run = bench.window.workspace()->openRun().run();
  CHECK(run.title == "Pivalic acid again");
  CHECK(run.aim == "whether the screen repeats");
}

TEST_CASE("the selected run is copied with Ctrl+D and Ctrl+Enter", "[ui][identity]") {
  EmptyBench bench;
  const app::RowNumber original = bench.fixture.addRun(bench.window.workspace()->link());
  auto* table = bench.child<QTableView>("runsTable");
  REQUIRE(QTest::qWaitFor([&] { return table->model()->rowCount() == 1; }, 5'000));
  table->setFocus();
  EmptyBench::press(Qt::Key_D, Qt::ControlModifier);
  auto* title = bench.child<QLineEdit>("newRunTitle");
  REQUIRE(QTest::qWaitFor([&] { return QApplication::focusWidget() == title; }, 2'000));
  CHECK(title->text() == QStringLiteral("Indoline dehydrogenation, pivalic acid 10 mol%"));
  EmptyBench::press(Qt::Key_Return, Qt::ControlModifier);
  REQUIRE(bench.runs() == 2);
  CHECK(bench.window.workspace()->openRun().run().clonedFrom == original);
}

TEST_CASE("a run without a title is refused beside the title, and what was typed stays",
          "[ui][identity]") {
  EmptyBench bench;
  EmptyBench::press(Qt::Key_N, Qt::ControlModifier);
  EmptyBench::press(Qt::Key_Return);
  auto* title = bench.child<QLineEdit>("newRunTitle");
  auto* aim = bench.child<QLineEdit>("newRunAim");
  title->selectAll();
  EmptyBench::type(" ");
  aim->setFocus();
  EmptyBench::type("kept");
  EmptyBench::press(Qt::Key_Return);
  CHECK(bench.child<QLabel>("newRunTitleFault")->isVisible());
  CHECK(QApplication::focusWidget() == title);
  CHECK(aim->text() == QStringLiteral("kept"));
  CHECK(bench.runs() == 0);
  EmptyBench::press(Qt::Key_Escape);
  CHECK_FALSE(title->isVisible());
}
