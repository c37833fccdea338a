// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/command_bench.h"

#include <catch2/catch.hpp>
#include <set>
#include <sstream>
#include <stdexcept>

#include "cli/command_line.h"

namespace vialkeeper::tests {

std::vector<std::string> Ran::faults() const {
  std::vector<std::string> lines;
  std::istringstream stream(err);
  for (std::string line; std::getline(stream, line);) lines.push_back(line);
  return lines;
}

nlohmann::json Ran::json() const { return nlohmann::json::parse(out); }

Ran run(const std::vector<std::string>& arguments) {
  std::ostringstream out;
  std::ostringstream err;
  const int status = cli::run(arguments, out, err);
  return {status, out.str(), err.str()};
}

const std::string& soundPlan() {
  static const std::string plan = R"(format = "vialkeeper-plan/1"
title = "Indoline dehydrogenation"
addition_order = ["nickel", "amine"]
[reaction]
limiting = "amine"
gases = [ { species = "H2", per_limiting = 1.0 } ]
[vial]
volume = "11.6 mL"
derating = 0.5
[seal]
atmosphere = "N2"
temperature = "21 degC"
pressure = "1.013 bar"
saturated = true
[liquid]
total = "2.0 mL"
[[component]]
key = "amine"
role = "substrate"
name = "indoline"
formula = "C8H9N"
cas = "496-15-1"
amount = "0.200 mmol"
supply = { kind = "solid", assay = 0.98 }
device = "balance-0.01mg"
[[component]]
key = "nickel"
role = "cocatalyst"
name = "nickel(II) chloride hexahydrate"
formula = "NiCl2·6H2O"
mol_percent = 5
supply = { kind = "stock", concentration = "0.10 mol/L", solvent = "water" }
[[component]]
key = "acid"
role = "acid"
name = "pivalic acid"
formula = "C5H10O2"
equiv = 0.1
tolerance_percent = 2
[[component]]
key = "mecn"
role = "solvent"
name = "acetonitrile"
share = 9
[[component]]
key = "water"
role = "solvent"
name = "water"
share = 1
)";
  return plan;
}

std::string changed(const std::string& text, std::string_view what, std::string_view by) {
  const std::size_t at = text.find(what);
  if (at == std::string::npos || text.find(what, at + 1) != std::string::npos) {
    throw std::logic_error("not exactly once in the plan: " + std::string(what));
  }
  return std::string(text).replace(at, what.size(), by);
}

void checkOneFault(const ScratchFolder& folder, const std::vector<std::string>& arguments,
                   int status, const std::string& place, const std::string& tells,
                   const std::string& mend) {
  const auto before = folder.contents();
  const Ran ran = run(arguments);
  const std::string line = folder.withoutPath(ran.err);
  INFO("expected " << place << ": … " << tells << " … " << mend << "\nsaid     " << line);
  CHECK(ran.status == status);
  CHECK(ran.out.empty());
  CHECK(ran.faults().size() == 1);
  CHECK_THAT(line, Catch::Matchers::StartsWith(place.empty() ? std::string{} : place + ": "));
  const std::size_t told = line.find(tells);
  CHECK(told != std::string::npos);
  CHECK((told != std::string::npos &&
         line.find(": " + mend, told + tells.size()) != std::string::npos));
  CHECK(folder.contents() == before);
}

void checkPlanFaults(std::span<const PlanFault> faults) {
  std::set<std::string> names;
  for (const PlanFault& fault : faults) {
    INFO(fault.name);
    CHECK(names.insert(fault.name).second);
    const ScratchFolder folder;
    const std::string plan = folder.write("plan.toml", changed(soundPlan(), fault.what, fault.by));
    checkOneFault(folder, {"charge", plan}, 1, std::string("plan.toml:") + fault.place, fault.tells,
                  fault.mend);
  }
}

}  // namespace vialkeeper::tests
