// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/run_list_model.h"
#include "ui/models/run_search.h"

class QLabel;
class QMenu;
class QStackedLayout;
class QTableView;

namespace vialkeeper::ui {

/// The runs that were found, with chosen columns.
class RunsTable : public QWidget {
  Q_OBJECT

 public:
  explicit RunsTable(RunSearch& search, QWidget* parent = nullptr);

  /// The run of the selected row; 0 where none is.
  [[nodiscard]] vialkeeper::app::RowNumber selectedRun() const;
  /// Selects a run if it is among those shown, and as soon as it is.
  void select(vialkeeper::app::RowNumber run);

 signals:
  void runChosen(vialkeeper::app::RowNumber run);
  /// Up from the first row.
  void filterWanted();

 private:
  bool eventFilter(QObject* watched, QEvent* event) override;
  void setUpView();
  void watchModel();
  void showFound();
  void selectWanted();
  void layOut();
  void layOutColumns();
  void layOutRows();
  void headClicked(int section);
  void showOrder();
  void showMenu(const QPoint& at);
  void fillMenu(QMenu& menu);
  [[nodiscard]] QString nothingFound() const;

  RunSearch& m_search;
  RunListModel m_model;
  QTableView* m_view;
  QLabel* m_nothing;
  QStackedLayout* m_stack;
  app::RowNumber m_wanted = 0;  ///< selected by the user, though it may not be shown now
  bool m_isRefreshing = false;
};

}  // namespace vialkeeper::ui
