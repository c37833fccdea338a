// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/plan_edit.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <optional>
#include <vector>

#include "text/toml_tree.h"
#include "text/utf8.h"
#include "units/quantity_text.h"

namespace vialkeeper::charge {
namespace {

using text::TomlTable;
using text::TomlValue;

constexpr auto kBases = std::to_array<std::string_view>(
    {"amount", "mass", "volume", "equiv", "mol_percent", "concentration", "share"});

std::unexpected<text::Faults> fault(std::string_view path, std::string what, std::string mend) {
  return std::unexpected(
      text::Faults{{.field = std::string(path), .what = std::move(what), .mend = std::move(mend)}});
}

/// The section that a path means: its fields, the line of its header (0 for the top), and its
/// field.
struct Target {
  const TomlTable* table = nullptr;
  int headerLine = 0;
  std::string field;
  bool component = false;
};

const TomlValue* memberOf(const TomlTable& table, std::string_view name) {
  const auto found =
      std::ranges::find_if(table, [name](const auto& entry) { return entry.first == name; });
  return found == table.end() ? nullptr : &found->second;
}

std::vector<std::string> splitPath(std::string_view path) {
  std::vector<std::string> parts;
  while (true) {
    const std::size_t dot = path.find('.');
    parts.emplace_back(path.substr(0, dot));
    if (dot == std::string_view::npos) return parts;
    path.remove_prefix(dot + 1);
  }
}

/// A component's table by its key.
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

text::Checked<Target> targetOf(const TomlTable& root, std::string_view path) {
  const auto parts = splitPath(path);
  if (std::ranges::any_of(parts, &std::string::empty))
    return fault(path, "this is no path of a field",
                 "write for example component.acid.mol_percent");
  if (parts.size() == 1) return Target{&root, 0, parts[0], false};
  const bool component = parts[0] == "component";
  const std::size_t wanted = component ? 3 : 2;
  if (parts.size() > wanted)
    return fault(path, "a part of an inline table cannot be set alone", "edit the plan's text");
  if (parts.size() < wanted)
    return fault(path, "this path names no field", "write for example component.acid.mol_percent");
  const TomlValue* section = component ? componentOf(root, parts[1]) : memberOf(root, parts[0]);
  const auto* table = section != nullptr ? std::get_if<TomlTable>(&section->data) : nullptr;
  if (table == nullptr) {
    return fault(path,
                 fmt::format("the plan has no {} {}", component ? "component" : "section",
                             text::quoted(component ? parts[1] : parts[0])),
                 "check the name");
  }
  return Target{table, section->line, parts.back(), component};
}

std::string written(std::string_view value) {
  const bool truth = value == "true" || value == "false";
  if (truth || units::readNumber(value, units::Dialect::kFile)) return std::string(value);
  std::string quoted = "\"";
  for (const char c : value) {
    if (c == '"' || c == '\\') quoted += '\\';
    quoted += c;
  }
  return quoted + '"';
}

/// Where a new field goes: behind the last single-line field of the section's own, else its header.
int lineToInsertAfter(const Target& target) {
  int line = target.headerLine;
  if (target.headerLine == 0) {
    // Fields of the top stand before the first section.
    for (const auto& [name, value] : *target.table) {
      const bool section = std::holds_alternative<TomlTable>(value.data) ||
                           std::holds_alternative<text::TomlArray>(value.data);
      if (!section) line = std::max(line, value.line);
    }
  }
  return line;
}

}  // namespace

text::Checked<std::string> withField(std::string_view planText, std::string_view path,
                                     std::string_view value) {
  if (text::oneLine(value) != value)
    return fault(path, "the value holds line breaks or control characters", "give one plain line");
  const text::TomlDocument document = text::readToml(planText, "plan");
  if (!document.faults.empty()) return std::unexpected(document.faults);
  const auto target = targetOf(document.root, path);
  if (!target) return std::unexpected(target.error());

  std::vector<std::string> lines;
  for (std::string_view rest = planText;;) {
    const std::size_t end = rest.find('\n');
    lines.emplace_back(rest.substr(0, end));
    if (end == std::string_view::npos) break;
    rest.remove_prefix(end + 1);
  }
  const bool basis = target->component && std::ranges::find(kBases, target->field) != kBases.end();
  const std::string line = fmt::format("{} = {}", target->field, written(value));
  int replaced = 0;
  for (const auto& [name, present] : *target->table) {
    const bool otherBasis = basis && std::ranges::find(kBases, name) != kBases.end();
    if (name != target->field && !otherBasis) continue;
    const bool simple = !std::holds_alternative<TomlTable>(present.data) &&
                        !std::holds_alternative<text::TomlArray>(present.data);
    const auto index = static_cast<std::size_t>(present.line - 1);
    const bool ownLine = index < lines.size() && text::trimmed(lines[index]).starts_with(name);
    if (!simple || !ownLine)
      return fault(path, "this field does not stand on a line of its own", "edit the plan's text");
    lines[index] = replaced == 0 ? line : std::string{};
    replaced = present.line;
  }
  if (replaced == 0) lines.insert(lines.begin() + lineToInsertAfter(*target), line);
  return fmt::format("{}", fmt::join(lines, "\n"));
}

}  // namespace vialkeeper::charge
