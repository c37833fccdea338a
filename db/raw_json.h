// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string_view>
#include <vector>

/// Parts of a JSON text as they stand in it, byte for byte: what was hashed is hashed again, not
/// what a parser would print. For texts that we wrote; on others the answers are empty, never a
/// crash.
namespace vialkeeper::db {

/// The elements of an array.
[[nodiscard]] std::vector<std::string_view> rawElements(std::string_view array);

/// The value of a member of an object; empty where there is none.
[[nodiscard]] std::string_view rawMember(std::string_view object, std::string_view name);

}  // namespace vialkeeper::db
