// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "charge/plan_edit.h"
#include "charge/plan_fixture.h"

namespace vialkeeper {
namespace {

const std::vector<charge::PlanField> kPivalicAcid = {
    {"role", "acid"},         {"name", "pivalic acid"}, {"formula", "C5H10O2"},
    {"cas", "75-98-9"},       {"equiv", "1.5"},         {"supply", "{ kind = \"solid\" }"},
    {"hazards", "[\"H315\"]"}};

std::size_t count(const std::string& text, std::string_view part) {
  std::size_t found = 0;
  for (std::size_t at = text.find(part); at != std::string::npos; at = text.find(part, at + 1))
    ++found;
  return found;
}

TEST_CASE("a component more is one that the plan's reader reads",
          "[charge][plan-edit][regression]") {
  const std::string before = tests::samplePlanText();
  const auto after = charge::withComponent(before, "piv", kPivalicAcid);
  REQUIRE(after);
  const charge::Plan plan = tests::readGoodPlan(*after);
  CHECK(plan.components.size() == tests::readGoodPlan(before).components.size() + 1);
  const charge::ComponentPlan& added = plan.components.back();
  CHECK(added.key == "piv");
  CHECK(added.name == "pivalic acid");
  CHECK(added.identity.cas == "75-98-9");
  CHECK(added.amount.basis == charge::Basis::kEquiv);
  CHECK(added.amount.value == 1.5);
  CHECK(added.hazards == std::vector<std::string>{"H315"});
}

TEST_CASE("what was added and is taken out again leaves the text as it was",
          "[charge][plan-edit][identity]") {
  const std::string before = tests::samplePlanText();
  const auto added = charge::withComponent(before, "piv", kPivalicAcid);
  REQUIRE(added);
  CHECK(charge::withoutComponent(*added, "piv") == before);

  // A section behind the components stays where it is, and so do its comments.
  const std::string more = before + "\n# about the gauge\n[liquid2]\n";
  const auto between = charge::withComponent(more, "piv", kPivalicAcid);
  REQUIRE(between);
  CHECK(between->find("pivalic") < between->find("# about the gauge"));
  CHECK(charge::withoutComponent(*between, "piv") == more);
}

TEST_CASE("a component goes with its own comments and with its place in the order",
          "[charge][plan-edit][regression]") {
  const std::string text = R"(addition_order = ["pc", "nickel", 'acid']  # as the paper has it

[[component]]
key = "pc"
note = "a"

# stays: stands apart

# the salt
# from the glovebox
[[component]]
key = "nickel" # comment of a field
[component.supply]
kind = "solid"

# the acid
[[component]]
key = "acid"
)";
  const auto without = charge::withoutComponent(text, "nickel");
  REQUIRE(without);
  CHECK(*without == R"(addition_order = ["pc", 'acid']  # as the paper has it

[[component]]
key = "pc"
note = "a"

# stays: stands apart

# the acid
[[component]]
key = "acid"
)");
  const auto last = charge::withoutComponent(*without, "acid");
  REQUIRE(last);
  CHECK(*last == R"(addition_order = ["pc"]  # as the paper has it

[[component]]
key = "pc"
note = "a"

# stays: stands apart
)");
}

TEST_CASE("a list of the order over several lines stays a list",
          "[charge][plan-edit][regression]") {
  std::string text =
      "addition_order = [\n  \"amine\",\n  \"nickel\",\n]\n" + tests::samplePlanText();
  const auto without = charge::withoutComponent(text, "nickel");
  REQUIRE(without);
  CHECK(tests::readGoodPlan(*without).additionOrder == std::vector<std::string>{"amine"});
}

TEST_CASE("every component but the limiting one and solvents of stocks can go",
          "[charge][plan-edit][identity]") {
  const std::string text = tests::samplePlanText();
  const charge::Plan plan = tests::readGoodPlan(text);
  for (const charge::ComponentPlan& component : plan.components) {
    const auto without = charge::withoutComponent(text, component.key);
    REQUIRE(without);
    INFO(*without);
    CHECK(count(*without, "[[component]]") == plan.components.size() - 1);
    CHECK(count(*without, "\n\n\n") == 0);
    CHECK(without->ends_with("\n"));
    if (component.key == plan.limiting || component.isSolvent()) continue;
    CHECK(tests::readGoodPlan(*without).components.size() == plan.components.size() - 1);
  }
}

TEST_CASE("component edits refuse what would break the text", "[charge][plan-edit][regression]") {
  const std::string text = tests::samplePlanText();
  const auto told = [](const auto& done) {
    REQUIRE_FALSE(done);
    return tests::toLines(done.error()).front();
  };
  CHECK(told(charge::withComponent(text, "nickel", kPivalicAcid)).find("taken") !=
        std::string::npos);
  CHECK(told(charge::withComponent(text, "", kPivalicAcid)).find("no key") != std::string::npos);
  CHECK(told(charge::withComponent(text, "a", {{"name", "two\nlines"}}))
            .starts_with("component.a.name"));
  CHECK(told(charge::withComponent("a = [", "a", {})).find("plan:1") != std::string::npos);
  CHECK(told(charge::withoutComponent(text, "xenon")).find("no component") != std::string::npos);
  CHECK(told(charge::withoutComponent("component = [ { key = \"a\" } ]", "a")).find("head") !=
        std::string::npos);
}

TEST_CASE("text that looks like a number stays text where a field is text",
          "[charge][plan-edit][regression]") {
  const auto text = charge::withComponent("", "12", {{"name", "4711"}, {"equiv", "1"}});
  REQUIRE(text);
  CHECK(*text == "\n[[component]]\nkey = \"12\"\nname = \"4711\"\nequiv = 1\n");
}

TEST_CASE("a free key says what it is and is free", "[charge][plan-edit][regression]") {
  CHECK(charge::freeKey("pivalic acid", {}) == "pivalic-acid");
  CHECK(charge::freeKey("nickel(II) bromide glyme", {}) == "nickel-ii-bromide-glyme");
  CHECK(charge::freeKey("pivalic acid", {"pivalic-acid", "pivalic-acid-2"}) == "pivalic-acid-3");
  CHECK(charge::freeKey("…", {"component"}) == "component-2");
  CHECK(charge::freeKey(std::string(200, 'x'), {}).size() == 32);
}

}  // namespace
}  // namespace vialkeeper
