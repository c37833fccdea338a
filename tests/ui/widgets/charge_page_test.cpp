// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QApplication>
#include <QPushButton>
#include <QTest>
#include <algorithm>
#include <catch2/catch.hpp>
#include <cstdlib>
#include <memory>

#include "ui/models/qt_text.h"
#include "ui/widgets/amount_editor.h"
#include "ui/widgets/charge_page.h"
#include "ui/widgets/charge_table.h"
#include "ui/widgets/main_window.h"
#include "ui/widgets/print_page.h"
#include "ui/widgets/structure_view.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/trail_panel.h"
#include "ui/widgets/weigh_page.h"
#include "ui/widgets/workspace.h"
#include "ui/workplace_fixture.h"

// The Charge page in the window itself, by keyboard alone.
using namespace vialkeeper;
using Model = ui::ChargeTableModel;

namespace {

class Window {
 public:
  /// The fixture's own notebook with one run from a template.
  Window() {
    {
      const auto link = m_fixture.link();
      m_run = m_fixture.addRun(*link);
    }
    open(m_fixture.bookFile());
    m_window.workspace()->showRun(m_run);
  }

  /// The demo campaign.
  explicit Window(const QString&) { open(m_fixture.demoFile()); }

  [[nodiscard]] ui::Workspace& workspace() { return *m_window.workspace(); }
  [[nodiscard]] ui::OpenRun& run() { return workspace().openRun(); }
  [[nodiscard]] ui::ChargePage& page() { return workspace().runPage().chargePage(); }
  [[nodiscard]] ui::ChargeTable& table() { return page().table(); }
  [[nodiscard]] Model& model() { return page().model(); }
  [[nodiscard]] QWidget& window() { return m_window; }

  void goTo(const std::string& key, int column) {
    table().setFocus();
    table().goTo(key, column);
    QTest::qWait(1);
  }
  /// Types into what has the focus.
  void type(const QString& text) { QTest::keyClicks(QApplication::focusWidget(), text); }
  void press(Qt::Key key, Qt::KeyboardModifiers with = Qt::NoModifier) {
    QTest::keyClick(QApplication::focusWidget(), key, with);
    QTest::qWait(5);
  }
  [[nodiscard]] std::string shown(const std::string& key, int column) {
    return model().index(model().rowOf(key), column).data().toString().toStdString();
  }
  [[nodiscard]] std::string actual(const std::string& key) {
    for (const auto& each : run().sheet().components)
      if (each.key == key) return each.actualText;
    return "none of that key";
  }

 private:
  void open(const QString& file) {
    m_window.openNotebook(file);
    REQUIRE(m_window.workspace() != nullptr);
    m_window.resize(1280, 800);
    m_window.setVisible(true);
    REQUIRE(QTest::qWaitForWindowActive(&m_window));
  }

  tests::WorkplaceFixture m_fixture;
  ui::MainWindow m_window{m_fixture.workplace()};
  app::RowNumber m_run = 0;
};

}  // namespace

TEST_CASE("an amount is changed by keyboard, with its reading shown while it is typed",
          "[ui][identity]") {
  Window window;
  window.goTo("acid", Model::kAmount);
  window.press(Qt::Key_F2);
  auto* editor = qobject_cast<ui::AmountEditor*>(QApplication::focusWidget());
  REQUIRE(editor != nullptr);
  editor->selectAll();
  window.type(QStringLiteral("7 mol%"));
  CHECK(editor->reading().contains(QStringLiteral("0.0140 mmol")));
  window.press(Qt::Key_Return);
  CHECK(QTest::qWaitFor([&] { return window.shown("acid", Model::kMillimoles) == "0.0140"; }));
  CHECK(window.shown("acid", Model::kAmount) == "7 mol%");
}

TEST_CASE("a refused amount stays in the cell until Esc", "[ui][identity]") {
  Window window;
  window.goTo("acid", Model::kAmount);
  window.press(Qt::Key_F2);
  auto* editor = qobject_cast<ui::AmountEditor*>(QApplication::focusWidget());
  REQUIRE(editor != nullptr);
  editor->selectAll();
  window.type(QStringLiteral("7 bar"));
  CHECK_FALSE(editor->reading().isEmpty());
  window.press(Qt::Key_Return);
  CHECK(QTest::qWaitFor([&] { return window.shown("acid", Model::kAmount) == "7 bar"; }));
  window.press(Qt::Key_Escape);
  CHECK(QTest::qWaitFor([&] { return window.shown("acid", Model::kAmount) == "10 mol%"; }));
}

