// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/page_flow.h"

#include <utility>

namespace vialkeeper::exports {
namespace {

/// Sums of heights are rounded differently on the way to a decision; a hundredth of this is seen
/// by nobody.
constexpr double kSlack_mm = 1e-6;

}  // namespace

double heightOf(const Blocks& blocks) {
  double height = 0.0;
  for (std::size_t i = 0; i < blocks.size(); ++i) {
    height += blocks[i].height_mm + (i > 0 ? blocks[i].gap_mm : 0.0);
  }
  return height;
}

PageFlow::PageFlow(const PageGeometry& geometry, PageFurniture furniture)
    : m_geometry(geometry),
      m_furniture(std::move(furniture)),
      m_bottom(geometry.height_mm - geometry.bottom_mm - m_furniture.footHeight_mm),
      m_start(geometry.top_mm),
      m_y(geometry.top_mm) {}

double PageFlow::emptyPage_mm() const {
  return m_bottom - m_geometry.top_mm - m_furniture.headHeight_mm - m_repeated.height_mm;
}

void PageFlow::place(const Block& block) {
  if (!isAtTop()) m_y += block.gap_mm;
  if (block.draw) m_pages.back().push_back({m_y, block});
  m_y += block.height_mm;
}

void PageFlow::newPage() {
  m_pages.emplace_back();
  m_y = m_geometry.top_mm + m_furniture.headHeight_mm;
  m_start = m_y;
  if (m_repeated.height_mm <= 0.0) return;
  place(m_repeated);
  m_start = m_y;
}

void PageFlow::add(const Block& block) { addTogether({block}); }

void PageFlow::addTogether(const Blocks& blocks) {
  if (blocks.empty()) return;
  const double height = heightOf(blocks);
  const double gap = isAtTop() ? 0.0 : blocks.front().gap_mm;
  const bool fitsHere = height + gap <= remaining_mm() + kSlack_mm;
  const bool fitsOnePage = height <= emptyPage_mm() + kSlack_mm;
  if (!fitsHere && fitsOnePage && !isAtTop()) newPage();
  for (std::size_t i = 0; i < blocks.size(); ++i) {
    double needed = blocks[i].height_mm + (isAtTop() ? 0.0 : blocks[i].gap_mm);
    if (blocks[i].isHeading && i + 1 < blocks.size()) {
      needed += blocks[i + 1].gap_mm + blocks[i + 1].height_mm;
    }
    if (needed > remaining_mm() + kSlack_mm && !isAtTop()) newPage();
    place(blocks[i]);
  }
}

void PageFlow::addAtBottom(const Block& block) {
  m_pages.back().push_back({m_bottom - block.height_mm, block});
  m_y = m_bottom;
}

void PageFlow::draw(int page, PagePainter& painter) const {
  if (page > 0 && m_furniture.head) m_furniture.head(painter, m_geometry.top_mm);
  for (const Placed& placed : m_pages[static_cast<std::size_t>(page)]) {
    placed.block.draw(painter, placed.y_mm);
  }
  if (m_furniture.foot) {
    m_furniture.foot(painter, m_bottom, page + 1, pages());
  }
}

}  // namespace vialkeeper::exports
