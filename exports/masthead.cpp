// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>

#include "exports/page_parts.h"

namespace vialkeeper::exports {
namespace {

const TextStyle kCode{21.0, Weight::kBold, colours::kInk};
const TextStyle kMark{12.5, Weight::kRegular, colours::kQuiet};
const TextStyle kTitle{12.5, Weight::kBold, colours::kInk};
const TextStyle kTitleAlone{16.0, Weight::kBold, colours::kInk};
const TextStyle kLabel{8.0, Weight::kRegular, colours::kQuiet};
const TextStyle kValue{9.0, Weight::kRegular, colours::kInk};
const TextStyle kHeadCode{8.5, Weight::kBold, colours::kInk};
const TextStyle kHeadTitle{8.5, Weight::kRegular, colours::kQuiet};
const TextStyle kFoot{7.0, Weight::kRegular, colours::kQuiet};

/// An entry in its place, relative to the masthead's corner.
struct PlacedEntry {
  TextBlock label;
  TextBlock value;
  double x_mm = 0.0;
  double y_mm = 0.0;
};

/// Entries from left to right, on as many lines as they need.
std::vector<PlacedEntry> placeEntries(const Setting& setting, const std::vector<Entry>& entries,
                                      double width_mm, double y_mm) {
  constexpr double kBetween_mm = 8.0;
  constexpr double kBlank_mm = 34.0;
  constexpr double kAfterLabel_mm = 1.8;
  std::vector<PlacedEntry> placed;
  double x = 0.0;
  double lineHeight = 0.0;
  for (const Entry& entry : entries) {
    PlacedEntry place;
    place.label = TextBlock(setting.typesetter, entry.label, kLabel, width_mm);
    const double labelWidth = place.label.width_mm() + kAfterLabel_mm;
    const double wanted = entry.value.isEmpty()
                              ? kBlank_mm
                              : textWidth_mm(setting.typesetter, entry.value, kValue) + 0.5;
    if (x > 0.0 && x + labelWidth + wanted > width_mm) {
      x = 0.0;
      y_mm += lineHeight + 1.0;
      lineHeight = 0.0;
    }
    const double valueWidth = std::min(wanted, width_mm - labelWidth);
    place.value = TextBlock(setting.typesetter, entry.value, kValue, valueWidth);
    place.x_mm = x;
    place.y_mm = y_mm;
    lineHeight = std::max({lineHeight, place.value.height_mm(), place.label.height_mm() + 0.8});
    x += labelWidth + valueWidth + kBetween_mm;
    placed.push_back(std::move(place));
  }
  return placed;
}

void drawEntry(PagePainter& painter, const PlacedEntry& entry, double x_mm, double y_mm) {
  constexpr double kBlank_mm = 34.0;
  constexpr double kAfterLabel_mm = 1.8;
  const double top = y_mm + entry.y_mm;
  const double baseline = top + std::max(entry.label.ascent_mm(), entry.value.ascent_mm());
  const double valueLeft = x_mm + entry.x_mm + entry.label.width_mm() + kAfterLabel_mm;
  painter.text(entry.label, x_mm + entry.x_mm, baseline - entry.label.ascent_mm());
  painter.text(entry.value, valueLeft, baseline - entry.value.ascent_mm());
  if (entry.value.isEmpty())
    painter.rule(valueLeft, baseline + 0.6, kBlank_mm, colours::kBox, 0.25);
}

/// Code and title: beside each other on one baseline if both fit, else the title below.
struct Names {
  TextBlock code;
  TextBlock title;
  double codeTop_mm = 0.0;
  double titleLeft_mm = 0.0;
  double titleTop_mm = 0.0;
  double height_mm = 0.0;
};

Names namesOf(const Setting& setting, const Masthead& masthead, double width_mm) {
  constexpr double kBetween_mm = 3.6;
  const TextStyle codeStyle = masthead.codeIsMark ? kMark : kCode;
  const QString title = toQString(masthead.title);
  Names names;
  names.code = TextBlock(setting.typesetter, toQString(masthead.code), codeStyle, width_mm);
  const double beside = width_mm - names.code.width_mm() - kBetween_mm;
  TextStyle titleStyle = masthead.codeIsMark ? kTitleAlone : kTitle;
  bool isBeside = false;
  for (const double size : {12.5, 11.8, 11.0}) {
    if (isBeside || names.code.lines() != 1 || masthead.codeIsMark) break;
    titleStyle.size_pt = size;
    isBeside = textWidth_mm(setting.typesetter, title, titleStyle) < beside;
  }
  if (!isBeside && !masthead.codeIsMark) titleStyle = kTitle;
  names.title = TextBlock(setting.typesetter, title, titleStyle, isBeside ? beside : width_mm);
  if (isBeside) {
    names.titleLeft_mm = names.code.width_mm() + kBetween_mm;
    names.titleTop_mm = names.code.ascent_mm() - names.title.ascent_mm();
    names.height_mm = names.code.height_mm();
  } else if (masthead.codeIsMark) {
    names.codeTop_mm = names.title.height_mm();
    names.height_mm = names.codeTop_mm + names.code.height_mm();
  } else {
    names.titleTop_mm = names.code.height_mm();
    names.height_mm = names.titleTop_mm + names.title.height_mm();
  }
  return names;
}

}  // namespace

Block mastheadBlock(const Setting& setting, const Masthead& masthead) {
  constexpr double kAfterNames_mm = 1.8;
  const double left = setting.page.left();
  const double qrSide = masthead.qr ? masthead.qr->side_mm() : 0.0;
  const double qrLeft = setting.page.right() - qrSide;
  const double width =
      masthead.qr ? qrLeft - masthead.qr->quietZone_mm() - 2.0 - left : setting.page.contentWidth();
  const Names names = namesOf(setting, masthead, width);
  const std::vector<PlacedEntry> entries =
      placeEntries(setting, masthead.entries, width, names.height_mm + kAfterNames_mm);
  double height =
      std::max(names.height_mm, qrSide + (masthead.qr ? masthead.qr->quietZone_mm() : 0.0));
  for (const PlacedEntry& entry : entries) {
    height = std::max(
        {height, entry.y_mm + entry.value.height_mm(), entry.y_mm + entry.label.height_mm() + 1.0});
  }
  return {height, [=, qr = masthead.qr](PagePainter& painter, double y_mm) {
            painter.text(names.code, left, y_mm + names.codeTop_mm);
            painter.text(names.title, left + names.titleLeft_mm, y_mm + names.titleTop_mm);
            for (const PlacedEntry& entry : entries) drawEntry(painter, entry, left, y_mm);
            if (!qr) return;
            painter.device().setRenderHint(QPainter::Antialiasing, false);
            painter.fill(qr->path, qrLeft, y_mm, qrSide / qr->modules, QColor(Qt::black));
            painter.device().setRenderHint(QPainter::Antialiasing, true);
          }};
}

PageFurniture furniture(const Setting& setting, const std::string& code, const std::string& title,
                        const std::string& footer) {
  constexpr double kFootGap_mm = 3.0;
  constexpr double kNumber_mm = 30.0;
  const Typesetter typesetter = setting.typesetter;
  const PageGeometry page = setting.page;
  const QString codeLine =
      shortened(typesetter, toQString(code), kHeadCode, page.contentWidth() / 2);
  const double codeWidth = textWidth_mm(typesetter, codeLine, kHeadCode);
  const double titleLeft = codeLine.isEmpty() ? 0.0 : codeWidth + 2.5;
  const double titleWidth = page.contentWidth() - titleLeft;
  const TextBlock headCode(typesetter, codeLine, kHeadCode, page.contentWidth());
  const TextBlock headTitle(typesetter,
                            shortened(typesetter, toQString(title), kHeadTitle, titleWidth - 1.0),
                            kHeadTitle, titleWidth);
  const TextBlock foot(typesetter, toQString(footer), kFoot,
                       page.contentWidth() - kNumber_mm - 4.0);
  const double number = TextBlock(typesetter, QStringLiteral("0"), kFoot, kNumber_mm).height_mm();
  PageFurniture furniture;
  furniture.headHeight_mm = std::max(headCode.height_mm(), headTitle.height_mm()) + 6.0;
  furniture.footHeight_mm = kFootGap_mm + std::max(foot.height_mm(), number);
  furniture.head = [=](PagePainter& painter, double y_mm) {
    painter.text(headCode, page.left(), y_mm);
    painter.text(headTitle, page.left() + titleLeft, y_mm);
    painter.rule(page.left(), y_mm + headTitle.height_mm() + 1.4, page.contentWidth());
  };
  furniture.foot = [=](PagePainter& painter, double y_mm, int onPage, int pages) {
    const QString text = QStringLiteral("page %1 of %2").arg(onPage).arg(pages);
    painter.text(foot, page.left(), y_mm + kFootGap_mm);
    painter.text(TextBlock(typesetter, text, kFoot, kNumber_mm, Align::kRight),
                 page.right() - kNumber_mm, y_mm + kFootGap_mm);
  };
  return furniture;
}

}  // namespace vialkeeper::exports
