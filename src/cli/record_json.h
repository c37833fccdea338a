// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <nlohmann/json_fwd.hpp>
#include <span>

#include "app/notebook/log_run.h"
#include "app/notebook/notebook.h"

namespace vialkeeper::cli {

/// Records in the fields that docs/command-line.md tells: null where a record has nothing.
[[nodiscard]] nlohmann::ordered_json toJson(const app::RunRecord& run);
[[nodiscard]] nlohmann::ordered_json toJson(const app::ComponentRecord& component);
[[nodiscard]] nlohmann::ordered_json toJson(const app::NumberedEvent& entry,
                                            std::span<const app::NumberedEvent> all);
[[nodiscard]] nlohmann::ordered_json toJson(const app::DatasetRecord& dataset);
[[nodiscard]] nlohmann::ordered_json toJson(const app::SubstanceRecord& substance);
[[nodiscard]] nlohmann::ordered_json textOrNullJson(const std::string& text);

}  // namespace vialkeeper::cli
