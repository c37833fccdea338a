// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/charge_table.h"

#include <fmt/format.h>

#include "charge/trail.h"
#include "cli/text_table.h"
#include "text/utf8.h"
#include "units/shown.h"

namespace vialkeeper::cli {
namespace {

using charge::ComponentCharge;
using stats::Uncertain;
using units::shown;

std::string headLines(const app::PlannedRun& run) {
  const charge::Charge& charge = run.charge;
  std::string head = text::oneLine(run.plan.title.empty() ? "Untitled run" : run.plan.title);
  if (!run.plan.series.empty())
    head += fmt::format("  (series {})", text::oneLine(run.plan.series));
  head += fmt::format("\nlimiting {}, {}{} · liquid {} mL", charge.limiting,
                      shown(charge.limitingAmount), charge.retargeted ? " as weighed" : "",
                      units::toSignificant(charge.totalLiquid.millilitres(), 3));
  if (run.plan.vial) {
    head += fmt::format(" in {:.3g} mL, {:.0f} % full", run.plan.vial->volume.millilitres(),
                        100.0 * *charge.fill);
  }
  return head + "\n\n";
}

std::string targetText(const ComponentCharge& component) {
  if (component.targetMass && component.targetVolume) {
    return fmt::format("{} = {}", shown(*component.targetMass), shown(*component.targetVolume));
  }
  if (component.targetMass) return shown(*component.targetMass);
  return component.targetVolume ? shown(*component.targetVolume) : "";
}

std::string amountText(const std::optional<Uncertain>& amount) {
  return amount ? shown(units::Amount::fromMoles(amount->value())) : "";
}

/// `1.012 ± 0.003`, the uncertainty to two digits and the value to the same place.
std::string withUncertainty(const Uncertain& number) {
  const auto u = number.standardUncertainty();
  if (!u || *u == 0.0) return units::toSignificant(number.value(), 4);
  const std::string uText = units::toSignificant(*u, 2);
  const std::size_t point = uText.find('.');
  const std::size_t places = point == std::string::npos || uText.find('e') != std::string::npos
                                 ? 0
                                 : uText.size() - point - 1;
  return fmt::format("{:.{}f} ± {}", number.value(), places, uText);
}

std::vector<std::string> weighedCells(const ComponentCharge& component) {
  if (!component.charged) return {"", "", ""};
  const charge::AsCharged& charged = *component.charged;
  return {charged.mass ? shown(*charged.mass, 4) : shown(*charged.volume, 4),
          charged.equiv && component.role != charge::Role::kSolvent
              ? withUncertainty(*charged.equiv)
              : "",
          charged.offTargetPercent ? fmt::format("{:+.1f} %", *charged.offTargetPercent) : ""};
}

std::string table(const app::PlannedRun& run, bool withWeighed) {
  using enum TextTable::Align;
  TextTable table;
  table.addColumn("key", kLeft);
  table.addColumn("component", kLeft);
  table.addColumn("supply", kLeft);
  table.addColumn("ratio", kRight);
  table.addColumn("amount", kRight);
  table.addColumn("weigh or pipette", kRight);
  table.addColumn("tolerance", kRight);
  if (withWeighed) {
    table.addColumn("recorded", kRight);
    table.addColumn("equiv as charged", kRight);
    table.addColumn("off target", kRight);
  }
  for (std::size_t i = 0; i < run.charge.components.size(); ++i) {
    const ComponentCharge& component = run.charge.components[i];
    const charge::ComponentPlan& plan = run.plan.components[i];
    std::vector<std::string> cells = {component.key,
                                      component.name,
                                      supplyText(run.plan, plan),
                                      ratioText(plan, component),
                                      plan.isSolvent() ? "" : amountText(component.amount_mol),
                                      targetText(component),
                                      fmt::format("±{:.2g} %", component.tolerancePercent)};
    if (withWeighed) {
      for (std::string& cell : weighedCells(component)) cells.push_back(std::move(cell));
    }
    table.addRow(std::move(cells));
  }
  return table.toText();
}

std::string noticeLines(const charge::Charge& charge) {
  std::string lines;
  const auto add = [&lines](const text::Notice& notice) {
    const std::string at = notice.at.starts_with("component.") ? notice.at.substr(10) + ": " : "";
    lines += fmt::format("! {}{}\n", at, text::oneLine(notice.text));
  };
  for (const ComponentCharge& component : charge.components) {
    for (const text::Notice& notice : component.notices) add(notice);
  }
  for (const text::Notice& notice : charge.notices) add(notice);
  return lines.empty() ? lines : "\n" + lines;
}

std::string trailLines(const app::PlannedRun& run) {
  std::string lines = "\nWhere each number is from\n";
  for (const ComponentCharge& component : run.charge.components) {
    lines += fmt::format("{}\n", component.key);
    for (const std::string& step : trailOf(run.plan, run.charge, component.key)) {
      lines += fmt::format("  {}\n", text::oneLine(step));
    }
  }
  return lines;
}

}  // namespace

std::string chargeTable(const app::PlannedRun& run, bool withWeighed, bool withTrail) {
  return headLines(run) + table(run, withWeighed) + noticeLines(run.charge) +
         (withTrail ? trailLines(run) : "");
}

}  // namespace vialkeeper::cli
