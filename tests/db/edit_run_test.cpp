// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/edit_run.h"

#include <algorithm>
#include <catch2/catch.hpp>
#include <set>

#include "app/notebook/run_results.h"
#include "app/notebook/weigh_run.h"
#include "charge/plan_edit.h"
#include "db/sqlite_notebook.h"
#include "db/work_desk.h"

namespace vialkeeper {
namespace {

using app::AmountEdit;
using app::ComponentAddition;
using app::ComponentRemoval;
using app::PlanEdit;
using app::PlanOverride;
using app::WholePlan;
using tests::good;
using tests::told;
using tests::WorkDesk;

std::vector<std::string> keysOf(const std::vector<app::ComponentRecord>& components) {
  std::vector<std::string> keys;
  for (const app::ComponentRecord& component : components) keys.push_back(component.key);
  return keys;
}

ComponentAddition pivalicAcid() {
  return {.name = "pivalic acid",
          .role = "acid",
          .amount = "1.5 equiv",
          .description = {.formula = "C5H10O2", .cas = "75-98-9"}};
}

TEST_CASE("an edit of the plan is in the file, and its records follow it",
          "[app][edit-run][identity]") {
  WorkDesk work;
  const app::RunRecord added = work.addRun();
  const auto edited = good(app::editRun(
      work.desk(), work.run(),
      {AmountEdit{"nickel", "7,5 mol%"}, PlanOverride{"irradiation.temperature", "40 degC"},
       PlanOverride{"liquid.total", "3.0 mL"}, pivalicAcid()},
      ""));
  CHECK(edited.planBefore == added.plan);
  CHECK(edited.newSubstances == std::vector<std::string>{"pivalic acid"});
  CHECK(keysOf(edited.sheet.components) ==
        std::vector<std::string>{"amine", "pc", "nickel", "mecn", "water", "pivalic-acid"});
  CHECK(work.component("nickel").planned_molPercent == 7.5);
  // 1.5 equiv of 0.2 mmol, by hand.
  CHECK(*work.component("pivalic-acid").planned_mmol == Approx(0.3));
  CHECK(work.run().temperature_C == 40.0);
  CHECK(work.run().liquid_mL == Approx(3.0));
  CHECK(work.run().limiting_mmol == Approx(0.2));
  CHECK(tests::findings(work.notebook()).empty());

  // A run that is added with the same text holds the same.
  const auto again =
      good(app::addRun(work.desk(), {.planText = work.planText(), .planFile = "again.toml"}));
  const auto changed = good(work.notebook().components(work.run().n));
  const auto fresh = good(work.notebook().components(again.run.n));
  REQUIRE(changed.size() == fresh.size());
  for (std::size_t i = 0; i < fresh.size(); ++i) {
    INFO(fresh[i].key);
    CHECK(changed[i].key == fresh[i].key);
    CHECK(changed[i].substance == fresh[i].substance);
    CHECK(changed[i].planned_mmol == fresh[i].planned_mmol);
    CHECK(changed[i].planned_molPercent == fresh[i].planned_molPercent);
    CHECK(changed[i].target_mg == fresh[i].target_mg);
    CHECK(changed[i].target_uL == fresh[i].target_uL);
    CHECK(changed[i].position == fresh[i].position);
  }
}

TEST_CASE("a preview is what the edit leads to, and writes nothing", "[app][edit-run][identity]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::weighComponent(work.desk(), work.run(), "nickel", "3.2 mg", true, ""));
  const std::vector<PlanEdit> edits = {AmountEdit{"nickel", "6 mol%"}, pivalicAcid()};
  const auto mark = good(work.notebook().changeMark());
  const auto preview = good(app::previewEdit(work.notebook(), work.run(), edits));
  CHECK(good(work.notebook().changeMark()) == mark);
  const auto edited = good(app::editRun(work.desk(), work.run(), edits, "more of it"));
  CHECK(preview.planned.planText == edited.sheet.planned.planText);
  CHECK(preview.weighed);
  REQUIRE(preview.components.size() == edited.sheet.components.size());
  for (std::size_t i = 0; i < preview.components.size(); ++i) {
    const auto& a = preview.planned.charge.components[i];
    const auto& b = edited.sheet.planned.charge.components[i];
    CHECK(a.key == b.key);
    CHECK(a.targetMass == b.targetMass);
    CHECK(a.charged.has_value() == b.charged.has_value());
    if (a.charged) CHECK(a.charged->offTargetPercent == b.charged->offTargetPercent);
    CHECK(preview.components[i].charged_molPercent ==
          edited.sheet.components[i].charged_molPercent);
  }
  // 3.2 mg were 8 % above 5 mol%, and are below 6 mol%: judged anew.
  CHECK(*edited.sheet.planned.charge.find("nickel")->charged->offTargetPercent < 0.0);
}

TEST_CASE("an edit is undone by putting the earlier text back", "[app][edit-run][identity]") {
  WorkDesk work;
  (void)work.addRun();
  const std::string text = work.planText();
  const auto components = good(work.notebook().components(work.run().n));
  const auto edited = good(app::editRun(
      work.desk(), work.run(),
      {PlanOverride{"title", "Another title"}, ComponentRemoval{"nickel"}, pivalicAcid()}, ""));
  CHECK(work.run().title == "Another title");
  CHECK(keysOf(edited.sheet.components) ==
        std::vector<std::string>{"amine", "pc", "mecn", "water", "pivalic-acid"});
  const auto restored =
      good(app::restorePlan(work.desk(), work.run(), edited.planBefore, "not that"));
  CHECK(work.planText() == text);
  CHECK(work.run().title == "Indoline dehydrogenation, acid additive 3");
  const auto now = good(work.notebook().components(work.run().n));
  REQUIRE(now.size() == components.size());
  for (std::size_t i = 0; i < now.size(); ++i) {
    CHECK(now[i].key == components[i].key);
    CHECK(now[i].substance == components[i].substance);
    CHECK(now[i].planned_mmol == components[i].planned_mmol);
    CHECK(now[i].position == components[i].position);
  }
  // And the undoing too.
  good(app::restorePlan(work.desk(), work.run(), restored.planBefore, "after all"));
  CHECK(work.run().title == "Another title");
  CHECK(tests::findings(work.notebook()).empty());
}

TEST_CASE("a removed component stays whole in the trail, and its number is never given again",
          "[app][edit-run][db][identity]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::editRun(work.desk(), work.run(), {pivalicAcid()}, ""));
  const app::ComponentRecord gone = work.component("pivalic-acid");
  good(app::editRun(work.desk(), work.run(), {ComponentRemoval{"pivalic-acid"}}, ""));
  const auto history = good(work.notebook().history(work.run().n));
  const std::string& changes = history.back().changes;
  CHECK(changes.find("\"after\":null") != std::string::npos);
  CHECK(changes.find("\"key\":\"pivalic-acid\"") != std::string::npos);
  good(app::editRun(work.desk(), work.run(), {pivalicAcid()}, ""));
  CHECK(work.component("pivalic-acid").n > gone.n);
  CHECK(tests::findings(work.notebook()).empty());

  // The archive rebuilds the very same file's content.

  REQUIRE(work.notebook().exportAll(work.path("archive")));
  const auto copy = good(db::createNotebook(work.path("copy.vialbook")));
  REQUIRE(copy->importAll(work.path("archive")));
  CHECK(tests::contentOf(work.path("copy.vialbook")) == tests::contentOf(work.file()));
  CHECK(tests::findings(*copy).empty());
  CHECK(good(copy->canonicalRun(tests::runOf(*copy).n)) ==
        good(work.notebook().canonicalRun(work.run().n)));
  // It goes on with numbers of its own behind those that were used.
  tests::SteppingClock clock;
  const auto more = good(app::editRun({*copy, clock, "KW"}, tests::runOf(*copy),
                                      {ComponentRemoval{"pivalic-acid"}}, ""));
  CHECK(more.sheet.components.size() == 5);
}

TEST_CASE("all faults of all edits come together and nothing is written",
          "[app][edit-run][regression]") {
  WorkDesk work;
  (void)work.addRun();
  const auto mark = good(work.notebook().changeMark());
  const std::vector<PlanEdit> edits = {AmountEdit{"nickel", "5 bar"},
                                       AmountEdit{"nikel", "5 mol%"},
                                       AmountEdit{"amine", "5 mol%"},
                                       PlanOverride{"vial.volume", "11 mg"},
                                       ComponentRemoval{"xenon"},
                                       ComponentAddition{.name = "TFA", .role = "acd"},
                                       ComponentAddition{.name = "", .description = {}}};
  const auto done = app::editRun(work.desk(), work.run(), edits, "");
  const std::string lines = told(done);
  INFO(lines);
  CHECK(lines.find("component.nickel.amount: '5 bar'") != std::string::npos);
  CHECK(lines.find("component.nikel: ") != std::string::npos);
  CHECK(lines.find("component.amine.amount: the limiting component is measured against itself") !=
        std::string::npos);
  CHECK(lines.find("vial.volume: ") != std::string::npos);
  CHECK(lines.find("component.xenon: ") != std::string::npos);
  CHECK(lines.find("component.tfa.role: ") != std::string::npos);
  CHECK(lines.find("component.component.name: ") != std::string::npos);
  CHECK(told(app::previewEdit(work.notebook(), work.run(), edits)) == lines);
  CHECK(good(work.notebook().changeMark()) == mark);
}

TEST_CASE("what was weighed is not taken out of the plan", "[app][edit-run][regression]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::weighComponent(work.desk(), work.run(), "nickel", "3.0 mg", true, ""));
  const std::string removed =
      told(app::editRun(work.desk(), work.run(), {ComponentRemoval{"nickel"}}, "why"));
  CHECK(removed.starts_with("component.nickel: nickel(II) bromide glyme was weighed"));
  const auto without = good(charge::withoutComponent(work.planText(), "nickel"));
  CHECK(told(app::editRun(work.desk(), work.run(), {WholePlan{without}}, "why")) == removed);
  // A supply that cannot have been weighed.
  good(app::weighComponent(work.desk(), work.run(), "mecn", "1000 uL", true, ""));
  std::string solid = work.planText();
  const std::string solvent = "role = \"solvent\"\nname = \"acetonitrile\"\nshare = 9\n";
  const std::size_t at = solid.find(solvent);
  REQUIRE(at != std::string::npos);
  solid.replace(
      at, solvent.size(),
      "role = \"other\"\nname = \"acetonitrile\"\nformula = \"C2H3N\"\nmass = \"1 mg\"\n");
  CHECK(told(app::editRun(work.desk(), work.run(), {WholePlan{solid}}, "why")).size() > 0);
}

TEST_CASE("a state that wants a reason or forbids the edit says so",
          "[app][edit-run][regression]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::weighComponent(work.desk(), work.run(), "nickel", "3.0 mg", true, ""));
  const std::vector<PlanEdit> edits = {AmountEdit{"pc", "2 mol%"}};
  CHECK(told(app::editRun(work.desk(), work.run(), edits, "")).starts_with("state: "));
  good(app::previewEdit(work.notebook(), work.run(), edits));
  good(app::editRun(work.desk(), work.run(), edits, "the stock is older"));
  CHECK(good(work.notebook().history(work.run().n)).back().reason == "the stock is older");
  good(app::recordResult(work.desk(), work.run(), {.state = "closed", .reason = "given up"}));
  CHECK(told(app::editRun(work.desk(), work.run(), edits, "why")).starts_with("state: nobody can"));
  CHECK(
      told(app::previewEdit(work.notebook(), work.run(), edits)).starts_with("state: nobody can"));
}

TEST_CASE("an edit of a run that was changed elsewhere fails with both",
          "[app][edit-run][regression]") {
  WorkDesk work;
  (void)work.addRun();
  const app::RunRecord stale = work.run();
  good(app::editRun(work.desk(), stale, {AmountEdit{"pc", "2 mol%"}}, ""));
  const auto done = app::editRun(work.desk(), stale, {AmountEdit{"pc", "3 mol%"}}, "");
  REQUIRE_FALSE(done);
  CHECK(done.error().front().kind == text::FaultKind::kNotebook);
  CHECK(work.component("pc").planned_molPercent == 2.0);
}

TEST_CASE("a substance of the shelf is taken with all it is", "[app][edit-run][regression]") {
  WorkDesk work;
  (void)work.addRun();
  app::SubstanceRecord card{
      .name = "acetic acid", .formula = "C2H4O2", .cas = "64-19-7", .hazards = {"H226", "H314"}};
  REQUIRE(work.notebook().act(work.desk().action("test"),
                              [&](app::Writing& writing) -> text::Checked<void> {
                                card.n = *writing.addSubstance(card);
                                return {};
                              }));
  const auto edited = good(
      app::editRun(work.desk(), work.run(),
                   {ComponentAddition{.name = "AcOH", .role = "acid", .substance = card.n}}, ""));
  CHECK(edited.newSubstances.empty());
  CHECK(work.component("acoh").substance == card.n);
  const charge::ComponentPlan& plan = edited.sheet.planned.plan.components.back();
  CHECK(plan.identity.cas == "64-19-7");
  CHECK(plan.hazards == std::vector<std::string>{"H226", "H314"});
  CHECK(*work.component("acoh").planned_mmol == Approx(0.2));  // 1 equiv unless said otherwise
}

TEST_CASE("edits are made one after the other", "[app][edit-run][regression]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::editRun(work.desk(), work.run(),
                    {pivalicAcid(), AmountEdit{"pivalic-acid", "2"},
                     ComponentAddition{.name = "pivalic acid",
                                       .role = "acid",
                                       .amount = "10 mg",
                                       .description = {.formula = "C5H10O2"}}},
                    ""));
  CHECK(*work.component("pivalic-acid").planned_mmol == Approx(0.4));
  CHECK(*work.component("pivalic-acid-2").target_mg == Approx(10.0));
  CHECK(work.component("pivalic-acid").substance == work.component("pivalic-acid-2").substance);
}

TEST_CASE("an edit that changes nothing writes nothing", "[app][edit-run][regression]") {
  WorkDesk work;
  (void)work.addRun();
  const auto before = good(work.notebook().summary()).revisions;
  good(app::editRun(work.desk(), work.run(), {WholePlan{work.planText()}}, ""));
  CHECK(good(work.notebook().summary()).revisions == before);
}

}  // namespace
}  // namespace vialkeeper
