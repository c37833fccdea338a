// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "charge/plan_fixture.h"
#include "charge/weighing.h"

using namespace vialkeeper;
using charge::readWeighings;
using tests::weighed;

namespace {

charge::Plan plan() { return tests::readGoodPlan(tests::samplePlanText()); }

std::vector<std::string> faultsOf(const std::string& csv) {
  const auto weighings = readWeighings(csv, "w.csv", plan());
  REQUIRE_FALSE(weighings);
  return tests::toLines(weighings.error());
}

}  // namespace

TEST_CASE("a weighed file is read in either order of its columns", "[charge]") {
  for (const char* csv : {"key,actual\namine,23.9 mg\npc,\"500 µL\"\n",
                          "actual,key\r\n23.9mg,amine\r\n500 uL,pc\r\n"}) {
    const auto weighings = readWeighings(csv, "w.csv", plan());
    REQUIRE(weighings);
    REQUIRE(weighings->size() == 2);
    CHECK((*weighings)[0].key == "amine");
    CHECK(std::get<units::Mass>((*weighings)[0].actual).milligrams() ==
          Approx(23.9).epsilon(1e-15));
    CHECK((*weighings)[0].line == 2);
    CHECK(std::get<units::Volume>((*weighings)[1].actual).microlitres() ==
          Approx(500.0).epsilon(1e-15));
    CHECK((*weighings)[1].line == 3);
  }
}

TEST_CASE("all faults of a weighed file are told at once with their lines", "[charge]") {
  const auto lines = faultsOf(
      "key,actual\namine,23.9\nnickle,3 mg\npc,5 mg\nnickel,3 uL\nmecn,1 bar\namine,24 "
      "mg\nwater,-1 mL\nwater,\"1,5 mL\"\n");
  REQUIRE(lines.size() == 7);
  CHECK(lines[0].starts_with("w.csv:2:amine: '23.9': the unit is missing"));
  CHECK(lines[1].starts_with(
      "w.csv:3:key: the plan has no component 'nickle': did you mean nickel?"));
  CHECK(
      lines[2].starts_with("w.csv:4:pc: '5 mg': a stock without a density is recorded by volume"));
  CHECK(lines[3].starts_with("w.csv:5:nickel: '3 uL': a solid is recorded by mass"));
  CHECK(lines[4].starts_with(
      "w.csv:6:mecn: '1 bar': bar is a pressure, but a mass or a volume is wanted"));
  CHECK(lines[5].starts_with("w.csv:8:water: '-1 mL': a negative value"));
  CHECK(lines[6].starts_with("w.csv:9:water: '1,5 mL': a comma in a number"));
}

TEST_CASE("a component recorded twice is told with the earlier line", "[charge]") {
  const auto lines = faultsOf("key,actual\namine,23.9 mg\nnickel,3 mg\namine,24 mg\n");
  REQUIRE(lines.size() == 1);
  CHECK(lines[0].starts_with("w.csv:4:amine: this component was recorded on line 2 already"));
}

TEST_CASE("unknown, missing and repeated columns of a weighed file are faults", "[charge]") {
  CHECK(faultsOf("key,actual,who\namine,23.9 mg,me\n")[0].starts_with(
      "w.csv:1:who: this column is not known here"));
  CHECK(faultsOf("key\namine\n")[0].starts_with("w.csv:1:actual: the column is missing"));
  CHECK(
      faultsOf("key,key,actual\na,b,c\n")[0].starts_with("w.csv:1:key: this column stands twice"));
  CHECK(faultsOf("key,actual\namine\n")[0].starts_with("w.csv:2: 1 cell where the header has 2"));
}

TEST_CASE("a gas is recorded by volume, a stock with density by mass as well", "[charge]") {
  const auto p = tests::readGoodPlan(tests::planText(
      "total=\"20 mL\"",
      {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nmolar_mass=\"100 g/mol\"\namount=\"1 mmol\"",
       "key=\"g\"\nrole=\"gas\"\nname=\"H2\"\nformula=\"H2\"\nequiv=1\nsupply={kind=\"gas\", "
       "pressure=\"1 bar\", temperature=\"300 K\"}",
       "key=\"s\"\nrole=\"other\"\nname=\"s\"\nequiv=1\nsupply={kind=\"stock\", "
       "concentration=\"0.1 M\", density=\"0.8 g/mL\", solvent=\"water\"}"}));
  const auto gas = readWeighings("key,actual\ng,2 mg\n", "w.csv", p);
  REQUIRE_FALSE(gas);
  CHECK(gas.error()[0].what.find("a gas is recorded by volume") != std::string::npos);
  // 8.8 g of stock at 0.8 g/mL are 11 mL, 1.1 mmol; the target is 10 mL.
  const auto charge = weighed(
      p, {{"s", units::Mass::fromGrams(8.8)}, {"g", units::Volume::fromMillilitres(24.94339)}});
  const auto& stock = *tests::at(charge, "s").charged;
  CHECK(stock.amount_mol->value() * 1e3 == Approx(1.1).epsilon(1e-12));
  CHECK(*stock.offTargetPercent == Approx(10.0).epsilon(1e-9));
  // n R T/p at 300 K and 1 bar: 24.94339 mL hold 1 mmol.
  const auto& hydrogen = *tests::at(charge, "g").charged;
  CHECK(hydrogen.amount_mol->value() * 1e3 == Approx(1.0).epsilon(1e-6));
  CHECK_FALSE(hydrogen.concentration_mol_m3);
}
