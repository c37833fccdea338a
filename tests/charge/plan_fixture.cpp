// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/plan_fixture.h"

#include <catch2/catch.hpp>

#include <algorithm>
#include <array>

#include "charge/plan_reader.h"

namespace vialkeeper::tests {
namespace {

/// No test of the core loads the structure module.
std::expected<chem::Structure, chem::StructureFault> noStructures(std::string_view) {
  return std::unexpected(
      chem::StructureFault{.what = "no structures here", .mend = "give a formula"});
}

template <class T>
T required(text::Checked<T> checked) {
  if (!checked) {
    for (const std::string& line : toLines(checked.error())) UNSCOPED_INFO(line);
  }
  REQUIRE(checked);
  return *std::move(checked);
}

}  // namespace

std::string planText(std::string_view liquid, const std::vector<std::string>& components,
                     std::string_view head) {
  std::string text = "format = \"vialkeeper-plan/1\"\n[reaction]\nlimiting = \"a\"\n[liquid]\n";
  text += std::string(liquid) + "\n" + std::string(head) + "\n";
  for (const std::string& component : components) text += "[[component]]\n" + component + "\n";
  return text;
}

charge::Plan readGoodPlan(const std::string& text) {
  INFO(text);
  return required(charge::readPlan(text, "plan.toml"));
}

charge::Substances substancesOf(const charge::Plan& plan) {
  return required(charge::resolveSubstances(plan, noStructures));
}

charge::Charge chargeOf(const charge::Plan& plan) {
  return required(charge::computeCharge(plan, substancesOf(plan)));
}

charge::Charge chargeOf(const std::string& text) {
  INFO(text);
  return chargeOf(readGoodPlan(text));
}

text::Faults faultsOfPlan(const std::string& text) {
  INFO(text);
  const auto plan = charge::readPlan(text, "plan.toml");
  if (!plan) return plan.error();
  const auto substances = charge::resolveSubstances(*plan, noStructures);
  if (!substances) return substances.error();
  const auto charge = charge::computeCharge(*plan, *substances);
  REQUIRE_FALSE(charge);
  return charge.error();
}

charge::Charge weighed(const charge::Plan& plan, const std::vector<Recorded>& recorded,
                       charge::Retarget retarget) {
  charge::Weighings weighings;
  for (const Recorded& entry : recorded) {
    weighings.push_back({.key = entry.key, .actual = entry.actual, .asWritten = {}, .line = 0});
  }
  return required(charge::chargeAsWeighed(plan, substancesOf(plan), weighings, retarget));
}

const charge::ComponentCharge& at(const charge::Charge& charge, std::string_view key) {
  const charge::ComponentCharge* component = charge.find(key);
  REQUIRE(component != nullptr);
  return *component;
}

bool hasNotice(const text::Notices& notices, std::string_view code) {
  return std::ranges::find(notices, code, &text::Notice::code) != notices.end();
}

std::vector<std::string> toLines(const text::Faults& faults) {
  std::vector<std::string> lines;
  for (const text::Fault& fault : faults) lines.push_back(text::toLine(fault));
  return lines;
}

}  // namespace vialkeeper::tests
