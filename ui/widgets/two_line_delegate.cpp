// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/two_line_delegate.h"

#include <QAbstractItemView>
#include <QFontMetrics>
#include <QPainter>

#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kSide_px = 10;
constexpr int kAbove_px = 6;
constexpr double kSmall = 0.85;

QFont small(QFont font) {
  font.setPointSizeF(font.pointSizeF() * kSmall);
  return font;
}

}  // namespace

void TwoLineDelegate::paint(QPainter* painter, const QStyleOptionViewItem& option,
                            const QModelIndex& index) const {
  QStyleOptionViewItem cell = option;
  initStyleOption(&cell, index);
  const QString words = cell.text;
  const bool isSelected = cell.state.testFlag(QStyle::State_Selected);
  cell.text.clear();
  cell.widget->style()->drawControl(QStyle::CE_ItemViewItem, &cell, painter, cell.widget);
  const QRect room = cell.rect.adjusted(kSide_px, kAbove_px, -kSide_px, -kAbove_px);
  const int below = QFontMetrics(small(cell.font)).lineSpacing();
  painter->save();
  painter->setPen(colour(isSelected ? "selectedText" : "text"));
  painter->setFont(cell.font);
  painter->drawText(room.adjusted(0, 0, 0, -below), Qt::TextWordWrap, words);
  painter->setPen(colour(isSelected ? "selectedText" : "quiet"));
  painter->setFont(small(cell.font));
  painter->drawText(room, Qt::AlignLeft | Qt::AlignBottom, index.data(m_smallRole).toString());
  painter->restore();
}

QSize TwoLineDelegate::sizeHint(const QStyleOptionViewItem& option,
                                const QModelIndex& index) const {
  const auto* view = qobject_cast<const QAbstractItemView*>(option.widget);
  const int width = view == nullptr ? option.rect.width() : view->viewport()->width();
  const QRect words = QFontMetrics(option.font)
                          .boundingRect(QRect(0, 0, std::max(1, width - 2 * kSide_px), 100'000),
                                        Qt::TextWordWrap, index.data().toString());
  return {width, words.height() + QFontMetrics(small(option.font)).lineSpacing() + 2 * kAbove_px};
}

}  // namespace vialkeeper::ui
