// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>
#include <catch2/catch.hpp>

#include "app/notebook/log_line_kinds.h"
#include "app/notebook/log_run.h"
#include "app/notebook/run_export.h"
#include "app/notebook/run_results.h"
#include "app/text_files.h"
#include "db/work_desk.h"

namespace vialkeeper {
namespace {

using tests::good;
using tests::told;
using tests::WorkDesk;

std::int64_t found(WorkDesk& work, const std::string& word) {
  app::FindQuery query;
  query.conditions.push_back({app::WordsCondition{.words = {word}}});
  return good(work.notebook().find(query, {})).matches;
}

TEST_CASE("a withdrawn entry stays to be seen and counts no more", "[app][log][regression]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::logLine(work.desk(), work.run(), {.line = "lamp on"}));
  good(app::logLine(work.desk(), work.run(), {.line = "note foaming heavily"}));
  CHECK(found(work, "foaming") == 1);
  const auto withdrawn =
      good(app::withdrawEntry(work.desk(), work.run(), 2, "the other vial was foaming"));
  CHECK(withdrawn.event.kind == app::event_kind::kWithdrawn);
  CHECK(withdrawn.sentence == "entry 2 withdrawn: 'the other vial was foaming'");
  const auto events = good(app::numberedEvents(work.notebook(), work.run()));
  REQUIRE(events.size() == 3);
  const auto original = std::ranges::find(events, 2, &app::NumberedEvent::number);
  CHECK(original->event.raw == "note foaming heavily");
  CHECK(original->event.supersededBy == withdrawn.event.n);
  CHECK(withdrawn.event.at.utc == original->event.at.utc);
  // Neither the entry nor the reason is found among the observations.
  CHECK(found(work, "foaming") == 0);
  CHECK(tests::findings(work.notebook()).empty());

  CHECK(told(app::withdrawEntry(work.desk(), work.run(), 2, "")) ==
        "event: entry 2 was withdrawn, by entry 3\n");
  CHECK(
      told(app::withdrawEntry(work.desk(), work.run(), 3, "")).starts_with("event: entry 3 says"));
  CHECK(told(app::withdrawEntry(work.desk(), work.run(), 9, "")) ==
        "event: KW-0001 has no entry 9\n");

  // The withdrawal is undone by a correction with the line as it was.
  const auto again =
      good(app::correctEvent(work.desk(), work.run(), 3, {.line = original->event.raw}));
  CHECK(again.event.at.utc == original->event.at.utc);
  CHECK(found(work, "foaming") == 1);
}

TEST_CASE("the log that leaves the notebook holds no withdrawn entry", "[app][log][regression]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::logLine(work.desk(), work.run(), {.line = "p 0.42 bar 35 C"}));
  good(app::withdrawEntry(work.desk(), work.run(), 1, "read off the wrong gauge"));
  REQUIRE(app::exportRuns(work.notebook(), {"KW-0001"}, work.path("out")));
  const auto log = good(app::readFile(work.path("out") + "/KW-0001/log.csv"));
  INFO(log);
  CHECK(std::ranges::count(log, '\n') == 1);
}

TEST_CASE("a state decides about withdrawing as about correcting", "[app][log][regression]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::logLine(work.desk(), work.run(), {.line = "lamp on"}));
  good(app::recordResult(work.desk(), work.run(), {.yield = "71 %"}));
  CHECK(told(app::withdrawEntry(work.desk(), work.run(), 1, " ")).starts_with("state: "));
  good(app::withdrawEntry(work.desk(), work.run(), 1, "never on"));
  CHECK(work.run().state == app::RunState::kWorkedUp);  // never moved back by itself
  good(app::recordResult(work.desk(), work.run(), {.state = "closed"}));
  CHECK(told(app::withdrawEntry(work.desk(), work.run(), 2, "x")).starts_with("state: nobody can"));
}

TEST_CASE("a result is undone by putting the run's outcome back", "[app][result][identity]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::logLine(work.desk(), work.run(), {.line = "lamp on"}));
  const app::RunRecord before = work.run();
  good(app::recordResult(work.desk(), work.run(),
                         {.yield = "71 ± 2 %",
                          .conversion = "90 %",
                          .conclusion = "works",
                          .title = "A better title"}));
  const app::RunRecord after = work.run();
  CHECK(told(app::restoreResult(work.desk(), after, before, "")).starts_with("state: "));
  const app::RunRecord restored =
      good(app::restoreResult(work.desk(), after, before, "other vial"));
  CHECK(restored.state == app::RunState::kIrradiating);
  CHECK_FALSE(restored.yield_percent);
  CHECK_FALSE(restored.uYield_percent);
  CHECK_FALSE(restored.conversion_percent);
  CHECK(restored.conclusion.empty());
  CHECK(restored.title == before.title);
  // And redone: the step forward needs no reason.
  const app::RunRecord redone = good(app::restoreResult(work.desk(), restored, after, ""));
  CHECK(redone.yield_percent == 71.0);
  CHECK(redone.uYield_percent == 2.0);
  CHECK(redone.state == app::RunState::kWorkedUp);
  CHECK(tests::findings(work.notebook()).empty());
}

TEST_CASE("a result is not undone where the run's life has no way back",
          "[app][result][regression]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::recordResult(work.desk(), work.run(), {.state = "charged"}));
  const app::RunRecord before = work.run();
  good(app::recordResult(work.desk(), work.run(), {.yield = "3 %"}));
  // From worked-up straight to charged there is no way.
  CHECK(
      told(app::restoreResult(work.desk(), work.run(), before, "dark run")).starts_with("state: "));
  const app::RunRecord worked = work.run();
  good(app::recordResult(work.desk(), work.run(), {.conclusion = "closed now", .state = "closed"}));
  CHECK(told(app::restoreResult(work.desk(), work.run(), worked, "")).starts_with("state: "));
  CHECK(good(app::restoreResult(work.desk(), work.run(), worked, "again")).conclusion.empty());
}

}  // namespace
}  // namespace vialkeeper
