// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/raw_json.h"

namespace vialkeeper::db {
namespace {

/// Where the value that begins at `at` ends; npos where it does not.
std::size_t endOfValue(std::string_view text, std::size_t at) {
  int depth = 0;
  bool inText = false;
  for (std::size_t i = at; i < text.size(); ++i) {
    const char c = text[i];
    if (inText) {
      if (c == '\\') {
        ++i;
      } else if (c == '"') {
        inText = false;
      }
      continue;
    }
    if (c == '"') {
      inText = true;
    } else if (c == '{' || c == '[') {
      ++depth;
    } else if (c == '}' || c == ']') {
      if (depth == 0) return i;
      --depth;
    } else if (c == ',' && depth == 0) {
      return i;
    }
  }
  return depth == 0 && !inText ? text.size() : std::string_view::npos;
}

/// The parts between the outer brackets.
std::vector<std::string_view> parts(std::string_view text, char open, char close) {
  std::vector<std::string_view> list;
  if (text.size() < 2 || text.front() != open || text.back() != close) return list;
  const std::string_view inside = text.substr(1, text.size() - 2);
  for (std::size_t at = 0; at < inside.size();) {
    const std::size_t end = endOfValue(inside, at);
    if (end == std::string_view::npos) return {};
    list.push_back(inside.substr(at, end - at));
    at = end + 1;
  }
  return list;
}

}  // namespace

std::vector<std::string_view> rawElements(std::string_view array) { return parts(array, '[', ']'); }

std::string_view rawMember(std::string_view object, std::string_view name) {
  for (const std::string_view member : parts(object, '{', '}')) {
    const bool here = member.size() > name.size() + 3 && member.front() == '"' &&
                      member.substr(1, name.size()) == name &&
                      member.substr(1 + name.size(), 2) == "\":";
    if (here) return member.substr(name.size() + 3);
  }
  return {};
}

}  // namespace vialkeeper::db
