// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "app/notebook/component_records.h"
#include "app/notebook/weigh_run.h"
#include "app/sheet_content.h"
#include "units/shown.h"

namespace vialkeeper::app {
namespace {

/// `0.198 mmol, 9.9 mol%`: the amount, and beside it what it is measured in.
std::string asChargedText(const charge::Plan& plan, const charge::ComponentPlan& component,
                          const charge::AsCharged& charged) {
  if (!charged.amount_mol) return {};
  const std::string amount = units::shown(units::Amount::fromMoles(charged.amount_mol->value()));
  if (component.key == plan.limiting || component.isSolvent()) return amount;
  if (component.amount.basis == charge::Basis::kEquiv && charged.equiv)
    return fmt::format("{}, {} equiv", amount, units::toSignificant(charged.equiv->value(), 3));
  if (!charged.molPercent) return amount;
  return fmt::format("{}, {} mol%", amount, units::toSignificant(charged.molPercent->value(), 3));
}

}  // namespace

Checked<WeighingPreview> previewWeighing(const RunSheet& sheet, const std::string& key,
                                         const std::string& quantity) {
  const charge::Plan& plan = sheet.planned.plan;
  const auto component = componentOfKey(plan, key);
  if (!component) return std::unexpected(component.error());
  const auto actual = readActual(**component, quantity);
  if (!actual) return std::unexpected(actual.error());
  WeighingPreview preview{.questions = questionWeighing(
                              **component, *sheet.planned.charge.find(key), *actual, quantity)};

  charge::Weighings weighings = recordedWeighings(sheet.components);
  std::erase_if(weighings, [&key](const charge::Weighing& each) { return each.key == key; });
  weighings.push_back({.key = key, .actual = *actual, .asWritten = quantity});
  const auto retarget =
      sheet.planned.charge.retargeted ? charge::Retarget::kYes : charge::Retarget::kNo;
  const auto judged = charge::chargeAsWeighed(plan, sheet.planned.substances, weighings, retarget);
  if (!judged) return std::unexpected(judged.error());
  const charge::ComponentCharge& charged = *judged->find(key);
  if (!charged.charged) return preview;
  preview.offTargetPercent = charged.charged->offTargetPercent;
  preview.withinTolerance =
      preview.offTargetPercent && std::abs(*preview.offTargetPercent) <= charged.tolerancePercent;
  preview.asCharged = asChargedText(plan, **component, *charged.charged);
  return preview;
}

std::vector<std::string> weighingOrder(const RunSheet& sheet) {
  std::vector<std::string> keys;
  for (const std::size_t i : additionOrder(sheet.planned))
    keys.push_back(sheet.planned.plan.components[i].key);
  return keys;
}

}  // namespace vialkeeper::app
