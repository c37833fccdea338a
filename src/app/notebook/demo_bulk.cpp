// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_bulk.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <charconv>
#include <cmath>
#include <map>
#include <span>

#include "app/notebook/demo_bulk_recipe.h"
#include "app/notebook/demo_clock.h"
#include "app/notebook/demo_people.h"
#include "app/notebook/demo_series.h"
#include "app/notebook/log_line.h"

namespace vialkeeper::app {
namespace {

constexpr std::int64_t kBatch =
    500;  // in one action: the index pages are written once for all of them
constexpr std::int64_t kRunsPerDay = 40;
constexpr std::uint64_t kStream = 1'000'000;  // apart from those of the campaign's runs

constexpr auto kColours = std::to_array<std::string_view>(
    {"amber", "yellow", "deep amber", "orange", "brown", "pale yellow", "dark brown", "colourless",
     "green", "red-brown"});
constexpr auto kSolids =
    std::to_array<std::string_view>({"clear", "no solid", "slightly turbid", "some ppt", "turbid",
                                     "black specks", "oily film", "white needles"});
constexpr auto kGas =
    std::to_array<std::string_view>({"steady bubbles", "no bubbles", "fine bubbles on the bar",
                                     "slow bubbles", "fast bubbles", "foam"});
constexpr auto kRare = std::to_array<std::string_view>(
    {"septum bulged", "stir bar stuck", "vial tilted", "fan noisy", "lid fogged",
     "mirror on the glass", "smells of indole", "crystals at the rim", "needle blocked",
     "block at 37 C", "power cut overnight", "gauge drifting", "second lamp used",
     "vial swapped with neighbour", "label smudged", "cap re-crimped"});

/// A place in a list, the first ones far more often: as 1, 1/2, 1/3, …
class Skewed {
 public:
  explicit Skewed(std::size_t count) {
    double sum = 0.0;
    for (std::size_t i = 0; i < count; ++i)
      m_sums.push_back(sum += 1.0 / static_cast<double>(i + 1));
  }
  std::size_t operator()(DemoRandom& random) const {
    const auto found = std::ranges::lower_bound(m_sums, random.between(0.0, m_sums.back()));
    return std::min(static_cast<std::size_t>(found - m_sums.begin()), m_sums.size() - 1);
  }

 private:
  std::vector<double> m_sums;
};

DemoVocabulary makeVocabulary() {
  DemoVocabulary vocabulary;
  vocabulary.photocatalysts = {"4CzIPN"};
  vocabulary.cocatalysts = {"nickel(II) bromide glyme", "nickel(II) chloride hexahydrate",
                            "palladium(II) acetate"};
  vocabulary.acids = {"pivalic acid", "acetic acid", "benzoic acid", "hexanoic acid",
                      "trifluoroacetic acid"};
  const auto fill = [](std::vector<std::string>& names, std::string_view pattern,
                       std::size_t count) {
    while (names.size() < count)
      names.push_back(fmt::format(fmt::runtime(pattern), names.size() + 1));
  };
  fill(vocabulary.photocatalysts, "invented dye D{:02}", 80);
  fill(vocabulary.cocatalysts, "invented metal salt M{:02}", 60);
  fill(vocabulary.acids, "invented acid A{:02}", 60);
  fill(vocabulary.additives, "invented additive X{:03}", 100);
  for (const auto& list :
       {std::span<const std::string_view>(kColours), std::span<const std::string_view>(kSolids),
        std::span<const std::string_view>(kGas), std::span<const std::string_view>(kRare)}) {
    vocabulary.words.insert(vocabulary.words.end(), list.begin(), list.end());
  }
  return vocabulary;
}

/// One run with its records, not yet written.
struct BulkRun {
  RunRecord run;
  std::vector<ComponentRecord> components;
  std::vector<EventRecord> events;
  std::string plan;
};

class BulkWriter {
 public:
  BulkWriter(BulkShelf shelf, BulkCharge charge, const DemoOptions& options)
      : m_shelf(std::move(shelf)), m_charge(std::move(charge)), m_random(options.seed, kStream) {}

