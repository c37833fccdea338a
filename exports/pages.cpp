// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/pages.h"

#include "exports/pages_module.h"
#include "exports/scheme_pictures.h"

namespace vialkeeper::exports {

text::Checked<PdfDocument> printWeighingSheet(const app::SheetContent& content, Paper paper) {
  const auto printer = pagePrinter();
  if (!printer) return std::unexpected(printer.error());
  const auto pictures = drawStructures(content.scheme);
  if (!pictures) return std::unexpected(pictures.error());
  return (*printer)->weighingSheet(content, *pictures, paper);
}

text::Checked<PdfDocument> printStockSheets(const std::vector<app::StockSheetContent>& contents,
                                            Paper paper) {
  const auto printer = pagePrinter();
  if (!printer) return std::unexpected(printer.error());
  return (*printer)->stockSheets(contents, paper);
}

text::Checked<PdfDocument> printVialLabels(const std::vector<app::LabelContent>& contents) {
  const auto printer = pagePrinter();
  if (!printer) return std::unexpected(printer.error());
  return (*printer)->vialLabels(contents);
}

text::Checked<std::vector<PagePicture>> paintWeighingSheet(const app::SheetContent& content,
                                                           Paper paper, double resolution_dpi) {
  const auto printer = pagePrinter();
  if (!printer) return std::unexpected(printer.error());
  const auto pictures = drawStructures(content.scheme);
  if (!pictures) return std::unexpected(pictures.error());
  return (*printer)->weighingSheetPictures(content, *pictures, paper, resolution_dpi);
}

text::Checked<std::vector<PagePicture>> paintVialLabels(
    const std::vector<app::LabelContent>& contents, double resolution_dpi) {
  const auto printer = pagePrinter();
  if (!printer) return std::unexpected(printer.error());
  return (*printer)->vialLabelPictures(contents, resolution_dpi);
}

}  // namespace vialkeeper::exports
