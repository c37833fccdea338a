// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/vial_strip.h"

#include <catch2/catch.hpp>

#include "app/plan_charge.h"
#include "support/sample_plan.h"

namespace vialkeeper {
namespace {

using std::chrono::minutes;

const units::Moment kStart = *units::readIsoTime("2026-03-04T08:00+01:00");

units::Moment at(int minute) { return {kStart.utc + minutes(minute), kStart.offset}; }

app::RunSheet sheetOf(const std::string& text, app::RunState state = app::RunState::kIrradiating) {
  auto planned = app::planCharge(text, "sample.toml", {});
  REQUIRE(planned);
  app::RunSheet sheet{.run = {}, .components = {}, .planned = *std::move(planned)};
  sheet.run.state = state;
  return sheet;
}

/// A log line by line, each at its minute.
std::vector<app::NumberedEvent> logged(const std::vector<std::pair<int, std::string>>& lines) {
  std::vector<app::NumberedEvent> events;
  for (const auto& [minute, line] : lines) {
    app::EventRecord event = app::readLogLine(line).event;
    event.n = static_cast<app::RowNumber>(events.size()) + 1;
    event.at = at(minute);
    events.push_back({static_cast<int>(event.n), event});
  }
  return events;
}

TEST_CASE("the strip over a run shows filling, clock and last readings",
          "[app][vial-strip][identity]") {
  const auto events = logged({{-10, "note sealed"},
                              {0, "lamp on"},
                              {60, "p 0.42 bar 35 C"},
                              {90, "lamp off"},
                              {100, "aliquot 100 uL S1"},
                              {110, "add 0.2 mL acetonitrile"},
                              {120, "lamp on"},
                              {150, "p 1.51325 bar abs"},
                              {155, "T 36 C"}});
  const auto strip = app::vialStrip(sheetOf(tests::samplePlanText()), events, at(180));
  REQUIRE(strip.filling);
  // The plan: 11.6 mL vial, 0.15 mL displaced, 2.0 mL liquid; the log: 0.1 mL out, 0.2 mL in.
  CHECK(strip.filling->liquid.millilitres() == Approx(2.1));
  CHECK(strip.filling->headspace.millilitres() == Approx(11.6 - 0.15 - 2.1));
  CHECK((strip.filling->vial - strip.filling->displaced - strip.filling->liquid -
         strip.filling->headspace)
            .si() == Approx(0.0).margin(1e-18));
  CHECK(*strip.rated_bar == Approx(2.0));
  CHECK(*strip.limit_bar == Approx(1.0));
  CHECK(strip.lampIsOn);
  CHECK(strip.lampOn.hours() == Approx(2.5));  // 90 and 60 minutes
  CHECK(strip.interruptions == 1);
  CHECK(strip.planned->hours() == Approx(20.0));
  CHECK(strip.light == "440 nm, LED 440");
  REQUIRE(strip.pressure);
  CHECK(strip.pressure->value == Approx(1.51325));
  CHECK(strip.pressure->kind == "abs");
  CHECK(strip.pressure->entry == 8);
  CHECK(*strip.pressureGauge_bar == Approx(0.5));  // less 1.01325 bar ambient
  CHECK(strip.temperature->value == 36.0);
  CHECK(strip.begin == at(0));
  CHECK(strip.end_h == Approx(20.5));  // 20 h of light and half an hour of pause
  REQUIRE(strip.lamp.size() == 2);
  CHECK(strip.lamp[0].to_h == Approx(1.5));
  CHECK(strip.lamp[1].from_h == Approx(2.0));
  CHECK(strip.lamp[1].to_h == Approx(3.0));
  CHECK(strip.lamp[1].open);
  REQUIRE(strip.marks.size() == 9);
  CHECK(strip.marks[0].hours == Approx(-10.0 / 60.0));
  CHECK(strip.marks[2].letter == "p");
  CHECK(strip.marks[2].sentence == "pressure 0.42 bar gauge at 35 °C");
  CHECK(strip.marks[4].letter == "s");
  REQUIRE(strip.pressures.size() == 2);
  CHECK(strip.pressures[0].value == Approx(0.42));
  CHECK(strip.pressures[0].lampOn_h == Approx(1.0));
  CHECK(strip.pressures[1].clock_h == Approx(2.5));
  CHECK(strip.pressures[1].lampOn_h == Approx(2.0));
  CHECK(strip.temperatures.size() == 2);
}

TEST_CASE("superseded and withdrawn entries count for nothing", "[app][vial-strip][identity]") {
  auto events =
      logged({{0, "lamp on"}, {30, "p 0.42 bar"}, {60, "aliquot 1 mL"}, {70, "lamp off"}});
  const auto plain = logged({{0, "lamp on"}});
  for (const std::size_t i : {1U, 2U, 3U}) {
    events[i].event.supersededBy = 10 + static_cast<app::RowNumber>(i);
    app::EventRecord withdrawn;
    withdrawn.kind = "withdrawn";
    withdrawn.at = events[i].event.at;
    events.push_back({static_cast<int>(events.size()) + 1, withdrawn});
  }
  const auto sheet = sheetOf(tests::samplePlanText());
  const auto a = app::vialStrip(sheet, events, at(90));
  const auto b = app::vialStrip(sheet, plain, at(90));
  CHECK(a.filling->liquid == b.filling->liquid);
  CHECK(a.lampOn == b.lampOn);
  CHECK(a.marks.size() == 1);
  CHECK_FALSE(a.pressure);
  CHECK(a.pressures.empty());
  CHECK(a.end_h == b.end_h);
}

TEST_CASE("a strip of a plan alone, of a dark run, and of a run that is over",
          "[app][vial-strip][regression]") {
  const auto sheet = sheetOf(tests::samplePlanText(), app::RunState::kPlanned);
  const auto planned = app::vialStrip(sheet, {}, at(0));
  CHECK_FALSE(planned.begin);
  CHECK(planned.end_h == Approx(20.0));
  CHECK(planned.marks.empty());
  CHECK_FALSE(planned.lampIsOn);

  const auto dark = app::vialStrip(sheet, logged({{0, "note sealed, wrapped in foil"}}), at(60));
  CHECK(dark.begin == at(0));
  CHECK(dark.lampOn.seconds() == 0.0);
  CHECK(dark.end_h == Approx(20.0));

  // A year later the line ends where it ended.
  const auto over = app::vialStrip(sheetOf(tests::samplePlanText(), app::RunState::kClosed),
                                   logged({{0, "lamp on"}, {1260, "lamp off"}}), at(525600));
  CHECK(over.end_h == Approx(21.0));
  CHECK(over.lampOn.hours() == Approx(21.0));
}

TEST_CASE("gas that is added or collected has a temperature of its own",
          "[app][vial-strip][regression]") {
  const auto strip = app::vialStrip(sheetOf(tests::samplePlanText()),
                                    logged({{0, "T 35 C"}, {5, "collected 4.2 mL 21 C"}}), at(10));
  CHECK(strip.temperature->value == 35.0);
  CHECK(strip.temperatures.size() == 1);
}

}  // namespace
}  // namespace vialkeeper
