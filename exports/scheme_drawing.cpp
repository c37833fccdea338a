// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/scheme_drawing.h"

#include <QByteArray>
#include <QSvgRenderer>
#include <algorithm>

#include "exports/page_parts.h"

namespace vialkeeper::exports {
namespace {

constexpr double kPixelsPerBond = 28.0;  // see chem/structure.h
constexpr double kGap_mm = 3.0;          // between parts
constexpr double kLabelGap_mm = 1.8;
constexpr double kFarthestLabel_mm = 6.0;
constexpr double kArrowText_mm = 52.0;  // the widest that conditions are set
constexpr double kShortestArrow_mm = 24.0;
const TextStyle kLabel{8.0, Weight::kRegular, colours::kInk};
const TextStyle kConditions{7.5, Weight::kRegular, colours::kQuiet};
const TextStyle kFormula{12.0, Weight::kRegular, colours::kInk};

/// A structure, a sign, a name or the arrow: all stand centred on the reaction's line.
struct Part {
  const StructurePicture* picture = nullptr;
  double scale_mm = 0.0;  ///< for one pixel of the picture
  TextBlock text;         ///< on the line itself, where there is no picture
  TextBlock label;        ///< below the structures of this line
  TextBlock above;        ///< the arrow's
  TextBlock below;
  bool isArrow = false;
  double width_mm = 0.0;

  [[nodiscard]] double pictureHeight() const {
    return picture != nullptr ? picture->height_px * scale_mm : 0.0;
  }
  [[nodiscard]] double up() const {
    return std::max({pictureHeight() / 2.0, text.height_mm() / 2.0, above.height_mm() + 1.2});
  }
  [[nodiscard]] double down() const {
    return std::max({pictureHeight() / 2.0, text.height_mm() / 2.0, below.height_mm() + 1.2});
  }
};

using Line = std::vector<Part>;

QString joined(const std::vector<std::string>& lines) {
  QString text;
  for (const std::string& line : lines) {
    if (!text.isEmpty()) text += QChar(QChar::LineSeparator);
    text += toQString(line);
  }
  return text;
}

TextBlock conditions(const Typesetter& typesetter, const std::vector<std::string>& lines,
                     double width_mm) {
  return TextBlock(typesetter, joined(lines), kConditions, width_mm, Align::kCentre);
}

class SchemeSetter {
 public:
  SchemeSetter(const Typesetter& typesetter, const app::SchemeContent& scheme,
               const SchemePictures& pictures, const SchemeSize& size)
      : m_typesetter(typesetter), m_scheme(scheme), m_pictures(pictures), m_size(size) {}

  std::vector<Line> set() {
    constexpr double kSmallestBond_mm = 1.7;
    m_scale_mm = m_size.bond_mm / kPixelsPerBond;
    double widest_px = 1.0;
    for (const auto* side : {&m_pictures.reactants, &m_pictures.products}) {
      for (const StructurePicture& picture : *side) {
        m_scale_mm = std::min(m_scale_mm, m_size.structure_mm / std::max(picture.height_px, 1));
        widest_px = std::max(widest_px, static_cast<double>(picture.width_px));
      }
    }
    const double first = m_scale_mm;
    Line line = parts();
    while (widthOf(line) > m_size.width_mm && m_scale_mm * kPixelsPerBond > kSmallestBond_mm) {
      m_scale_mm *= 0.95;
      line = parts();
    }
    if (widthOf(line) <= m_size.width_mm) return {line};
    m_scale_mm = std::min(first * 0.7, m_size.width_mm / widest_px);
    return broken(parts());
  }

 private:
  Part textPart(const QString& text, double widest_mm, const TextStyle& style) {
    Part part;
    const double width = std::min(textWidth_mm(m_typesetter, text, style) + 0.5, widest_mm);
    part.text = TextBlock(m_typesetter, text, style, width, Align::kCentre);
    part.width_mm = width;
    return part;
  }

