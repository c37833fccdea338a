// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/shelf_places.h"

#include <fmt/format.h>

#include "app/notebook/fold_name.h"
#include "app/notebook/substance_cards.h"
#include "chem/solvents.h"

namespace vialkeeper::app {
namespace {

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

Checked<ShelfPlace> placeOnShelf(Notebook& notebook, const ComponentPlan& component,
                                 text::Notices& notices) {
  auto record = describeSubstance(draftOf(component));
  if (!record) return std::unexpected(record.error());
  const auto match = matchSubstance(notebook, *record);
  if (!match) return std::unexpected(match.error());
  if (!match->same.empty()) return ShelfPlace{match->same.front().n, {}};
  if (!match->nearMisses.empty()) {
    notices.push_back({"near-miss",
                       fmt::format("{} is new on the shelf, where {} looks like it", component.name,
                                   match->nearMisses.front()),
                       "component." + component.key});
  }
  return ShelfPlace{0, *std::move(record)};
}

bool isSameSubstance(const SubstanceRecord& a, const SubstanceRecord& b) {
  if (!a.canonicalSmiles.empty() && a.canonicalSmiles == b.canonicalSmiles) return true;
  if (!a.cas.empty() && a.cas == b.cas) return true;
  return foldName(a.name) == foldName(b.name);
}

}  // namespace

Checked<std::vector<ShelfPlace>> placeAll(Notebook& notebook, const charge::Plan& plan,
                                          const KnownPlace& known, text::Notices& notices) {
  std::vector<ShelfPlace> places;
  text::Faults faults;
  for (const ComponentPlan& component : plan.components) {
    if (const RowNumber n = known ? known(component) : 0; n != 0) {
      places.push_back({.n = n});
      continue;
    }
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

Checked<void> putOnShelf(Writing& writing, std::vector<ShelfPlace>& places,
                         std::vector<std::string>& added) {
  for (std::size_t i = 0; i < places.size(); ++i) {
    if (places[i].n != 0) continue;
    const auto n = writing.addSubstance(places[i].record);
    if (!n) return std::unexpected(n.error());
    added.push_back(places[i].record.name);
    for (std::size_t j = i; j < places.size(); ++j) {
      if (places[j].n == 0 && isSameSubstance(places[j].record, places[i].record)) places[j].n = *n;
    }
  }
  return {};
}

}  // namespace vialkeeper::app
