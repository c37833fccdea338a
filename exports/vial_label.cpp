// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/vial_label.h"

#include <QStringList>
#include <algorithm>
#include <utility>

#include "exports/page_parts.h"

namespace vialkeeper::exports {
namespace {

constexpr double kWidth_mm = 62.0;
constexpr double kHeight_mm = 29.0;
constexpr double kSide_mm = 2.0;  // label printers leave 1.5 mm blank
constexpr double kTop_mm = 1.6;
constexpr double kBottom_mm = kHeight_mm - 1.6;
constexpr double kFullWidth_mm = kWidth_mm - 2.0 * kSide_mm;
constexpr double kLargestQr_mm = 22.0;
constexpr QColor kBlack(0, 0, 0);  // label printers turn greys into dots

TextStyle style(double size_pt, Weight weight = Weight::kRegular) {
  return {.size_pt = size_pt, .weight = weight, .colour = kBlack, .leading = 0.96};
}

/// All sizes of type, from one scale: the smaller the text, the less it gives way.
struct Sizes {
  explicit Sizes(double scale)
      : code_pt(std::max(12.0, 19.0 * scale)),
        title_pt(std::max(5.8, 8.5 * scale)),
        contents_pt(std::max(5.2, 7.2 * scale)),
        conditions_pt(std::max(5.8, 7.5 * scale)),
        hazards_pt(std::max(5.4, 7.5 * scale)),
        caution_pt(std::max(6.6, 8.5 * scale)) {}
  double code_pt, title_pt, contents_pt, conditions_pt, hazards_pt, caution_pt;
};

constexpr double kLargestScale = 1.2;
constexpr double kSmallestScale = 0.61;

/// The printed code with the white around it, from the label's corner.
struct QrPlace {
  double side_mm = 0.0;
  double corner_mm = 0.0;    ///< of the dark part, from both edges
  double end_mm = kSide_mm;  ///< of the white, in both directions
};

QrPlace placeOf(const std::optional<QrCode>& qr) {
  constexpr double kLeastModule_mm = 0.4;  // five dots of a printer of 300 dpi, three of 203 dpi
  constexpr double kSide_mm = 12.5;
  QrPlace place;
  if (!qr) return place;
  place.side_mm = std::max(kSide_mm, kLeastModule_mm * qr->modules);
  place.corner_mm = 4.0 * place.side_mm / qr->modules;
  place.end_mm = place.side_mm + 2.0 * place.corner_mm;
  return place;
}

/// The text as large as it goes on one line of the width; at the least size on more.
TextBlock fitted(const Typesetter& type, const QString& text, TextStyle style, double least_pt,
                 double width_mm) {
  while (style.size_pt > least_pt && textWidth_mm(type, text, style) > width_mm) {
    style.size_pt = std::max(least_pt, style.size_pt * 0.96);
  }
  return TextBlock(type, text, style, width_mm);
}

/// The texts without the last word of the longest of them, an ellipsis in its place.
bool shorten(QStringList& texts) {
  const QChar ellipsis(0x2026);
  const auto longest = std::ranges::max_element(
      texts, [](const QString& a, const QString& b) { return a.size() < b.size(); });
  if (longest == texts.end() || longest->size() < 2) return false;
  QString& text = *longest;
  if (text.endsWith(ellipsis)) text.chop(1);
  const qsizetype blank = text.lastIndexOf(QLatin1Char(' '));
  text.truncate(blank > 0 ? blank : text.size() * 3 / 4);
  while (text.endsWith(QLatin1Char(' ')) || text.endsWith(QLatin1Char(','))) text.chop(1);
  text += ellipsis;
  return true;
}

/// Texts behind each other on so many lines, cut where they are longer; nothing on no lines.
TextBlock cut(const Typesetter& type, QStringList texts, const TextStyle& style, double width_mm,
              int lines) {
  constexpr qsizetype kMostCharacters = 600;  // more are never on a label
  if (lines < 1) return {};
  for (QString& text : texts) text.truncate(kMostCharacters);
  const auto set = [&] {
    return TextBlock(type, dotted({texts.begin(), texts.end()}), style, width_mm);
  };
  TextBlock block = set();
  while (block.lines() > lines && shorten(texts)) block = set();
  return block.lines() > lines ? TextBlock() : block;
}

/// Person and date, or lines to write them on.
class People {
 public:
  People(const Typesetter& type, const app::LabelContent& label, double width_mm, double blank_mm)
      : m_width(width_mm) {
    add(type, QStringLiteral("by"), label.person, blank_mm);
    add(type, QStringLiteral("date"), label.date, blank_mm);
  }

