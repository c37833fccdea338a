// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <map>
#include <memory>
#include <set>

#include "app/notebook/demo_bulk.h"
#include "app/notebook/demo_campaign.h"
#include "app/notebook/find_runs.h"
#include "app/notebook/run_plan.h"
#include "cli/command_bench.h"
#include "db/sqlite_notebook.h"

using namespace vialkeeper;
using namespace vialkeeper::tests;

namespace {

/// A demonstration, made once for all cases.
class Demo {
 public:
  Demo()
      : m_file(m_folder.path("demo.vialbook")), m_ran(run({"--book", m_file, "--json", "demo"})) {}

  const Ran& ran() const { return m_ran; }
  std::unique_ptr<app::Notebook> notebook() const {
    auto notebook = db::openNotebook(m_file, db::OpenFor::kReading, "test");
    REQUIRE(notebook);
    return *std::move(notebook);
  }

 private:
  ScratchFolder m_folder;
  std::string m_file;
  Ran m_ran;
};

const Demo& demo() {
  static const Demo made;
  return made;
}

std::vector<app::FoundRun> found(app::Notebook& notebook, std::string_view query) {
  const auto result =
      app::findRuns(notebook, query, {.order = app::FindOrder::kOldest, .limit = 0});
  INFO(query << ": " << (result ? "" : text::toLine(result.error().front())));
  REQUIRE(result);
  return result->runs;
}

/// What two demonstrations must agree in, run by run.
std::string told(app::Notebook& notebook) {
  std::string text;
  for (const app::FoundRun& entry : found(notebook, "")) {
    text += entry.run.code + "|" + entry.run.title + "|" + entry.run.conclusion + "|" +
            toIsoText(entry.run.created) + "\n";
    text += std::to_string(entry.run.yield_percent.value_or(-1)) + "\n";
    for (const app::ComponentRecord& component : entry.components)
      text += component.actualText + ";";
    const auto events = notebook.events(entry.run.n);
    REQUIRE(events);
    for (const app::EventRecord& event : *events)
      text += toIsoText(event.at) + toIsoText(event.logged) + event.raw + "\n";
    const auto datasets = notebook.datasetsOf(entry.run.n);
    REQUIRE(datasets);
    for (const app::DatasetRecord& dataset : *datasets) text += *notebook.attachment(dataset.raw);
  }
  return text;
}

}  // namespace

TEST_CASE("demo makes a notebook and says what is in it", "[demo][cli]") {
  INFO(demo().ran().err);
  REQUIRE(demo().ran().status == 0);
  const auto json = demo().ran().json();
  CHECK(json["people"] == nlohmann::json({"KW", "MR", "TS"}));
  CHECK(json["runs"] == app::kDemoCampaignRuns);
  CHECK(json["datasets"] >= 14);
  const auto summary = demo().notebook()->summary();
  REQUIRE(summary);
  CHECK(json["runs"] == summary->runs);
  CHECK(json["events"] == summary->events);
  CHECK(json["datasets"] == summary->datasets);
}

TEST_CASE("demo refuses a file that is there and a number of runs below one", "[demo][cli]") {
  const ScratchFolder folder;
  const std::string file = folder.write("work.vialbook", "years of work");
  CHECK(run({"--book", file, "demo"}).status == 3);
  CHECK(bytesOf(file) == "years of work");
  CHECK(run({"--book", folder.path("new.vialbook"), "demo", "--runs", "0"}).status == 2);
  CHECK(folder.contents().size() == 1);
}

TEST_CASE("two demonstrations agree in every code, text and number", "[demo][identity]") {
  const ScratchFolder folder;
  const std::string file = folder.path("again.vialbook");
  const Ran ran = run({"--book", file, "demo"});
  REQUIRE(ran.status == 0);
  CHECK_THAT(ran.out, Catch::Matchers::Contains("All of it is invented"));
  auto again = db::openNotebook(file, db::OpenFor::kReading, "test");
  REQUIRE(again);
  CHECK(told(**again) == told(*demo().notebook()));
}

TEST_CASE("a demonstration verifies and is marked as invented", "[demo][identity]") {
  const auto notebook = demo().notebook();
  const auto report = notebook->verify({});
  REQUIRE(report);
  for (const app::Finding& finding : report->findings)
    FAIL_CHECK(finding.where << ": " << finding.what);
  const auto people = notebook->people();
  REQUIRE(people);
  for (const app::Person& person : *people) CHECK(person.name.ends_with("(invented)"));
  for (const app::FoundRun& entry : found(*notebook, ""))
    CHECK(entry.run.aim.starts_with("Invented demonstration data."));
}

