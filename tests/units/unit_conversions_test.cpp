// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include <algorithm>
#include <cmath>
#include <set>

#include "support/reference_data.h"
#include "units/quantity_text.h"

using namespace vialkeeper;
using units::Dialect;
using units::Kind;
using units::readAnyQuantity;

namespace {

/// Every unit that the command line's contract lists for files, with what it measures.
struct ListedUnit {
  const char* symbol;
  Kind kind;
};

const std::vector<ListedUnit> kListed = {
    {"kg", Kind::kMass},
    {"g", Kind::kMass},
    {"mg", Kind::kMass},
    {"ug", Kind::kMass},
    {"\u00B5g", Kind::kMass},
    {"\u03BCg", Kind::kMass},
    {"mol", Kind::kAmount},
    {"mmol", Kind::kAmount},
    {"umol", Kind::kAmount},
    {"\u00B5mol", Kind::kAmount},
    {"\u03BCmol", Kind::kAmount},
    {"nmol", Kind::kAmount},
    {"L", Kind::kVolume},
    {"mL", Kind::kVolume},
    {"uL", Kind::kVolume},
    {"\u00B5L", Kind::kVolume},
    {"\u03BCL", Kind::kVolume},
    {"Pa", Kind::kPressure},
    {"kPa", Kind::kPressure},
    {"mbar", Kind::kPressure},
    {"bar", Kind::kPressure},
    {"atm", Kind::kPressure},
    {"psi", Kind::kPressure},
    {"mmHg", Kind::kPressure},
    {"degC", Kind::kTemperature},
    {"°C", Kind::kTemperature},
    {"K", Kind::kTemperature},
    {"mol/L", Kind::kConcentration},
    {"mmol/L", Kind::kConcentration},
    {"umol/L", Kind::kConcentration},
    {"\u00B5mol/L", Kind::kConcentration},
    {"\u03BCmol/L", Kind::kConcentration},
    {"M", Kind::kConcentration},
    {"mM", Kind::kConcentration},
    {"uM", Kind::kConcentration},
    {"\u00B5M", Kind::kConcentration},
    {"\u03BCM", Kind::kConcentration},
    {"g/mL", Kind::kDensity},
    {"g/L", Kind::kDensity},
    {"s", Kind::kDuration},
    {"min", Kind::kDuration},
    {"h", Kind::kDuration},
    {"d", Kind::kDuration},
    {"ms", Kind::kDuration},
    {"us", Kind::kDuration},
    {"\u00B5s", Kind::kDuration},
    {"\u03BCs", Kind::kDuration},
    {"ns", Kind::kDuration},
    {"nm", Kind::kLength},
    {"cm", Kind::kLength},
    {"g/mol", Kind::kMolarMass},
    {"L/mol/s", Kind::kSecondOrderRate},
    {"L/mol/cm", Kind::kMolarAbsorptivity},
    {"W", Kind::kPower},
    {"mW", Kind::kPower},
    {"W/m2", Kind::kIrradiance},
    {"mW/cm2", Kind::kIrradiance},
};

/// The unit with µ written as u, as the table of the outside program has it.
std::string plain(std::string symbol) {
  for (const std::string_view micro : {"\u00B5", "\u03BC"}) {
    if (const auto at = symbol.find(micro); at != std::string::npos)
      symbol = symbol.substr(0, at) + 'u' + symbol.substr(at + micro.size());
  }
  if (symbol == "°C") return "degC";
  return symbol;
}

}  // namespace

TEST_CASE("every listed unit is read with and without a blank, µ in both code points", "[units]") {
  for (const ListedUnit& unit : kListed) {
    for (const char* blank : {"", " ", "  ", "\u00A0", "\u202F"}) {
      const std::string written = std::string("12.34") + blank + unit.symbol;
      INFO(written);
      const auto read = readAnyQuantity(written, Dialect::kFile);
      REQUIRE(read);
      CHECK(read->kind == unit.kind);
      CHECK(read->number == 12.34);
      CHECK(read->symbol == plain(unit.symbol));
    }
  }
}

