// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/weighing.h"

#include <catch2/catch.hpp>

#include <cmath>

#include "charge/plan_fixture.h"

using namespace vialkeeper;
using tests::at;
using tests::planText;
using tests::weighed;
using units::Mass;
using units::Volume;

namespace {

/// 0.2 mmol of a solid of 119.17 g/mol, assay 0.98 u 0.005; a stock of 4.0 mM u 0.04 mM; and 2 mL
/// in all.
charge::Plan plan() {
  return tests::readGoodPlan(planText("total=\"2.0 mL\"", {R"(key="a"
role="substrate"
name="a"
molar_mass="119.17 g/mol"
amount="0.200 mmol"
supply={kind="solid", assay=0.98, u_assay=0.005}
device="balance-0.01mg")",
                                                           R"(key="pc"
role="photocatalyst"
name="pc"
mol_percent=0.4
supply={kind="stock", concentration="4.0 mM", u_concentration="0.04 mM", solvent="mecn"}
device="pipette-200uL")",
                                                           R"(key="b"
role="base"
name="b"
molar_mass="100 g/mol"
equiv=2
device="balance-0.1mg")",
                                                           R"(key="l"
role="other"
name="l"
molar_mass="50 g/mol"
amount="0.1 mmol"
supply={kind="liquid", density="0.5 g/mL"})",
                                                           R"(key="mecn"
role="solvent"
name="acetonitrile"
share=1
device="pipette-1000uL")"}));
}

double u(const std::optional<stats::Uncertain>& number) {
  REQUIRE(number);
  const auto known = number->standardUncertainty();
  REQUIRE(known);
  return *known;
}

const charge::AsCharged& chargedOf(const charge::Charge& charge, std::string_view key) {
  REQUIRE(at(charge, key).charged);
  return *at(charge, key).charged;
}

}  // namespace

TEST_CASE("a weighed solid has the amount and the doubt of the GUM's sum by hand",
          "[charge][independent]") {
  // n = 24.0 mg x 0.98/119.17 g/mol = 0.1973651 mmol. u(m) = sqrt(0.02^2 + 2 x 0.01^2/12) =
  // 0.0204124 mg; u(M) = 0.005/sqrt(3) = 0.0028868 g/mol (half of the last digit written); u/n =
  // sqrt((0.0204124/24)^2 + (0.005/0.98)^2 + (0.0028868/119.17)^2) = 0.00517250, u = 1.020872e-3
  // mmol.
  const auto charge = weighed(plan(), {{"a", Mass::fromMilligrams(24.0)}});
  const auto& a = chargedOf(charge, "a");
  CHECK(a.amount_mol->value() * 1e3 == Approx(0.1973651).epsilon(1e-6));
  CHECK(u(a.amount_mol) * 1e3 == Approx(1.020872e-3).epsilon(1e-5));
  CHECK(a.mass->milligrams() == Approx(24.0).epsilon(1e-15));
  CHECK_FALSE(a.volume);
}

TEST_CASE("the limiting component's ratio to itself is one without doubt", "[charge][identity]") {
  const auto charge = weighed(plan(), {{"a", Mass::fromMilligrams(24.0)}});
  const auto& a = chargedOf(charge, "a");
  CHECK(a.equiv->value() == 1.0);
  CHECK(u(a.equiv) == 0.0);
  CHECK(a.molPercent->value() == 100.0);
  CHECK(u(a.molPercent) == 0.0);
}

TEST_CASE("a pipetted stock has the doubt of the pipette and of its strength",
          "[charge][independent]") {
  // n = 4.0 mM x 200 uL = 8.0e-4 mmol. u(V) = sqrt((1.6/sqrt 3)^2 + 0.6^2) = 1.101514 uL;
  // u/n = sqrt((1.101514/200)^2 + 0.01^2) = 0.01141636, u = 9.133090e-6 mmol.
  // equiv = 8.0e-4/0.1973651 = 4.053401e-3; u/equiv = sqrt(0.00517250^2 + 0.01141636^2) =
  // 0.01253349, u = 5.080322e-5.
  const auto charge =
      weighed(plan(), {{"a", Mass::fromMilligrams(24.0)}, {"pc", Volume::fromMicrolitres(200)}});
  const auto& pc = chargedOf(charge, "pc");
  CHECK(pc.amount_mol->value() * 1e3 == Approx(8.0e-4).epsilon(1e-12));
  CHECK(u(pc.amount_mol) * 1e3 == Approx(9.133090e-6).epsilon(1e-5));
  CHECK(pc.equiv->value() == Approx(4.053401e-3).epsilon(1e-6));
  CHECK(u(pc.equiv) == Approx(5.080322e-5).epsilon(1e-5));
  CHECK(pc.molPercent->value() == Approx(100.0 * pc.equiv->value()).epsilon(1e-14));
  CHECK(pc.volume->microlitres() == Approx(200.0).epsilon(1e-15));
}

