// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>

#include "units/iso_time.h"

/// Moments as people read them, in the offset in which they were noted.
namespace vialkeeper::ui {

[[nodiscard]] QString clockText(const units::Moment& at);        ///< `14:20`
[[nodiscard]] QString dayText(const units::Moment& at);          ///< `4 Mar`
[[nodiscard]] QString dayAndClockText(const units::Moment& at);  ///< `4 Mar 14:20`
/// `14:20`, with the day where it is not that of `reference`.
[[nodiscard]] QString clockBeside(const units::Moment& at, const units::Moment& reference);
[[nodiscard]] bool isSameDay(const units::Moment& a, const units::Moment& b);
/// A moment by the clock of the place where it was noted: `2026-03-04 14:20`.
[[nodiscard]] QString momentText(const units::Moment& at);

}  // namespace vialkeeper::ui
