// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include <cmath>

#include "charge/plan_fixture.h"
#include "support/reference_data.h"

using namespace vialkeeper;
using tests::at;
using tests::chargeOf;
using tests::planText;

namespace {

/// A textbook's answer as printed, with half a unit of its last digit.
struct Printed {
  double value;
  double half;
};

/// The first number of the answer to these inputs in tests/reference/worked-examples.csv (OpenStax
/// Chemistry 2e).
Printed printed(const std::string& inputs) {
  static const tests::ReferenceData table("worked-examples.csv");
  for (const auto& row : table.rows()) {
    if (table.cell(row, "inputs") != inputs) continue;
    std::size_t length = 0;
    const std::string& answer = table.cell(row, "published_answer");
    const double value = std::stod(answer, &length);
    const std::string digits = answer.substr(0, length);
    const std::size_t e = digits.find('e');
    const std::size_t point = digits.find('.');
    const auto places =
        point == std::string::npos ? 0 : static_cast<int>(std::min(e, digits.size()) - point) - 1;
    const int exponent = e == std::string::npos ? 0 : std::stoi(digits.substr(e + 1));
    return {value, 0.5 * std::pow(10.0, exponent - places)};
  }
  FAIL("no such worked example: " << inputs);
  return {};
}

void checkPrinted(double value, const std::string& inputs) {
  const Printed answer = printed(inputs);
  INFO(inputs);
  CHECK(std::abs(value - answer.value) <= 1.0001 * answer.half);
}

}  // namespace

TEST_CASE("dissolving a weighed solid gives the molarity that the textbook prints",
          "[charge][published]") {
  const auto charge = chargeOf(planText("total = \"0.500 L\"", {R"(key="a"
role="acid"
name="acetic acid"
formula="CH3CO2H"
mass="25.2 g")",
                                                                R"(key="w"
role="solvent"
name="water"
share=1)"}));
  checkPrinted(at(charge, "a").concentration->molPerLitre(), "25.2 g CH3CO2H (60.052) in 0.500 L");
}

TEST_CASE("diluting a stock gives the molarity and the volume that the textbook prints",
          "[charge][published]") {
  const std::string water = "key=\"w\"\nrole=\"solvent\"\nname=\"water\"\nshare=1";
  const std::string stock = R"(key="a"
role="substrate"
name="copper nitrate"
supply={kind="stock", solvent="w", concentration=)";
  const auto diluted =
      chargeOf(planText("total=\"1.80 L\"", {stock + "\"5.00 M\"}\nvolume=\"0.850 L\"", water}));
  checkPrinted(at(diluted, "a").concentration->molPerLitre(), "0.850 L of 5.00 M to 1.80 L");
  CHECK(at(diluted, "w").targetVolume->litres() == Approx(0.95).epsilon(1e-12));
  const auto needed = chargeOf(
      planText("total=\"5.00 L\"", {stock + "\"1.59 M\"}\nconcentration=\"0.100 M\"", water}));
  checkPrinted(at(needed, "a").targetVolume->litres(), "volume of 1.59 M for 5.00 L of 0.100 M");
}

TEST_CASE("mass to mass by stoichiometric numbers gives what the textbook prints",
          "[charge][published]") {
  struct Example {
    const char* limiting;
    const char* mass;
    const char* other;
    double equiv;
    const char* inputs;
  };
  for (const auto& e : {Example{"Mg(OH)2", "16 g", "NaOH", 2.0, "16 g Mg(OH)2 needs NaOH (1:2)"},
                        Example{"Ga", "29.0 g", "Ga2O3", 0.5, "29.0 g Ga -> Ga2O3"},
                        Example{"Fe2O3", "25.13 g", "CO", 3.0, "25.13 g Fe2O3 needs CO (1:3)"},
                        Example{"C8H18", "702 g", "O2", 12.5, "702 g C8H18 needs O2 (2:25)"}}) {
    const auto charge = chargeOf(planText(
        "total=\"10 L\"", {std::string("key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nformula=\"") +
                               e.limiting + "\"\nmass=\"" + e.mass + "\"",
                           std::string("key=\"b\"\nrole=\"partner\"\nname=\"b\"\nformula=\"") +
                               e.other + "\"\nequiv=" + std::to_string(e.equiv)}));
    checkPrinted(at(charge, "b").targetMass->grams(), e.inputs);
  }
}

TEST_CASE("gallium and acid give the hydrogen that the textbook prints", "[charge][published]") {
  // 2 Ga give 3 H2. Printed 0.191 mol and 4.94 L; the volume is 4.946 with the book's own rounded
  // amount kept whole.
  const auto charge = chargeOf(
      planText("total=\"1 L\"",
               {"key=\"a\"\nrole=\"substrate\"\nname=\"gallium\"\nformula=\"Ga\"\nmass=\"8.88 g\"",
                R"(key="h"
role="gas"
name="hydrogen"
formula="H2"
equiv=1.5
supply={kind="gas", pressure="723 mmHg", temperature="27 degC"})"}));
  checkPrinted(at(charge, "h").amount_mol->value(), "8.88 g Ga + HCl -> H2 (2:3), 27 C, 723 torr");
  CHECK(at(charge, "h").targetVolume->litres() == Approx(4.94).margin(0.01));
  CHECK_FALSE(at(charge, "h").concentration);
  CHECK_FALSE(at(charge, "h").targetMass);
}

TEST_CASE("silicon and nitrogen meet in the amounts that the textbook prints",
          "[charge][published]") {
  // OpenStax m68714: 2.00 g Si are 0.0712 mol, 1.50 g N2 0.0535 mol, and make 0.0237 mol Si3N4.
  const auto charge = chargeOf(planText(
      "total=\"1 L\"",
      {"key=\"a\"\nrole=\"substrate\"\nname=\"Si\"\nformula=\"Si\"\nmass=\"2.00 g\"",
       "key=\"n\"\nrole=\"partner\"\nname=\"N2\"\nformula=\"N2\"\nmass=\"1.50 g\"",
       "key=\"p\"\nrole=\"product\"\nname=\"p\"\nformula=\"Si3N4\"\nequiv=0.3333333333333"}));
  CHECK(charge.limitingAmount.moles() == Approx(0.0712).margin(5e-5));
  CHECK(at(charge, "n").amount_mol->value() == Approx(0.0535).margin(5e-5));
  CHECK(at(charge, "p").amount_mol->value() == Approx(0.0237).margin(5e-5));
}
