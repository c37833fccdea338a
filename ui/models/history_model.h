// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractTableModel>
#include <vector>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// The trail of the open run, newest first: when, who, what was done and why, with every changed
/// value before and after.
class HistoryModel : public QAbstractTableModel {
  Q_OBJECT

 public:
  enum Column { kWhen, kWho, kWhat, kChanges, kReason, kColumnCount };

  explicit HistoryModel(OpenRun& run, QObject* parent = nullptr);

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] int columnCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] QVariant headerData(int section, Qt::Orientation orientation,
                                    int role) const override;

 private:
  void load();

  OpenRun& m_run;
  std::vector<app::RevisionRecord> m_revisions;
};

/// What a revision changed, one value a line: `component 3: actual_text – → 3.1 mg`. Values that
/// only serve the file (ids, versions) are left out.
[[nodiscard]] QStringList changedValues(const app::RevisionRecord& revision);

}  // namespace vialkeeper::ui
