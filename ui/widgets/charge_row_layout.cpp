// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/charge_row_layout.h"

#include <QFontMetrics>
#include <QStringList>
#include <algorithm>

#include "ui/models/charge_table_model.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kBandGap = 2;
constexpr int kAnswersHeight = 38;

QFont scaledFont(QFont font, double factor, QFont::Weight weight) {
  font.setPointSizeF(font.pointSizeF() * factor);
  font.setWeight(weight);
  return font;
}

}  // namespace

ChargeFonts::ChargeFonts(const QFont& base)
    : plain(base),
      name(scaledFont(base, 1.0, QFont::DemiBold)),
      target(scaledFont(base, 1.15, QFont::Bold)),
      small(scaledFont(base, 0.85, QFont::Normal)) {}

const QFont& ChargeRowLayout::fontOf(int column, const ChargeFonts& fonts) {
  if (column == ChargeTableModel::kComponent) return fonts.name;
  return column == ChargeTableModel::kTarget ? fonts.target : fonts.plain;
}

int ChargeRowLayout::wrapping(const QString& text, const QFont& font, int width) {
  const QFontMetrics metrics(font);
  const QStringList words = text.split(QLatin1Char(' '));
  const bool fit = std::ranges::all_of(
      words, [&](const QString& word) { return metrics.horizontalAdvance(word) <= width; });
  return fit ? Qt::TextWordWrap : Qt::TextWrapAnywhere;
}

int ChargeRowLayout::wrappedHeight(const QString& text, const QFont& font, int width) {
  if (text.isEmpty()) return 0;
  return QFontMetrics(font)
      .boundingRect(QRect(0, 0, std::max(1, width), 100000),
                    Qt::AlignLeft | wrapping(text, font, width), text)
      .height();
}

int ChargeRowLayout::widthOf(const QModelIndex& index, const ChargeFonts& fonts) {
  const QString second = index.data(ChargeTableModel::kSecondLineRole).toString();
  const int first = QFontMetrics(fontOf(index.column(), fonts))
                        .horizontalAdvance(index.data(Qt::DisplayRole).toString());
  return std::max(first, QFontMetrics(fonts.small).horizontalAdvance(second)) + 2 * kPadding + 4;
}

ChargeRowLayout::ChargeRowLayout(const QModelIndex& first, const ChargeFonts& fonts, int nameWidth,
                                 int width) {
  const int inside = nameWidth - 2 * kPadding;
  const int names =
      wrappedHeight(first.data(Qt::DisplayRole).toString(), fonts.name, inside) +
      wrappedHeight(first.data(ChargeTableModel::kSecondLineRole).toString(), fonts.small, inside);
  const int plain = QFontMetrics(fonts.target).height() + QFontMetrics(fonts.small).height();
  m_cellsHeight = kTop + std::max(names, plain) + kTop;
  m_height = m_cellsHeight;
  m_textLeft = kPadding + QFontMetrics(fonts.small).height() + 4;
  const int bandWidth = width - m_textLeft - kPadding;
  for (const QString& fault : first.data(ChargeTableModel::kFaultsRole).toStringList())
    add(BandLine::Kind::kFault, fault, fonts, bandWidth);
  if (const QString asked = first.data(ChargeTableModel::kQuestionRole).toString();
      !asked.isEmpty()) {
    add(BandLine::Kind::kQuestion, asked, fonts, bandWidth);
    m_answers = QRect(m_textLeft, m_height, bandWidth, Theme::instance().scaled(kAnswersHeight));
    m_height += m_answers.height();
  }
  for (const QString& notice : first.data(ChargeTableModel::kNoticesRole).toStringList())
    add(BandLine::Kind::kNotice, notice, fonts, bandWidth);
  if (!m_band.empty()) m_height += kTop;
}

void ChargeRowLayout::add(BandLine::Kind kind, const QString& text, const ChargeFonts& fonts,
                          int width) {
  if (m_band.empty()) m_height -= kTop - kBandGap;
  const int height = wrappedHeight(text, fonts.small, width);
  m_band.push_back({kind, text, m_height, height});
  m_height += height + kBandGap;
}

}  // namespace vialkeeper::ui
