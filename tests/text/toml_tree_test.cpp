// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/toml_tree.h"

#include <catch2/catch.hpp>

#include <algorithm>
#include <random>

#include "support/sample_plan.h"

using namespace vialkeeper;
using namespace std::string_literals;
using text::readToml;
using text::TomlTable;
using text::TomlValue;

namespace {

const TomlValue* find(const TomlTable& table, std::string_view key) {
  const auto found = std::ranges::find(
      table, key, [](const auto& entry) { return std::string_view(entry.first); });
  return found == table.end() ? nullptr : &found->second;
}

template <class T>
T get(const TomlTable& table, std::string_view key) {
  const TomlValue* value = find(table, key);
  REQUIRE(value != nullptr);
  REQUIRE(std::holds_alternative<T>(value->data));
  return std::get<T>(value->data);
}

}  // namespace

TEST_CASE("a document keeps types, lines and the order of its fields", "[text]") {
  const auto document = readToml(
      "zulu = \"x\"\nalpha = 1.5\n\n[mike]\ncount = 3\nflag = true\nlist = [1, \"a\"]\n"
      "[[unit]]\nn = 1\n[[unit]]\nn = 2\n",
      "p.toml");
  REQUIRE(document.faults.empty());
  CHECK(document.complete);
  REQUIRE(document.root.size() == 4);
  CHECK(document.root[0].first == "zulu");
  CHECK(document.root[1].first == "alpha");
  CHECK(document.root[2].first == "mike");
  CHECK(find(document.root, "alpha")->line == 2);
  CHECK(get<double>(document.root, "alpha") == 1.5);
  const auto mike = get<TomlTable>(document.root, "mike");
  CHECK(find(document.root, "mike")->line == 4);
  CHECK(get<std::int64_t>(mike, "count") == 3);
  CHECK(get<bool>(mike, "flag"));
  CHECK(find(mike, "list")->line == 7);
  CHECK(get<text::TomlArray>(mike, "list").size() == 2);
  const auto units = get<text::TomlArray>(document.root, "unit");
  REQUIRE(units.size() == 2);
  CHECK(units[0].line == 8);
  CHECK(units[1].line == 10);
}

TEST_CASE("dates of TOML are recognised as values that no field takes", "[text]") {
  const auto document = readToml("day = 1979-05-27\nmoment = 1979-05-27T07:32:00Z\n", "p.toml");
  REQUIRE(document.faults.empty());
  CHECK_NOTHROW(get<text::TomlMoment>(document.root, "day"));
  CHECK_NOTHROW(get<text::TomlMoment>(document.root, "moment"));
}

TEST_CASE("a repeated field is told on its second line, and the first value counts", "[text]") {
  const auto document =
      readToml("title = \"one\"\nseries = \"s\"\ntitle = \"two\"\nlast = 4\n", "p.toml");
  REQUIRE(document.faults.size() == 1);
  CHECK(document.faults[0].line == 3);
  CHECK(document.faults[0].field == "title");
  CHECK(document.faults[0].what == "this field stands twice");
  CHECK(get<std::string>(document.root, "title") == "one");
  CHECK(get<std::int64_t>(document.root, "last") == 4);
}

TEST_CASE("a repeated section is told on its second line", "[text]") {
  const auto document =
      readToml("[vial]\nvolume = \"1 mL\"\n[liquid]\na = 1\n[vial]\nvolume = \"2 mL\"\n", "p.toml");
  REQUIRE(document.faults.size() == 1);
  CHECK(document.faults[0].line == 5);
  CHECK(document.faults[0].field == "vial");
  CHECK(document.faults[0].what == "this section stands twice");
}

TEST_CASE("a quantity without quotation marks is recognised and its mending is spelt out",
          "[text]") {
  const auto document = readToml("[liquid]\ntotal = 2.0 mL   # as usual\n", "p.toml");
  REQUIRE(document.faults.size() == 1);
  CHECK(document.faults[0].line == 2);
  CHECK(document.faults[0].field == "total");
  CHECK(document.faults[0].what == "a quantity without quotation marks");
  CHECK(document.faults[0].mend == "write total = \"2.0 mL\"");
  const auto liquid = get<TomlTable>(document.root, "liquid");
  CHECK_NOTHROW(get<text::Unreadable>(liquid, "total"));
}

