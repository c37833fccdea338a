// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/plan_charge.h"

#include <utility>

#include "app/text_files.h"
#include "charge/material.h"
#include "charge/plan_reader.h"
#include "charge/scaling.h"

namespace vialkeeper::app {
namespace {

using charge::Plan;
using charge::Substances;
using text::Checked;
using text::Faults;

/// The limiting amount that the request asks for, or nothing.
Checked<std::optional<units::Amount>> wantedAmount(const ChargeRequest& request, const Plan& plan,
                                                   const Substances& substances) {
  if (request.scaleToAmount) return request.scaleToAmount;
  if (!request.scaleToMass) return std::nullopt;
  stats::Causes causes;
  text::Notices notices;
  const std::size_t limiting = plan.indexOf(plan.limiting);
  const charge::Material material(plan, plan.components[limiting], substances.components[limiting],
                                  causes, notices);
  const auto amount =
      material.isGas() ? std::nullopt : material.amountInMass(request.scaleToMass->si());
  if (amount) return units::Amount::fromMoles(amount->value());
  return std::unexpected(
      Faults{{.file = plan.file,
              .field = "component." + plan.limiting,
              .what = "a mass of the limiting component says nothing about its amount",
              .mend = "scale to an amount such as 0.5 mmol"}});
}

Checked<Plan> scaledAsAsked(const ChargeRequest& request, Plan plan, const Substances& substances) {
  const auto wanted = wantedAmount(request, plan, substances);
  if (!wanted) return std::unexpected(wanted.error());
  if (*wanted) {
    const auto planned = charge::plannedLimitingAmount(plan, substances);
    if (!planned) return std::unexpected(planned.error());
    plan = charge::scaled(plan, **wanted / *planned);
  }
  if (!request.scaleToVial) return plan;
  if (plan.vial) return charge::scaledToVial(plan, *request.scaleToVial);
  return std::unexpected(Faults{{.file = plan.file,
                                 .field = "vial",
                                 .what = "the plan has no vial to scale from",
                                 .mend = "add [vial] with its volume"}});
}

/// The weighed file's faults are told beside the plan's, so it is read as soon as the keys are
/// known.
Checked<charge::Weighings> readWeighedFile(const ChargeRequest& request, const Plan& plan) {
  if (!request.weighedFile) return charge::Weighings{};
  auto bytes = readFile(*request.weighedFile);
  if (!bytes) return std::unexpected(bytes.error());
  return charge::readWeighings(*bytes, *request.weighedFile, plan);
}

}  // namespace

Checked<PlannedRun> planCharge(const ChargeRequest& request) {
  auto bytes = readFile(request.planFile);
  if (!bytes) return std::unexpected(bytes.error());
  return planCharge(*std::move(bytes), request.planFile, request);
}

Checked<PlannedRun> planCharge(std::string planText, const std::string& file,
                               const ChargeRequest& request) {
  auto plan = charge::readPlan(planText, file);
  if (!plan) return std::unexpected(plan.error());
  auto substances = charge::resolveSubstances(*plan, charge::structureModuleReader());
  auto weighings = readWeighedFile(request, *plan);
  Faults faults;
  if (!substances) faults = substances.error();
  if (!weighings) faults.insert(faults.end(), weighings.error().begin(), weighings.error().end());
  if (!faults.empty()) return std::unexpected(std::move(faults));

  auto scaledPlan = scaledAsAsked(request, *std::move(plan), *substances);
  if (!scaledPlan) return std::unexpected(scaledPlan.error());
  auto result = request.weighedFile ? charge::chargeAsWeighed(*scaledPlan, *substances, *weighings,
                                                              request.retarget)
                                    : charge::computeCharge(*scaledPlan, *substances);
  if (!result) {
    for (text::Fault& fault : result.error()) {
      if (fault.file.empty()) fault.file = request.weighedFile.value_or(file);
    }
    return std::unexpected(result.error());
  }
  return PlannedRun{std::move(planText), *std::move(scaledPlan), *std::move(substances),
                    *std::move(result)};
}

}  // namespace vialkeeper::app
