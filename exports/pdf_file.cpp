// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/pdf_file.h"

#include <QMarginsF>
#include <QPageSize>
#include <QPainter>
#include <algorithm>
#include <string_view>

namespace vialkeeper::exports {
namespace {

/// A hundredth of a millimetre for every unit, finer than any printer.
constexpr int kResolution_dpi = 2540;
constexpr double kUnitsPerMm = 100.0;

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
    : m_writer(&m_buffer) {
  m_buffer.open(QIODevice::WriteOnly);
  const bool isA4 = paper == Paper::kA4;
  m_geometry.width_mm = isA4 ? 210.0 : 215.9;
  m_geometry.height_mm = isA4 ? 297.0 : 279.4;
  // All of this must stand before a painter begins: Qt fixes the page at that moment.
  m_writer.setResolution(kResolution_dpi);
  m_writer.setPageSize(QPageSize(isA4 ? QPageSize::A4 : QPageSize::Letter));
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
  return document;
}

}  // namespace vialkeeper::exports