  [[nodiscard]] double height_mm() const { return m_lines[0].height_mm + m_lines[1].height_mm; }
  [[nodiscard]] int textLines() const {
    return std::max(m_lines[0].text.lines(), m_lines[1].text.lines());
  }

  void drawBelowEachOther(PagePainter& painter, double x_mm, double y_mm) const {
    for (const Line& line : m_lines) {
      draw(painter, line, x_mm, y_mm);
      y_mm += line.height_mm;
    }
  }
  void drawBesideEachOther(PagePainter& painter, double x_mm, double y_mm) const {
    const double height = std::max(m_lines[0].height_mm, m_lines[1].height_mm);
    for (const Line& line : m_lines) {
      draw(painter, line, x_mm, y_mm + height - line.height_mm);
      x_mm += m_width + 2.0;
    }
  }
  [[nodiscard]] double heightBeside_mm() const {
    return std::max(m_lines[0].height_mm, m_lines[1].height_mm);
  }

 private:
  struct Line {
    TextBlock text;
    bool isBlank = false;
    double height_mm = 0.0;
  };

  void add(const Typesetter& type, const QString& label, const std::string& value,
           double blank_mm) {
    constexpr double kLeast_pt = 5.0;
    Line& line = m_lines[m_count++];
    line.isBlank = value.empty();
    line.text =
        fitted(type, line.isBlank ? label : toQString(value), style(6.2), kLeast_pt, m_width);
    line.height_mm = line.isBlank ? blank_mm : line.text.height_mm();
  }

  void draw(PagePainter& painter, const Line& line, double x_mm, double y_mm) const {
    constexpr double kRuleAbove_mm = 0.35;
    if (!line.isBlank) {
      painter.text(line.text, x_mm, y_mm);
      return;
    }
    const double rule = y_mm + line.height_mm - kRuleAbove_mm;
    const double gap = line.text.width_mm() + 0.8;
    painter.text(line.text, x_mm, rule - line.text.ascent_mm() - 0.2);
    painter.rule(x_mm + gap, rule, m_width - gap, kBlack, 0.15);
  }

  double m_width;
  Line m_lines[2];
  int m_count = 0;
};

/// What stands at the foot, over the whole width, and is never cut.
class Foot {
 public:
  Foot(const Typesetter& type, const app::LabelContent& label, const Sizes& sizes,
       std::optional<People> people)
      : m_people(std::move(people)),
        m_hazards(type, toQString(label.hazards), style(sizes.hazards_pt, Weight::kBold),
                  kFullWidth_mm) {
    const TextStyle caution = style(sizes.caution_pt, Weight::kBold);
    m_sign_mm = caution.size_pt * 0.37;
    m_caution = fitted(type, toQString(label.caution), caution, 6.6, kFullWidth_mm - indent());
  }

  [[nodiscard]] double height_mm() const {
    double height = m_hazards.height_mm() + m_caution.height_mm();
    if (height > 0.0) height += kAfterRule_mm;
    if (m_people) height += m_people->heightBeside_mm();
    return height;
  }

  void draw(PagePainter& painter) const {
    double y = kBottom_mm - height_mm();
    if (m_people) {
      m_people->drawBesideEachOther(painter, kSide_mm, y);
      y += m_people->heightBeside_mm();
    }
    if (m_hazards.isEmpty() && m_caution.isEmpty()) return;
    painter.rule(kSide_mm, y + 0.3, kFullWidth_mm, kBlack, 0.25);
    y += kAfterRule_mm;
    painter.text(m_hazards, kSide_mm, y);
    y += m_hazards.height_mm();
    if (m_caution.isEmpty()) return;
    painter.warningSign(kSide_mm, y + m_caution.ascent_mm() - m_sign_mm * 0.93, m_sign_mm, kBlack);
    painter.text(m_caution, kSide_mm + indent(), y);
  }

