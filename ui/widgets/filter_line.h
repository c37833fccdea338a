// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/filter_completion.h"
#include "ui/models/run_search.h"
#include "ui/models/saved_filters.h"

class QLabel;
class QToolButton;

namespace vialkeeper::ui {

class CompletionList;
class DropPanel;
class FilterEdit;
class SavedFiltersMenu;

/// The line in which runs are searched, completed from what the notebook holds: how many there are
/// at its end, what is wrong with it below it, and a menu of searches that were kept.
class FilterLine : public QWidget {
  Q_OBJECT

 public:
  explicit FilterLine(RunSearch& search, QWidget* parent = nullptr);

  /// Searches for another text.
  void setText(const QString& text);

 signals:
  /// Down or Enter: go on among the runs.
  void runsWanted();

 private:
  bool eventFilter(QObject* watched, QEvent* event) override;
  bool keyPressed(int key, Qt::KeyboardModifiers modifiers);
  bool enterPressed();
  void escapePressed();
  void typed(const QString& text);
  void propose(bool all);
  void take(int row);
  void showCount();
  void showFault();

  RunSearch& m_search;
  FilterCompletion m_completion;
  FilterEdit* m_edit;
  QLabel* m_count;
  SavedFiltersMenu* m_saved;
  DropPanel* m_faultPanel;
  QLabel* m_fault;
  CompletionList* m_list;
};

}  // namespace vialkeeper::ui
