// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/gui_session.h"
#include "exports/page_pictures.h"
#include "exports/pages_module.h"
#include "exports/pdf_file.h"
#include "exports/qr_code.h"
#include "exports/stock_sheet.h"
#include "exports/vial_label.h"
#include "exports/weighing_sheet.h"

namespace vialkeeper::exports {
namespace {

/// The text's code; none for an empty text.
text::Checked<std::optional<QrCode>> codeFor(const std::string& text) {
  if (text.empty()) return std::optional<QrCode>();
  std::optional<QrCode> code = makeQrCode(text);
  if (code) return code;
  return std::unexpected(text::Faults{
      {.what = "the text for the printed code has " + std::to_string(text.size()) + " bytes",
       .mend = "give the run a shorter code: a printed code holds 2331 bytes"}});
}

class QtPagePrinter final : public PagePrinter {
 public:
  text::Checked<PdfDocument> weighingSheet(const app::SheetContent& content,
                                           const SchemePictures& pictures, Paper paper) override {
    const auto family = startGuiSession();
    if (!family) return std::unexpected(family.error());
    const auto qr = codeFor(content.qrText);
    if (!qr) return std::unexpected(qr.error());
    PdfFile file(paper, *family, content.title);
    return file.write(
        {layOutWeighingSheet(file.typesetter(), file.geometry(), content, pictures, *qr)});
  }

  text::Checked<PdfDocument> stockSheets(const std::vector<app::StockSheetContent>& contents,
                                         Paper paper) override {
    if (contents.empty()) {
      return std::unexpected(
          text::Faults{{.what = "the plan uses no stock solution to print a sheet for",
                        .mend = "print the weighing sheet alone"}});
    }
    const auto family = startGuiSession();
    if (!family) return std::unexpected(family.error());
    PdfFile file(paper, *family, contents.front().title);
    std::vector<PageFlow> flows;
    for (const app::StockSheetContent& content : contents) {
      const auto qr = codeFor(content.qrText);
      if (!qr) return std::unexpected(qr.error());
      flows.push_back(layOutStockSheet(file.typesetter(), file.geometry(), content, *qr));
    }
    return file.write(flows);
  }

  text::Checked<PdfDocument> vialLabels(const std::vector<app::LabelContent>& contents) override {
    const auto family = startGuiSession();
    if (!family) return std::unexpected(family.error());
    PdfFile file(vialLabelGeometry(), *family, contents.empty() ? "" : contents.front().title);
    const auto flows = layOutLabels(file, contents);
    if (!flows) return std::unexpected(flows.error());
    return file.write(*flows);
  }

  text::Checked<std::vector<PagePicture>> weighingSheetPictures(const app::SheetContent& content,
                                                                const SchemePictures& pictures,
                                                                Paper paper,
                                                                double resolution_dpi) override {
    const auto family = startGuiSession();
    if (!family) return std::unexpected(family.error());
    const auto qr = codeFor(content.qrText);
    if (!qr) return std::unexpected(qr.error());
    const PdfFile file(paper, *family, content.title);
    return paintPages(
        {layOutWeighingSheet(file.typesetter(), file.geometry(), content, pictures, *qr)},
        file.typesetter(), file.geometry(), resolution_dpi);
  }

  text::Checked<std::vector<PagePicture>> vialLabelPictures(
      const std::vector<app::LabelContent>& contents, double resolution_dpi) override {
    const auto family = startGuiSession();
    if (!family) return std::unexpected(family.error());
    const PdfFile file(vialLabelGeometry(), *family,
                       contents.empty() ? "" : contents.front().title);
    const auto flows = layOutLabels(file, contents);
    if (!flows) return std::unexpected(flows.error());
    return paintPages(*flows, file.typesetter(), file.geometry(), resolution_dpi);
  }

 private:
  static text::Checked<std::vector<PageFlow>> layOutLabels(
      const PdfFile& file, const std::vector<app::LabelContent>& contents) {
    if (contents.empty()) {
      return std::unexpected(text::Faults{
          {.what = "there is no vial to print a label for", .mend = "name a plan or a run"}});
    }
    std::vector<PageFlow> flows;
    for (const app::LabelContent& content : contents) {
      const auto qr = codeFor(content.qrText);
      if (!qr) return std::unexpected(qr.error());
      const auto label = layOutVialLabel(file.typesetter(), content, *qr);
      if (!label) return std::unexpected(label.error());
      flows.push_back(*label);
    }
    return flows;
  }
};

}  // namespace
}  // namespace vialkeeper::exports

/// The module's one export; the object is kept by the module and never destroyed.
extern "C" __attribute__((visibility("default"))) vialkeeper::exports::PagePrinter*
vialkeeper_open_page_printer(int abiVersion) {
  using namespace vialkeeper::exports;
  if (abiVersion != kPagesModuleAbi) return nullptr;
  static PagePrinter* printer = new QtPagePrinter;
  return printer;
}
