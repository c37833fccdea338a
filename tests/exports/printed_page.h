// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "exports/pages.h"

/// Reads a PDF back with other people's programs: poppler's tools and zbarimg.
namespace vialkeeper::exports {

/// A word where it stands, in points from the page's upper left corner.
struct Word {
  int page = 0;  ///< from 0
  double left = 0.0;
  double top = 0.0;
  double right = 0.0;
  double bottom = 0.0;
  std::string text;
};

/// A document in a folder of its own that goes with it.
class PrintedPages {
 public:
  explicit PrintedPages(const PdfDocument& document);
  PrintedPages(const PrintedPages&) = delete;
  PrintedPages& operator=(const PrintedPages&) = delete;
  ~PrintedPages();

  /// What a program prints; `%` in its arguments stands for the PDF, `@` for the folder.
  [[nodiscard]] std::string output(std::string command) const;
  [[nodiscard]] std::vector<Word> words() const;
  /// All text in the order in which it was drawn, without blanks, line breaks and hyphens.
  [[nodiscard]] std::string squeezedText() const;
  /// The text of the codes on a page, from 1, rendered at 200 dpi.
  [[nodiscard]] std::string scannedCode(int page) const;
  /// Pixels of a colour on the first page at 100 dpi.
  [[nodiscard]] long pixelsOf(int red, int green, int blue) const;

 private:
  std::string m_folder;
};

/// The text without blanks, line breaks and hyphens.
[[nodiscard]] std::string squeezed(const std::string& text);

}  // namespace vialkeeper::exports