TEST_CASE("every listed unit has the size that UDUNITS-2 gives it", "[units][independent]") {
  // tests/reference/udunits-conversions.csv, whose head names version and command; the tolerance is
  // half a unit of the last digit that the program printed.
  const tests::ReferenceData table("udunits-conversions.csv");
  std::set<std::string> covered;
  for (const auto& row : table.rows()) {
    const std::string written = table.cell(row, "number") + " " + table.cell(row, "unit");
    INFO(written);
    const auto read = readAnyQuantity(written, Dialect::kFile);
    REQUIRE(read);
    const double expected = table.number(row, "si");
    CHECK(std::abs(read->si - expected) <= table.number(row, "half_digit") * 1.0001);
    covered.insert(table.cell(row, "unit"));
  }
  for (const ListedUnit& unit : kListed) {
    INFO(unit.symbol);
    CHECK(covered.contains(plain(unit.symbol)));
  }
}

TEST_CASE("psi, mmHg and atm are what NIST SP 811 makes them", "[units][published]") {
  // NIST SP 811 (2008), appendix B.8: psi 6.894 757 E+03 Pa, mmHg (conventional) 1.333 224 E+02 Pa,
  // atmosphere, standard 1.013 25 E+05 Pa (exact).
  CHECK(readAnyQuantity("1 psi", Dialect::kFile)->si == Approx(6.894757e3).margin(5e-4));
  CHECK(readAnyQuantity("1 mmHg", Dialect::kFile)->si == Approx(1.333224e2).margin(5e-5));
  CHECK(readAnyQuantity("1 atm", Dialect::kFile)->si == 101325.0);
}

TEST_CASE("a number is scaled with a single rounding, so that it reads back as written",
          "[units][identity]") {
  CHECK(units::readQuantity<units::Amount>("0.2 mmol", Dialect::kFile)->si() == 0.2 / 1e3);
  CHECK(units::readQuantity<units::Mass>("12.3 mg", Dialect::kFile)->si() == 12.3 / 1e6);
  CHECK(units::readQuantity<units::Volume>("37 uL", Dialect::kFile)->si() == 37 / 1e9);
  CHECK(units::readQuantity<units::Concentration>("2.5 mM", Dialect::kFile)->si() == 2.5);
}

TEST_CASE("units of one kind agree where they meet", "[units][identity]") {
  const std::vector<std::pair<const char*, const char*>> same = {
      {"1 kg", "1000 g"},      {"1 g", "1000 mg"},      {"1 mg", "1000 ug"},
      {"1 mol", "1000 mmol"},  {"1 mmol", "1000 umol"}, {"1 umol", "1000 nmol"},
      {"1 L", "1000 mL"},      {"1 mL", "1000 uL"},     {"1 bar", "1000 mbar"},
      {"1 bar", "100 kPa"},    {"1 kPa", "1000 Pa"},    {"760 mmHg", "1.0000001424 atm"},
      {"1 mol/L", "1 M"},      {"1 mmol/L", "1 mM"},    {"1 umol/L", "1 uM"},
      {"1 M", "1000 mM"},      {"1 mM", "1000 uM"},     {"1 g/mL", "1000 g/L"},
      {"1 d", "24 h"},         {"1 h", "60 min"},       {"1 min", "60 s"},
      {"1 s", "1000 ms"},      {"1 ms", "1000 us"},     {"1 us", "1000 ns"},
      {"1 cm", "10000000 nm"}, {"1 W", "1000 mW"},      {"1 mW/cm2", "10 W/m2"},
      {"0 degC", "273.15 K"}};
  for (const auto& [one, other] : same) {
    INFO(one);
    CHECK(readAnyQuantity(one, Dialect::kFile)->si ==
          Approx(readAnyQuantity(other, Dialect::kFile)->si).epsilon(1e-10));
  }
}

TEST_CASE("spellings that only people use are refused in files", "[units]") {
  for (const char* written :
       {"1 ml", "1 l", "1 ul", "5 mol%", "2 equiv", "1 g/ml", "20 C", "3 parts", "4 %"}) {
    INFO(written);
    CHECK(readAnyQuantity(written, Dialect::kPerson));
    CHECK_FALSE(readAnyQuantity(written, Dialect::kFile));
  }
}

TEST_CASE("every unit of the table is either listed or for people only", "[units]") {
  for (const units::Unit& unit : units::allUnits()) {
    INFO(unit.symbol);
    const bool listed =
        std::ranges::any_of(kListed, [&](const ListedUnit& l) { return unit.symbol == l.symbol; });
    CHECK(listed != unit.peopleOnly);
  }
}
