// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>

#include "text/fault.h"

namespace vialkeeper::charge {

/// The text of a plan with one field set, everything else as its author left it, comments too.
/// `path` is the field's place as faults name it: `component.acid.mol_percent`, `vial.volume`,
/// `title`. A basis takes the place of the component's other basis. Numbers and true/false are
/// written bare, all else in quotation marks. Faults: a path that names no section or component of
/// the plan, a field inside an inline table, a value with line breaks. Whether the value makes
/// sense is for readPlan to say.
[[nodiscard]] text::Checked<std::string> withField(std::string_view planText, std::string_view path,
                                                   std::string_view value);

}  // namespace vialkeeper::charge
