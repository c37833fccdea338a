// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QFont>
#include <QModelIndex>
#include <QRect>
#include <QString>
#include <vector>

namespace vialkeeper::ui {

/// The fonts of the charge's table, from the application's.
struct ChargeFonts {
  explicit ChargeFonts(const QFont& base);
  QFont plain;
  QFont name;    ///< of a component
  QFont target;  ///< what to weigh: the number that is looked for
  QFont small;
};

/// A sentence below a row, over the table's whole width.
struct BandLine {
  enum class Kind { kFault, kQuestion, kNotice };
  Kind kind;
  QString text;
  int top = 0;  ///< from the row's top
  int height = 0;
};

/// Where everything of one row stands: the cells' two lines, and below them its sentences.
class ChargeRowLayout {
 public:
  static constexpr int kPadding = 8;
  static constexpr int kTop = 7;

  /// `nameWidth`: of the first column; `width`: of the whole row.
  ChargeRowLayout(const QModelIndex& first, const ChargeFonts& fonts, int nameWidth, int width);

  [[nodiscard]] int height() const { return m_height; }
  /// Of the cells without the sentences below.
  [[nodiscard]] int cellsHeight() const { return m_cellsHeight; }
  [[nodiscard]] const std::vector<BandLine>& band() const { return m_band; }
  /// Where the sentences begin, right of their signs.
  [[nodiscard]] int bandTextLeft() const { return m_textLeft; }
  /// Room for the answers to a question, from the row's top; empty without one.
  [[nodiscard]] const QRect& answers() const { return m_answers; }

  /// The width a cell's text needs on one line, with its padding.
  [[nodiscard]] static int widthOf(const QModelIndex& index, const ChargeFonts& fonts);
  /// The font of a cell's first line.
  [[nodiscard]] static const QFont& fontOf(int column, const ChargeFonts& fonts);
  /// How a text is drawn that may take several lines: broken between words, and within one only
  /// where it is wider than the line.
  [[nodiscard]] static int wrapping(const QString& text, const QFont& font, int width);
  [[nodiscard]] static int wrappedHeight(const QString& text, const QFont& font, int width);

 private:
  void add(BandLine::Kind kind, const QString& text, const ChargeFonts& fonts, int width);

  std::vector<BandLine> m_band;
  QRect m_answers;
  int m_cellsHeight = 0;
  int m_height = 0;
  int m_textLeft = 0;
};

}  // namespace vialkeeper::ui
