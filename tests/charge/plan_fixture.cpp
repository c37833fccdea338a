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
  return std::unexpected(chem::StructureFault{.what = "no structures here", .mend = "give a formula"});
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

std::string samplePlanText() {
  return R"(format = "vialkeeper-plan/1"
title  = "Indoline dehydrogenation, acid additive 3"
series = "acid additives"
date = "2026-03-04"
chemist = "A. N. Other"

[reaction]
limiting = "amine"
products = [ { key = "imine", name = "indole", formula = "C8H7N", per_limiting = 1.0 } ]
gases    = [ { species = "H2", per_limiting = 1.0 } ]

[vial]
name = "10 mL crimp vial"
volume = "11.6 mL"
u_volume = "0.1 mL"
displaced = "0.15 mL"
rated_gauge = "2.0 bar"
derating = 0.5

[seal]
atmosphere = { N2 = 0.9, O2 = 0.1 }
temperature = "21 degC"
pressure = "1.013 bar"
saturated = true
ambient = "1.01325 bar"

[irradiation]
lamp = "LED 440"
wavelength = "440 nm"
temperature = "35 degC"
duration = "20 h"

[liquid]
total = "2.0 mL"

[instruments]
u_pressure = "5 mbar"
u_pressure_shared = "2 mbar"
u_temperature = "0.5 K"

[[component]]
key = "amine"
role = "substrate"
name = "indoline"
formula = "C8H9N"
cas = "496-15-1"
amount = "0.200 mmol"
supply = { kind = "liquid", density = "1.063 g/mL", assay = 0.99 }
device = "balance-0.01mg"
hazards = ["H302", "H315"]

[[component]]
key = "pc"
role = "photocatalyst"
name = "4CzIPN"
formula = "C56H32N6"
mol_percent = 1
supply = { kind = "stock", concentration = "4.0 mM", solvent = "mecn" }
device = "pipette-1000uL"

[[component]]
key = "nickel"
role = "cocatalyst"
name = "nickel(II) bromide glyme"
formula = "C4H10Br2NiO2"
mol_percent = 5
supply = { kind = "solid", assay = 0.97 }
device = { kind = "balance", readability = "0.01 mg", repeatability = "0.02 mg" }
tolerance_percent = 3

[[component]]
key = "mecn"
role = "solvent"
name = "acetonitrile"
share = 9
device = "pipette-1000uL"

[[component]]
key = "water"
role = "solvent"
name = "water"
share = 1
)";
}

std::string planText(std::string_view liquid, const std::vector<std::string>& components, std::string_view head) {
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

charge::Charge weighed(const charge::Plan& plan, const std::vector<Recorded>& recorded, charge::Retarget retarget) {
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

std::string mutated(const std::string& text, std::mt19937_64& random) {
  static const std::array<std::string, 26> pieces = {
      "\"", "[", "]", "[[", "]]", "{", "}", "=", ",", ".", "#", "\n", "\r\n", "'''", "\"\"\"", "\\",
      "0",  "-", "e9", "nan", "inf", " mg", "µ", "\xC2", "\x01", "share = 1\n"};
  std::string bytes = text;
  const std::size_t edits = random() % 2 == 0 ? 1 : 1 + random() % 4;
  for (std::size_t edit = 0; edit < edits && !bytes.empty(); ++edit) {
    const std::size_t place = random() % bytes.size();
    const std::size_t length = 1 + random() % 12;
    switch (random() % 8) {
      case 0: bytes.erase(place, length); break;
      case 1: bytes.insert(place, pieces[random() % pieces.size()]); break;
      case 2: bytes.insert(place, bytes.substr(random() % bytes.size(), length)); break;
      case 3: bytes[place] = static_cast<char>(random() % 256); break;
      case 4: bytes.replace(place, length, pieces[random() % pieces.size()]); break;
      case 5:
      case 6: {  // another digit
        const std::size_t digit = bytes.find_first_of("0123456789", place);
        if (digit != std::string::npos) bytes[digit] = static_cast<char>('0' + random() % 10);
        break;
      }
      default: {  // a whole line again, somewhere else
        const std::size_t begin = bytes.rfind('\n', place) + 1;
        const std::size_t end = std::min(bytes.find('\n', place), bytes.size());
        const std::string line = bytes.substr(begin, end - begin) + "\n";
        bytes.insert(bytes.rfind('\n', random() % bytes.size()) + 1, line);
      }
    }
  }
  return bytes;
}

}  // namespace vialkeeper::tests
