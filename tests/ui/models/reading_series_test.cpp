// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/reading_series.h"

#include <catch2/catch.hpp>
#include <cmath>

#include "ui/models/strip_view.h"

using namespace vialkeeper;

namespace {

/// On from 0 to 2 h, off for 1 h with a vent, on again from 3 h to 5 h.
app::VialStrip interrupted() {
  app::VialStrip strip;
  strip.begin = units::Moment{};
  strip.lamp = {{0.0, 2.0, false}, {3.0, 5.0, true}};
  strip.lampIsOn = true;
  strip.lampOn = units::Duration::fromHours(4.0);
  strip.planned = units::Duration::fromHours(6.0);
  strip.interruptions = 1;
  strip.light = "440 nm";
  strip.end_h = 7.0;
  strip.limit_bar = 1.0;
  strip.pressures = {{1.0, 1.0, 0.2, 2}, {2.0, 2.0, 0.4, 3}, {4.0, 3.0, 0.1, 5}};
  strip.temperatures = {{1.0, 1.0, 35.0, 2}};
  strip.marks = {{1, "lamp on", "l", "lamp on", {}, 0.0},
                 {2, "pressure", "p", "pressure 0.2 bar gauge at 35 °C", {}, 1.0},
                 {3, "pressure", "p", "pressure 0.4 bar gauge", {}, 2.0},
                 {4, "vent", "v", "vent to ambient", {}, 2.5},
                 {5, "pressure", "p", "pressure 0.1 bar gauge", {}, 4.0}};
  return strip;
}

}  // namespace

TEST_CASE("readings against the clock break where gas was let out", "[ui][identity]") {
  const auto series = ui::readingSeries(interrupted(), ui::ReadingAxis::kClock);
  REQUIRE(series.pressure.x_h.size() == 4);
  CHECK(series.pressure.x_h[1] == 2.0);
  CHECK(std::isnan(series.pressure.y[2]));
  CHECK(series.pressure.entries == std::vector<int>{2, 3, 0, 5});
  CHECK(series.pressure.x_h[3] == 4.0);
  CHECK(series.lampOn_h.size() == 2);
  REQUIRE(series.openings.size() == 1);
  CHECK(series.openings.front().x_h == 2.5);
  CHECK(series.limit_bar == 1.0);
}

TEST_CASE("readings against lamp-on time leave the dark out", "[ui][identity]") {
  const auto series = ui::readingSeries(interrupted(), ui::ReadingAxis::kLampOn);
  CHECK(series.pressure.x_h.back() == 3.0);
  CHECK(series.lampOn_h.empty());
  REQUIRE(series.openings.size() == 1);
  CHECK(series.openings.front().x_h == 2.0);
}

TEST_CASE("the strip in words and shares", "[ui][identity]") {
  const auto view = ui::stripView(interrupted());
  CHECK(view.lamp.clock == QStringLiteral("Lamp on 4 h of 6 h"));
  CHECK(view.lamp.detail == QStringLiteral("440 nm · 1 interruption"));
  CHECK_FALSE(view.vial);
  REQUIRE(view.timeline.lamp.size() == 2);
  CHECK(view.timeline.lamp[0].to == Approx(2.0 / 7.0));
  REQUIRE(view.timeline.planned);
  CHECK(view.timeline.planned->from == Approx(5.0 / 7.0));
  CHECK(view.timeline.planned->to == 1.0);
  CHECK(view.timeline.marks.size() == 5);
  CHECK(view.latest.size() == 3);
  for (const auto& mark : view.timeline.marks) {
    CHECK(mark.at >= 0.0);
    CHECK(mark.at <= 1.0);
  }
}

TEST_CASE("a strip without vial, log or plan has words for it", "[ui][identity]") {
  const auto view = ui::stripView({});
  CHECK_FALSE(view.vial);
  CHECK(view.lamp.clock == QStringLiteral("Lamp not on yet"));
  CHECK(view.gauge.value == QStringLiteral("no reading"));
  CHECK(view.gauge.forecast == QStringLiteral("no forecast yet"));
  CHECK(view.timeline.isEmpty());
}

TEST_CASE("the gauge keeps its limit in sight and says when it is passed", "[ui][identity]") {
  app::VialStrip strip = interrupted();
  strip.pressure = app::LastReading{.value = 1.2, .kind = "gauge"};
  strip.pressureGauge_bar = 1.2;
  strip.filling =
      app::VialFilling{units::Volume::fromMillilitres(11.6), units::Volume::fromMillilitres(2.0),
                       units::Volume::fromMillilitres(0.1), units::Volume::fromMillilitres(9.5)};
  const auto view = ui::stripView(strip);
  CHECK(view.gauge.overLimit);
  CHECK(*view.gauge.limit == Approx(1.0 / 1.5));
  CHECK(*view.gauge.reading == Approx(1.2 / 1.5));
  CHECK(view.vial->filled == Approx(2.1 / 11.6));
  CHECK(view.vial->hasStirBar);
}
