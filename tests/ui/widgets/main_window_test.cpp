// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QApplication>
#include <QAccessible>
#include <QTest>
#include <catch2/catch.hpp>
#include <memory>

#include "ui/widgets/main_window.h"
#include "ui/widgets/workspace.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;

TEST_CASE("a file that is no notebook leaves a sentence on the start page", "[ui][identity]") {
  tests::WorkplaceFixture fixture;
  ui::MainWindow window(fixture.workplace());
  const std::string file = fixture.folder().write("no.vialbook", "not a notebook");
  window.openNotebook(QString::fromStdString(file));
  CHECK(window.workspace() == nullptr);
}

TEST_CASE("every control of the window that takes the focus has a name for screen readers",
          "[ui][identity]") {
  tests::WorkplaceFixture fixture;
  ui::MainWindow window(fixture.workplace());
  window.openNotebook(fixture.demoFile());
  REQUIRE(window.workspace() != nullptr);
  window.workspace()->showRun(1);
  window.setVisible(true);
  QTest::qWait(50);
  int seen = 0;
  for (QWidget* widget : window.findChildren<QWidget*>()) {
    if (widget->focusPolicy() == Qt::NoFocus) continue;
    if (widget->objectName().startsWith(QStringLiteral("qt_"))) continue;
    QAccessibleInterface* reader = QAccessible::queryAccessibleInterface(widget);
    if (reader == nullptr || reader->state().invisible) continue;
    ++seen;
    INFO(widget->metaObject()->className() << " " << widget->objectName().toStdString());
    CHECK_FALSE(reader->text(QAccessible::Name).isEmpty());
  }
  CHECK(seen > 5);
}
