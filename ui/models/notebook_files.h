// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <memory>
#include <string>

#include "app/notebook/notebook.h"
#include "text/fault.h"

namespace vialkeeper::ui {

/// The port to notebook files: what opens and makes them. The program wires the real one.
/// May be called from any thread; each notebook is then used by the thread that opened it.
class NotebookFiles {
 public:
  NotebookFiles() = default;
  NotebookFiles(const NotebookFiles&) = delete;
  NotebookFiles& operator=(const NotebookFiles&) = delete;
  virtual ~NotebookFiles() = default;

  enum class Use { kReading, kWriting };
  [[nodiscard]] virtual text::Checked<std::unique_ptr<app::Notebook>> open(const std::string& file,
                                                                           Use use) = 0;
  /// Fault: there is a file of that name.
  [[nodiscard]] virtual text::Checked<std::unique_ptr<app::Notebook>> create(
      const std::string& file) = 0;
};

}  // namespace vialkeeper::ui
