// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAction>
#include <QKeySequence>
#include <QString>
#include <QWidget>
#include <functional>
#include <vector>

namespace vialkeeper::ui {

/// Every command of a window by its shortcut, so that no two can want the same keys.
class ActionRegistry {
 public:
  explicit ActionRegistry(QWidget& window) : m_window(window) {}

  /// Makes a command of the window. Shortcuts that are taken, and commands of one name, are a
  /// mistake of the program's and throw.
  QAction* add(const QString& text, const QKeySequence& keys, std::function<void()> act);
  [[nodiscard]] const std::vector<QAction*>& actions() const { return m_actions; }

 private:
  QWidget& m_window;
  std::vector<QAction*> m_actions;
};

}  // namespace vialkeeper::ui
