// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include <algorithm>
#include <optional>

#include "charge/plan_fixture.h"

using namespace vialkeeper;
using tests::at;
using tests::chargeOf;
using tests::planText;

namespace {

/// Limiting: 1 mmol of a solid of 100 g/mol, so 100 mg.
const std::string kLimiting =
    "key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nmolar_mass=\"100 g/mol\"\namount=\"1 mmol\"";

/// The other component, of 200 g/mol, always comes to 0.5 mmol.
std::string other(const std::string& basis, const std::string& supply) {
  return "key=\"b\"\nrole=\"other\"\nname=\"b\"\nmolar_mass=\"200 g/mol\"\n" + basis +
         "\nsupply=" + supply;
}

struct SupplyCase {
  const char* supply;
  const char* mass;    ///< basis `mass` that holds 0.5 mmol
  const char* volume;  ///< basis `volume` that does; empty where a volume makes no sense
  std::optional<double> targetMass_mg;
  std::optional<double> targetVolume_uL;
  bool gas = false;
};

const std::vector<SupplyCase> kSupplies = {
    // 0.5 mmol x 200 g/mol = 100 mg pure; assay 0.8: 125 mg.
    {R"({kind="solid", assay=0.8})", "125 mg", "", 125.0, std::nullopt},
    // The same, 125 mg / 1.25 g/mL = 100 uL.
    {R"({kind="liquid", density="1.25 g/mL", assay=0.8})", "125 mg", "100 uL", 125.0, 100.0},
    // 0.5 mmol / 0.25 mol/L = 2000 uL; at 0.9 g/mL 1.8 g.
    {R"({kind="stock", concentration="0.25 mol/L", density="0.9 g/mL", solvent="water"})", "1.8 g",
     "2 mL", std::nullopt, 2000.0},
    // 100 mg / 0.1 = 1 g of solution; at 1.25 g/mL 800 uL.
    {R"({kind="stock", mass_fraction=0.1, density="1.25 g/mL", solvent="water"})", "1 g", "800 uL",
     std::nullopt, 800.0},
    // n R T/p = 0.5e-3 mol x 8.31446261815324 J/mol/K x 300 K / 1e5 Pa = 1.247169392722986e-5 m3.
    {R"({kind="gas", pressure="1 bar", temperature="300 K"})", "100 mg", "12471.69392722986 uL",
     std::nullopt, 12471.69392722986, true},
};

/// 0.5 mmol in every basis: half of the limiting 1 mmol, and 0.05 mol/L in 10 mL.
std::vector<std::string> basesOf(const SupplyCase& supply) {
  std::vector<std::string> bases = {"amount=\"0.5 mmol\"", "equiv=0.5", "mol_percent=50",
                                    "concentration=\"0.05 mol/L\"",
                                    std::string("mass=\"") + supply.mass + "\""};
  if (*supply.volume != '\0') bases.push_back(std::string("volume=\"") + supply.volume + "\"");
  return bases;
}

void checkTargets(const charge::ComponentCharge& component, const SupplyCase& supply) {
  REQUIRE(component.amount_mol);
  CHECK(component.amount_mol->value() == Approx(0.5e-3).epsilon(1e-12));
  REQUIRE(component.targetMass.has_value() == supply.targetMass_mg.has_value());
  if (supply.targetMass_mg)
    CHECK(component.targetMass->milligrams() == Approx(*supply.targetMass_mg).epsilon(1e-12));
  REQUIRE(component.targetVolume.has_value() == supply.targetVolume_uL.has_value());
  if (supply.targetVolume_uL)
    CHECK(component.targetVolume->microlitres() == Approx(*supply.targetVolume_uL).epsilon(1e-12));
}

}  // namespace

TEST_CASE("every basis with every supply comes to the same half millimole", "[charge][identity]") {
  for (const SupplyCase& supply : kSupplies) {
    for (const std::string& basis : basesOf(supply)) {
      INFO(basis << " " << supply.supply);
      const auto charge =
          chargeOf(planText("total=\"10.0 mL\"", {kLimiting, other(basis, supply.supply)}));
      const auto& b = at(charge, "b");
      checkTargets(b, supply);
      CHECK(*b.equiv == Approx(0.5).epsilon(1e-12));
      CHECK(*b.molPercent == Approx(50.0).epsilon(1e-12));
      REQUIRE(b.concentration.has_value() == !supply.gas);
      if (!supply.gas) CHECK(b.concentration->molPerLitre() == Approx(0.05).epsilon(1e-12));
      CHECK(at(charge, "a").targetMass->milligrams() == Approx(100.0).epsilon(1e-12));
    }
  }
}

