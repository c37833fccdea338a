// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/hazard_statements.h"

#include "chem/reference_table.h"

namespace vialkeeper::chem {

std::optional<std::string> hazardStatement(std::string_view code) {
  for (const auto& row : ReferenceTable::builtIn("hazard-statements.csv").rows()) {
    if (row.text("code") == code) return row.text("text");
  }
  return std::nullopt;
}

}  // namespace vialkeeper::chem
