// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "app/sheet_content.h"
#include "text/fault.h"

/// Printed pages. Plain values in, the bytes of a PDF out; nothing of Qt shows through, so that the
/// command line can use it. The pages module, which holds Qt, is loaded on first use.
namespace vialkeeper::exports {

enum class Paper { kA4, kLetter };

/// A finished document.
struct PdfDocument {
  std::string bytes;
  int pages = 0;
};

/// A page as it will be printed: rows of red, green and blue from the top left, without padding.
struct PagePicture {
  int width_px = 0;
  int height_px = 0;
  double width_mm = 0.0;
  double height_mm = 0.0;
  std::string rgb;
};

/// The weighing sheet: one page where it fits, else broken between rows with the table's head
/// repeated. Fonts are embedded, text can be selected, structures and the QR code are vector
/// graphics. Fault: the pages module or a font is missing, a structure cannot be drawn.
[[nodiscard]] text::Checked<PdfDocument> printWeighingSheet(const app::SheetContent& content,
                                                            Paper paper);

/// One page for every stock solution.
[[nodiscard]] text::Checked<PdfDocument> printStockSheets(
    const std::vector<app::StockSheetContent>& contents, Paper paper);

/// Labels of vials, one a page of 62 mm × 29 mm, the size of a common label roll (common practice,
/// no source); pure black, for printers that know nothing else. Long texts are set smaller;
/// contents that still have no room are cut with an ellipsis, then the title after two lines and
/// the person; the code, conditions, hazards and caution never.
/// Fault: no content, a text for the printed code that is too long for a label, hazards and caution
/// that do not fit; the pages module or a font is missing.
[[nodiscard]] text::Checked<PdfDocument> printVialLabels(
    const std::vector<app::LabelContent>& contents);

/// The same pages as pictures, for a preview and for printers. Faults as above.
[[nodiscard]] text::Checked<std::vector<PagePicture>> paintWeighingSheet(
    const app::SheetContent& content, Paper paper, double resolution_dpi);
[[nodiscard]] text::Checked<std::vector<PagePicture>> paintVialLabels(
    const std::vector<app::LabelContent>& contents, double resolution_dpi);

}  // namespace vialkeeper::exports
