// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <nlohmann/json_fwd.hpp>

#include "app/plan_charge.h"

namespace vialkeeper::cli {

/// The charge in the fields that the command line's contract fixes; `withWeighed` adds `charged`.
[[nodiscard]] nlohmann::ordered_json toJson(const app::PlannedRun& run, bool withWeighed);

}  // namespace vialkeeper::cli
