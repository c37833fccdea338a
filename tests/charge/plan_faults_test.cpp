// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include <algorithm>

#include "charge/plan_fixture.h"
#include "charge/plan_reader.h"

using namespace vialkeeper;
using charge::readPlan;

namespace {

/// One change to the sample plan, and the one fault that it must draw on the line where it was
/// made.
struct Change {
  const char* from;
  const char* to;
  const char* field;
  const char* what;  ///< part of it
  int below = 0;     ///< the fault's line counted from where `from` begins, where it is another
};

void checkFault(const Change& change) {
  std::string text = tests::samplePlanText();
  const std::size_t place = text.find(change.from);
  INFO(change.from << " -> " << change.to);
  REQUIRE(place != std::string::npos);
  text.replace(place, std::string_view(change.from).size(), change.to);
  const auto line = 1 + std::ranges::count(text.substr(0, place), '\n') + change.below;
  const auto plan = readPlan(text, "plan.toml");
  REQUIRE_FALSE(plan);
  for (const std::string& told : tests::toLines(plan.error())) UNSCOPED_INFO(told);
  REQUIRE(plan.error().size() == 1);
  const text::Fault& fault = plan.error().front();
  CHECK(fault.file == "plan.toml");
  CHECK(fault.line == line);
  CHECK(fault.field == change.field);
  CHECK(fault.what.find(change.what) != std::string::npos);
  CHECK_FALSE(fault.mend.empty());
}

void checkFaults(std::initializer_list<Change> changes) {
  for (const Change& change : changes) checkFault(change);
}

}  // namespace

TEST_CASE("quantities of a plan that cannot be are faults with their places", "[plan]") {
  checkFaults(
      {{"\"11.6 mL\"", "\"11.6 bar\"", "vial.volume", "bar is a pressure, but a volume is wanted"},
       {"\"11.6 mL\"", "\"11.6\"", "vial.volume", "the unit is missing"},
       {"\"11.6 mL\"", "11.6", "vial.volume", "a bare number"},
       {"\"11.6 mL\"", "true", "vial.volume", "not a text"},
       {"\"11.6 mL\"", "\"-11.6 mL\"", "vial.volume", "negative"},
       {"\"11.6 mL\"", "\"0 mL\"", "vial.volume", "zero"},
       {"\"11.6 mL\"", "\"nan mL\"", "vial.volume", "no number"},
       {"\"11.6 mL\"", "\"inf mL\"", "vial.volume", "no number"},
       {"\"11.6 mL\"", "\"11,6 mL\"", "vial.volume", "a comma in a number (character 3)"},
       {"\"11.6 mL\"", "\"11.6 ml\"", "vial.volume", "unit 'ml' is not known here (character 6)"},
       {"\"11.6 mL\"", "11.6 mL", "volume", "a quantity without quotation marks"},
       {"\"0.200 mmol\"", "\"0.200 mg\"", "component.amine.amount",
        "mg is a mass, but an amount of substance is wanted"},
       {"\"21 degC\"", "\"-300 degC\"", "seal.temperature", "absolute zero"},
       {"\"0.5 K\"", "\"0.5 degC\"", "instruments.u_temperature", "in K"},
       {"\"4.0 mM\"", "\"0 mM\"", "component.pc.supply.concentration", "zero"},
       {"\"20 h\"", "\"-1 h\"", "irradiation.duration", "negative"},
       {"\"0.01 mg\", rep", "\"0.01 mL\", rep", "component.nickel.device.readability",
        "is a volume"}});
}

TEST_CASE("bare numbers of a plan outside their range are faults with their places", "[plan]") {
  checkFaults(
      {{"derating = 0.5", "derating = 0", "vial.derating", "0 lies outside"},
       {"derating = 0.5", "derating = 1.01", "vial.derating", "1.01 lies outside"},
       {"derating = 0.5", "derating = \"0.5\"", "vial.derating", "not a bare number"},
       {"assay = 0.97", "assay = 0", "component.nickel.supply.assay", "outside"},
       {"assay = 0.97", "assay = 97", "component.nickel.supply.assay", "outside"},
       {"mol_percent = 5", "mol_percent = nan", "component.nickel.mol_percent", "nan lies outside"},
       {"mol_percent = 5", "mol_percent = inf", "component.nickel.mol_percent", "inf lies outside"},
       {"mol_percent = 5", "mol_percent = -inf", "component.nickel.mol_percent", "outside"},
       {"mol_percent = 5", "mol_percent = -5", "component.nickel.mol_percent", "outside"},
       {"mol_percent = 5", "mol_percent = \"5 mol%\"", "component.nickel.mol_percent",
        "not a bare number"},
       {"share = 9", "share = 0", "component.mecn.share", "outside"},
       {"tolerance_percent = 3", "tolerance_percent = 0", "component.nickel.tolerance_percent",
        "outside"},
       {"per_limiting = 1.0 } ]\ng", "per_limiting = 0 } ]\ng", "reaction.products[1].per_limiting",
        "outside"},
       {"saturated = true", "saturated = \"yes\"", "seal.saturated", "neither true nor false"}});
}

