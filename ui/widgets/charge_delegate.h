// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QStyledItemDelegate>

#include "ui/widgets/charge_row_layout.h"

class QTableView;

namespace vialkeeper::ui {

class ChargeTableModel;

/// Paints the rows of the charge and edits its cells. Each cell paints its own part of the
/// sentences below the row, so that any part of the table can be painted alone.
class ChargeDelegate : public QStyledItemDelegate {
  Q_OBJECT

 public:
  ChargeDelegate(ChargeTableModel& model, QTableView& view);

  [[nodiscard]] ChargeFonts fonts() const;
  [[nodiscard]] ChargeRowLayout layoutOf(int row) const;

  void paint(QPainter* painter, const QStyleOptionViewItem& option,
             const QModelIndex& index) const override;
  [[nodiscard]] QSize sizeHint(const QStyleOptionViewItem& option,
                               const QModelIndex& index) const override;
  QWidget* createEditor(QWidget* parent, const QStyleOptionViewItem& option,
                        const QModelIndex& index) const override;
  void setEditorData(QWidget* editor, const QModelIndex& index) const override;
  void setModelData(QWidget* editor, QAbstractItemModel* model,
                    const QModelIndex& index) const override;
  void updateEditorGeometry(QWidget* editor, const QStyleOptionViewItem& option,
                            const QModelIndex& index) const override;

 private:
  [[nodiscard]] QColor inkOf(const QModelIndex& index, bool selected) const;
  void paintTexts(QPainter& painter, const QRect& cell, const QModelIndex& index,
                  bool selected) const;
  void paintBand(QPainter& painter, const QRect& row, const ChargeRowLayout& layout) const;
  void paintFrame(QPainter& painter, const QRect& cell, const QModelIndex& index) const;

  ChargeTableModel& m_model;
  QTableView& m_view;
};

}  // namespace vialkeeper::ui
