// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/stock_sheet.h"

#include <algorithm>

#include "exports/stock_label.h"

namespace vialkeeper::exports {
namespace {

const TextStyle kLabel{7.5, Weight::kRegular, colours::kQuiet};
const TextStyle kName{11.0, Weight::kBold, colours::kInk};
const TextStyle kDetail{8.0, Weight::kRegular, colours::kQuiet};
const TextStyle kTarget{30.0, Weight::kBold, colours::kInk};
const TextStyle kTolerance{12.0, Weight::kRegular, colours::kInk};
const TextStyle kFact{9.5, Weight::kRegular, colours::kInk};
const TextStyle kStep{9.5, Weight::kRegular, colours::kInk};
const TextStyle kStepNumber{9.5, Weight::kBold, colours::kQuiet};
constexpr double kColumnGap_mm = 6.0;

/// What to weigh, as large as it can be read from an arm's length, and a box for what it was.
Block targetBlock(const Setting& setting, const app::StockSheetContent& stock) {
  constexpr double kBoxWidth_mm = 46.0;
  constexpr double kBoxHeight_mm = 15.0;
  const Typesetter& type = setting.typesetter;
  const double left = setting.page.left();
  const double boxLeft = setting.page.right() - kBoxWidth_mm;
  QString target = toQString(stock.target);
  if (!stock.target.empty() && !stock.unit.empty()) target += QChar(QChar::Nbsp);
  target += toQString(stock.unit);
  const double targetWidth = std::clamp(textWidth_mm(type, target, kTarget) + 0.5, 30.0, 74.0);
  const double targetLeft = boxLeft - kColumnGap_mm - targetWidth;
  const double nameWidth = targetLeft - kColumnGap_mm - left;
  const TextBlock number(type, target, kTarget, targetWidth, Align::kRight);
  const TextBlock tolerance(type, toQString(stock.tolerance), kTolerance, targetWidth,
                            Align::kRight);
  const TextBlock weigh(type, QStringLiteral("weigh"), kLabel, nameWidth);
  const TextBlock actual(type, QStringLiteral("actual"), kLabel, kBoxWidth_mm);
  const TextBlock name(type, toQString(stock.name), kName, nameWidth);
  const TextBlock detail(
      type, dotted({toQString(stock.cas), unbroken(stock.molarMass), unbroken(stock.assay)}),
      kDetail, nameWidth);
  const double labelHeight = weigh.height_mm() + 1.0;
  const double height = std::max({name.height_mm() + detail.height_mm(),
                                  number.height_mm() + tolerance.height_mm(), kBoxHeight_mm});
  return {labelHeight + height,
          [=](PagePainter& painter, double y_mm) {
            painter.text(weigh, left, y_mm);
            painter.text(actual, boxLeft, y_mm);
            const double y = y_mm + labelHeight;
            painter.text(name, left, y);
            painter.text(detail, left, y + name.height_mm());
            // The digits' upper edges stand level with the box's.
            painter.text(number, targetLeft, y - number.ascent_mm() * 0.12);
            painter.text(tolerance, targetLeft, y + number.height_mm() * 0.94);
            painter.box({boxLeft, y, kBoxWidth_mm, kBoxHeight_mm});
          },
          setting.density.sectionGap_mm};
}

/// Labels above their values, side by side, as many on a line as there is room for.
Blocks factBlocks(const Setting& setting, const std::vector<Entry>& facts) {
  constexpr std::size_t kPerLine = 3;
  const double width = (setting.page.contentWidth() - kColumnGap_mm * (kPerLine - 1)) /
                       static_cast<double>(kPerLine);
  Blocks blocks;
  for (std::size_t first = 0; first < facts.size(); first += kPerLine) {
    std::vector<std::pair<TextBlock, TextBlock>> cells;
    double height = 0.0;
    for (std::size_t i = first; i < std::min(first + kPerLine, facts.size()); ++i) {
      const auto& cell =
          cells.emplace_back(TextBlock(setting.typesetter, facts[i].label, kLabel, width),
                             TextBlock(setting.typesetter, facts[i].value, kFact, width));
      height = std::max(height, cell.first.height_mm() + 0.4 + cell.second.height_mm());
    }
    const double left = setting.page.left();
    blocks.push_back({height,
                      [cells, left, width](PagePainter& painter, double y_mm) {
                        double x = left;
                        for (const auto& [label, value] : cells) {
                          painter.text(label, x, y_mm);
                          painter.text(value, x, y_mm + label.height_mm() + 0.4);
                          x += width + kColumnGap_mm;
                        }
                      },
                      first == 0 ? setting.density.sectionGap_mm : 3.0});
  }
  return blocks;
}

Blocks stepBlocks(const Setting& setting, const std::vector<std::string>& steps) {
  constexpr double kTick_mm = 5.5;
  constexpr double kNumberLeft_mm = 9.0;
  constexpr double kTextLeft_mm = 16.0;
  constexpr double kSpace_mm = 2.2;
  Blocks blocks;
  const double left = setting.page.left();
  for (std::size_t i = 0; i < steps.size(); ++i) {
    const TextBlock number(setting.typesetter, QString::number(i + 1), kStepNumber, 7.0);
    const TextBlock text(setting.typesetter, toQString(steps[i]), kStep,
                         setting.page.contentWidth() - kTextLeft_mm);
    blocks.push_back({std::max(kTick_mm, text.height_mm() + 1.4),
                      [=](PagePainter& painter, double y_mm) {
                        painter.tickBox(left, y_mm, kTick_mm);
                        painter.text(number, left + kNumberLeft_mm, y_mm + 0.7);
                        painter.text(text, left + kTextLeft_mm, y_mm + 0.7);
                      },
                      i == 0 ? setting.density.sectionGap_mm : kSpace_mm});
  }
  return blocks;
}

/// The formula, and a line for what comes out of it.
Block formulaBlock(const Setting& setting, const std::string& formula) {
  constexpr double kBlank_mm = 46.0;
  const double left = setting.page.left();
  const double blankLeft = setting.page.right() - kBlank_mm;
  const double width = blankLeft - kColumnGap_mm - left;
  const TextBlock label(setting.typesetter, QStringLiteral("formula"), kLabel, width);
  const TextBlock result(setting.typesetter, QStringLiteral("actual concentration"), kLabel,
                         kBlank_mm);
  const TextBlock text(setting.typesetter, toQString(formula), kFact, width);
  if (text.isEmpty()) return {};
  const double height = label.height_mm() + 0.6 + text.height_mm();
  return {height,
          [=](PagePainter& painter, double y_mm) {
            painter.text(label, left, y_mm);
            painter.text(text, left, y_mm + label.height_mm() + 0.6);
            painter.text(result, blankLeft, y_mm);
            painter.rule(blankLeft, y_mm + label.height_mm() + 0.6 + text.ascent_mm() + 0.6,
                         kBlank_mm, colours::kBox, 0.25);
          },
          setting.density.sectionGap_mm};
}

Block ruleBlock(const Setting& setting) {
  const double left = setting.page.left();
  const double width = setting.page.contentWidth();
  return {0.0,
          [left, width](PagePainter& painter, double y_mm) { painter.rule(left, y_mm, width); },
          setting.density.sectionGap_mm * 0.8};
}

std::vector<Entry> factsOf(const app::StockSheetContent& stock) {
  std::vector<Entry> facts;
  const auto add = [&facts](const char* label, const std::string& value) {
    if (!value.empty()) facts.push_back({QString::fromLatin1(label), toQString(value)});
  };
  add("concentration", stock.concentration);
  add("solvent", stock.solvent);
  add("flask", stock.flask);
  add("transfer", stock.transfer);
  add("serves", stock.serves);
  return facts;
}

void addSteps(PageFlow& flow, const Setting& setting, const app::StockSheetContent& stock) {
  flow.add(ruleBlock(setting));
  flow.add(targetBlock(setting, stock));
  flow.add(ruleBlock(setting));
  for (const Block& block : factBlocks(setting, factsOf(stock))) flow.add(block);
  for (const Block& block : stepBlocks(setting, stock.steps)) flow.add(block);
  if (const Block formula = formulaBlock(setting, stock.formula); formula.height_mm > 0.0) {
    flow.add(formula);
  }
  Blocks notices =
      noticeBlocks(setting, stock.notices, setting.page.left(), setting.page.contentWidth());
  for (std::size_t i = 0; i < notices.size(); ++i) {
    notices[i].gap_mm = i == 0 ? setting.density.sectionGap_mm * 0.7 : 1.2;
    flow.add(notices[i]);
  }
}

struct Laid {
  PageFlow flow;
  bool hasNotes = false;
};

Laid layOut(const Setting& setting, const app::StockSheetContent& stock,
            const std::optional<QrCode>& qr) {
  Laid laid{PageFlow(setting.page, furniture(setting, stock.code, stock.title, stock.footer))};
  // The title says what the page is for; the run's code only to whom it belongs.
  const std::vector<Entry> entries{{QStringLiteral("for run"), toQString(stock.forRun)}};
  const std::string code = stock.forRun.starts_with(stock.code) ? std::string() : stock.code;
  laid.flow.add(mastheadBlock(setting, {code, true, stock.title, entries, qr}));
  addSteps(laid.flow, setting, stock);
  Blocks tail =
      besideCautions(setting, stockLabelBlock(setting, stock), kStockLabelWidth_mm, stock.cautions);
  for (Block& block : hazardBlocks(setting, stock.hazards)) tail.push_back(std::move(block));
  laid.flow.addTogether(tail);
  laid.hasNotes = closePage(laid.flow, setting,
                            {QStringLiteral("made by"), QStringLiteral("date"),
                             QStringLiteral("lot"), QStringLiteral("use before")});
  return laid;
}

}  // namespace

PageFlow layOutStockSheet(const Typesetter& typesetter, const PageGeometry& page,
                          const app::StockSheetContent& content, const std::optional<QrCode>& qr) {
  const Laid loose = layOut({typesetter, page, {2.2, 9.5, 7.0, 0.0, 0.0}}, content, qr);
  if (loose.flow.pages() == 1) return loose.flow;
  const Laid tight = layOut({typesetter, page, {0.9, 8.5, 4.0, 0.0, 0.0}}, content, qr);
  return tight.flow.pages() < loose.flow.pages() ? tight.flow : loose.flow;
}

}  // namespace vialkeeper::exports
