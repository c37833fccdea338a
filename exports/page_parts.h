// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "app/sheet_content.h"
#include "exports/page_flow.h"
#include "exports/qr_code.h"

/// What the weighing sheet and the stock sheet have in common.
namespace vialkeeper::exports {

/// How much air a page has: where a looser one would need another page, a denser one is taken.
struct Density {
  double rowPad_mm = 2.2;  ///< above and below each row of the table
  double box_mm = 9.5;     ///< height of the boxes to write in
  double sectionGap_mm = 7.0;
  double bond_mm = 5.2;  ///< see SchemeSize
  double structure_mm = 40.0;
  double vial_mm = 36.0;      ///< height of the drawn vial
  double body_pt = 8.0;       ///< cautions, hazards and what is known of the vial
  double paragraph_mm = 1.3;  ///< between two of them
};

/// What every part is set with.
struct Setting {
  const Typesetter& typesetter;
  const PageGeometry& page;
  Density density = {};
};

/// A label with its value, `chemist KW`; without a value a line to fill in.
struct Entry {
  QString label;
  QString value;
};

struct Masthead {
  std::string code;
  bool codeIsMark = false;  ///< no code of a run: set quietly, the title takes its place
  std::string title;
  std::vector<Entry> entries;
  std::optional<QrCode> qr;
};

/// The code and title, large, the entries below them, and the printed code in the right corner.
[[nodiscard]] Block mastheadBlock(const Setting& setting, const Masthead& masthead);

/// A slim running head with code and title, and the foot with `page 2 of 3`.
[[nodiscard]] PageFurniture furniture(const Setting& setting, const std::string& code,
                                      const std::string& title, const std::string& footer);

/// A paragraph at a left edge: one block, more where it is longer than most of a page.
[[nodiscard]] Blocks paragraphBlocks(const TextBlock& text, double x_mm, double gap_mm);

/// A section's heading.
[[nodiscard]] TextBlock heading(const Setting& setting, const QString& text);

/// Notices, one a block, each behind a warning sign.
[[nodiscard]] Blocks noticeBlocks(const Setting& setting, const std::vector<std::string>& notices,
                                  double x_mm, double width_mm);

/// Hazard statements under their heading, in two columns to be read one after the other; one below
/// the other where a substance has too many for that.
[[nodiscard]] Blocks hazardBlocks(const Setting& setting,
                                  const std::vector<app::HazardContent>& hazards);

/// A block on the left with the cautions to its right; cautions that would be much longer than
/// the block are set below it in the full width.
[[nodiscard]] Blocks besideCautions(const Setting& setting, const Block& left, double leftWidth_mm,
                                    const std::vector<std::string>& cautions);

/// Labels with lines to fill in, over the whole width.
[[nodiscard]] Block signBlock(const Setting& setting, const std::vector<QString>& labels);

/// Ends the last page: notes on what is left of it, if that is enough, and the line to sign.
/// True where there was room for notes.
bool closePage(PageFlow& flow, const Setting& setting, const std::vector<QString>& signLabels);

/// The texts that are not empty, with dots between; a line never begins with a dot.
[[nodiscard]] QString dotted(const std::vector<QString>& texts);

/// The text with blanks at which no line breaks: a number and its unit stay together.
[[nodiscard]] QString unbroken(const std::string& text);

}  // namespace vialkeeper::exports
