// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/action_registry.h"

#include <stdexcept>

namespace vialkeeper::ui {

QAction* ActionRegistry::add(const QString& text, const QKeySequence& keys,
                             std::function<void()> act) {
  for (const QAction* other : m_actions) {
    if (!keys.isEmpty() && other->shortcut() == keys)
      throw std::logic_error("two commands want " + keys.toString().toStdString());
    if (other->text() == text)
      throw std::logic_error("two commands are called " + text.toStdString());
  }
  auto* action = new QAction(text, &m_window);
  action->setShortcut(keys);
  action->setShortcutContext(Qt::WindowShortcut);
  QObject::connect(action, &QAction::triggered, &m_window, [act = std::move(act)] { act(); });
  m_window.addAction(action);
  m_actions.push_back(action);
  return action;
}

}  // namespace vialkeeper::ui
