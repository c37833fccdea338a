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
constexpr double kTop_mm = 1.5;
constexpr double kBottom_mm = kHeight_mm - 1.5;
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
  constexpr double kLeast_mm = 12.0;
  QrPlace place;
  if (!qr) return place;
  place.side_mm = std::max(kLeast_mm, kLeastModule_mm * qr->modules);
  place.corner_mm = 4.0 * place.side_mm / qr->modules;
  place.end_mm = place.side_mm + 2.0 * place.corner_mm;
  return place;
}

/// A text in which no line breaks between a number and its unit.
QString bound(const std::string& utf8) {
  QString text = toQString(utf8);
  for (qsizetype i = 1; i + 1 < text.size(); ++i) {
    if (text[i] == QLatin1Char(' ') && text[i - 1].isDigit()) text[i] = QChar(QChar::Nbsp);
  }
  return text;
}

/// The text as large as it goes on the fewest lines that it needs at the least size.
TextBlock fitted(const Typesetter& type, const QString& text, TextStyle letters, double least_pt,
                 double width_mm) {
  const double largest_pt = letters.size_pt;
  letters.size_pt = std::min(least_pt, largest_pt);
  const int lines = TextBlock(type, text, letters, width_mm).lines();
  for (letters.size_pt = largest_pt; letters.size_pt > least_pt; letters.size_pt *= 0.97) {
    TextBlock block(type, text, letters, width_mm);
    if (block.lines() <= lines) return block;
  }
  letters.size_pt = std::min(least_pt, largest_pt);
  return TextBlock(type, text, letters, width_mm);
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
TextBlock cut(const Typesetter& type, QStringList texts, const TextStyle& letters, double width_mm,
              int lines) {
  constexpr qsizetype kMostCharacters = 600;  // more are never on a label
  if (lines < 1) return {};
  for (QString& text : texts) text.truncate(kMostCharacters);
  const auto set = [&] {
    return TextBlock(type, dotted({texts.begin(), texts.end()}), letters, width_mm);
  };
  TextBlock block = set();
  while (block.lines() > lines && shorten(texts)) block = set();
  return block.lines() > lines ? TextBlock() : block;
}

/// Who or when, or a line to write it on.
struct Entered {
  TextBlock text;
  bool isBlank = false;
  double width_mm = 0.0;
  double height_mm = 0.0;

  Entered() = default;
  Entered(const Typesetter& type, const char* label, const std::string& value, double column_mm,
          double blank_mm)
      : isBlank(value.empty()), width_mm(column_mm) {
    constexpr double kLeast_pt = 5.0;
    constexpr int kMostLines = 2;
    const QString shown = isBlank ? QString::fromLatin1(label) : toQString(value);
    text = fitted(type, shown, style(6.2), kLeast_pt, column_mm);
    if (text.lines() > kMostLines)
      text = cut(type, {shown}, style(kLeast_pt), column_mm, kMostLines);
    height_mm = isBlank ? blank_mm : text.height_mm();
  }

  void draw(PagePainter& painter, double x_mm, double bottom_mm) const {
    if (!isBlank) {
      painter.text(text, x_mm, bottom_mm - height_mm);
      return;
    }
    const double rule = bottom_mm - 0.35;
    const double gap = text.width_mm() + 0.8;
    painter.text(text, x_mm, rule - text.ascent_mm() - 0.2);
    painter.rule(x_mm + gap, rule, width_mm - gap, kBlack, 0.15);
  }
};

/// Where person and date stand, from the best place to the last.
enum class PeoplePlace {
  kBelowQr,     ///< below each other
  kAtBothEnds,  ///< the person below the printed code, the date behind the conditions
  kBelowConditions
};

/// What stands at the foot, over the whole width, and is never cut.
class Foot {
 public:
  /// Nothing.
  Foot() = default;
  Foot(const Typesetter& type, const app::LabelContent& label, const Sizes& sizes)
      : m_hazards(hazards(type, toQString(label.hazards), sizes)) {
    constexpr double kLeast_pt = 6.6;
    const TextStyle caution = style(sizes.caution_pt, Weight::kBold);
    m_sign_mm = caution.size_pt * 0.37;
    m_caution =
        fitted(type, toQString(label.caution), caution, kLeast_pt, kFullWidth_mm - indent());
  }

  [[nodiscard]] double height_mm() const {
    if (m_hazards.isEmpty() && m_caution.isEmpty()) return 0.0;
    return kAfterRule_mm + m_hazards.height_mm() + m_caution.height_mm();
  }

  void draw(PagePainter& painter) const {
    if (m_hazards.isEmpty() && m_caution.isEmpty()) return;
    double y = kBottom_mm - height_mm();
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

  /// Bold, if that does not take another line.
  static TextBlock hazards(const Typesetter& type, const QString& codes, const Sizes& sizes) {
    constexpr double kLeast_pt = 5.0;
    const TextBlock bold =
        fitted(type, codes, style(sizes.hazards_pt, Weight::kBold), kLeast_pt, kFullWidth_mm);
    const TextBlock regular =
        fitted(type, codes, style(sizes.hazards_pt), kLeast_pt, kFullWidth_mm);
    return bold.lines() <= regular.lines() ? bold : regular;
  }
  [[nodiscard]] double indent() const { return m_sign_mm + 1.2; }

  TextBlock m_hazards;
  TextBlock m_caution;
  double m_sign_mm = 0.0;
};

/// The label at one size of type.
struct Layout {
  TextBlock code, title, contents, conditions;
  Entered person, date;
  PeoplePlace people = PeoplePlace::kBelowConditions;
  Foot foot;
  double left_mm = 0.0;   ///< of the texts beside the printed code
  double room_mm = 0.0;   ///< above the foot
  double below_mm = 0.0;  ///< between the printed code and the foot

  /// The first line's letters begin at the upper edge, not the space above them.
  [[nodiscard]] double codeLift_mm() const { return 0.17 * code.ascent_mm(); }
  /// Below the conditions' upper edge.
  [[nodiscard]] double conditions_mm() const {
    switch (people) {
      case PeoplePlace::kBelowConditions:
        return conditions.height_mm() + std::max(person.height_mm, date.height_mm);
      case PeoplePlace::kAtBothEnds:
        return std::max(conditions.height_mm(), date.height_mm);
      case PeoplePlace::kBelowQr:
        break;
    }
    return conditions.height_mm();
  }
  /// Of what is not cut.
  [[nodiscard]] double fixed_mm() const {
    return code.height_mm() - codeLift_mm() + conditions_mm();
  }
  [[nodiscard]] bool hasRoom() const {
    return fixed_mm() + title.height_mm() + contents.height_mm() <= room_mm && below_mm >= 0.0;
  }
};

class LabelSetter {
 public:
  LabelSetter(const Typesetter& type, const app::LabelContent& label, const QrPlace& qr)
      : m_type(type), m_label(label), m_qr(qr), m_title(bound(label.title)) {
    for (const std::string& line : label.lines) {
      if (!line.empty()) m_contents << bound(line);
    }
  }

  /// As large as all of it fits; at the smallest size the contents are cut, then the title.
  [[nodiscard]] std::optional<Layout> set() const {
    constexpr double kSmallestForPeople = 0.75;  // below this any place will do for them
    for (const bool anyPlace : {false, true}) {
      const double smallest = anyPlace ? kSmallestScale : kSmallestForPeople;
      for (double scale = kLargestScale; scale > smallest; scale -= kStep) {
        const Layout layout = at(Sizes(scale), Sizes(scale));
        if (!fits(layout) || !(anyPlace || layout.people == PeoplePlace::kBelowQr)) continue;
        return enlarged(layout, scale);
      }
    }
    return cutToRoom();
  }

 private:
  static constexpr int kTitleLines = 2;
  static constexpr double kStep = 0.03;
  static constexpr double kLeastCode_pt = 8.0;
  static constexpr double kAboveFoot_mm = 0.4;

  static double width(const Layout& layout) { return kWidth_mm - kSide_mm - layout.left_mm; }

  static bool fits(const Layout& layout) {
    return layout.hasRoom() && layout.title.lines() <= kTitleLines;
  }

  /// What stands above the foot, larger than it where there is room.
  [[nodiscard]] Layout enlarged(const Layout& layout, double scale) const {
    for (double larger = kLargestScale; larger > scale; larger -= kStep) {
      const Layout other = at(Sizes(larger), Sizes(scale));
      if (fits(other) && other.people == layout.people) return other;
    }
    return layout;
  }

  [[nodiscard]] Layout uncuttable(const Sizes& sizes) const {
    Layout layout = at(sizes, sizes);
    layout.title = {};
    layout.contents = {};
    return layout;
  }

  [[nodiscard]] std::optional<Layout> cutToRoom() const {
    Sizes sizes(kSmallestScale);
    Layout layout = uncuttable(sizes);
    if (!layout.hasRoom()) {
      sizes.code_pt = kLeastCode_pt;
      layout = uncuttable(sizes);
    }
    if (!layout.hasRoom()) return std::nullopt;
    const auto lines = [this, &layout](const TextStyle& letters) {
      const double line = TextBlock(m_type, QStringLiteral("x"), letters, kWidth_mm).height_mm();
      const double room = layout.room_mm - layout.fixed_mm() - layout.title.height_mm();
      return static_cast<int>(room / line);
    };
    const TextStyle title = style(sizes.title_pt, Weight::kBold);
    const TextStyle contents = style(sizes.contents_pt);
    layout.title =
        cut(m_type, {m_title}, title, width(layout), std::min(kTitleLines, lines(title)));
    layout.contents = cut(m_type, m_contents, contents, width(layout), lines(contents));
    return layout;
  }

  [[nodiscard]] Layout at(const Sizes& sizes, const Sizes& footSizes) const {
    Layout layout;
    layout.left_mm = m_qr.end_mm;
    const double width_mm = width(layout);
    layout.code = fitted(m_type, toQString(m_label.code), style(sizes.code_pt, Weight::kBold),
                         kLeastCode_pt, width_mm);
    layout.title = TextBlock(m_type, m_title, style(sizes.title_pt, Weight::kBold), width_mm);
    layout.contents = TextBlock(m_type, dotted({m_contents.begin(), m_contents.end()}),
                                style(sizes.contents_pt), width_mm);
    layout.conditions =
        TextBlock(m_type, bound(m_label.conditions), style(sizes.conditions_pt), width_mm);
    layout.foot = Foot(m_type, m_label, footSizes);
    const double bottom = kBottom_mm - layout.foot.height_mm() - kAboveFoot_mm;
    layout.room_mm = bottom - kTop_mm;
    layout.below_mm = bottom - m_qr.end_mm;
    placePeople(layout);
    return layout;
  }

  /// In the best place where they fit, with lines to write on as high as they can be there.
  void placePeople(Layout& layout) const {
    constexpr double kLeastWidth_mm = 11.0;
    constexpr double kDate_mm = 14.0;
    constexpr double kGap_mm = 2.0;
    const double below_mm = layout.left_mm - kGap_mm - kSide_mm;
    const auto person = [&](double column_mm, double blank_mm) {
      return Entered(m_type, "by", m_label.person, column_mm, blank_mm);
    };
    const auto date = [&](double column_mm, double blank_mm) {
      return Entered(m_type, "date", m_label.date, column_mm, blank_mm);
    };
    const auto areSet = [&](PeoplePlace place) {
      layout.people = place;
      const double height =
          layout.person.height_mm + (place == PeoplePlace::kBelowQr ? layout.date.height_mm : 0.0);
      return below_mm >= kLeastWidth_mm && height <= layout.below_mm &&
             layout.person.text.lines() <= 1 && layout.date.text.lines() <= 1;
    };
    // The upper line may be lower, with the printed code's white above it.
    for (const auto& [upper, lower] : {std::pair{3.8, 4.4}, {3.0, 4.0}, {2.2, 3.4}, {1.7, 2.8}}) {
      layout.person = person(below_mm, upper);
      layout.date = date(below_mm, lower);
      if (areSet(PeoplePlace::kBelowQr)) return;
    }
    const double beside_mm = width(layout);
    layout.person = person(below_mm, 2.6);
    layout.date = date(kDate_mm, 3.0);
    const bool isShort = layout.conditions.width_mm() + kGap_mm + kDate_mm <= beside_mm;
    if (isShort && areSet(PeoplePlace::kAtBothEnds)) return;
    layout.people = PeoplePlace::kBelowConditions;
    layout.person = person(beside_mm - kGap_mm - kDate_mm, 3.4);
    layout.date = date(kDate_mm, 3.4);
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
  const double bottom = kTop_mm + layout.room_mm;
  const double right = kWidth_mm - kSide_mm - layout.date.width_mm;
  switch (layout.people) {
    case PeoplePlace::kBelowQr:
      painter.text(layout.conditions, x, bottom - layout.conditions.height_mm());
      layout.person.draw(painter, kSide_mm, bottom - layout.date.height_mm);
      layout.date.draw(painter, kSide_mm, bottom);
      break;
    case PeoplePlace::kAtBothEnds:
      painter.text(layout.conditions, x, bottom - layout.conditions.height_mm());
      layout.person.draw(painter, kSide_mm, bottom);
      layout.date.draw(painter, right, bottom);
      break;
    case PeoplePlace::kBelowConditions:
      painter.text(layout.conditions, x, bottom - layout.conditions_mm());
      layout.person.draw(painter, x, bottom);
      layout.date.draw(painter, right, bottom);
      break;
  }
  layout.foot.draw(painter);
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
