// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>
#include <memory>

#include "ui/models/action_history.h"
#include "ui/models/notebook_link.h"
#include "ui/models/open_run.h"
#include "ui/models/run_search.h"
#include "ui/widgets/run_page.h"

class QLabel;
class QStackedWidget;

namespace vialkeeper::ui {

class FilterLine;
class MessageBar;
class NewRunPage;
class PersonField;
class RunsTable;
class ShelfPage;

/// Everything that is seen while a notebook is open: the bar with the filter line, the runs, and
/// beside them the open run, the shelf or a new run.
class Workspace : public QWidget {
  Q_OBJECT

 public:
  explicit Workspace(std::unique_ptr<NotebookLink> link, QWidget* parent = nullptr);
  ~Workspace() override;

  [[nodiscard]] NotebookLink& link() { return *m_link; }
  [[nodiscard]] OpenRun& openRun() { return *m_run; }
  [[nodiscard]] RunSearch& runSearch() { return *m_search; }
  [[nodiscard]] ActionHistory& history() { return m_history; }
  [[nodiscard]] RunPage& runPage() { return *m_runPage; }
  [[nodiscard]] MessageBar& messages() { return *m_messages; }

 public slots:
  void showRun(vialkeeper::app::RowNumber run);
  void showPage(vialkeeper::ui::RunPage::Page page);
  void showShelf();
  void showNewRun();
  /// A new run that starts from the selected one.
  void cloneSelected();
  void focusFilter();
  void focusRuns();
  void focusEntry();

 signals:
  /// The button that opens the window's menu was pressed; `at` in global coordinates.
  void menuWanted(const QPoint& at);

 private:
  QWidget* makeBar();
  void watchPeople();

  std::unique_ptr<NotebookLink> m_link;
  ActionHistory m_history;
  std::unique_ptr<OpenRun> m_run;
  std::unique_ptr<RunSearch> m_search;
  PersonField* m_person;
  FilterLine* m_filter;
  RunsTable* m_runs;
  MessageBar* m_messages;
  QStackedWidget* m_stack;
  QLabel* m_nothing;
  RunPage* m_runPage;
  NewRunPage* m_newRun;
  ShelfPage* m_shelf;
};

}  // namespace vialkeeper::ui
