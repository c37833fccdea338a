// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/charge_delegate.h"

#include <QHeaderView>
#include <QPainter>
#include <QTableView>

#include "ui/models/charge_table_model.h"
#include "ui/widgets/amount_editor.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

const char* colourOf(BandLine::Kind kind) {
  return kind == BandLine::Kind::kFault ? "limit" : "notice";
}

/// A shape for each kind, so that colour is not the only sign: a triangle for what to note, a disc
/// for what was refused or is asked.
void paintSign(QPainter& painter, BandLine::Kind kind, const QRectF& place) {
  painter.save();
  painter.setRenderHint(QPainter::Antialiasing);
  painter.setPen(Qt::NoPen);
  painter.setBrush(colour(colourOf(kind)));
  QString mark = QStringLiteral("!");
  if (kind == BandLine::Kind::kNotice) {
    const QPointF corners[] = {
        {place.center().x(), place.top()}, place.bottomRight(), place.bottomLeft()};
    painter.drawConvexPolygon(corners, 3);
  } else {
    painter.drawEllipse(place);
    mark = kind == BandLine::Kind::kFault ? QStringLiteral("×") : QStringLiteral("?");
  }
  QFont font = painter.font();
  font.setPixelSize(std::max(7, static_cast<int>(place.height() * 0.75)));
  font.setBold(true);
  painter.setFont(font);
  painter.setPen(colour("panel"));
  const double drop = kind == BandLine::Kind::kNotice ? place.height() * 0.12 : 0.0;
  painter.drawText(place.translated(0, drop), Qt::AlignCenter, mark);
  painter.restore();
}

}  // namespace

ChargeDelegate::ChargeDelegate(ChargeTableModel& model, QTableView& view)
    : QStyledItemDelegate(&view), m_model(model), m_view(view) {}

ChargeFonts ChargeDelegate::fonts() const { return ChargeFonts(m_view.font()); }

ChargeRowLayout ChargeDelegate::layoutOf(int row) const {
  return {m_model.index(row, 0), fonts(), m_view.columnWidth(0),
          m_view.horizontalHeader()->length()};
}

QSize ChargeDelegate::sizeHint(const QStyleOptionViewItem&, const QModelIndex& index) const {
  return {ChargeRowLayout::widthOf(index, fonts()), layoutOf(index.row()).height()};
}

QColor ChargeDelegate::inkOf(const QModelIndex& index, bool selected) const {
  switch (static_cast<Tone>(index.data(ChargeTableModel::kToneRole).toInt())) {
    case Tone::kGood:
      return colour("closed");
    case Tone::kOff:
    case Tone::kFault:
      return colour("limit");
    case Tone::kQuiet:
      return colour("quiet");
    case Tone::kPlain:
      break;
  }
  return colour(selected ? "selectedText" : "text");
}

void ChargeDelegate::paintTexts(QPainter& painter, const QRect& cell, const QModelIndex& index,
                                bool selected) const {
  const ChargeFonts all = fonts();
  const bool isName = index.column() == ChargeTableModel::kComponent;
  const Qt::Alignment side =
      index.data(Qt::TextAlignmentRole).value<Qt::Alignment>() & Qt::AlignHorizontal_Mask;
  const QRect inside = cell.adjusted(ChargeRowLayout::kPadding, ChargeRowLayout::kTop,
                                     -ChargeRowLayout::kPadding, 0);
  const QString first = index.data(Qt::DisplayRole).toString();
  const QFont& font = ChargeRowLayout::fontOf(index.column(), all);
  const int firstHeight = isName ? ChargeRowLayout::wrappedHeight(first, font, inside.width())
                                 : QFontMetrics(all.target).height();
  painter.setFont(font);
  painter.setPen(inkOf(index, selected));
  painter.drawText(
      QRect(inside.topLeft(), QSize(inside.width(), firstHeight)),
      static_cast<int>(side) |
          (isName ? Qt::AlignTop | ChargeRowLayout::wrapping(first, font, inside.width())
                  : Qt::AlignVCenter),
      first);
  const QString second = index.data(ChargeTableModel::kSecondLineRole).toString();
  if (second.isEmpty()) return;
  painter.setFont(all.small);
  const bool isCharged = index.column() == ChargeTableModel::kCharged;
  painter.setPen(isCharged ? inkOf(index, selected) : colour(selected ? "selectedText" : "quiet"));
  painter.drawText(QRect(inside.left(), inside.top() + firstHeight, inside.width(), cell.height()),
                   static_cast<int>(side) | Qt::AlignTop |
                       (isName ? ChargeRowLayout::wrapping(second, all.small, inside.width()) : 0),
                   second);
}

