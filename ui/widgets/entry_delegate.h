// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QStyledItemDelegate>

class QTableView;

namespace vialkeeper::ui {

/// Draws a cell of the entries: whole texts on as many lines as they need, what another entry
/// stands for struck through, and the kind in the colour of its meaning.
class EntryDelegate : public QStyledItemDelegate {
  Q_OBJECT

 public:
  explicit EntryDelegate(QTableView& table);

  void paint(QPainter* painter, const QStyleOptionViewItem& option,
             const QModelIndex& index) const override;
  [[nodiscard]] QSize sizeHint(const QStyleOptionViewItem& option,
                               const QModelIndex& index) const override;

 private:
  QTableView& m_table;
};

}  // namespace vialkeeper::ui
