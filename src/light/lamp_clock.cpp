// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "light/lamp_clock.h"

namespace vialkeeper::light {

LampClock::LampClock(std::span<const LampSwitch>) {}
units::Duration LampClock::onTime(Instant) const { return units::Duration::fromSeconds(0.0); }
std::optional<Instant> LampClock::whenOnTimeIs(units::Duration) const { return std::nullopt; }
int LampClock::interruptions() const { return 0; }

}  // namespace vialkeeper::light
