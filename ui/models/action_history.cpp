// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/action_history.h"

namespace vialkeeper::ui {

void ActionHistory::add(DoneAction action) {
  m_actions.resize(m_done);
  m_actions.push_back(std::move(action));
  m_done = m_actions.size();
  emit changed();
}

QString ActionHistory::undoName() const {
  return canUndo() ? m_actions[m_done - 1].name : QString();
}

QString ActionHistory::redoName() const { return canRedo() ? m_actions[m_done].name : QString(); }

void ActionHistory::undo() {
  if (!canUndo()) return;
  if (const auto undone = m_actions[m_done - 1].undo(); !undone) {
    emit refused(undone.error());
    return;
  }
  --m_done;
  emit changed();
}

void ActionHistory::redo() {
  if (!canRedo()) return;
  if (const auto redone = m_actions[m_done].redo(); !redone) {
    emit refused(redone.error());
    return;
  }
  ++m_done;
  emit changed();
}

void ActionHistory::clear() {
  m_actions.clear();
  m_done = 0;
  emit changed();
}

}  // namespace vialkeeper::ui
