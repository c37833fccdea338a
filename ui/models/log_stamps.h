// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <array>

#include "app/notebook/vial_strip.h"

namespace vialkeeper::ui {

/// What is stamped at the bench, in the order of the row.
enum class Stamp {
  kLamp,
  kPressure,
  kTemperature,
  kSample,
  kGasSample,
  kVent,
  kPurge,
  kPhoto,
  kNote,
};

inline constexpr std::array kStamps{Stamp::kLamp,   Stamp::kPressure,  Stamp::kTemperature,
                                    Stamp::kSample, Stamp::kGasSample, Stamp::kVent,
                                    Stamp::kPurge,  Stamp::kPhoto,     Stamp::kNote};

/// What a stamp does: it logs its line at once, or begins one and puts the cursor where the value
/// goes, or asks for a file.
struct StampDeed {
  enum class How { kLog, kBegin, kChooseFile } how = How::kLog;
  QString line = {};
  int cursor = 0;

  bool operator==(const StampDeed&) const = default;
};

[[nodiscard]] QString stampWord(Stamp stamp, bool lampIsOn);
/// The accent by meaning, as the style sheet calls it: `lamp`, `gas`, `sample`, `removal`, or
/// empty.
[[nodiscard]] QString stampMeaning(Stamp stamp);
/// The key beside the word: Alt with the digit of its place.
[[nodiscard]] QString stampKey(Stamp stamp);

/// What the stamp does now. A begun pressure takes the last temperature along; what stands in the
/// line already is kept behind the shorthand's word where it begins with a figure.
[[nodiscard]] StampDeed stampDeed(Stamp stamp, const app::VialStrip& strip, const QString& typed);

}  // namespace vialkeeper::ui
