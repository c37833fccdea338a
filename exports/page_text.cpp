// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/page_text.h"

#include <QFont>
#include <QFontMetricsF>
#include <QPaintDevice>
#include <QPainter>
#include <QTextCharFormat>
#include <QTextOption>
#include <algorithm>

namespace vialkeeper::exports {
namespace {

/// Wide enough for every text on one line, and within the layout's fixed-point numbers.
constexpr double kUnlimited_units = 1.0e6;

QFont fontOf(const Typesetter& typesetter, const TextStyle& style) {
  QFont font(typesetter.family);
  font.setPointSizeF(style.size_pt);
  font.setBold(style.weight == Weight::kBold);
  font.setHintingPreference(QFont::PreferNoHinting);
  // One glyph for one character: what a font draws for two ("fi"), or instead of another beside a
  // digit ("±" in Inter), is lost to whoever selects or searches the text.
  font.setStyleStrategy(QFont::PreferNoShaping);
  return font;
}

Qt::Alignment alignmentOf(Align align) {
  switch (align) {
    case Align::kCentre:
      return Qt::AlignHCenter;
    case Align::kRight:
      return Qt::AlignRight;
    case Align::kLeft:
      break;
  }
  return Qt::AlignLeft;
}

bool turnsDirection(QChar character) {
  const char16_t code = character.unicode();
  return code == 0x200E || code == 0x200F || code == 0x061C || (code >= 0x202A && code <= 0x202E) ||
         (code >= 0x2066 && code <= 0x2069);
}

}  // namespace

QString toQString(const std::string& utf8) {
  QString text;
  for (const QChar character : QString::fromStdString(utf8)) {
    if (character == QLatin1Char('\n')) {
      text += QChar(QChar::LineSeparator);
    } else if (character.category() == QChar::Other_Control) {
      text += QLatin1Char(' ');
    } else if (!turnsDirection(character)) {
      text += character;
    }
  }
  return text;
}

TextBlock::TextBlock(const Typesetter& typesetter, const QString& text, const TextStyle& style,
                     double width_mm, Align align)
    : TextBlock(typesetter, std::vector<TextRun>{{text, style}}, width_mm, align) {}

TextBlock::TextBlock(const Typesetter& typesetter, const std::vector<TextRun>& runs,
                     double width_mm, Align align)
    : m_unitsPerMm(typesetter.unitsPerMm) {
  QString text;
  QList<QTextLayout::FormatRange> formats;
  for (const TextRun& run : runs) {
    QTextLayout::FormatRange range;
    range.start = static_cast<int>(text.size());
    range.length = static_cast<int>(run.text.size());
    range.format.setFont(fontOf(typesetter, run.style));
    range.format.setForeground(run.style.colour);
    text += run.text;
    formats.append(range);
  }
  if (text.isEmpty()) return;
  m_layout = std::make_shared<QTextLayout>(text, fontOf(typesetter, runs.front().style),
                                           typesetter.device);
  m_layout->setFormats(formats);
  QTextOption option(alignmentOf(align));
  option.setWrapMode(QTextOption::WrapAtWordBoundaryOrAnywhere);
  m_layout->setTextOption(option);
  breakIntoLines(width_mm * m_unitsPerMm, runs.front().style.leading);
}

void TextBlock::breakIntoLines(double width_units, double leading) {
  double y = 0.0;
  double widest = 0.0;
  m_layout->beginLayout();
  for (QTextLine line = m_layout->createLine(); line.isValid(); line = m_layout->createLine()) {
    line.setLineWidth(std::max(width_units, 1.0));
    line.setPosition(QPointF(0.0, y));
    if (y == 0.0) m_ascent_mm = line.ascent() / m_unitsPerMm;
    y += line.height() * leading;
    widest = std::max(widest, line.naturalTextWidth());
  }
  m_layout->endLayout();
  m_lines = m_layout->lineCount();
  m_height_mm = y / m_unitsPerMm;
  m_width_mm = widest / m_unitsPerMm;
}

TextBlock TextBlock::slice(int firstLine, int lines) const {
  TextBlock part = *this;
  part.m_firstLine = m_firstLine + firstLine;
  part.m_lines = std::min(lines, m_lines - firstLine);
  part.m_height_mm = m_height_mm * part.m_lines / m_lines;
  return part;
}

void TextBlock::draw(QPainter& painter, double x_mm, double y_mm) const {
  if (isEmpty()) return;
  const double top = m_layout->lineAt(m_firstLine).y();
  for (int i = m_firstLine; i < m_firstLine + m_lines; ++i) {
    m_layout->lineAt(i).draw(&painter, QPointF(x_mm * m_unitsPerMm, y_mm * m_unitsPerMm - top));
  }
}

double textWidth_mm(const Typesetter& typesetter, const QString& text, const TextStyle& style) {
  return TextBlock(typesetter, text, style, kUnlimited_units / typesetter.unitsPerMm).width_mm();
}

QString shortened(const Typesetter& typesetter, const QString& text, const TextStyle& style,
                  double width_mm) {
  const QFontMetricsF metrics(fontOf(typesetter, style), typesetter.device);
  return metrics.elidedText(text, Qt::ElideRight, width_mm * typesetter.unitsPerMm);
}

}  // namespace vialkeeper::exports