TEST_CASE("Esc in a cell gives up, Tab takes and goes on to the next cell to write in",
          "[ui][identity]") {
  Window window;
  window.goTo("acid", Model::kAmount);
  window.press(Qt::Key_Return);
  window.type(QStringLiteral("9"));
  window.press(Qt::Key_Escape);
  CHECK(window.shown("acid", Model::kAmount) == "10 mol%");
  window.press(Qt::Key_Return);
  window.press(Qt::Key_Tab);
  CHECK(QTest::qWaitFor([&] { return window.table().currentIndex().column() == Model::kWeighed; }));
  CHECK(window.table().currentKey() == "acid");
  CHECK(qobject_cast<ui::AmountEditor*>(QApplication::focusWidget()) != nullptr);
}

TEST_CASE("a component is added from the shelf by keyboard and removed again", "[ui][identity]") {
  Window window;
  window.page().startAdding();
  window.type(QStringLiteral("indol"));
  window.press(Qt::Key_Down);
  window.press(Qt::Key_Up);
  window.press(Qt::Key_Return);  // takes the first of the list
  window.press(Qt::Key_Return);  // the role stays
  window.type(QStringLiteral("0.5 equiv"));
  window.press(Qt::Key_Return);
  CHECK(QTest::qWaitFor([&] { return window.model().rowCount() == 7; }));
  CHECK(window.table().hasFocus());
  CHECK(window.table().currentIndex().row() == 6);
  window.press(Qt::Key_Delete);
  CHECK(window.model().rowCount() == 6);
  window.workspace().history().undo();
  CHECK(window.model().rowCount() == 7);
}

TEST_CASE("a new substance is made in place", "[ui][identity]") {
  Window window;
  window.page().startAdding();
  window.type(QStringLiteral("4-fluorobenzoic acid"));
  window.press(Qt::Key_Up);
  for (int i = 0; i < 9; ++i) window.press(Qt::Key_Down);  // the offer of a new one is the last
  window.press(Qt::Key_Return);
  window.type(QStringLiteral("OC(=O)c1ccc(F)cc1"));
  window.press(Qt::Key_Return);
  window.press(Qt::Key_Return);
  window.type(QStringLiteral("10 mol%"));
  window.press(Qt::Key_Return);
  CHECK(QTest::qWaitFor([&] { return window.model().rowCount() == 7; }));
}

TEST_CASE("all components are weighed by a wedge that types a line and Enter", "[ui][identity]") {
  Window window;
  window.goTo("acid", Model::kAmount);
  window.press(Qt::Key_F4);
  QLineEdit& field = window.page().weighPage().field();
  CHECK(QTest::qWaitFor([&] { return field.hasFocus(); }));
  const std::vector<std::string> order = app::weighingOrder(window.run().sheet());
  for (const std::string& key : order) {
    const auto& rows = window.model().rows();
    const auto row = std::ranges::find(rows, key, &ui::ChargeRow::key);
    window.type(QStringLiteral("N  +00") + row->target.section(QLatin1Char(' '), 0, 0));
    window.press(Qt::Key_Return);
    INFO(key);
    CHECK_FALSE(window.actual(key).empty());
    CHECK(field.text().isEmpty());
  }
  window.press(Qt::Key_F5);
  window.press(Qt::Key_Escape);
  CHECK(window.table().hasFocus());
}

TEST_CASE("a slip at the balance is answered by keyboard", "[ui][identity]") {
  Window window;
  window.goTo("acid", Model::kAmount);
  window.press(Qt::Key_F4);
  for (int i = 0; i < 10 && window.page().weighPage().field().placeholderText().isEmpty(); ++i)
    QTest::qWait(5);
  // The first one is a solid or a liquid with a mass; ten times its target is a slip.
  const std::string first = app::weighingOrder(window.run().sheet()).front();
  const QString target =
      std::ranges::find(window.model().rows(), first, &ui::ChargeRow::key)->target;
  window.type(QString(target).remove(QLatin1Char('.')));
  window.press(Qt::Key_Return);
  CHECK(window.actual(first).empty());
  CHECK(window.page().weighPage().field().hasFocus());
  window.press(Qt::Key_Return);  // a second line end of the device's
  CHECK(window.actual(first).empty());
  window.press(Qt::Key_Tab);
  CHECK(qobject_cast<QPushButton*>(QApplication::focusWidget()) != nullptr);
  QTest::qWait(300);
  window.press(Qt::Key_Return);
  CHECK_FALSE(window.actual(first).empty());
}

TEST_CASE("the panel tells where the number of the chosen cell is from", "[ui][identity]") {
  Window window;
  window.goTo("nickel", Model::kTarget);
  CHECK(window.page().trail().text().contains(QStringLiteral("308.62 g/mol")));
  window.goTo("acid", Model::kMillimoles);
  CHECK(window.page().trail().text().contains(QStringLiteral("10 mol% × 0.200 mmol")));
  window.press(Qt::Key_I, Qt::ControlModifier);
  CHECK_FALSE(window.table().hasFocus());
}

