// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <span>
#include <string>
#include <string_view>

#include "units/quantity.h"

namespace vialkeeper::units {

/// Who wrote the text. Files are exact; people may write a decimal comma and a few more spellings.
enum class Dialect { kFile, kPerson };

/// A unit as it may be written. SI value = number × numerator ÷ denominator + offset.
/// Two integers, not one factor, so that `0.2 mmol` becomes 0.2/1000 with a single rounding.
struct Unit {
  std::string_view symbol;  ///< both code points of µ, and °, are folded before the comparison
  Kind kind;
  double numerator;
  double denominator;
  double offset = 0.0;
  bool peopleOnly = false;
};

/// The unit that is written so, or nullptr. Case counts: `M` is mol/L, `m` is not.
[[nodiscard]] const Unit* findUnit(std::string_view symbol, Dialect dialect);

/// `mg, g, kg`: the symbols of one kind for a message, in the order people think of them.
[[nodiscard]] std::string unitsOf(Kind kind, Dialect dialect);

/// `a mass`, `an amount of substance`: the kind with its article, for a message.
[[nodiscard]] std::string_view nameOf(Kind kind);

/// All units, for tests and documentation.
[[nodiscard]] std::span<const Unit> allUnits();

}  // namespace vialkeeper::units
