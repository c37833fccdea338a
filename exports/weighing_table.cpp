// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/weighing_table.h"

#include <algorithm>

namespace vialkeeper::exports {
namespace {

constexpr double kTick_mm = 6.5;
constexpr double kColumnGap_mm = 3.5;
const TextStyle kHead{7.2, Weight::kRegular, colours::kQuiet};
const TextStyle kName{9.8, Weight::kBold, colours::kInk};
const TextStyle kLongName{9.0, Weight::kBold, colours::kInk};
const TextStyle kDetail{7.5, Weight::kRegular, colours::kQuiet};
const TextStyle kCell{8.5, Weight::kRegular, colours::kInk};
const TextStyle kTarget{14.0, Weight::kBold, colours::kInk};
const TextStyle kTolerance{8.5, Weight::kRegular, colours::kInk};
const TextStyle kActual{11.0, Weight::kBold, colours::kInk};

struct Column {
  double left_mm = 0.0;
  double width_mm = 0.0;
  [[nodiscard]] double right() const { return left_mm + width_mm; }
};

struct Columns {
  Column tick, component, supply, ratio, target, actual;
};

QString targetOf(const app::SheetRow& row) {
  QString text = toQString(row.target);
  // A number and its unit are never on two lines, unless even they alone are too wide.
  if (!row.target.empty() && !row.unit.empty()) text += QChar(QChar::Nbsp);
  return text + toQString(row.unit);
}

/// The widest of some texts, within limits.
class Widest {
 public:
  Widest(const Typesetter& typesetter, double least_mm)
      : m_typesetter(typesetter), m_width(least_mm) {}
  void see(const QString& text, const TextStyle& style) {
    m_width = std::max(m_width, textWidth_mm(m_typesetter, text, style) + 0.5);
  }
  [[nodiscard]] double within(double most_mm) const { return std::min(m_width, most_mm); }

 private:
  const Typesetter& m_typesetter;
  double m_width;
};

/// Columns as wide as the content asks for, within limits; the names have what is left.
Columns columnsFor(const Setting& setting, const std::vector<app::SheetRow>& rows) {
  constexpr double kActual_mm = 31.0;
  Widest supply(setting.typesetter, 20.0);
  Widest ratio(setting.typesetter, 12.0);
  Widest target(setting.typesetter, 24.0);
  for (const app::SheetRow& row : rows) {
    supply.see(toQString(row.supply), kCell);
    supply.see(toQString(row.device), kDetail);
    ratio.see(toQString(row.ratio), kCell);
    target.see(targetOf(row), kTarget);
    target.see(toQString(row.tolerance), kTolerance);
    target.see(toQString(row.alternative), kDetail);
  }
  Columns columns;
  columns.actual = {setting.page.right() - kActual_mm, kActual_mm};
  columns.target.width_mm = target.within(36.0);
  columns.target.left_mm = columns.actual.left_mm - 5.0 - columns.target.width_mm;
  columns.ratio.width_mm = ratio.within(20.0);
  columns.ratio.left_mm = columns.target.left_mm - kColumnGap_mm - columns.ratio.width_mm;
  columns.supply.width_mm = supply.within(37.0);
  columns.supply.left_mm = columns.ratio.left_mm - kColumnGap_mm - columns.supply.width_mm;
  columns.tick = {setting.page.left(), kTick_mm};
  columns.component.left_mm = columns.tick.right() + kColumnGap_mm;
  columns.component.width_mm = columns.supply.left_mm - kColumnGap_mm - columns.component.left_mm;
  return columns;
}

Block headBlock(const Setting& setting, const Columns& columns) {
  const auto label = [&](const char* text, const Column& column, Align align) {
    return TextBlock(setting.typesetter, QString::fromLatin1(text), kHead, column.width_mm, align);
  };
  const std::vector<std::pair<TextBlock, double>> labels{
      {label("done", {0.0, 20.0}, Align::kLeft), columns.tick.left_mm},
      {label("component", columns.component, Align::kLeft), columns.component.left_mm},
      {label("supply", columns.supply, Align::kLeft), columns.supply.left_mm},
      {label("ratio", columns.ratio, Align::kRight), columns.ratio.left_mm},
      {label("target", columns.target, Align::kRight), columns.target.left_mm},
      {label("actual", columns.actual, Align::kLeft), columns.actual.left_mm}};
  const double textHeight = labels.front().first.height_mm();
  const double left = setting.page.left();
  const double width = setting.page.contentWidth();
  return {textHeight + 1.4, [labels, textHeight, left, width](PagePainter& painter, double y_mm) {
            for (const auto& [text, x] : labels) painter.text(text, x, y_mm);
            painter.rule(left, y_mm + textHeight + 1.4, width, colours::kBox, 0.3);
          }};
}

/// A stack of paragraphs in one cell.
struct Cell {
  TextBlock first;
  TextBlock second;
  TextBlock third;
  double left_mm = 0.0;

