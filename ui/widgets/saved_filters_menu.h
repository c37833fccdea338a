// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>

#include "ui/models/saved_filters.h"

class QLineEdit;
class QMenu;
class QToolButton;

namespace vialkeeper::ui {

class DropPanel;

/// The button at the filter line's end with the searches that were kept: choose one, keep this one,
/// forget one.
class SavedFiltersMenu : public QObject {
  Q_OBJECT

 public:
  explicit SavedFiltersMenu(QLineEdit& line);
  [[nodiscard]] QToolButton* button() { return m_button; }

 signals:
  void chosen(const QString& text);

 private:
  void fill();
  void askName();
  void save();
  bool eventFilter(QObject* watched, QEvent* event) override;
  void leaveName();

  QLineEdit& m_line;
  SavedFilters m_filters;
  QToolButton* m_button;
  QMenu* m_menu;
  DropPanel* m_panel;
  QLineEdit* m_name;
};

}  // namespace vialkeeper::ui
