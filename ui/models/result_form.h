// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <vector>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// Results, headings and the life of the open run as a form: one field is one action.
class ResultForm : public QObject {
  Q_OBJECT

 public:
  enum class Field { kTitle, kAim, kYield, kConversion, kConclusion };
  Q_ENUM(Field)

  explicit ResultForm(OpenRun& run, QObject* parent = nullptr);

  /// What the notebook holds, as a person would type it.
  [[nodiscard]] QString text(Field field) const;
  /// Why the field cannot be changed now; empty where it can.
  [[nodiscard]] QString refusal(Field field) const;
  /// Records what was typed if it says something else than before. What was refused is told by the
  /// faults and written nowhere.
  Outcome commit(Field field, const QString& typed);

  /// A state the run may be moved to by hand.
  struct Move {
    app::RunState to;
    bool wantsReason = false;
  };
  [[nodiscard]] std::vector<Move> moves() const;
  Outcome moveTo(app::RunState state, const QString& reason);

 signals:
  void changed();

 private:
  OpenRun& m_run;
};

}  // namespace vialkeeper::ui
