// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/command_bench.h"
#include "cli/json_fields.h"

using namespace vialkeeper::tests;

namespace {

/// The sound plan with one component more of every kind that it lacks.
std::string planOfAllKinds() {
  return soundPlan() + R"(
[[component]]
key = "co"
role = "gas"
name = "carbon monoxide"
formula = "CO"
amount = "0.050 mmol"
supply = { kind = "gas", pressure = "1.0 bar", temperature = "21 degC" }
[[component]]
key = "lutidine"
role = "base"
name = "2,6-lutidine"
formula = "C7H9N"
cas = "108-48-5"
equiv = 0.2
supply = { kind = "liquid", density = "0.920 g/mL", assay = 0.99 }
device = "pipette-10uL"
[[component]]
key = "support"
role = "other"
name = "palladium on a support of unknown mass"
mass = "5 mg"
)";
}

nlohmann::json chargeOf(const std::string& plan, const std::vector<std::string>& options = {}) {
  const ScratchFolder folder;
  std::vector<std::string> arguments = {"--json", "charge", folder.write("plan.toml", plan)};
  arguments.insert(arguments.end(), options.begin(), options.end());
  const Ran ran = run(arguments);
  INFO(ran.err);
  REQUIRE(ran.status == 0);
  CHECK(ran.err.empty());
  checkOneObject(ran.out);
  return ran.json();
}

}  // namespace

TEST_CASE("charge answers with every field of the contract", "[cli][json][charge]") {
  const auto json = chargeOf(planOfAllKinds());
  checkTexts(json, "limiting");
  checkNumbers(json, "total_liquid_mL limiting_amount_mmol fill_fraction");
  checkNotices(json);
  REQUIRE(json["components"].is_array());
  REQUIRE(json["components"].size() == 8);
  for (const auto& each : json["components"]) {
    INFO(each["key"]);
    checkTexts(each, "key role name");
    for (const char* field :
         {"molar_mass_g_mol", "amount_mmol", "u_amount_mmol", "equiv", "mol_percent",
          "concentration_mol_L", "target_mass_mg", "target_volume_uL", "formula"}) {
      INFO(field);
      REQUIRE(each.contains(field));
    }
    checkNumbers(each, "tolerance_percent");
    checkNotices(each);
    CHECK(!each.contains("charged"));
    REQUIRE(each["trail"].is_array());
    for (const auto& step : each["trail"]) CHECK(step.is_string());
    for (const auto& notice : each["notices"])
      CHECK(notice["at"] == "component." + each["key"].get<std::string>());
  }
  CHECK(json["components"][0]["key"] == "amine");  // in the plan's order
  CHECK(json["components"][7]["key"] == "support");
}

TEST_CASE("solids have a target mass, stocks and gases a volume, neat liquids both",
          "[cli][json][charge]") {
  const auto json = chargeOf(planOfAllKinds());
  for (const char* solid : {"amine", "acid", "support"}) {
    INFO(solid);
    checkNumbers(component(json, solid), "target_mass_mg");
    checkNulls(component(json, solid), "target_volume_uL");
  }
  for (const char* byVolume : {"nickel", "co"}) {
    INFO(byVolume);
    checkNumbers(component(json, byVolume), "target_volume_uL");
    checkNulls(component(json, byVolume), "target_mass_mg");
  }
  for (const char* liquid : {"lutidine", "mecn", "water"}) {
    INFO(liquid);
    checkNumbers(component(json, liquid), "target_mass_mg target_volume_uL");
  }
}

TEST_CASE("an undetermined number is null with a notice", "[cli][json][charge]") {
  const auto json = chargeOf(planOfAllKinds());
  const auto& support = component(json, "support");
  checkNulls(
      support,
      "molar_mass_g_mol amount_mmol u_amount_mmol equiv mol_percent concentration_mol_L formula");
  CHECK_THAT(noticeCodes(support), Catch::Matchers::Contains("undetermined "));
  CHECK(support["target_mass_mg"].get<double>() == Approx(5.0).epsilon(1e-12));
  checkNumbers(component(json, "amine"), "u_amount_mmol");
  checkNulls(component(json, "acid"),
             "u_amount_mmol");  // no device, so no uncertainty: told in no-device
  CHECK_THAT(noticeCodes(json), Catch::Matchers::Contains("no-device "));
  checkNulls(component(json, "co"), "concentration_mol_L");  // it is not in the liquid
}

// calculations.md 1, worked by hand with M(C8H9N) = 119.167 g/mol, M(C5H10O2) = 102.133 g/mol,
// M(C7H9N) = 107.156 g/mol; R = 8.314462618 J/(mol K).
TEST_CASE("the targets of the sound plan are those worked by hand",
          "[cli][json][charge][identity]") {
  const auto json = chargeOf(planOfAllKinds());
  const auto number = [&](const char* key, const char* field) {
    return component(json, key)[field].get<double>();
  };
  CHECK(json["limiting"] == "amine");
  CHECK(json["limiting_amount_mmol"].get<double>() == 0.2);
  CHECK(json["total_liquid_mL"].get<double>() == Approx(2.0).epsilon(1e-14));
  CHECK(json["fill_fraction"].get<double>() == Approx(2.0 / 11.6).epsilon(1e-12));
  CHECK(number("amine", "equiv") == 1.0);
  CHECK(number("amine", "concentration_mol_L") == Approx(0.1).epsilon(1e-12));
  CHECK(number("amine", "target_mass_mg") == Approx(0.2 * 119.167 / 0.98).epsilon(1e-5));
  CHECK(number("nickel", "mol_percent") == 5.0);
  CHECK(number("nickel", "target_volume_uL") == Approx(100.0).epsilon(1e-12));
  CHECK(number("acid", "target_mass_mg") == Approx(0.02 * 102.133).epsilon(1e-5));
  CHECK(number("co", "target_volume_uL") ==
        Approx(0.05e-3 * 8.314462618 * 294.15 / 1e5 * 1e9).epsilon(1e-9));
  const double lutidine_uL = 0.04 * 107.156 / 0.99 / 0.920;
  CHECK(number("lutidine", "target_volume_uL") == Approx(lutidine_uL).epsilon(1e-5));
  CHECK(number("mecn", "target_volume_uL") == Approx(0.9 * (2000.0 - lutidine_uL)).epsilon(1e-6));
  CHECK(number("water", "target_volume_uL") ==
        Approx(0.1 * (2000.0 - lutidine_uL) - 100.0).epsilon(1e-6));
  CHECK(number("mecn", "tolerance_percent") == 5.0);
  CHECK(number("acid", "tolerance_percent") == 2.0);
}

