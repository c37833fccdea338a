// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/pdf_file.h"

#include <QMarginsF>
#include <QPainter>
#include <algorithm>
#include <cmath>
#include <string_view>

namespace vialkeeper::exports {
namespace {

/// A hundredth of a millimetre for every unit, finer than any printer.
constexpr int kResolution_dpi = 2540;
constexpr double kUnitsPerMm = 100.0;

/// Writes a page's true size over the one that Qt has rounded to whole points. The length stays, so
/// that the file's table of offsets stays right; a size of another length is left rounded.
void putTrueSize(std::string& bytes, const QSizeF& size_pt) {
  const auto box = [](double width, double height) {
    return ("MediaBox [0 0 " + QByteArray::number(width, 'f', 6) + ' ' +
            QByteArray::number(height, 'f', 6) + ']')
        .toStdString();
  };
  const std::string rounded = box(std::round(size_pt.width()), std::round(size_pt.height()));
  const std::string exact = box(size_pt.width(), size_pt.height());
  if (exact.size() != rounded.size()) return;
  for (std::size_t at = bytes.find(rounded); at != std::string::npos;
       at = bytes.find(rounded, at)) {
    bytes.replace(at, exact.size(), exact);
    at += exact.size();
  }
}

/// Blanks out the entry of the document's information that says when the file was written. The
/// length stays, so that the file's table of offsets stays right.
void takeOutDate(std::string& bytes) {
  constexpr std::string_view kEntry = "/CreationDate (";
  const std::size_t start = bytes.rfind(kEntry);
  if (start == std::string::npos) return;
  const std::size_t end = bytes.find(')', start);
  if (end == std::string::npos) return;
  std::fill(bytes.begin() + static_cast<std::ptrdiff_t>(start),
            bytes.begin() + static_cast<std::ptrdiff_t>(end + 1), ' ');
}

}  // namespace

PdfFile::PdfFile(Paper paper, const QString& family, const std::string& title)
    : PdfFile(paper == Paper::kA4 ? PageGeometry{.width_mm = 210.0, .height_mm = 297.0}
                                  : PageGeometry{.width_mm = 215.9, .height_mm = 279.4},
              QPageSize(paper == Paper::kA4 ? QPageSize::A4 : QPageSize::Letter), family, title) {}

PdfFile::PdfFile(const PageGeometry& geometry, const QString& family, const std::string& title)
    : PdfFile(geometry,
              QPageSize(QSizeF(geometry.width_mm, geometry.height_mm), QPageSize::Millimeter,
                        QString(), QPageSize::ExactMatch),
              family, title) {}

PdfFile::PdfFile(const PageGeometry& geometry, const QPageSize& size, const QString& family,
                 const std::string& title)
    : m_writer(&m_buffer), m_geometry(geometry), m_isOfAnySize(size.id() == QPageSize::Custom) {
  m_buffer.open(QIODevice::WriteOnly);
  // All of this must stand before a painter begins: Qt fixes the page at that moment.
  m_writer.setResolution(kResolution_dpi);
  m_writer.setPageSize(size);
  m_writer.setPageMargins(QMarginsF(0.0, 0.0, 0.0, 0.0));
  m_writer.setTitle(toQString(title));
  m_writer.setCreator(QStringLiteral("Vialkeeper"));
  m_typesetter = {family, &m_writer, kUnitsPerMm};
}

text::Checked<PdfDocument> PdfFile::write(const std::vector<PageFlow>& flows) {
  QPainter painter;
  if (!painter.begin(&m_writer)) {
    return std::unexpected(text::Faults{
        {.what = "the pages cannot be written", .mend = "free some memory and retry"}});
  }
  painter.setRenderHint(QPainter::Antialiasing);
  PagePainter page(painter, m_typesetter);
  PdfDocument document;
  for (const PageFlow& flow : flows) {
    for (int i = 0; i < flow.pages(); ++i) {
      if (document.pages > 0) m_writer.newPage();
      flow.draw(i, page);
      ++document.pages;
    }
  }
  painter.end();
  document.bytes = m_buffer.data().toStdString();
  takeOutDate(document.bytes);
  if (m_isOfAnySize) {
    putTrueSize(document.bytes, QSizeF(m_geometry.width_mm, m_geometry.height_mm) * 72.0 / 25.4);
  }
  return document;
}

}  // namespace vialkeeper::exports
