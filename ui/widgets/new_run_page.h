// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>
#include <array>

#include "ui/models/new_run_model.h"
#include "ui/models/notebook_link.h"

class QLabel;
class QLineEdit;
class QListView;
class QPushButton;
class QTableView;
class QVBoxLayout;

namespace vialkeeper::ui {

/// Sets up a run from a template, an earlier run or a plan file. What is typed stays until the run
/// is made or given up.
class NewRunPage : public QWidget {
  Q_OBJECT

 public:
  explicit NewRunPage(NotebookLink& link, QWidget* parent = nullptr);

  /// Offers an earlier run as the one to start from.
  void startFrom(vialkeeper::app::RowNumber run);

 signals:
  void created(vialkeeper::app::RowNumber run);
  void cancelled();

 private:
  /// A line of text with its label and, when it is refused, the reason below.
  struct Entry {
    QLineEdit* line = nullptr;
    QLabel* fault = nullptr;
  };

  void showEvent(QShowEvent* event) override;
  bool eventFilter(QObject* watched, QEvent* event) override;
  QWidget* makeSources();
  QWidget* makeForm();
  void makeTable();
  Entry addEntry(QVBoxLayout& column, const QString& label, const QString& name);
  void startAfresh();
  void chooseFirst();
  void chooseFile();
  void showChosen();
  void showPreview();
  void showFault(const Entry& entry, const QString& sentence);
  void clearFaults();
  void create();
  void cancel();

  NewRunModel m_model;
  QListView* m_list;
  Entry m_source = {};
  Entry m_title = {};
  Entry m_series = {};
  Entry m_aim = {};
  QTableView* m_table;
  QLabel* m_vial;
  QLabel* m_notices;
  QLabel* m_caution;
  QPushButton* m_create;
  bool m_isFresh = true;
};

}  // namespace vialkeeper::ui
