// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/edit_run.h"

#include <fmt/format.h>

#include <algorithm>

#include "app/notebook/component_records.h"
#include "app/notebook/plan_edits.h"
#include "app/notebook/run_life.h"
#include "app/notebook/shelf_places.h"
#include "charge/plan_reader.h"
#include "charge/weighing.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

using text::Faults;

/// A run as it would be after its edits, and what has to be written for it.
struct EditPlanned {
  std::string text;
  PlannedRun planned;
  RunRecord run;
  std::vector<ComponentRecord> components;  ///< in the plan's order; new ones have no number yet
  std::vector<ComponentRecord> removed;
  std::vector<ShelfPlace> places;
  text::Notices notices;
};

void append(Faults& faults, const Faults& more) {
  faults.insert(faults.end(), more.begin(), more.end());
}

bool isWeighed(const ComponentRecord& component) {
  return component.actual_mg || component.actual_uL;
}

bool isSameIdentity(const charge::ComponentPlan& a, const charge::ComponentPlan& b) {
  return a.name == b.name && a.identity.smiles == b.identity.smiles &&
         a.identity.formula == b.identity.formula && a.identity.cas == b.identity.cas &&
         a.identity.molarMass == b.identity.molarMass;
}

/// The title follows the plan's where that one changed; it may have been set besides the plan.
RunRecord headed(const RunRecord& run, const PlannedRun& planned, const charge::Plan* before) {
  const RunRecord said = runRecord(planned);
  RunRecord changed = run;
  if (before == nullptr || before->title != planned.plan.title) changed.title = said.title;
  changed.series = said.series;
  changed.vial = said.vial;
  changed.lamp = said.lamp;
  changed.atmosphere = said.atmosphere;
  changed.wavelength_nm = said.wavelength_nm;
  changed.temperature_C = said.temperature_C;
  changed.duration_h = said.duration_h;
  changed.limitingKey = said.limitingKey;
  changed.limiting_mmol = said.limiting_mmol;
  changed.liquid_mL = said.liquid_mL;
  return changed;
}

class RunEditor {
 public:
  RunEditor(Notebook& notebook, const RunRecord& run) : m_notebook(notebook), m_run(run) {}

  /// `faults` are those found before; with them nothing comes back.
  Checked<EditPlanned> plan(const std::vector<PlanEdit>& edits, Faults faults) {
    const auto textBefore = m_notebook.attachment(m_run.plan);
    if (!textBefore) return std::unexpected(textBefore.error());
    auto records = m_notebook.components(m_run.n);
    if (!records) return std::unexpected(records.error());
    m_records = *std::move(records);
    auto edited = editPlanText(m_notebook, *textBefore, m_run.code, edits);
    if (!edited) return std::unexpected(edited.error());
    append(faults, edited->faults);
    if (auto before = charge::readPlan(*textBefore, m_run.code)) m_before = *std::move(before);
    auto planned = planCharge(edited->text, m_run.code, {});
    if (!planned) {
      append(faults, planned.error());
      for (text::Fault& fault : faults) nameAmountCell(fault, edited->amountKeys);
      return std::unexpected(std::move(faults));
    }
    EditPlanned result{.text = edited->text,
                       .planned = *std::move(planned),
                       .run = {},
                       .components = {},
                       .removed = {},
                       .places = {},
                       .notices = {}};
    checkRemoved(result, faults);
    makeComponents(result, faults);
    if (faults.empty()) {
      if (const auto judged =
              judgeAll(result.planned.plan, result.planned.substances, result.components);
          !judged)
        append(faults, judged.error());
    }
    placeOnShelf(result, edited->cards, faults);
    if (!faults.empty()) return std::unexpected(std::move(faults));
    result.run = headed(m_run, result.planned, m_before ? &*m_before : nullptr);
    return result;
  }

 private:
  [[nodiscard]] const ComponentRecord* recordOf(const std::string& key) const {
    const auto found = std::ranges::find(m_records, key, &ComponentRecord::key);
    return found == m_records.end() ? nullptr : &*found;
  }

  void checkRemoved(EditPlanned& result, Faults& faults) const {
    for (const ComponentRecord& record : m_records) {
      if (result.planned.plan.find(record.key) != nullptr) continue;
      result.removed.push_back(record);
      if (!isWeighed(record)) continue;
      faults.push_back({.field = "component." + record.key,
                        .what = fmt::format("{} was weighed: {} is in the vial", record.name,
                                            text::quoted(record.actualText)),
                        .mend = "take the weighing out first if it never went in"});
    }
  }

  void makeComponents(EditPlanned& result, Faults& faults) const {
    const charge::Plan& plan = result.planned.plan;
    for (std::size_t i = 0; i < plan.components.size(); ++i) {
      ComponentRecord made = plannedRecord(plan.components[i], result.planned.charge.components[i],
                                           static_cast<int>(i));
      made.run = m_run.n;
      if (const ComponentRecord* present = recordOf(made.key)) {
        keepRecorded(*present, made);
        checkRecorded(plan.components[i], made, faults);
      }
      result.components.push_back(std::move(made));
    }
  }

