// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/plan_edit.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <optional>
#include <vector>

#include "charge/plan_text.h"
#include "text/toml_tree.h"
#include "text/utf8.h"

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

std::vector<std::string> splitPath(std::string_view path) {
  std::vector<std::string> parts;
  while (true) {
    const std::size_t dot = path.find('.');
    parts.emplace_back(path.substr(0, dot));
    if (dot == std::string_view::npos) return parts;
    path.remove_prefix(dot + 1);
  }
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

  std::vector<std::string> lines = linesOf(planText);
  const bool basis = target->component && std::ranges::find(kBases, target->field) != kBases.end();
  const std::string line = fmt::format("{} = {}", target->field, writtenValue(value));
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
  return joined(lines);
}

}  // namespace vialkeeper::charge
