// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>

namespace vialkeeper::app {

/// A substance's name for comparison: letters' case, accents of Latin letters, blanks, hyphens of
/// any kind and apostrophes do not count, and Greek letters are spelt out (`α-` as `alpha`, both
/// code points of µ as `u`). `4CzIPN`, `4-CzIPN` and `4 czipn` are the same name; `N,N-` keeps its
/// comma.
[[nodiscard]] std::string foldName(std::string_view name);

}  // namespace vialkeeper::app
