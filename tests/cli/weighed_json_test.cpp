// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/command_bench.h"
#include "cli/json_fields.h"

using namespace vialkeeper::tests;

namespace {

constexpr const char* kWeighed = "key,actual\namine,26.9 mg\nnickel,98 uL\nwater,105 uL\n";

nlohmann::json chargeOf(const std::vector<std::string>& options = {},
                        const std::string& csv = kWeighed) {
  const ScratchFolder folder;
  std::vector<std::string> arguments = {"--json", "charge", folder.write("plan.toml", soundPlan()),
                                        "--weighed", folder.write("w.csv", csv)};
  arguments.insert(arguments.end(), options.begin(), options.end());
  const Ran ran = run(arguments);
  INFO(ran.err);
  REQUIRE(ran.status == 0);
  checkOneObject(ran.out);
  return ran.json();
}

// 26.9 mg of indoline of assay 0.98, M = 119.167 g/mol
constexpr double kAmine_mmol = 26.9 * 0.98 / 119.167;

}  // namespace

TEST_CASE("what was weighed has charged, the others null", "[cli][json][weighed]") {
  const auto json = chargeOf();
  for (const char* key : {"amine", "nickel", "water"}) {
    INFO(key);
    const auto& charged = component(json, key)["charged"];
    REQUIRE(charged.is_object());
    checkNumbers(charged, "amount_mmol equiv mol_percent concentration_mol_L off_target_percent");
    for (const char* field : {"mass_mg", "volume_uL", "u_amount_mmol", "u_equiv", "u_mol_percent",
                              "u_concentration_mol_L"}) {
      CHECK(charged.contains(field));
    }
  }
  for (const char* key : {"acid", "mecn"}) CHECK(component(json, key)["charged"].is_null());
  checkNumbers(component(json, "amine")["charged"], "mass_mg u_amount_mmol u_equiv u_mol_percent");
  checkNulls(component(json, "amine")["charged"], "volume_uL");
  checkNumbers(component(json, "nickel")["charged"], "volume_uL");
  checkNulls(component(json, "nickel")["charged"], "mass_mg u_amount_mmol");  // no pipette is named
}

TEST_CASE("as charged follows from what was recorded", "[cli][json][weighed][identity]") {
  const auto json = chargeOf();
  const auto& amine = component(json, "amine")["charged"];
  CHECK(amine["mass_mg"].get<double>() == Approx(26.9).epsilon(1e-12));
  CHECK(amine["amount_mmol"].get<double>() == Approx(kAmine_mmol).epsilon(1e-5));
  CHECK(amine["equiv"].get<double>() == 1.0);
  CHECK(amine["u_equiv"].get<double>() == 0.0);
  const double target_mg = component(json, "amine")["target_mass_mg"].get<double>();
  CHECK(amine["off_target_percent"].get<double>() ==
        Approx(100.0 * (26.9 / target_mg - 1.0)).epsilon(1e-9));

  const auto& nickel = component(json, "nickel")["charged"];
  CHECK(nickel["amount_mmol"].get<double>() == Approx(0.0098).epsilon(1e-12));
  CHECK(nickel["equiv"].get<double>() == Approx(0.0098 / kAmine_mmol).epsilon(1e-5));
  CHECK(nickel["mol_percent"].get<double>() ==
        Approx(100.0 * nickel["equiv"].get<double>()).epsilon(1e-12));
  CHECK(nickel["off_target_percent"].get<double>() == Approx(-2.0).epsilon(1e-9));
  // recorded volumes take the place of the planned: 2 µL less of the stock, 5 µL more of water than
  // 100 µL
  CHECK(nickel["concentration_mol_L"].get<double>() == Approx(0.0098 / 2.003).epsilon(1e-9));
  CHECK(component(json, "nickel")["target_volume_uL"].get<double>() ==
        Approx(100.0).epsilon(1e-12));
}

TEST_CASE(
    "after a re-target everything that follows the limiting component follows what was weighed",
    "[cli][json][weighed][identity]") {
  const auto json = chargeOf({"--retarget"});
  CHECK(json["limiting_amount_mmol"].get<double>() == Approx(kAmine_mmol).epsilon(1e-5));
  CHECK(json["total_liquid_mL"].get<double>() ==
        Approx(2.0).epsilon(1e-12));  // it is given, so it stays
  CHECK(component(json, "acid")["amount_mmol"].get<double>() ==
        Approx(0.1 * kAmine_mmol).epsilon(1e-5));
  CHECK(component(json, "nickel")["target_volume_uL"].get<double>() ==
        Approx(500.0 * kAmine_mmol).epsilon(1e-5));
  const auto plain = chargeOf();
  CHECK(component(json, "amine")["target_mass_mg"] == component(plain, "amine")["target_mass_mg"]);
  CHECK(component(json, "nickel")["charged"]["off_target_percent"].get<double>() ==
        Approx(100.0 * (98.0 / (500.0 * kAmine_mmol) - 1.0)).epsilon(1e-4));
}

TEST_CASE("weighing and scale go together", "[cli][json][weighed][scale]") {
  const auto json = chargeOf({"--scale-to", "0.4 mmol"});
  CHECK(component(json, "nickel")["charged"]["off_target_percent"].get<double>() ==
        Approx(-51.0).epsilon(1e-9));
  CHECK(component(json, "acid")["charged"].is_null());
}

TEST_CASE("a weighed file without rows weighs nothing", "[cli][json][weighed]") {
  const auto json = chargeOf({}, "key,actual\n");
  for (const auto& each : json["components"]) CHECK(each["charged"].is_null());
}

TEST_CASE("a quantity by the wrong device is recorded without uncertainty and told",
          "[cli][json][weighed]") {
  const ScratchFolder folder;
  const std::string plan = folder.write(
      "plan.toml",
      changed(soundPlan(), "supply = { kind = \"solid\", assay = 0.98 }",
              "supply = { kind = \"liquid\", density = \"1.063 g/mL\", assay = 0.98 }"));
  const Ran ran = run(
      {"--json", "charge", plan, "--weighed", folder.write("w.csv", "key,actual\namine,23 uL\n")});
  REQUIRE(ran.status == 0);
  const auto json = ran.json();
  const auto& amine = component(json, "amine");
  CHECK_THAT(noticeCodes(amine), Catch::Matchers::Contains("other-device "));
  checkNulls(amine["charged"], "u_amount_mmol mass_mg");
  checkNumbers(amine["charged"], "amount_mmol volume_uL");
}
