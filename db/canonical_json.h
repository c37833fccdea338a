// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>

#include "db/row.h"

/// JSON in the canonical form of RFC 8785: one text for one value, so that hashes can be compared.
namespace vialkeeper::db {

/// A text in quotation marks; only what must be escaped is.
[[nodiscard]] std::string canonicalText(std::string_view text);

/// A finite number as ECMAScript prints it: the shortest digits that read back the same.
[[nodiscard]] std::string canonicalNumber(double number);

/// A row as an object, columns sorted, NULL left out. A BLOB of up to 64 bytes stands as
/// `{"hex":"…"}`, a longer one as `{"sha256":"…","size":n}`.
[[nodiscard]] std::string canonicalRow(const Row& row);

[[nodiscard]] std::string toHex(std::string_view bytes);
/// The bytes of a hexadecimal text; empty where it is none.
[[nodiscard]] std::string fromHex(std::string_view hex);

/// SHA-256 (FIPS 180-4), 32 bytes.
[[nodiscard]] std::string sha256(std::string_view bytes);

}  // namespace vialkeeper::db
