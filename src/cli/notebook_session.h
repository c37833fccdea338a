// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <memory>
#include <string>

#include "app/notebook/desk.h"
#include "cli/verb.h"

namespace vialkeeper::cli {

/// The notebook that a verb works on, and who works.
class NotebookSession {
 public:
  /// For looking: nobody needs to be named. Fault: no --book, or the file cannot be opened.
  [[nodiscard]] static text::Checked<NotebookSession> forReading(const CommonOptions& common);
  /// For changing: also who works, by --person or VIALKEEPER_PERSON, or the only one there is.
  /// Fault: the notebook is open for reading only; told before anything that is wrong with the
  /// work.
  [[nodiscard]] static text::Checked<NotebookSession> forWriting(const CommonOptions& common);

  /// For checking: open for writing where that is possible, because SQLite lets no reader check the
  /// full-text index; nobody needs to be named.
  [[nodiscard]] static text::Checked<NotebookSession> forChecking(const CommonOptions& common);

  [[nodiscard]] app::Notebook& notebook() { return *m_notebook; }
  [[nodiscard]] app::Desk desk() { return {*m_notebook, *m_clock, m_person}; }

 private:
  NotebookSession(std::unique_ptr<app::Notebook> notebook, app::Clock& clock, std::string person)
      : m_notebook(std::move(notebook)), m_clock(&clock), m_person(std::move(person)) {}

  std::unique_ptr<app::Notebook> m_notebook;
  app::Clock* m_clock;
  std::string m_person;
};

/// The file that --book or VIALKEEPER_BOOK names. Fault: neither does.
[[nodiscard]] text::Checked<std::string> bookFile(const CommonOptions& common);

/// The initials that --person or VIALKEEPER_PERSON gives, if either does.
[[nodiscard]] std::optional<std::string> namedPerson(const CommonOptions& common);

}  // namespace vialkeeper::cli