TEST_CASE("a weighing below the minimum comes with a stock that would do", "[cli][json][charge]") {
  const auto json = chargeOf(soundPlan());
  const auto& amine = component(json, "amine");  // 24 mg where the balance wants 40 mg
  CHECK_THAT(noticeCodes(amine), Catch::Matchers::Contains("minimum-weight ") &&
                                     Catch::Matchers::Contains("stock-proposed "));
  const auto& stock = amine["proposed_stock"];
  checkTexts(stock, "solvent pipette");
  checkNumbers(stock, "concentration_mol_L flask_mL stock_mass_mg transfer_uL");
  CHECK(stock["solvent"] == "mecn");
  CHECK(stock["stock_mass_mg"].get<double>() >= 40.0);
  CHECK(stock["concentration_mol_L"].get<double>() * stock["transfer_uL"].get<double>() ==
        Approx(0.2e3).epsilon(1e-9));
  CHECK(!component(json, "acid")
             .contains("proposed_stock"));  // no balance is named, so none is judged
}

TEST_CASE("a plan without a vial has no fill", "[cli][json][charge]") {
  const auto json =
      chargeOf(changed(soundPlan(), "[vial]\nvolume = \"11.6 mL\"\nderating = 0.5\n", ""));
  checkNulls(json, "fill_fraction");
}

TEST_CASE("a vial more than half full is told", "[cli][json][charge]") {
  const auto json = chargeOf(changed(soundPlan(), "volume = \"11.6 mL\"", "volume = \"3.9 mL\""));
  CHECK_THAT(noticeCodes(json), Catch::Matchers::Contains("fill-above-half "));
  CHECK_THAT(
      noticeCodes(chargeOf(changed(soundPlan(), "volume = \"11.6 mL\"", "volume = \"4.1 mL\""))),
      !Catch::Matchers::Contains("fill-above-half"));
}

TEST_CASE("a scaled plan keeps ratios and concentrations", "[cli][json][charge][scale][identity]") {
  const auto plain = chargeOf(planOfAllKinds());
  const double mass_mg = component(plain, "amine")["target_mass_mg"].get<double>();
  for (const std::string& scale :
       {std::string("0.4 mmol"), std::string("400 umol"), std::to_string(2.0 * mass_mg) + " mg"}) {
    INFO(scale);
    const auto doubled = chargeOf(planOfAllKinds(), {"--scale-to", scale});
    CHECK(doubled["limiting_amount_mmol"].get<double>() == Approx(0.4).epsilon(1e-7));
    CHECK(doubled["total_liquid_mL"].get<double>() == Approx(4.0).epsilon(1e-7));
    for (const auto& each : plain["components"]) {
      INFO(each["key"]);
      const auto& other = component(doubled, each["key"].get<std::string>());
      for (const char* field : {"amount_mmol", "target_mass_mg", "target_volume_uL"}) {
        CHECK(other[field].is_null() == each[field].is_null());
        if (each[field].is_null()) continue;
        CHECK(other[field].get<double>() == Approx(2.0 * each[field].get<double>()).epsilon(1e-7));
      }
      for (const char* field : {"equiv", "mol_percent", "concentration_mol_L"}) {
        if (each[field].is_null()) continue;
        CHECK(other[field].get<double>() == Approx(each[field].get<double>()).epsilon(1e-7));
      }
    }
  }
}

TEST_CASE("a plan scaled to another vial keeps its fill", "[cli][json][charge][scale][identity]") {
  const auto plain = chargeOf(soundPlan());
  const auto moved = chargeOf(soundPlan(), {"--scale-to-vial", "23.2 mL"});
  CHECK(moved["fill_fraction"].get<double>() ==
        Approx(plain["fill_fraction"].get<double>()).epsilon(1e-12));
  CHECK(moved["limiting_amount_mmol"].get<double>() == Approx(0.4).epsilon(1e-12));
}

TEST_CASE("the same plan gives the same bytes wherever --json stands", "[cli][json][charge]") {
  const ScratchFolder folder;
  const std::string plan = folder.write("plan.toml", planOfAllKinds());
  const Ran first = run({"--json", "charge", plan});
  REQUIRE(first.status == 0);
  CHECK(run({"--json", "charge", plan}).out == first.out);
  CHECK(run({"charge", "--json", plan}).out == first.out);
  CHECK(run({"charge", plan, "--json"}).out == first.out);
  const Ran table = run({"charge", plan});
  CHECK(table.status == 0);
  CHECK(!nlohmann::json::accept(table.out));
  CHECK(run({"charge", plan}).out == table.out);
  CHECK_THAT(run({"charge", plan, "--trail"}).out, Catch::Matchers::StartsWith(table.out));
}
