// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractTableModel>
#include <QList>

#include "ui/models/run_columns.h"
#include "ui/models/run_search.h"

namespace vialkeeper::ui {

/// The runs that were found, one a row, with the columns that the user chose.
class RunListModel : public QAbstractTableModel {
  Q_OBJECT

 public:
  enum Role {
    kRunRole = Qt::UserRole,  ///< the run's number
    kColumnRole,              ///< RunColumn of the column
    kIsRunningRole,           ///< whether the run is irradiating
    kStateRole                ///< its state as a word
  };

  explicit RunListModel(RunSearch& search, QObject* parent = nullptr);

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] int columnCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] QVariant headerData(int section, Qt::Orientation orientation,
                                    int role) const override;
  [[nodiscard]] bool canFetchMore(const QModelIndex& parent) const override;
  void fetchMore(const QModelIndex& parent) override;

  [[nodiscard]] const QList<RunColumn>& columns() const { return m_columns; }
  /// Shows or hides a column and remembers it; the last one stays.
  void setShown(RunColumn column, bool shown);
  void showDefaultColumns();
  [[nodiscard]] int rowOf(app::RowNumber run) const;  ///< -1 where it is not among them
  [[nodiscard]] app::RowNumber runAt(int row) const;  ///< 0 where there is no such row

 private:
  void replace(bool isSameQuestion);
  void replaceMiddle(const std::vector<app::FoundRun>& runs);
  void append(int first);
  void setColumns(const QList<RunColumn>& columns);
  [[nodiscard]] QVariant headText(RunColumn column, int role) const;

  RunSearch& m_search;
  QList<RunColumn> m_columns;
  std::vector<app::FoundRun> m_runs;
};

}  // namespace vialkeeper::ui
