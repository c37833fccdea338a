// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/stock_label.h"

#include <QSet>
#include <QStringList>
#include <algorithm>
#include <cctype>
#include <cmath>

namespace vialkeeper::exports {
namespace {

const TextStyle kHint{7.0, Weight::kRegular, colours::kQuiet};
const TextStyle kName{11.0, Weight::kBold, colours::kInk};
const TextStyle kContents{9.0, Weight::kRegular, colours::kInk};
const TextStyle kSmall{7.5, Weight::kRegular, colours::kInk};
constexpr double kPad_mm = 3.5;
constexpr double kInside_mm = kStockLabelWidth_mm - 2.0 * kPad_mm;

/// `H302`, `EUH066`, `P280`: letters, then a digit.
bool isCode(const QString& word) {
  qsizetype letters = 0;
  while (letters < word.size() && word[letters].isUpper()) ++letters;
  return letters > 0 && letters < word.size() && word[letters].isDigit();
}

/// The codes with which the statements begin (`H301 + H311 Toxic …`), each once.
QString hazardCodes(const std::vector<app::HazardContent>& hazards) {
  QStringList codes;
  for (const app::HazardContent& hazard : hazards) {
    for (const std::string& statement : hazard.statements) {
      QStringList leading;
      for (const QString& word : toQString(statement).split(QLatin1Char(' '), Qt::SkipEmptyParts)) {
        if (word != QLatin1String("+") && !isCode(word)) break;
        leading << word;
      }
      const QString code = leading.join(QLatin1Char(' '));
      if (!code.isEmpty() && !codes.contains(code)) codes << code;
    }
  }
  return codes.join(QStringLiteral(" · "));
}

/// `date ____  initials ____` over the label's width.
void drawBlanks(PagePainter& painter, const TextBlock& date, const TextBlock& initials, double x_mm,
                double y_mm) {
  const double half = kInside_mm / 2.0;
  const double baseline = y_mm + date.ascent_mm();
  painter.text(date, x_mm, y_mm);
  painter.rule(x_mm + date.width_mm() + 1.5, baseline + 0.5, half - date.width_mm() - 4.0,
               colours::kBox, 0.25);
  painter.text(initials, x_mm + half, y_mm);
  painter.rule(x_mm + half + initials.width_mm() + 1.5, baseline + 0.5,
               half - initials.width_mm() - 1.5, colours::kBox, 0.25);
}

}  // namespace

Block stockLabelBlock(const Setting& setting, const app::StockSheetContent& stock) {
  constexpr double kHintGap_mm = 1.2;
  constexpr double kBlankGap_mm = 4.0;
  const auto set = [&](const QString& text, const TextStyle& style) {
    return TextBlock(setting.typesetter, text, style, kInside_mm);
  };
  const TextBlock hint = set(QStringLiteral("label for the bottle, to cut out"), kHint);
  const TextBlock name = set(toQString(stock.name), kName);
  std::string contents = stock.concentration;
  if (!contents.empty() && !stock.solvent.empty()) contents += " in ";
  const TextBlock strength = set(toQString(contents + stock.solvent), kContents);
  const TextBlock forRun = set(toQString(stock.code), kSmall);
  const TextBlock codes = set(hazardCodes(stock.hazards), kSmall);
  const TextBlock date = set(QStringLiteral("date"), kSmall);
  const TextBlock initials = set(QStringLiteral("initials"), kSmall);
  const double texts = name.height_mm() + strength.height_mm() + forRun.height_mm();
  const double inside =
      std::max(26.0, texts + 2.0 * kBlankGap_mm + date.height_mm() + codes.height_mm());
  const double top = hint.height_mm() + kHintGap_mm;
  const double left = setting.page.left();
  return {top + inside + 2.0 * kPad_mm,
          [=](PagePainter& painter, double y_mm) {
            painter.text(hint, left, y_mm);
            painter.dashedBox({left, y_mm + top, kStockLabelWidth_mm, inside + 2.0 * kPad_mm});
            const double x = left + kPad_mm;
            double y = y_mm + top + kPad_mm;
            for (const TextBlock& text : {name, strength, forRun}) {
              painter.text(text, x, y);
              y += text.height_mm();
            }
            const double codesTop = y_mm + top + kPad_mm + inside - codes.height_mm();
            painter.text(codes, x, codesTop);
            drawBlanks(painter, date, initials, x,
                       codesTop - date.height_mm() - (codes.isEmpty() ? 1.0 : 2.5));
          },
          setting.density.sectionGap_mm};
}

}  // namespace vialkeeper::exports
