// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "units/shown.h"

#include <catch2/catch.hpp>

#include <cmath>
#include <random>

#include "units/quantity_text.h"

using namespace vialkeeper;
using namespace vialkeeper::units;

TEST_CASE("numbers keep their significant digits through roundings that carry", "[units]") {
  CHECK(toSignificant(0.2, 3) == "0.200");
  CHECK(toSignificant(9.996, 3) == "10.0");
  CHECK(toSignificant(99.96, 3) == "100");
  CHECK(toSignificant(0.0009999, 3) == "0.00100");
  CHECK(toSignificant(1234.0, 3) == "1230");
  CHECK(toSignificant(-0.0456, 2) == "-0.046");
  CHECK(toSignificant(0.0, 3) == "0");
  CHECK(toSignificant(1e-5, 3) == "1.00e-05");
  CHECK(toSignificant(1e-4, 3) == "0.000100");
  CHECK(toSignificant(9999999.0, 7) == "9999999");
  CHECK(toSignificant(1e7, 3) == "1.00e+07");
}

TEST_CASE("quantities choose the unit that a bench balance or pipette shows", "[units]") {
  CHECK(shown(Mass::fromMilligrams(23.83)) == "23.8 mg");
  CHECK(shown(Mass::fromMilligrams(0.05)) == "50.0 µg");
  CHECK(shown(Mass::fromGrams(12.5)) == "12.5 g");
  CHECK(shown(Mass::fromMilligrams(0.0)) == "0 mg");
  CHECK(shown(Volume::fromMicrolitres(500)) == "500 µL");
  CHECK(shown(Volume::fromMillilitres(2.0)) == "2000 µL");
  CHECK(shown(Volume::fromMillilitres(11.6)) == "11.6 mL");
  CHECK(shown(Amount::fromMillimoles(0.2)) == "0.200 mmol");
  CHECK(shown(Amount::fromMillimoles(0.0002)) == "0.200 µmol");
  CHECK(shown(Concentration::fromMolPerLitre(0.5)) == "0.500 mol/L");
  CHECK(shown(Concentration::fromMolPerLitre(0.004)) == "4.00 mM");
  CHECK(shown(Pressure::fromKilopascals(101.325), 6) == "1.01325 bar");
}

TEST_CASE("temperatures are shown to a tenth, and never as minus zero", "[units]") {
  CHECK(shown(Temperature::fromCelsius(21)) == "21 °C");
  CHECK(shown(Temperature::fromCelsius(21.46)) == "21.5 °C");
  CHECK(shown(Temperature::fromCelsius(-0.01)) == "0 °C");
  CHECK(shown(Temperature::fromCelsius(-78.5)) == "-78.5 °C");
}

TEST_CASE("time spans are shown in hours and minutes, short ones in minutes and seconds",
          "[units]") {
  CHECK(shown(Duration::fromHours(20)) == "20 h");
  CHECK(shown(Duration::fromHours(1.5)) == "1 h 30 min");
  CHECK(shown(Duration::fromSeconds(90)) == "1 min 30 s");
  CHECK(shown(Duration::fromSeconds(300)) == "5 min");
  CHECK(shown(Duration::fromSeconds(3599.7)) == "1 h");
}

TEST_CASE("a time span of hours is shown to the nearest minute", "[units]") {
  CHECK(shown(Duration::fromSeconds(2 * 3600 - 5)) == "2 h");
  CHECK(shown(Duration::fromSeconds(3600 + 50)) == "1 h 1 min");
}

TEST_CASE("what is shown is read back within its last digit, 3000 times", "[units][identity]") {
  std::mt19937_64 random(3);
  std::uniform_real_distribution<double> decade(-3.5, 3.5);
  for (int round = 0; round < 3000; ++round) {
    const double number = std::pow(10.0, decade(random));
    const int digits = 3 + static_cast<int>(random() % 4);
    const double tolerance = 0.5001 * std::pow(10.0, 1 - digits);
    const auto mass = Mass::fromMilligrams(number);
    const auto volume = Volume::fromMicrolitres(number);
    const auto amount = Amount::fromMillimoles(number);
    const auto concentration = Concentration::fromMolPerLitre(number);
    REQUIRE(readQuantity<Mass>(shown(mass, digits), Dialect::kFile)->si() ==
            Approx(mass.si()).epsilon(tolerance));
    REQUIRE(readQuantity<Volume>(shown(volume, digits), Dialect::kFile)->si() ==
            Approx(volume.si()).epsilon(tolerance));
    REQUIRE(readQuantity<Amount>(shown(amount, digits), Dialect::kFile)->si() ==
            Approx(amount.si()).epsilon(tolerance));
    REQUIRE(readQuantity<Concentration>(shown(concentration, digits), Dialect::kFile)->si() ==
            Approx(concentration.si()).epsilon(tolerance));
  }
}
