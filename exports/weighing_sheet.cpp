// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/weighing_sheet.h"

#include <algorithm>

#include "exports/scheme_drawing.h"
#include "exports/vial_drawing.h"
#include "exports/weighing_table.h"

namespace vialkeeper::exports {
namespace {

const TextStyle kHeadline{11.0, Weight::kBold, colours::kInk};
const TextStyle kVerdict{8.5, Weight::kBold, colours::kInk};
constexpr double kVialBlockShare = 0.47;

/// From loose to tight; the boxes stay large enough for a gloved hand.
constexpr Density kDensities[] = {{2.2, 9.5, 7.0, 6.0, 38.0, 36.0, 8.0, 1.3},
                                  {1.8, 9.2, 6.2, 5.5, 35.0, 34.0, 8.0, 1.2},
                                  {1.5, 9.0, 5.5, 5.0, 32.0, 32.0, 8.0, 1.1},
                                  {1.1, 8.6, 4.6, 4.6, 29.0, 30.0, 7.7, 0.9},
                                  {0.9, 8.5, 3.8, 4.2, 26.0, 28.0, 7.5, 0.7}};

struct Laid {
  PageFlow flow;
  bool hasNotes = false;
  bool isVialBelowTable = false;  ///< on the page on which the table ends
};

/// What stands beside the vial, top to bottom.
Blocks vialTexts(const Setting& setting, const app::VialContent& vial, double x_mm,
                 double width_mm) {
  Blocks blocks;
  const auto add = [&](const std::string& text, const TextStyle& style, double gap_mm) {
    const TextBlock set(setting.typesetter, toQString(text), style, width_mm);
    if (set.isEmpty()) return;
    blocks.push_back({set.height_mm(),
                      [set, x_mm](PagePainter& painter, double y) { painter.text(set, x_mm, y); },
                      gap_mm});
  };
  const TextStyle line{.size_pt = setting.density.body_pt};
  const double between = setting.density.paragraph_mm / 2.0;
  const TextBlock title = heading(setting, QStringLiteral("Vial"));
  blocks.push_back({title.height_mm(), [title, x_mm](PagePainter& painter, double y) {
                      painter.text(title, x_mm, y);
                    }});
  if (vial.forecast) {
    add(vial.forecast->headline, kHeadline, 1.6);
    add(vial.forecast->verdict, kVerdict, 0.6);
    for (const std::string& text : vial.forecast->lines) add(text, line, between);
  }
  for (std::size_t i = 0; i < vial.lines.size(); ++i) {
    add(vial.lines[i], line, i == 0 ? 1.6 : between);
  }
  return blocks;
}

Block vialBlock(const Setting& setting, const app::VialContent& vial) {
  if (vial.lines.empty() && !vial.forecast && vial.fill <= 0.0) return {};
  constexpr double kVialGap_mm = 6.0;
  const double left = setting.page.left();
  const double vialHeight = setting.density.vial_mm;
  const double vialWidth = vialHeight * kVialAspect;
  const double textLeft = left + vialWidth + kVialGap_mm;
  const double textWidth = kVialBlockShare * setting.page.contentWidth() - vialWidth - kVialGap_mm;
  const Blocks texts = vialTexts(setting, vial, textLeft, textWidth);
  return {std::max(vialHeight, heightOf(texts)),
          [=, fill = vial.fill](PagePainter& painter, double y_mm) {
            drawVial(painter, left, y_mm, vialHeight, fill);
            for (std::size_t i = 0; i < texts.size(); ++i) {
              if (i > 0) y_mm += texts[i].gap_mm;
              texts[i].draw(painter, y_mm);
              y_mm += texts[i].height_mm;
            }
          },
          setting.density.sectionGap_mm};
}

void addScheme(PageFlow& flow, const Setting& setting, const app::SchemeContent& scheme,
               const SchemePictures& pictures) {
  SchemeSize size;
  size.width_mm = setting.page.contentWidth();
  size.bond_mm = setting.density.bond_mm;
  size.structure_mm = setting.density.structure_mm;
  Blocks blocks = schemeBlocks(setting.typesetter, scheme, pictures, size, setting.page.left());
  if (blocks.empty()) return;
  blocks.front().gap_mm = setting.density.sectionGap_mm;
  flow.addTogether(blocks);
}

/// What belongs together: on this page if there is room, else on a new one; what no page can hold
/// begins on a new one rather than at the end of this.
void addGroup(PageFlow& flow, const Blocks& group) {
  const bool fitsAPage = heightOf(group) <= flow.emptyPage_mm();
  if (!fitsAPage && flow.remaining_mm() < flow.emptyPage_mm() / 2.0) flow.newPage();
  flow.addTogether(group);
}

Laid layOut(const Setting& setting, const app::SheetContent& content,
            const SchemePictures& pictures, const std::optional<QrCode>& qr) {
  Laid laid{
      PageFlow(setting.page, furniture(setting, content.code, content.title, content.footer))};
  Masthead masthead{content.code, content.codeIsMark, content.title, {}, qr};
  if (!content.series.empty()) {
    masthead.entries.push_back({QStringLiteral("series"), toQString(content.series)});
  }
  masthead.entries.push_back({QStringLiteral("date"), toQString(content.date)});
  masthead.entries.push_back({QStringLiteral("chemist"), toQString(content.chemist)});
  laid.flow.add(mastheadBlock(setting, masthead));
  addScheme(laid.flow, setting, content.scheme, pictures);
  addWeighingTable(laid.flow, setting, content.rows);
  for (Block& notice :
       noticeBlocks(setting, content.notices, setting.page.left(), setting.page.contentWidth())) {
    notice.gap_mm = 1.6;
    laid.flow.add(notice);
  }
  const int tablePages = laid.flow.pages();
  addGroup(laid.flow,
           besideCautions(setting, vialBlock(setting, content.vial),
                          kVialBlockShare * setting.page.contentWidth(), content.cautions));
  laid.isVialBelowTable = laid.flow.pages() == tablePages;
  addGroup(laid.flow, hazardBlocks(setting, content.hazards));
  laid.hasNotes = closePage(laid.flow, setting,
                            {QStringLiteral("weighed by"), QStringLiteral("date"),
                             QStringLiteral("lamp on at"), QStringLiteral("start pressure")});
  return laid;
}

}  // namespace

PageFlow layOutWeighingSheet(const Typesetter& typesetter, const PageGeometry& page,
                             const app::SheetContent& content, const SchemePictures& pictures,
                             const std::optional<QrCode>& qr) {
  std::vector<Laid> layouts;
  for (const Density& density : kDensities) {
    layouts.push_back(layOut({typesetter, page, density}, content, pictures, qr));
  }
  // Fewest pages first, then the vial with the table, then room for notes, then the looser one,
  // which stands first.
  const auto better = [](const Laid& a, const Laid& b) {
    if (a.flow.pages() != b.flow.pages()) return a.flow.pages() < b.flow.pages();
    if (a.isVialBelowTable != b.isVialBelowTable) return a.isVialBelowTable;
    return a.hasNotes && !b.hasNotes;
  };
  return std::min_element(layouts.begin(), layouts.end(), better)->flow;
}

}  // namespace vialkeeper::exports
