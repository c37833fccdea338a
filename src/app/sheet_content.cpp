// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/sheet_content.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <cmath>
#include <cstdint>

#include "app/plan_charge.h"
#include "app/sheet_parts.h"
#include "charge/trail.h"
#include "units/shown.h"

namespace vialkeeper::app {
namespace {

using charge::Basis;
using charge::ComponentCharge;
using charge::ComponentPlan;
using units::shown;

/// Where a component stands by the rule of addition.
int additionRank(const ComponentPlan& component) {
  if (component.isSolvent()) return 3;
  if (std::holds_alternative<charge::SolidSupply>(component.supply)) return 0;
  if (std::holds_alternative<charge::LiquidSupply>(component.supply)) return 1;
  return std::holds_alternative<charge::StockSupply>(component.supply) ? 2 : 4;
}

SheetRow rowOf(const PlannedRun& run, std::size_t i) {
  const ComponentPlan& plan = run.plan.components[i];
  const ComponentCharge& charge = run.charge.components[i];
  const TargetText target = targetText(plan, charge);
  SheetRow row{.name = plan.name,
               .role = std::string(toText(plan.role)),
               .cas = plan.identity.cas,
               .molarMass = molarMassText(charge.substance),
               .supply = supplyText(run.plan, plan),
               .ratio = ratioText(plan, charge),
               .amount = plan.isSolvent() || !charge.amount_mol
                             ? std::string{}
                             : shown(units::Amount::fromMoles(charge.amount_mol->value())),
               .target = target.number,
               .unit = target.unit,
               .alternative = target.alternative,
               .tolerance = target.tolerance,
               .device = plan.device ? plan.device->name : std::string{},
               .notices = {},
               .actual = {}};
  for (const text::Notice& notice : charge.notices) row.notices.push_back(notice.text);
  if (charge.charged) {
    row.actual =
        charge.charged->mass ? shown(*charge.charged->mass, 4) : shown(*charge.charged->volume, 4);
  }
  return row;
}

SchemeContent schemeOf(const PlannedRun& run) {
  SchemeContent scheme;
  std::vector<std::string> solvents;
  std::vector<std::string> parts;
  for (std::size_t i = 0; i < run.plan.components.size(); ++i) {
    const ComponentPlan& component = run.plan.components[i];
    if (component.key == run.plan.limiting || component.role == charge::Role::kPartner) {
      scheme.reactants.push_back({component.identity.smiles, component.name});
    } else if (component.isSolvent()) {
      solvents.push_back(component.name);
      if (component.amount.basis == Basis::kShare) parts.push_back(component.amount.asWritten);
    } else if (component.role != charge::Role::kStandard &&
               component.role != charge::Role::kProduct) {
      const std::string ratio = ratioText(component, run.charge.components[i]);
      scheme.above.push_back(ratio.empty() ? component.name
                                           : fmt::format("{} ({})", component.name, ratio));
    }
  }
  for (const charge::ProductPlan& product : run.plan.products) {
    scheme.products.push_back({product.identity.smiles, product.name});
  }
  for (const charge::EvolvedGas& gas : run.plan.gases)
    scheme.gases.push_back(speciesText(gas.species));
  std::string liquid = fmt::format("{}", fmt::join(solvents, "/"));
  if (parts.size() > 1 && parts.size() == solvents.size())
    liquid += fmt::format(" {}", fmt::join(parts, ":"));
  const ComponentCharge* limiting = run.charge.find(run.charge.limiting);
  if (limiting->concentration)
    liquid += (liquid.empty() ? "" : ", ") + shown(*limiting->concentration);
  if (!liquid.empty()) scheme.below.push_back(liquid);
  if (const std::string light = lightText(run.plan.irradiation); !light.empty())
    scheme.below.push_back(light);
  return scheme;
}

VialContent vialOf(const PlannedRun& run) {
  VialContent vial{.fill = run.charge.fill.value_or(0.0), .lines = {}, .forecast = {}};
  const double liquid_mL = run.charge.totalLiquid.millilitres();
  if (run.plan.vial) {
    const charge::VialPlan& plan = *run.plan.vial;
    const double headspace_mL =
        plan.volume.millilitres() - plan.displaced.millilitres() - liquid_mL;
    if (!plan.name.empty()) vial.lines.push_back(plan.name);
    vial.lines.push_back(fmt::format("{:.2f} mL liquid, {:.0f} % of {:.3g} mL", liquid_mL,
                                     100.0 * vial.fill, plan.volume.millilitres()));
    vial.lines.push_back(fmt::format("{:.2f} mL headspace", headspace_mL));
    vial.lines.push_back(plan.ratedGauge
                             ? fmt::format("rated {} gauge, used to {:.0f} %",
                                           shown(*plan.ratedGauge), 100.0 * plan.derating)
                             : "no pressure rating known");
  } else {
    vial.lines.push_back(fmt::format("{:.2f} mL liquid", liquid_mL));
  }
  if (run.plan.seal) {
    vial.lines.push_back(
        fmt::format("closed under {} at {}, {} absolute", atmosphereText(*run.plan.seal),
                    shown(run.plan.seal->temperature), shown(run.plan.seal->pressure, 4)));
  }
  const std::string light = lightText(run.plan.irradiation);
  if (!run.plan.irradiation.lamp.empty()) {
    vial.lines.push_back(run.plan.irradiation.lamp + (light.empty() ? "" : ", " + light));
  } else if (!light.empty()) {
    vial.lines.push_back(light);
  }
  return vial;
}

}  // namespace

std::vector<std::size_t> additionOrder(const PlannedRun& run) {
  std::vector<std::size_t> order;
  for (const std::string& key : run.plan.additionOrder) order.push_back(run.plan.indexOf(key));
  const auto listed = static_cast<std::ptrdiff_t>(order.size());
  for (std::size_t i = 0; i < run.plan.components.size(); ++i) {
    const auto end = order.begin() + listed;
    if (std::find(order.begin(), end, i) == end) order.push_back(i);
  }
  std::stable_sort(order.begin() + listed, order.end(), [&run](std::size_t a, std::size_t b) {
    return additionRank(run.plan.components[a]) < additionRank(run.plan.components[b]);
  });
  return order;
}

std::string planMark(std::string_view planText) {
  std::uint64_t hash = 0xcbf29ce484222325U;
  for (const char c : planText) {
    hash ^= static_cast<unsigned char>(c);
    hash *= 0x100000001b3U;
  }
  return fmt::format("{:08x}", static_cast<std::uint32_t>(hash ^ (hash >> 32U)));
}

SheetContent weighingSheet(const PlannedRun& run) {
  SheetContent sheet{
      .title = run.plan.title.empty() ? "Untitled run" : run.plan.title,
      .code = sheetCode(run),
      .codeIsMark = run.plan.code.empty(),
      .qrText = run.plan.code.empty() ? "plan " + planMark(run.planText) : run.plan.code,
      .series = run.plan.series,
      .date = run.plan.date,
      .chemist = run.plan.chemist,
      .scheme = schemeOf(run),
      .rows = {},
      .notices = {},
      .vial = vialOf(run),
      .hazards = hazardsOf(run),
      .cautions = cautionsOf(run.plan),
      .footer = footerOf(run)};
  for (const std::size_t i : additionOrder(run)) sheet.rows.push_back(rowOf(run, i));
  for (const text::Notice& notice : run.charge.notices) sheet.notices.push_back(notice.text);
  return sheet;
}

}  // namespace vialkeeper::app
