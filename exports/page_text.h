// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QColor>
#include <QString>
#include <QTextLayout>
#include <memory>
#include <string>
#include <vector>

class QPaintDevice;
class QPainter;

namespace vialkeeper::exports {

/// The colours of the printed pages. All text has a contrast of 5:1 or more on white, and every
/// meaning has a word or a shape beside its colour, for printers that know only black.
namespace colours {
inline constexpr QColor kInk(0x22, 0x26, 0x2B);
inline constexpr QColor kQuiet(0x5A, 0x5F, 0x67);    ///< what is read second
inline constexpr QColor kWarning(0x85, 0x55, 0x00);  ///< notices, beside their sign
inline constexpr QColor kBox(0x86, 0x82, 0x7A);      ///< boxes to write in
inline constexpr QColor kHairline(0xC9, 0xC4, 0xBA);
inline constexpr QColor kLiquid(0xF1, 0xDC, 0xAE);
}  // namespace colours

enum class Weight { kRegular, kBold };
enum class Align { kLeft, kCentre, kRight };

struct TextStyle {
  double size_pt = 8.5;
  Weight weight = Weight::kRegular;
  QColor colour = colours::kInk;
  double leading = 1.06;  ///< of the first run's style, in the font's own line heights
};

/// A stretch of text in one style.
struct TextRun {
  QString text;
  TextStyle style;
};

/// What text is measured for: the font family, and the device with its resolution.
struct Typesetter {
  QString family;
  QPaintDevice* device = nullptr;
  double unitsPerMm = 1.0;
};

/// A text of the content's: UTF-8, line breaks kept, other control characters and marks that
/// would turn the direction of what follows taken out.
[[nodiscard]] QString toQString(const std::string& utf8);

/// A paragraph set into lines, wrapped between words and, where one word is wider than the
/// column, inside it, so that nothing is ever cut off. Copies share the lines.
class TextBlock {
 public:
  /// Nothing: no height, draws nothing.
  TextBlock() = default;
  TextBlock(const Typesetter& typesetter, const std::vector<TextRun>& runs, double width_mm,
            Align align = Align::kLeft);
  TextBlock(const Typesetter& typesetter, const QString& text, const TextStyle& style,
            double width_mm, Align align = Align::kLeft);

  [[nodiscard]] bool isEmpty() const { return m_layout == nullptr; }
  [[nodiscard]] double height_mm() const { return m_height_mm; }
  /// Of the widest line.
  [[nodiscard]] double width_mm() const { return m_width_mm; }
  /// From the top to the first line's baseline.
  [[nodiscard]] double ascent_mm() const { return m_ascent_mm; }
  [[nodiscard]] int lines() const { return m_lines; }
  /// Some of its lines, as a paragraph of their own: for one that is longer than a page.
  [[nodiscard]] TextBlock slice(int firstLine, int lines) const;

  /// Draws with the top left corner of the column at the given place.
  void draw(QPainter& painter, double x_mm, double y_mm) const;

 private:
  void breakIntoLines(double width_units, double leading);

  std::shared_ptr<QTextLayout> m_layout;
  int m_firstLine = 0;
  int m_lines = 0;
  double m_unitsPerMm = 1.0;
  double m_height_mm = 0.0;
  double m_width_mm = 0.0;
  double m_ascent_mm = 0.0;
};

/// The width a text takes on one line.
[[nodiscard]] double textWidth_mm(const Typesetter& typesetter, const QString& text,
                                  const TextStyle& style);

/// The text, shortened with an ellipsis to fit on one line: for running heads only, where the
/// whole stands on the first page.
[[nodiscard]] QString shortened(const Typesetter& typesetter, const QString& text,
                                const TextStyle& style, double width_mm);

}  // namespace vialkeeper::exports
