// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QStyledItemDelegate>

namespace vialkeeper::ui {

/// Draws the cells of a RunListModel: the code in bold with a sign and the word for a run that is
/// irradiating, what it is in as many lines as it takes.
class RunRowDelegate : public QStyledItemDelegate {
  Q_OBJECT

 public:
  using QStyledItemDelegate::QStyledItemDelegate;

  void paint(QPainter* painter, const QStyleOptionViewItem& option,
             const QModelIndex& index) const override;
  [[nodiscard]] QSize sizeHint(const QStyleOptionViewItem& option,
                               const QModelIndex& index) const override;

  /// Width for a text of a column, with what stands beside it [px].
  [[nodiscard]] static int widthFor(const QString& text, const QFont& font, bool isCode);
  /// Height of a row of so many lines [px].
  [[nodiscard]] static int heightOf(int lines, const QFont& font);
  /// How many lines a text takes in a column of that width.
  [[nodiscard]] static int linesOf(const QString& text, const QFont& font, int width);

 private:
  void paintCode(QPainter* painter, const QStyleOptionViewItem& option,
                 const QModelIndex& index) const;
};

}  // namespace vialkeeper::ui
