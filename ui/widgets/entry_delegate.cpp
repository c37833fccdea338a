// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/entry_delegate.h"

#include <QPainter>
#include <QTableView>

#include "app/notebook/log_line_kinds.h"
#include "ui/models/log_table_model.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kSide_px = 8;
constexpr int kAbove_px = 6;
constexpr int kFlags = Qt::AlignLeft | Qt::AlignTop | Qt::TextWordWrap | Qt::TextWrapAnywhere;

QFont fontOf(const QModelIndex& index, QFont font) {
  const bool word = index.column() == LogTableModel::kKind;
  font.setBold(word);
  font.setStrikeOut(index.data(LogTableModel::kStruckRole).toBool() &&
                    (word || index.column() == LogTableModel::kReading));
  return font;
}

QColor accentOf(const QString& kind) {
  namespace kinds = app::event_kind;
  const auto is = [&](std::string_view wanted) { return kind == toQt(wanted); };
  if (is(kinds::kLampOn) || is(kinds::kLampOff)) return colour("lamp");
  if (is(kinds::kPressure)) return colour("hydrogen");
  if (is(kinds::kVent) || is(kinds::kPurge)) return colour("limit");
  if (is(kinds::kGasSample) || is(kinds::kLiquidSample)) return colour("closed");
  return colour("text");
}

QColor inkOf(const QModelIndex& index) {
  if (index.data(LogTableModel::kStruckRole).toBool()) return colour("quiet");
  if (index.column() == LogTableModel::kKind)
    return accentOf(index.data(LogTableModel::kKindRole).toString());
  return index.column() == LogTableModel::kReading ? colour("text") : colour("quiet");
}

}  // namespace

EntryDelegate::EntryDelegate(QTableView& table) : QStyledItemDelegate(&table), m_table(table) {}

void EntryDelegate::paint(QPainter* painter, const QStyleOptionViewItem& option,
                          const QModelIndex& index) const {
  const bool selected = option.state.testFlag(QStyle::State_Selected);
  painter->save();
  if (selected) painter->fillRect(option.rect, colour("selected"));
  painter->setPen(QPen(colour("line"), 1.0));
  painter->drawLine(option.rect.bottomLeft(), option.rect.bottomRight());
  painter->setFont(fontOf(index, option.font));
  painter->setPen(selected ? colour("selectedText") : inkOf(index));
  painter->drawText(option.rect.adjusted(kSide_px, kAbove_px, -kSide_px, 0), kFlags,
                    index.data().toString());
  painter->restore();
}

QSize EntryDelegate::sizeHint(const QStyleOptionViewItem& option, const QModelIndex& index) const {
  const QFontMetrics metrics(fontOf(index, option.font));
  const QString text = index.data().toString();
  const bool wraps =
      index.column() == LogTableModel::kReading || index.column() == LogTableModel::kRemark;
  const int room = wraps ? m_table.columnWidth(index.column()) - 2 * kSide_px : 10'000;
  const QRect box = metrics.boundingRect(QRect(0, 0, std::max(room, 40), 1 << 20), kFlags, text);
  return {box.width() + 2 * kSide_px + 1, std::max(box.height(), metrics.height()) + 2 * kAbove_px};
}

}  // namespace vialkeeper::ui
