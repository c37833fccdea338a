// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/notebook_session.h"

#include "app/system_clock.h"
#include "db/sqlite_notebook.h"

namespace vialkeeper::cli {
namespace {

text::Checked<std::unique_ptr<app::Notebook>> open(const CommonOptions& common, db::OpenFor use) {
  const auto file = bookFile(common);
  if (!file) return std::unexpected(file.error());
  return db::openNotebook(*file, use, app::fileStamp(common.around->clock.now()));
}

}  // namespace

text::Checked<std::string> bookFile(const CommonOptions& common) {
  if (!common.book.empty()) return common.book;
  if (const auto named = common.around->environment("VIALKEEPER_BOOK"); named && !named->empty())
    return *named;
  return std::unexpected(text::Faults{usageFault(
      "--book", "no notebook is named", "add --book FILE.vialbook, or set VIALKEEPER_BOOK")});
}

std::optional<std::string> namedPerson(const CommonOptions& common) {
  if (common.person) return common.person;
  const auto named = common.around->environment("VIALKEEPER_PERSON");
  return named && !named->empty() ? named : std::nullopt;
}

text::Checked<NotebookSession> NotebookSession::forReading(const CommonOptions& common) {
  auto notebook = open(common, db::OpenFor::kReading);
  if (!notebook) return std::unexpected(notebook.error());
  return NotebookSession(*std::move(notebook), common.around->clock, "");
}

text::Checked<NotebookSession> NotebookSession::forWriting(const CommonOptions& common) {
  auto notebook = open(common, db::OpenFor::kWriting);
  if (!notebook) return std::unexpected(notebook.error());
  // Before anything else is looked at: another fault would send the person the wrong way.
  if (const auto may = (*notebook)->mayWrite(); !may) return std::unexpected(may.error());
  auto person =
      app::whoWorks(**notebook, namedPerson(common),
                    common.newPerson ? app::Newcomer::kWelcome : app::Newcomer::kQuestioned);
  if (!person) {
    for (text::Fault& fault : person.error()) {
      if (fault.kind == text::FaultKind::kInput) fault.kind = text::FaultKind::kUsage;
    }
    return std::unexpected(person.error());
  }
  return NotebookSession(*std::move(notebook), common.around->clock, *std::move(person));
}

text::Checked<NotebookSession> NotebookSession::forChecking(const CommonOptions& common) {
  auto notebook = open(common, db::OpenFor::kWriting);
  if (!notebook) return std::unexpected(notebook.error());
  return NotebookSession(*std::move(notebook), common.around->clock, "");
}

}  // namespace vialkeeper::cli
