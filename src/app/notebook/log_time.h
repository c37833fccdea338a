// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <string>
#include <string_view>

#include "text/text_fault.h"
#include "units/iso_time.h"

namespace vialkeeper::app {

/// When an event happened, as its author said it.
struct LogTime {
  units::Moment at;
  bool late = false;     ///< more than 24 h before it was written down
  std::string sentence;  ///< `yesterday 17:05 (21 h 15 min ago)`
};

/// Reads the time of an entry that is written down now: `now`, `14:20`, `today 14:20`,
/// `yesterday 17:05`, `20 min ago`, `1 h 20 min ago`, or ISO 8601 with its offset. Days are those
/// of the offset in `now`, also across a change to summer time. Pure: the clock is the caller's.
/// Faults: a time that is still to come (14:20 is never taken for yesterday's), more than 100 years
/// back, a day without an hour, anything that cannot be read; each points at the place.
[[nodiscard]] std::expected<LogTime, text::TextFault> readLogTime(std::string_view text,
                                                                  const units::Moment& now);

}  // namespace vialkeeper::app
