// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/page_parts.h"

#include <algorithm>
#include <functional>
#include <iterator>

namespace vialkeeper::exports {
namespace {

const TextStyle kHeading{8.5, Weight::kBold, colours::kInk};
const TextStyle kBody{8.0, Weight::kRegular, colours::kInk};
const TextStyle kNotice{7.8, Weight::kRegular, colours::kWarning};

constexpr double kAfterHeading_mm = 1.6;

TextStyle body(const Setting& setting, Weight weight = Weight::kRegular) {
  return {.size_pt = setting.density.body_pt, .weight = weight, .colour = colours::kInk};
}

/// A paragraph as a block at a fixed left edge.
Block textBlock(const TextBlock& text, double x_mm, double gap_mm) {
  return {text.height_mm(),
          [text, x_mm](PagePainter& painter, double y_mm) { painter.text(text, x_mm, y_mm); },
          gap_mm};
}

using Mark = std::function<void(PagePainter&, double y_mm)>;

/// A paragraph that may be longer than a page, with a mark beside its first line.
Blocks markedParagraph(const TextBlock& text, double x_mm, double gap_mm, const Mark& mark) {
  Blocks blocks = paragraphBlocks(text, x_mm, gap_mm);
  if (blocks.empty()) return blocks;
  blocks.front().draw = [mark, draw = blocks.front().draw](PagePainter& painter, double y_mm) {
    mark(painter, y_mm);
    draw(painter, y_mm);
  };
  return blocks;
}

void append(Blocks& blocks, Blocks more) {
  std::move(more.begin(), more.end(), std::back_inserter(blocks));
}

Blocks cautionBlocks(const Setting& setting, const std::vector<std::string>& cautions, double x_mm,
                     double width_mm) {
  constexpr double kIndent_mm = 3.2;
  Blocks blocks;
  if (cautions.empty()) return blocks;
  blocks.push_back(textBlock(heading(setting, QStringLiteral("Cautions")), x_mm, 0.0));
  blocks.back().isHeading = true;
  for (const std::string& caution : cautions) {
    const TextBlock text(setting.typesetter, toQString(caution), body(setting),
                         width_mm - kIndent_mm);
    const Mark dot = [x_mm, middle = text.ascent_mm() * 0.66](PagePainter& painter, double y_mm) {
      QPainterPath path;
      path.addEllipse(QPointF(0.0, 0.0), 0.5, 0.5);
      painter.fill(path, x_mm + 0.6, y_mm + middle, 1.0, colours::kInk);
    };
    const double gap = blocks.size() == 1 ? kAfterHeading_mm : setting.density.paragraph_mm;
    append(blocks, markedParagraph(text, x_mm + kIndent_mm, gap, dot));
  }
  return blocks;
}

/// A statement whose code is not parted from its first word: `H302 Harmful if swallowed`.
QString codeBound(QString statement) {
  const qsizetype blank = statement.indexOf(QLatin1Char(' '));
  if (blank > 0 && blank <= 7) statement[blank] = QChar(QChar::Nbsp);
  return statement;
}

/// Several blocks as one.
Block merged(const Blocks& blocks) {
  return {heightOf(blocks), [blocks](PagePainter& painter, double y_mm) {
            for (std::size_t i = 0; i < blocks.size(); ++i) {
              if (i > 0) y_mm += blocks[i].gap_mm;
              blocks[i].draw(painter, y_mm);
              y_mm += blocks[i].height_mm;
            }
          }};
}

/// Each substance's name with its statements behind it.
std::vector<TextBlock> hazardEntries(const Setting& setting,
                                     const std::vector<app::HazardContent>& hazards,
                                     double width_mm) {
  std::vector<TextBlock> entries;
  for (const app::HazardContent& hazard : hazards) {
    std::vector<QString> statements;
    for (const std::string& statement : hazard.statements) {
      statements.push_back(codeBound(toQString(statement)));
    }
    QString name = toQString(hazard.name);
    if (!name.isEmpty()) name += QStringLiteral("  ");
    entries.emplace_back(setting.typesetter,
                         std::vector<TextRun>{{name, body(setting, Weight::kBold)},
                                              {dotted(statements), body(setting)}},
                         width_mm);
  }
  return entries;
}

/// Paragraphs in two columns, the first no shorter than it must be to hold half of the height.
Block columnsBlock(const std::vector<TextBlock>& texts, double left_mm, double right_mm,
                   double gap_mm) {
  const auto height = [&](std::size_t first, std::size_t last) {
    double sum = 0.0;
    for (std::size_t i = first; i < last; ++i) {
      sum += texts[i].height_mm() + (i > first ? gap_mm : 0.0);
    }
    return sum;
  };
  std::size_t split = 0;
  double least = height(0, texts.size());
  for (std::size_t i = 1; i <= texts.size(); ++i) {
    const double higher = std::max(height(0, i), height(i, texts.size()));
    if (split > 0 && higher >= least) continue;
    split = i;
    least = higher;
  }
  return {least,
          [=](PagePainter& painter, double y_mm) {
            double y = y_mm;
            for (std::size_t i = 0; i < texts.size(); ++i) {
              if (i == split) y = y_mm;
              painter.text(texts[i], i < split ? left_mm : right_mm, y);
              y += texts[i].height_mm() + gap_mm;
            }
          },
          gap_mm};
}

}  // namespace

Blocks paragraphBlocks(const TextBlock& text, double x_mm, double gap_mm) {
  constexpr int kLinesTogether = 20;
  Blocks blocks;
  for (int line = 0; line < text.lines(); line += kLinesTogether) {
    blocks.push_back(textBlock(text.slice(line, kLinesTogether), x_mm, line == 0 ? gap_mm : 0.0));
  }
  return blocks;
}

TextBlock heading(const Setting& setting, const QString& text) {
  return TextBlock(setting.typesetter, text, kHeading, setting.page.contentWidth());
}

QString dotted(const std::vector<QString>& texts) {
  QString line;
  for (const QString& text : texts) {
    if (text.isEmpty()) continue;
    if (!line.isEmpty()) line += QStringLiteral("\u00A0· ");
    line += text;
  }
  return line;
}

QString unbroken(const std::string& text) {
  return toQString(text).replace(QLatin1Char(' '), QChar(QChar::Nbsp));
}

Blocks noticeBlocks(const Setting& setting, const std::vector<std::string>& notices, double x_mm,
                    double width_mm) {
  constexpr double kSign_mm = 2.9;
  constexpr double kIndent_mm = 4.2;
  Blocks blocks;
  for (const std::string& notice : notices) {
    const TextBlock text(setting.typesetter, toQString(notice), kNotice, width_mm - kIndent_mm);
    const Mark sign = [x_mm, ascent = text.ascent_mm()](PagePainter& painter, double y_mm) {
      painter.warningSign(x_mm, y_mm + ascent - kSign_mm * 0.9, kSign_mm);
    };
    append(blocks, markedParagraph(text, x_mm + kIndent_mm, 0.8, sign));
  }
  return blocks;
}

Blocks hazardBlocks(const Setting& setting, const std::vector<app::HazardContent>& hazards) {
  constexpr double kColumnGap_mm = 7.0;
  constexpr double kTooLong_mm = 40.0;
  constexpr double kTogether_mm = 240.0;  // in both columns: what no page's end comes between
  Blocks blocks;
  if (hazards.empty()) return blocks;
  const double left = setting.page.left();
  blocks.push_back(
      textBlock(heading(setting, QStringLiteral("Hazards")), left, setting.density.sectionGap_mm));
  blocks.back().isHeading = true;
  const double width = setting.page.contentWidth();
  const double half = (width - kColumnGap_mm) / 2.0;
  const std::vector<TextBlock> entries = hazardEntries(setting, hazards, half);
  const bool inColumns =
      entries.size() > 1 && std::ranges::all_of(entries, [](const TextBlock& entry) {
        return entry.height_mm() <= kTooLong_mm;
      });
  if (inColumns) {
    std::vector<TextBlock> together;
    double height = 0.0;
    for (const TextBlock& entry : entries) {
      together.push_back(entry);
      height += entry.height_mm();
      if (height < kTogether_mm && &entry != &entries.back()) continue;
      blocks.push_back(
          columnsBlock(together, left, left + half + kColumnGap_mm, setting.density.paragraph_mm));
      together.clear();
      height = 0.0;
    }
  } else {
    for (const TextBlock& entry : hazardEntries(setting, hazards, width)) {
      append(blocks, paragraphBlocks(entry, left, setting.density.paragraph_mm));
    }
  }
  if (blocks.size() > 1) blocks[1].gap_mm = kAfterHeading_mm;
  return blocks;
}

Blocks besideCautions(const Setting& setting, const Block& left, double leftWidth_mm,
                      const std::vector<std::string>& cautions) {
  constexpr double kColumnGap_mm = 8.0;
  constexpr double kTooLong_mm = 110.0;
  const double x = setting.page.left() + leftWidth_mm + kColumnGap_mm;
  const Blocks column = cautionBlocks(setting, cautions, x, setting.page.right() - x);
  const bool hasLeft = left.height_mm > 0.0;
  if (!hasLeft || heightOf(column) > std::max(kTooLong_mm, left.height_mm)) {
    Blocks blocks =
        cautionBlocks(setting, cautions, setting.page.left(), setting.page.contentWidth());
    if (!blocks.empty()) blocks.front().gap_mm = setting.density.sectionGap_mm;
    if (hasLeft) blocks.insert(blocks.begin(), left);
    return blocks;
  }
  const Block right = merged(column);
  return {{std::max(left.height_mm, right.height_mm),
           [left, right](PagePainter& painter, double y_mm) {
             left.draw(painter, y_mm);
             right.draw(painter, y_mm);
           },
           left.gap_mm}};
}

Block signBlock(const Setting& setting, const std::vector<QString>& labels) {
  constexpr double kGap_mm = 4.0;
  constexpr double kHeight_mm = 9.0;
  std::vector<TextBlock> texts;
  double used = kGap_mm * static_cast<double>(labels.size() - 1);
  for (const QString& label : labels) {
    texts.emplace_back(setting.typesetter, label, kBody, setting.page.contentWidth());
    used += texts.back().width_mm() + 1.5;
  }
  const double line = (setting.page.contentWidth() - used) / static_cast<double>(labels.size());
  const double left = setting.page.left();
  return {kHeight_mm, [texts, line, left](PagePainter& painter, double y_mm) {
            const double baseline = y_mm + kHeight_mm - 1.5;
            double x = left;
            for (const TextBlock& text : texts) {
              painter.text(text, x, baseline - text.ascent_mm());
              x += text.width_mm() + 1.5;
              painter.rule(x, baseline + 0.5, line, colours::kBox, 0.25);
              x += line + kGap_mm;
            }
          }};
}

bool closePage(PageFlow& flow, const Setting& setting, const std::vector<QString>& signLabels) {
  constexpr double kLeastNotes_mm = 14.0;  // the heading and one line
  constexpr double kLine_mm = 8.0;
  const Block sign = signBlock(setting, signLabels);
  if (flow.remaining_mm() < sign.height_mm + 2.0) flow.newPage();
  const double room = flow.remaining_mm() - sign.height_mm - setting.density.sectionGap_mm;
  const bool hasNotes = room >= kLeastNotes_mm;
  if (hasNotes) {
    const TextBlock title = heading(setting, QStringLiteral("Notes"));
    const double left = setting.page.left();
    const double width = setting.page.contentWidth();
    flow.add({room,
              [title, left, width, room](PagePainter& painter, double y_mm) {
                painter.text(title, left, y_mm);
                for (double y = title.height_mm() + kLine_mm; y <= room; y += kLine_mm) {
                  painter.rule(left, y_mm + y, width);
                }
              },
              setting.density.sectionGap_mm});
  }
  flow.addAtBottom(sign);
  return hasNotes;
}

}  // namespace vialkeeper::exports
