// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "units/quantity_text.h"

#include <catch2/catch.hpp>

#include <cmath>
#include <random>

using namespace vialkeeper;
using units::Dialect;
using units::Kind;
using units::Range;
using units::readNumber;
using units::readQuantity;

namespace {

/// What the fault's offset and length mark in the text.
template <class T>
std::string marked(const std::expected<T, text::TextFault>& read, std::string_view typed) {
  REQUIRE_FALSE(read);
  REQUIRE(read.error().offset <= typed.size());
  REQUIRE(read.error().offset + read.error().length <= typed.size());
  CHECK_FALSE(read.error().what.empty());
  CHECK_FALSE(read.error().mend.empty());
  return std::string(typed.substr(read.error().offset, read.error().length));
}

std::string markedMass(std::string_view typed, Dialect dialect = Dialect::kFile) {
  INFO(typed);
  return marked(readQuantity<units::Mass>(typed, dialect), typed);
}

}  // namespace

TEST_CASE("numbers are read in every form a file may use", "[units]") {
  for (const auto& [typed, value] :
       std::vector<std::pair<const char*, double>>{{"12.3", 12.3},
                                                   {" 12.3 ", 12.3},
                                                   {".5", 0.5},
                                                   {"5.", 5.0},
                                                   {"+7", 7.0},
                                                   {"-7", -7.0},
                                                   {"\u22127", -7.0},
                                                   {"1e3", 1000.0},
                                                   {"1E-3", 0.001},
                                                   {"2.5e+2", 250.0},
                                                   {"007", 7.0},
                                                   {"0", 0.0},
                                                   {"1e-300", 1e-300}}) {
    INFO(typed);
    const auto read = readNumber(typed, Dialect::kFile);
    REQUIRE(read);
    CHECK(*read == value);
  }
}

TEST_CASE("what is no finite decimal number is refused", "[units]") {
  for (const char* typed :
       {"",      " ",     "nan",    "NaN",     "inf",      "-inf",     "infinity", "0x10",
        "0x1p3", "1e999", "-1e999", "1,234.5", "1.234,5",  "1.2.3",    "1,2,3",    "1'000",
        "1 000", "--1",   "+-1",    "-+1",     "+\u22121", "-\u22121", ".",        ",",
        "e5",    "1e",    "1e+",    "twelve",  "\u0661",   "1_000",    "$1"}) {
    for (const Dialect dialect : {Dialect::kFile, Dialect::kPerson}) {
      INFO(typed);
      CHECK_FALSE(readNumber(typed, dialect));
      CHECK_FALSE(readQuantity<units::Mass>(std::string(typed) + " mg", dialect, Range::kAny));
    }
  }
}

TEST_CASE("a decimal comma is read from people and refused in files with its place", "[units]") {
  CHECK(*readNumber("12,5", Dialect::kPerson) == 12.5);
  CHECK(readQuantity<units::Mass>("12,5 mg", Dialect::kPerson)->milligrams() ==
        Approx(12.5).epsilon(1e-15));
  CHECK(markedMass("12,5 mg") == ",");
  CHECK(readQuantity<units::Mass>("12,5 mg", Dialect::kFile).error().offset == 2);
  CHECK(markedMass("1,234.5 mg", Dialect::kFile) == ",");
  CHECK(markedMass("1,234.5 mg", Dialect::kPerson) == ".");
}

TEST_CASE("a fault marks the characters that are wrong", "[units]") {
  CHECK(markedMass("12.3 mgg") == "mgg");
  CHECK(markedMass("12.3mgg") == "mgg");
  CHECK(markedMass("12.3 Mg") == "Mg");
  CHECK(markedMass("12.3") == "");
  CHECK(readQuantity<units::Mass>("12.3", Dialect::kFile).error().offset == 4);
  CHECK(markedMass("mg") == "mg");
  CHECK(markedMass("  12.3 mL") == "mL");
  CHECK(markedMass("12.3 µL") == "µL");
  CHECK(markedMass("12.3 °C") == "°C");
  CHECK(markedMass("12.3 mg 4 mg") == "4 mg");
  CHECK(markedMass("-3 mg") == "-3 mg");
  CHECK(markedMass("1.2.3 mg") == ".");
  CHECK(markedMass("12.3 mg mg") == "mg mg");
}

TEST_CASE("a unit of the wrong kind is named with what is wanted", "[units]") {
  const auto read = readQuantity<units::Mass>("2 mL", Dialect::kFile);
  REQUIRE_FALSE(read);
  CHECK(read.error().what == "mL is a volume, but a mass is wanted");
  CHECK(read.error().mend.find("mg, g, kg, ug") != std::string::npos);
  const auto two = units::readQuantityOf({Kind::kMass, Kind::kVolume}, "2 bar", Dialect::kFile);
  REQUIRE_FALSE(two);
  CHECK(two.error().what == "bar is a pressure, but a mass or a volume is wanted");
}

TEST_CASE("a unit that differs by case alone draws the right one as advice", "[units]") {
  const auto read = readQuantity<units::Pressure>("2 Bar", Dialect::kFile);
  REQUIRE_FALSE(read);
  CHECK(read.error().mend.starts_with("did you mean bar?"));
  CHECK_FALSE(readQuantity<units::Amount>("2 MMOL", Dialect::kPerson));
}

