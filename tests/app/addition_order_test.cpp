// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "app/sheet_bench.h"

using namespace vialkeeper;
using namespace vialkeeper::tests;

namespace {

std::string orderOf(const std::string& plan) {
  const app::PlannedRun run = planned(plan);
  std::string keys;
  for (const std::size_t i : app::additionOrder(run)) keys += run.plan.components[i].key + " ";
  return keys;
}

std::string listed(const std::string& list) {
  return replaced(sheetPlan(), "series = \"bases\"\n",
                  "series = \"bases\"\naddition_order = " + list + "\n");
}

constexpr const char* kGas = R"([[component]]
key = "co"
role = "gas"
name = "carbon monoxide"
formula = "CO"
equiv = 0.1
supply = { kind = "gas", pressure = "1.0 bar", temperature = "21 degC" }
)";

}  // namespace

TEST_CASE("solids come first, then neat liquids, stocks, solvents and gases", "[app][sheet]") {
  CHECK(orderOf(sheetPlan()) == "amine lutidine standard nickel mecn water ");
  const std::string first = "[[component]]\nkey = \"mecn\"";
  CHECK(orderOf(replaced(sheetPlan(), first, kGas + first)) ==
        "amine lutidine standard nickel mecn water co ");
}

TEST_CASE("what the plan lists goes before the rule, the rest follows it", "[app][sheet]") {
  CHECK(orderOf(listed("[\"water\", \"nickel\"]")) == "water nickel amine lutidine standard mecn ");
  CHECK(orderOf(listed("[]")) == "amine lutidine standard nickel mecn water ");
  CHECK(
      orderOf(listed("[\"water\", \"mecn\", \"standard\", \"amine\", \"lutidine\", \"nickel\"]")) ==
      "water mecn standard amine lutidine nickel ");
}

TEST_CASE("the sheet's rows stand in the order of addition", "[app][sheet]") {
  const auto sheet = app::weighingSheet(planned(listed("[\"nickel\"]")));
  REQUIRE(sheet.rows.size() == 6);
  CHECK(sheet.rows[0].name == "nickel(II) chloride hexahydrate");
  CHECK(sheet.rows[1].name == "indoline");
  CHECK(sheet.rows[5].name == "water");
}
