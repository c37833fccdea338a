// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <QApplication>
#include <QCommandLineParser>
#include <QIcon>

#include "app/system_clock.h"
#include "db/signing.h"
#include "ui/desktop/sqlite_files.h"
#include "ui/models/recent_notebooks.h"
#include "ui/widgets/main_window.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

int runDesktop(QApplication& application) {
  QCommandLineParser parser;
  parser.setApplicationDescription(
      QApplication::tr("A record for light-driven reactions that give off hydrogen."));
  parser.addHelpOption();
  parser.addVersionOption();
  parser.addPositionalArgument(QStringLiteral("notebook"),
                               QApplication::tr("The .vialbook file to open; else the last one."),
                               QStringLiteral("[NOTEBOOK]"));
  parser.process(application);
  QApplication::setWindowIcon(QIcon(QStringLiteral(":/vialkeeper/vialkeeper.svg")));
  SqliteFiles files;
  app::SystemClock clock;
  db::SodiumSigner signer;
  Theme::instance().apply(application, Theme::chosen());
  MainWindow window({files, clock, signer});
  const QStringList named = parser.positionalArguments();
  if (!named.isEmpty()) {
    window.openNotebook(named.front());
  } else if (const QStringList recent = RecentNotebooks().files(); !recent.isEmpty()) {
    window.openNotebook(recent.front());
  }
  window.setVisible(true);
  return QApplication::exec();
}

}  // namespace
}  // namespace vialkeeper::ui

int main(int argc, char** argv) {
  QApplication::setOrganizationName(QStringLiteral("vialkeeper"));
  QApplication::setApplicationName(QStringLiteral("vialkeeper"));
  QApplication::setApplicationDisplayName(QStringLiteral("Vialkeeper"));
  QApplication::setApplicationVersion(QStringLiteral(VIALKEEPER_VERSION));
  QApplication::setDesktopFileName(QStringLiteral("vialkeeper"));
  QApplication application(argc, argv);
  return vialkeeper::ui::runDesktop(application);
}
