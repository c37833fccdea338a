// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <string_view>

#include "text/text_fault.h"

namespace vialkeeper::chem {

/// Checks a CAS Registry Number: two to seven digits without a leading zero, two digits, and the
/// check digit (the digits times their place counted from the right, summed, modulo 10).
/// Source: the check-digit page of cas.org.
[[nodiscard]] std::expected<void, text::TextFault> checkCasNumber(std::string_view number);

}  // namespace vialkeeper::chem
