// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/found_substance_delegate.h"

#include <QPainter>

#include "ui/models/component_search.h"
#include "ui/widgets/charge_row_layout.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kSide = 8;
constexpr int kAbove = 3;

}  // namespace

void FoundSubstanceDelegate::paint(QPainter* painter, const QStyleOptionViewItem& option,
                                   const QModelIndex& index) const {
  const ChargeFonts fonts(option.font);
  const bool selected = (option.state & QStyle::State_Selected) != 0;
  painter->save();
  painter->fillRect(option.rect, colour(selected ? "selected" : "panel"));
  const QRect inside = option.rect.adjusted(kSide, kAbove, -kSide, -kAbove);
  const bool isNew = index.data(ComponentSearch::kIsNewRole).toBool();
  painter->setFont(isNew ? fonts.plain : fonts.name);
  painter->setPen(colour(isNew ? "hydrogen" : (selected ? "selectedText" : "text")));
  const QFontMetrics metrics(painter->font());
  painter->drawText(inside, Qt::AlignLeft | Qt::AlignTop,
                    metrics.elidedText(index.data().toString(), Qt::ElideRight, inside.width()));
  painter->setFont(fonts.small);
  painter->setPen(colour(selected ? "selectedText" : "quiet"));
  painter->drawText(inside.adjusted(0, metrics.height(), 0, 0), Qt::AlignLeft | Qt::AlignTop,
                    QFontMetrics(fonts.small)
                        .elidedText(index.data(ComponentSearch::kDetailsRole).toString(),
                                    Qt::ElideRight, inside.width()));
  painter->restore();
}

QSize FoundSubstanceDelegate::sizeHint(const QStyleOptionViewItem& option,
                                       const QModelIndex& index) const {
  const ChargeFonts fonts(option.font);
  const bool isNew = index.data(ComponentSearch::kIsNewRole).toBool();
  return {100, QFontMetrics(fonts.name).height() +
                   (isNew ? 0 : QFontMetrics(fonts.small).height()) + 2 * kAbove};
}

}  // namespace vialkeeper::ui
