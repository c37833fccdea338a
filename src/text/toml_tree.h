// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <string>
#include <string_view>
#include <utility>
#include <variant>
#include <vector>

#include "text/fault.h"

namespace vialkeeper::text {

struct TomlValue;
using TomlArray = std::vector<TomlValue>;
using TomlTable = std::vector<std::pair<std::string, TomlValue>>;  ///< in the file's order

/// A value whose line could not be read; that fault has been told, so nothing is to be said of it.
struct Unreadable {};

/// A date or time of TOML: no field of ours takes one.
struct TomlMoment {};

/// A TOML value with the line it stands on, free of the parser's own types.
struct TomlValue {
  int line = 0;
  std::variant<std::string, double, std::int64_t, bool, TomlArray, TomlTable, TomlMoment,
               Unreadable>
      data;
};

/// A document and what is wrong with its spelling.
struct TomlDocument {
  TomlTable root;
  Faults faults;         ///< syntax faults and repeated fields, in the order of lines
  bool complete = true;  ///< false where so much was unreadable that missing fields mean nothing
};

/// Parses TOML and goes on behind a fault: an unreadable or repeated line is told, set aside, and
/// the rest is read again, so that all faults of a file come out in one go.
[[nodiscard]] TomlDocument readToml(std::string_view bytes, const std::string& file);

}  // namespace vialkeeper::text
