// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <functional>
#include <vector>

#include "text/fault.h"

namespace vialkeeper::ui {

/// Something a user did, with the two actions that take it back and do it again. Each of them is a
/// new change in the notebook's trail: nothing that was written is ever taken out.
struct DoneAction {
  QString name;  ///< behind `Undo`: `weigh pivalic acid`
  std::function<text::Checked<void>()> undo;
  std::function<text::Checked<void>()> redo;
};

/// What can be undone and done again in this window, newest last.
class ActionHistory : public QObject {
  Q_OBJECT

 public:
  explicit ActionHistory(QObject* parent = nullptr) : QObject(parent) {}

  /// Something was done; what had been undone before can no longer be done again.
  void add(DoneAction action);
  [[nodiscard]] bool canUndo() const { return m_done > 0; }
  [[nodiscard]] bool canRedo() const { return m_done < m_actions.size(); }
  [[nodiscard]] QString undoName() const;
  [[nodiscard]] QString redoName() const;

 public slots:
  void undo();
  void redo();
  void clear();

 signals:
  void changed();
  /// An undo or redo was refused; the history stays as it was.
  void refused(const vialkeeper::text::Faults& faults);

 private:
  std::vector<DoneAction> m_actions;
  std::size_t m_done = 0;  ///< actions before this one are done
};

}  // namespace vialkeeper::ui
