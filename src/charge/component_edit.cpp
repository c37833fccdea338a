// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <limits>
#include <optional>

#include "charge/plan_edit.h"
#include "charge/plan_text.h"
#include "text/toml_tree.h"
#include "text/utf8.h"

namespace vialkeeper::charge {
namespace {

using text::TomlArray;
using text::TomlTable;
using text::TomlValue;

/// Fields that are text even where the text is a number.
constexpr auto kTextFields =
    std::to_array<std::string_view>({"key", "name", "role", "smiles", "formula", "cas", "device"});

constexpr std::size_t kLongestFreeKey = 32;

std::unexpected<text::Faults> fault(std::string path, std::string what, std::string mend) {
  return std::unexpected(
      text::Faults{{.field = std::move(path), .what = std::move(what), .mend = std::move(mend)}});
}

bool isBlank(std::string_view line) {
  return line.find_first_not_of(" \t\r") == std::string_view::npos;
}
bool isComment(std::string_view line) { return text::trimmed(line).starts_with('#'); }

/// The first line of a section behind `line`, among the lines of this value and all within it that
/// do not belong to the section of `line` itself.
void nearestSection(const TomlValue& value, int line, int& nearest) {
  if (value.line > line && std::holds_alternative<TomlTable>(value.data))
    nearest = std::min(nearest, value.line);
  if (const auto* table = std::get_if<TomlTable>(&value.data)) {
    if (value.line == line) return;
    for (const auto& [name, inner] : *table) nearestSection(inner, line, nearest);
  }
  if (const auto* array = std::get_if<TomlArray>(&value.data)) {
    for (const TomlValue& inner : *array) nearestSection(inner, line, nearest);
  }
}

/// A component's part of the text as indices of lines: from its own comments to behind its last
/// field.
struct Block {
  std::size_t comments = 0;
  std::size_t end = 0;
};

/// Nothing where the component does not stand under a head of its own.
std::optional<Block> blockOf(const TomlTable& root, const std::vector<std::string>& lines,
                             const TomlValue& component) {
  const auto head = static_cast<std::size_t>(component.line - 1);
  if (component.line < 1 || head >= lines.size() || !text::trimmed(lines[head]).starts_with("[["))
    return std::nullopt;
  int next = std::numeric_limits<int>::max();
  for (const auto& [name, value] : root) nearestSection(value, component.line, next);
  Block block{.comments = head, .end = std::min(lines.size(), static_cast<std::size_t>(next - 1))};
  while (block.comments > 0 && isComment(lines[block.comments - 1])) --block.comments;
  while (block.end > head + 1 && (isBlank(lines[block.end - 1]) || isComment(lines[block.end - 1])))
    --block.end;
  return block;
}

std::string asField(const PlanField& field) {
  const bool inlineValue = field.value.starts_with('{') || field.value.starts_with('[');
  const bool isText = std::ranges::find(kTextFields, field.name) != kTextFields.end();
  const std::string value = isText        ? quotedValue(field.value)
                            : inlineValue ? field.value
                                          : writtenValue(field.value);
  return fmt::format("{} = {}", field.name, value);
}

/// The component that stands last in the text.
const TomlValue* lastComponent(const TomlTable& root) {
  const TomlValue* list = memberOf(root, "component");
  const auto* array = list != nullptr ? std::get_if<TomlArray>(&list->data) : nullptr;
  if (array == nullptr || array->empty()) return nullptr;
  return &*std::ranges::max_element(*array, {}, &TomlValue::line);
}

/// Takes a key out of the list `addition_order`, with one of the commas beside it.
void leaveOrder(const TomlTable& root, std::vector<std::string>& lines, std::string_view key) {
  const TomlValue* order = memberOf(root, "addition_order");
  const auto* array = order != nullptr ? std::get_if<TomlArray>(&order->data) : nullptr;
  if (array == nullptr) return;
  for (const TomlValue& entry : *array) {
    const auto* written = std::get_if<std::string>(&entry.data);
    if (written == nullptr || *written != key) continue;
    std::string& line = lines[static_cast<std::size_t>(entry.line - 1)];
    std::size_t at = line.find(fmt::format("\"{}\"", key));
    if (at == std::string::npos) at = line.find(fmt::format("'{}'", key));
    if (at == std::string::npos) return;  // an escaped spelling; readPlan tells it
    std::size_t end = at + key.size() + 2;
    const std::size_t behind = std::min(line.find_first_not_of(" \t", end), line.size());
    if (behind < line.size() && line[behind] == ',') {
      end = std::min(line.find_first_not_of(" \t", behind + 1), line.size());
    } else if (at > 0) {
      const std::size_t before = line.find_last_not_of(" \t", at - 1);
      if (before != std::string::npos && line[before] == ',') at = before;
    }
    line.erase(at, end - at);
    if (isBlank(line)) lines.erase(lines.begin() + (entry.line - 1));
    return;
  }
}

}  // namespace

text::Checked<std::string> withComponent(std::string_view planText, std::string_view key,
                                         const std::vector<PlanField>& fields) {
  const std::string path = fmt::format("component.{}", key);
  if (key.empty()) return fault("component", "the new component has no key", "give it a key");
  const text::TomlDocument document = text::readToml(planText, "plan");
  if (!document.faults.empty()) return std::unexpected(document.faults);
  if (componentOf(document.root, key) != nullptr) {
    return fault(path, fmt::format("the key {} is taken", text::quoted(key)),
                 "give the new component another key");
  }
  std::vector<PlanField> all{{"key", std::string(key)}};
  all.insert(all.end(), fields.begin(), fields.end());
  std::vector<std::string> block{"", "[[component]]"};
  text::Faults faults;
  for (const PlanField& field : all) {
    if (text::oneLine(field.value) != field.value || text::oneLine(field.name) != field.name) {
      faults.push_back({.field = path + "." + text::oneLine(field.name),
                        .what = "the value holds line breaks or control characters",
                        .mend = "give one plain line"});
    }
    block.push_back(asField(field));
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));

