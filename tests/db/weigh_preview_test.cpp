// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>
#include <cmath>

#include "app/notebook/log_run.h"
#include "app/notebook/weigh_run.h"
#include "db/work_desk.h"

namespace vialkeeper {
namespace {

using tests::good;
using tests::told;
using tests::WorkDesk;

TEST_CASE("a preview says what weighing would, and writes nothing", "[app][weigh][identity]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::weighComponent(work.desk(), work.run(), "amine", "24.5 mg", true, ""));
  const auto mark = good(work.notebook().changeMark());
  const auto preview = good(app::previewWeighing(work.sheet(), "nickel", "3.31 mg"));
  CHECK(good(work.notebook().changeMark()) == mark);
  good(app::weighComponent(work.desk(), work.run(), "nickel", "3.31 mg", true, ""));
  const auto sheet = work.sheet();
  const auto& charged = *sheet.planned.charge.find("nickel")->charged;
  CHECK(*preview.offTargetPercent == Approx(*charged.offTargetPercent));
  CHECK(preview.withinTolerance ==
        (std::abs(*charged.offTargetPercent) <= 3.0));  // the plan's own tolerance
  INFO(preview.asCharged);
  // By hand: 3.31 mg of assay 0.97 and 308.62 g/mol is 10.40 µmol.
  CHECK(preview.asCharged.starts_with("0.0104 mmol, "));
  CHECK(preview.asCharged.ends_with(" mol%"));
  CHECK(preview.questions.empty());
}

TEST_CASE("a preview asks what weighing asks and faults where it faults",
          "[app][weigh][regression]") {
  WorkDesk work;
  (void)work.addRun();
  const auto sheet = work.sheet();
  const auto slip = good(app::previewWeighing(sheet, "nickel", "3.2 g"));
  REQUIRE(slip.questions.size() == 1);
  CHECK(slip.questions.front().likelyText == "3.2 mg");
  CHECK_FALSE(slip.withinTolerance);
  for (const auto& [key, quantity] :
       {std::pair{"nickel", "3.2"}, std::pair{"nickel", "3 uL"}, std::pair{"nikel", "3 mg"}}) {
    const auto weighed = app::weighComponent(work.desk(), work.run(), key, quantity, false, "");
    CHECK_FALSE(told(weighed).empty());
    CHECK(told(app::previewWeighing(sheet, key, quantity)) == told(weighed));
  }
}

TEST_CASE("a weighing is undone and put back", "[app][weigh][identity]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::weighComponent(work.desk(), work.run(), "nickel", "3.31 mg", true, ""));
  const app::ComponentRecord weighed = work.component("nickel");
  const auto without = good(app::restoreWeighing(work.desk(), work.run(), "nickel", "", "slip"));
  CHECK_FALSE(without.weighed);
  const app::ComponentRecord empty = work.component("nickel");
  CHECK(empty.actualText.empty());
  CHECK_FALSE(empty.actual_mg);
  CHECK_FALSE(empty.weighed);
  CHECK_FALSE(empty.charged_mmol);
  CHECK(empty.loading_molPercent() == empty.planned_molPercent);
  CHECK(work.run().state == app::RunState::kCharged);
  good(app::restoreWeighing(work.desk(), work.run(), "nickel", weighed.actualText, "after all"));
  const app::ComponentRecord again = work.component("nickel");
  CHECK(again.actual_mg == weighed.actual_mg);
  CHECK(again.charged_mmol == weighed.charged_mmol);
  CHECK(again.charged_molPercent == weighed.charged_molPercent);
  CHECK(tests::findings(work.notebook()).empty());
}

TEST_CASE("taking the limiting weighing out judges the others against the plan",
          "[app][weigh][regression]") {
  WorkDesk work;
  (void)work.addRun();
  good(app::weighComponent(work.desk(), work.run(), "nickel", "3.31 mg", true, ""));
  const auto before = work.component("nickel").charged_molPercent;
  good(app::weighComponent(work.desk(), work.run(), "amine", "30.0 mg", true, ""));
  CHECK(work.component("nickel").charged_molPercent != before);
  good(app::restoreWeighing(work.desk(), work.run(), "amine", " ", ""));
  CHECK(work.component("nickel").charged_molPercent == before);
  // Once the lamp is on, it takes a reason.
  good(app::logLine(work.desk(), work.run(), {.line = "lamp on"}));
  CHECK(told(app::restoreWeighing(work.desk(), work.run(), "nickel", "", "")).starts_with("state"));
}

TEST_CASE("the order of weighing is solids, neat liquids, stocks, solvents",
          "[app][weigh][regression]") {
  WorkDesk work;
  (void)work.addRun();
  CHECK(app::weighingOrder(work.sheet()) ==
        std::vector<std::string>{"nickel", "amine", "pc", "mecn", "water"});
}

}  // namespace
}  // namespace vialkeeper
