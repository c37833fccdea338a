// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/run_plan.h"

#include <fmt/format.h>

#include <algorithm>

#include "app/notebook/component_records.h"
#include "app/notebook/shelf_places.h"
#include "app/sheet_parts.h"
#include "charge/plan_edit.h"
#include "charge/plan_reader.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

using charge::ComponentCharge;

Checked<void> writeRun(Writing& writing, RunRecord& run, std::vector<ComponentRecord>& components,
                       std::vector<ShelfPlace>& places, const std::string& planText,
                       std::vector<std::string>& added) {
  if (const auto put = putOnShelf(writing, places, added); !put) return put;
  for (std::size_t i = 0; i < places.size(); ++i) components[i].substance = places[i].n;
  const auto plan = writing.addAttachment(planText);
  if (!plan) return std::unexpected(plan.error());
  run.plan = *plan;
  const auto code = writing.nextRunCode(run.person);
  if (!code) return std::unexpected(code.error());
  run.code = *code;
  const auto n = writing.addRun(run, components);
  if (!n) return std::unexpected(n.error());
  run.n = *n;
  run.version = 1;
  return {};
}

}  // namespace

RunRecord runRecord(const PlannedRun& planned) {
  const charge::Plan& plan = planned.plan;
  RunRecord run{.title = plan.title,
                .series = plan.series,
                .aim = {},
                .conclusion = {},
                .vial = plan.vial ? plan.vial->name : "",
                .lamp = plan.irradiation.lamp,
                .atmosphere = plan.seal ? plan.seal->atmosphereAsWritten : "",
                .limitingKey = plan.limiting,
                .limiting_mmol = planned.charge.limitingAmount.millimoles(),
                .liquid_mL = planned.charge.totalLiquid.millilitres()};
  if (plan.seal && run.atmosphere.empty()) run.atmosphere = atmosphereText(*plan.seal);
  if (plan.irradiation.wavelength) run.wavelength_nm = plan.irradiation.wavelength->nanometres();
  if (plan.irradiation.temperature) run.temperature_C = plan.irradiation.temperature->celsius();
  if (plan.irradiation.duration) run.duration_h = plan.irradiation.duration->hours();
  return run;
}

void headPlan(charge::Plan& plan, const RunRecord& run) {
  if (!run.title.empty()) plan.title = run.title;
  plan.code = run.code;
  if (plan.chemist.empty()) plan.chemist = run.person;
  if (plan.date.empty()) plan.date = toIsoText(run.created).substr(0, 10);
}

charge::Weighings recordedWeighings(const std::vector<ComponentRecord>& components) {
  charge::Weighings weighings;
  for (const ComponentRecord& component : components) {
    charge::Weighing weighing{.key = component.key,
                              .actual = units::Mass::fromSi(0.0),
                              .asWritten = component.actualText};
    if (component.actual_mg) {
      weighing.actual = units::Mass::fromMilligrams(*component.actual_mg);
    } else if (component.actual_uL) {
      weighing.actual = units::Volume::fromMicrolitres(*component.actual_uL);
    } else {
      continue;
    }
    weighings.push_back(std::move(weighing));
  }
  return weighings;
}

Checked<RunSheet> loadRun(Notebook& notebook, const RunRecord& run, charge::Retarget retarget) {
  auto planText = notebook.attachment(run.plan);
  if (!planText) return std::unexpected(planText.error());
  auto components = notebook.components(run.n);
  if (!components) return std::unexpected(components.error());
  auto plan = charge::readPlan(*planText, run.code);
  if (!plan) return std::unexpected(plan.error());
  auto substances = charge::resolveSubstances(*plan, charge::structureModuleReader());
  if (!substances) return std::unexpected(substances.error());
  const charge::Weighings weighings = recordedWeighings(*components);
  auto result = weighings.empty() && retarget == charge::Retarget::kNo
                    ? charge::computeCharge(*plan, *substances)
                    : charge::chargeAsWeighed(*plan, *substances, weighings, retarget);
  if (!result) return std::unexpected(result.error());
  headPlan(*plan, run);
  return RunSheet{run, *std::move(components),
                  PlannedRun{*std::move(planText), *std::move(plan), *std::move(substances),
                             *std::move(result)},
                  !weighings.empty()};
}

Checked<AddedRun> addRun(const Desk& desk, const NewRun& wanted) {
  std::string planText = wanted.planText;
  text::Faults faults;
  for (const PlanOverride& override : wanted.overrides) {
    auto edited = charge::withField(planText, override.path, override.value);
    if (edited) {
      planText = *std::move(edited);
    } else {
      for (text::Fault& fault : edited.error()) {
        if (fault.file == "plan") fault.file = wanted.planFile;
        faults.push_back(std::move(fault));
      }
    }
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  auto planned = planCharge(planText, wanted.planFile, {});
  if (!planned) return std::unexpected(planned.error());
  AddedRun added{.run = runRecord(*planned), .newSubstances = {}, .notices = {}};
  if (!wanted.title.empty()) added.run.title = wanted.title;
  if (!planned->plan.code.empty()) {
    added.notices.push_back(
        {"code-ignored", "the plan's own code is not used: the notebook gives the next free one",
         "code"});
  }
  added.run.aim = wanted.aim;
  added.run.person = desk.person;
  added.run.created = desk.clock.now();
  added.run.clonedFrom = wanted.clonedFrom;
  auto places = placeAll(desk.notebook, planned->plan, {}, added.notices);
  if (!places) return std::unexpected(places.error());
  std::vector<ComponentRecord> components;
  for (std::size_t i = 0; i < planned->plan.components.size(); ++i) {
    components.push_back(plannedRecord(planned->plan.components[i], planned->charge.components[i],
                                       static_cast<int>(i)));
  }
  const auto done = desk.notebook.act(
      desk.action(wanted.clonedFrom == 0 ? "add" : "clone"), [&](Writing& writing) {
        return writeRun(writing, added.run, components, *places, planText, added.newSubstances);
      });
  if (!done) return std::unexpected(done.error());
  for (const ComponentCharge& component : planned->charge.components) {
    added.notices.insert(added.notices.end(), component.notices.begin(), component.notices.end());
  }
  added.notices.insert(added.notices.end(), planned->charge.notices.begin(),
                       planned->charge.notices.end());
  return added;
}

Checked<AddedRun> cloneRun(const Desk& desk, const RunRecord& original,
                           const std::vector<PlanOverride>& overrides, const std::string& title) {
  auto planText = desk.notebook.attachment(original.plan);
  if (!planText) return std::unexpected(planText.error());
  return addRun(desk, {.planText = *std::move(planText),
                       .planFile = original.code,
                       .overrides = overrides,
                       .title = title,
                       .aim = original.aim,
                       .clonedFrom = original.n});
}

}  // namespace vialkeeper::app