  [[nodiscard]] double height_mm() const {
    return first.height_mm() + second.height_mm() + third.height_mm();
  }
  void draw(PagePainter& painter, double y_mm) const {
    painter.text(first, left_mm, y_mm);
    painter.text(second, left_mm, y_mm + first.height_mm());
    painter.text(third, left_mm, y_mm + first.height_mm() + second.height_mm());
  }
};

/// The texts of a row, set, on one baseline.
struct RowCells {
  std::vector<Cell> cells;
  double ascent_mm = 0.0;
  double height_mm = 0.0;

  void settle() {
    for (const Cell& cell : cells) ascent_mm = std::max(ascent_mm, cell.first.ascent_mm());
    for (const Cell& cell : cells) {
      height_mm = std::max(height_mm, ascent_mm - cell.first.ascent_mm() + cell.height_mm());
    }
  }
};

/// Role, CAS number, molar mass and amount: on one line, or on two of a kind.
TextBlock detailOf(const Setting& setting, const Column& column, const app::SheetRow& row) {
  const QString who = dotted({toQString(row.role), toQString(row.cas)});
  const QString much = dotted({unbroken(row.molarMass), unbroken(row.amount)});
  const QString line = dotted({who, much});
  if (who.isEmpty() || much.isEmpty() ||
      textWidth_mm(setting.typesetter, line, kDetail) < column.width_mm) {
    return TextBlock(setting.typesetter, line, kDetail, column.width_mm);
  }
  return TextBlock(setting.typesetter, who + QChar(QChar::LineSeparator) + much, kDetail,
                   column.width_mm);
}

RowCells cellsOf(const Setting& setting, const Columns& columns, const app::SheetRow& row,
                 const TextBlock& name) {
  const auto set = [&](const QString& text, const TextStyle& style, const Column& column,
                       Align align = Align::kLeft) {
    return TextBlock(setting.typesetter, text, style, column.width_mm, align);
  };
  const TextBlock detail = detailOf(setting, columns.component, row);
  RowCells cells;
  cells.cells = {{name.isEmpty() ? detail : name,
                  name.isEmpty() ? TextBlock() : detail,
                  {},
                  columns.component.left_mm},
                 {set(toQString(row.supply), kCell, columns.supply),
                  set(toQString(row.device), kDetail, columns.supply),
                  {},
                  columns.supply.left_mm},
                 {set(toQString(row.ratio), kCell, columns.ratio, Align::kRight),
                  {},
                  {},
                  columns.ratio.left_mm},
                 {set(targetOf(row), kTarget, columns.target, Align::kRight),
                  set(unbroken(row.tolerance), kTolerance, columns.target, Align::kRight),
                  set(unbroken(row.alternative), kTolerance, columns.target, Align::kRight),
                  columns.target.left_mm}};
  cells.settle();
  return cells;
}

/// What was weighed, or the unit in the box's corner, so that the number alone has to be written.
struct ActualBox {
  TextBlock text;
  TextBlock unit;
  QRectF place_mm;  ///< from the row's top