  Part memberPart(const app::SchemeMember& member, const StructurePicture& picture) {
    constexpr double kNarrowestLabel_mm = 26.0;
    const QString label = toQString(member.label);
    if (picture.svg.empty()) return textPart(label, 44.0, kFormula);
    Part part;
    part.picture = &picture;
    part.scale_mm = m_scale_mm;
    const double drawn = picture.width_px * m_scale_mm;
    const double room = std::max(drawn, kNarrowestLabel_mm);
    part.width_mm =
        std::max(drawn, std::min(textWidth_mm(m_typesetter, label, kLabel) + 0.5, room));
    part.label = TextBlock(m_typesetter, label, kLabel, part.width_mm, Align::kCentre);
    return part;
  }

  Part arrowPart() {
    const QString above = m_size.conditionsOnArrow ? joined(m_scheme.above) : QString();
    const QString below = m_size.conditionsOnArrow ? joined(m_scheme.below) : QString();
    const double text =
        std::min(kArrowText_mm, std::max(textWidth_mm(m_typesetter, above, kConditions),
                                         textWidth_mm(m_typesetter, below, kConditions)) +
                                    0.5);
    Part part;
    part.isArrow = true;
    part.width_mm = std::max(kShortestArrow_mm, text + 5.0);
    part.above = TextBlock(m_typesetter, above, kConditions, part.width_mm - 3.0, Align::kCentre);
    part.below = TextBlock(m_typesetter, below, kConditions, part.width_mm - 3.0, Align::kCentre);
    return part;
  }

  void addMembers(Line& line, const std::vector<app::SchemeMember>& members,
                  const std::vector<StructurePicture>& pictures) {
    for (std::size_t i = 0; i < members.size(); ++i) {
      if (i > 0) line.push_back(textPart(QStringLiteral("+"), 10.0, kFormula));
      const bool drawn = i < pictures.size();
      line.push_back(memberPart(members[i], drawn ? pictures[i] : kNoPicture));
    }
  }

  Line parts() {
    Line line;
    addMembers(line, m_scheme.reactants, m_pictures.reactants);
    line.push_back(arrowPart());
    addMembers(line, m_scheme.products, m_pictures.products);
    for (std::size_t i = 0; i < m_scheme.gases.size(); ++i) {
      const bool isFirst = i == 0 && m_scheme.products.empty();
      const QString gas = toQString(m_scheme.gases[i]);
      line.push_back(textPart(isFirst ? gas : QStringLiteral("+ ") + gas, 44.0, kFormula));
    }
    return line;
  }

  static double widthOf(const Line& line) {
    double width = kGap_mm * static_cast<double>(std::max<std::size_t>(line.size(), 1) - 1);
    for (const Part& part : line) width += part.width_mm;
    return width;
  }

  std::vector<Line> broken(const Line& parts) const {
    std::vector<Line> lines(1);
    for (const Part& part : parts) {
      lines.back().push_back(part);
      if (widthOf(lines.back()) <= m_size.width_mm || lines.back().size() == 1) continue;
      lines.back().pop_back();
      lines.push_back({part});
    }
    return lines;
  }

