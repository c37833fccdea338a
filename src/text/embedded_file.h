// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstddef>
#include <string_view>

namespace vialkeeper::text {

/// A data file linked into the program, byte for byte, so that no path can be wrong at the bench.
struct EmbeddedFile {
  std::string_view name;      ///< file name without its folder
  std::string_view contents;  ///< the bytes as they stand in the source tree
};

}  // namespace vialkeeper::text
