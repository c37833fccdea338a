// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <filesystem>
#include <vector>

namespace vialkeeper::chem {

/// The directories in which the program's own modules may stand, the most particular first: the one that
/// VIALKEEPER_MODULE_DIR names, and no other where it does; else `lib/vialkeeper` beside the program's
/// `bin`, then where this build installs them.
[[nodiscard]] std::vector<std::filesystem::path> moduleDirectories();

}  // namespace vialkeeper::chem
