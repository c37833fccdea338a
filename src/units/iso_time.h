// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <chrono>
#include <expected>
#include <string>
#include <string_view>

#include "text/text_fault.h"

namespace vialkeeper::units {

/// A moment with the local offset that was in force where it was noted.
struct Moment {
  std::chrono::sys_time<std::chrono::milliseconds> utc;
  std::chrono::minutes offset;

  bool operator==(const Moment&) const = default;
};

/// Reads ISO 8601 in its extended form with an offset: `2026-03-04T14:20+01:00`,
/// `2026-03-04T13:20:05.250Z`. A blank may stand for the `T`. Seconds and milliseconds may be left
/// out; a leap second (60) is refused, for civil clocks do not show it.
/// Faults: a missing offset, a day or hour that does not exist, anything left over.
[[nodiscard]] std::expected<Moment, text::TextFault> readIsoTime(std::string_view text);

/// Reads a calendar day, `2026-03-04`.
[[nodiscard]] std::expected<std::chrono::year_month_day, text::TextFault> readIsoDate(
    std::string_view text);

/// `2026-03-04T14:20:05+01:00`; milliseconds only where they are not zero.
[[nodiscard]] std::string toIsoText(const Moment& moment);

}  // namespace vialkeeper::units
