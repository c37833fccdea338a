// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/plan_reader.h"

#include <catch2/catch.hpp>

#include "charge/plan_fixture.h"

using namespace vialkeeper;
using namespace vialkeeper::charge;
using tests::readGoodPlan;

TEST_CASE("the head, vial, seal, irradiation and instruments of a plan are read", "[plan]") {
  const Plan plan = readGoodPlan(tests::samplePlanText());
  CHECK(plan.title == "Indoline dehydrogenation, acid additive 3");
  CHECK(plan.series == "acid additives");
  CHECK(plan.date == "2026-03-04");
  CHECK(plan.chemist == "A. N. Other");
  CHECK(plan.limiting == "amine");
  REQUIRE(plan.vial);
  CHECK(plan.vial->name == "10 mL crimp vial");
  CHECK(plan.vial->volume.millilitres() == Approx(11.6));
  CHECK(plan.vial->volumeUncertainty.millilitres() == Approx(0.1));
  CHECK(plan.vial->displaced.millilitres() == Approx(0.15));
  CHECK(plan.vial->ratedGauge->bar() == Approx(2.0));
  CHECK(plan.vial->derating == 0.5);
  REQUIRE(plan.seal);
  CHECK(plan.seal->atmosphere ==
        std::vector<std::pair<std::string, double>>{{"N2", 0.9}, {"O2", 0.1}});
  CHECK(plan.seal->temperature.celsius() == Approx(21.0));
  CHECK(plan.seal->pressure.bar() == Approx(1.013));
  CHECK(plan.seal->saturated);
  CHECK(plan.seal->ambient.pascals() == Approx(101325.0));
  CHECK(plan.irradiation.lamp == "LED 440");
  CHECK(plan.irradiation.wavelength->nanometres() == Approx(440.0));
  CHECK(plan.irradiation.temperature->celsius() == Approx(35.0));
  CHECK(plan.irradiation.duration->hours() == Approx(20.0));
  CHECK(plan.liquid.total->millilitres() == Approx(2.0));
  CHECK(plan.instruments.pressure.bar() == Approx(0.005));
  CHECK(plan.instruments.pressureShared.bar() == Approx(0.002));
  CHECK(plan.instruments.temperature_K == 0.5);
  REQUIRE(plan.products.size() == 1);
  CHECK(plan.products[0].key == "imine");
  CHECK(plan.products[0].identity.formula == "C8H7N");
  REQUIRE(plan.gases.size() == 1);
  CHECK(plan.gases[0].species == "H2");
}

TEST_CASE("components are read with identity, basis, supply and device", "[plan]") {
  const Plan plan = readGoodPlan(tests::samplePlanText());
  REQUIRE(plan.components.size() == 5);
  const ComponentPlan& amine = *plan.find("amine");
  CHECK(amine.role == Role::kSubstrate);
  CHECK(amine.identity.cas == "496-15-1");
  CHECK(amine.amount.basis == Basis::kAmount);
  CHECK(amine.amount.value == 0.2 / 1e3);
  CHECK(amine.amount.asWritten == "0.200 mmol");
  const auto& liquid = std::get<LiquidSupply>(amine.supply);
  CHECK(liquid.density->gramsPerMillilitre() == Approx(1.063));
  CHECK(liquid.assay == 0.99);
  CHECK(amine.device->name == "balance-0.01mg");
  CHECK(amine.hazards == std::vector<std::string>{"H302", "H315"});
  const auto& stock = std::get<StockSupply>(plan.find("pc")->supply);
  CHECK(stock.concentration->millimolPerLitre() == Approx(4.0));
  CHECK(plan.solventOf(stock) == plan.indexOf("mecn"));
  const ComponentPlan& nickel = *plan.find("nickel");
  CHECK(std::get<SolidSupply>(nickel.supply).assay == 0.97);
  CHECK(nickel.device->balance()->repeatability.milligrams() == Approx(0.02));
  CHECK(nickel.tolerancePercent == 3.0);
  CHECK(plan.find("mecn")->amount.basis == Basis::kShare);
  CHECK(std::holds_alternative<LiquidSupply>(plan.find("water")->supply));
}

TEST_CASE("what a plan leaves out has the defaults of the contract", "[plan]") {
  const Plan plan = readGoodPlan(R"(format = "vialkeeper-plan/1"
[reaction]
limiting = "a"
products = [ { key = "p" } ]
gases = [ { species = "CO2" } ]
[vial]
volume = "10 mL"
[seal]
atmosphere = "air"
temperature = "21 degC"
pressure = "1 bar"
[liquid]
limiting_concentration = "0.1 mol/L"
[[component]]
key = "a"
role = "substrate"
name = "A"
formula = "C8H9N"
mass = "10 mg"
[[component]]
key = "b"
role = "partner"
name = "B"
formula = "CH4"
equiv = 1
[[component]]
key = "c"
role = "additive"
name = "C"
formula = "CH4"
equiv = 1
)");
  CHECK(plan.vial->volumeUncertainty.millilitres() == Approx(0.1));
  CHECK(plan.vial->displaced.si() == 0.0);
  CHECK(plan.vial->derating == 0.5);
  CHECK_FALSE(plan.vial->ratedGauge);
  CHECK(plan.seal->saturated);
  CHECK(plan.seal->ambient.pascals() == 101325.0);
  CHECK(plan.seal->atmosphere == std::vector<std::pair<std::string, double>>{
                                     {"N2", 0.7808}, {"O2", 0.2095}, {"Ar", 0.0097}});
  CHECK(plan.instruments.pressure.bar() == Approx(0.005));
  CHECK(plan.instruments.pressureShared.si() == 0.0);
  CHECK(plan.instruments.temperature_K == 0.5);
  CHECK(plan.products[0].perLimiting == 1.0);
  CHECK(plan.products[0].name == "p");
  CHECK(plan.gases[0].perLimiting == 1.0);
  CHECK(plan.find("a")->perLimiting == 0.0);
  CHECK(plan.find("b")->perLimiting == 1.0);
  CHECK(plan.find("c")->perLimiting == 0.0);
  CHECK(std::get<SolidSupply>(plan.find("a")->supply).assay == 1.0);
  CHECK_FALSE(plan.find("a")->supplyGiven);
  CHECK_FALSE(plan.find("a")->device);
  CHECK(plan.title.empty());
}

