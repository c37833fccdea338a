// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QHash>
#include <QObject>
#include <QString>
#include <optional>
#include <utility>

#include "app/notebook/log_line.h"
#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// The one line in which entries are written: what is typed, how it reads, and what becomes of it.
/// It writes a new entry, or one in the place of another, or takes one back. A line that was not
/// finished waits while another run is open.
class LogEntryModel : public QObject {
  Q_OBJECT

 public:
  enum class Task { kNew, kCorrection, kWithdrawal };
  enum class Standing {
    kEmpty,
    kReads,       ///< understood
    kUnfinished,  ///< something is still missing at its end
    kDoubtful,    ///< looks like a shorthand, but cannot be read as one
    kBadTime,     ///< the time cannot be read
  };

  explicit LogEntryModel(OpenRun& run, QObject* parent = nullptr);

  [[nodiscard]] QString line() const { return m_line; }
  [[nodiscard]] QString at() const { return m_at; }
  [[nodiscard]] QString reason() const { return m_reason; }
  [[nodiscard]] Task task() const { return m_task; }
  /// The entry that is corrected or taken back; 0 for a new one.
  [[nodiscard]] int entry() const { return m_entry; }
  [[nodiscard]] Standing standing() const { return m_standing; }
  /// `reads as: pressure 0.38 bar gauge at 35 °C, now (14:20)`, or what is in doubt and how to mend
  /// it; empty for an empty line.
  [[nodiscard]] QString sentence() const { return m_sentence; }
  /// The characters in doubt, as place and length in the line; of the time where that is at fault.
  [[nodiscard]] std::optional<std::pair<int, int>> doubtPlace() const { return m_doubtPlace; }
  [[nodiscard]] bool canKeepAsText() const;
  /// Whether the line was questioned as a slip: it is kept as it stands with commit(true).
  [[nodiscard]] bool isQuestioned() const { return m_questioned; }
  /// Whether the run's state wants a reason for what is being done.
  [[nodiscard]] bool wantsReason() const;
  /// Why nothing can be written now; empty where something can.
  [[nodiscard]] QString refusal() const;
  /// What the task is, in words; empty for a new entry.
  [[nodiscard]] QString taskSentence() const;

 public slots:
  void setLine(const QString& line);
  void setAt(const QString& at);
  void setReason(const QString& reason);
  /// A stamp begins this line: until a figure stands in it, it is unfinished and not in doubt.
  void begin(const QString& line);
  /// Fills the line with an entry that is to be corrected. One that cannot be is left alone.
  void startCorrection(int entry);
  /// Takes an entry back at once, or asks for the reason first where the state wants one.
  void startWithdrawal(int entry);
  /// Back to an empty line.
  void clear();
  /// Reads again: the clock went on or the run changed.
  void readAgain();

 public:
  /// Does what the task says. `keepAsText`: a doubtful line stands as an observation. Success
  /// empties the line; anything else leaves it as it is.
  Outcome commit(bool keepAsText = false);
  /// Logs a line besides what is typed: a stamp that needs no value. Now, and without a reason.
  Outcome logAtOnce(const QString& line);

 signals:
  void changed();
  /// Something was written; the newest entry's number.
  void written(int entry);
  /// A command failed; the sentences of its faults.
  void failed(const QString& sentences);

 private:
  [[nodiscard]] app::Deed deed() const;
  [[nodiscard]] const app::EventRecord* original() const;
  void start(Task task, const app::NumberedEvent& entry);
  void followRun();
  void read();
  [[nodiscard]] std::optional<QString> readTime();
  void readLine(const QString& time);
  void setDoubt(const text::TextFault& doubt, const std::string& utf8);
  Outcome tell(Outcome outcome);

  OpenRun& m_run;
  app::RowNumber m_runNumber = 0;
  QHash<app::RowNumber, QString> m_drafts;  ///< lines that were left unfinished, by run
  Task m_task = Task::kNew;
  int m_entry = 0;
  QString m_line;
  QString m_begun;
  QString m_at;
  QString m_reason;
  Standing m_standing = Standing::kEmpty;
  QString m_sentence;
  std::optional<std::pair<int, int>> m_doubtPlace;
  bool m_lineInDoubt = false;
  bool m_questioned = false;
};

}  // namespace vialkeeper::ui
