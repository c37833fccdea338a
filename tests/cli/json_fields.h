// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <nlohmann/json.hpp>
#include <string>
#include <string_view>

namespace vialkeeper::tests {

/// Checks that the text is one JSON object and nothing else, and that every number in it is written
/// in the shortest form that reads back the same.
void checkOneObject(const std::string& out);

/// Checks that every field of the blank-separated list is there and a number.
void checkNumbers(const nlohmann::json& object, std::string_view fields);
/// Checks that every field of the blank-separated list is there and a text.
void checkTexts(const nlohmann::json& object, std::string_view fields);
/// Checks that every field of the blank-separated list is there and null.
void checkNulls(const nlohmann::json& object, std::string_view fields);
/// Checks that `notices` is a list of { code, text, at }.
void checkNotices(const nlohmann::json& object);

/// The codes of the object's own notices, each followed by a blank.
[[nodiscard]] std::string noticeCodes(const nlohmann::json& object);

/// The component of that key.
[[nodiscard]] const nlohmann::json& component(const nlohmann::json& charge, std::string_view key);

}  // namespace vialkeeper::tests
