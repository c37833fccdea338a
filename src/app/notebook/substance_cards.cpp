// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/substance_cards.h"

#include <fmt/format.h>

#include <algorithm>

#include "app/notebook/fold_name.h"
#include "charge/substances.h"
#include "chem/cas_number.h"
#include "chem/structure.h"
#include "text/utf8.h"
#include "units/quantity_text.h"
#include "units/toml_section.h"

namespace vialkeeper::app {
namespace {

using text::Faults;

/// The draft as one component of a plan, so that the shelf and a plan agree on what a substance is.
charge::Plan planOf(const SubstanceDraft& draft, Faults& faults) {
  charge::Plan plan;
  charge::ComponentPlan component{.key = "substance",
                                  .role = charge::Role::kOther,
                                  .name = draft.name,
                                  .identity = {.smiles = draft.smiles,
                                               .formula = draft.formula,
                                               .molarMass = {},
                                               .cas = draft.cas},
                                  .amount = {charge::Basis::kAmount, 1.0, ""},
                                  .supply = charge::SolidSupply{},
                                  .device = {},
                                  .tolerancePercent = {},
                                  .hazards = {},
                                  .place = {.path = "substance", .line = 0}};
  if (!draft.molarMass.empty()) {
    const auto mass =
        units::readQuantity<units::MolarMass>(draft.molarMass, units::Dialect::kPerson);
    if (mass) {
      component.identity.molarMass = *mass;
      component.identity.molarMassLastDigit = units::MolarMass::fromGramsPerMole(0.01);
    } else {
      faults.push_back({.field = "molar_mass",
                        .what = fmt::format("{}: {}", text::quoted(draft.molarMass),
                                            whatWithPosition(mass.error(), draft.molarMass)),
                        .mend = mass.error().mend});
    }
  }
  plan.components.push_back(std::move(component));
  return plan;
}

void checkTexts(const SubstanceDraft& draft, Faults& faults) {
  if (text::trimmed(draft.name).empty()) {
    faults.push_back({.field = "name",
                      .what = "the substance has no name",
                      .mend = "give the name you call it by"});
  }
  for (const auto& [field, content] :
       {std::pair{"name", draft.name}, std::pair{"note", draft.note}}) {
    if (text::firstInvalidUtf8(content) || text::oneLine(content) != content) {
      faults.push_back({.field = field,
                        .what = "the text holds invisible control characters",
                        .mend = "type it again in one plain line"});
    }
  }
  if (draft.cas.empty()) return;
  if (const auto checked = chem::checkCasNumber(draft.cas); !checked) {
    faults.push_back({.field = "cas",
                      .what = fmt::format("{}: {}", text::quoted(draft.cas),
                                          whatWithPosition(checked.error(), draft.cas)),
                      .mend = checked.error().mend});
  }
}

/// What only the structure module can tell.
void addStructure(const std::string& smiles, SubstanceRecord& record, Faults& faults) {
  const auto engine = chem::structureEngine();
  const auto identity = engine ? (*engine)->identify(smiles) : std::unexpected(engine.error());
  if (!identity) {
    faults.push_back(
        {.field = "smiles", .what = identity.error().what, .mend = identity.error().mend});
    return;
  }
  record.inchiKey = identity->inchiKey;
  if (const auto fingerprint = (*engine)->fingerprint(smiles)) record.fingerprint = *fingerprint;
}

bool contradicts(const SubstanceRecord& a, const SubstanceRecord& b) {
  const auto differ = [](const std::string& x, const std::string& y) {
    return !x.empty() && !y.empty() && x != y;
  };
  return differ(a.canonicalSmiles, b.canonicalSmiles) || differ(a.cas, b.cas) ||
         differ(a.formula, b.formula);
}

/// Names within two letters of it, folded, the nearest first.
Checked<std::vector<std::string>> nearNames(Notebook& notebook, std::string_view name) {
  const auto names = notebook.substanceNames();
  if (!names) return std::unexpected(names.error());
  const std::string wanted = foldName(name);
  std::vector<std::string> near;
  for (const auto& [candidate, n] : *names) {
    const std::string folded = foldName(candidate);
    const bool beginning = wanted.size() >= 4 && folded.starts_with(wanted);
    if (beginning || units::nearestName(wanted, {folded})) near.push_back(candidate);
    if (near.size() == 8) break;
  }
  return near;
}

}  // namespace

Checked<SubstanceRecord> describeSubstance(const SubstanceDraft& draft) {
  Faults faults;
  checkTexts(draft, faults);
  const charge::Plan plan = planOf(draft, faults);
  auto resolved = charge::resolveSubstances(plan, charge::structureModuleReader());
  if (!resolved) faults.insert(faults.end(), resolved.error().begin(), resolved.error().end());
  if (!faults.empty()) return std::unexpected(std::move(faults));
  const charge::Substance& substance = resolved->components.front();
  SubstanceRecord record{.name = std::string(text::trimmed(draft.name)),
                         .synonyms = draft.synonyms,
                         .formula = substance.formula,
                         .smiles = draft.smiles,
                         .canonicalSmiles = substance.canonicalSmiles,
                         .inchiKey = {},
                         .cas = draft.cas,
                         .molarMass_g_mol = {},
                         .uMolarMass_g_mol = {},
                         .fingerprint = {},
                         .hazards = draft.hazards,
                         .note = draft.note};
  if (substance.molarMass) {
    record.molarMass_g_mol = substance.molarMass->value.gramsPerMole();
    record.uMolarMass_g_mol = substance.molarMass->standardUncertainty.gramsPerMole();
  }
  if (!draft.smiles.empty()) addStructure(draft.smiles, record, faults);
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return record;
}

Checked<SubstanceMatch> matchSubstance(Notebook& notebook, const SubstanceRecord& substance) {
  SubstanceMatch match;
  if (!substance.canonicalSmiles.empty()) {
    auto found = notebook.substanceByStructure(substance.canonicalSmiles);
    if (!found) return std::unexpected(found.error());
    if (*found) match.same.push_back(**std::move(found));
    if (!match.same.empty()) return match;
  }
  if (!substance.cas.empty()) {
    auto found = notebook.substanceByCas(substance.cas);
    if (!found) return std::unexpected(found.error());
    if (*found && !contradicts(**found, substance)) match.same.push_back(**std::move(found));
    if (!match.same.empty()) return match;
  }
  auto named = notebook.substancesByName(foldName(substance.name));
  if (!named) return std::unexpected(named.error());
  std::erase_if(*named,
                [&](const SubstanceRecord& other) { return contradicts(other, substance); });
  match.same = *std::move(named);
  if (!match.same.empty()) return match;
  auto near = nearNames(notebook, substance.name);
  if (!near) return std::unexpected(near.error());
  match.nearMisses = *std::move(near);
  return match;
}

Checked<SubstanceMatch> lookUpSubstance(Notebook& notebook, std::string_view nameOrCas) {
  SubstanceMatch match;
  auto byCas = notebook.substanceByCas(nameOrCas);
  if (!byCas) return std::unexpected(byCas.error());
  if (*byCas) {
    match.same.push_back(**std::move(byCas));
    return match;
  }
  auto named = notebook.substancesByName(foldName(nameOrCas));
  if (!named) return std::unexpected(named.error());
  match.same = *std::move(named);
  if (!match.same.empty()) return match;
  auto near = nearNames(notebook, nameOrCas);
  if (!near) return std::unexpected(near.error());
  match.nearMisses = *std::move(near);
  return match;
}

Checked<SubstanceRecord> addSubstanceCard(const Desk& desk, const SubstanceDraft& draft) {
  auto record = describeSubstance(draft);
  if (!record) return record;
  const auto match = matchSubstance(desk.notebook, *record);
  if (!match) return std::unexpected(match.error());
  if (!match->same.empty()) {
    return askedFault(
        "name",
        fmt::format("{} is on the shelf already, as {}", draft.name, match->same.front().name),
        "add a synonym to that card instead");
  }
  const auto done =
      desk.notebook.act(desk.action("shelf add"), [&](Writing& writing) -> Checked<void> {
        const auto n = writing.addSubstance(*record);
        if (!n) return std::unexpected(n.error());
        record->n = *n;
        record->version = 1;
        return {};
      });
  if (!done) return std::unexpected(done.error());
  return record;
}

}  // namespace vialkeeper::app
