// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include <algorithm>
#include <random>

#include "charge/plan_fixture.h"
#include "charge/plan_reader.h"
#include "charge/random_plan.h"

using namespace vialkeeper;
using charge::readPlan;

namespace {

using Place = std::pair<int, std::string>;

std::vector<Place> placesOf(const std::string& text) {
  const auto plan = readPlan(text, "p.toml");
  REQUIRE_FALSE(plan);
  std::vector<Place> places;
  for (const auto& fault : plan.error()) {
    UNSCOPED_INFO(text::toLine(fault));
    places.emplace_back(fault.line, fault.field);
  }
  return places;
}

}  // namespace

TEST_CASE("all faults of a plan are told at once, in the order of its lines", "[plan]") {
  const std::string text = R"(format = "vialkeeper-plan/1"
titel = "x"
[reaction]
limiting = "amin"
[vial]
volume = "11,6 mL"
derating = 2
[seal]
atmosphere = { N2 = 0.5 }
temperature = "21"
pressure = "1.013 bar"
[liquid]
total = 2.0
total = "3 mL"
[[component]]
key = "amine"
role = "substrate"
name = "indoline"
cas = "496-15-2"
amount = 0.2 mmol
[[component]]
key = "amine"
role = "acid"
name = "acid"
equiv = nan
device = "balance"
[[component]]
role = "solvent"
name = "water"
share = 1
colour = "blue"
)";
  CHECK(placesOf(text) == std::vector<Place>{{2, "titel"},
                                             {4, "reaction.limiting"},
                                             {6, "vial.volume"},
                                             {7, "vial.derating"},
                                             {9, "seal.atmosphere"},
                                             {10, "seal.temperature"},
                                             {13, "liquid.total"},
                                             {14, "total"},
                                             {19, "component.amine.cas"},
                                             {20, "amount"},
                                             {22, "component[2].key"},
                                             {25, "component.amine.equiv"},
                                             {26, "component.amine.device"},
                                             {27, "component[3].key"},
                                             {31, "component[3].colour"}});
}

TEST_CASE("a repeated section does not hide the other faults of the file", "[plan]") {
  const std::string text = R"(format = "vialkeeper-plan/1"
[reaction]
limiting = "a"
[liquid]
total = "2 bar"
[vial]
volume = "10 mL"
[vial]
volume = "11 mL"
[[component]]
key = "a"
role = "substrate"
name = "a"
amount = "1 mmol"
)";
  CHECK(placesOf(text) == std::vector<Place>{{5, "liquid.total"}, {8, "vial"}});
}

TEST_CASE("an empty file lacks its format, reaction, liquid and components", "[plan]") {
  const auto places = placesOf("");
  std::vector<std::string> fields;
  for (const auto& [line, field] : places) fields.push_back(field);
  CHECK(fields == std::vector<std::string>{"format", "reaction", "liquid", "component"});
}

TEST_CASE("a plan in another encoding or of more than a mebibyte is refused as a whole", "[plan]") {
  using namespace std::string_literals;
  for (const auto& text :
       {"\xFF\xFE"
        "f\0"s,
        "format = \"\0\""s, "title = \"5 \xB5L\"\n"s, std::string((1U << 20U) + 1, ' ')}) {
    CHECK(placesOf(text).size() == 1);
  }
  CHECK(readPlan("\xEF\xBB\xBF" + tests::samplePlanText(), "p"));
  std::string crlf;
  for (const char c : tests::samplePlanText()) crlf += c == '\n' ? "\r\n"s : std::string(1, c);
  CHECK(readPlan(crlf, "p"));
}

TEST_CASE(
    "3,000 mutated plans are read or refused with places, and those read are charged or refused",
    "[plan][identity]") {
  const std::string sample = tests::samplePlanText();
  std::mt19937_64 random(31);
  std::size_t good = 0;
  std::size_t refused = 0;
  for (int round = 0; round < 3000; ++round) {
    const std::string text =
        tests::mutated(round % 3 == 0 ? tests::randomPlanText(random() % 50) : sample, random);
    const auto lines = 1 + std::ranges::count(text, '\n');
    const auto plan = readPlan(text, "p.toml");
    if (!plan) {
      ++refused;
      REQUIRE_FALSE(plan.error().empty());
      REQUIRE(std::ranges::is_sorted(plan.error(), {}, &text::Fault::line));
      for (const auto& fault : plan.error()) {
        REQUIRE(fault.line >= 0);
        REQUIRE(fault.line <= lines);
        REQUIRE_FALSE(fault.what.empty());
        REQUIRE_FALSE(fault.mend.empty());
        REQUIRE(text::toLine(fault).find('\n') == std::string::npos);
      }
      continue;
    }
    ++good;
    const auto substances = charge::resolveSubstances(
        *plan, [](std::string_view) -> std::expected<chem::Structure, chem::StructureFault> {
          return std::unexpected(chem::StructureFault{"no structures here", "give a formula"});
        });
    if (!substances) continue;
    const auto charge = charge::computeCharge(*plan, *substances);
    if (!charge) {
      REQUIRE_FALSE(charge.error().empty());
      continue;
    }
    for (const auto& component : charge->components) {
      if (component.targetMass) REQUIRE(component.targetMass->si() >= 0.0);
      if (component.targetVolume) REQUIRE(component.targetVolume->si() >= 0.0);
    }
  }
  CHECK(good > 200);
  CHECK(refused > 1000);
}
