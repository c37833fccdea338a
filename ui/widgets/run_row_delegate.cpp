// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/run_row_delegate.h"

#include <QAbstractItemView>
#include <QFontMetrics>
#include <QPainter>

#include "ui/models/run_list_model.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kSide_px = 8;
constexpr int kAbove_px = 7;
constexpr int kSign_px = 8;
constexpr int kBar_px = 3;
constexpr double kSmall = 0.85;

QFont bold(QFont font) {
  font.setBold(true);
  return font;
}

QFont small(QFont font) {
  font.setPointSizeF(font.pointSizeF() * kSmall);
  return font;
}

RunColumn columnOf(const QModelIndex& index) {
  return static_cast<RunColumn>(index.data(RunListModel::kColumnRole).toInt());
}

QRect inner(const QRect& cell) { return cell.adjusted(kSide_px, 0, -kSide_px, 0); }

/// Room before the code for the sign of a run that is irradiating.
int signRoom() { return Theme::instance().scaled(kSign_px) + 4; }

}  // namespace

int RunRowDelegate::widthFor(const QString& text, const QFont& font, bool isCode) {
  const int words = QFontMetrics(isCode ? bold(font) : font).horizontalAdvance(text);
  return words + 2 * kSide_px + (isCode ? signRoom() : 0) + 2;
}

int RunRowDelegate::heightOf(int lines, const QFont& font) {
  return lines * QFontMetrics(font).lineSpacing() + 2 * kAbove_px;
}

int RunRowDelegate::linesOf(const QString& text, const QFont& font, int width) {
  const QFontMetrics metrics(font);
  const int room = width - 2 * kSide_px;
  if (room <= 0 || metrics.horizontalAdvance(text) <= room) return 1;
  const QRect taken = metrics.boundingRect(QRect(0, 0, room, 100'000), Qt::TextWordWrap, text);
  return std::max(1, (taken.height() + metrics.leading()) / metrics.lineSpacing());
}

void RunRowDelegate::paint(QPainter* painter, const QStyleOptionViewItem& option,
                           const QModelIndex& index) const {
  QStyleOptionViewItem cell = option;
  initStyleOption(&cell, index);
  const QString words = cell.text;
  const bool isSelected = cell.state.testFlag(QStyle::State_Selected);
  cell.text.clear();
  // The row is what is current, not the cell: a bar at its beginning says so.
  cell.state.setFlag(QStyle::State_HasFocus, false);
  cell.widget->style()->drawControl(QStyle::CE_ItemViewItem, &cell, painter, cell.widget);
  painter->save();
  if (isSelected && index.column() == 0 && cell.widget->hasFocus())
    painter->fillRect(QRect(cell.rect.topLeft(), QSize(kBar_px, cell.rect.height())),
                      colour("focus"));
  const RunColumn column = columnOf(index);
  if (column == RunColumn::kCode) {
    paintCode(painter, cell, index);
  } else {
    painter->setFont(cell.font);
    painter->setPen(colour(isSelected ? "selectedText" : "text"));
    const bool wraps = column == RunColumn::kTitle;
    const QString shown =
        wraps ? words
              : QFontMetrics(cell.font).elidedText(words, Qt::ElideRight, inner(cell.rect).width());
    painter->drawText(inner(cell.rect),
                      static_cast<int>(cell.displayAlignment) | (wraps ? Qt::TextWordWrap : 0),
                      shown);
  }
  painter->restore();
}

void RunRowDelegate::paintCode(QPainter* painter, const QStyleOptionViewItem& option,
                               const QModelIndex& index) const {
  const bool isSelected = option.state.testFlag(QStyle::State_Selected);
  const bool isRunning = index.data(RunListModel::kIsRunningRole).toBool();
  QRect room = inner(option.rect).adjusted(signRoom(), 0, 0, 0);
  const int line = QFontMetrics(option.font).lineSpacing();
  if (isRunning) {
    const int size = Theme::instance().scaled(kSign_px);
    painter->setRenderHint(QPainter::Antialiasing);
    painter->setPen(Qt::NoPen);
    painter->setBrush(colour("lamp"));
    painter->drawEllipse(
        QRect(room.left() - signRoom(), room.center().y() - line / 2 - size / 2, size, size));
    painter->setFont(small(option.font));
    painter->setPen(colour("lamp"));
    painter->drawText(
        QRect(room.left() - signRoom(), room.center().y(), room.width() + signRoom(), line),
        Qt::AlignLeft | Qt::AlignVCenter, index.data(RunListModel::kStateRole).toString());
    room.adjust(0, 0, 0, -line);
  }
  painter->setFont(bold(option.font));
  painter->setPen(colour(isSelected ? "selectedText" : "text"));
  painter->drawText(room, Qt::AlignLeft | Qt::AlignVCenter, index.data().toString());
}

QSize RunRowDelegate::sizeHint(const QStyleOptionViewItem& option, const QModelIndex& index) const {
  return {widthFor(index.data().toString(), option.font, columnOf(index) == RunColumn::kCode),
          heightOf(1, option.font)};
}

}  // namespace vialkeeper::ui
