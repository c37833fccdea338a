// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "ui/models/notebook_files.h"

namespace vialkeeper::ui {

/// Notebooks over SQLite: what the program, its tests and its pictures work with.
class SqliteFiles final : public NotebookFiles {
 public:
  [[nodiscard]] text::Checked<std::unique_ptr<app::Notebook>> open(const std::string& file,
                                                                   Use use) override;
  [[nodiscard]] text::Checked<std::unique_ptr<app::Notebook>> create(
      const std::string& file) override;
};

}  // namespace vialkeeper::ui
