// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>

#include "charge/plan.h"
#include "units/toml_section.h"

namespace vialkeeper::charge {

/// Reads one `[[component]]`; nothing where a fault leaves it without key, role, name or amount.
[[nodiscard]] std::optional<ComponentPlan> readComponent(units::TomlSection section);

/// Reads one entry of `reaction.products`.
[[nodiscard]] std::optional<ProductPlan> readProduct(units::TomlSection section);

}  // namespace vialkeeper::charge