  static const StructurePicture kNoPicture;
  const Typesetter& m_typesetter;
  const app::SchemeContent& m_scheme;
  const SchemePictures& m_pictures;
  SchemeSize m_size;
  double m_scale_mm = 0.0;
};

const StructurePicture SchemeSetter::kNoPicture;

/// A line with its measures: how far it reaches above and below the middle, labels included.
struct SetLine {
  Line parts;
  double up_mm = 0.0;
  double labels_mm = 0.0;  ///< from the middle down to the labels
  double down_mm = 0.0;
  double width_mm = 0.0;
};

SetLine measured(Line parts) {
  SetLine line;
  double pictureDown = 0.0;
  double labels = 0.0;
  for (const Part& part : parts) {
    line.up_mm = std::max(line.up_mm, part.up());
    line.down_mm = std::max(line.down_mm, part.down());
    pictureDown = std::max(pictureDown, part.pictureHeight() / 2.0);
    labels = std::max(labels, part.label.height_mm());
    line.width_mm += part.width_mm + (line.width_mm > 0.0 ? kGap_mm : 0.0);
  }
  line.labels_mm = pictureDown + kLabelGap_mm;
  if (labels > 0.0) line.down_mm = std::max(line.down_mm, line.labels_mm + labels);
  line.parts = std::move(parts);
  return line;
}

void drawStructure(PagePainter& painter, const Part& part, double x_mm, double middle_mm) {
  const double width = part.picture->width_px * part.scale_mm;
  const QRectF place(x_mm + (part.width_mm - width) / 2.0, middle_mm - part.pictureHeight() / 2.0,
                     width, part.pictureHeight());
  QSvgRenderer svg(QByteArray::fromStdString(part.picture->svg));
  svg.render(&painter.device(), painter.toUnits(place));
}

void drawArrow(PagePainter& painter, const Part& part, double x_mm, double middle_mm) {
  constexpr double kHead_mm = 2.6;
  painter.rule(x_mm, middle_mm, part.width_mm - kHead_mm / 2.0, colours::kInk, 0.4);
  QPainterPath head;
  head.moveTo(0.0, 0.0);
  head.lineTo(-1.0, -0.42);
  head.lineTo(-0.78, 0.0);
  head.lineTo(-1.0, 0.42);
  head.closeSubpath();
  painter.fill(head, x_mm + part.width_mm, middle_mm, kHead_mm, colours::kInk);
  painter.text(part.above, x_mm + 1.0, middle_mm - 1.2 - part.above.height_mm());
  painter.text(part.below, x_mm + 1.0, middle_mm + 1.2);
}

void drawLine(PagePainter& painter, const SetLine& line, double x_mm, double y_mm) {
  const double middle = y_mm + line.up_mm;
  for (const Part& part : line.parts) {
    if (part.picture != nullptr) drawStructure(painter, part, x_mm, middle);
    if (part.isArrow) drawArrow(painter, part, x_mm, middle);
    painter.text(part.text, x_mm, middle - part.text.height_mm() / 2.0);
    // Labels stand on one line, but not far below a structure that is much smaller than others.
    const double own = part.pictureHeight() / 2.0 + kFarthestLabel_mm;
    painter.text(part.label, x_mm, middle + std::min(line.labels_mm, own));
    x_mm += part.width_mm + kGap_mm;
  }
}

}  // namespace

Blocks schemeBlocks(const Typesetter& typesetter, const app::SchemeContent& scheme,
                    const SchemePictures& pictures, SchemeSize size, double x_mm) {
  constexpr double kBetweenLines_mm = 4.0;
  constexpr double kMostOnArrow_mm = 44.0;
  if (scheme.isEmpty()) return {};
  const double onArrow = std::max(conditions(typesetter, scheme.above, kArrowText_mm).height_mm(),
                                  conditions(typesetter, scheme.below, kArrowText_mm).height_mm());
  size.conditionsOnArrow = onArrow <= kMostOnArrow_mm;
  Blocks blocks;
  for (Line& parts : SchemeSetter(typesetter, scheme, pictures, size).set()) {
    const SetLine line = measured(std::move(parts));
    const double left = x_mm + (size.width_mm - line.width_mm) / 2.0;
    blocks.push_back(
        {line.up_mm + line.down_mm,
         [line, left](PagePainter& painter, double y_mm) { drawLine(painter, line, left, y_mm); },
         kBetweenLines_mm});
  }
  if (size.conditionsOnArrow) return blocks;
  for (const auto* list : {&scheme.above, &scheme.below}) {
    for (const std::string& condition : *list) {
      const TextBlock text(typesetter, toQString(condition), kConditions, size.width_mm);
      for (Block& block : paragraphBlocks(text, x_mm, 0.8)) blocks.push_back(std::move(block));
    }
  }
  return blocks;
}

}  // namespace vialkeeper::exports
