// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "units/iso_time.h"

namespace vialkeeper::cli {

/// A moment to the minute with its offset, as tables show it: `2026-03-04T14:20+01:00`.
[[nodiscard]] inline std::string minuteText(const units::Moment& moment) {
  const std::string iso = toIsoText(moment);
  return iso.substr(0, 16) + iso.substr(iso.find_first_of("+-Z", 16));
}

}  // namespace vialkeeper::cli
