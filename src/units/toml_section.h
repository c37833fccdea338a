// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "text/fault.h"
#include "text/toml_tree.h"
#include "units/quantity_text.h"

namespace vialkeeper::units {

/// Bounds of a bare number in a file.
struct Bounds {
  double least;
  double most;
  bool leastExcluded = false;
  bool mostExcluded = false;
};

/// Where a section and its fields stood, kept with what was read so that later checks can point
/// there.
struct SectionPlace {
  std::string path;  ///< `component.amine`
  int line = 0;
  std::vector<std::pair<std::string, int>> fieldLines = {};

  /// The field's own line, or the section's where the field is not written.
  [[nodiscard]] int lineOf(std::string_view field) const;
  [[nodiscard]] bool holds(std::string_view field) const;
};

/// Takes the fields out of one table of a TOML file and notes every fault on the way.
/// Each reader returns nothing both where the field is absent and where it is at fault; has() tells
/// the two apart. finish() must be called last: it reports the fields that nobody asked for.
class TomlSection {
 public:
  TomlSection(const text::TomlTable& table, std::string file, SectionPlace place,
              text::Faults& faults);

  [[nodiscard]] bool has(std::string_view field) const { return find(field) != nullptr; }

  /// A text without control characters; blanks at the ends are cut.
  [[nodiscard]] std::optional<std::string> text(std::string_view field);
  /// A text that must be one of `choices`; gives its index.
  [[nodiscard]] std::optional<std::size_t> choice(std::string_view field,
                                                  std::initializer_list<std::string_view> choices);
  [[nodiscard]] std::optional<double> number(std::string_view field, Bounds bounds);
  [[nodiscard]] std::optional<bool> truth(std::string_view field);
  [[nodiscard]] std::optional<ReadQuantity> quantityOf(std::initializer_list<Kind> kinds,
                                                       std::string_view field,
                                                       Range range = Range::kPositive);
  template <class Quantity>
  [[nodiscard]] std::optional<Quantity> quantity(std::string_view field,
                                                 Range range = Range::kPositive) {
    const auto read = quantityOf({Quantity::kKind}, field, range);
    return read ? std::optional(Quantity::fromSi(read->si)) : std::nullopt;
  }
  [[nodiscard]] std::optional<double> kelvinDifference(std::string_view field, Range range);
  [[nodiscard]] std::optional<std::vector<std::string>> texts(std::string_view field);

  /// A table below this one, its path extended by the field's name.
  [[nodiscard]] std::optional<TomlSection> section(std::string_view field);
  /// An array of tables; each gets the path `field[n]`, n from 1.
  [[nodiscard]] std::vector<TomlSection> sections(std::string_view field);
  /// The raw value, for a field that may be of several types; counts as asked for.
  [[nodiscard]] const text::TomlValue* value(std::string_view field);

  /// The text as written in the file, without checks; for keeping what was typed.
  [[nodiscard]] std::string asWritten(std::string_view field) const;

  /// Names the section by what identifies it once that is known: `component.amine`.
  void rename(std::string path) { m_place.path = std::move(path); }

  void fault(std::string_view field, std::string what, std::string mend);
  void missing(std::string_view field, std::string mend);
  /// Reports every field that was never asked for, with the nearest known name.
  void finish();

  [[nodiscard]] const SectionPlace& place() const { return m_place; }

 private:
  [[nodiscard]] const text::TomlValue* find(std::string_view field) const;
  /// The value if present and readable; nullptr otherwise. Marks the field as known.
  [[nodiscard]] const text::TomlValue* take(std::string_view field);
  [[nodiscard]] const std::string* takeText(std::string_view field, std::string_view example);

  const text::TomlTable* m_table;
  std::string m_file;
  SectionPlace m_place;
  text::Faults* m_faults;
  std::vector<std::string> m_known;
};

/// The known name that differs from `name` by the fewest letters, if by no more than two.
[[nodiscard]] std::optional<std::string> nearestName(std::string_view name,
                                                     const std::vector<std::string>& known);

}  // namespace vialkeeper::units
