// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "units/toml_section.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <cmath>
#include <numeric>

#include "text/text_fault.h"
#include "text/utf8.h"

namespace vialkeeper::units {
namespace {

std::string boundsText(const Bounds& bounds) {
  if (std::isinf(bounds.most)) {
    return fmt::format("give a number {} {}", bounds.leastExcluded ? "above" : "not below",
                       bounds.least);
  }
  return fmt::format("give a number {} {} and {} {}", bounds.leastExcluded ? "above" : "from",
                     bounds.least, bounds.mostExcluded ? "below" : "at most", bounds.most);
}

bool isWithin(double value, const Bounds& bounds) {
  const bool aboveLeast = bounds.leastExcluded ? value > bounds.least : value >= bounds.least;
  const bool belowMost = bounds.mostExcluded ? value < bounds.most : value <= bounds.most;
  return aboveLeast && belowMost;
}

std::optional<double> asNumber(const text::TomlValue& value) {
  if (const auto* real = std::get_if<double>(&value.data)) return *real;
  if (const auto* integer = std::get_if<std::int64_t>(&value.data))
    return static_cast<double>(*integer);
  return std::nullopt;
}

bool isListOfTables(const text::TomlValue& value) {
  const auto* list = std::get_if<text::TomlArray>(&value.data);
  return list != nullptr && !list->empty() &&
         std::holds_alternative<text::TomlTable>(list->front().data);
}

/// Levenshtein distance: the fewest letters to add, drop or change.
std::size_t letterDistance(std::string_view a, std::string_view b) {
  std::vector<std::size_t> row(b.size() + 1);
  std::iota(row.begin(), row.end(), std::size_t{0});
  for (std::size_t i = 0; i < a.size(); ++i) {
    std::size_t diagonal = row[0]++;
    for (std::size_t j = 0; j < b.size(); ++j) {
      const std::size_t change = diagonal + (a[i] == b[j] ? 0 : 1);
      diagonal = row[j + 1];
      row[j + 1] = std::min({row[j] + 1, row[j + 1] + 1, change});
    }
  }
  return row[b.size()];
}

}  // namespace

int SectionPlace::lineOf(std::string_view field) const {
  const auto found =
      std::ranges::find_if(fieldLines, [field](const auto& entry) { return entry.first == field; });
  return found == fieldLines.end() ? line : found->second;
}

bool SectionPlace::holds(std::string_view field) const {
  return std::ranges::any_of(fieldLines,
                             [field](const auto& entry) { return entry.first == field; });
}

TomlSection::TomlSection(const text::TomlTable& table, std::string file, SectionPlace place,
                         text::Faults& faults)
    : m_table(&table), m_file(std::move(file)), m_place(std::move(place)), m_faults(&faults) {
  for (const auto& [name, value] : table) m_place.fieldLines.emplace_back(name, value.line);
}

const text::TomlValue* TomlSection::find(std::string_view field) const {
  const auto found =
      std::ranges::find_if(*m_table, [field](const auto& entry) { return entry.first == field; });
  return found == m_table->end() ? nullptr : &found->second;
}

const text::TomlValue* TomlSection::take(std::string_view field) {
  if (std::ranges::find(m_known, field) == m_known.end()) m_known.emplace_back(field);
  const text::TomlValue* value = find(field);
  const bool readable = value != nullptr && !std::holds_alternative<text::Unreadable>(value->data);
  return readable ? value : nullptr;
}

const text::TomlValue* TomlSection::value(std::string_view field) { return take(field); }

const std::string* TomlSection::takeText(std::string_view field, std::string_view example) {
  const text::TomlValue* value = take(field);
  if (value == nullptr) return nullptr;
  if (const auto* written = std::get_if<std::string>(&value->data)) return written;
  if (asNumber(*value)) {
    fault(field, "a bare number where a text in quotation marks is wanted",
          fmt::format("write it with its unit, for example {} = \"{}\"", field, example));
  } else {
    fault(field, "this is not a text in quotation marks",
          fmt::format("write for example {} = \"{}\"", field, example));
  }
  return nullptr;
}

std::optional<std::string> TomlSection::text(std::string_view field) {
  const text::TomlValue* value = take(field);
  if (value == nullptr) return std::nullopt;
  const auto* written = std::get_if<std::string>(&value->data);
  if (written == nullptr) {
    fault(field, "this is not a text", "put it in quotation marks");
    return std::nullopt;
  }
  if (text::oneLine(*written) != *written) {
    fault(field, "the text holds invisible control characters", "type it again in one plain line");
    return std::nullopt;
  }
  const std::string_view content = text::trimmed(*written);
  if (content.empty()) {
    fault(field, "the text is empty", "fill it in or leave the field out");
    return std::nullopt;
  }
  return std::string(content);
}

std::optional<std::size_t> TomlSection::choice(std::string_view field,
                                               std::initializer_list<std::string_view> choices) {
  const auto written = text(field);
  if (!written) return std::nullopt;
  const auto* found = std::ranges::find(choices, *written);
  if (found != choices.end()) return static_cast<std::size_t>(found - choices.begin());
  fault(field, fmt::format("{} is not one of the known words", text::quoted(*written)),
        fmt::format("choose among {}", fmt::join(choices, ", ")));
  return std::nullopt;
}

std::optional<double> TomlSection::number(std::string_view field, Bounds bounds) {
  const text::TomlValue* value = take(field);
  if (value == nullptr) return std::nullopt;
  const auto number = asNumber(*value);
  if (!number) {
    fault(field, "this is not a bare number",
          boundsText(bounds) + ", without unit or quotation marks");
    return std::nullopt;
  }
  if (!std::isfinite(*number) || !isWithin(*number, bounds)) {
    fault(field, fmt::format("{} lies outside the range", *number), boundsText(bounds));
    return std::nullopt;
  }
  return number;
}

std::optional<bool> TomlSection::truth(std::string_view field) {
  const text::TomlValue* value = take(field);
  if (value == nullptr) return std::nullopt;
  if (const auto* truth = std::get_if<bool>(&value->data)) return *truth;
  fault(field, "this is neither true nor false", "write true or false, without quotation marks");
  return std::nullopt;
}

std::optional<ReadQuantity> TomlSection::quantityOf(std::initializer_list<Kind> kinds,
                                                    std::string_view field, Range range) {
  const std::string unit = unitsOf(*kinds.begin(), Dialect::kFile);
  const bool temperature = *kinds.begin() == Kind::kTemperature;
  const std::string* written =
      takeText(field, (temperature ? "21 " : "2.0 ") + unit.substr(0, unit.find(',')));
  if (written == nullptr) return std::nullopt;
  const auto read = readQuantityOf(kinds, *written, Dialect::kFile, range);
  if (read) return *read;
  fault(field,
        fmt::format("{}: {}", text::quoted(*written), whatWithPosition(read.error(), *written)),
        read.error().mend);
  return std::nullopt;
}

std::optional<double> TomlSection::kelvinDifference(std::string_view field, Range range) {
  const std::string* written = takeText(field, "0.5 K");
  if (written == nullptr) return std::nullopt;
  const auto read = readKelvinDifference(*written, range);
  if (read) return *read;
  fault(field,
        fmt::format("{}: {}", text::quoted(*written), whatWithPosition(read.error(), *written)),
        read.error().mend);
  return std::nullopt;
}

std::optional<std::vector<std::string>> TomlSection::texts(std::string_view field) {
  const text::TomlValue* value = take(field);
  if (value == nullptr) return std::nullopt;
  const auto* array = std::get_if<text::TomlArray>(&value->data);
  std::vector<std::string> list;
  if (array != nullptr) {
    for (const text::TomlValue& item : *array) {
      const auto* written = std::get_if<std::string>(&item.data);
      if (written != nullptr && text::oneLine(*written) == *written) list.push_back(*written);
    }
  }
  if (array == nullptr || list.size() != array->size()) {
    fault(field, "this is not a list of texts",
          "write texts in quotation marks between [ and ], with commas");
    return std::nullopt;
  }
  return list;
}

std::optional<TomlSection> TomlSection::section(std::string_view field) {
  const text::TomlValue* value = take(field);
  if (value == nullptr) return std::nullopt;
  const auto* table = std::get_if<text::TomlTable>(&value->data);
  if (table == nullptr) {
    fault(field, "a section is wanted here",
          fmt::format("write [{}] or {} = {{ … }}", field, field));
    return std::nullopt;
  }
  const std::string path =
      m_place.path.empty() ? std::string(field) : m_place.path + "." + std::string(field);
  return TomlSection(*table, m_file, {.path = path, .line = value->line}, *m_faults);
}

std::vector<TomlSection> TomlSection::sections(std::string_view field) {
  std::vector<TomlSection> list;
  const text::TomlValue* value = take(field);
  if (value == nullptr) return list;
  const auto* array = std::get_if<text::TomlArray>(&value->data);
  if (array == nullptr) {
    fault(field, "a list of sections is wanted here",
          fmt::format("write [[{}]] above each", field));
    return list;
  }
  const std::string prefix = m_place.path.empty() ? "" : m_place.path + ".";
  for (std::size_t i = 0; i < array->size(); ++i) {
    const auto* table = std::get_if<text::TomlTable>(&(*array)[i].data);
    if (table == nullptr) {
      fault(field, fmt::format("entry {} is not a section", i + 1), "write every entry as { … }");
      continue;
    }
    list.emplace_back(*table, m_file,
                      SectionPlace{.path = fmt::format("{}{}[{}]", prefix, field, i + 1),
                                   .line = (*array)[i].line},
                      *m_faults);
  }
  return list;
}

std::string TomlSection::asWritten(std::string_view field) const {
  const text::TomlValue* value = find(field);
  if (value == nullptr) return {};
  if (const auto* written = std::get_if<std::string>(&value->data)) return *written;
  const auto number = asNumber(*value);
  return number ? fmt::format("{}", *number) : std::string{};
}

void TomlSection::fault(std::string_view field, std::string what, std::string mend) {
  std::string path = m_place.path;
  if (!field.empty()) path += (path.empty() ? "" : ".") + std::string(field);
  m_faults->push_back({.file = m_file,
                       .line = m_place.lineOf(field),
                       .field = std::move(path),
                       .what = std::move(what),
                       .mend = std::move(mend)});
}

void TomlSection::missing(std::string_view field, std::string mend) {
  if (has(field)) return;  // present but at fault: that has been told
  fault(field, "this is missing", std::move(mend));
}

void TomlSection::finish() {
  for (const auto& [name, value] : *m_table) {
    if (std::ranges::find(m_known, name) != m_known.end()) continue;
    const auto nearest = nearestName(name, m_known);
    const bool isTable =
        std::holds_alternative<text::TomlTable>(value.data) || isListOfTables(value);
    fault(name, isTable ? "this section is not known here" : "this field is not known here",
          nearest ? fmt::format("did you mean {}?", *nearest)
                  : fmt::format("known here are {}", fmt::join(m_known, ", ")));
  }
}

std::optional<std::string> nearestName(std::string_view name,
                                       const std::vector<std::string>& known) {
  std::optional<std::string> best;
  std::size_t least = 3;
  for (const std::string& candidate : known) {
    const std::size_t distance = letterDistance(name, candidate);
    // Half the letters must be right, else the suggestion is a guess.
    if (distance < least && 2 * distance < std::max(name.size(), candidate.size())) {
      least = distance;
      best = candidate;
    }
  }
  return best;
}

}  // namespace vialkeeper::units
