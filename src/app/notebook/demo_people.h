// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <array>
#include <string_view>

#include "app/notebook/desk.h"

namespace vialkeeper::app {

/// The initials of the three invented people.
inline constexpr auto kDemoPeople = std::to_array<std::string_view>({"KW", "MR", "TS"});

/// Adds those of the three who are not in the notebook yet; their names say that they are invented.
[[nodiscard]] Checked<void> addDemoPeople(Notebook& notebook, const units::Moment& at);

}  // namespace vialkeeper::app
