// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "charge/plan_fixture.h"

using namespace vialkeeper;
using tests::at;
using tests::chargeOf;
using tests::faultsOfPlan;
using tests::planText;

namespace {

/// 1 mmol of a neat liquid of 100 g/mol and 1.0 g/mL: 100 uL.
const std::string kLimiting =
    "key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nmolar_mass=\"100 g/mol\"\namount=\"1 "
    "mmol\"\nsupply={kind=\"liquid\", density=\"1.0 g/mL\"}";
const std::string kAcetonitrile = "key=\"mecn\"\nrole=\"solvent\"\nname=\"acetonitrile\"\nshare=9";
const std::string kWater = "key=\"water\"\nrole=\"solvent\"\nname=\"water\"\nshare=1";

/// 1 mol% from a 50 mM stock: 0.01 mmol / 0.05 mol/L = 200 uL.
std::string stock(const std::string& solvent, const std::string& key = "b",
                  const std::string& concentration = "50 mM") {
  return "key=\"" + key + "\"\nrole=\"photocatalyst\"\nname=\"" + key +
         "\"\nmol_percent=1\nsupply={kind=\"stock\", concentration=\"" + concentration +
         "\", solvent=\"" + solvent + "\"}";
}

double added_uL(const charge::Charge& charge, std::string_view key) {
  return at(charge, key).targetVolume->microlitres();
}

}  // namespace

TEST_CASE("what a stock brings of a solvent counts towards its share", "[charge][identity]") {
  // 2000 - 100 = 1900 uL in 9:1 parts: 1710 and 190; the stock brings 200 of the 1710, 1510 are
  // added pure.
  const auto charge =
      chargeOf(planText("total=\"2.0 mL\"", {kLimiting, stock("mecn"), kAcetonitrile, kWater}));
  CHECK(added_uL(charge, "b") == Approx(200.0).epsilon(1e-12));
  CHECK(added_uL(charge, "mecn") == Approx(1510.0).epsilon(1e-12));
  CHECK(added_uL(charge, "water") == Approx(190.0).epsilon(1e-12));
}

TEST_CASE("a stock's solvent is known by key, name, abbreviation and CAS number", "[charge]") {
  const auto byKey =
      chargeOf(planText("total=\"2.0 mL\"", {kLimiting, stock("mecn"), kAcetonitrile, kWater}));
  for (const char* solvent :
       {"acetonitrile", "MeCN", "Acetonitrile", "75-05-8", "methyl cyanide"}) {
    INFO(solvent);
    const auto charge =
        chargeOf(planText("total=\"2.0 mL\"", {kLimiting, stock(solvent), kAcetonitrile, kWater}));
    CHECK(added_uL(charge, "mecn") == added_uL(byKey, "mecn"));
  }
}

TEST_CASE("two stocks in one solvent both count towards its share", "[charge]") {
  // A second stock of 25 mM: 400 uL. 1710 - 200 - 400 = 1110.
  const auto charge =
      chargeOf(planText("total=\"2.0 mL\"", {kLimiting, stock("mecn"), stock("mecn", "c", "25 mM"),
                                             kAcetonitrile, kWater}));
  CHECK(added_uL(charge, "mecn") == Approx(1110.0).epsilon(1e-12));
  CHECK(added_uL(charge, "water") == Approx(190.0).epsilon(1e-12));
}

TEST_CASE("a stock in a solvent without a share takes its room from all shares", "[charge]") {
  // 2000 - 100 - 200 = 1700 in 9:1 parts: 1530 and 170. Toluene is only in the solvent table,
  // methanol has a fixed volume.
  const auto table =
      chargeOf(planText("total=\"2.0 mL\"", {kLimiting, stock("toluene"), kAcetonitrile, kWater}));
  CHECK(added_uL(table, "mecn") == Approx(1530.0).epsilon(1e-12));
  CHECK(added_uL(table, "water") == Approx(170.0).epsilon(1e-12));
  // With 300 uL of methanol as well: 1400, so 1260 and 140; the methanol stays as written.
  const auto fixed =
      chargeOf(planText("total=\"2.0 mL\"",
                        {kLimiting, stock("meoh"), kAcetonitrile, kWater,
                         "key=\"meoh\"\nrole=\"solvent\"\nname=\"methanol\"\nvolume=\"300 uL\""}));
  CHECK(added_uL(fixed, "mecn") == Approx(1260.0).epsilon(1e-12));
  CHECK(added_uL(fixed, "water") == Approx(140.0).epsilon(1e-12));
  CHECK(added_uL(fixed, "meoh") == Approx(300.0).epsilon(1e-12));
}

