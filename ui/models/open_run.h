// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <functional>
#include <optional>
#include <string>
#include <vector>

#include "app/notebook/edit_run.h"
#include "app/notebook/log_run.h"
#include "app/notebook/run_life.h"
#include "app/notebook/run_plan.h"
#include "app/notebook/run_results.h"
#include "app/notebook/vial_strip.h"
#include "app/notebook/weigh_run.h"
#include "ui/models/action_history.h"
#include "ui/models/notebook_link.h"

namespace vialkeeper::ui {

/// A value that somebody else changed since it was shown: both, and a way to settle it.
struct Conflict {
  QString what;    ///< `pivalic acid, weighed`
  QString mine;    ///< what was typed here
  QString theirs;  ///< what the notebook holds now
  std::function<void()> takeMine;  ///< does the action again on what is there now
};

/// What a command came to. Exactly one of these: done, faults, questions, a conflict, or a reason
/// that is wanted first.
struct Outcome {
  bool done = false;
  text::Faults faults = {};
  std::vector<app::SlipQuestion> questions = {};  ///< answer by calling again with `accepted`
  std::vector<app::LogSlip> slips = {};  ///< the same of a line of the log
  bool conflict = false;                          ///< told by OpenRun::conflictFound

  [[nodiscard]] static Outcome success() { return {.done = true}; }
  [[nodiscard]] static Outcome failure(text::Faults faults) { return {.faults = std::move(faults)}; }
};

/// How a command is to be taken.
struct CommandOptions {
  QString reason = {};
  bool accepted = false;  ///< questions were answered: this is what was meant
};

/// The run that is open: what it holds now, and everything a user can do to it. Commands go to the
/// use cases, are remembered in the history, and end in reloaded(). All of it in the GUI thread;
/// each command is one short transaction.
class OpenRun : public QObject {
  Q_OBJECT

 public:
  OpenRun(NotebookLink& link, ActionHistory& history, QObject* parent = nullptr);

  /// Opens another run; what was open is left. Fault: it cannot be loaded; nothing is open then.
  text::Checked<void> open(app::RowNumber run);
  void close();
  [[nodiscard]] bool isOpen() const { return m_sheet.has_value(); }
  [[nodiscard]] NotebookLink& link() { return m_link; }
  [[nodiscard]] ActionHistory& history() { return m_history; }

  [[nodiscard]] const app::RunSheet& sheet() const { return *m_sheet; }
  [[nodiscard]] const app::RunRecord& run() const { return m_sheet->run; }
  [[nodiscard]] const std::vector<app::NumberedEvent>& events() const { return m_events; }
  [[nodiscard]] const std::vector<app::DatasetRecord>& datasets() const { return m_datasets; }
  /// As of now: the lamp's clock runs.
  [[nodiscard]] app::VialStrip strip() const;
  [[nodiscard]] app::Permission permission(app::Deed deed) const;
  /// Whether the deed wants a reason in the run's state.
  [[nodiscard]] bool wantsReason(app::Deed deed) const {
    return permission(deed) == app::Permission::kWithReason;
  }
  /// Why the deed cannot be done at all now; empty where it can.
  [[nodiscard]] QString refusal(app::Deed deed) const;

  Outcome edit(const QString& name, std::vector<app::PlanEdit> edits,
               const CommandOptions& options = {});
  Outcome weigh(const std::string& key, const QString& typed, const CommandOptions& options = {});
  /// Takes a recorded weighing out.
  Outcome clearWeighing(const std::string& key, const CommandOptions& options = {});
  /// `at`: when it happened, as typed; empty: now.
  Outcome log(const QString& line, const QString& at = {}, const CommandOptions& options = {});
  Outcome correct(int entry, const QString& line, const QString& at,
                  const CommandOptions& options = {});
  Outcome withdraw(int entry, const CommandOptions& options = {});
  Outcome record(const app::ResultRequest& request);
  /// Work that was done elsewhere (an import in another thread, a seal): loads what it changed.
  void reload();

 signals:
  /// Another run is open, or none.
  void opened();
  /// The open run may hold something else now; also follows opened().
  void reloaded();
  /// A quantity was not recorded because somebody else changed it meanwhile.
  void conflictFound(const vialkeeper::ui::Conflict& conflict);
  /// A command was refused; for those who show it apart from the field it came from.
  void refused(const vialkeeper::text::Faults& faults);

 private:
  text::Checked<void> load(app::RowNumber run);
  void followChanges();
  /// After a command of ours that was written.
  Outcome finished();
  const app::ComponentRecord* component(const std::string& key) const;
  /// Does something to a run as it is then, for undo and redo; tells of the change.
  template <class Work>
  text::Checked<void> onRun(app::RowNumber n, Work work) {
    const auto present = m_link.notebook().run(n);
    if (!present) return std::unexpected(present.error());
    const auto done = work(*present);
    m_link.lookForChanges();
    if (!done) return std::unexpected(done.error());
    return {};
  }
  void rememberWeighing(const QString& name, const std::string& key, const std::string& before,
                        const std::string& after);
  /// Tells a conflict if the component is not as it was shown; false then.
  bool isAsShown(const std::string& key, const QString& mine, std::function<void()> takeMine);

  NotebookLink& m_link;
  ActionHistory& m_history;
  std::optional<app::RunSheet> m_sheet;
  std::vector<app::NumberedEvent> m_events;
  std::vector<app::DatasetRecord> m_datasets;
};

}  // namespace vialkeeper::ui
