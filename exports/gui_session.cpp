// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/gui_session.h"

#include <QFont>
#include <QFontDatabase>
#include <QFontInfo>
#include <QGuiApplication>
#include <QHashSeed>
#include <QRawFont>
#include <QStringList>
#include <clocale>
#include <string>

namespace vialkeeper::exports {
namespace {

void saySilently(QtMsgType, const QMessageLogContext&, const QString&) {}

/// Qt warns of missing runtime directories and changes the C locale, which would turn the decimal
/// point of the whole program into a comma; neither is the page's business.
void makeApplication() {
  static int argumentCount = 3;
  static char program[] = "vialkeeper";
  static char option[] = "-platform";
  static char platform[] = "offscreen";
  static char* arguments[] = {program, option, platform, nullptr};
  const char* current = std::setlocale(LC_ALL, nullptr);
  const std::string locale = current != nullptr ? current : "C";
  const QtMessageHandler previous = qInstallMessageHandler(saySilently);
  // The same content gives the same bytes: Qt's PDF writer goes through a hash table.
  QHashSeed::setDeterministicGlobalSeed();
  QGuiApplication::setDesktopSettingsAware(false);
  // Never destroyed: Qt's own static objects may be gone before ours at exit.
  static QGuiApplication* application = new QGuiApplication(argumentCount, arguments);
  static_cast<void>(application);
  qInstallMessageHandler(previous);
  std::setlocale(LC_ALL, locale.c_str());
}

QString preferredFamily(const QStringList& installed) {
  for (const char* name : {"Inter", "Noto Sans", "DejaVu Sans"}) {
    const QString family = QString::fromLatin1(name);
    if (installed.contains(family)) return family;
  }
  QFont any;
  any.setStyleHint(QFont::SansSerif);
  return QFontInfo(any).family();
}

/// Qt lists families, and draws boxes, on a system without a single font.
bool isReal(const QString& family) {
  return !QRawFont::fromFont(QFont(family)).fontTable("cmap").isEmpty();
}

}  // namespace

text::Checked<QString> startGuiSession() {
  if (QCoreApplication::instance() == nullptr) makeApplication();
  if (qobject_cast<QGuiApplication*>(QCoreApplication::instance()) == nullptr) {
    return std::unexpected(text::Faults{
        {.kind = text::FaultKind::kUsage,
         .what = "pages cannot be printed from a program whose Qt application has no fonts",
         .mend = "print from the desktop or with the vialkeeper command"}});
  }
  const QString family = preferredFamily(QFontDatabase::families());
  if (!isReal(family)) {
    return std::unexpected(text::Faults{
        {.kind = text::FaultKind::kUsage,
         .what = "no font is installed, so that no page can be printed",
         .mend = "install one, DejaVu Sans for example (fonts-dejavu-core on Debian)"}});
  }
  return family;
}

}  // namespace vialkeeper::exports
