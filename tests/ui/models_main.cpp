// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#define CATCH_CONFIG_RUNNER
#include <QCoreApplication>
#include <QStandardPaths>
#include <catch2/catch.hpp>

// View-models run without any display: there is not even a QGuiApplication.
int main(int argc, char** argv) {
  QCoreApplication application(argc, argv);
  QCoreApplication::setOrganizationName(QStringLiteral("vialkeeper"));
  QCoreApplication::setApplicationName(QStringLiteral("vialkeeper-tests"));
  QStandardPaths::setTestModeEnabled(true);
  return Catch::Session().run(argc, argv);
}
