// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>
#include <algorithm>
#include <catch2/catch.hpp>
#include <filesystem>

#include "charge/plan_reader.h"
#include "chem/hazard_statements.h"
#include "cli/command_bench.h"
#include "cli/json_fields.h"

using namespace vialkeeper;
using namespace vialkeeper::tests;

namespace {

std::vector<std::string> runTemplates() {
  std::vector<std::string> files;
  for (const auto& entry :
       std::filesystem::directory_iterator(VIALKEEPER_SOURCE_DIR "/templates/runs")) {
    if (entry.path().extension() == ".toml") files.push_back(entry.path().string());
  }
  std::ranges::sort(files);
  return files;
}

charge::Plan planOf(const std::string& file) {
  const auto plan = charge::readPlan(bytesOf(file), file);
  REQUIRE(plan);
  return *plan;
}

nlohmann::json chargeOf(std::vector<std::string> arguments) {
  arguments.insert(arguments.begin(), {"--json", "charge"});
  const Ran ran = run(arguments);
  INFO(ran.err);
  REQUIRE(ran.status == 0);
  checkOneObject(ran.out);
  return ran.json();
}

/// Weighed just as planned: masses where a mass is all there is, else volumes.
std::string weighedAsPlanned(const nlohmann::json& charge) {
  std::string csv = "key,actual\n";
  for (const auto& each : charge["components"]) {
    const bool byVolume = !each["target_volume_uL"].is_null();
    csv += fmt::format("{},{} {}\n", each["key"].get<std::string>(),
                       each[byVolume ? "target_volume_uL" : "target_mass_mg"].get<double>(),
                       byVolume ? "uL" : "mg");
  }
  return csv;
}

}  // namespace

TEST_CASE("there are run templates, and each says in its first lines that it is invented",
          "[templates]") {
  const auto files = runTemplates();
  CHECK(files.size() >= 7);
  for (const std::string& file : files) {
    INFO(file);
    const std::string text = bytesOf(file);
    CHECK(text.starts_with("# "));
    CHECK(text.substr(0, text.find("format")).find("invented") != std::string::npos);
  }
}

TEST_CASE("every run template passes the charge, scaled and weighed too",
          "[templates][structures]") {
  for (const std::string& file : runTemplates()) {
    INFO(file);
    const auto planned = chargeOf({file});
    CHECK(run({"charge", file, "--trail"}).status == 0);
    for (const char* amount : {"0.1 mmol", "0.35 mmol"}) {
      const auto scaled = chargeOf({file, "--scale-to", amount});
      CHECK(scaled["fill_fraction"].get<double>() < 1.0);
    }
    const ScratchFolder folder;
    const std::string csv = folder.write("w.csv", weighedAsPlanned(planned));
    const auto weighed = chargeOf({file, "--weighed", csv});
    const auto retargeted = chargeOf({file, "--weighed", csv, "--retarget"});
    CHECK(retargeted["limiting_amount_mmol"].get<double>() ==
          Approx(planned["limiting_amount_mmol"].get<double>()).epsilon(1e-9));
    for (const auto& each : weighed["components"]) {
      INFO(each["key"]);
      CHECK(each["charged"]["off_target_percent"].get<double>() == Approx(0.0).margin(1e-9));
      CHECK(each["charged"]["amount_mmol"].get<double>() ==
            Approx(each["amount_mmol"].get<double>()).epsilon(1e-9));
    }
  }
}

TEST_CASE("every run template has title, series, vial rating, devices and hazards", "[templates]") {
  for (const std::string& file : runTemplates()) {
    INFO(file);
    const charge::Plan plan = planOf(file);
    CHECK(!plan.title.empty());
    CHECK(!plan.series.empty());
    CHECK(!plan.gases.empty());
    REQUIRE(plan.vial);
    CHECK(!plan.vial->name.empty());
    REQUIRE(plan.vial->ratedGauge);
    CHECK(plan.vial->ratedGauge->bar() <= 5.0);
    CHECK(plan.seal);
    std::size_t withHazards = 0;
    for (const auto& component : plan.components) {
      INFO(component.key);
      CHECK(component.device);
      CHECK(!component.identity.cas.empty());
      withHazards += component.hazards.empty() ? 0 : 1;
      for (const std::string& code : component.hazards) CHECK(chem::hazardStatement(code));
    }
    CHECK(withHazards >= 2);
  }
}

TEST_CASE("no run template fills its vial more than half or takes a number from memory",
          "[templates][structures]") {
  for (const std::string& file : runTemplates()) {
    INFO(file);
    const auto json = chargeOf({file});
    std::string codes = noticeCodes(json);
    for (const auto& each : json["components"]) codes += noticeCodes(each);
    for (const char* unwanted :
         {"fill-above-half", "volume-not-filled", "recalled-value", "outside-validity", "no-device",
          "taken-as-exact", "below-pipette-range", "undetermined"}) {
      CHECK_THAT(codes, !Catch::Matchers::Contains(unwanted));
    }
  }
}

TEST_CASE("the same-excess pair has one excess and the same catalysts",
          "[templates][structures][identity]") {
  const std::string folder = VIALKEEPER_SOURCE_DIR "/templates/runs/";
  const auto standard = chargeOf({folder + "same-excess-standard.toml"});
  const auto second = chargeOf({folder + "same-excess-second.toml"});
  const auto concentration = [](const nlohmann::json& charge, const char* key) {
    return component(charge, key)["concentration_mol_L"].get<double>();
  };
  const auto excess = [&](const nlohmann::json& charge) {
    return concentration(charge, "indole") - concentration(charge, "amine");
  };
  CHECK(excess(second) == Approx(excess(standard)).epsilon(1e-9));
  CHECK(concentration(second, "amine") < concentration(standard, "amine"));
  for (const char* key : {"pc", "nickel"}) {
    CHECK(concentration(second, key) == Approx(concentration(standard, key)).epsilon(1e-9));
  }
}

TEST_CASE("the four vials of the screen differ in their acid alone", "[templates]") {
  const std::string folder = VIALKEEPER_SOURCE_DIR "/templates/runs/";
  const charge::Plan first = planOf(folder + "screen-acid-1.toml");
  std::vector<std::string> acids;
  for (int vial = 1; vial <= 4; ++vial) {
    const charge::Plan plan = planOf(fmt::format("{}screen-acid-{}.toml", folder, vial));
    CHECK(plan.series == first.series);
    REQUIRE(plan.components.size() == first.components.size());
    for (std::size_t i = 0; i < plan.components.size(); ++i) {
      const auto& component = plan.components[i];
      CHECK(component.amount.value == first.components[i].amount.value);
      CHECK(
          (component.isSolvent() || std::holds_alternative<charge::StockSupply>(component.supply)));
      if (component.key != "acid") CHECK(component.name == first.components[i].name);
    }
    acids.push_back(plan.find("acid")->name);
  }
  std::ranges::sort(acids);
  CHECK(std::ranges::adjacent_find(acids) == acids.end());
}

TEST_CASE("the blank has no light", "[templates]") {
  const charge::Plan plan = planOf(VIALKEEPER_SOURCE_DIR "/templates/runs/dark-blank.toml");
  REQUIRE(plan.irradiation.duration);
  CHECK(plan.irradiation.duration->seconds() == 0.0);
  CHECK(!plan.irradiation.wavelength);
}