TEST_CASE("unknown fields and sections draw the nearest known name", "[plan]") {
  checkFaults(
      {{"derating =", "deratting =", "vial.deratting", "this field is not known here"},
       {"lamp =", "lampe =", "irradiation.lampe", "this field is not known here"},
       {"[irradiation]", "[iradiation]", "iradiation", "this section is not known here"},
       {"cas =", "CAS =", "component.amine.CAS", "this field is not known here"},
       {"solvent = \"mecn\"", "solvent = \"mecn\", colour = \"red\"", "component.pc.supply.colour",
        "this field is not known here"},
       {"O2 = 0.1", "O2 = 0.1, Xe = 0.0", "seal.atmosphere.Xe", "this field is not known here"}});
  const auto plan = readPlan("titel = \"x\"\n" + tests::samplePlanText(), "p");
  REQUIRE_FALSE(plan);
  CHECK(plan.error()[0].mend == "did you mean title?");
}

TEST_CASE("a format that is missing, another's or newer is a fault", "[plan]") {
  checkFaults({{"vialkeeper-plan/1", "vialkeeper-plan/2", "format", "another version"},
               {"vialkeeper-plan/1", "vialkeeper-actinometer/1", "format", "is no plan format"},
               {"\"vialkeeper-plan/1\"", "1", "format", "not a text"}});
  std::string text = tests::samplePlanText();
  text.erase(0, text.find('\n') + 1);
  const auto plan = readPlan(text, "p");
  REQUIRE_FALSE(plan);
  REQUIRE(plan.error().size() == 1);
  CHECK(plan.error()[0].field == "format");
  CHECK(plan.error()[0].what == "this is missing");
}

TEST_CASE("a limiting component that is missing, relative or circular is a fault", "[plan]") {
  checkFaults(
      {{"limiting = \"amine\"", "limiting = \"amin\"", "reaction.limiting",
        "no component has the key 'amin'"},
       {"limiting = \"amine\"", "limiting = \"imine\"", "reaction.limiting",
        "no component has the key 'imine'"},
       {"limiting = \"amine\"", "", "reaction.limiting", "this is missing", -1},
       {"amount = \"0.200 mmol\"", "equiv = 1", "component.amine.equiv", "measured against itself"},
       {"amount = \"0.200 mmol\"", "mol_percent = 100", "component.amine.mol_percent",
        "measured against itself"}});
  const auto circular = tests::faultsOfPlan(tests::planText(
      "limiting_concentration=\"0.1 M\"",
      {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nformula=\"CH4\"\nconcentration=\"0.1 M\""}));
  REQUIRE(circular.size() == 1);
  CHECK(circular[0].field == "component.a.concentration");
  CHECK(circular[0].what.find("by each other") != std::string::npos);
}

TEST_CASE("an amount must be fixed exactly once", "[plan]") {
  checkFaults({{"share = 9", "share = 9\nvolume = \"1 mL\"", "component.mecn.share",
                "fixed twice, by volume and share"},
               {"formula = \"C4H10Br2NiO2\"", "formula = \"C4H10Br2NiO2\"\nmass = \"3 mg\"",
                "component.nickel.mol_percent", "fixed twice", 2}});
}

TEST_CASE("an amount that nothing fixes is a fault of its component", "[plan]") {
  std::string text = tests::samplePlanText();
  text.replace(text.find("share = 9\n"), 10, "");
  const auto plan = readPlan(text, "p");
  REQUIRE_FALSE(plan);
  REQUIRE(plan.error().size() == 1);
  CHECK(plan.error()[0].field == "component.mecn");
  CHECK(plan.error()[0].what == "nothing fixes the amount");
}