  BulkRun next(const units::Moment& at) {
    BulkRun bulk;
    BulkRecipe recipe = this->recipe();
    bulk.plan = bulkPlanText(m_shelf, recipe);
    bulk.run = m_charge.run(recipe.substrate);
    bulk.components = m_charge.components(m_shelf, recipe);
    bulk.run.person = m_random.pick(kDemoPeople);
    bulk.run.created = at;
    bulk.run.title = std::move(recipe.title);
    bulk.run.series = std::move(recipe.series);
    bulk.run.aim = fmt::format("{} One of a screen.", kDemoMark);
    bulk.run.state = m_random.once(0.95) ? RunState::kClosed : RunState::kWorkedUp;
    const double yield = std::clamp(55.0 + 18.0 * m_random.normal(), 0.0, 99.0);
    bulk.run.yield_percent = std::round(yield * 10.0) / 10.0;
    bulk.run.uYield_percent = 2.0;
    bulk.run.conversion_percent = std::min(100.0, std::round(yield * 10.4) / 10.0);
    bulk.run.uConversion_percent = 2.0;
    bulk.run.conclusion = yield > 70.0   ? "Good, worth a second look."
                          : yield < 20.0 ? "Poor, dropped."
                                         : "As expected.";
    weigh(bulk.components, bulk.run, laterBy(at, 0.2));
    log(bulk, yield * 0.01);
    return bulk;
  }

 private:
  BulkRecipe recipe() {
    constexpr auto kCatalyst = std::to_array<double>({1, 1, 1, 0.5, 2, 0.25});
    constexpr auto kMetal = std::to_array<double>({5, 5, 5, 2, 10, 1});
    constexpr auto kAcid = std::to_array<double>({10, 10, 10, 5, 20, 2, 15});
    constexpr auto kAdditive = std::to_array<double>({10, 10, 5, 20});
    BulkRecipe recipe{.substrate = m_random.below(m_shelf.substrates.size()),
                      .photocatalyst = m_photocatalyst(m_random),
                      .cocatalyst = m_cocatalyst(m_random),
                      .acid = m_acid(m_random),
                      .additive = m_additive(m_random),
                      .photocatalyst_molPercent = m_random.pick(kCatalyst),
                      .cocatalyst_molPercent = m_random.pick(kMetal),
                      .acid_molPercent = m_random.pick(kAcid),
                      .additive_molPercent = m_random.pick(kAdditive)};
    recipe.title = fmt::format("{}, {} {:g} mol%", m_shelf.substrates[recipe.substrate].name,
                               m_shelf.acids[recipe.acid].name, recipe.acid_molPercent);
    recipe.series = fmt::format("screen {}", 1 + m_random.below(60));
    return recipe;
  }

  void weigh(std::vector<ComponentRecord>& components, const RunRecord& run,
             const units::Moment& at) {
    for (ComponentRecord& component : components) {
      if (component.role == "solvent") continue;
      const double factor = 1.0 + 0.012 * m_random.normal();
      if (component.target_mg) {
        component.actual_mg = std::round(*component.target_mg * factor * 100.0) / 100.0;
        component.actualText = fmt::format("{:.2f} mg", *component.actual_mg);
      } else {
        component.actual_uL = std::round(*component.target_uL * factor);
        component.actualText = fmt::format("{:.0f} uL", *component.actual_uL);
      }
      const double took = component.target_mg ? *component.actual_mg / *component.target_mg
                                              : *component.actual_uL / *component.target_uL;
      component.weighed = at;
      component.weighedBy = run.person;
      component.charged_mmol = *component.planned_mmol * took;
      component.uCharged_mmol = *component.charged_mmol * 0.01;
      if (component.planned_mol_L) component.charged_mol_L = *component.planned_mol_L * took;
    }
    // The loadings are those of what was weighed against the substrate that was weighed.
    for (ComponentRecord& component : components) {
      if (component.planned_molPercent && component.charged_mmol) {
        component.charged_molPercent =
            100.0 * *component.charged_mmol / *components.front().charged_mmol;
      }
    }
  }

  void log(BulkRun& bulk, double extent) {
    const auto say = [&](double hour, const std::string& line) {
      EventRecord event = readLogLine(line).event;
      event.at = event.logged = laterBy(bulk.run.created, hour);
      event.person = bulk.run.person;
      bulk.events.push_back(std::move(event));
    };
    const auto pressure = [&](double share) {
      constexpr double kBarPerMmol = 0.0831446 * 308.15 / 9.45;
      return fmt::format("p {:.2f} bar 35 C", 0.1 + 0.2 * extent * share * kBarPerMmol);
    };
    say(0.4, observation());
    say(0.5, "lamp on");
    say(1.5, pressure(0.2));
    say(2.5, pressure(0.35));
    say(2.6, "T 35 C");
    say(4.5, pressure(0.6));
    say(4.6, "aliquot 50 uL");
    say(20.4, pressure(1.0));
    say(20.5, "lamp off");
    say(20.7, observation());
  }