TEST_CASE("every role is read by its word and written back as it", "[plan]") {
  for (const char* role :
       {"substrate", "partner", "photocatalyst", "cocatalyst", "additive", "acid", "base",
        "oxidant", "reductant", "quencher", "standard", "product", "solvent", "gas", "other"}) {
    INFO(role);
    const std::string supply =
        std::string(role) == "gas"
            ? "\nsupply={kind=\"gas\", pressure=\"1 bar\", temperature=\"20 degC\"}"
            : "";
    const Plan plan = readGoodPlan(tests::planText(
        "total=\"2 mL\"",
        {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nformula=\"CH4\"\namount=\"1 mmol\"",
         std::string("key=\"b\"\nrole=\"") + role +
             "\"\nname=\"methanol\"\nformula=\"CH4O\"\nequiv=1" + supply}));
    CHECK(toText(plan.find("b")->role) == role);
  }
}

TEST_CASE("every supply is read with all of its fields", "[plan]") {
  const auto supplyOf = [](const std::string& supply, const std::string& role = "other") {
    return readGoodPlan(
               tests::planText(
                   "total=\"2 mL\"",
                   {"key=\"a\"\nrole=\"" + role +
                    "\"\nname=\"a\"\nformula=\"CH4\"\namount=\"1 mmol\"\nsupply=" + supply}))
        .find("a")
        ->supply;
  };
  const auto solid = std::get<SolidSupply>(
      supplyOf(R"({kind="solid", assay=0.5, u_assay=0.01, density="2 g/mL"})"));
  CHECK(solid.assay == 0.5);
  CHECK(solid.assayUncertainty == 0.01);
  CHECK(solid.density->gramsPerMillilitre() == Approx(2.0));
  const auto liquid = std::get<LiquidSupply>(supplyOf(
      R"({kind="liquid", assay=1, u_assay=0.002, density="0.9 g/mL", u_density="0.001 g/mL", density_temperature="25 degC"})"));
  CHECK(liquid.assayUncertainty == 0.002);
  CHECK(liquid.densityUncertainty->gramsPerMillilitre() == Approx(0.001));
  CHECK(liquid.densityTemperature->celsius() == Approx(25.0));
  const auto stock = std::get<StockSupply>(supplyOf(
      R"({kind="stock", concentration="1 M", u_concentration="0.01 M", density="1.1 g/mL", solvent="water"})"));
  CHECK(stock.concentrationUncertainty->molPerLitre() == Approx(0.01));
  CHECK(stock.solvent == "water");
  const auto byMass = std::get<StockSupply>(
      supplyOf(R"({kind="stock", mass_fraction=0.1, density="1.1 g/mL", solvent="water"})"));
  CHECK(byMass.massFraction == 0.1);
  CHECK_FALSE(byMass.concentration);
  const auto gas = std::get<GasSupply>(
      supplyOf(R"({kind="gas", pressure="2 bar", temperature="300 K"})", "gas"));
  CHECK(gas.pressure.bar() == Approx(2.0));
  CHECK(gas.temperature.kelvin() == 300.0);
}

TEST_CASE("measured vapour pressures and Ostwald coefficients are read", "[plan]") {
  const Plan plan = readGoodPlan(tests::planText(
      "total=\"2 mL\"\nvapour_pressure=[{temperature=\"21 degC\", pressure=\"9.9 kPa\"}, "
      "{temperature=\"35 degC\", pressure=\"18.2 kPa\"}]\n"
      "ostwald={H2=0.08, N2=0.0}",
      {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nformula=\"CH4\"\namount=\"1 mmol\""}));
  REQUIRE(plan.liquid.vapourPressure.size() == 2);
  CHECK(plan.liquid.vapourPressure[1].pressure.pascals() == Approx(18200.0));
  CHECK(plan.liquid.ostwaldGiven);
  CHECK(plan.liquid.ostwald ==
        std::vector<std::pair<std::string, double>>{{"H2", 0.08}, {"N2", 0.0}});
}

TEST_CASE("an order of addition and a pipette of one's own are read", "[plan]") {
  const Plan plan = readGoodPlan(
      "addition_order = [\"b\", \"a\"]\n" +
      tests::planText(
          "total=\"2 mL\"",
          {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nformula=\"CH4\"\namount=\"1 mmol\"",
           "key=\"b\"\nrole=\"solvent\"\nname=\"water\"\nshare=1\ndevice={kind=\"pipette\", "
           "name=\"P300\", "
           "nominal=\"300 uL\", systematic=\"1.8 uL\", random=\"0.6 uL\"}"}));
  CHECK(plan.additionOrder == std::vector<std::string>{"b", "a"});
  const Pipette* pipette = plan.find("b")->device->pipette();
  REQUIRE(pipette != nullptr);
  CHECK(plan.find("b")->device->name == "P300");
  CHECK(pipette->nominal.microlitres() == Approx(300.0));
  CHECK(pipette->smallest.microlitres() == Approx(30.0));
  CHECK(pipette->systematicLimit.microlitres() == Approx(1.8));
}
