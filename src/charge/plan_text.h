// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "text/toml_tree.h"

/// A plan as lines of text beside its tree: what the editors of a plan have in common.
namespace vialkeeper::charge {

/// The lines without their line feeds; a text that ends in one has an empty last line.
[[nodiscard]] std::vector<std::string> linesOf(std::string_view text);
[[nodiscard]] std::string joined(const std::vector<std::string>& lines);

/// The field of a table, or nullptr.
[[nodiscard]] const text::TomlValue* memberOf(const text::TomlTable& table, std::string_view name);

/// The table of the component with that key, or nullptr.
[[nodiscard]] const text::TomlValue* componentOf(const text::TomlTable& root, std::string_view key);

/// The text between quotation marks, as TOML reads it back. It must hold no control characters.
[[nodiscard]] std::string quotedValue(std::string_view value);

/// A value as TOML: numbers and true/false bare, all else quoted.
[[nodiscard]] std::string writtenValue(std::string_view value);

}  // namespace vialkeeper::charge
