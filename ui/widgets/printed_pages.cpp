// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/printed_pages.h"

#include <QCoreApplication>
#include <QSaveFile>
#include <cstring>

#include "app/sheet_content.h"
#include "exports/pages.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

constexpr double kMmPerMetre = 1000.0;

exports::Paper paperOf(Printed what) {
  return what == Printed::kSheetLetter ? exports::Paper::kLetter : exports::Paper::kA4;
}

PageImage imageOf(const exports::PagePicture& picture) {
  QImage image(picture.width_px, picture.height_px, QImage::Format_RGB888);
  const auto rowBytes = static_cast<std::size_t>(picture.width_px) * 3;
  for (int y = 0; y < picture.height_px; ++y)
    std::memcpy(image.scanLine(y), picture.rgb.data() + static_cast<std::size_t>(y) * rowBytes,
                rowBytes);
  image.setDotsPerMeterX(qRound(picture.width_px / picture.width_mm * kMmPerMetre));
  image.setDotsPerMeterY(qRound(picture.height_px / picture.height_mm * kMmPerMetre));
  return {std::move(image), QSizeF(picture.width_mm, picture.height_mm)};
}

}  // namespace

text::Checked<std::vector<PageImage>> pageImages(const app::RunSheet& sheet, Printed what,
                                                 double resolution_dpi) {
  const auto pictures =
      what == Printed::kLabel
          ? exports::paintVialLabels({app::vialLabel(sheet.planned)}, resolution_dpi)
          : exports::paintWeighingSheet(app::weighingSheet(sheet.planned), paperOf(what),
                                        resolution_dpi);
  if (!pictures) return std::unexpected(pictures.error());
  std::vector<PageImage> images;
  for (const exports::PagePicture& picture : *pictures) images.push_back(imageOf(picture));
  return images;
}

text::Checked<std::string> pagePdf(const app::RunSheet& sheet, Printed what) {
  auto document =
      what == Printed::kLabel
          ? exports::printVialLabels({app::vialLabel(sheet.planned)})
          : exports::printWeighingSheet(app::weighingSheet(sheet.planned), paperOf(what));
  if (!document) return std::unexpected(document.error());
  return std::move(document->bytes);
}

QString savePdf(const app::RunSheet& sheet, Printed what, const QString& file) {
  const auto bytes = pagePdf(sheet, what);
  if (!bytes) return sentences(bytes.error());
  QSaveFile target(file);
  const bool saved =
      target.open(QIODevice::WriteOnly) &&
      target.write(QByteArray::fromStdString(*bytes)) == static_cast<qint64>(bytes->size()) &&
      target.commit();
  if (saved) return {};
  return QCoreApplication::translate("PrintedPages", "%1 could not be written: %2.")
      .arg(file, target.errorString());
}

}  // namespace vialkeeper::ui
