// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/sheet_bench.h"

#include <algorithm>
#include <catch2/catch.hpp>
#include <stdexcept>

namespace vialkeeper::tests {

const std::string& sheetPlan() {
  static const std::string plan = R"(format = "vialkeeper-plan/1"
title = "Indoline dehydrogenation"
series = "bases"
[reaction]
limiting = "amine"
products = [ { key = "imine", name = "indole", formula = "C8H7N" } ]
gases = [ { species = "H2" } ]
[vial]
name = "10 mL crimp vial"
volume = "11.6 mL"
displaced = "0.15 mL"
rated_gauge = "2.0 bar"
[seal]
atmosphere = "N2"
temperature = "21 degC"
pressure = "1.013 bar"
[irradiation]
lamp = "LED 440"
wavelength = "440 nm"
temperature = "35 degC"
duration = "20 h"
[liquid]
total = "2.0 mL"
[[component]]
key = "mecn"
role = "solvent"
name = "acetonitrile"
cas = "75-05-8"
share = 4
hazards = ["H225", "H319"]
[[component]]
key = "nickel"
role = "cocatalyst"
name = "nickel(II) chloride hexahydrate"
formula = "NiCl2·6H2O"
cas = "7791-20-0"
mol_percent = 5
supply = { kind = "stock", concentration = "0.10 mol/L", solvent = "water" }
device = "pipette-100uL"
[[component]]
key = "lutidine"
role = "base"
name = "2,6-lutidine"
formula = "C7H9N"
equiv = 0.5
supply = { kind = "liquid", density = "0.920 g/mL", assay = 0.99 }
device = "pipette-20uL"
[[component]]
key = "amine"
role = "substrate"
name = "indoline"
formula = "C8H9N"
cas = "496-15-1"
amount = "0.400 mmol"
supply = { kind = "solid", assay = 0.98 }
device = "balance-0.01mg"
hazards = ["H315", "H999"]
[[component]]
key = "standard"
role = "standard"
name = "dodecane"
formula = "C12H26"
equiv = 1
supply = { kind = "liquid", density = "0.749 g/mL" }
device = "balance-0.1mg"
[[component]]
key = "water"
role = "solvent"
name = "water"
share = 1
)";
  return plan;
}

std::string replaced(const std::string& text, std::string_view what, std::string_view by) {
  const std::size_t at = text.find(what);
  if (at == std::string::npos || text.find(what, at + 1) != std::string::npos) {
    throw std::logic_error("not exactly once in the plan: " + std::string(what));
  }
  return std::string(text).replace(at, what.size(), by);
}

app::PlannedRun planned(const std::string& planText, const app::ChargeRequest& request) {
  auto run = app::planCharge(planText, "bench/plan.toml", request);
  if (!run) FAIL(text::toLine(run.error().front()));
  return *std::move(run);
}

app::SheetRow rowOf(const app::SheetContent& sheet, std::string_view name) {
  const auto found = std::ranges::find(sheet.rows, name, &app::SheetRow::name);
  if (found == sheet.rows.end()) FAIL("no row of " << name);
  return *found;
}

bool anyHolds(const std::vector<std::string>& texts, std::string_view words) {
  return std::ranges::any_of(
      texts, [words](const std::string& text) { return text.find(words) != std::string::npos; });
}

}  // namespace vialkeeper::tests
