// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/json_text.h"

#include <fmt/format.h>

#include <cmath>
#include <nlohmann/json.hpp>

namespace vialkeeper::cli {
namespace {

using Json = nlohmann::ordered_json;

void append(std::string& text, const Json& value, int depth);

void newLine(std::string& text, int depth) {
  text += '\n';
  text.append(static_cast<std::size_t>(depth) * 2, ' ');
}

void appendMembers(std::string& text, const Json& value, int depth) {
  const bool object = value.is_object();
  text += object ? '{' : '[';
  bool first = true;
  for (const auto& [key, member] : value.items()) {
    if (!first) text += ',';
    first = false;
    newLine(text, depth + 1);
    if (object) text += Json(key).dump() + ": ";
    append(text, member, depth + 1);
  }
  if (!first) newLine(text, depth);
  text += object ? '}' : ']';
}

void append(std::string& text, const Json& value, int depth) {
  if (value.is_structured()) {
    appendMembers(text, value, depth);
  } else if (value.is_number_float()) {
    // fmt's default is the shortest decimal that reads back the same; nlohmann's is so only mostly.
    const double number = value.get<double>();
    text += std::isfinite(number) ? fmt::format("{}", number) : "null";
  } else {
    text += value.dump();
  }
}

}  // namespace

std::string toJsonText(const Json& value) {
  std::string text;
  append(text, value, 0);
  return text + '\n';
}

Json orNull(const std::optional<double>& number) { return number ? Json(*number) : Json(nullptr); }

Json noticesJson(const text::Notices& notices) {
  Json list = Json::array();
  for (const text::Notice& notice : notices) {
    list.push_back(Json{{"code", notice.code}, {"text", notice.text}, {"at", notice.at}});
  }
  return list;
}

}  // namespace vialkeeper::cli