TEST_CASE("bases, supplies and devices that do not go together are faults", "[plan]") {
  checkFaults(
      {{"mol_percent = 5", "share = 5", "component.nickel.share", "for solvents only"},
       {"mol_percent = 5", "volume = \"5 uL\"", "component.nickel.volume", "a solid is weighed"},
       {"mol_percent = 1\n", "mass = \"1 mg\"\n", "component.pc.mass", "needs its density"},
       {"device = \"balance-0.01mg\"", "device = \"balance-0.01 mg\"", "component.amine.device",
        "no device is called"},
       {"device = { kind", "device = { kin", "component.nickel.device.kind", "this is missing"},
       {"solvent = \"mecn\"", "solvent = \"moon juice\"", "component.pc.supply",
        "is no solvent of this plan"},
       {"solvent = \"mecn\"", "solvent = \"amine\"", "component.pc.supply",
        "is no solvent of this plan"},
       {", solvent = \"mecn\"", "", "component.pc.supply.solvent", "this is missing"},
       {"concentration = \"4.0 mM\", ", "", "component.pc.supply", "strength is not given"},
       {"concentration = \"4.0 mM\", ", "mass_fraction = 0.1, ", "component.pc.supply.density",
        "this is missing"},
       {"kind = \"stock\"", "kind = \"slurry\"", "component.pc.supply.kind",
        "not one of the known words"},
       {"role = \"solvent\"\nname = \"water\"", "role = \"solvant\"\nname = \"water\"",
        "component.water.role", "not one of the known words"},
       {"name = \"water\"\nshare = 1", "name = \"water\"\nshare = 1\nsupply = { kind = \"solid\" }",
        "component.water.share", "neat liquid", 1}});
}

TEST_CASE("a CAS number with a wrong check digit and a hazard code that is none are faults",
          "[plan]") {
  checkFaults(
      {{"496-15-1", "496-15-2", "component.amine.cas",
        "the check digit of this CAS number would be 1"},
       {"\"H302\"", "\"X302\"", "component.amine.hazards", "is no hazard statement code"},
       {"[\"H302\", \"H315\"]", "\"H302\"", "component.amine.hazards", "not a list of texts"}});
}

TEST_CASE("atmospheres must be known and their fractions sum to one", "[plan]") {
  checkFaults({{"N2 = 0.9, O2", "N2 = 0.8, O2", "seal.atmosphere", "the fractions sum to 0.9"},
               {"N2 = 0.9, O2", "N2 = 0.91, O2", "seal.atmosphere", "sum to 1.01"},
               {"{ N2 = 0.9, O2 = 0.1 }", "\"argon\"", "seal.atmosphere", "is no atmosphere"},
               {"{ N2 = 0.9, O2 = 0.1 }", "{}", "seal.atmosphere", "sum to 0"},
               {"species = \"H2\"", "species = \"h2\"", "reaction.gases[1].species",
                "no gas of the table"}});
}

TEST_CASE("keys must be plain, given and each its own", "[plan]") {
  checkFaults({{"key = \"mecn\"", "key = \"me cn\"", "component[4].key", "cannot be a key"},
               {"key = \"water\"", "key = \"mecn\"", "component[5].key",
                "the key 'mecn' is taken by the entry of line 72"},
               {"key = \"water\"", "key = \"imine\"", "component[5].key",
                "the key 'imine' is taken by the entry of line 9"},
               {"key = \"water\"", "key = \"\"", "component[5].key", "the text is empty"}});
}

TEST_CASE("the volume of the liquid is fixed exactly once", "[plan]") {
  checkFault({"total = \"2.0 mL\"", "", "liquid", "nothing fixes the volume", -1});
  std::string text = tests::samplePlanText();
  text.replace(text.find("total = \"2.0 mL\""), 16,
               "total = \"2.0 mL\"\nlimiting_concentration = \"0.1 M\"");
  const auto plan = readPlan(text, "p");
  REQUIRE_FALSE(plan);
  REQUIRE(plan.error().size() == 1);
  CHECK(plan.error()[0].field == "liquid.limiting_concentration");
}

TEST_CASE("a day that does not exist and an order of unknown keys are faults", "[plan]") {
  checkFaults({{"2026-03-04", "2026-02-30", "date", "no such day"},
               {"chemist =", "addition_order = [\"amine\", \"salt\"]\nchemist =", "addition_order",
                "no component has the key 'salt'"},
               {"chemist =", "addition_order = [\"amine\", \"amine\"]\nchemist =", "addition_order",
                "listed twice"},
               {"A. N. Other", "A.\\u202E N. Other", "chemist", "invisible control characters"}});
}