void ChargeDelegate::paintBand(QPainter& painter, const QRect& row,
                               const ChargeRowLayout& layout) const {
  const QFont font = fonts().small;
  const int line = QFontMetrics(font).height();
  for (const BandLine& each : layout.band()) {
    const int top = row.top() + each.top;
    paintSign(
        painter, each.kind,
        QRectF(row.left() + ChargeRowLayout::kPadding, top + line * 0.1, line * 0.85, line * 0.8));
    painter.setFont(font);
    painter.setPen(colour(colourOf(each.kind)));
    const int left = row.left() + layout.bandTextLeft();
    const QRect place(left, top, row.right() - ChargeRowLayout::kPadding - left + 1, each.height);
    painter.drawText(
        place,
        Qt::AlignLeft | Qt::AlignTop | ChargeRowLayout::wrapping(each.text, font, place.width()),
        each.text);
  }
}

void ChargeDelegate::paintFrame(QPainter& painter, const QRect& cell,
                                const QModelIndex& index) const {
  const bool isCurrent = m_view.hasFocus() && m_view.currentIndex() == index;
  const bool isKept = index.data(ChargeTableModel::kIsKeptRole).toBool() &&
                      index.column() != ChargeTableModel::kComponent;
  if (!isCurrent && !isKept) return;
  painter.setRenderHint(QPainter::Antialiasing);
  painter.setBrush(Qt::NoBrush);
  painter.setPen(QPen(colour(isKept ? "limit" : "focus"), isCurrent ? 2.0 : 1.2));
  painter.drawRoundedRect(QRectF(cell).adjusted(1.5, 2.5, -1.5, -6.5), 4, 4);
}

void ChargeDelegate::paint(QPainter* painter, const QStyleOptionViewItem& option,
                           const QModelIndex& index) const {
  const ChargeRowLayout layout = layoutOf(index.row());
  const bool selected = (option.state & QStyle::State_Selected) != 0;
  painter->save();
  painter->setClipRect(option.rect);
  painter->fillRect(option.rect, colour(selected ? "selected" : "window"));
  painter->setPen(colour("line"));
  painter->drawLine(option.rect.bottomLeft(), option.rect.bottomRight());
  const QRect cell(option.rect.topLeft(), QSize(option.rect.width(), layout.cellsHeight()));
  paintTexts(*painter, cell, index, selected);
  const int left = m_view.columnViewportPosition(0);
  paintBand(*painter,
            QRect(left, option.rect.top(), m_view.horizontalHeader()->length(), layout.height()),
            layout);
  paintFrame(*painter, cell, index);
  painter->restore();
}

QWidget* ChargeDelegate::createEditor(QWidget* parent, const QStyleOptionViewItem&,
                                      const QModelIndex& index) const {
  auto* editor = new AmountEditor(parent);
  editor->setAlignment(index.data(Qt::TextAlignmentRole).value<Qt::Alignment>());
  editor->setAccessibleName(index.data(Qt::AccessibleTextRole).toString());
  const QPersistentModelIndex place(index);
  connect(editor, &QLineEdit::textEdited, this, [this, editor, place](const QString& typed) {
    const auto reading = m_model.preview(place, typed);
    editor->showReading(reading.text, reading.isFault);
  });
  return editor;
}

void ChargeDelegate::setEditorData(QWidget* editor, const QModelIndex& index) const {
  auto* field = static_cast<AmountEditor*>(editor);
  // A change from elsewhere must not take away what is being typed.
  if (!field->isModified()) field->setText(index.data(Qt::EditRole).toString());
}

void ChargeDelegate::setModelData(QWidget* editor, QAbstractItemModel* model,
                                  const QModelIndex& index) const {
  model->setData(index, static_cast<AmountEditor*>(editor)->text(), Qt::EditRole);
}

void ChargeDelegate::updateEditorGeometry(QWidget* editor, const QStyleOptionViewItem& option,
                                          const QModelIndex& index) const {
  const ChargeRowLayout layout = layoutOf(index.row());
  QRect field(option.rect.left() + 1, option.rect.top() + 2, option.rect.width() - 2,
              std::min(layout.cellsHeight() - 4, editor->sizeHint().height() + 4));
  editor->setGeometry(field);
}

}  // namespace vialkeeper::ui
