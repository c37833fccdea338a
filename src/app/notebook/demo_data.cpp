// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_data.h"

#include <fmt/format.h>

#include <algorithm>

namespace vialkeeper::app {

std::string demoCourseCsv(const DemoRunSpec& run, const DemoOutcome& outcome, const DemoLog& log,
                          DemoRandom& random) {
  const DemoRecipe& recipe = run.recipe;
  const bool coupling = recipe.partner_mol_L > 0.0;
  const double start_mol_L = recipe.substrate_mmol / recipe.liquid_mL;
  const auto measured = [&](double value) {
    return std::max(
        0.0, value * (1.0 + 0.012 * random.normal()) + 0.004 * start_mol_L * random.normal());
  };
  std::string csv =
      fmt::format("# cat = {:.6f} mol/L\n", 0.01 * recipe.catalyst_molPercent * start_mol_L);
  csv += fmt::format("time [h],amine [mol/L],{}{} [mol/L]\n", coupling ? "indole [mol/L]," : "",
                     demoSubstrate(recipe.substrate).productKey);
  std::vector<double> times_h{0.0};
  times_h.insert(times_h.end(), log.aliquots_h.begin(), log.aliquots_h.end());
  for (const double time_h : times_h) {
    const double gone_mol_L = start_mol_L * outcome.extentAt(time_h);
    csv += fmt::format("{:.3f},{:.5f},", time_h, measured(start_mol_L - gone_mol_L));
    if (coupling) csv += fmt::format("{:.5f},", measured(recipe.partner_mol_L - gone_mol_L));
    csv += fmt::format("{:.5f}\n", measured(gone_mol_L * outcome.selectivity()));
  }
  return csv;
}

std::string demoTraceCsv(const DemoLog& log) {
  std::string csv = "time [h],pressure [bar],temperature [degC]\n";
  for (const DemoTracePoint& point : log.trace) {
    csv += fmt::format("{:.4f},{:.4f},{:.1f}\n", point.time_h, point.pressure_bar, point.celsius);
  }
  return csv;
}

}  // namespace vialkeeper::app