TEST_CASE("a demonstration's runs are found by everything that they are looked for by",
          "[demo][identity]") {
  const auto notebook = demo().notebook();
  const std::map<std::string, std::size_t> least = {{R"(acid:"pivalic acid" 5..20 mol%)", 20},
                                                    {"acid:PivOH 1.5..3 mol%", 1},
                                                    {"photocatalyst:4CzIPN 1.8..2.2 mol%", 2},
                                                    {"cocatalyst:NiBr2 0.5..3 mol%", 3},
                                                    {R"(catalyst:"palladium(II) acetate")", 4},
                                                    {"substrate:indoline yield>60", 8},
                                                    {"not acid:*", 5},
                                                    {"solvent:DMF", 5},
                                                    {"solvent:ethanol not solvent:acetonitrile", 3},
                                                    {"wavelength:440 nm", 40},
                                                    {"amber bubbles", 5},
                                                    {"septum leaks", 1},
                                                    {"timer", 1},
                                                    {R"("black ppt")", 1},
                                                    {"state:planned", 2},
                                                    {"state:charged", 1},
                                                    {"state:irradiating", 2},
                                                    {"state:worked-up", 2},
                                                    {"person:TS", 10},
                                                    {"2026-04", 15},
                                                    {R"(series:"acid additives")", 11},
                                                    {R"(partner:indole)", 4},
                                                    {R"(vial:"20 mL crimp vial" yield>50)", 4}};
  for (const auto& [query, count] : least) {
    INFO(query);
    CHECK(found(*notebook, query).size() >= count);
  }
  CHECK(found(*notebook, "FAILED").size() == 3);
}

TEST_CASE("duplicates of a demonstration scatter, but by no more than chemistry does",
          "[demo][identity]") {
  const auto notebook = demo().notebook();
  std::vector<double> yields;
  for (
      const app::FoundRun& entry : found(
          *notebook,
          R"(substrate:indoline acid:"pivalic acid" 9..11 mol% cocatalyst:NiBr2 4.5..5.5 mol% photocatalyst:4CzIPN 0.9..1.1 mol% solvent:water wavelength:440 limiting:0.2 mmol)")) {
    if (entry.run.yield_percent) yields.push_back(*entry.run.yield_percent);
  }
  REQUIRE(yields.size() >= 3);
  const auto [least, most] = std::ranges::minmax(yields);
  CHECK(most > least);
  CHECK(most - least < 15.0);
}

TEST_CASE("a demonstration's trail looks like work: who did what in the order of time",
          "[demo][identity]") {
  const auto notebook = demo().notebook();
  const auto first = notebook->findRun("KW-0002");
  REQUIRE((first && *first));
  const auto history = notebook->history((*first)->n);
  REQUIRE(history);
  CHECK(std::ranges::is_sorted(
      *history, {}, [](const app::RevisionRecord& revision) { return revision.at.utc; }));
  std::set<std::string> actions;
  for (const app::RevisionRecord& revision : *history) actions.insert(revision.action);
  for (const char* action : {"weigh", "log", "result", "import"}) CHECK(actions.contains(action));
  std::size_t superseded = 0;
  std::size_t late = 0;
  for (const app::FoundRun& entry : found(*notebook, "")) {
    const auto events = notebook->events(entry.run.n);
    REQUIRE(events);
    for (const app::EventRecord& event : *events) {
      superseded += event.supersededBy != 0 ? 1U : 0U;
      late += event.logged.utc - event.at.utc > std::chrono::hours(5) ? 1U : 0U;
    }
  }
  CHECK(superseded >= 3);
  CHECK(late >= 3);
}

TEST_CASE("runs filled in bulk have 8 components and 10 events, and the charge of their own plans",
          "[demo][identity]") {
  const ScratchFolder folder;
  auto notebook = db::createNotebook(folder.path("bulk.vialbook"));
  REQUIRE(notebook);
  const auto summary = app::fillWithRuns(**notebook, 620, {});
  INFO((summary ? "" : text::toLine(summary.error().front())));
  REQUIRE(summary);
  CHECK(summary->runs == 620);
  CHECK(summary->events == 6200);
  const auto runs = found(**notebook, "");
  REQUIRE(runs.size() == 620);
  std::set<std::string> codes;
  const auto near = [](const std::optional<double>& kept, const std::optional<double>& computed) {
    if (kept.has_value() != computed.has_value()) return false;
    return !kept || std::abs(*kept - *computed) <= 1e-9 * std::max(1.0, std::abs(*computed));
  };
  for (std::size_t i = 0; i < runs.size(); ++i) {
    codes.insert(runs[i].run.code);
    CHECK(runs[i].components.size() == 8);
    if (i % 40 != 0) continue;
    CHECK((*notebook)->events(runs[i].run.n)->size() == 10);
    const auto sheet = app::loadRun(**notebook, runs[i].run);
    INFO(runs[i].run.code << ": " << (sheet ? "" : text::toLine(sheet.error().front())));
    REQUIRE(sheet);
    for (std::size_t c = 0; c < 8; ++c) {
      const charge::ComponentCharge& computed = sheet->planned.charge.components[c];
      const app::ComponentRecord& kept = runs[i].components[c];
      INFO(kept.key);
      CHECK(near(kept.planned_molPercent, computed.molPercent));
      CHECK(near(kept.planned_mmol, computed.amount_mol
                                        ? std::optional(computed.amount_mol->value() * 1e3)
                                        : std::nullopt));
      CHECK(near(kept.planned_mol_L, computed.concentration
                                         ? std::optional(computed.concentration->molPerLitre())
                                         : std::nullopt));
      CHECK(near(kept.target_mg, computed.targetMass
                                     ? std::optional(computed.targetMass->milligrams())
                                     : std::nullopt));
      CHECK(near(kept.target_uL, computed.targetVolume
                                     ? std::optional(computed.targetVolume->microlitres())
                                     : std::nullopt));
    }
  }
  CHECK(codes.size() == 620);
  const auto report = (*notebook)->verify({});
  REQUIRE(report);
  CHECK(report->findings.empty());
}
