// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/toml_tree.h"

#include <fmt/format.h>
#include <toml++/toml.h>

#include <algorithm>
#include <optional>
#include <set>

#include "text/encoding.h"
#include "text/utf8.h"

namespace vialkeeper::text {
namespace {

/// What stands in place of a value that could not be read. A control character cannot be typed into
/// a TOML string unescaped, so no plan holds it by chance.
constexpr std::string_view kUnreadableText = "\x01";
constexpr std::string_view kUnreadableWritten = R"("\u0001")";

constexpr std::size_t kMostRounds = 64;

/// Parts of a dotted key beyond which it is refused; no file of ours has half as many.
constexpr int kDeepestKey = 8;

std::vector<std::string> splitLines(std::string_view text) {
  std::vector<std::string> lines;
  while (true) {
    const std::size_t end = text.find('\n');
    lines.emplace_back(text.substr(0, end));
    if (end == std::string_view::npos) return lines;
    text.remove_prefix(end + 1);
  }
}

std::string joinLines(const std::vector<std::string>& lines) {
  return fmt::format("{}", fmt::join(lines, "\n"));
}

/// Number of the line with a dotted key too deep to follow, or 0. The parser and the tree that it
/// makes descend one call per part, so that a key of some thousand parts would overrun the stack.
int lineOfEndlessKey(const std::vector<std::string>& lines) {
  for (std::size_t i = 0; i < lines.size(); ++i) {
    int dots = 0;
    char quote = '\0';
    char before = '\0';
    for (const char c : lines[i]) {
      if (quote != '\0') {
        if (c == quote) quote = '\0';
      } else if (c == '"' || c == '\'') {
        quote = c;
      } else if (c == '.' && before != '.') {
        if (++dots >= kDeepestKey) return static_cast<int>(i) + 1;
      } else if (std::string_view(".=[]{},#").find(c) != std::string_view::npos) {
        dots = 0;
      }
      before = c;
    }
  }
  return 0;
}

/// `key` where the line reads `key = …`, else nothing.
std::optional<std::string_view> keyOfLine(std::string_view line) {
  const std::size_t equals = line.find('=');
  if (equals == std::string_view::npos) return std::nullopt;
  const std::string_view key = trimmed(line.substr(0, equals));
  const bool bare = !key.empty() && std::ranges::all_of(key, [](char c) {
    return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z') || (c >= '0' && c <= '9') || c == '_' ||
           c == '-';
  });
  return bare ? std::optional(key) : std::nullopt;
}

/// `0.2 mmol` in `amount = 0.2 mmol`: a quantity that lacks its quotation marks.
std::optional<std::string> unquotedQuantity(std::string_view line) {
  const auto key = keyOfLine(line);
  if (!key) return std::nullopt;
  std::string_view value = line.substr(line.find('=') + 1);
  value = trimmed(value.substr(0, value.find('#')));
  const bool number = !value.empty() && value.front() >= '0' && value.front() <= '9';
  if (!number || value.find_first_of("\"'[{,") != std::string_view::npos) return std::nullopt;
  return fmt::format("{} = \"{}\"", *key, value);
}

/// The parser's sentence without its opening words.
std::string parserSentence(std::string_view description) {
  constexpr std::string_view kOpening = "Error while parsing ";
  if (description.starts_with(kOpening)) description.remove_prefix(kOpening.size());
  return oneLine(description);
}

/// The name in `cannot redefine existing string 'name'`, else nothing.
std::optional<std::string> redefinedName(std::string_view description) {
  if (description.find("cannot redefine") == std::string_view::npos) return std::nullopt;
  const std::size_t open = description.find('\'');
  const std::size_t close = description.rfind('\'');
  if (open == std::string_view::npos || close <= open) return std::string{};
  std::string name(description.substr(open + 1, close - open - 1));
  return std::string(trimmed(name.substr(0, name.find('"', 1))));
}

/// Sets the faulty line aside so that the rest can be read; false where that is not possible.
class LineRepair {
 public:
  explicit LineRepair(std::vector<std::string>& lines) : m_lines(lines) {}

  bool setAside(std::size_t index, const std::optional<std::string>& redefined) {
    if (index >= m_lines.size() || !m_touched.insert(index).second) return false;
    std::string& line = m_lines[index];
    const std::string_view content = trimmed(line);
    if (content.starts_with('[')) {
      // The fields below stay out of the sections above.
      const bool array = content.starts_with("[[");
      line = fmt::format(R"({}"\u0001{}"{})", array ? "[[" : "[", m_touched.size(),
                         array ? "]]" : "]");
      return true;
    }
    const auto key = keyOfLine(line);
    const bool repeatsItself = redefined && key && *redefined == *key;
    line = key && !repeatsItself ? fmt::format("{} = {}", *key, kUnreadableWritten) : std::string{};
    return true;
  }

