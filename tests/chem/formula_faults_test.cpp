// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include <cmath>
#include <random>

#include "chem/formula.h"

using namespace vialkeeper;
using chem::parseFormula;
using chem::toHillFormula;

namespace {

bool isWhole(const chem::Composition& composition) {
  for (const auto& [kind, count] : composition.atoms) {
    if (count != std::floor(count)) return false;
  }
  return true;
}

/// Whatever parses must come back from its own Hill formula; counts that are not whole cannot,
/// because `O4.5S` reads as a hydrate of half a sulphur.
void checkRoundTrip(const std::string& typed) {
  const auto composition = parseFormula(typed);
  if (!composition) {
    REQUIRE(composition.error().offset <= typed.size());
    REQUIRE(composition.error().offset + composition.error().length <= typed.size());
    REQUIRE_FALSE(composition.error().what.empty());
    return;
  }
  for (const auto& [kind, count] : composition->atoms) {
    REQUIRE(count > 0.0);
    REQUIRE(count <= 1e6);
  }
  if (!isWhole(*composition)) return;
  const std::string hill = toHillFormula(*composition);
  INFO(typed << " -> " << hill);
  const auto again = parseFormula(hill);
  REQUIRE(again);
  REQUIRE(*again == *composition);
  REQUIRE(toHillFormula(*again) == hill);
}

}  // namespace

TEST_CASE("a fault in a formula marks the characters that are wrong", "[chem]") {
  struct Wrong {
    const char* formula;
    const char* marked;
    std::size_t offset;
  };
  for (const auto& [formula, marked, offset] : std::vector<Wrong>{{"C8Xh9N", "Xh", 2},
                                                                  {"C8h9N", "h", 2},
                                                                  {"C8H9N)", ")", 5},
                                                                  {"C8(H9N", "(", 2},
                                                                  {"C8(H9N]", "(", 2},
                                                                  {"C8()H9", "()", 2},
                                                                  {"C0H4", "0", 1},
                                                                  {"CH2000000", "2000000", 2},
                                                                  {"(CuSO4·5H2O)2", "·", 6},
                                                                  {"0H2O", "0", 0},
                                                                  {"C8 H9", " ", 2},
                                                                  {"CuSO₄é", "é", 7},
                                                                  {"[0C]", "0", 1},
                                                                  {"[1234C]", "1234", 1},
                                                                  {"[13]", "]", 3},
                                                                  {"Na+Cl-", "+", 2},
                                                                  {"C8H9N?", "?", 5}}) {
    const std::string_view typed = formula;
    INFO(typed);
    const auto read = parseFormula(typed);
    REQUIRE_FALSE(read);
    CHECK(read.error().offset == offset);
    CHECK(typed.substr(read.error().offset, read.error().length) == marked);
  }
}

TEST_CASE("what is no formula at all is refused", "[chem]") {
  for (const std::string& typed :
       {std::string(), std::string("+"), std::string("2-"), std::string("^2-"), std::string("5"),
        std::string("·"), std::string("CuSO4·"), std::string("·5H2O"), std::string("CuSO4··5H2O"),
        std::string("\xC2"), std::string("C\xFF"), std::string("Xx"), std::string("J"),
        std::string("Ca^"), std::string("C^2"), std::string("C^123-"), std::string(1001, 'C'),
        std::string(65, '(') + "C" + std::string(65, ')')}) {
    INFO(typed);
    CHECK_FALSE(parseFormula(typed));
  }
  CHECK(parseFormula(std::string(1000, 'C')));
  CHECK(parseFormula(std::string(64, '(') + "C" + std::string(64, ')')));
}

TEST_CASE("nested multipliers cannot run away", "[chem]") {
  std::string typed = "C";
  for (int i = 0; i < 60; ++i) typed = "(" + typed + ")999999";
  CHECK_FALSE(parseFormula(typed));
}

TEST_CASE("Hill formulas of ions whose count could pass for a charge are read back as themselves",
          "[chem][identity]") {
  for (const char* formula :
       {"[I3]-", "[N3]-", "[O2]-", "[H2]+", "C2N12^-", "[Nb6O14]-", "P4^-", "S8^+", "[HF2]-",
        "PW12O40^3-", "C60-", "[Na2]+", "[B12H12]2-", "[Au25S12]-"}) {
    checkRoundTrip(formula);
  }
}

TEST_CASE("20,000 random formulas never crash, and what parses survives its Hill formula",
          "[chem][identity]") {
  std::mt19937_64 random(20260304);
  const std::vector<std::string> pieces = {
      "C", "H", "N", "O", "Na",  "Cl", "Co", "Fe",   "D", "T",   "(",   ")",   "[",
      "]", "{", "}", "2", "3",   "4",  "12", "0",    "·", "*",   ".",   "^",   "+",
      "-", "²", "⁻", "₂", "13C", "Xx", "é",  "\xC2", " ", "0.5", "H2O", "SO4", "PF6"};
  std::size_t readable = 0;
  for (int round = 0; round < 20000; ++round) {
    std::string typed;
    const std::size_t length = 1 + random() % 9;
    for (std::size_t i = 0; i < length; ++i) {
      // Mostly symbols and counts, so that a good part of the strings are formulas.
      const std::size_t range = random() % 3 == 0 ? pieces.size() : 10;
      typed += pieces[random() % range];
      if (random() % 3 == 0) typed += std::to_string(1 + random() % 20);
    }
    if (random() % 4 == 0)
      typed += std::vector<std::string>{"+", "-", "2+", "^3-", "3-", "²⁺"}[random() % 6];
    if (parseFormula(typed)) ++readable;
    checkRoundTrip(typed);
  }
  CHECK(readable > 4000);
}

TEST_CASE("random bytes never crash the formula reader", "[chem][identity]") {
  std::mt19937_64 random(6);
  for (int round = 0; round < 20000; ++round) {
    std::string typed;
    const std::size_t length = random() % 16;
    for (std::size_t i = 0; i < length; ++i)
      typed += static_cast<char>(random() % (round % 2 == 0 ? 128 : 256));
    checkRoundTrip(typed);
  }
}
