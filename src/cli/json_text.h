// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <nlohmann/json_fwd.hpp>
#include <optional>
#include <string>

#include "text/notice.h"

namespace vialkeeper::cli {

/// The value as text, two blanks a level, with a line end. Numbers have the shortest form that
/// reads back the same; infinities and NaN, which JSON lacks, are null. Fields keep their order.
[[nodiscard]] std::string toJsonText(const nlohmann::ordered_json& value);

/// A number, or null where there is none.
[[nodiscard]] nlohmann::ordered_json orNull(const std::optional<double>& number);

/// `[{ "code", "text", "at" }]`
[[nodiscard]] nlohmann::ordered_json noticesJson(const text::Notices& notices);

}  // namespace vialkeeper::cli
