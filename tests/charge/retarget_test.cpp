// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "charge/plan_fixture.h"
#include "charge/scaling.h"

using namespace vialkeeper;
using charge::Retarget;
using tests::at;
using tests::planText;
using tests::weighed;
using units::Mass;
using units::Volume;

namespace {

/// 1 mmol of a (100 mg) and one component of every basis. `liquid` fixes the volume, 10 mL as
/// planned.
charge::Plan plan(const std::string& liquid) {
  const std::string solid = "role=\"other\"\nmolar_mass=\"200 g/mol\"\n";
  return tests::readGoodPlan(
      planText(liquid, {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nmolar_mass=\"100 "
                        "g/mol\"\namount=\"1 mmol\"\ndevice=\"balance-0.1mg\"",
                        "key=\"equiv\"\nname=\"b\"\nequiv=2\n" + solid,
                        "key=\"percent\"\nname=\"c\"\nmol_percent=5\n" + solid,
                        "key=\"amount\"\nname=\"d\"\namount=\"0.3 mmol\"\n" + solid,
                        "key=\"mass\"\nname=\"e\"\nmass=\"30 mg\"\n" + solid,
                        "key=\"molar\"\nname=\"f\"\nconcentration=\"0.05 mol/L\"\n" + solid,
                        "key=\"stock\"\nname=\"g\"\nrole=\"other\"\nmol_percent=1\nsupply={kind="
                        "\"stock\", concentration=\"10 mM\", solvent=\"w\"}",
                        "key=\"w\"\nrole=\"solvent\"\nname=\"water\"\nshare=1"}));
}

double mg(const charge::Charge& charge, std::string_view key) {
  return at(charge, key).targetMass->milligrams();
}
double uL(const charge::Charge& charge, std::string_view key) {
  return at(charge, key).targetVolume->microlitres();
}

}  // namespace

TEST_CASE("after a re-target ratios follow the weighed amount and absolute bases stay",
          "[charge]") {
  // 110 mg instead of 100: everything in proportion grows by 1.1.
  const auto charge =
      weighed(plan("total=\"10 mL\""), {{"a", Mass::fromMilligrams(110)}}, Retarget::kYes);
  CHECK(charge.retargeted);
  CHECK(charge.limitingAmount.millimoles() == Approx(1.1).epsilon(1e-12));
  CHECK(mg(charge, "equiv") == Approx(440.0).epsilon(1e-12));
  CHECK(mg(charge, "percent") == Approx(11.0).epsilon(1e-12));
  CHECK(uL(charge, "stock") == Approx(1100.0).epsilon(1e-12));
  CHECK(mg(charge, "amount") == Approx(60.0).epsilon(1e-12));
  CHECK(mg(charge, "mass") == Approx(30.0).epsilon(1e-12));
  CHECK(mg(charge, "molar") == Approx(100.0).epsilon(1e-12));
  CHECK(charge.totalLiquid.millilitres() == Approx(10.0).epsilon(1e-12));
  // The share solvent makes room for the larger stock: 10 - 1.1 mL.
  CHECK(uL(charge, "w") == Approx(8900.0).epsilon(1e-12));
}

TEST_CASE(
    "the liquid's volume follows only where a concentration of the limiting component fixes it",
    "[charge]") {
  const auto charge = weighed(plan("limiting_concentration=\"0.1 mol/L\""),
                              {{"a", Mass::fromMilligrams(110)}}, Retarget::kYes);
  CHECK(charge.totalLiquid.millilitres() == Approx(11.0).epsilon(1e-12));
  CHECK(mg(charge, "molar") == Approx(110.0).epsilon(1e-12));
  CHECK(uL(charge, "w") == Approx(9900.0).epsilon(1e-12));
  CHECK(mg(charge, "mass") == Approx(30.0).epsilon(1e-12));
}

TEST_CASE("the limiting component's own target stays, and its weighing is judged against it",
          "[charge]") {
  for (const auto retarget : {Retarget::kNo, Retarget::kYes}) {
    const auto charge =
        weighed(plan("total=\"10 mL\""), {{"a", Mass::fromMilligrams(110)}}, retarget);
    CHECK(mg(charge, "a") == Approx(100.0).epsilon(1e-12));
    CHECK(*at(charge, "a").charged->offTargetPercent == Approx(10.0).epsilon(1e-12));
  }
}

TEST_CASE("what is already recorded is left alone and judged against the new target", "[charge]") {
  const auto charge = weighed(
      plan("total=\"10 mL\""),
      {{"a", Mass::fromMilligrams(110)}, {"equiv", Mass::fromMilligrams(400)}}, Retarget::kYes);
  const auto& charged = *at(charge, "equiv").charged;
  CHECK(charged.mass->milligrams() == Approx(400.0).epsilon(1e-15));
  // Target now 440 mg; 2 mmol for 1.1 mmol.
  CHECK(*charged.offTargetPercent == Approx(100.0 * (400.0 / 440.0 - 1.0)).epsilon(1e-12));
  CHECK(charged.equiv->value() == Approx(2.0 / 1.1).epsilon(1e-12));
  const auto before = weighed(plan("total=\"10 mL\""), {{"a", Mass::fromMilligrams(110)},
                                                        {"equiv", Mass::fromMilligrams(400)}});
  CHECK(*at(before, "equiv").charged->offTargetPercent == Approx(0.0).margin(1e-9));
  CHECK_FALSE(before.retargeted);
}

