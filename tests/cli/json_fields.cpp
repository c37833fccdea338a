// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/json_fields.h"

#include <fmt/format.h>

#include <catch2/catch.hpp>
#include <cstdlib>
#include <regex>
#include <sstream>
#include <stdexcept>

namespace vialkeeper::tests {
namespace {

using nlohmann::json;

template <class Check>
void forEachField(const json& object, std::string_view fields, Check check) {
  std::istringstream names{std::string(fields)};
  for (std::string name; names >> name;) {
    INFO(name);
    REQUIRE(object.contains(name));
    check(object[name]);
  }
}

/// What stands in quotation marks holds no numbers of ours.
std::string withoutTexts(const std::string& out) {
  static const std::regex text(R"re("(\\.|[^"\\])*")re");
  return std::regex_replace(out, text, "");
}

}  // namespace

void checkOneObject(const std::string& out) {
  REQUIRE(json::accept(out));  // refuses a second value and anything behind the first
  CHECK(json::parse(out).is_object());
  CHECK(out.starts_with("{"));
  CHECK(out.ends_with("}\n"));
  static const std::regex number(R"(-?[0-9][0-9.eE+-]*)");
  const std::string bare = withoutTexts(out);
  for (auto it = std::sregex_iterator(bare.begin(), bare.end(), number);
       it != std::sregex_iterator(); ++it) {
    const std::string written = it->str();
    const double value = std::strtod(written.c_str(), nullptr);
    INFO(written);
    CHECK(fmt::format("{}", value) == written);
  }
}

void checkNumbers(const json& object, std::string_view fields) {
  forEachField(object, fields, [](const json& value) { CHECK(value.is_number()); });
}

void checkTexts(const json& object, std::string_view fields) {
  forEachField(object, fields, [](const json& value) { CHECK(value.is_string()); });
}

void checkNulls(const json& object, std::string_view fields) {
  forEachField(object, fields, [](const json& value) { CHECK(value.is_null()); });
}

void checkNotices(const json& object) {
  REQUIRE(object.contains("notices"));
  REQUIRE(object["notices"].is_array());
  static const std::regex code("[a-z0-9]+(-[a-z0-9]+)*");
  for (const json& notice : object["notices"]) {
    REQUIRE(notice.is_object());
    CHECK(notice.size() == 3);
    checkTexts(notice, "code text at");
    CHECK(std::regex_match(notice["code"].get<std::string>(), code));
    CHECK(!notice["text"].get<std::string>().empty());
  }
}

std::string noticeCodes(const json& object) {
  std::string codes;
  for (const json& notice : object["notices"]) codes += notice["code"].get<std::string>() + " ";
  return codes;
}

const json& component(const json& charge, std::string_view key) {
  for (const json& entry : charge["components"]) {
    if (entry["key"] == key) return entry;
  }
  throw std::logic_error("no component " + std::string(key));
}

}  // namespace vialkeeper::tests