TEST_CASE("sheet and label are shown as pages and saved as a PDF", "[ui][identity]") {
  Window window;
  window.page().showPrinted();
  QTest::qWait(5);
  CHECK(window.page().printPage().pages() == 1);
  window.page().printPage().choose(ui::Printed::kLabel);
  CHECK(window.page().printPage().pages() == 1);
  const auto pdf = ui::pagePdf(window.run().sheet(), ui::Printed::kSheetA4);
  REQUIRE(pdf);
  CHECK(pdf->starts_with("%PDF"));
  const auto images = ui::pageImages(window.run().sheet(), ui::Printed::kSheetA4, 72.0);
  REQUIRE(images);
  CHECK(images->front().image.width() == 595);
  CHECK(images->front().image.height() == 842);
}

TEST_CASE("no text of the charge's table is cut off at 1280 by 800 for any run of the demo",
          "[ui][identity]") {
  Window window{QString()};
  int seen = 0;
  for (app::RowNumber n = 1; window.run().link().notebook().run(n); ++n) {
    window.workspace().showRun(n);
    if (!window.run().isOpen()) continue;
    QTest::qWait(1);
    ++seen;
    INFO(window.run().run().code);
    CHECK(window.table().viewport()->width() >= 800);
    CHECK(window.table().showsAllTexts());
  }
  CHECK(seen > 10);
}

// Pictures for people to look at: `ui_widget_tests "[.pictures]"` with VIALKEEPER_PICTURES set.
TEST_CASE("pictures of the charge", "[.pictures]") {
  const char* folder = std::getenv("VIALKEEPER_PICTURES");
  REQUIRE(folder != nullptr);
  const auto choice = GENERATE(ui::Theme::Choice::kLight, ui::Theme::Choice::kDark);
  const QString kind =
      choice == ui::Theme::Choice::kLight ? QStringLiteral("light") : QStringLiteral("dark");
  ui::Theme::instance().apply(*qApp, choice);
  Window window;
  const auto shoot = [&](const char* name) {
    QTest::qWait(30);
    window.window().grab().save(
        QStringLiteral("%1/%2-%3.png")
            .arg(QString::fromLocal8Bit(folder), QString::fromLatin1(name), kind));
  };
  window.goTo("nickel", Model::kTarget);
  shoot("charge");
  window.goTo("acid", Model::kAmount);
  window.press(Qt::Key_F2);
  qobject_cast<QLineEdit*>(QApplication::focusWidget())->selectAll();
  window.type(QStringLiteral("7 mol%"));
  shoot("charge-editing");
  qobject_cast<QLineEdit*>(QApplication::focusWidget())->selectAll();
  window.type(QStringLiteral("7 bar"));
  shoot("charge-fault-typed");
  window.press(Qt::Key_Return);
  shoot("charge-fault");
  window.press(Qt::Key_Escape);
  window.goTo("nickel", Model::kWeighed);
  window.press(Qt::Key_F2);
  window.type(QStringLiteral("32 mg"));
  window.press(Qt::Key_Return);
  shoot("charge-question");
  QTest::qWait(300);
  window.press(Qt::Key_Return);
  window.page().startAdding();
  window.type(QStringLiteral("ac"));
  shoot("charge-search");
  window.press(Qt::Key_Return);
  shoot("charge-adding");
  window.page().startWeighing();
  window.type(QStringLiteral("25.1"));
  shoot("charge-weighing");
  window.press(Qt::Key_F5);
  shoot("charge-retarget");
  window.press(Qt::Key_Escape);
  window.goTo("acid", Model::kAmount);
  window.press(Qt::Key_F2);
  window.type(QStringLiteral("7 mol%"));
  window.press(Qt::Key_Return);
  shoot("charge-reason");
  window.page().showPrinted();
  shoot("charge-print");
  window.page().printPage().choose(ui::Printed::kLabel);
  shoot("charge-label");
  ui::Theme::instance().apply(*qApp, ui::Theme::Choice::kLight);
}

TEST_CASE("a structure is drawn in the colour of the text", "[ui][identity]") {
  ui::Theme::instance().apply(*qApp, ui::Theme::Choice::kDark);
  ui::StructureView view;
  view.resize(200, 120);
  view.setSmiles(QStringLiteral("CC#N"));
  CHECK(view.isDrawn());
  QImage image(view.size(), QImage::Format_ARGB32_Premultiplied);
  image.fill(Qt::transparent);
  view.render(&image, {}, {}, QWidget::DrawChildren);
  int light = 0;
  int dark = 0;
  for (int y = 0; y < image.height(); ++y) {
    for (int x = 0; x < image.width(); ++x) {
      const QColor pixel = image.pixelColor(x, y);
      if (pixel.alpha() < 200) continue;
      ++(pixel.lightness() > 128 ? light : dark);
    }
  }
  CHECK(light > 50);
  CHECK(dark == 0);
  view.setSmiles(QStringLiteral("no structure"));
  CHECK_FALSE(view.isDrawn());
  ui::Theme::instance().apply(*qApp, ui::Theme::Choice::kLight);
}
