// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/component_records.h"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include "app/notebook/run_plan.h"
#include "text/text_fault.h"
#include "text/utf8.h"
#include "units/quantity_text.h"
#include "units/toml_section.h"

namespace vialkeeper::app {

ComponentRecord plannedRecord(const charge::ComponentPlan& plan,
                              const charge::ComponentCharge& charge, int position) {
  ComponentRecord record{.position = position,
                         .key = plan.key,
                         .role = std::string(toText(plan.role)),
                         .name = plan.name,
                         .actualText = {},
                         .weighed = {},
                         .weighedBy = {}};
  if (charge.amount_mol) record.planned_mmol = charge.amount_mol->value() * 1e3;
  record.planned_molPercent = charge.molPercent;
  if (charge.concentration) record.planned_mol_L = charge.concentration->molPerLitre();
  if (charge.targetMass) record.target_mg = charge.targetMass->milligrams();
  if (charge.targetVolume) record.target_uL = charge.targetVolume->microlitres();
  return record;
}

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

void forgetActual(ComponentRecord& record) {
  record.actual_mg.reset();
  record.actual_uL.reset();
  record.actualText.clear();
  record.weighed.reset();
  record.weighedBy.clear();
}

Checked<void> judgeAll(const charge::Plan& plan, const charge::Substances& substances,
                       std::vector<ComponentRecord>& records) {
  const charge::Weighings weighings = recordedWeighings(records);
  for (ComponentRecord& record : records) {
    record.charged_mmol.reset();
    record.uCharged_mmol.reset();
    record.charged_molPercent.reset();
    record.charged_mol_L.reset();
  }
  if (weighings.empty()) return {};
  const auto judged = charge::chargeAsWeighed(plan, substances, weighings);
  if (!judged) return std::unexpected(judged.error());
  for (ComponentRecord& record : records) {
    const charge::ComponentCharge* component = judged->find(record.key);
    if (component != nullptr && component->charged) takeCharged(record, *component->charged);
  }
  return {};
}

}  // namespace vialkeeper::app
