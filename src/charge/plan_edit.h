// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <vector>

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

/// A field of a new component, as it stands in a plan file: `mol_percent` and `5`.
/// A value that begins with `{` or `[` is an inline table or list and written as it is.
struct PlanField {
  std::string name;
  std::string value;
};

/// The text of a plan with a component more, behind the last one. Its key must be free.
/// Faults: a key that is taken or none, a value with line breaks. What the component means is for
/// readPlan to say.
[[nodiscard]] text::Checked<std::string> withComponent(std::string_view planText,
                                                       std::string_view key,
                                                       const std::vector<PlanField>& fields);

/// The text of a plan without a component; its own comments, those directly above its head, go
/// with it. The key is taken out of `addition_order` too. Faults: no component of that key.
[[nodiscard]] text::Checked<std::string> withoutComponent(std::string_view planText,
                                                          std::string_view key);

/// A key for a new component, made from its name: lower-case letters, digits and hyphens, not one
/// of `taken`.
[[nodiscard]] std::string freeKey(std::string_view name, const std::vector<std::string>& taken);

}  // namespace vialkeeper::charge