TEST_CASE("ranges: zero and negative values are refused where they make no sense", "[units]") {
  using units::Volume;
  CHECK_FALSE(readQuantity<Volume>("0 mL", Dialect::kFile));
  CHECK_FALSE(readQuantity<Volume>("-1 mL", Dialect::kFile));
  CHECK_FALSE(readQuantity<Volume>("-0.0 mL", Dialect::kFile));
  CHECK(readQuantity<Volume>("0 mL", Dialect::kFile, Range::kNonNegative)->si() == 0.0);
  CHECK_FALSE(readQuantity<Volume>("-1 mL", Dialect::kFile, Range::kNonNegative));
  CHECK(readQuantity<Volume>("-1 mL", Dialect::kFile, Range::kAny)->millilitres() == Approx(-1.0));
  CHECK(readQuantity<Volume>("0 mL", Dialect::kFile).error().what.starts_with("zero"));
  CHECK(readQuantity<Volume>("-1 mL", Dialect::kFile).error().what == "a negative value");
}

TEST_CASE("a value that the unit drives out of the doubles is refused", "[units]") {
  CHECK_FALSE(readQuantity<units::Pressure>("1e305 bar", Dialect::kFile));
  CHECK_FALSE(readQuantity<units::Mass>("1e-323 ug", Dialect::kFile));
  const auto any = units::readAnyQuantity("1e305 bar", Dialect::kFile);
  CHECK((!any || std::isfinite(any->si)));
}

TEST_CASE("temperatures may be negative in Celsius but not reach absolute zero", "[units]") {
  using units::Temperature;
  CHECK(readQuantity<Temperature>("-20 degC", Dialect::kFile)->kelvin() ==
        Approx(253.15).epsilon(1e-15));
  CHECK(readQuantity<Temperature>("0 °C", Dialect::kFile)->kelvin() == 273.15);
  CHECK_FALSE(readQuantity<Temperature>("-273.15 degC", Dialect::kFile));
  CHECK_FALSE(readQuantity<Temperature>("0 K", Dialect::kFile));
  CHECK_FALSE(readQuantity<Temperature>("-300 degC", Dialect::kFile, Range::kAny));
}

TEST_CASE("a temperature difference is given in kelvin only", "[units]") {
  CHECK(*units::readKelvinDifference("0.5 K", Range::kPositive) == 0.5);
  CHECK(*units::readKelvinDifference("0 K", Range::kNonNegative) == 0.0);
  CHECK_FALSE(units::readKelvinDifference("0 K", Range::kPositive));
  CHECK_FALSE(units::readKelvinDifference("-0.5 K", Range::kNonNegative));
  CHECK_FALSE(units::readKelvinDifference("0.5 degC", Range::kNonNegative));
  CHECK_FALSE(units::readKelvinDifference("0.5", Range::kNonNegative));
}

TEST_CASE("people add up time spans, files and other quantities do not", "[units]") {
  using units::Duration;
  CHECK(readQuantity<Duration>("1 h 20 min", Dialect::kPerson)->seconds() == 4800.0);
  CHECK(readQuantity<Duration>("1h 20min", Dialect::kPerson)->seconds() == 4800.0);
  CHECK(readQuantity<Duration>("2 d 3 h 4 min 5 s", Dialect::kPerson)->seconds() == 183845.0);
  CHECK(readQuantity<Duration>("1,5 h 6 min", Dialect::kPerson)->seconds() == 5760.0);
  CHECK_FALSE(readQuantity<Duration>("1 h 20 min", Dialect::kFile));
  CHECK_FALSE(readQuantity<Duration>("1 h 20", Dialect::kPerson));
  CHECK_FALSE(readQuantity<Duration>("1 h 20 mg", Dialect::kPerson));
  CHECK_FALSE(readQuantity<units::Mass>("1 g 200 mg", Dialect::kPerson));
}

TEST_CASE("scaling a written number scales its quantity, over 2000 random numbers and units",
          "[units][identity]") {
  std::mt19937_64 random(42);
  std::uniform_real_distribution<double> decade(-6.0, 6.0);
  const auto all = units::allUnits();
  for (int round = 0; round < 2000; ++round) {
    const units::Unit& unit = all[random() % all.size()];
    const double number = std::pow(10.0, decade(random));
    char digits[40];
    std::snprintf(digits, sizeof digits, "%.17g", number);
    INFO(digits << unit.symbol);
    const auto read =
        units::readAnyQuantity(std::string(digits) + std::string(unit.symbol), Dialect::kPerson);
    REQUIRE(read);
    REQUIRE(read->number == number);
    REQUIRE(read->si ==
            Approx(number * (unit.numerator / unit.denominator) + unit.offset).epsilon(1e-14));
  }
}

TEST_CASE("no random text crashes a reader, and every fault lies inside the text",
          "[units][identity]") {
  std::mt19937_64 random(43);
  const std::vector<std::string> pieces = {
      "1", "2.5", ",",   ".", "-", "+", "e", "E5", " ",      "\t",   "\u00A0", "mg", "mL",
      "h", "min", "mol", "%", "/", "µ", "μ", "°C", "\u2212", "\xC2", "nan",    "L"};
  for (int round = 0; round < 20000; ++round) {
    std::string typed;
    const std::size_t length = random() % 7;
    for (std::size_t i = 0; i < length; ++i) typed += pieces[random() % pieces.size()];
    for (const Dialect dialect : {Dialect::kFile, Dialect::kPerson}) {
      const auto read = units::readAnyQuantity(typed, dialect);
      if (read) {
        REQUIRE(std::isfinite(read->si));
      } else {
        INFO(typed);
        REQUIRE(read.error().offset + read.error().length <= typed.size());
        REQUIRE_FALSE(pointedAt(read.error(), typed).empty());
      }
    }
  }
}
