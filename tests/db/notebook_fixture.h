// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <memory>
#include <string>

#include "app/notebook/desk.h"
#include "app/notebook/notebook.h"

/// Notebooks for tests.
namespace vialkeeper::tests {

/// A clock that goes on one second with every look at it.
class SteppingClock final : public app::Clock {
 public:
  [[nodiscard]] units::Moment now() override;

 private:
  std::int64_t m_seconds = 0;
};

/// A new notebook of KW with one run, `KW-0001`, and a few entries. The file is closed again.
void makeSmallNotebook(const std::string& file, int entries = 3);

/// Opens for writing; a fault fails the test.
[[nodiscard]] std::unique_ptr<app::Notebook> opened(const std::string& file);

/// The run of that code; a fault fails the test.
[[nodiscard]] app::RunRecord runOf(app::Notebook& notebook, const std::string& code = "KW-0001");

/// What verify finds, one line each; empty where the notebook is sound.
[[nodiscard]] std::string findings(app::Notebook& notebook);

/// Everything that the records of a file say, read through SQLite alone; `unreadable` where it
/// cannot be.
[[nodiscard]] std::string contentOf(const std::string& file);

}  // namespace vialkeeper::tests
