// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_run.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <memory>

#include "app/notebook/dataset_import.h"
#include "app/notebook/demo_data.h"
#include "app/notebook/demo_words.h"
#include "app/notebook/log_run.h"
#include "app/notebook/run_plan.h"
#include "app/notebook/run_results.h"
#include "app/notebook/weigh_run.h"

namespace vialkeeper::app {
namespace {

constexpr double kMinute = 1.0 / 60.0;

template <class T>
Checked<void> withoutValue(const Checked<T>& result) {
  if (!result) return std::unexpected(result.error());
  return {};
}

/// The steps of one run; they keep it alive.
class StepWriter : public std::enable_shared_from_this<StepWriter> {
 public:
  StepWriter(DemoRun& run, const std::vector<DemoRun>& runs, bool withStructures,
             DemoSummary& summary)
      : m_run(run),
        m_runs(runs),
        m_withStructures(withStructures),
        m_summary(summary),
        m_setUp(demoMoment(run.spec.day, run.spec.hour)),
        m_lamp(laterBy(m_setUp, kDemoSetUp_h)) {}

  std::vector<DemoStep> run() {
    at(m_setUp, [this](const Desk& desk) { return add(desk); });
    if (m_run.spec.state == RunState::kPlanned) return std::move(m_steps);
    weighings();
    if (m_run.spec.state != RunState::kCharged) {
      entries();
      if (m_run.spec.state != RunState::kIrradiating) outcome();
    }
    const units::Moment end = demoMoment(kDemoLastDay, kDemoLastHour);
    std::erase_if(m_steps, [&end](const DemoStep& step) { return step.at.utc > end.utc; });
    return std::move(m_steps);
  }

 private:
  template <class Work>
  void at(const units::Moment& moment, Work work) {
    m_steps.push_back({moment, m_run.spec.person,
                       [self = shared_from_this(), work = std::move(work)](const Desk& desk) {
                         return work(desk);
                       }});
  }

  Checked<RunRecord> record(const Desk& desk) const { return desk.notebook.run(m_run.n); }

  Checked<void> add(const Desk& desk) {
    const DemoRecipe& recipe = m_run.spec.recipe;
    auto added = m_run.frame != nullptr
                     ? clone(desk)
                     : addRun(desk, {.planText = demoPlanText(recipe, m_withStructures),
                                     .planFile = "plan.toml",
                                     .aim = m_run.spec.aim});
    if (!added) return std::unexpected(added.error());
    m_run.n = added->run.n;
    m_run.code = added->run.code;
    ++m_summary.runs;
    if (added->run.aim == m_run.spec.aim) return {};
    const auto current = record(desk);
    if (!current) return std::unexpected(current.error());
    return withoutValue(recordResult(desk, *current, {.aim = m_run.spec.aim}));
  }

  Checked<AddedRun> clone(const Desk& desk) const {
    const DemoRecipe& from = m_run.frame->spec.recipe;
    const DemoRecipe& to = m_run.spec.recipe;
    std::vector<PlanOverride> overrides;
    const auto set = [&overrides](std::string path, double before, double after,
                                  std::string_view unit) {
      if (before != after)
        overrides.push_back({std::move(path), fmt::format("{:g}{}", after, unit)});
    };
    if (from.series != to.series) overrides.push_back({"series", to.series});
    if (from.title != to.title) overrides.push_back({"title", to.title});
    set("component.amine.amount", from.substrate_mmol, to.substrate_mmol, " mmol");
    set("component.pc.mol_percent", from.catalyst_molPercent, to.catalyst_molPercent, "");
    if (to.metal != DemoMetalKind::kNone) {
      set(fmt::format("component.{}.mol_percent", demoMetal(to.metal).key), from.metal_molPercent,
          to.metal_molPercent, "");
    }
    set("component.acid.mol_percent", from.acid_molPercent, to.acid_molPercent, "");
    set("irradiation.duration", from.light_h, to.light_h, " h");
    auto original = desk.notebook.run(m_run.frame->n);
    if (!original) return std::unexpected(original.error());
    return cloneRun(desk, *original, overrides, "");
  }

  void weighings() {
    int place = 0;
    for (const std::string_view key : {"amine", "indole", "nickel", "pc", "acid", "palladium"}) {
      const double hour = 5 * kMinute + 3 * kMinute * place++;
      at(laterBy(m_setUp, hour),
         [this, key = std::string(key)](const Desk& desk) { return weigh(desk, key); });
    }
  }

  Checked<void> weigh(const Desk& desk, const std::string& key) {
    const auto components = desk.notebook.components(m_run.n);
    if (!components) return std::unexpected(components.error());
    const auto component = std::ranges::find(*components, key, &ComponentRecord::key);
    if (component == components->end()) return {};
    DemoHand hand(m_run.spec.person, m_run.random);
    if (!component->target_mg) return weighOnce(desk, key, hand.volume(*component->target_uL), "");
    const double reading_mg = *component->target_mg * (1.0 + 0.012 * m_run.random.normal());
    if (key == "amine" && m_run.random.once(0.05)) {
      // Read again before the vial is closed: the figures were swapped.
      const auto slip = weighOnce(desk, key, hand.mass(reading_mg * 1.13), "");
      if (!slip) return slip;
      return weighOnce(desk, key, hand.mass(reading_mg), "misread the balance");
    }
    return weighOnce(desk, key, hand.mass(reading_mg), "");
  }

  Checked<void> weighOnce(const Desk& desk, const std::string& key, const std::string& quantity,
                          const std::string& reason) const {
    const auto current = record(desk);
    if (!current) return std::unexpected(current.error());
    return withoutValue(weighComponent(desk, *current, key, quantity, true, reason));
  }

