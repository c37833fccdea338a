// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_campaign.h"

#include <algorithm>
#include <iterator>

#include "app/notebook/demo_bulk.h"
#include "app/notebook/demo_people.h"
#include "app/notebook/demo_run.h"
#include "app/notebook/shelf_cards.h"
#include "chem/structure.h"

namespace vialkeeper::app {
namespace {

struct CardText {
  ShelfKind kind;
  const char* name;
  TypedFields fields;
};

std::vector<CardText> shelfCards() {
  using enum ShelfKind;
  const std::pair<std::string, std::string> invented{"note", "invented"};
  return {
      {kVial, "10 mL crimp vial", {{"volume", "11.6 mL"}, {"u_volume", "0.1 mL"}, {"displaced", "0.15 mL"}, {"rated_gauge", "2.0 bar"}, invented}},
      {kVial, "20 mL crimp vial", {{"volume", "21.5 mL"}, {"u_volume", "0.2 mL"}, {"displaced", "0.15 mL"}, {"rated_gauge", "2.0 bar"}, invented}},
      {kLamp, "LED 440", {{"wavelength", "440 nm"}, {"power", "30 W"}, invented}},
      {kLot, "indoline 26-A (invented)", {{"substance", "indoline"}, {"assay", "0.99"}, {"u_assay", "0.005"}, {"density", "1.063 g/mL"}, {"opened", "2026-02-27"}, invented}},
      {kLot, "NiBr2 glyme 25-7 (invented)", {{"substance", "nickel(II) bromide glyme"}, {"assay", "0.97"}, {"u_assay", "0.01"}, {"opened", "2026-01-12"}, invented}},
      {kLot, "NiBr2 glyme 26-2 (invented)", {{"substance", "nickel(II) bromide glyme"}, {"assay", "0.98"}, {"u_assay", "0.01"}, {"opened", "2026-05-18"}, invented}},
      {kStock, "4CzIPN 4 mM in acetonitrile", {{"substance", "4CzIPN"}, {"concentration", "4.0 mM"}, {"u_concentration", "0.04 mM"}, {"solvent", "acetonitrile"}, {"volume", "50 mL"}, {"made", "2026-03-02"}, invented}},
      {kStock, "pivalic acid 0.10 M in acetonitrile", {{"substance", "pivalic acid"}, {"concentration", "0.10 mol/L"}, {"u_concentration", "0.001 mol/L"}, {"solvent", "acetonitrile"}, {"volume", "25 mL"}, {"made", "2026-03-02"}, invented}},
      {kStock, "Pd(OAc)2 10 mM in DMF", {{"substance", "palladium(II) acetate"}, {"concentration", "10 mM"}, {"u_concentration", "0.1 mM"}, {"solvent", "DMF"}, {"volume", "10 mL"}, {"made", "2026-03-31"}, invented}},
  };
}

Checked<void> checkEmpty(Notebook& notebook, const DemoOptions& options) {
  if (options.runs < 1) return askedFault("--runs", "a demonstration has at least one run", "ask for 1 or more");
  const auto summary = notebook.summary();
  if (!summary) return std::unexpected(summary.error());
  if (summary->revisions == 0) return {};
  return askedFault("", "the notebook is not empty", "make the demonstration in a new file, so that nobody takes it for work");
}

Checked<void> fillShelf(Notebook& notebook, DemoClock& clock, bool withStructures) {
  const Desk desk{notebook, clock, "KW"};
  units::Moment now = clock.now();
  for (const SubstanceDraft& draft : demoShelf(withStructures)) {
    clock.set(now = laterBy(now, 1.0 / 60.0));
    if (const auto added = addSubstanceCard(desk, draft); !added) return std::unexpected(added.error());
  }
  for (const CardText& card : shelfCards()) {
    clock.set(now = laterBy(now, 1.0 / 60.0));
    if (const auto added = addShelfCard(desk, card.kind, card.name, card.fields); !added) return std::unexpected(added.error());
  }
  return {};
}

/// The campaign itself, everybody's steps in the order of time.
Checked<DemoSummary> perform(Notebook& notebook, DemoClock& clock, const DemoOptions& options, bool withStructures) {
  DemoSummary summary;
  std::vector<DemoRun> runs = demoRuns(options);
  std::vector<DemoStep> steps;
  for (DemoRun& run : runs) {
    auto more = demoSteps(run, runs, withStructures, summary);
    std::ranges::move(more, std::back_inserter(steps));
  }
  std::ranges::stable_sort(steps, {}, [](const DemoStep& step) { return step.at.utc; });
  for (const DemoStep& step : steps) {
    clock.set(step.at);
    if (const auto done = step.work({notebook, clock, step.person}); !done) return std::unexpected(done.error());
  }
  return summary;
}

}  // namespace

Checked<DemoSummary> makeDemo(Notebook& notebook, const DemoOptions& options) {
  if (const auto empty = checkEmpty(notebook, options); !empty) return std::unexpected(empty.error());
  const bool withStructures = chem::structureEngine().has_value();
  DemoClock clock;
  clock.set(demoMoment(0, 8.0));
  if (const auto done = addDemoPeople(notebook, clock.now()); !done) return std::unexpected(done.error());
  if (const auto done = fillShelf(notebook, clock, withStructures); !done) return std::unexpected(done.error());
  DemoSummary summary;
  if (options.runs > kDemoCampaignRuns) {
    const auto bulk = fillWithRuns(notebook, options.runs - kDemoCampaignRuns, options);
    if (!bulk) return bulk;
    summary = *bulk;
  }
  const auto campaign = perform(notebook, clock, options, withStructures);
  if (!campaign) return campaign;
  summary.runs += campaign->runs;
  summary.events += campaign->events;
  summary.datasets += campaign->datasets;
  return summary;
}

}  // namespace vialkeeper::app
