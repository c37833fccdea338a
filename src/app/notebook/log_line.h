// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>

#include "app/notebook/records.h"
#include "text/text_fault.h"

/// The one line in which people log what happens to a vial: `p 0.42 bar 35 C`. Its words stand in
/// docs/log.md. The same reading serves the command line and a field that is read with every key.
namespace vialkeeper::app {

/// How a line was understood.
struct ReadEntry {
  EventRecord event;     ///< kind, raw and what was read; moments, person and run are the caller's
  std::string sentence;  ///< the reading in words, `pressure 0.42 bar gauge at 35 °C`; one line
  std::string photo;     ///< the file as typed, of a photo only
  /// The line looks like a shorthand but cannot be read as one: it stands as an observation unless
  /// its author mends it. Offsets are bytes of the line.
  std::optional<text::TextFault> doubt;
  std::string meant;  ///< with a doubt: the kind that the line seems to mean
  bool likelyText =
      false;  ///< with a doubt: there is no figure and no unit, so it may well be text

  /// Whether the doubt is only that something is still missing at the end, as while typing.
  [[nodiscard]] bool isUnfinished() const;
};

/// Reads one line; never fails, whatever the bytes: what is no shorthand is an observation, word
/// for word. Pure: the same line is always read in the same way. Cost is linear in the line's
/// length. Numbers take a decimal point or comma, units may follow without a blank and in any case
/// that is not ambiguous; a quantity without its unit is a doubt. A pressure is gauge unless `abs`
/// is said; `vent`, `purge`, `gas added` and `headspace` want the word, and a barometer is
/// absolute. What follows a semicolon is a remark and goes into the note.
[[nodiscard]] ReadEntry readLogLine(std::string_view line);

/// The line as text alone, for a sealed run: kind `addendum`.
[[nodiscard]] ReadEntry readAddendum(std::string_view line);

}  // namespace vialkeeper::app
