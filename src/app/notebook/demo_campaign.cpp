// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_campaign.h"

#include <algorithm>
#include <array>
#include <iterator>

#include "app/notebook/demo_bulk.h"
#include "app/notebook/demo_people.h"
#include "app/notebook/demo_run.h"
#include "app/notebook/shelf_cards.h"
#include "chem/structure.h"

namespace vialkeeper::app {
namespace {

/// The shelf's cards as tables, the way a group would bring them along.
struct ShelfTable {
  std::string_view kind;
  std::string_view csv;
};

constexpr auto kShelfTables = std::to_array<ShelfTable>({
    {"vials", R"(name,volume,u_volume,displaced,rated_gauge,note
10 mL crimp vial,11.6 mL,0.1 mL,0.15 mL,2.0 bar,invented
20 mL crimp vial,21.5 mL,0.2 mL,0.15 mL,2.0 bar,invented
)"},
    {"lamps", R"(name,wavelength,power,note
LED 440,440 nm,30 W,invented
)"},
    {"lots", R"(name,substance,assay,u_assay,opened,note
indoline 26-A (invented),indoline,0.99,0.005,2026-02-27,invented
NiBr2 glyme 25-7 (invented),nickel(II) bromide glyme,0.97,0.01,2026-01-12,invented
NiBr2 glyme 26-2 (invented),nickel(II) bromide glyme,0.98,0.01,2026-02-25,"invented; kept for May"
)"},
    {"stocks", R"(name,substance,solvent,concentration,u_concentration,volume,made,note
4CzIPN 4 mM in acetonitrile,4CzIPN,acetonitrile,4.0 mM,0.04 mM,50 mL,2026-03-02,invented
pivalic acid 0.10 M in acetonitrile,pivalic acid,acetonitrile,0.10 mol/L,0.001 mol/L,25 mL,2026-03-02,invented
)"},
});

Checked<void> checkEmpty(Notebook& notebook, const DemoOptions& options) {
  if (options.runs < 1)
    return askedFault("--runs", "a demonstration has at least one run", "ask for 1 or more");
  const auto summary = notebook.summary();
  if (!summary) return std::unexpected(summary.error());
  if (summary->revisions == 0) return {};
  return askedFault("", "the notebook is not empty",
                    "make the demonstration in a new file, so that nobody takes it for work");
}

Checked<void> fillShelf(Notebook& notebook, DemoClock& clock, bool withStructures) {
  const Desk desk{notebook, clock, "KW"};
  units::Moment now = clock.now();
  for (const SubstanceDraft& draft : demoShelf(withStructures)) {
    clock.set(now = laterBy(now, 1.0 / 60.0));
    if (const auto added = addSubstanceCard(desk, draft); !added)
      return std::unexpected(added.error());
  }
  for (const ShelfTable& table : kShelfTables) {
    clock.set(now = laterBy(now, 1.0 / 60.0));
    const auto imported = importShelf(desk, table.kind, table.csv, "invented-shelf.csv");
    if (!imported) return std::unexpected(imported.error());
  }
  return {};
}

/// The campaign itself, everybody's steps in the order of time.
Checked<DemoSummary> perform(Notebook& notebook, DemoClock& clock, const DemoOptions& options,
                             bool withStructures) {
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
    if (const auto done = step.work({notebook, clock, step.person}); !done)
      return std::unexpected(done.error());
  }
  return summary;
}

}  // namespace

Checked<DemoSummary> makeDemo(Notebook& notebook, const DemoOptions& options) {
  if (const auto empty = checkEmpty(notebook, options); !empty)
    return std::unexpected(empty.error());
  const bool withStructures = chem::structureEngine().has_value();
  DemoClock clock;
  clock.set(demoMoment(0, 8.0));
  if (const auto done = addDemoPeople(notebook, clock.now()); !done)
    return std::unexpected(done.error());
  if (const auto done = fillShelf(notebook, clock, withStructures); !done)
    return std::unexpected(done.error());
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