TEST_CASE("amounts as planned carry the doubt that the device gives at the target",
          "[charge][independent]") {
  // Target 0.2 x 119.17/0.98 = 24.32041 mg; u/n = sqrt((0.0204124/24.32041)^2 + (0.005/0.98)^2 +
  // ...) = 0.00517067. Stock target 0.0008 mmol/4 mM = 200 uL: as above. Without a device the doubt
  // is not known.
  const auto charge = tests::chargeOf(plan());
  CHECK(at(charge, "a").targetMass->milligrams() == Approx(24.32041).epsilon(1e-6));
  CHECK(u(at(charge, "a").amount_mol) * 1e3 == Approx(0.2 * 0.00517067).epsilon(1e-5));
  CHECK(at(charge, "a").amount_mol->value() == 0.2e-3);
  CHECK(u(at(charge, "pc").amount_mol) * 1e3 == Approx(9.133090e-6).epsilon(1e-5));
  CHECK_FALSE(at(charge, "l").amount_mol->standardUncertainty());
}

TEST_CASE("off target is judged in per cent of the target", "[charge]") {
  const auto charge =
      weighed(plan(), {{"a", Mass::fromMilligrams(24.0)}, {"b", Mass::fromMilligrams(44.0)}});
  // b: target 0.4 mmol x 100 g/mol = 40 mg, so + 10 %; a: 24.0/24.32041 - 1 = -1.317453 %.
  CHECK(*chargedOf(charge, "b").offTargetPercent == Approx(10.0).epsilon(1e-12));
  CHECK(*chargedOf(charge, "a").offTargetPercent == Approx(-1.317453).epsilon(1e-5));
}

TEST_CASE("ratios refer to the planned limiting amount where it was not weighed", "[charge]") {
  const auto charge = weighed(plan(), {{"b", Mass::fromMilligrams(44.0)}});
  CHECK(chargedOf(charge, "b").equiv->value() == Approx(2.2).epsilon(1e-12));
  CHECK_FALSE(at(charge, "a").charged);
}

TEST_CASE("concentrations use the recorded volumes and planned ones where nothing is recorded",
          "[charge]") {
  // Planned: 200 uL stock, 0.1 mmol x 50 g/mol/0.5 g/mL = 10 uL of l, 1790 uL added; 2000 in all.
  const auto asPlanned = weighed(plan(), {{"b", Mass::fromMilligrams(40.0)}});
  CHECK(chargedOf(asPlanned, "b").concentration_mol_m3->value() == Approx(200.0).epsilon(1e-9));
  // Recorded 190 uL of stock and 1840 uL of acetonitrile: 190 + 10 + 1840 = 2040 uL.
  const auto recorded = weighed(plan(), {{"b", Mass::fromMilligrams(40.0)},
                                         {"pc", Volume::fromMicrolitres(190)},
                                         {"mecn", Volume::fromMicrolitres(1840)}});
  CHECK(chargedOf(recorded, "b").concentration_mol_m3->value() ==
        Approx(400.0 / 2.04).epsilon(1e-9));
  CHECK(recorded.totalLiquid.millilitres() == Approx(2.0));
  // A neat liquid by mass counts with its density: 15 mg/0.5 g/mL = 30 uL instead of 10.
  const auto byMass =
      weighed(plan(), {{"b", Mass::fromMilligrams(40.0)}, {"l", Mass::fromMilligrams(15.0)}});
  CHECK(chargedOf(byMass, "b").concentration_mol_m3->value() == Approx(400.0 / 2.02).epsilon(1e-9));
}

TEST_CASE("a concentration is correlated with the volume that its own stock brings",
          "[charge][independent]") {
  // c = c_s V/(V + W) with V = 200 uL u 1.101514, W = 1800 uL exact: dc/dV = c_s W/(V + W)^2.
  // u(c)^2 = (V/(V + W) u(c_s))^2 + (c_s W/(V + W)^2 u(V))^2 = (0.1 x 0.04)^2 + (4 x 1800/2000^2
  // x 1.101514)^2 mM^2.
  const auto charge = weighed(plan(), {{"pc", Volume::fromMicrolitres(200)}});
  const auto& c = chargedOf(charge, "pc").concentration_mol_m3;
  CHECK(c->value() == Approx(0.4).epsilon(1e-9));
  CHECK(u(c) == Approx(std::hypot(0.1 * 0.04, 4.0 * 1800.0 / 4e6 * 1.101514)).epsilon(1e-5));
}

TEST_CASE("a device of the other kind leaves the doubt unknown and is told", "[charge]") {
  const std::string liquid =
      "key=\"l2\"\nrole=\"other\"\nname=\"l2\"\nmolar_mass=\"50 g/mol\"\namount=\"0.1 "
      "mmol\"\ndevice=\"pipette-10uL\"\n"
      "supply={kind=\"liquid\", density=\"0.5 g/mL\"}";
  const auto other = tests::readGoodPlan(planText(
      "total=\"2 mL\"",
      {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nmolar_mass=\"100 g/mol\"\namount=\"1 mmol\"",
       liquid}));
  const auto byMass = weighed(other, {{"l2", Mass::fromMilligrams(5.0)}});
  CHECK(tests::hasNotice(at(byMass, "l2").notices, "other-device"));
  CHECK_FALSE(chargedOf(byMass, "l2").amount_mol->standardUncertainty());
  const auto byVolume = weighed(other, {{"l2", Volume::fromMicrolitres(10.0)}});
  CHECK_FALSE(tests::hasNotice(at(byVolume, "l2").notices, "other-device"));
  CHECK(u(chargedOf(byVolume, "l2").amount_mol) > 0.0);
}
