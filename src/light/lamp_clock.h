// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <chrono>
#include <optional>
#include <span>
#include <vector>

#include "units/iso_time.h"
#include "units/quantity.h"

/// The lamp clock (calculations.md 3): lamp-on time is the union of the logged on/off intervals.
namespace vialkeeper::light {

using Instant = std::chrono::sys_time<std::chrono::milliseconds>;

/// A switching of the lamp.
struct LampSwitch {
  Instant at;
  bool on = false;
};

/// A stretch with the lamp on; open while it still burns.
struct LampInterval {
  Instant on;
  std::optional<Instant> off = {};
};

/// The lamp's record. Switchings may come in any order; a second `on` while it burns and a second
/// `off` change nothing. At the same instant `off` counts before `on`, so that both together are an
/// interruption of no length.
class LampClock {
 public:
  explicit LampClock(std::span<const LampSwitch> switches);

  [[nodiscard]] const std::vector<LampInterval>& intervals() const { return m_intervals; }
  [[nodiscard]] bool isOn() const { return !m_intervals.empty() && !m_intervals.back().off; }
  /// Lamp-on time up to `when`; an open interval counts up to there.
  [[nodiscard]] units::Duration onTime(Instant when) const;
  /// The instant at which so much lamp-on time has gone by; nothing where it never does.
  [[nodiscard]] std::optional<Instant> whenOnTimeIs(units::Duration onTime) const;
  /// How often the lamp went out and on again.
  [[nodiscard]] int interruptions() const;

 private:
  std::vector<LampInterval> m_intervals;
};

}  // namespace vialkeeper::light