TEST_CASE("every absolute basis with every supply may be the limiting component's",
          "[charge][identity]") {
  for (const SupplyCase& supply : kSupplies) {
    for (const std::string& basis : basesOf(supply)) {
      if (basis.starts_with("equiv") || basis.starts_with("mol_percent")) continue;
      INFO(basis << " " << supply.supply);
      const std::string limiting =
          "key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nmolar_mass=\"200 g/mol\"\n" + basis +
          "\nsupply=" + supply.supply;
      const std::string follower =
          "key=\"b\"\nrole=\"other\"\nname=\"b\"\nmolar_mass=\"100 g/mol\"\nequiv=2";
      const auto charge = chargeOf(planText("total=\"10.0 mL\"", {limiting, follower}));
      CHECK(charge.limitingAmount.millimoles() == Approx(0.5).epsilon(1e-12));
      checkTargets(at(charge, "a"), supply);
      CHECK(*at(charge, "a").equiv == 1.0);
      CHECK(*at(charge, "a").molPercent == 100.0);
      // 2 x 0.5 mmol x 100 g/mol = 100 mg.
      CHECK(at(charge, "b").targetMass->milligrams() == Approx(100.0).epsilon(1e-12));
    }
  }
}

TEST_CASE("a written ratio is kept to its last digit", "[charge]") {
  const auto charge = chargeOf(planText(
      "total=\"7.3 mL\"", {kLimiting, other("mol_percent=7", R"({kind="solid", assay=0.97})")}));
  CHECK(*at(charge, "b").molPercent == 7.0);
  const auto equiv = chargeOf(planText(
      "total=\"7.3 mL\"", {kLimiting, other("equiv=1.1", R"({kind="solid", assay=0.97})")}));
  CHECK(*at(equiv, "b").equiv == 1.1);
}

TEST_CASE("a share is the solvent's part of the liquid by volume", "[charge]") {
  // 10 mL in the parts 3 and 1: 7.5 mL and 2.5 mL; water at 20 degC, 0.998207 g/mL (CRC, from
  // memory): 2.4955 g.
  const auto charge = chargeOf(planText(
      "total=\"10.0 mL\"", {kLimiting, "key=\"m\"\nrole=\"solvent\"\nname=\"methanol\"\nshare=3",
                            "key=\"w\"\nrole=\"solvent\"\nname=\"water\"\nshare=1"}));
  CHECK(at(charge, "m").targetVolume->millilitres() == Approx(7.5).epsilon(1e-12));
  CHECK(at(charge, "w").targetVolume->millilitres() == Approx(2.5).epsilon(1e-12));
  CHECK(at(charge, "w").targetMass->grams() == Approx(2.4955).epsilon(1e-4));
}

TEST_CASE("the liquid's volume may come from a concentration of the limiting component",
          "[charge]") {
  // 1 mmol / 0.1 mol/L = 10 mL; 0.02 mol/L in 10 mL are 0.2 mmol of 200 g/mol, 40 mg.
  const auto charge =
      chargeOf(planText("limiting_concentration=\"0.1 mol/L\"",
                        {kLimiting, other("concentration=\"0.02 mol/L\"", R"({kind="solid"})")}));
  CHECK(charge.totalLiquid.millilitres() == Approx(10.0).epsilon(1e-12));
  CHECK(at(charge, "b").targetMass->milligrams() == Approx(40.0).epsilon(1e-12));
  CHECK(at(charge, "a").concentration->molPerLitre() == Approx(0.1).epsilon(1e-12));
}

