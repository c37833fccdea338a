// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/page_pictures.h"

#include <QImage>
#include <QPainter>

namespace vialkeeper::exports {
namespace {

constexpr double kMmPerInch = 25.4;

PagePicture pictureOf(const QImage& image, const PageGeometry& geometry) {
  PagePicture picture{.width_px = image.width(),
                      .height_px = image.height(),
                      .width_mm = geometry.width_mm,
                      .height_mm = geometry.height_mm,
                      .rgb = {}};
  const auto rowBytes = static_cast<std::size_t>(image.width()) * 3;
  picture.rgb.reserve(rowBytes * static_cast<std::size_t>(image.height()));
  for (int y = 0; y < image.height(); ++y)
    picture.rgb.append(reinterpret_cast<const char*>(image.constScanLine(y)), rowBytes);
  return picture;
}

}  // namespace

text::Checked<std::vector<PagePicture>> paintPages(const std::vector<PageFlow>& flows,
                                                   const Typesetter& typesetter,
                                                   const PageGeometry& geometry,
                                                   double resolution_dpi) {
  const double pixelsPerMm = resolution_dpi / kMmPerInch;
  const QSize size(qRound(geometry.width_mm * pixelsPerMm),
                   qRound(geometry.height_mm * pixelsPerMm));
  std::vector<PagePicture> pictures;
  for (const PageFlow& flow : flows) {
    for (int i = 0; i < flow.pages(); ++i) {
      QImage image(size, QImage::Format_RGB888);
      if (image.isNull()) {
        return std::unexpected(text::Faults{
            {.what = "the pages cannot be drawn", .mend = "free some memory and retry"}});
      }
      image.fill(Qt::white);
      QPainter painter(&image);
      painter.setRenderHints(QPainter::Antialiasing | QPainter::TextAntialiasing);
      painter.scale(pixelsPerMm / typesetter.unitsPerMm, pixelsPerMm / typesetter.unitsPerMm);
      PagePainter page(painter, typesetter);
      flow.draw(i, page);
      painter.end();
      pictures.push_back(pictureOf(image, geometry));
    }
  }
  return pictures;
}

}  // namespace vialkeeper::exports
