// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/desktop/sqlite_files.h"

#include "app/system_clock.h"
#include "db/sqlite_notebook.h"

namespace vialkeeper::ui {

text::Checked<std::unique_ptr<app::Notebook>> SqliteFiles::open(const std::string& file, Use use) {
  return db::openNotebook(file,
                          use == Use::kWriting ? db::OpenFor::kWriting : db::OpenFor::kReading,
                          app::fileStamp(app::SystemClock().now()));
}

text::Checked<std::unique_ptr<app::Notebook>> SqliteFiles::create(const std::string& file) {
  return db::createNotebook(file);
}

}  // namespace vialkeeper::ui
