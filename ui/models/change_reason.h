// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <functional>
#include <vector>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// Why a run that is past its plan is changed: asked for once, where the first change is made, kept
/// for the next ones, and forgotten with the run. Changes wait here until the reason is given.
class ChangeReason : public QObject {
  Q_OBJECT

 public:
  explicit ChangeReason(OpenRun& run, QObject* parent = nullptr);

  [[nodiscard]] const QString& text() const { return m_text; }
  /// Whether the deed can be done now. If it wants a reason that was not given yet, it is asked for
  /// and `then` is called once it is there.
  bool allows(app::Deed deed, const QString& what, std::function<void()> then);
  [[nodiscard]] bool isAsked() const { return !m_waiting.empty(); }
  /// What waits for the reason: `change the amount of pivalic acid`.
  [[nodiscard]] QString waitingFor() const;

 public slots:
  /// Takes the reason and does what waits. Blanks are no reason.
  void give(const QString& reason);
  /// Nothing that waits is done.
  void giveUp();

 signals:
  /// A reason is asked for, was given or is wanted no more.
  void changed();
  void givenUp();

 private:
  struct Waiting {
    QString what;
    std::function<void()> then;
  };
  void forget();

  OpenRun& m_run;
  QString m_text;
  std::vector<Waiting> m_waiting;
};

}  // namespace vialkeeper::ui
