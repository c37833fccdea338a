// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <memory>

#include "db/signing.h"
#include "support/scratch_folder.h"
#include "ui/desktop/sqlite_files.h"
#include "ui/models/action_history.h"
#include "ui/models/notebook_link.h"
#include "ui/models/open_run.h"

/// Notebooks on disk for tests of the desktop, as the program itself has them, but for the clock.
namespace vialkeeper::tests {

/// A clock that stands at 2026-03-04 09:00:00 +01:00 until it is moved; each look goes on 1 ms.
class SetClock final : public app::Clock {
 public:
  [[nodiscard]] units::Moment now() override;
  void advance(std::chrono::milliseconds by);

 private:
  std::int64_t m_ms = 0;
};

/// A workplace with a scratch folder, in which notebooks are made.
class WorkplaceFixture {
 public:
  WorkplaceFixture();

  [[nodiscard]] ui::Workplace workplace() { return {m_files, m_clock, m_signer}; }
  [[nodiscard]] SetClock& clock() { return m_clock; }
  [[nodiscard]] const ScratchFolder& folder() const { return m_folder; }
  [[nodiscard]] QString bookFile() const;

  /// The link to the fixture's notebook `book.vialbook`, which is made on the first call.
  [[nodiscard]] std::unique_ptr<ui::NotebookLink> link(const QString& person = QStringLiteral("KW"));
  /// Another program's connection to the same notebook.
  [[nodiscard]] std::unique_ptr<app::Notebook> other();
  /// Adds a run from templates/runs/NAME.toml to the notebook of the link and gives its number. A
  /// fault fails the test.
  app::RowNumber addRun(ui::NotebookLink& link, const std::string& name = "acid-additive");
  /// The demo campaign as a notebook file, made once in a process and copied for each call.
  [[nodiscard]] QString demoFile();

 private:
  ScratchFolder m_folder;
  ui::SqliteFiles m_files;
  SetClock m_clock;
  db::SodiumSigner m_signer;
};

/// Whether every fault's sentence is told: fails the test with them otherwise.
void requireDone(const ui::Outcome& outcome);

}  // namespace vialkeeper::tests
