// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QBuffer>
#include <QPageSize>
#include <QPdfWriter>
#include <string>
#include <vector>

#include "exports/page_flow.h"
#include "exports/pages.h"

namespace vialkeeper::exports {

/// One PDF in memory. Text is measured for it before the first page is drawn.
class PdfFile {
 public:
  PdfFile(Paper paper, const QString& family, const std::string& title);
  /// Pages of any size.
  PdfFile(const PageGeometry& geometry, const QString& family, const std::string& title);

  [[nodiscard]] const PageGeometry& geometry() const { return m_geometry; }
  [[nodiscard]] const Typesetter& typesetter() const { return m_typesetter; }

  /// Draws all pages of all flows, in order, and closes the file: to be called once. The same
  /// pages give the same bytes: the date that Qt writes into the file is taken out again.
  /// Fault: Qt cannot write.
  [[nodiscard]] text::Checked<PdfDocument> write(const std::vector<PageFlow>& flows);

 private:
  PdfFile(const PageGeometry& geometry, const QPageSize& size, const QString& family,
          const std::string& title);

  QBuffer m_buffer;
  QPdfWriter m_writer;
  PageGeometry m_geometry;
  Typesetter m_typesetter;
  bool m_isOfAnySize;
};

}  // namespace vialkeeper::exports