 private:
  std::vector<std::string>& m_lines;
  std::set<std::size_t> m_touched;
};

Fault toFault(const toml::parse_error& error, const std::vector<std::string>& lines,
              const std::string& file) {
  const int line = static_cast<int>(error.source().begin.line);
  const std::string_view text = line >= 1 && static_cast<std::size_t>(line) <= lines.size()
                                    ? std::string_view(lines[static_cast<std::size_t>(line) - 1])
                                    : std::string_view{};
  Fault fault{.file = file, .line = line};
  if (const auto name = redefinedName(error.description())) {
    const bool section = trimmed(text).starts_with('[');
    fault.field = *name;
    fault.what = section ? "this section stands twice" : "this field stands twice";
    fault.mend = "keep one of them";
  } else if (const auto quotedLine = unquotedQuantity(text)) {
    fault.field = std::string(*keyOfLine(text));
    fault.what = "a quantity without quotation marks";
    fault.mend = "write " + *quotedLine;
  } else if (std::ranges::count(text, '"') % 2 == 1) {
    fault.field = std::string(keyOfLine(text).value_or(""));
    fault.what = "a quotation mark is never closed";
    fault.mend = "close it at the end of the text";
  } else {
    fault.field = std::string(keyOfLine(text).value_or(""));
    fault.what = fmt::format("this line is not TOML ({})", parserSentence(error.description()));
    fault.mend = "write name = value, texts and quantities in quotation marks";
  }
  return fault;
}

TomlTable convertTable(const toml::table& table);

TomlValue convert(const toml::node& node) {
  TomlValue value{.line = static_cast<int>(node.source().begin.line), .data = TomlMoment{}};
  if (const auto* text = node.as_string()) {
    if (text->get() == kUnreadableText) {
      value.data = Unreadable{};
    } else {
      value.data = text->get();
    }
  } else if (const auto* real = node.as_floating_point()) {
    value.data = real->get();
  } else if (const auto* integer = node.as_integer()) {
    value.data = integer->get();
  } else if (const auto* truth = node.as_boolean()) {
    value.data = truth->get();
  } else if (const auto* array = node.as_array()) {
    TomlArray items;
    for (const toml::node& item : *array) items.push_back(convert(item));
    value.data = std::move(items);
  } else if (const auto* table = node.as_table()) {
    value.data = convertTable(*table);
  }
  return value;
}

TomlTable convertTable(const toml::table& table) {
  TomlTable fields;
  std::vector<std::pair<toml::source_position, std::size_t>> order;
  for (const auto& [key, node] : table) {
    if (key.str().starts_with('\x01')) continue;
    order.emplace_back(key.source().begin, fields.size());
    fields.emplace_back(std::string(key.str()), convert(node));
    if (fields.back().second.line == 0) {
      fields.back().second.line = static_cast<int>(key.source().begin.line);
    }
  }
  // The parser sorts by name; people read a file from top to bottom.
  std::ranges::stable_sort(order, [](const auto& a, const auto& b) {
    return std::pair(a.first.line, a.first.column) < std::pair(b.first.line, b.first.column);
  });
  TomlTable sorted;
  sorted.reserve(fields.size());
  for (const auto& [position, index] : order) sorted.push_back(std::move(fields[index]));
  return sorted;
}

}  // namespace

TomlDocument readToml(std::string_view bytes, const std::string& file) {
  TomlDocument document{.root = {}, .faults = encodingFaults(bytes, file), .complete = true};
  if (!document.faults.empty()) {
    document.complete = false;
    return document;
  }
  std::vector<std::string> lines = splitLines(withoutByteOrderMark(bytes));
  if (const int line = lineOfEndlessKey(lines)) {
    document.faults.push_back({.file = file,
                               .line = line,
                               .what = "a key of too many parts",
                               .mend = "write sections as [name] and fields as name = value"});
    document.complete = false;
    return document;
  }
  LineRepair repair(lines);
  for (std::size_t round = 0; round < kMostRounds; ++round) {
    try {
      document.root = convertTable(toml::parse(joinLines(lines)));
      std::ranges::stable_sort(document.faults, {}, &Fault::line);
      return document;
    } catch (const toml::parse_error& error) {
      document.faults.push_back(toFault(error, lines, file));
      const auto redefined = redefinedName(error.description());
      const auto index = static_cast<std::size_t>(error.source().begin.line) - 1;
      const bool header = index < lines.size() && trimmed(lines[index]).starts_with('[');
      if (header && !redefined) document.complete = false;  // a repeated section stands there once
      if (!repair.setAside(index, redefined)) break;
    }
  }
  document.root.clear();
  document.complete = false;
  return document;
}

}  // namespace vialkeeper::text