TEST_CASE("each formula of the charge has the exponents that it should", "[charge][identity]") {
  const auto targetMass = [](double amount_mmol, double M, double assay) {
    const auto charge = chargeOf(
        planText("total=\"10 mL\"",
                 {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\nmolar_mass=\"" + std::to_string(M) +
                  " g/mol\"\namount=\"" + std::to_string(amount_mmol) +
                  " mmol\"\nsupply={kind=\"solid\", assay=" + std::to_string(assay) + "}"}));
    return at(charge, "a").targetMass->si();
  };
  const double m = targetMass(0.25, 150.0, 0.45);
  CHECK(targetMass(0.5, 150.0, 0.45) / m == Approx(2.0).epsilon(1e-12));
  CHECK(targetMass(0.25, 300.0, 0.45) / m == Approx(2.0).epsilon(1e-12));
  CHECK(targetMass(0.25, 150.0, 0.9) / m == Approx(0.5).epsilon(1e-12));

  const auto stockVolume = [](double amount_mmol, double c) {
    const auto charge = chargeOf(planText(
        "total=\"50 mL\"",
        {"key=\"a\"\nrole=\"substrate\"\nname=\"a\"\namount=\"" + std::to_string(amount_mmol) +
         " mmol\"\nsupply={kind=\"stock\", solvent=\"water\", concentration=\"" +
         std::to_string(c) + " mM\"}"}));
    return at(charge, "a").targetVolume->si();
  };
  const double V = stockVolume(0.25, 40.0);
  CHECK(stockVolume(0.5, 40.0) / V == Approx(2.0).epsilon(1e-12));
  CHECK(stockVolume(0.25, 80.0) / V == Approx(0.5).epsilon(1e-12));

  const auto gasAmount = [](double p, double T, double V_mL) {
    const auto charge = chargeOf(planText(
        "total=\"5 mL\"", {"key=\"a\"\nrole=\"gas\"\nname=\"a\"\nvolume=\"" + std::to_string(V_mL) +
                           " mL\"\nsupply={kind=\"gas\", pressure=\"" + std::to_string(p) +
                           " bar\", temperature=\"" + std::to_string(T) + " K\"}"}));
    return charge.limitingAmount.si();
  };
  const double n = gasAmount(1.0, 300.0, 10.0);
  CHECK(gasAmount(2.0, 300.0, 10.0) / n == Approx(2.0).epsilon(1e-12));
  CHECK(gasAmount(1.0, 600.0, 10.0) / n == Approx(0.5).epsilon(1e-12));
  CHECK(gasAmount(1.0, 300.0, 20.0) / n == Approx(2.0).epsilon(1e-12));
}

TEST_CASE("what an amount needs and nobody gave is a fault that names it", "[charge]") {
  const auto wants = [](const std::string& component, const std::string& field,
                        const std::string& what) {
    const auto faults = tests::faultsOfPlan(planText("total=\"10 mL\"", {kLimiting, component}));
    INFO(tests::toLines(faults).front());
    REQUIRE(faults.size() == 1);
    CHECK(faults[0].field == field);
    CHECK(faults[0].what == what);
    CHECK(faults[0].line > 0);
  };
  const std::string head = "key=\"b\"\nrole=\"other\"\nname=\"b\"\n";
  wants(head + "equiv=2", "component.b.equiv", "the molar mass of b is not known");
  wants(head + "mass=\"10 mg\"\nsupply={kind=\"gas\", pressure=\"1 bar\", temperature=\"300 K\"}",
        "component.b.mass", "the molar mass of b is not known");
  wants(head + "molar_mass=\"50 g/mol\"\nequiv=2\nsupply={kind=\"liquid\"}", "component.b.supply",
        "the density of b is not known");
  wants("key=\"s\"\nrole=\"solvent\"\nname=\"moon juice\"\nshare=1", "component.s.supply",
        "the density of moon juice is not known");
}

TEST_CASE("a mass of unknown molar mass is charged, its amount told to be undetermined",
          "[charge]") {
  const auto charge =
      chargeOf(planText("total=\"10 mL\"",
                        {kLimiting, "key=\"b\"\nrole=\"other\"\nname=\"celite\"\nmass=\"50 mg\""}));
  CHECK(at(charge, "b").targetMass->milligrams() == Approx(50.0));
  CHECK_FALSE(at(charge, "b").amount_mol);
  CHECK_FALSE(at(charge, "b").equiv);
  CHECK(tests::hasNotice(at(charge, "b").notices, "undetermined"));
}
