// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/weigh_run.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>

#include "app/notebook/run_life.h"
#include "text/text_fault.h"
#include "text/utf8.h"
#include "units/quantity_text.h"
#include "units/toml_section.h"

namespace vialkeeper::app {
namespace {

Checked<const charge::ComponentPlan*> componentOfKey(const charge::Plan& plan,
                                                     const std::string& key) {
  if (const charge::ComponentPlan* component = plan.find(key)) return component;
  std::vector<std::string> keys;
  for (const charge::ComponentPlan& component : plan.components) keys.push_back(component.key);
  const auto nearest = units::nearestName(key, keys);
  return askedFault("key", fmt::format("the run has no component {}", text::quoted(key)),
                    nearest ? fmt::format("did you mean {}?", *nearest)
                            : fmt::format("its keys are {}", fmt::join(keys, ", ")));
}

Checked<Recorded> readActual(const charge::ComponentPlan& component, const std::string& quantity) {
  const auto read = units::readQuantityOf({units::Kind::kMass, units::Kind::kVolume}, quantity,
                                          units::Dialect::kPerson);
  if (!read) {
    return askedFault(
        component.key,
        fmt::format("{}: {}", text::quoted(quantity), whatWithPosition(read.error(), quantity)),
        read.error().mend);
  }
  Recorded actual = units::Mass::fromSi(read->si);
  if (read->kind == units::Kind::kVolume) actual = units::Volume::fromSi(read->si);
  if (const auto recordable = charge::checkRecordable(component, actual); !recordable) {
    return askedFault(component.key,
                      fmt::format("{}: {}", text::quoted(quantity), recordable.error().what),
                      recordable.error().mend);
  }
  return actual;
}

/// Copies the judgement of the charge into the component's record.
void takeCharged(ComponentRecord& record, const charge::AsCharged& charged) {
  const auto valueOf = [](const std::optional<stats::Uncertain>& number, double perSi) {
    return number ? std::optional(number->value() * perSi) : std::nullopt;
  };
  record.charged_mmol = valueOf(charged.amount_mol, 1e3);
  const auto u = charged.amount_mol ? charged.amount_mol->standardUncertainty() : std::nullopt;
  record.uCharged_mmol = u ? std::optional(*u * 1e3) : std::nullopt;
  record.charged_molPercent = valueOf(charged.molPercent, 1.0);
  record.charged_mol_L = valueOf(charged.concentration_mol_m3, 1e-3);
}

void takeActual(ComponentRecord& record, const Recorded& actual, const std::string& typed,
                const Author& author) {
  record.actual_mg.reset();
  record.actual_uL.reset();
  if (const auto* mass = std::get_if<units::Mass>(&actual)) record.actual_mg = mass->milligrams();
  if (const auto* volume = std::get_if<units::Volume>(&actual))
    record.actual_uL = volume->microlitres();
  record.actualText = typed;
  record.weighed = author.at;
  record.weighedBy = author.person;
}

}  // namespace

Checked<WeighedComponent> weighComponent(const Desk& desk, const RunRecord& run,
                                         const std::string& key, const std::string& quantity,
                                         bool accepted, const std::string& reason) {
  if (const auto may = mayDo(run.state, Deed::kWeigh, reason); !may)
    return std::unexpected(may.error());
  auto sheet = loadRun(desk.notebook, run);
  if (!sheet) return std::unexpected(sheet.error());
  const auto component = componentOfKey(sheet->planned.plan, key);
  if (!component) return std::unexpected(component.error());
  const auto actual = readActual(**component, quantity);
  if (!actual) return std::unexpected(actual.error());
  if (!accepted) {
    auto questions =
        questionWeighing(**component, *sheet->planned.charge.find(key), *actual, quantity);
    if (!questions.empty()) return WeighedComponent{std::move(questions), *std::move(sheet), {}};
  }
  const Action action = desk.action("weigh", reason);
  const auto record = std::ranges::find(sheet->components, key, &ComponentRecord::key);
  const std::string before = record->actualText;
  takeActual(*record, *actual, quantity, action.author);
  auto judged = charge::chargeAsWeighed(sheet->planned.plan, sheet->planned.substances,
                                        recordedWeighings(sheet->components));
  if (!judged) return std::unexpected(judged.error());
  for (ComponentRecord& each : sheet->components) {
    const auto& charged = judged->find(each.key)->charged;
    if (charged) takeCharged(each, *charged);
  }
  RunRecord changed = run;
  changed.state = stateAfter(run.state, Trigger::kFirstWeighing);
  const auto done = desk.notebook.act(action, [&](Writing& writing) -> Checked<void> {
    for (const ComponentRecord& each : sheet->components) {
      if (const auto written = writing.changeComponent(each); !written) return written;
    }
    return changed.state == run.state ? Checked<void>{} : writing.changeRun(changed);
  });
  if (!done) return std::unexpected(done.error());
  auto current = desk.notebook.run(run.n);
  if (!current) return std::unexpected(current.error());
  auto reloaded = loadRun(desk.notebook, *current);
  if (!reloaded) return std::unexpected(reloaded.error());
  return WeighedComponent{{}, *std::move(reloaded), before};
}

}  // namespace vialkeeper::app
