// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "charge/plan_fixture.h"

using namespace vialkeeper;
using tests::at;
using tests::chargeOf;
using tests::hasNotice;
using tests::planText;

namespace {

const std::string kLimiting =
    "key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nmolar_mass=\"100 g/mol\"\namount=\"1 mmol\"";
const std::string kWater = "key=\"water\"\nrole=\"solvent\"\nname=\"water\"\nshare=1";

std::string vial(const std::string& volume, const std::string& displaced = "0 mL") {
  return "[vial]\nvolume=\"" + volume + "\"\ndisplaced=\"" + displaced + "\"";
}

/// A weighed solid of 200 g/mol.
std::string weighedSolid(const std::string& basis, const std::string& device,
                         const std::string& more = "") {
  return "key=\"b\"\nrole=\"other\"\nname=\"b\"\nmolar_mass=\"200 g/mol\"\n" + basis +
         "\ndevice=" + device + "\n" + more;
}

}  // namespace

TEST_CASE("a liquid above half of the vial is told, one at half is not", "[charge]") {
  const auto half = chargeOf(planText("total=\"5.0 mL\"", {kLimiting, kWater}, vial("10.0 mL")));
  CHECK(*half.fill == Approx(0.5).epsilon(1e-12));
  CHECK_FALSE(hasNotice(half.notices, "fill-above-half"));
  const auto above = chargeOf(planText("total=\"5.01 mL\"", {kLimiting, kWater}, vial("10.0 mL")));
  CHECK(hasNotice(above.notices, "fill-above-half"));
  CHECK_FALSE(chargeOf(planText("total=\"5.0 mL\"", {kLimiting, kWater})).fill);
}

TEST_CASE("a liquid that with the stir bar fills the vial leaves no headspace, a fault",
          "[charge]") {
  for (const char* total : {"9.85 mL", "10.0 mL", "12 mL"}) {
    const auto faults = tests::faultsOfPlan(planText(
        std::string("total=\"") + total + "\"", {kLimiting, kWater}, vial("10.0 mL", "0.15 mL")));
    REQUIRE(faults.size() == 1);
    CHECK(faults[0].field == "liquid.total");
    CHECK(faults[0].what.find("leave no headspace") != std::string::npos);
  }
  CHECK_NOTHROW(
      chargeOf(planText("total=\"9.84 mL\"", {kLimiting, kWater}, vial("10.0 mL", "0.15 mL"))));
}

TEST_CASE("a target's tolerance is its own, the role's, and never finer than the last digit",
          "[charge]") {
  const auto tolerance = [](const std::string& component) {
    return at(chargeOf(planText("total=\"5 mL\"", {kLimiting, component, kWater})), "b")
        .tolerancePercent;
  };
  // 20 mg on a balance of 1 mg: one digit is 5 %; of 0.1 mg 0.5 %, finer than the default 2 %.
  CHECK(tolerance(weighedSolid("mass=\"20 mg\"", "\"balance-1mg\"")) == Approx(5.0).epsilon(1e-12));
  CHECK(tolerance(weighedSolid("mass=\"20 mg\"", "\"balance-0.1mg\"")) == 2.0);
  CHECK(tolerance(weighedSolid("mass=\"20 mg\"", "\"balance-0.1mg\"", "tolerance_percent=0.2")) ==
        Approx(0.5).epsilon(1e-12));
  CHECK(tolerance(weighedSolid("mass=\"20 mg\"", "\"balance-0.01mg\"", "tolerance_percent=0.2")) ==
        0.2);
  CHECK(tolerance("key=\"b\"\nrole=\"solvent\"\nname=\"methanol\"\nshare=1") == 5.0);
  CHECK(tolerance("key=\"b\"\nrole=\"solvent\"\nname=\"methanol\"\nshare=1\ntolerance_percent=1") ==
        1.0);
}

TEST_CASE(
    "a weighing below the minimum weight is told and gets a stock in the solvent that has room",
    "[charge]") {
  // balance-0.01mg: s 0.02, d 0.01, minimum 2000 x 0.02 = 40 mg.
  const auto at40 = chargeOf(planText(
      "total=\"5 mL\"", {kLimiting, weighedSolid("mass=\"40 mg\"", "\"balance-0.01mg\""), kWater}));
  CHECK_FALSE(hasNotice(at(at40, "b").notices, "minimum-weight"));
  const auto below = chargeOf(planText(
      "total=\"5 mL\"", {kLimiting, weighedSolid("mass=\"2 mg\"", "\"balance-0.01mg\""), kWater}));
  const auto& b = at(below, "b");
  CHECK(hasNotice(b.notices, "minimum-weight"));
  REQUIRE(hasNotice(b.notices, "stock-proposed"));
  REQUIRE(b.proposal);
  CHECK(b.proposal->solventKey == "water");
  CHECK(b.proposal->stockMass.milligrams() >= 40.0);
  CHECK((b.proposal->concentration * b.proposal->transfer).moles() ==
        Approx(b.amount_mol->value()).epsilon(1e-12));
  // No more than half of the 5 mL to be added.
  CHECK(b.proposal->transfer.millilitres() <= 2.5);
  for (const auto& notice : b.notices) CHECK(notice.at == "component.b");
}

