// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <vector>

#include "exports/page_painter.h"

namespace vialkeeper::exports {

/// What is never cut in two by a page's end.
struct Block {
  double height_mm = 0.0;
  std::function<void(PagePainter&, double y_mm)> draw = {};
  double gap_mm = 0.0;     ///< above it, except at the top of a page
  bool isHeading = false;  ///< never the last on a page
};

using Blocks = std::vector<Block>;

/// The sum of the heights, and of the gaps between.
[[nodiscard]] double heightOf(const Blocks& blocks);

/// The page and what of it may be printed on.
struct PageGeometry {
  double width_mm = 210.0;
  double height_mm = 297.0;
  double side_mm = 14.0;
  double top_mm = 12.0;
  double bottom_mm = 10.0;

  [[nodiscard]] double left() const { return side_mm; }
  [[nodiscard]] double right() const { return width_mm - side_mm; }
  [[nodiscard]] double contentWidth() const { return width_mm - 2.0 * side_mm; }
};

/// The head of every page but the first, and the foot of every page; they learn the page's number
/// and how many there are.
struct PageFurniture {
  double headHeight_mm = 0.0;
  double footHeight_mm = 0.0;
  std::function<void(PagePainter&, double y_mm)> head = {};
  std::function<void(PagePainter&, double y_mm, int page, int pages)> foot = {};
};

/// Puts blocks below each other, and on a new page where the old one is full.
class PageFlow {
 public:
  PageFlow(const PageGeometry& geometry, PageFurniture furniture);

  void add(const Block& block);
  /// Keeps the blocks on one page; where even an empty one is too small they break between blocks.
  void addTogether(const Blocks& blocks);
  /// From here on new pages begin with this block; an empty block ends that.
  void repeatOnNewPages(const Block& block) { m_repeated = block; }
  void newPage();
  /// At the lower end of the page, whatever is above it; the caller has seen that there is room.
  void addAtBottom(const Block& block);

  [[nodiscard]] double remaining_mm() const { return m_bottom - m_y; }
  /// The room on a page that holds nothing yet.
  [[nodiscard]] double emptyPage_mm() const;
  [[nodiscard]] int pages() const { return static_cast<int>(m_pages.size()); }

  /// Draws the page counted from 0.
  void draw(int page, PagePainter& painter) const;

 private:
  struct Placed {
    double y_mm;
    Block block;
  };
  [[nodiscard]] bool isAtTop() const { return m_y <= m_start; }
  void place(const Block& block);

  PageGeometry m_geometry;
  PageFurniture m_furniture;
  Block m_repeated;
  std::vector<std::vector<Placed>> m_pages{1};
  double m_bottom;
  double m_start;  ///< where the content of this page begins
  double m_y;
};

}  // namespace vialkeeper::exports
