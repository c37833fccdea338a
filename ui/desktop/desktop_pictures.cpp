// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QApplication>
#include <QCommandLineParser>
#include <QDir>
#include <QElapsedTimer>
#include <QKeyEvent>
#include <QPixmap>
#include <QSettings>
#include <QStandardPaths>
#include <QTabWidget>
#include <cstdio>

#include "app/notebook/desk.h"
#include "app/system_clock.h"
#include "db/signing.h"
#include "ui/desktop/sqlite_files.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/main_window.h"
#include "ui/widgets/message_bar.h"
#include "ui/widgets/shelf_page.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/workspace.h"

// Makes the pictures of the desktop from the invented notebook: every page, light and dark. Not
// part of an installation; tools/pictures calls it.
namespace vialkeeper::ui {
namespace {

constexpr QSize kSize(1280, 800);
constexpr int kSettle_ms = 400;

/// Lets the window come to rest: searches in other threads, layouts, charts.
void settle(int wait_ms = kSettle_ms) {
  QElapsedTimer clock;
  clock.start();
  while (clock.elapsed() < wait_ms) QCoreApplication::processEvents(QEventLoop::AllEvents, 20);
}

void press(QWidget& window, int key, Qt::KeyboardModifiers modifiers = Qt::NoModifier) {
  QWidget* target = QApplication::focusWidget() != nullptr ? QApplication::focusWidget() : &window;
  for (const auto type : {QEvent::ShortcutOverride, QEvent::KeyPress, QEvent::KeyRelease}) {
    QKeyEvent event(type, key, modifiers);
    QApplication::sendEvent(target, &event);
  }
  settle();
}

class Pictures {
 public:
  Pictures(MainWindow& window, QDir folder, QString suffix)
      : m_window(window), m_folder(std::move(folder)), m_suffix(std::move(suffix)) {}

  void take(const QString& name) {
    settle();
    const QString file = m_folder.filePath(name + m_suffix + QStringLiteral(".png"));
    if (!m_window.grab().save(file)) std::fprintf(stderr, "%s: not written\n", qPrintable(file));
  }

 private:
  MainWindow& m_window;
  QDir m_folder;
  QString m_suffix;
};

void openRun(Workspace& workspace, const QString& code) {
  const auto run = app::runOfCode(workspace.link().notebook(), toUtf8(code));
  if (run) workspace.showRun(run->n);
}

void takeAll(MainWindow& window, const QString& notebook, const QString& code, Pictures& pictures) {
  pictures.take(QStringLiteral("start"));
  window.openNotebook(notebook);
  Workspace& workspace = *window.workspace();
  workspace.link().setPerson(QStringLiteral("KW"));
  workspace.messages().dismiss();
  settle();
  openRun(workspace, code);
  workspace.showPage(RunPage::Page::kCharge);
  pictures.take(QStringLiteral("charge"));
  press(window, Qt::Key_F4);
  pictures.take(QStringLiteral("weigh"));
  press(window, Qt::Key_Escape);
  workspace.showPage(RunPage::Page::kLog);
  pictures.take(QStringLiteral("log"));
  Theme::instance().setHoodMode(*qApp, true);
  pictures.take(QStringLiteral("hood"));
  Theme::instance().setHoodMode(*qApp, false);
  workspace.showPage(RunPage::Page::kEvidence);
  pictures.take(QStringLiteral("evidence"));
  workspace.showPage(RunPage::Page::kResult);
  pictures.take(QStringLiteral("result"));
  workspace.showNewRun();
  pictures.take(QStringLiteral("new-run"));
  workspace.showShelf();
  pictures.take(QStringLiteral("shelf"));
}

int run(QApplication& application) {
  QCommandLineParser parser;
  parser.addPositionalArgument(QStringLiteral("notebook"), QStringLiteral("the invented notebook"));
  parser.addPositionalArgument(QStringLiteral("code"), QStringLiteral("the run to show"));
  parser.addPositionalArgument(QStringLiteral("folder"), QStringLiteral("where the pictures go"));
  parser.addHelpOption();
  parser.process(application);
  const QStringList given = parser.positionalArguments();
  if (given.size() != 3) parser.showHelp(2);
  QStandardPaths::setTestModeEnabled(true);
  // Nobody's recent notebooks in a picture.
  QSettings().clear();
  SqliteFiles files;
  app::SystemClock clock;
  db::SodiumSigner signer;
  const bool large = application.devicePixelRatio() > 1.5;
  for (const bool dark : {false, true}) {
    Theme::instance().apply(application, dark ? Theme::Choice::kDark : Theme::Choice::kLight);
    QSettings().clear();
    MainWindow window({files, clock, signer});
    window.resize(kSize);
    window.setVisible(true);
    Pictures pictures(window, QDir(given[2]),
                      QStringLiteral("%1%2").arg(dark ? QStringLiteral("-dark") : QString(),
                                                 large ? QStringLiteral("-2x") : QString()));
    takeAll(window, given[0], given[1], pictures);
  }
  return 0;
}

}  // namespace
}  // namespace vialkeeper::ui

int main(int argc, char** argv) {
  qputenv("QT_QPA_PLATFORM", "offscreen");
  QApplication::setOrganizationName(QStringLiteral("vialkeeper"));
  QApplication::setApplicationName(QStringLiteral("vialkeeper-pictures"));
  QApplication application(argc, argv);
  return vialkeeper::ui::run(application);
}