TEST_CASE("a re-target to exactly the planned amount changes nothing", "[charge][identity]") {
  for (const char* liquid : {"total=\"10 mL\"", "limiting_concentration=\"0.1 mol/L\""}) {
    const auto planned = tests::chargeOf(plan(liquid));
    const auto again = weighed(plan(liquid), {{"a", Mass::fromMilligrams(100)}}, Retarget::kYes);
    for (const auto& component : planned.components) {
      INFO(component.key);
      const auto& other = at(again, component.key);
      if (component.targetMass)
        CHECK(other.targetMass->si() == Approx(component.targetMass->si()).epsilon(1e-12));
      if (component.targetVolume)
        CHECK(other.targetVolume->si() == Approx(component.targetVolume->si()).epsilon(1e-12));
    }
  }
}

TEST_CASE("nothing can be re-targeted before the limiting component is weighed", "[charge]") {
  const auto p = plan("total=\"10 mL\"");
  const charge::Weighings weighings = {
      {.key = "equiv", .actual = Mass::fromMilligrams(400), .asWritten = "400 mg"}};
  const auto charge = chargeAsWeighed(p, tests::substancesOf(p), weighings, Retarget::kYes);
  REQUIRE_FALSE(charge);
  REQUIRE(charge.error().size() == 1);
  CHECK(charge.error()[0].field == "a");
}

TEST_CASE("a re-target that drives a stock beyond its solvent's share is refused", "[charge]") {
  const auto p = plan("total=\"10 mL\"");
  const charge::Weighings weighings = {
      {.key = "a", .actual = Mass::fromMilligrams(1100), .asWritten = "1.1 g"}};
  CHECK_FALSE(chargeAsWeighed(p, tests::substancesOf(p), weighings, Retarget::kYes));
  CHECK(chargeAsWeighed(p, tests::substancesOf(p), weighings, Retarget::kNo));
}

TEST_CASE("scaling keeps ratios and concentrations and multiplies what is absolute", "[charge]") {
  const auto p = plan("total=\"10 mL\"");
  const auto one = tests::chargeOf(p);
  const auto three = tests::chargeOf(charge::scaled(p, 3.0));
  CHECK(three.limitingAmount.millimoles() == Approx(3.0).epsilon(1e-12));
  CHECK(three.totalLiquid.millilitres() == Approx(30.0).epsilon(1e-12));
  for (const auto& component : one.components) {
    INFO(component.key);
    const auto& other = at(three, component.key);
    if (component.targetMass)
      CHECK(other.targetMass->si() == Approx(3.0 * component.targetMass->si()).epsilon(1e-12));
    if (component.targetVolume)
      CHECK(other.targetVolume->si() == Approx(3.0 * component.targetVolume->si()).epsilon(1e-12));
    CHECK(*other.equiv == Approx(*component.equiv).epsilon(1e-12));
    CHECK(other.concentration->si() == Approx(component.concentration->si()).epsilon(1e-12));
  }
  CHECK(charge::scaled(p, 3.0).find("amount")->amount.asWritten == "0.900000 mmol");
  CHECK(charge::scaled(p, 3.0).find("molar")->amount.asWritten == "0.05 mol/L");
}

TEST_CASE("a plan moved to another vial keeps its fill, its stir bar, and loses the rating",
          "[charge]") {
  const auto p = tests::readGoodPlan(planText(
      "total=\"4 mL\"",
      {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nmolar_mass=\"100 g/mol\"\namount=\"1 mmol\""},
      "[vial]\nvolume=\"10 mL\"\nu_volume=\"0.1 mL\"\ndisplaced=\"0.2 mL\"\nrated_gauge=\"2 "
      "bar\""));
  const auto moved = charge::scaledToVial(p, Volume::fromMillilitres(25));
  CHECK(tests::chargeOf(moved).fill == Approx(0.4).epsilon(1e-12));
  CHECK(tests::chargeOf(moved).limitingAmount.millimoles() == Approx(2.5).epsilon(1e-12));
  CHECK(moved.vial->volumeUncertainty.millilitres() == Approx(0.25).epsilon(1e-12));
  CHECK(moved.vial->displaced.millilitres() == Approx(0.2).epsilon(1e-12));
  CHECK_FALSE(moved.vial->ratedGauge);
}

TEST_CASE("a factor that is not positive and finite is a wrong program", "[charge]") {
  const auto p = plan("total=\"10 mL\"");
  for (const double factor : {0.0, -1.0, std::numeric_limits<double>::infinity(),
                              std::numeric_limits<double>::quiet_NaN()}) {
    CHECK_THROWS_AS(charge::scaled(p, factor), std::logic_error);
  }
  CHECK_THROWS_AS(charge::scaledToVial(p, Volume::fromMillilitres(5)), std::logic_error);
}
