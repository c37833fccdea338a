// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>

#include "text/fault.h"

namespace vialkeeper::text {

/// Why these bytes are not a UTF-8 text file (UTF-16, a NUL byte, malformed sequences), with lines;
/// empty where they are. A byte-order mark is no fault.
[[nodiscard]] Faults encodingFaults(std::string_view bytes, const std::string& file);

/// The text behind a UTF-8 byte-order mark, if there is one.
[[nodiscard]] std::string_view withoutByteOrderMark(std::string_view bytes);

}  // namespace vialkeeper::text