  static void keepRecorded(const ComponentRecord& present, ComponentRecord& made) {
    made.n = present.n;
    made.version = present.version;
    made.substance = present.substance;
    made.lot = present.lot;
    made.stock = present.stock;
    made.actualText = present.actualText;
    made.actual_mg = present.actual_mg;
    made.actual_uL = present.actual_uL;
    made.weighed = present.weighed;
    made.weighedBy = present.weighedBy;
  }

  /// What was weighed stays weighed, so the new supply must allow it.
  static void checkRecorded(const charge::ComponentPlan& component, const ComponentRecord& made,
                            Faults& faults) {
    for (const charge::Weighing& weighing : recordedWeighings({made})) {
      if (const auto fits = charge::checkRecordable(component, weighing.actual); !fits) {
        faults.push_back({.field = fmt::format("component.{}.supply", made.key),
                          .what = fmt::format("{} is recorded, but {}",
                                              text::quoted(made.actualText), fits.error().what),
                          .mend = fits.error().mend});
      }
    }
  }

  /// A component that says the same of its substance as before keeps its card.
  void placeOnShelf(EditPlanned& result, const std::map<std::string, RowNumber>& cards,
                    Faults& faults) const {
    const auto known = [&](const charge::ComponentPlan& component) -> RowNumber {
      if (const auto card = cards.find(component.key); card != cards.end()) return card->second;
      const ComponentRecord* present = recordOf(component.key);
      const charge::ComponentPlan* before = m_before ? m_before->find(component.key) : nullptr;
      const bool same =
          present != nullptr && before != nullptr && isSameIdentity(*before, component);
      return same ? present->substance : 0;
    };
    auto places = placeAll(m_notebook, result.planned.plan, known, result.notices);
    if (!places) {
      append(faults, places.error());
      return;
    }
    result.places = *std::move(places);
    // A lot or stock is one of its substance.
    for (std::size_t i = 0; i < result.components.size(); ++i) {
      ComponentRecord& component = result.components[i];
      if (component.substance != result.places[i].n) component.lot = component.stock = 0;
      component.substance = result.places[i].n;
    }
  }

  Notebook& m_notebook;
  const RunRecord& m_run;
  std::vector<ComponentRecord> m_records;
  std::optional<charge::Plan> m_before;
};

Checked<void> write(Writing& writing, EditPlanned& edit, std::vector<std::string>& newSubstances) {
  if (const auto put = putOnShelf(writing, edit.places, newSubstances); !put) return put;
  const auto text = writing.addAttachment(edit.text);
  if (!text) return std::unexpected(text.error());
  edit.run.plan = *text;
  for (const ComponentRecord& removed : edit.removed) {
    if (const auto done = writing.removeComponent(removed); !done) return done;
  }
  for (std::size_t i = 0; i < edit.components.size(); ++i) {
    ComponentRecord& component = edit.components[i];
    component.substance = edit.places[i].n;
    if (component.n != 0) {
      if (const auto done = writing.changeComponent(component); !done) return done;
    } else if (const auto n = writing.addComponent(component); !n) {
      return std::unexpected(n.error());
    }
  }
  return writing.changeRun(edit.run);
}

}  // namespace

Checked<RunSheet> previewEdit(Notebook& notebook, const RunRecord& run,
                              const std::vector<PlanEdit>& edits) {
  // Whether a reason is wanted is a question of writing, not of the plan.
  const auto may = mayDo(run.state, Deed::kChangePlan, "preview");
  auto edit = RunEditor(notebook, run).plan(edits, may ? Faults{} : may.error());
  if (!edit) return std::unexpected(edit.error());
  const charge::Weighings weighings = recordedWeighings(edit->components);
  if (!weighings.empty()) {
    auto judged = charge::chargeAsWeighed(edit->planned.plan, edit->planned.substances, weighings);
    if (!judged) return std::unexpected(judged.error());
    edit->planned.charge = *std::move(judged);
  }
  headPlan(edit->planned.plan, edit->run);
  return RunSheet{std::move(edit->run), std::move(edit->components), std::move(edit->planned),
                  !weighings.empty()};
}

Checked<EditedRun> editRun(const Desk& desk, const RunRecord& run,
                           const std::vector<PlanEdit>& edits, const std::string& reason) {
  const auto may = mayDo(run.state, Deed::kChangePlan, reason);
  auto edit = RunEditor(desk.notebook, run).plan(edits, may ? Faults{} : may.error());
  if (!edit) return std::unexpected(edit.error());
  std::vector<std::string> newSubstances;
  const auto done = desk.notebook.act(desk.action("change", reason), [&](Writing& writing) {
    return write(writing, *edit, newSubstances);
  });
  if (!done) return std::unexpected(done.error());
  const auto current = desk.notebook.run(run.n);
  if (!current) return std::unexpected(current.error());
  auto sheet = loadRun(desk.notebook, *current);
  if (!sheet) return std::unexpected(sheet.error());
  return EditedRun{*std::move(sheet), run.plan, std::move(newSubstances), std::move(edit->notices)};
}

Checked<EditedRun> restorePlan(const Desk& desk, const RunRecord& run, RowNumber plan,
                               const std::string& reason) {
  auto text = desk.notebook.attachment(plan);
  if (!text) return std::unexpected(text.error());
  return editRun(desk, run, {WholePlan{*std::move(text)}}, reason);
}

}  // namespace vialkeeper::app
