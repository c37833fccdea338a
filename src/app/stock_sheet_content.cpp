// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <cmath>
#include <optional>

#include "app/plan_charge.h"
#include "app/sheet_content.h"
#include "app/sheet_parts.h"
#include "charge/devices.h"
#include "units/shown.h"

namespace vialkeeper::app {
namespace {

using charge::ComponentCharge;
using charge::ComponentPlan;
using units::shown;

/// A stock solution to be made, wherever the wish for it comes from.
struct StockOrder {
  const ComponentPlan* component;
  const ComponentCharge* charge;
  units::Concentration concentration;
  std::string solvent;
  units::Volume flask;
  units::Volume transfer;
  double assay;
  bool proposed;
};

/// The smallest standard flask that holds the transfer with a tenth to spare for rinsing the
/// pipette, and in which the weighing lies above the balance's minimum; else the largest.
units::Volume flaskFor(units::Volume transfer, units::Mass perVolume_kg_m3,
                       units::Mass minimumWeight) {
  for (const charge::Flask& flask : charge::flasks()) {
    const bool weighable = flask.nominal.si() * perVolume_kg_m3.si() >= minimumWeight.si();
    if (flask.nominal >= 1.1 * transfer && weighable) return flask.nominal;
  }
  return charge::flasks().back().nominal;
}

/// The balance that a stock is weighed on: the component's own, else the finest of the shelf.
const charge::Device& balanceOf(const ComponentPlan& component) {
  if (component.device && component.device->balance() != nullptr) return *component.device;
  return *charge::findDevice("balance-0.01mg");
}

std::optional<StockOrder> plannedStock(const PlannedRun& run, std::size_t i) {
  const ComponentPlan& component = run.plan.components[i];
  const ComponentCharge& charge = run.charge.components[i];
  const auto* stock = std::get_if<charge::StockSupply>(&component.supply);
  if (stock == nullptr || !stock->concentration || !charge.substance.molarMass ||
      !charge.targetVolume) {
    return std::nullopt;
  }
  const auto solvent = run.plan.solventOf(*stock);
  const auto perVolume =
      units::Mass::fromSi(stock->concentration->si() * charge.substance.molarMass->value.si());
  return StockOrder{.component = &component,
                    .charge = &charge,
                    .concentration = *stock->concentration,
                    .solvent = solvent ? run.plan.components[*solvent].name : stock->solvent,
                    .flask = flaskFor(*charge.targetVolume, perVolume,
                                      balanceOf(component).balance()->minimumWeight()),
                    .transfer = *charge.targetVolume,
                    .assay = 1.0,
                    .proposed = false};
}

std::optional<StockOrder> proposedStock(const PlannedRun& run, std::size_t i) {
  const ComponentPlan& component = run.plan.components[i];
  const ComponentCharge& charge = run.charge.components[i];
  if (!charge.proposal) return std::nullopt;
  const auto* solid = std::get_if<charge::SolidSupply>(&component.supply);
  const auto* liquid = std::get_if<charge::LiquidSupply>(&component.supply);
  return StockOrder{.component = &component,
                    .charge = &charge,
                    .concentration = charge.proposal->concentration,
                    .solvent = run.plan.find(charge.proposal->solventKey)->name,
                    .flask = charge.proposal->flask,
                    .transfer = charge.proposal->transfer,
                    .assay = solid != nullptr    ? solid->assay
                             : liquid != nullptr ? liquid->assay
                                                 : 1.0,
                    .proposed = true};
}

StockSheetContent sheetOf(const PlannedRun& run, const StockOrder& order) {
  const double M = order.charge->substance.molarMass->value.gramsPerMole();
  const units::Mass mass =
      units::Mass::fromGrams((order.concentration * order.flask).moles() * M / order.assay);
  const charge::Device& device = balanceOf(*order.component);
  const TargetText target =
      massTarget(mass, order.component->tolerancePercent.value_or(2.0), device.balance());
  const std::string flask = fmt::format("{:g} mL", order.flask.millilitres());
  const std::string concentration = shown(order.concentration);
  StockSheetContent sheet{
      .title = fmt::format("Stock solution: {} in {}", order.component->name, order.solvent),
      .forRun = fmt::format("{} {}", sheetCode(run), run.plan.title),
      .code = sheetCode(run),
      .qrText = fmt::format(
          "{} {}", run.plan.code.empty() ? "plan " + planMark(run.planText) : run.plan.code,
          order.component->key),
      .name = order.component->name,
      .cas = order.component->identity.cas,
      .molarMass = molarMassText(order.charge->substance),
      .assay = order.assay == 1.0 ? "" : fmt::format("assay {:.4g} %", 100.0 * order.assay),
      .concentration = concentration,
      .solvent = order.solvent,
      .flask = fmt::format("{} volumetric flask, class A", flask),
      .target = target.number,
      .unit = target.unit,
      .tolerance = target.tolerance,
      .transfer = fmt::format("{} into each vial", shown(order.transfer)),
      .serves = fmt::format("enough for {} vials",
                            static_cast<int>(std::floor(order.flask / order.transfer + 1e-9))),
      .formula = fmt::format("c = m{} ÷ ({:.2f} g/mol × {})",
                             order.assay == 1.0 ? "" : fmt::format(" × {}", order.assay), M, flask),
      .steps =
          {fmt::format("Tare the {} flask or a weighing boat on {}.", flask, device.name),
           fmt::format("Weigh {} {} {} ({}) and write down what the balance shows.", target.number,
                       target.unit, order.component->name, target.tolerance),
           fmt::format("Dissolve it in about two thirds of the {}; look for undissolved solid.",
                       order.solvent),
           fmt::format(
               "Fill up to the mark with {} at room temperature, close and turn over ten times.",
               order.solvent),
           "Work out the concentration from the mass that was weighed and write it on the label."},
      .notices = {},
      .hazards = {},
      .cautions = {"Check the solubility with a small portion first.",
                   "The supplier's safety data sheet and your site's rules decide."},
      .footer = footerOf(run)};
  if (mass < device.balance()->minimumWeight()) {
    sheet.notices.push_back(
        fmt::format("{} is below the least that {} may weigh to 0.1 %, {}: make more, or a "
                    "stronger stock to dilute",
                    shown(mass), device.name, shown(device.balance()->minimumWeight())));
  }
  if (order.proposed)
    sheet.notices.emplace_back(
        "proposed by Vialkeeper; the plan still weighs this component directly");
  if (!order.component->hazards.empty()) sheet.hazards.push_back(hazardOf(*order.component));
  for (const ComponentPlan& solvent : run.plan.components) {
    if (solvent.isSolvent() && solvent.name == order.solvent && !solvent.hazards.empty()) {
      sheet.hazards.push_back(hazardOf(solvent));
    }
  }
  return sheet;
}

}  // namespace

std::vector<StockSheetContent> stockSheets(const PlannedRun& run) {
  std::vector<StockSheetContent> sheets;
  for (std::size_t i = 0; i < run.plan.components.size(); ++i) {
    if (const auto planned = plannedStock(run, i)) sheets.push_back(sheetOf(run, *planned));
    if (const auto proposed = proposedStock(run, i)) sheets.push_back(sheetOf(run, *proposed));
  }
  return sheets;
}

}  // namespace vialkeeper::app
