// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/substances.h"

#include <catch2/catch.hpp>

#include <cmath>

#include "charge/plan_fixture.h"

using namespace vialkeeper;

namespace {

charge::Plan planOf(const std::string& identity) {
  return tests::readGoodPlan(tests::planText(
      "total=\"2 mL\"",
      {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\namount=\"1 mmol\"\n" + identity}));
}

/// A reader that knows two molecules.
std::expected<chem::Structure, chem::StructureFault> twoMolecules(std::string_view smiles) {
  chem::Structure structure{};
  structure.canonicalSmiles = smiles;
  if (smiles == "CCO") {
    structure.formula = "C2H6O";
  } else if (smiles == "O") {
    structure.formula = "H2O";
  } else {
    return std::unexpected(
        chem::StructureFault{.what = "an unclosed ring (character 2)", .mend = "close it"});
  }
  return structure;
}

text::Faults faultsOf(const std::string& identity) {
  const auto substances = charge::resolveSubstances(planOf(identity), twoMolecules);
  REQUIRE_FALSE(substances);
  return substances.error();
}

}  // namespace

TEST_CASE("formula, structure and molar mass that agree give one substance", "[charge]") {
  const auto substances = charge::resolveSubstances(
      planOf("smiles=\"CCO\"\nformula=\"CH3CH2OH\"\nmolar_mass=\"46.07 g/mol\""), twoMolecules);
  REQUIRE(substances);
  const auto& a = substances->components[0];
  CHECK(a.formula == "C2H6O");
  CHECK(a.canonicalSmiles == "CCO");
  CHECK(a.molarMass->value.gramsPerMole() == Approx(46.069).epsilon(1e-7));
}

TEST_CASE("a structure and a formula that disagree are a fault that shows both", "[charge]") {
  const auto faults = faultsOf("smiles=\"CCO\"\nformula=\"CH3OH\"");
  REQUIRE(faults.size() == 1);
  CHECK(faults[0].field == "component.a.smiles");
  CHECK(faults[0].what == "the structure is C2H6O but the formula says CH4O");
}

TEST_CASE("a molar mass agrees within its last digit and the spread of old tables, or is a fault",
          "[charge]") {
  // Ethanol 46.069: 46.1 and 46 are roundings of it, 46.07(4) the old value; 46.2 and 47.07 are
  // another thing.
  for (const char* given : {"46.069", "46.07", "46.1", "46", "46.0684"}) {
    INFO(given);
    CHECK(charge::resolveSubstances(
        planOf("formula=\"C2H6O\"\nmolar_mass=\"" + std::string(given) + " g/mol\""),
        twoMolecules));
  }
  for (const char* given : {"46.08", "46.2", "47.07", "46.05"}) {
    const auto faults =
        faultsOf("formula=\"C2H6O\"\nmolar_mass=\"" + std::string(given) + " g/mol\"");
    REQUIRE(faults.size() == 1);
    CHECK(faults[0].field == "component.a.molar_mass");
    CHECK(faults[0].what.find("46.069 g/mol but") != std::string::npos);
  }
}

TEST_CASE("a molar mass alone is as exact as its last digit", "[charge]") {
  const auto u = [](const char* given) {
    return charge::resolveSubstances(planOf("molar_mass=\"" + std::string(given) + " g/mol\""),
                                     twoMolecules)
        ->components[0]
        .molarMass->standardUncertainty.gramsPerMole();
  };
  CHECK(u("119.17") == Approx(0.005 / std::sqrt(3.0)).epsilon(1e-12));
  CHECK(u("119.2") == Approx(0.05 / std::sqrt(3.0)).epsilon(1e-12));
  CHECK(u("119") == Approx(0.5 / std::sqrt(3.0)).epsilon(1e-12));
}

TEST_CASE("the unreadable descriptions of all substances are told together", "[charge]") {
  const auto plan = tests::readGoodPlan(tests::planText(
      "total=\"2 mL\"",
      {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\namount=\"1 mmol\"\nformula=\"C8Xh9\"",
       "key=\"b\"\nrole=\"other\"\nname=\"b\"\nequiv=1\nsmiles=\"C1CC\"",
       "key=\"c\"\nrole=\"other\"\nname=\"c\"\nequiv=1\nformula=\"Tc2O7\""}));
  const auto substances = charge::resolveSubstances(plan, twoMolecules);
  REQUIRE_FALSE(substances);
  REQUIRE(substances.error().size() == 3);
  CHECK(substances.error()[0].what == "'C8Xh9': 'Xh' is no element (character 3)");
  CHECK(substances.error()[1].what == "'C1CC': an unclosed ring (character 2)");
  CHECK(substances.error()[2].what == "Tc has no standard atomic weight");
  for (const auto& fault : substances.error()) CHECK(fault.line > 0);
}

TEST_CASE("a solvent is known by its name alone", "[charge]") {
  const auto plan = tests::readGoodPlan(tests::planText(
      "total=\"2 mL\"",
      {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\namount=\"1 mmol\"\nformula=\"CH4\"",
       "key=\"s\"\nrole=\"solvent\"\nname=\"MeCN\"\nshare=1"}));
  const auto substances = charge::resolveSubstances(plan, twoMolecules);
  REQUIRE(substances);
  CHECK(substances->components[1].formula == "C2H3N");
}
