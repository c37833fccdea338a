// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QTableView>

#include "ui/models/log_table_model.h"

namespace vialkeeper::ui {

/// The entries of the log. Enter or F2 on a row: correct it; Delete: take it back.
class EntriesTable : public QTableView {
  Q_OBJECT

 public:
  explicit EntriesTable(LogTableModel& model, QWidget* parent = nullptr);
  /// Selects an entry and scrolls to it.
  void goToEntry(int entry);
  [[nodiscard]] int currentEntry() const;

 signals:
  void correctionWanted(int entry);
  void withdrawalWanted(int entry);
  void upWanted();

 protected:
  void keyPressEvent(QKeyEvent* event) override;
  void resizeEvent(QResizeEvent* event) override;
  void changeEvent(QEvent* event) override;
  void contextMenuEvent(QContextMenuEvent* event) override;

 private:
  void fitColumns();
  void restoreCurrent();

  LogTableModel& m_model;
  int m_keptEntry = 0;
};

}  // namespace vialkeeper::ui