 private:
  static constexpr double kAfterRule_mm = 0.7;
  [[nodiscard]] double indent() const { return m_sign_mm + 1.2; }

  std::optional<People> m_people;
  TextBlock m_hazards;
  TextBlock m_caution;
  double m_sign_mm = 0.0;
};

/// The label at one size of type.
struct Layout {
  TextBlock code, title, contents, conditions;
  std::optional<People> people;  ///< below the printed code; else at the foot
  std::optional<Foot> foot;
  double left_mm = 0.0;   ///< of the texts beside the printed code
  double room_mm = 0.0;   ///< above the foot
  double below_mm = 0.0;  ///< between the printed code and the foot

  /// The first line's letters begin at the upper edge, not the space above them.
  [[nodiscard]] double codeLift_mm() const { return 0.17 * code.ascent_mm(); }
  [[nodiscard]] double fixed_mm() const {
    return code.height_mm() - codeLift_mm() + conditions.height_mm();
  }
  [[nodiscard]] bool hasRoom() const {
    return fixed_mm() + title.height_mm() + contents.height_mm() <= room_mm && below_mm >= 0.0;
  }
};

class LabelSetter {
 public:
  LabelSetter(const Typesetter& type, const app::LabelContent& label, const QrPlace& qr)
      : m_type(type), m_label(label), m_qr(qr), m_title(toQString(label.title)) {
    for (const std::string& line : label.lines) {
      if (!line.empty()) m_contents << toQString(line);
    }
  }

  /// As large as all of it fits; at the smallest size the contents are cut, then the title.
  [[nodiscard]] std::optional<Layout> set() const {
    for (double scale = kLargestScale; scale > kSmallestScale; scale -= 0.03) {
      const Layout layout = at(Sizes(scale));
      if (layout.hasRoom() && layout.title.lines() <= kTitleLines) return layout;
    }
    const Sizes sizes(kSmallestScale);
    Layout layout = at(sizes);
    layout.title = {};
    layout.contents = {};
    if (!layout.hasRoom()) return std::nullopt;
    const auto lines = [&layout](double taken_mm, const TextStyle& style, const Typesetter& type) {
      const double line = TextBlock(type, QStringLiteral("x"), style, kWidth_mm).height_mm();
      return static_cast<int>((layout.room_mm - layout.fixed_mm() - taken_mm) / line);
    };
    const TextStyle title = style(sizes.title_pt, Weight::kBold);
    const TextStyle contents = style(sizes.contents_pt);
    layout.title = cut(m_type, {m_title}, title, width(layout),
                       std::min(kTitleLines, lines(0.0, title, m_type)));
    layout.contents = cut(m_type, m_contents, contents, width(layout),
                          lines(layout.title.height_mm(), contents, m_type));
    return layout;
  }

 private:
  static constexpr int kTitleLines = 2;

  static double width(const Layout& layout) { return kWidth_mm - kSide_mm - layout.left_mm; }

  [[nodiscard]] Layout at(const Sizes& sizes) const {
    constexpr double kLeastCode_pt = 8.0;
    constexpr double kAboveFoot_mm = 0.5;
    Layout layout;
    layout.left_mm = m_qr.end_mm;
    const double width_mm = width(layout);
    layout.code = fitted(m_type, toQString(m_label.code), style(sizes.code_pt, Weight::kBold),
                         kLeastCode_pt, width_mm);
    layout.title = TextBlock(m_type, m_title, style(sizes.title_pt, Weight::kBold), width_mm);
    layout.contents = TextBlock(m_type, dotted({m_contents.begin(), m_contents.end()}),
                                style(sizes.contents_pt), width_mm);
    layout.conditions =
        TextBlock(m_type, toQString(m_label.conditions), style(sizes.conditions_pt), width_mm);
    placePeople(layout, sizes);
    const double footTop = kBottom_mm - layout.foot->height_mm();
    layout.room_mm = footTop - kAboveFoot_mm - kTop_mm;
    layout.below_mm =
        footTop - m_qr.end_mm - (layout.people ? layout.people->height_mm() + kAboveFoot_mm : 0.0);
    return layout;
  }