  std::vector<std::string> lines = linesOf(planText);
  std::size_t place = lines.size();
  if (const TomlValue* last = lastComponent(document.root)) {
    const auto found = blockOf(document.root, lines, *last);
    if (!found)
      return fault(path, "the plan's components have no heads of their own", "edit its text");
    place = found->end;
  } else {
    while (place > 0 && isBlank(lines[place - 1])) --place;
  }
  if (place == lines.size()) block.emplace_back();  // the text ended without a line feed
  lines.insert(lines.begin() + static_cast<std::ptrdiff_t>(place), block.begin(), block.end());
  return joined(lines);
}

text::Checked<std::string> withoutComponent(std::string_view planText, std::string_view key) {
  const std::string path = fmt::format("component.{}", key);
  const text::TomlDocument document = text::readToml(planText, "plan");
  if (!document.faults.empty()) return std::unexpected(document.faults);
  const TomlValue* component = componentOf(document.root, key);
  if (component == nullptr) {
    return fault(path, fmt::format("the plan has no component {}", text::quoted(key)),
                 "check the key");
  }
  std::vector<std::string> lines = linesOf(planText);
  const auto block = blockOf(document.root, lines, *component);
  if (!block)
    return fault(path, "this component does not stand under a head of its own", "edit the text");
  std::size_t begin = block->comments;
  std::size_t end = block->end;
  // With the block goes one of the blank stretches around it.
  while (end < lines.size() && isBlank(lines[end])) ++end;
  if (end == lines.size()) {
    while (begin > 0 && isBlank(lines[begin - 1])) --begin;
    if (begin > 0) lines.emplace_back();
  }
  lines.erase(lines.begin() + static_cast<std::ptrdiff_t>(begin),
              lines.begin() + static_cast<std::ptrdiff_t>(end));
  leaveOrder(document.root, lines, key);
  return joined(lines);
}

std::string freeKey(std::string_view name, const std::vector<std::string>& taken) {
  std::string key;
  for (const char c : text::asciiLowered(name)) {
    const bool plain = (c >= 'a' && c <= 'z') || (c >= '0' && c <= '9');
    const bool between = (c & '\x80') == 0 && !key.empty() && key.back() != '-';
    if (plain)
      key += c;
    else if (between)
      key += '-';
  }
  key.resize(std::min(key.size(), kLongestFreeKey));
  while (!key.empty() && key.back() == '-') key.pop_back();
  if (key.empty()) key = "component";
  std::string candidate = key;
  for (int number = 2; std::ranges::find(taken, candidate) != taken.end(); ++number)
    candidate = fmt::format("{}-{}", key, number);
  return candidate;
}

}  // namespace vialkeeper::charge