TEST_CASE("all spelling faults of a file come out in one go, in the order of lines", "[text]") {
  const auto document = readToml(
      "title = \"open\nseries == \"s\"\n\n[vial]\nvolume = 11.6 mL\nname = \"v\"\nname = \"w\"\n"
      "displaced = mL\nderating = 0.5\n",
      "p.toml");
  std::vector<int> lines;
  for (const auto& fault : document.faults) lines.push_back(fault.line);
  CHECK(lines == std::vector<int>{1, 2, 5, 7, 8});
  const auto vial = get<TomlTable>(document.root, "vial");
  CHECK(get<double>(vial, "derating") == 0.5);
  CHECK(get<std::string>(vial, "name") == "v");
}

TEST_CASE("an unreadable section header is told once and keeps its fields to itself", "[text]") {
  const auto document = readToml(
      "[reaction]\nlimiting = \"a\"\n[liquid\ntotal = \"2 mL\"\n[seal]\nsaturated = true\n",
      "p.toml");
  REQUIRE(document.faults.size() == 1);
  CHECK(document.faults[0].line == 3);
  CHECK_FALSE(document.complete);
  CHECK(get<TomlTable>(document.root, "reaction").size() == 1);
  CHECK(get<bool>(get<TomlTable>(document.root, "seal"), "saturated"));
}

TEST_CASE("a file in another encoding is refused before it is parsed", "[text]") {
  for (const auto& bytes : {"\xFF\xFE"
                            "a\0=\0"s,
                            "a = \"\0\"\n"s, "a = \"5 \xB5L\"\n"s}) {
    const auto document = readToml(bytes, "p.toml");
    REQUIRE(document.faults.size() == 1);
    CHECK_FALSE(document.complete);
    CHECK(document.root.empty());
  }
  const auto marked = readToml("\xEF\xBB\xBFtitle = \"µ\"\r\n", "p.toml");
  CHECK(marked.faults.empty());
  CHECK(get<std::string>(marked.root, "title") == "µ");
}

TEST_CASE("a document nested without end is refused, not followed", "[text]") {
  std::string dotted = "a";
  for (int i = 0; i < 20000; ++i) dotted += ".a";
  for (const std::string& bytes :
       {"a = " + std::string(20000, '[') + std::string(20000, ']'), dotted + " = 1",
        "a = " + std::string(20000, '{'), "[" + dotted + "]", "a = { " + dotted + " = 1 }",
        "\"a\" ." + dotted + " = 1"}) {
    const auto document = readToml(bytes, "p.toml");
    CHECK_FALSE(document.faults.empty());
  }
}

TEST_CASE("dotted keys of a plan's depth and dots in texts are no nesting", "[text]") {
  const auto document = readToml(
      "supply.kind = \"stock\"\n[a.b.c]\nd.e = 1.5\nname = \"1.2.3.4.5.6.7.8.9.10.11.12 ......\" # "
      "a.b.c.d.e.f\n"
      "v = [1.0, 1.0, 1.0, 1.0, 1.0, 1.0, 1.0, 1.0, 1.0, 1.0]\n",
      "p.toml");
  CHECK(document.faults.empty());
}

TEST_CASE("inline tables nested as deep as the parser goes are followed or refused, never overrun",
          "[text]") {
  std::string bytes = "a = ";
  for (int i = 0; i < 250; ++i) bytes += "{ a.a.a.a.a.a.a = ";
  bytes += "1" + std::string(250, '}');
  const auto document = readToml(bytes, "p.toml");
  CHECK(document.faults.size() <= 1);
}

TEST_CASE("two thousand mutated plans never hang, throw or go without lines", "[text][identity]") {
  const std::string good = tests::samplePlanText();
  std::mt19937_64 random(1);
  std::size_t faulty = 0;
  for (int round = 0; round < 2000; ++round) {
    const std::string bytes = tests::mutated(good, random);
    const auto document = readToml(bytes, "p.toml");
    const auto lineCount = 1 + std::ranges::count(bytes, '\n');
    if (!document.faults.empty()) ++faulty;
    for (const auto& fault : document.faults) {
      REQUIRE(fault.line >= 1);
      REQUIRE(fault.line <= lineCount);
      REQUIRE_FALSE(fault.what.empty());
    }
    REQUIRE(std::ranges::is_sorted(document.faults, {}, &text::Fault::line));
  }
  CHECK(faulty > 500);
}