TEST_CASE("a solid takes room in the liquid only where its density is given", "[charge]") {
  // 100 mg at 2.0 g/mL are 50 uL: 1900 - 50 = 1850, of which a tenth is water.
  const std::string solid =
      "key=\"s\"\nrole=\"base\"\nname=\"s\"\nmass=\"100 mg\"\nsupply={kind=\"solid\"";
  const auto with = chargeOf(planText(
      "total=\"2.0 mL\"", {kLimiting, solid + ", density=\"2.0 g/mL\"}", kAcetonitrile, kWater}));
  CHECK(added_uL(with, "water") == Approx(185.0).epsilon(1e-12));
  CHECK_FALSE(tests::hasNotice(with.notices, "solids-take-no-room"));
  const auto without =
      chargeOf(planText("total=\"2.0 mL\"", {kLimiting, solid + "}", kAcetonitrile, kWater}));
  CHECK(added_uL(without, "water") == Approx(190.0).epsilon(1e-12));
  CHECK(tests::hasNotice(without.notices, "solids-take-no-room"));
}

TEST_CASE("a gas takes no room in the liquid", "[charge]") {
  const auto charge = chargeOf(planText(
      "total=\"2.0 mL\"",
      {kLimiting, kAcetonitrile, kWater,
       "key=\"g\"\nrole=\"gas\"\nname=\"hydrogen\"\nvolume=\"5 mL\"\nsupply={kind=\"gas\", "
       "pressure=\"1 bar\", temperature=\"21 degC\"}"}));
  CHECK(added_uL(charge, "water") == Approx(190.0).epsilon(1e-12));
  CHECK_FALSE(at(charge, "g").liquidVolume);
}

TEST_CASE(
    "a stock that brings more than its solvent's share is a fault that names it and the excess",
    "[charge]") {
  // 0.01 mmol / 5 mM = 2000 uL against a share of 1710 uL: 290 uL too many.
  const auto faults = faultsOfPlan(
      planText("total=\"2.0 mL\"", {kLimiting, stock("mecn", "b", "5 mM"), kAcetonitrile, kWater}));
  REQUIRE(faults.size() == 1);
  CHECK(faults[0].field == "component.b.mol_percent");
  CHECK(faults[0].what ==
        "the stock b brings 290 µL more of acetonitrile than its share of 1710 µL");
  CHECK(faults[0].line == 18);
}

TEST_CASE("two stocks that exceed a share together are both named, the larger is pointed at",
          "[charge]") {
  // 1000 + 1250 = 2250 against 1710: 540 uL.
  const auto faults = faultsOfPlan(planText(
      "total=\"2.0 mL\"",
      {kLimiting, stock("mecn", "b", "10 mM"), stock("mecn", "c", "8 mM"), kAcetonitrile, kWater}));
  REQUIRE(faults.size() == 1);
  CHECK(faults[0].field == "component.c.mol_percent");
  CHECK(faults[0].what ==
        "the stock b, c brings 540 µL more of acetonitrile than its share of 1710 µL");
}

TEST_CASE("a stock that brings exactly the share leaves nothing to add", "[charge]") {
  // 0.01 mmol / 1710 uL.
  const auto charge =
      chargeOf(planText("total=\"2.0 mL\"", {kLimiting, stock("mecn", "b", "5.847953216374269 mM"),
                                             kAcetonitrile, kWater}));
  CHECK(added_uL(charge, "mecn") == Approx(0.0).margin(1e-6));
  CHECK(added_uL(charge, "water") == Approx(190.0).epsilon(1e-9));
}

TEST_CASE("liquids that exceed the total are a fault of the total, with or without shares",
          "[charge]") {
  const std::string fixed = "key=\"m\"\nrole=\"solvent\"\nname=\"methanol\"\nvolume=\"2 mL\"";
  for (const bool share : {true, false}) {
    std::vector<std::string> components = {kLimiting, fixed};
    if (share) components.push_back(kWater);
    const auto faults = faultsOfPlan(planText("total=\"2.0 mL\"", components));
    REQUIRE(faults.size() == 1);
    CHECK(faults[0].field == "liquid.total");
    CHECK(faults[0].line == 5);
    CHECK(faults[0].what == "the liquids come to 100 µL more than the total of 2000 µL");
  }
  const auto faults =
      faultsOfPlan(planText("limiting_concentration=\"0.5 mol/L\"", {kLimiting, fixed}));
  REQUIRE(faults.size() == 1);
  CHECK(faults[0].field == "liquid.limiting_concentration");
}

TEST_CASE("a total that nothing fills is told, not made up", "[charge]") {
  const auto charge = chargeOf(planText("total=\"2.0 mL\"", {kLimiting}));
  CHECK(charge.totalLiquid.millilitres() == Approx(2.0));
  CHECK(tests::hasNotice(charge.notices, "volume-not-filled"));
  const auto full = chargeOf(planText("total=\"2.0 mL\"", {kLimiting, kWater}));
  CHECK_FALSE(tests::hasNotice(full.notices, "volume-not-filled"));
}

TEST_CASE("the last microlitres may be fixed volumes that fill the total without shares",
          "[charge]") {
  const auto charge = chargeOf(
      planText("total=\"2.0 mL\"",
               {kLimiting, "key=\"m\"\nrole=\"solvent\"\nname=\"methanol\"\nvolume=\"1.9 mL\""}));
  CHECK_FALSE(tests::hasNotice(charge.notices, "volume-not-filled"));
}
