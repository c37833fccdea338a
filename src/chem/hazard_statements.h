// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>

namespace vialkeeper::chem {

/// The wording of a hazard statement, `H302`, or nothing where the table does not hold the code.
/// Source: Regulation (EC) 1272/2008, annex III, row by row in templates/reference.
[[nodiscard]] std::optional<std::string> hazardStatement(std::string_view code);

}  // namespace vialkeeper::chem