  /// Below the printed code where they fit there, with lines to write on as high as they can be;
  /// else at the foot.
  void placePeople(Layout& layout, const Sizes& sizes) const {
    constexpr double kLeastWidth_mm = 12.0;
    const double width_mm = layout.left_mm - 0.8 - kSide_mm;
    const double bottom = kBottom_mm - Foot(m_type, m_label, sizes, std::nullopt).height_mm() - 0.5;
    for (const double blank : {4.4, 4.0, 3.6, 3.2}) {
      if (width_mm < kLeastWidth_mm) break;
      const People people(m_type, m_label, width_mm, blank);
      if (people.textLines() > 1 || people.height_mm() > bottom - m_qr.end_mm) continue;
      layout.people = people;
      layout.foot.emplace(m_type, m_label, sizes, std::nullopt);
      return;
    }
    layout.foot.emplace(m_type, m_label, sizes,
                        People(m_type, m_label, (kFullWidth_mm - 2.0) / 2.0, 3.6));
  }

  const Typesetter& m_type;
  const app::LabelContent& m_label;
  const QrPlace& m_qr;
  QString m_title;
  QStringList m_contents;
};

void drawLabel(PagePainter& painter, const Layout& layout, const std::optional<QrCode>& qr,
               const QrPlace& place) {
  if (qr) {
    painter.device().setRenderHint(QPainter::Antialiasing, false);
    painter.fill(qr->path, place.corner_mm, place.corner_mm, place.side_mm / qr->modules, kBlack);
    painter.device().setRenderHint(QPainter::Antialiasing, true);
  }
  const double x = layout.left_mm;
  double y = kTop_mm - layout.codeLift_mm();
  for (const TextBlock& text : {layout.code, layout.title, layout.contents}) {
    painter.text(text, x, y);
    y += text.height_mm();
  }
  painter.text(layout.conditions, x, kTop_mm + layout.room_mm - layout.conditions.height_mm());
  if (layout.people) {
    const double top = place.end_mm + layout.below_mm;
    layout.people->drawBelowEachOther(painter, kSide_mm, top);
  }
  layout.foot->draw(painter);
}

std::unexpected<text::Faults> tooLong(const app::LabelContent& label, const std::string& what,
                                      const std::string& mend) {
  const std::string whose = label.code.empty() ? label.title : label.code;
  return std::unexpected(
      text::Faults{{.what = what + " of the label of \"" + whose + "\" is too long for 62 × 29 mm",
                    .mend = mend}});
}

}  // namespace

PageGeometry vialLabelGeometry() {
  return {.width_mm = kWidth_mm,
          .height_mm = kHeight_mm,
          .side_mm = 0.0,
          .top_mm = 0.0,
          .bottom_mm = 0.0};
}

text::Checked<PageFlow> layOutVialLabel(const Typesetter& typesetter,
                                        const app::LabelContent& label,
                                        const std::optional<QrCode>& qr) {
  const QrPlace place = placeOf(qr);
  if (place.side_mm > kLargestQr_mm) {
    return tooLong(label, "the printed code's text", "give the run a shorter code");
  }
  const std::optional<Layout> layout = LabelSetter(typesetter, label, place).set();
  if (!layout) {
    return tooLong(label, "what may not be cut (code, conditions, hazards, caution)",
                   "shorten the code, the conditions or the caution");
  }
  PageFlow flow(vialLabelGeometry(), {});
  flow.add(
      {kHeight_mm, [=](PagePainter& painter, double) { drawLabel(painter, *layout, qr, place); }});
  return flow;
}

}  // namespace vialkeeper::exports
