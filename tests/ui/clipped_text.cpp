// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/clipped_text.h"

#include <QAbstractButton>
#include <QHeaderView>
#include <QLabel>
#include <QTabBar>
#include <QTableView>
#include <QTextDocument>

namespace vialkeeper::tests {
namespace {

/// Rounding of font metrics.
constexpr int kSlack_px = 1;

QString found(const QWidget& widget, const QString& text, int missing) {
  return QStringLiteral("%1 “%2”: %3 px are missing")
      .arg(QString::fromLatin1(widget.metaObject()->className()), text.left(60))
      .arg(missing);
}

void checkLabel(const QLabel& label, QStringList& all) {
  if (label.text().isEmpty() || !label.pixmap(Qt::ReturnByValue).isNull()) return;
  if (label.sizePolicy().horizontalPolicy() == QSizePolicy::Ignored) return;
  const int room = label.contentsRect().width() + kSlack_px;
  if (label.wordWrap()) {
    const int missing = label.heightForWidth(label.width()) - label.height() - kSlack_px;
    if (missing > 0) all += found(label, label.text(), missing);
    return;
  }
  const int wanted = label.minimumSizeHint().width();
  if (wanted > label.width() + kSlack_px) all += found(label, label.text(), wanted - room);
}

void checkButton(const QAbstractButton& button, QStringList& all) {
  if (button.text().isEmpty()) return;
  QString text = button.text();
  text.remove(QLatin1Char('&'));
  const int wanted = button.fontMetrics().horizontalAdvance(text);
  if (wanted > button.width() + kSlack_px) all += found(button, text, wanted - button.width());
}

void checkTable(const QTableView& table, QStringList& all) {
  const QAbstractItemModel* model = table.model();
  if (model == nullptr) return;
  const QRect view = table.viewport()->rect();
  for (int row = 0; row < model->rowCount(); ++row) {
    for (int column = 0; column < model->columnCount(); ++column) {
      if (table.isColumnHidden(column) || table.isRowHidden(row)) continue;
      const QModelIndex index = model->index(row, column);
      const QRect cell = table.visualRect(index);
      if (!view.intersects(cell)) continue;
      const QString text = index.data().toString();
      if (text.isEmpty() || table.columnSpan(row, column) > 1) continue;
      const QSize wanted = table.sizeHintForIndex(index);
      // A delegate that wraps says how high it wants to be at this width.
      if (wanted.width() > cell.width() + kSlack_px && wanted.height() > cell.height() + kSlack_px)
        all += found(table, text, wanted.width() - cell.width());
      else if (!table.wordWrap() && wanted.width() > cell.width() + kSlack_px)
        all += found(table, text, wanted.width() - cell.width());
    }
  }
}

void checkHeader(const QHeaderView& header, QStringList& all) {
  if (header.orientation() != Qt::Horizontal || header.model() == nullptr) return;
  for (int section = 0; section < header.count(); ++section) {
    if (header.isSectionHidden(section)) continue;
    const QString text =
        header.model()->headerData(section, Qt::Horizontal, Qt::DisplayRole).toString();
    const int missing =
        header.fontMetrics().horizontalAdvance(text) - header.sectionSize(section) - kSlack_px;
    if (missing > 0) all += found(header, text, missing);
  }
}

}  // namespace

QStringList clippedTexts(const QWidget& window) {
  QStringList all;
  for (const QWidget* widget : window.findChildren<QWidget*>()) {
    if (!widget->isVisibleTo(&window) || widget->visibleRegion().isEmpty()) continue;
    if (const auto* label = qobject_cast<const QLabel*>(widget)) checkLabel(*label, all);
    if (const auto* button = qobject_cast<const QAbstractButton*>(widget)) checkButton(*button, all);
    if (const auto* table = qobject_cast<const QTableView*>(widget)) checkTable(*table, all);
    if (const auto* header = qobject_cast<const QHeaderView*>(widget)) checkHeader(*header, all);
  }
  return all;
}

}  // namespace vialkeeper::tests