  void draw(PagePainter& painter, double y_mm) const {
    constexpr double kPad_mm = 1.6;
    const QRectF box = place_mm.translated(0.0, y_mm);
    painter.box(box);
    painter.text(text, box.left() + kPad_mm, box.center().y() - text.height_mm() / 2.0);
    painter.text(unit, box.right() - kPad_mm - unit.width_mm(),
                 box.bottom() - 1.0 - unit.height_mm());
  }
};

ActualBox actualOf(const Setting& setting, const Columns& columns, const app::SheetRow& row,
                   double top_mm) {
  constexpr double kPad_mm = 1.6;
  const double width = columns.actual.width_mm - 2.0 * kPad_mm;
  ActualBox actual;
  actual.text =
      TextBlock(setting.typesetter, toQString(row.actual), kActual, width, Align::kCentre);
  if (row.actual.empty())
    actual.unit = TextBlock(setting.typesetter, toQString(row.unit), kHead, width);
  actual.place_mm =
      QRectF(columns.actual.left_mm, top_mm, columns.actual.width_mm,
             std::max({setting.density.box_mm, actual.text.height_mm() + 2.0 * kPad_mm,
                       actual.unit.height_mm() + 2.0}));
  return actual;
}

/// The row without its notices and without a name that is set above it.
Block cellsBlock(const Setting& setting, const Columns& columns, const app::SheetRow& row,
                 const TextBlock& name, bool hasTick) {
  const RowCells cells = cellsOf(setting, columns, row, name);
  const double pad = hasTick ? setting.density.rowPad_mm : 0.8;
  const ActualBox actual = actualOf(setting, columns, row, pad);
  const double tickTop = pad + (setting.density.box_mm - kTick_mm) / 2.0;
  // Text begins a little below the box's upper edge, so that a single line stands in its middle.
  const double textTop = pad + std::max(0.0, (setting.density.box_mm - 9.0) / 2.0);
  return {std::max(actual.place_mm.bottom(), textTop + cells.height_mm),
          [=](PagePainter& painter, double y_mm) {
            if (hasTick) painter.tickBox(columns.tick.left_mm, y_mm + tickTop, kTick_mm);
            for (const Cell& cell : cells.cells) {
              cell.draw(painter, y_mm + textTop + cells.ascent_mm - cell.first.ascent_mm());
            }
            actual.draw(painter, y_mm);
          }};
}

/// A name too long for its column, over the whole width, with the row's tick box at its side.
Blocks longNameBlocks(const Setting& setting, const Columns& columns, const app::SheetRow& row) {
  const double left = columns.component.left_mm;
  const TextBlock name(setting.typesetter, toQString(row.name), kLongName,
                       setting.page.right() - left);
  Blocks blocks = paragraphBlocks(name, left, 0.0);
  Block& first = blocks.front();
  const double pad = setting.density.rowPad_mm;
  first.height_mm += pad;
  first.draw = [draw = first.draw, pad, x = columns.tick.left_mm](PagePainter& painter,
                                                                  double y_mm) {
    painter.tickBox(x, y_mm + pad, kTick_mm);
    draw(painter, y_mm + pad);
  };
  return blocks;
}

/// A little smaller where that keeps the name on one line.
TextStyle nameStyle(const Setting& setting, const app::SheetRow& row, double width_mm) {
  TextStyle style = kName;
  for (const double size : {9.8, 9.3, 8.8}) {
    style.size_pt = size;
    if (textWidth_mm(setting.typesetter, toQString(row.name), style) < width_mm) return style;
  }
  return kName;
}

Blocks rowBlocks(const Setting& setting, const Columns& columns, const app::SheetRow& row) {
  constexpr int kMostLines = 3;
  Blocks blocks;
  TextBlock name(setting.typesetter, toQString(row.name),
                 nameStyle(setting, row, columns.component.width_mm), columns.component.width_mm);
  const bool isLong = name.lines() > kMostLines;
  if (isLong) {
    blocks = longNameBlocks(setting, columns, row);
    name = {};
  }
  blocks.push_back(cellsBlock(setting, columns, row, name, !isLong));
  const double x = columns.component.left_mm;
  Blocks notices = noticeBlocks(setting, row.notices, x, setting.page.right() - x);
  for (std::size_t i = 0; i < notices.size(); ++i) {
    if (i == 0) notices[i].gap_mm = 1.2;
    blocks.push_back(std::move(notices[i]));
  }
  const double left = setting.page.left();
  const double width = setting.page.contentWidth();
  const double pad = setting.density.rowPad_mm;
  Block& last = blocks.back();
  const double height = last.height_mm;
  last.height_mm += pad;
  last.draw = [draw = last.draw, height, pad, left, width](PagePainter& painter, double y_mm) {
    draw(painter, y_mm);
    painter.rule(left, y_mm + height + pad, width);
  };
  return blocks;
}

}  // namespace

void addWeighingTable(PageFlow& flow, const Setting& setting,
                      const std::vector<app::SheetRow>& rows) {
  if (rows.empty()) return;
  const Columns columns = columnsFor(setting, rows);
  Block head = headBlock(setting, columns);
  Blocks first{head};
  first.front().gap_mm = setting.density.sectionGap_mm;
  first.front().isHeading = true;
  for (Block& block : rowBlocks(setting, columns, rows.front())) first.push_back(std::move(block));
  flow.addTogether(first);
  flow.repeatOnNewPages(head);
  for (std::size_t i = 1; i < rows.size(); ++i)
    flow.addTogether(rowBlocks(setting, columns, rows[i]));
  flow.repeatOnNewPages({});
}

}  // namespace vialkeeper::exports
