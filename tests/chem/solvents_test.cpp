// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/solvents.h"

#include <catch2/catch.hpp>

#include "chem/reference_table.h"

using namespace vialkeeper;
using chem::findSolvent;
using units::Temperature;

TEST_CASE("every reference table is linked in and names the source of each row",
          "[chem][reference]") {
  const auto names = chem::ReferenceTable::builtInNames();
  CHECK(names.size() >= 12);
  for (const auto name : names) {
    INFO(name);
    const auto rows = chem::ReferenceTable::builtIn(name).rows();
    CHECK(!rows.empty());
    for (const auto& row : rows) CHECK(row.source().size() > 10);
  }
}

TEST_CASE("a reference row without a source is refused with its line", "[chem][reference]") {
  const auto table = chem::ReferenceTable::read(
      "# vialkeeper-reference/1 test\nname,value,source\na,1,book\nb,2,\n", "t.csv");
  REQUIRE(!table);
  REQUIRE(table.error().size() == 1);
  CHECK(table.error().front().line == 4);
  CHECK(table.error().front().field == "source");
}

TEST_CASE("the solvent table holds at least fourteen solvents with densities and vapour pressures",
          "[chem][reference]") {
  std::size_t complete = 0;
  for (const chem::Solvent& solvent : chem::solvents()) {
    const bool density = solvent.densityAt20C && solvent.densityAt25C;
    if (density && vapourPressure(solvent, Temperature::fromCelsius(25)) &&
        !solvent.formula.empty())
      ++complete;
  }
  CHECK(complete >= 14);
}

TEST_CASE("a solvent is found by name, abbreviation in any case, and CAS number", "[chem]") {
  const chem::Solvent* acetonitrile = findSolvent("acetonitrile");
  REQUIRE(acetonitrile != nullptr);
  CHECK(findSolvent("MeCN") == acetonitrile);
  CHECK(findSolvent("mecn") == acetonitrile);
  CHECK(findSolvent("75-05-8") == acetonitrile);
  CHECK(findSolvent("acetonitril") == nullptr);
}

TEST_CASE("vapour pressures meet the printed points of the published coefficient sets",
          "[chem][published]") {
  // Antoine sets of the NIST WebBook, Landolt-Börnstein IV/20 and Poling et al., evaluated at these
  // temperatures in tests/reference/vapour-pressure-points.csv; 2 % covers the spread of good sets.
  struct Point {
    const char* name;
    double kelvin, kPa;
  };
  const auto point =
      GENERATE(Point{"acetonitrile", 298.15, 11.7951}, Point{"methanol", 298.15, 16.9407},
               Point{"ethanol", 298.15, 7.8764}, Point{"acetone", 298.15, 30.6},
               Point{"tetrahydrofuran", 298.15, 21.6229}, Point{"toluene", 298.15, 3.789},
               Point{"dichloromethane", 298.15, 58.2899}, Point{"acetonitrile", 333.15, 48.8498},
               Point{"ethanol", 333.15, 46.8994}, Point{"water", 298.15, 3.1698});
  INFO(point.name);
  const auto pressure =
      vapourPressure(*findSolvent(point.name), Temperature::fromKelvin(point.kelvin));
  REQUIRE(pressure);
  CHECK(pressure->withinValidity);
  CHECK(pressure->value.pascals() / 1e3 == Approx(point.kPa).epsilon(0.02));
}

TEST_CASE("outside every set's range a vapour pressure says so", "[chem]") {
  const auto pressure =
      vapourPressure(*findSolvent("dichloromethane"), Temperature::fromCelsius(200));
  REQUIRE(pressure);
  CHECK(!pressure->withinValidity);
}

TEST_CASE("densities are carried between 20 and 25 degrees and flagged beyond 15 to 30",
          "[chem][published]") {
  // Water, CRC Handbook (from memory): 0.998207 g/mL at 20 °C, 0.997047 at 25 °C.
  const auto at20 = densityAt(*findSolvent("water"), Temperature::fromCelsius(20));
  const auto between = densityAt(*findSolvent("water"), Temperature::fromCelsius(22.5));
  REQUIRE(at20);
  CHECK(at20->value.gramsPerMillilitre() == Approx(0.998207).epsilon(5e-7));
  CHECK(between->value.gramsPerMillilitre() == Approx(0.997627).epsilon(1e-5));
  CHECK(at20->withinValidity);
  CHECK(!densityAt(*findSolvent("water"), Temperature::fromCelsius(60))->withinValidity);
}
