// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "light/lamp_clock.h"

#include <algorithm>
#include <cmath>

namespace vialkeeper::light {
namespace {

using std::chrono::milliseconds;

/// Longer than any experiment, and short enough to be added to any instant.
constexpr double kLongest_s = 1e10;

}  // namespace

LampClock::LampClock(std::span<const LampSwitch> switches) {
  std::vector<LampSwitch> ordered(switches.begin(), switches.end());
  std::ranges::stable_sort(ordered, [](const LampSwitch& a, const LampSwitch& b) {
    return a.at != b.at ? a.at < b.at : !a.on && b.on;
  });
  for (const LampSwitch& each : ordered) {
    if (each.on && !isOn())
      m_intervals.push_back({.on = each.at});
    else if (!each.on && isOn())
      m_intervals.back().off = each.at;
  }
}

units::Duration LampClock::onTime(Instant when) const {
  milliseconds sum{0};
  for (const LampInterval& interval : m_intervals) {
    const Instant end = interval.off ? std::min(*interval.off, when) : when;
    if (end > interval.on) sum += end - interval.on;
  }
  return units::Duration::fromChrono(sum);
}

std::optional<Instant> LampClock::whenOnTimeIs(units::Duration onTime) const {
  if (!(onTime.seconds() >= 0.0) || onTime.seconds() > kLongest_s) return std::nullopt;
  milliseconds rest{std::llround(onTime.seconds() * 1e3)};
  for (const LampInterval& interval : m_intervals) {
    if (!interval.off || *interval.off - interval.on >= rest) return interval.on + rest;
    rest -= *interval.off - interval.on;
  }
  return std::nullopt;
}

int LampClock::interruptions() const {
  return m_intervals.empty() ? 0 : static_cast<int>(m_intervals.size()) - 1;
}

}  // namespace vialkeeper::light
