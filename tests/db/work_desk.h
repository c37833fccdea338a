// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <memory>
#include <string>

#include "app/notebook/desk.h"
#include "app/notebook/run_plan.h"
#include "db/notebook_fixture.h"
#include "support/scratch_folder.h"

/// A desk with a real notebook file, for tests of use cases.
namespace vialkeeper::tests {

/// The value; a fault fails the test and shows itself.
template <class T>
T good(text::Checked<T> checked) {
  if (!checked) {
    for (const text::Fault& fault : checked.error()) UNSCOPED_INFO(toLine(fault));
  }
  REQUIRE(checked);
  return *std::move(checked);
}

/// `FIELD: WHAT` of all faults, a line each; empty without one.
template <class T>
[[nodiscard]] std::string told(const text::Checked<T>& checked) {
  std::string lines;
  if (checked) return lines;
  for (const text::Fault& fault : checked.error()) lines += fault.field + ": " + fault.what + "\n";
  return lines;
}

class WorkDesk {
 public:
  WorkDesk();

  [[nodiscard]] app::Desk desk() { return {*m_notebook, m_clock, "KW"}; }
  [[nodiscard]] app::Notebook& notebook() { return *m_notebook; }
  /// Another connection to the same file.
  [[nodiscard]] std::unique_ptr<app::Notebook> another() const { return opened(file()); }
  [[nodiscard]] std::string file() const { return m_folder.path("work.vialbook"); }
  [[nodiscard]] std::string path(std::string_view name) const { return m_folder.path(name); }

  /// A run of the sample plan.
  [[nodiscard]] app::RunRecord addRun();
  [[nodiscard]] app::RunRecord run(const std::string& code = "KW-0001") {
    return runOf(*m_notebook, code);
  }
  [[nodiscard]] app::RunSheet sheet() { return good(app::loadRun(*m_notebook, run())); }
  [[nodiscard]] app::ComponentRecord component(const std::string& key);
  [[nodiscard]] std::string planText() { return good(m_notebook->attachment(run().plan)); }

 private:
  ScratchFolder m_folder;
  SteppingClock m_clock;
  std::unique_ptr<app::Notebook> m_notebook;
};

}  // namespace vialkeeper::tests
