// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#define CATCH_CONFIG_RUNNER
#include <QApplication>
#include <QStandardPaths>
#include <catch2/catch.hpp>
#include <cstdlib>

#include "ui/widgets/theme.h"

// Also started by the build, to list its cases: it must never want a display.
int main(int argc, char** argv) {
  setenv("QT_QPA_PLATFORM", "offscreen", 0);
  QApplication application(argc, argv);
  QCoreApplication::setOrganizationName(QStringLiteral("vialkeeper"));
  QCoreApplication::setApplicationName(QStringLiteral("vialkeeper-tests"));
  QStandardPaths::setTestModeEnabled(true);
  vialkeeper::ui::Theme::instance().apply(application, vialkeeper::ui::Theme::Choice::kLight);
  return Catch::Session().run(argc, argv);
}