  void entries() {
    for (std::size_t i = 0; i < m_run.log.entries.size(); ++i) {
      const units::Moment written = laterBy(m_lamp, m_run.log.entries[i].written_h);
      at(written,
         [this, i, written](const Desk& desk) { return log(desk, m_run.log.entries[i], written); });
    }
  }

  Checked<void> log(const Desk& desk, const DemoEntry& entry, const units::Moment& written) const {
    const auto current = record(desk);
    if (!current) return std::unexpected(current.error());
    LogRequest request{.line = entry.line, .accepted = entry.accepted, .reason = entry.reason};
    ++m_summary.events;
    if (!entry.corrects && entry.happened_h != entry.written_h)
      request.at = demoTimeText(laterBy(m_lamp, entry.happened_h), written);
    const auto logged =
        entry.corrects
            ? correctEvent(desk, *current, static_cast<int>(*entry.corrects) + 1, request)
            : logLine(desk, *current, request);
    if (!logged) return std::unexpected(logged.error());
    if (logged->questions.empty()) return {};
    return askedFault(m_run.code, logged->questions.front().what, logged->questions.front().ask);
  }

  void outcome() {
    const double last_h = m_run.log.entries.back().written_h;
    const units::Moment worked = laterBy(m_lamp, last_h + 1.5);
    if (m_run.spec.trace)
      at(worked,
         [this](const Desk& desk) { return import(desk, demoTraceCsv(m_run.log), "pressure"); });
    if (m_run.spec.course) {
      at(worked, [this](const Desk& desk) {
        return import(desk, demoCourseCsv(m_run.spec, m_run.outcome, m_run.log, m_run.random),
                      "course");
      });
    }
    if (m_run.spec.fate != DemoFate::kNoLamp)
      at(worked, [this](const Desk& desk) { return recordYield(desk); });
    if (m_run.spec.state != RunState::kClosed) return;
    at(laterBy(worked, 0.4), [this](const Desk& desk) { return close(desk); });
  }

  Checked<void> import(const Desk& desk, const std::string& csv, const std::string& kind) const {
    const auto current = record(desk);
    if (!current) return std::unexpected(current.error());
    ++m_summary.datasets;
    return withoutValue(importDataset(desk, *current, csv,
                                      fmt::format("invented-{}-{}.csv", m_run.code, kind), kind));
  }

  Checked<void> recordYield(const Desk& desk) {
    const auto current = record(desk);
    if (!current) return std::unexpected(current.error());
    DemoHand hand(m_run.spec.person, m_run.random);
    const bool little = m_run.outcome.yield_percent() < 5.0;
    m_run.yield = hand.percent(m_run.outcome.yield_percent(), little ? 1.0 : 2.0);
    return withoutValue(recordResult(
        desk, *current,
        {.yield = m_run.yield,
         .conversion = hand.percent(m_run.outcome.conversion_percent(), little ? 1.0 : 2.0)}));
  }

  /// What its author concludes, set beside the earlier runs that were charged alike.
  std::string conclusion() const {
    constexpr double kAgree_percent = 6.0;
    std::string text = m_run.spec.conclusion;
    std::string others;
    bool agree = true;
    for (const DemoRun& other : m_runs) {
      if (&other == &m_run) break;
      if (other.spec.fate != DemoFate::kSound || other.yield.empty() ||
          !isDuplicate(other.spec.recipe, m_run.spec.recipe))
        continue;
      others +=
          fmt::format("{}{}: {}", others.empty() ? " Compare " : "; ", other.code, other.yield);
      agree = agree && std::abs(other.outcome.yield_percent() - m_run.outcome.yield_percent()) <
                           kAgree_percent;
    }
    if (m_run.yield.empty() || others.empty()) return text;
    if (!agree && text.starts_with("Repeats")) text = "Same charge, not the same yield: why?";
    return text + others + ".";
  }

  Checked<void> close(const Desk& desk) const {
    const auto current = record(desk);
    if (!current) return std::unexpected(current.error());
    ResultRequest request{.conclusion = conclusion(), .state = "closed"};
    if (m_run.spec.fate == DemoFate::kNoLamp) request.reason = "no light, nothing to work up";
    return withoutValue(recordResult(desk, *current, request));
  }

  DemoRun& m_run;
  const std::vector<DemoRun>& m_runs;
  bool m_withStructures;
  DemoSummary& m_summary;
  units::Moment m_setUp;
  units::Moment m_lamp;
  std::vector<DemoStep> m_steps;
};

}  // namespace

std::vector<DemoRun> demoRuns(const DemoOptions& options) {
  std::vector<DemoRunSpec> specs = demoCampaign();
  if (options.runs < static_cast<int>(specs.size()))
    specs.resize(static_cast<std::size_t>(std::max(0, options.runs)));
  std::vector<DemoRun> runs;
  runs.reserve(specs.size());
  for (DemoRunSpec& spec : specs) {
    DemoRandom random(options.seed, runs.size());
    DemoOutcome outcome(spec.recipe, spec.fate, random);
    DemoLog log = demoLog(spec, outcome, random);
    const auto frame = std::ranges::find_if(
        runs, [&spec](const DemoRun& run) { return hasSameFrame(run.spec.recipe, spec.recipe); });
    const DemoRun* cloned = frame == runs.end() ? nullptr : &*frame;
    runs.push_back({std::move(spec), std::move(outcome), std::move(log), random, cloned});
  }
  return runs;
}

std::vector<DemoStep> demoSteps(DemoRun& run, const std::vector<DemoRun>& runs, bool withStructures,
                                DemoSummary& summary) {
  return std::make_shared<StepWriter>(run, runs, withStructures, summary)->run();
}

}  // namespace vialkeeper::app
