// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "app/sheet_content.h"
#include "exports/pages.h"
#include "text/fault.h"

/// What the program and its pages module have agreed on. Nothing of Qt is named here.
namespace vialkeeper::exports {

/// Raised whenever a class of this file, of pages.h or of app/sheet_content.h changes: a module of
/// another number is refused before any of its functions is called.
inline constexpr int kPagesModuleAbi = 3;

inline constexpr const char* kPagesModuleFile = "vialkeeper_pages.so";
inline constexpr const char* kPagesModuleFactory = "vialkeeper_open_page_printer";

/// A structure as it is to be printed; without SVG the member's label stands in its place.
struct StructurePicture {
  std::string svg;
  int width_px = 0;
  int height_px = 0;
};

/// The structures of a scheme, one for each member, all drawn at one scale.
struct SchemePictures {
  std::vector<StructurePicture> reactants;
  std::vector<StructurePicture> products;
};

/// Lays out and writes pages; the functions are those of pages.h. Structures come ready drawn, so
/// that the module needs nothing of the program's core.
class PagePrinter {
 public:
  PagePrinter() = default;
  PagePrinter(const PagePrinter&) = delete;
  PagePrinter& operator=(const PagePrinter&) = delete;
  virtual ~PagePrinter() = default;
  [[nodiscard]] virtual text::Checked<PdfDocument> weighingSheet(const app::SheetContent& content,
                                                                 const SchemePictures& pictures,
                                                                 Paper paper) = 0;
  [[nodiscard]] virtual text::Checked<PdfDocument> stockSheets(
      const std::vector<app::StockSheetContent>& contents, Paper paper) = 0;
  [[nodiscard]] virtual text::Checked<PdfDocument> vialLabels(
      const std::vector<app::LabelContent>& contents) = 0;
  [[nodiscard]] virtual text::Checked<std::vector<PagePicture>> weighingSheetPictures(
      const app::SheetContent& content, const SchemePictures& pictures, Paper paper,
      double resolution_dpi) = 0;
  [[nodiscard]] virtual text::Checked<std::vector<PagePicture>> vialLabelPictures(
      const std::vector<app::LabelContent>& contents, double resolution_dpi) = 0;
};

/// The module's one export. The function takes the caller's ABI number and returns the printer,
/// which the module keeps, or null where the numbers differ.
using PagesModuleFactory = PagePrinter*(int abiVersion);

/// The printer, loaded on the first call and kept for the life of the process. Sought as the
/// structure modules are: see chem/rdkit/structure_module.h.
/// Fault: missing, not loadable, or of another ABI number; a fault is not kept.
[[nodiscard]] text::Checked<PagePrinter*> pagePrinter();

}  // namespace vialkeeper::exports
