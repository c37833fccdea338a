// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_campaign.h"

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <set>
#include <string>

#include "app/notebook/demo_data.h"
#include "app/notebook/demo_run.h"
#include "app/notebook/demo_vial.h"
#include "app/notebook/demo_words.h"
#include "app/notebook/log_line.h"
#include "app/plan_charge.h"
#include "charge/plan_reader.h"

using namespace vialkeeper;
using namespace vialkeeper::app;

namespace {

constexpr double kRated_bar = 2.0;

const std::vector<DemoRun>& campaign() {
  static const std::vector<DemoRun> runs = demoRuns({});
  return runs;
}

std::size_t countIf(auto predicate) {
  return static_cast<std::size_t>(std::ranges::count_if(campaign(), predicate));
}

}  // namespace

TEST_CASE("the campaign has more than 40 runs by three people over three months",
          "[demo][identity]") {
  CHECK(campaign().size() == kDemoCampaignRuns);
  std::set<std::string> people;
  for (const DemoRun& run : campaign()) people.insert(run.spec.person);
  CHECK(people == std::set<std::string>{"KW", "MR", "TS"});
  CHECK(toIsoText(demoMoment(campaign().front().spec.day, 0.0))
            .starts_with("2026-03-02T00:00:00+01:00"));
  CHECK(toIsoText(demoMoment(campaign().back().spec.day, 0.0))
            .starts_with("2026-05-29T00:00:00+02:00"));
}

TEST_CASE("every aim of the campaign says that it is invented", "[demo][identity]") {
  for (const DemoRun& run : campaign())
    CHECK(run.spec.aim.starts_with("Invented demonstration data."));
}

TEST_CASE("the campaign holds every state but sealed, failures, blanks and duplicates",
          "[demo][identity]") {
  for (const RunState state : {RunState::kPlanned, RunState::kCharged, RunState::kIrradiating,
                               RunState::kWorkedUp, RunState::kClosed}) {
    CHECK(countIf([state](const DemoRun& run) { return run.spec.state == state; }) >= 1);
  }
  for (const DemoFate fate : {DemoFate::kLeak, DemoFate::kNoLamp, DemoFate::kPrecipitate}) {
    CHECK(countIf([fate](const DemoRun& run) { return run.spec.fate == fate; }) == 1);
  }
  CHECK(countIf([](const DemoRun& run) { return run.spec.recipe.light_h == 0.0; }) == 1);
  CHECK(countIf([](const DemoRun& run) { return run.spec.recipe.catalyst_molPercent == 0.0; }) ==
        1);
  CHECK(countIf([](const DemoRun& run) {
          return run.spec.recipe.acid == DemoAcidKind::kNone &&
                 run.spec.recipe.partner_mol_L == 0.0;
        }) == 1);
  CHECK(countIf([](const DemoRun& run) { return run.spec.recipe.partner_mol_L > 0.0; }) == 4);
  CHECK(countIf([](const DemoRun& run) {
          return std::ranges::count_if(campaign(), [&run](const DemoRun& other) {
                   return isDuplicate(run.spec.recipe, other.spec.recipe);
                 }) > 1;
        }) > 20);
  CHECK(countIf([](const DemoRun& run) { return run.spec.course; }) >= 10);
  CHECK(countIf([](const DemoRun& run) { return run.spec.trace; }) >= 4);
}

TEST_CASE("every plan of the campaign can be charged", "[demo][identity]") {
  for (const DemoRun& run : campaign()) {
    const auto planned =
        planCharge(demoPlanText(run.spec.recipe, false), run.spec.recipe.title, {});
    INFO(run.spec.recipe.title << ": " << (planned ? "" : text::toLine(planned.error().front())));
    CHECK(planned.has_value());
  }
}

TEST_CASE("a line of the campaign's logs is read without doubt, or kept as text and corrected",
          "[demo][identity]") {
  std::size_t doubted = 0;
  std::size_t corrected = 0;
  for (const DemoRun& run : campaign()) {
    for (std::size_t i = 0; i < run.log.entries.size(); ++i) {
      const DemoEntry& entry = run.log.entries[i];
      const ReadEntry read = readLogLine(entry.line);
      INFO(run.spec.recipe.title << ": " << entry.line);
      // Besides what cannot be read, a pressure with its decimal sign in the wrong place.
      if (read.doubt) CHECK(entry.accepted);
      if (entry.accepted && !read.doubt) CHECK(read.event.kind == "pressure");
      const bool superseded = std::ranges::any_of(
          run.log.entries, [i](const DemoEntry& other) { return other.corrects == i; });
      if (entry.accepted) CHECK(superseded);
      doubted += read.doubt ? 1U : 0U;
      corrected += superseded ? 1U : 0U;
    }
  }
  CHECK(doubted >= 1);
  CHECK(corrected >= 3);
}

TEST_CASE("observations are text whatever they say", "[demo][identity]") {
  for (const DemoSight sight :
       {DemoSight::kCharged, DemoSight::kFirst, DemoSight::kEarly, DemoSight::kEvening,
        DemoSight::kEnd, DemoSight::kDark, DemoSight::kNoLight, DemoSight::kLeak,
        DemoSight::kPrecipitate, DemoSight::kPalladium}) {
    for (const std::string_view text : demoObservations(sight)) {
      const ReadEntry read = readLogLine(text);
      INFO(text);
      CHECK(read.event.kind == "observation");
      CHECK_FALSE(read.doubt.has_value());
    }
  }
}