  std::string observation() {
    std::string text = fmt::format("{}, {}, {}", kColours[m_colour(m_random)],
                                   kSolids[m_solid(m_random)], kGas[m_gas(m_random)]);
    if (m_random.once(0.05)) text += fmt::format("; {}", kRare[m_rare(m_random)]);
    return text;
  }

  BulkShelf m_shelf;
  BulkCharge m_charge;
  DemoRandom m_random;
  Skewed m_photocatalyst{m_shelf.photocatalysts.size()};
  Skewed m_cocatalyst{m_shelf.cocatalysts.size()};
  Skewed m_acid{m_shelf.acids.size()};
  Skewed m_additive{m_shelf.additives.size()};
  Skewed m_colour{kColours.size()};
  Skewed m_solid{kSolids.size()};
  Skewed m_gas{kGas.size()};
  Skewed m_rare{kRare.size()};
};

/// The next codes of everybody, asked for once in an action and then counted on.
class Codes {
 public:
  explicit Codes(Writing& writing) : m_writing(writing) {}

  Checked<std::string> next(const std::string& person) {
    int& number = m_numbers[person];
    if (number == 0) {
      const auto code = m_writing.nextRunCode(person);
      if (!code) return code;
      std::from_chars(code->data() + person.size() + 1, code->data() + code->size(), number);
    }
    return fmt::format("{}-{:04}", person, number++);
  }

 private:
  Writing& m_writing;
  std::map<std::string, int> m_numbers;
};

Checked<void> write(Writing& writing, Codes& codes, BulkRun& bulk) {
  const auto plan = writing.addAttachment(bulk.plan);
  if (!plan) return std::unexpected(plan.error());
  const auto code = codes.next(bulk.run.person);
  if (!code) return std::unexpected(code.error());
  bulk.run.plan = *plan;
  bulk.run.code = *code;
  const auto n = writing.addRun(bulk.run, bulk.components);
  if (!n) return std::unexpected(n.error());
  for (EventRecord& event : bulk.events) {
    event.run = *n;
    if (const auto added = writing.addEvent(event); !added) return std::unexpected(added.error());
  }
  return {};
}

}  // namespace

const DemoVocabulary& demoVocabulary() {
  static const DemoVocabulary vocabulary = makeVocabulary();
  return vocabulary;
}

Checked<DemoSummary> fillWithRuns(Notebook& notebook, std::int64_t runs,
                                  const DemoOptions& options) {
  if (runs < 0) return askedFault("runs", "a number of runs is at least 0", "give another");
  const units::Moment first =
      laterBy(demoMoment(0, 8.0), -24.0 * static_cast<double>(runs / kRunsPerDay + 3));
  const auto whenOf = [&first](std::int64_t i) {
    return laterBy(first, 24.0 * static_cast<double>(i / kRunsPerDay) +
                              0.2 * static_cast<double>(i % kRunsPerDay));
  };
  if (const auto people = addDemoPeople(notebook, first); !people)
    return std::unexpected(people.error());
  auto shelf = stockBulkShelf(notebook, {{"KW", first}, "demo"});
  if (!shelf) return std::unexpected(shelf.error());
  auto charge = BulkCharge::of(*shelf);
  if (!charge) return std::unexpected(charge.error());
  BulkWriter writer(*std::move(shelf), *std::move(charge), options);
  DemoSummary summary;
  while (summary.runs < runs) {
    const std::int64_t end = std::min(runs, summary.runs + kBatch);
    const auto done = notebook.act(
        {{"KW", laterBy(whenOf(end - 1), 21.0)}, "demo"}, [&](Writing& writing) -> Checked<void> {
          Codes codes(writing);
          for (; summary.runs < end; ++summary.runs) {
            BulkRun bulk = writer.next(whenOf(summary.runs));
            if (const auto written = write(writing, codes, bulk); !written) return written;
            summary.events += static_cast<std::int64_t>(bulk.events.size());
          }
          return {};
        });
    if (!done) return std::unexpected(done.error());
  }
  return summary;
}

}  // namespace vialkeeper::app
