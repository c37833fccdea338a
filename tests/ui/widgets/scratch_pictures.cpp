// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QApplication>
#include <QTest>
#include <catch2/catch.hpp>
#include <cstdlib>

#include "ui/widgets/entry_line.h"
#include "ui/widgets/log_page.h"
#include "ui/widgets/main_window.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/workspace.h"
#include "ui/workplace_fixture.h"

using namespace vialkeeper;

TEST_CASE("pictures", "[.pictures]") {
  const QString to = QString::fromLocal8Bit(getenv("PICTURES_TO"));
  const int run = atoi(getenv("PICTURE_RUN") ? getenv("PICTURE_RUN") : "1");
  const bool dark = getenv("PICTURE_DARK") != nullptr;
  ui::Theme::instance().apply(*qApp, dark ? ui::Theme::Choice::kDark : ui::Theme::Choice::kLight);
  tests::WorkplaceFixture fixture;
  fixture.clock().advance(std::chrono::hours(24 * (getenv("PICTURE_DAYS") ? atoi(getenv("PICTURE_DAYS")) : 75)));
  ui::MainWindow window(fixture.workplace());
  window.openNotebook(fixture.demoFile());
  window.workspace()->link().setPerson(QStringLiteral("KW"));
  window.workspace()->showRun(run);
  window.resize(1280, 800);
  window.setVisible(true);
  const QString tag =
      (dark ? QStringLiteral("dark") : QStringLiteral("light")) + QString::number(run);
  window.workspace()->showPage(ui::RunPage::Page::kLog);
  QTest::qWait(400);
  window.grab().save(to + "/log-" + tag + ".png");
  auto& page = window.workspace()->runPage().logPage();
  if (getenv("PICTURE_MORE")) {
    QImage picture(640, 480, QImage::Format_RGB32);
    picture.fill(QColor(220, 170, 60));
    picture.save(to + "/vial.png");
    page.addPhotos({to + "/vial.png"});
    page.entryLine().field().setText(QStringLiteral("p 0.42 bra"));
    QTest::qWait(600);
    window.grab().save(to + "/log-doubt-" + tag + ".png");
    page.entryLine().field().clear();
    page.goToEntry(2);
    QTest::keyClick(QApplication::focusWidget(), Qt::Key_F2);
    QTest::qWait(100);
    window.grab().save(to + "/log-correct-" + tag + ".png");
    QTest::keyClick(QApplication::focusWidget(), Qt::Key_Escape);
  }
  window.workspace()->showPage(ui::RunPage::Page::kEvidence);
  QTest::qWait(800);
  window.grab().save(to + "/evidence-" + tag + ".png");
  window.workspace()->showPage(ui::RunPage::Page::kLog);
  ui::Theme::instance().setHoodMode(*qApp, true);
  page.startEntry();
  page.press(ui::Stamp::kPressure);
  QTest::qWait(300);
  window.grab().save(to + "/hood-" + tag + ".png");
  WARN("hood window " << window.width() << "x" << window.height());
  ui::Theme::instance().setHoodMode(*qApp, false);
}
