// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QStyledItemDelegate>

namespace vialkeeper::ui {

/// Draws an item's text in as many lines as it takes, and below it, smaller, what it is or where it
/// is from.
class TwoLineDelegate : public QStyledItemDelegate {
  Q_OBJECT

 public:
  TwoLineDelegate(int smallRole, QObject* parent)
      : QStyledItemDelegate(parent), m_smallRole(smallRole) {}

  void paint(QPainter* painter, const QStyleOptionViewItem& option,
             const QModelIndex& index) const override;
  [[nodiscard]] QSize sizeHint(const QStyleOptionViewItem& option,
                               const QModelIndex& index) const override;

 private:
  int m_smallRole;
};

}  // namespace vialkeeper::ui
