// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/demo_notebook.h"

#include <QDir>
#include <QFile>
#include <QStandardPaths>
#include <QUuid>

#include "app/notebook/demo_campaign.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

std::unexpected<text::Faults> fileFault(const QString& file, const QString& what) {
  return std::unexpected(text::Faults{{.kind = text::FaultKind::kNotebook,
                                       .file = toUtf8(file),
                                       .what = toUtf8(what),
                                       .mend = "check that the folder may be written"}});
}

}  // namespace

text::Checked<QString> demoNotebook(NotebookFiles& files) {
  const QDir folder(QStandardPaths::writableLocation(QStandardPaths::AppDataLocation));
  const QString file = folder.filePath(QStringLiteral("look-around.vialbook"));
  if (QFile::exists(file)) return file;
  if (!folder.mkpath(QStringLiteral(".")))
    return fileFault(folder.path(), QStringLiteral("the folder cannot be made"));
  const QString part =
      folder.filePath(QUuid::createUuid().toString(QUuid::Id128) + QStringLiteral(".part"));
  {
    auto notebook = files.create(toUtf8(part));
    if (!notebook) return std::unexpected(notebook.error());
    if (const auto made = app::makeDemo(**notebook, {}); !made) {
      notebook->reset();
      QFile::remove(part);
      return std::unexpected(made.error());
    }
  }
  // Another window may have made it meanwhile: then that one is as good.
  if (!QFile::rename(part, file)) {
    QFile::remove(part);
    if (!QFile::exists(file)) return fileFault(file, QStringLiteral("the file cannot be made"));
  }
  return file;
}

}  // namespace vialkeeper::ui
