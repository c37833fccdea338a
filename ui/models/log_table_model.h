// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractTableModel>
#include <vector>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// The entries of the open run, newest first. What was corrected or withdrawn stays in its place
/// and says so.
class LogTableModel : public QAbstractTableModel {
  Q_OBJECT

 public:
  enum Column { kWhen, kKind, kReading, kRemark, kWho, kColumnCount };
  enum Role {
    kEntryRole = Qt::UserRole,  ///< the entry's number
    kStruckRole,                ///< bool: another entry stands in its place
    kKindRole,                  ///< the kind as the notebook keeps it
  };

  explicit LogTableModel(OpenRun& run, QObject* parent = nullptr);

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] int columnCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] QVariant headerData(int section, Qt::Orientation orientation,
                                    int role) const override;

  /// The entry's number; 0 where there is no such row.
  [[nodiscard]] int entryAt(int row) const;
  /// Its row; -1 where there is none.
  [[nodiscard]] int rowOf(int entry) const;
  /// Whether the entry can be corrected or withdrawn: nothing stands in its place yet.
  [[nodiscard]] bool stands(int entry) const;

 private:
  struct Row {
    int entry = 0;
    QString when = {};
    QString kind = {};
    QString reading = {};
    QString remark = {};
    QString who = {};
    QString tip = {};
    bool struck = false;

    bool operator==(const Row&) const = default;
  };

  void follow();
  [[nodiscard]] std::vector<Row> makeRows() const;
  [[nodiscard]] Row makeRow(const app::NumberedEvent& entry) const;
  [[nodiscard]] QString remarkOf(const app::EventRecord& event) const;
  [[nodiscard]] const app::EventRecord* eventOf(app::RowNumber n) const;

  OpenRun& m_run;
  std::vector<Row> m_rows;
};

}  // namespace vialkeeper::ui