TEST_CASE("a proposal takes no more than half of the solvent that is still to be added",
          "[charge]") {
  // 5.6 umol of 1000 g/mol, minimum 40 mg: 50 mg make 25 mL of 2 mM or 10 mL of 5 mM. Of the more
  // dilute stock 2.8 mL would be needed, more than half of the 5 mL; of the other 1.12 mL.
  const auto charge = chargeOf(planText(
      "total=\"5 mL\"", {kLimiting,
                         "key=\"b\"\nrole=\"other\"\nname=\"b\"\nmolar_mass=\"1000 g/mol\"\n"
                         "mass=\"5.6 mg\"\ndevice=\"balance-0.01mg\"",
                         kWater}));
  REQUIRE(at(charge, "b").proposal);
  CHECK(at(charge, "b").proposal->concentration.millimolPerLitre() == Approx(5.0).epsilon(1e-12));
  CHECK(at(charge, "b").proposal->transfer.microlitres() == Approx(1120.0).epsilon(1e-12));
}

TEST_CASE("a proposal counts the impurity of what is weighed", "[charge][identity]") {
  const auto of = [](const std::string& assay) {
    const auto charge = chargeOf(
        planText("total=\"5 mL\"", {kLimiting,
                                    weighedSolid("amount=\"0.01 mmol\"", "\"balance-0.01mg\"",
                                                 "supply={kind=\"solid\", assay=" + assay + "}"),
                                    kWater}));
    REQUIRE(at(charge, "b").proposal);
    return *at(charge, "b").proposal;
  };
  for (const char* assay : {"1.0", "0.5"}) {
    const auto p = of(assay);
    // m = c V M/w.
    CHECK(p.stockMass.grams() ==
          Approx((p.concentration * p.flask).moles() * 200.0 / std::stod(assay)).epsilon(1e-12));
  }
}

TEST_CASE("without a solvent to spare, or without a molar mass, no stock is proposed", "[charge]") {
  const auto none = chargeOf(
      planText("total=\"5 mL\"", {kLimiting, weighedSolid("mass=\"2 mg\"", "\"balance-0.01mg\"")}));
  CHECK(hasNotice(at(none, "b").notices, "minimum-weight"));
  CHECK_FALSE(at(none, "b").proposal);
  const auto nameless = chargeOf(planText(
      "total=\"5 mL\"",
      {kLimiting, "key=\"b\"\nrole=\"other\"\nname=\"b\"\nmass=\"2 mg\"\ndevice=\"balance-0.01mg\"",
       kWater}));
  CHECK(hasNotice(at(nameless, "b").notices, "minimum-weight"));
  CHECK_FALSE(at(nameless, "b").proposal);
}

TEST_CASE("several proposals together leave room in the solvent", "[charge][identity]") {
  std::vector<std::string> components = {kLimiting, kWater};
  for (int i = 0; i < 6; ++i) {
    components.push_back("key=\"c" + std::to_string(i) +
                         "\"\nrole=\"other\"\nname=\"c\"\nmolar_mass=\"500 g/mol\"\nmass=\"3 "
                         "mg\"\ndevice=\"balance-0.01mg\"");
  }
  const auto charge = chargeOf(planText("total=\"2 mL\"", components));
  double promised = 0.0;
  std::size_t proposals = 0;
  for (const auto& component : charge.components) {
    if (!component.proposal) continue;
    ++proposals;
    promised += component.proposal->transfer.si();
  }
  CHECK(proposals >= 2);
  CHECK(promised < at(charge, "water").targetVolume->si());
}

TEST_CASE("a pipette that is too large or needs several strokes is told", "[charge]") {
  const auto notices = [](const std::string& volume, const std::string& device) {
    return at(chargeOf(planText("total=\"20 mL\"",
                                {kLimiting, kWater,
                                 "key=\"b\"\nrole=\"solvent\"\nname=\"methanol\"\nvolume=\"" +
                                     volume + "\"\ndevice=\"" + device + "\""})),
              "b")
        .notices;
  };
  CHECK(hasNotice(notices("50 uL", "pipette-1000uL"), "below-pipette-range"));
  CHECK_FALSE(hasNotice(notices("100 uL", "pipette-1000uL"), "below-pipette-range"));
  CHECK(hasNotice(notices("2.5 mL", "pipette-1000uL"), "several-strokes"));
  CHECK_FALSE(hasNotice(notices("1 mL", "pipette-1000uL"), "several-strokes"));
}

TEST_CASE(
    "what is assumed is told: mixing, exact strengths, unnamed devices, densities out of range",
    "[charge]") {
  const std::string stock =
      "key=\"b\"\nrole=\"other\"\nname=\"b\"\nequiv=0.01\nsupply={kind=\"stock\", "
      "concentration=\"10 mM\", solvent=\"water\"";
  const auto charge = chargeOf(planText("total=\"5 mL\"", {kLimiting, stock + "}", kWater}));
  CHECK(hasNotice(charge.notices, "ideal-mixing"));
  CHECK(hasNotice(charge.notices, "taken-as-exact"));
  CHECK(hasNotice(charge.notices, "no-device"));
  CHECK(hasNotice(charge.notices, "solids-take-no-room"));
  const auto stated = chargeOf(
      planText("total=\"5 mL\"", {kLimiting, stock + ", u_concentration=\"0.1 mM\"}", kWater}));
  CHECK_FALSE(hasNotice(stated.notices, "taken-as-exact"));
  const std::string seal = "[seal]\natmosphere=\"N2\"\npressure=\"1 bar\"\ntemperature=";
  CHECK(hasNotice(
      at(chargeOf(planText("total=\"5 mL\"", {kLimiting, kWater}, seal + "\"60 degC\"")), "water")
          .notices,
      "outside-validity"));
  CHECK_FALSE(hasNotice(
      at(chargeOf(planText("total=\"5 mL\"", {kLimiting, kWater}, seal + "\"22 degC\"")), "water")
          .notices,
      "outside-validity"));
}
