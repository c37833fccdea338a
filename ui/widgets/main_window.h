// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QMainWindow>
#include <memory>

#include "ui/models/notebook_link.h"
#include "ui/models/recent_notebooks.h"
#include "ui/widgets/action_registry.h"

class QMenu;
class QStackedWidget;

namespace vialkeeper::ui {

class StartPage;
class Workspace;

/// The one window: the start page, or the workspace of the notebook that is open, and the commands
/// of both.
class MainWindow : public QMainWindow {
  Q_OBJECT

 public:
  explicit MainWindow(Workplace workplace, QWidget* parent = nullptr);
  ~MainWindow() override;

  /// Opens a notebook; what was open is closed. A fault is shown on the start page.
  void openNotebook(const QString& file);
  void createNotebook(const QString& file);
  /// The workspace of the open notebook, or nullptr.
  [[nodiscard]] Workspace* workspace() { return m_workspace; }
  [[nodiscard]] const ActionRegistry& commands() const { return m_commands; }

 public slots:
  void chooseNotebook();
  void chooseNewNotebook();
  /// Makes the invented notebook in another thread and opens it.
  void openDemo();
  void closeNotebook();

 private:
  void addCommands();
  void addViewCommands(QMenu& menu);
  void addRunCommands(QMenu& menu);
  void show(std::unique_ptr<app::Notebook> notebook, const QString& file);
  void backUp();
  void nameUndo();

  Workplace m_workplace;
  RecentNotebooks m_recent;
  ActionRegistry m_commands;
  QStackedWidget* m_stack;
  StartPage* m_start;
  Workspace* m_workspace = nullptr;
  QMenu* m_menu;
  QAction* m_undo = nullptr;
  QAction* m_redo = nullptr;
};

}  // namespace vialkeeper::ui