TEST_CASE("pressures stay between ambient and the vial's limit unless they are corrected",
          "[demo][identity]") {
  std::size_t readings = 0;
  for (const DemoRun& run : campaign()) {
    for (std::size_t i = 0; i < run.log.entries.size(); ++i) {
      const ReadEntry read = readLogLine(run.log.entries[i].line);
      if (read.event.kind != "pressure") continue;
      if (std::ranges::any_of(run.log.entries,
                              [i](const DemoEntry& other) { return other.corrects == i; }))
        continue;
      ++readings;
      const double ambient_bar = read.event.pressureKind == "abs" ? 1.013 : 0.0;
      const double gauge_bar = *read.event.pressure_bar - ambient_bar;
      INFO(run.spec.recipe.title << ": " << run.log.entries[i].line);
      CHECK(gauge_bar >= -1e-3);
      CHECK(gauge_bar <= kRated_bar);
    }
  }
  CHECK(readings > 250);
}

TEST_CASE("a log goes forward as it is written down, and back-dated entries are among it",
          "[demo][identity]") {
  std::size_t late = 0;
  for (const DemoRun& run : campaign()) {
    CHECK(std::ranges::is_sorted(run.log.entries, {}, &DemoEntry::written_h));
    for (const DemoEntry& entry : run.log.entries) {
      CHECK(entry.happened_h <= entry.written_h);
      if (!entry.corrects && entry.written_h - entry.happened_h > 5.0) ++late;
    }
  }
  CHECK(late >= 3);
}

TEST_CASE("the same seed gives the same campaign, another seed another", "[demo][identity]") {
  const auto again = demoRuns({});
  const auto other = demoRuns({.seed = 7});
  REQUIRE(again.size() == campaign().size());
  bool different = false;
  for (std::size_t i = 0; i < again.size(); ++i) {
    CHECK(again[i].outcome.yield_percent() == campaign()[i].outcome.yield_percent());
    CHECK(std::ranges::equal(again[i].log.entries, campaign()[i].log.entries, {}, &DemoEntry::line,
                             &DemoEntry::line));
    CHECK(demoTraceCsv(again[i].log) == demoTraceCsv(campaign()[i].log));
    different = different || other[i].outcome.yield_percent() != again[i].outcome.yield_percent();
  }
  CHECK(different);
}

TEST_CASE("the campaign's first runs are the same however many are asked for", "[demo][identity]") {
  const auto few = demoRuns({.runs = 5});
  REQUIRE(few.size() == 5);
  for (std::size_t i = 0; i < few.size(); ++i)
    CHECK(few[i].outcome.yield_percent() == campaign()[i].outcome.yield_percent());
}

TEST_CASE(
    "yields follow the model: best at 10 mol% of acid, saturating with catalyst, none in the dark",
    "[demo][identity]") {
  const auto mean = [](auto change) {
    double sum = 0.0;
    for (std::uint64_t i = 0; i < 40; ++i) {
      DemoRecipe recipe;
      change(recipe);
      DemoRandom random(1, i);
      sum += DemoOutcome(recipe, DemoFate::kSound, random).yield_percent();
    }
    return sum / 40.0;
  };
  const auto ofAcid = [&](double molPercent) {
    return mean([=](DemoRecipe& recipe) { recipe.acid_molPercent = molPercent; });
  };
  const auto ofCatalyst = [&](double molPercent) {
    return mean([=](DemoRecipe& recipe) { recipe.catalyst_molPercent = molPercent; });
  };
  CHECK(ofAcid(2) < ofAcid(5));
  CHECK(ofAcid(5) < ofAcid(10));
  CHECK(ofAcid(20) < ofAcid(10));
  CHECK(ofCatalyst(1) - ofCatalyst(0.5) > ofCatalyst(2) - ofCatalyst(1.5));
  CHECK(mean([](DemoRecipe& recipe) { recipe.light_h = 0.0; }) < 1.5);
}

TEST_CASE(
    "a sealed vial at the temperature of sealing is at ambient, and venting brings it back there",
    "[demo][identity]") {
  DemoVial vial({});
  CHECK(std::abs(vial.gauge_bar()) < 1e-12);
  vial.pass(1.0, 0.1);
  // Ideal gas: 0.1 mmol in 9.45 mL at 21 °C.
  CHECK(vial.gauge_bar() == Approx(0.1 * 0.0831446 * 294.15 / 9.45));
  vial.vent();
  CHECK(std::abs(vial.gauge_bar()) < 1e-12);
  vial.leak(0.5);
  vial.pass(1.0, 0.1);
  const double before = vial.gauge_bar();
  vial.pass(1.0, 0.0);
  CHECK(vial.gauge_bar() < before);
}

TEST_CASE("the campaign's clock goes forward on 29 March 2026", "[demo][published]") {
  // Directive 2000/84/EC: summer time begins at 1 a.m. GMT on the last Sunday in March.
  CHECK(toIsoText(demoMoment(26, 23.5)) == "2026-03-28T23:30:00+01:00");
  CHECK(toIsoText(demoMoment(27, 12.0)) == "2026-03-29T12:00:00+02:00");
  CHECK(toIsoText(laterBy(demoMoment(26, 13.0), 20.0)) == "2026-03-29T10:00:00+02:00");
}
