// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/find_completion.h"

#include <fmt/format.h>
#include <catch2/catch.hpp>

#include <chrono>
#include <random>

#include "app/notebook/find_language.h"

using namespace vialkeeper::app;

namespace {

FindVocabulary sample() {
  FindVocabulary vocabulary{
      .substances = {{"pivalic acid", 40},
                     {"acetic acid", 90},
                     {"4CzIPN", 300},
                     {"acridine", 1},
                     {"indoline", 200},
                     {"2-methylindoline", 3},
                     {"DMF", 500}},
      .series = {{"acid additives"}, {"nickel screen"}},
      .people = {{"KW"}, {"KM"}, {"AB"}},
      .vials = {},
      .lamps = {{"LED 440"}},
      .atmospheres = {},
  };
  prepareVocabulary(vocabulary);
  return vocabulary;
}

/// Proposals for the text with `|` at the cursor, as their labels.
std::vector<std::string> labels(std::string text) {
  const std::size_t cursor = text.find('|');
  text.erase(cursor, 1);
  std::vector<std::string> all;
  for (const Completion& each : completeFind(text, cursor, sample())) all.push_back(each.label);
  return all;
}

/// The text after the first proposal is taken.
std::string taken(std::string text) {
  const std::size_t cursor = text.find('|');
  text.erase(cursor, 1);
  const auto found = completeFind(text, cursor, sample());
  if (found.empty()) return "nothing";
  return text.replace(found[0].replace.offset, found[0].replace.length, found[0].insert);
}

using Labels = std::vector<std::string>;

}  // namespace

TEST_CASE("values are completed behind their field, best first", "[notebook][find]") {
  CHECK(labels("additive:ac|") == Labels{"acetic acid", "acridine", "pivalic acid"});
  CHECK(labels("film additive:\"4-cz|") == Labels{"4CzIPN"});
  CHECK(labels("any:indoline|") == Labels{"indoline", "2-methylindoline"});
  CHECK(labels("series:|") == Labels{"nickel screen", "acid additives"});
  CHECK(labels("person:k|") == Labels{"KM", "KW"});
  CHECK(labels("state:|").front() == "planned");
  CHECK(labels("state:c|") == Labels{"charged", "closed"});
  CHECK(labels("lamp:4|") == Labels{"LED 440"});
  CHECK(labels("yield>|").empty());
  CHECK(labels("structure:C|").empty());
  CHECK(labels("code:KW|").empty());
}

TEST_CASE("fields and substances in any role are completed from a bare word", "[notebook][find]") {
  CHECK(labels("addi|") == Labels{"additive: a substance in this role"});
  CHECK(labels("film not (pho|").front() == "photocatalyst: a substance in this role");
  CHECK(labels("|").size() == 12);
  CHECK(labels("film |").size() == 12);
  CHECK(labels("indol|") == Labels{"indoline, in any role", "2-methylindoline, in any role"});
  CHECK(labels("\"done\"|").empty());
}

TEST_CASE("taking a proposal replaces the whole word around the cursor", "[notebook][find]") {
  CHECK(taken("additive:pi|") == "additive:\"pivalic acid\" ");
  CHECK(taken("additive:\"pi|\" yield>60") == "additive:\"pivalic acid\"  yield>60");
  CHECK(taken("additive:pi|v 5 mol%") == "additive:\"pivalic acid\"  5 mol%");
  CHECK(taken("(additive:pi|)") == "(additive:\"pivalic acid\" )");
  CHECK(taken("addi| film") == "additive: film");
  CHECK(taken("4cz|") == "any:4CzIPN ");
  CHECK(taken("additive: |") == "additive: DMF ");
}

TEST_CASE("any text and cursor are answered, within the text", "[notebook][find][identity]") {
  const FindVocabulary vocabulary = sample();
  constexpr std::string_view kParts[] = {"additive:", "\"",     "pi",      " ", "(", ")", "é",
                                         "\xE2",      "yield>", "series:", ":", "*", "\0"};
  std::mt19937_64 random(23);
  for (int round = 0; round < 5'000; ++round) {
    std::string text;
    const std::size_t parts = random() % 8;
    for (std::size_t i = 0; i < parts; ++i) text += kParts[random() % std::size(kParts)];
    for (std::size_t cursor = 0; cursor <= text.size() + 1; ++cursor) {
      for (const Completion& each : completeFind(text, cursor, vocabulary)) {
        REQUIRE(each.replace.offset + each.replace.length <= text.size());
        REQUIRE(each.replace.offset <= cursor);
        REQUIRE(cursor <= each.replace.offset + each.replace.length);
      }
    }
  }
}

TEST_CASE("twenty thousand names are gone through between two keystrokes", "[notebook][find]") {
  FindVocabulary vocabulary;
  for (int i = 0; i < 20'000; ++i)
    vocabulary.substances.push_back(
        {fmt::format("{}-methyl-{}-indoline acid {}", i % 7, i % 991, i), i % 13});
  prepareVocabulary(vocabulary);
  const auto begin = std::chrono::steady_clock::now();
  CHECK(completeFind("additive:ind", 12, vocabulary).size() == 12);
  const std::chrono::duration<double, std::milli> passed = std::chrono::steady_clock::now() - begin;
  INFO(passed.count() << " ms");
  CHECK(passed.count() < 500.0);  // a few ms; the room is for instrumented builds on busy machines
}
