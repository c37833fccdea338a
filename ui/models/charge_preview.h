// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QAbstractTableModel>
#include <vector>

#include "app/sheet_content.h"

namespace vialkeeper::ui {

/// The charge of a run that is not made yet: what goes in, how much of it, what to weigh.
class ChargePreview : public QAbstractTableModel {
  Q_OBJECT

 public:
  enum Column { kComponent, kRole, kRatio, kAmount, kTarget, kColumns };

  using QAbstractTableModel::QAbstractTableModel;

  [[nodiscard]] int rowCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] int columnCount(const QModelIndex& parent = {}) const override;
  [[nodiscard]] QVariant data(const QModelIndex& index, int role) const override;
  [[nodiscard]] QVariant headerData(int section, Qt::Orientation orientation,
                                    int role) const override;

  void show(std::vector<app::SheetRow> rows);

 private:
  std::vector<app::SheetRow> m_rows;
};

}  // namespace vialkeeper::ui
