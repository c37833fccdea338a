// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/plan_text.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>

#include "units/quantity_text.h"

namespace vialkeeper::charge {

using text::TomlTable;
using text::TomlValue;

std::vector<std::string> linesOf(std::string_view text) {
  std::vector<std::string> lines;
  for (std::string_view rest = text;;) {
    const std::size_t end = rest.find('\n');
    lines.emplace_back(rest.substr(0, end));
    if (end == std::string_view::npos) return lines;
    rest.remove_prefix(end + 1);
  }
}

std::string joined(const std::vector<std::string>& lines) {
  return fmt::format("{}", fmt::join(lines, "\n"));
}

const TomlValue* memberOf(const TomlTable& table, std::string_view name) {
  const auto found =
      std::ranges::find_if(table, [name](const auto& entry) { return entry.first == name; });
  return found == table.end() ? nullptr : &found->second;
}

const TomlValue* componentOf(const TomlTable& root, std::string_view key) {
  const TomlValue* list = memberOf(root, "component");
  const auto* array = list != nullptr ? std::get_if<text::TomlArray>(&list->data) : nullptr;
  if (array == nullptr) return nullptr;
  for (const TomlValue& entry : *array) {
    const auto* table = std::get_if<TomlTable>(&entry.data);
    const TomlValue* name = table != nullptr ? memberOf(*table, "key") : nullptr;
    const auto* written = name != nullptr ? std::get_if<std::string>(&name->data) : nullptr;
    if (written != nullptr && *written == key) return &entry;
  }
  return nullptr;
}

std::string quotedValue(std::string_view value) {
  std::string quoted = "\"";
  for (const char c : value) {
    if (c == '"' || c == '\\') quoted += '\\';
    quoted += c;
  }
  return quoted + '"';
}

std::string writtenValue(std::string_view value) {
  const bool truth = value == "true" || value == "false";
  if (truth || units::readNumber(value, units::Dialect::kFile)) return std::string(value);
  return quotedValue(value);
}

}  // namespace vialkeeper::charge
