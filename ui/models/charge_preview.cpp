// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/charge_preview.h"

#include "ui/models/qt_text.h"

namespace vialkeeper::ui {

int ChargePreview::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_rows.size());
}

int ChargePreview::columnCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : kColumns;
}

QVariant ChargePreview::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid)) return {};
  if (role == Qt::TextAlignmentRole) {
    return static_cast<int>((index.column() >= kRatio ? Qt::AlignRight : Qt::AlignLeft) |
                            Qt::AlignVCenter);
  }
  if (role != Qt::DisplayRole) return {};
  const app::SheetRow& row = m_rows[static_cast<std::size_t>(index.row())];
  switch (index.column()) {
    case kComponent:
      return toQt(row.name);
    case kRole:
      return toQt(row.role);
    case kRatio:
      return toQt(row.ratio);
    case kAmount:
      return toQt(row.amount);
    case kTarget:
      return toQt(row.target.empty() ? row.target : row.target + " " + row.unit);
    default:
      return {};
  }
}

QVariant ChargePreview::headerData(int section, Qt::Orientation orientation, int role) const {
  if (orientation != Qt::Horizontal) return {};
  if (role == Qt::TextAlignmentRole) {
    return static_cast<int>((section >= kRatio ? Qt::AlignRight : Qt::AlignLeft) |
                            Qt::AlignVCenter);
  }
  if (role != Qt::DisplayRole) return {};
  switch (section) {
    case kComponent:
      return tr("component");
    case kRole:
      return tr("role");
    case kRatio:
      return tr("how much");
    case kAmount:
      return tr("amount");
    case kTarget:
      return tr("weigh or pipette");
    default:
      return {};
  }
}

void ChargePreview::show(std::vector<app::SheetRow> rows) {
  beginResetModel();
  m_rows = std::move(rows);
  endResetModel();
}

}  // namespace vialkeeper::ui
