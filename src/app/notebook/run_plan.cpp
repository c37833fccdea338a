// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/run_plan.h"

#include <fmt/format.h>

#include <algorithm>

#include "app/notebook/fold_name.h"
#include "app/notebook/substance_cards.h"
#include "app/sheet_parts.h"
#include "charge/plan_edit.h"
#include "charge/plan_reader.h"
#include "chem/solvents.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

using charge::ComponentCharge;
using charge::ComponentPlan;

/// What a plan says of one component's substance, for the shelf.
SubstanceDraft draftOf(const ComponentPlan& component) {
  SubstanceDraft draft{.name = component.name,
                       .formula = component.identity.formula,
                       .smiles = component.identity.smiles,
                       .cas = component.identity.cas,
                       .hazards = component.hazards};
  if (component.identity.molarMass) {
    draft.molarMass = fmt::format("{:.6g} g/mol", component.identity.molarMass->gramsPerMole());
  }
  if (!component.identity.isEmpty()) return draft;
  if (const chem::Solvent* solvent = chem::findSolvent(component.name)) {
    draft.formula = solvent->formula;
    draft.smiles = solvent->smiles;
    if (draft.cas.empty()) draft.cas = solvent->cas;
    if (foldName(solvent->name) != foldName(component.name))
      draft.synonyms.push_back(solvent->name);
  }
  return draft;
}

/// A component's substance on the shelf, or a new card for it.
struct ShelfPlace {
  RowNumber n = 0;         ///< 0: to be added
  SubstanceRecord record;  ///< of a new card
};

Checked<ShelfPlace> placeOnShelf(Notebook& notebook, const ComponentPlan& component,
                                 text::Notices& notices) {
  auto record = describeSubstance(draftOf(component));
  if (!record) return std::unexpected(record.error());
  const auto match = matchSubstance(notebook, *record);
  if (!match) return std::unexpected(match.error());
  if (!match->same.empty()) return ShelfPlace{match->same.front().n, {}};
  if (auto notice = nearMissNotice(*match, component.name, "component." + component.key))
    notices.push_back(*std::move(notice));
  return ShelfPlace{0, *std::move(record)};
}

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

/// The shelf place of every component, substances that occur twice in the plan found once.
Checked<std::vector<ShelfPlace>> placeAll(Notebook& notebook, const charge::Plan& plan,
                                          text::Notices& notices) {
  std::vector<ShelfPlace> places;
  text::Faults faults;
  for (const ComponentPlan& component : plan.components) {
    auto place = placeOnShelf(notebook, component, notices);
    if (place) {
      places.push_back(*std::move(place));
    } else {
      for (text::Fault& fault : place.error()) {
        if (fault.kind == text::FaultKind::kNotebook) return std::unexpected(place.error());
        fault.field = "component." + component.key + (fault.field.empty() ? "" : "." + fault.field);
        fault.file = plan.file;
        fault.line = component.place.line;
        faults.push_back(fault);
      }
    }
  }
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return places;
}

bool isLetterOrDigit(char c) {
  return (c >= 'a' && c <= 'z') || (c >= '0' && c <= '9') ||
         (static_cast<unsigned char>(c) >= 0x80);
}

/// Whether the text holds the word by itself, both in lower case; `figure`: behind a figure.
bool holdsWord(std::string_view text, std::string_view word, bool figure) {
  if (word.empty()) return false;
  for (std::size_t at = text.find(word); at != std::string_view::npos;
       at = text.find(word, at + 1)) {
    const std::string_view before = text::trimmed(text.substr(0, at));
    const bool begins = figure ? !before.empty() && before.back() >= '0' && before.back() <= '9'
                               : at == 0 || !isLetterOrDigit(text[at - 1]);
    const std::size_t end = at + word.size();
    if (begins && (end == text.size() || !isLetterOrDigit(text[end]))) return true;
  }
  return false;
}

/// The unit in which a field's value is told, as a title would: `nm` of `455 nm`, `mol%`, `equiv`.
std::string unitOf(const PlanOverride& override) {
  if (override.path.ends_with(".mol_percent")) return "mol%";
  if (override.path.ends_with(".equiv")) return "equiv";
  const std::size_t figures = override.value.find_last_of("0123456789.,");
  if (figures == std::string::npos) return {};
  return text::asciiLowered(text::trimmed(std::string_view(override.value).substr(figures + 1)));
}

/// Whether the title speaks of what was set: of the component by key, role or name, or of a figure
/// in the same unit that is not the new one.
bool speaksOf(const charge::Plan& plan, const PlanOverride& override) {
  const std::string title = text::asciiLowered(plan.title);
  constexpr std::string_view kComponent = "component.";
  if (override.path.starts_with(kComponent)) {
    const std::string_view rest = std::string_view(override.path).substr(kComponent.size());
    const ComponentPlan* component = plan.find(rest.substr(0, rest.find('.')));
    if (component != nullptr) {
      for (const std::string_view word : {std::string_view(component->key), toText(component->role),
                                          std::string_view(component->name)}) {
        if (holdsWord(title, text::asciiLowered(word), false)) return true;
      }
    }
  }
  const std::string unit = unitOf(override);
  const std::string value = text::asciiLowered(override.value);
  return holdsWord(title, unit, true) && title.find(value) == std::string::npos;
}

/// A title that is still the plan's though it speaks of what was set otherwise.
void noteKeptTitle(const NewRun& wanted, const charge::Plan& plan, text::Notices& notices) {
  const bool isSet = std::ranges::any_of(
      wanted.overrides, [](const PlanOverride& each) { return each.path == "title"; });
  if (!wanted.title.empty() || isSet) return;
  for (const PlanOverride& override : wanted.overrides) {
    if (!speaksOf(plan, override)) continue;
    notices.push_back({"title-kept",
                       fmt::format("{} is the title of the plan and may speak of another {}: give "
                                   "this run its own with --title",
                                   text::quoted(plan.title), override.path),
                       "title"});
    return;
  }
}

bool isSameSubstance(const SubstanceRecord& a, const SubstanceRecord& b) {
  if (!a.canonicalSmiles.empty() && a.canonicalSmiles == b.canonicalSmiles) return true;
  if (!a.cas.empty() && a.cas == b.cas) return true;
  return foldName(a.name) == foldName(b.name);
}

Checked<void> writeRun(Writing& writing, RunRecord& run, std::vector<ComponentRecord>& components,
                       std::vector<ShelfPlace>& places, const std::string& planText,
                       std::vector<std::string>& added) {
  for (std::size_t i = 0; i < places.size(); ++i) {
    if (places[i].n == 0) {
      const auto n = writing.addSubstance(places[i].record);
      if (!n) return std::unexpected(n.error());
      added.push_back(places[i].record.name);
      for (std::size_t j = i; j < places.size(); ++j) {
        if (places[j].n == 0 && isSameSubstance(places[j].record, places[i].record))
          places[j].n = *n;
      }
    }
    components[i].substance = places[i].n;
  }
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

ComponentRecord plannedRecord(const ComponentPlan& plan, const ComponentCharge& charge,
                              int position) {
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
  if (!run.title.empty()) plan->title = run.title;
  plan->code = run.code;
  if (plan->chemist.empty()) plan->chemist = run.person;
  if (plan->date.empty()) plan->date = toIsoText(run.created).substr(0, 10);
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
  noteKeptTitle(wanted, planned->plan, added.notices);
  added.run.aim = wanted.aim;
  added.run.person = desk.person;
  added.run.created = desk.clock.now();
  added.run.clonedFrom = wanted.clonedFrom;
  auto places = placeAll(desk.notebook, planned->plan, added.notices);
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
