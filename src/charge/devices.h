// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <span>
#include <string>
#include <string_view>
#include <variant>

#include "units/quantity.h"

namespace vialkeeper::charge {

/// A balance, by the two figures that its maker states.
struct Balance {
  units::Mass readability;    ///< d, the last digit
  units::Mass repeatability;  ///< s, standard deviation of one reading

  /// Standard uncertainty of a tared weighing, two readings of which each is rounded:
  /// u² = s² + 2 (d/√12)². Source: JCGM 100:2008, F.2.2.1 for the rounding.
  [[nodiscard]] units::Mass standardUncertainty() const;

  /// The least that may be weighed so that 2 s stays within 0.10 %: 2000 max(s, 0.41 d).
  /// Source: USP general chapter <41>, 2019.
  [[nodiscard]] units::Mass minimumWeight() const;
};

/// A piston pipette, by the limits of ISO 8655-2, which hold in µL at every selected volume.
struct Pipette {
  units::Volume nominal;
  units::Volume smallest;         ///< least volume that can be selected
  units::Volume systematicLimit;  ///< bound of the systematic error of one stroke
  units::Volume randomLimit;      ///< standard deviation of one stroke

  /// Equal strokes that it takes to deliver the volume.
  [[nodiscard]] int strokesFor(units::Volume volume) const;

  /// Standard uncertainty of a delivered volume: u² = (k e_s/√3)² + k s_r² over k strokes, the
  /// systematic error being the same in each.
  [[nodiscard]] units::Volume standardUncertainty(units::Volume volume) const;
};

/// A device of the shelf or one described in the plan.
struct Device {
  std::string name;
  std::variant<Balance, Pipette> kind;

  [[nodiscard]] const Balance* balance() const { return std::get_if<Balance>(&kind); }
  [[nodiscard]] const Pipette* pipette() const { return std::get_if<Pipette>(&kind); }
};

/// The devices that every installation has: balances, then pipettes by size.
[[nodiscard]] std::span<const Device> builtInDevices();

/// The device of that name, or nullptr.
[[nodiscard]] const Device* findDevice(std::string_view name);

/// A volumetric flask, ISO 1042 class A.
struct Flask {
  units::Volume nominal;
  units::Volume limit;  ///< bound of the error of the marked volume
};

/// The flasks for stock solutions, smallest first.
[[nodiscard]] std::span<const Flask> flasks();

}  // namespace vialkeeper::charge
