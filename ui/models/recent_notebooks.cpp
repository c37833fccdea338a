// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/recent_notebooks.h"

#include <QFileInfo>
#include <QSettings>

namespace vialkeeper::ui {
namespace {

const QString kFiles = QStringLiteral("notebooks/recent");

/// A settings key for a file: its path holds slashes, which would be groups.
QString personKey(const QString& file) {
  return QStringLiteral("notebooks/person/") +
         QString::fromLatin1(file.toUtf8().toHex());
}

}  // namespace

QStringList RecentNotebooks::files() const {
  QStringList present;
  for (const QString& file : QSettings().value(kFiles).toStringList())
    if (QFileInfo::exists(file)) present += file;
  return present;
}

QString RecentNotebooks::personOf(const QString& file) const {
  return QSettings().value(personKey(file)).toString();
}

void RecentNotebooks::remember(const QString& file, const QString& person) {
  QSettings settings;
  QStringList all = settings.value(kFiles).toStringList();
  all.removeAll(file);
  all.prepend(file);
  settings.setValue(kFiles, all.mid(0, kMost));
  settings.setValue(personKey(file), person);
}

void RecentNotebooks::forget(const QString& file) {
  QSettings settings;
  QStringList all = settings.value(kFiles).toStringList();
  all.removeAll(file);
  settings.setValue(kFiles, all);
  settings.remove(personKey(file));
}

}  // namespace vialkeeper::ui
