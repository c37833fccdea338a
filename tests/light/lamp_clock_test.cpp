// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "light/lamp_clock.h"

#include <algorithm>
#include <catch2/catch.hpp>
#include <random>

namespace vialkeeper {
namespace {

using light::Instant;
using light::LampClock;
using light::LampSwitch;
using std::chrono::minutes;
using units::Duration;

Instant at(int minute) { return Instant{} + minutes(minute); }
double min(const Duration& duration) { return duration.seconds() / 60.0; }

TEST_CASE("lamp-on time is the union of the intervals", "[light][identity]") {
  // By hand: 0–60, 90–150, then from 200 on.
  const std::vector<LampSwitch> switches = {
      {at(200), true}, {at(0), true}, {at(60), false}, {at(90), true}, {at(150), false}};
  const LampClock clock(switches);
  CHECK(clock.intervals().size() == 3);
  CHECK(clock.isOn());
  CHECK(clock.interruptions() == 2);
  CHECK(min(clock.onTime(at(-5))) == 0.0);
  CHECK(min(clock.onTime(at(30))) == 30.0);
  CHECK(min(clock.onTime(at(75))) == 60.0);
  CHECK(min(clock.onTime(at(100))) == 70.0);
  CHECK(min(clock.onTime(at(210))) == 130.0);
  CHECK(clock.whenOnTimeIs(Duration::fromSeconds(60.0 * 60)) == at(60));
  CHECK(clock.whenOnTimeIs(Duration::fromSeconds(70.0 * 60)) == at(100));
  CHECK(clock.whenOnTimeIs(Duration::fromHours(3)) == at(260));
  CHECK_FALSE(clock.whenOnTimeIs(Duration::fromSeconds(-1)));
  CHECK_FALSE(clock.whenOnTimeIs(Duration::fromSeconds(1e300)));
}

TEST_CASE("switchings that say nothing new change nothing", "[light][regression]") {
  const std::vector<LampSwitch> switches = {
      {at(-9), false}, {at(0), true}, {at(10), true}, {at(20), false}, {at(25), false}};
  const LampClock clock(switches);
  REQUIRE(clock.intervals().size() == 1);
  CHECK_FALSE(clock.isOn());
  CHECK(min(clock.onTime(at(100))) == 20.0);
  CHECK(clock.interruptions() == 0);
  CHECK_FALSE(clock.whenOnTimeIs(Duration::fromSeconds(21.0 * 60)));
}

TEST_CASE("off and on at one instant are an interruption of no length", "[light][regression]") {
  const std::vector<LampSwitch> switches = {{at(0), true}, {at(10), true}, {at(10), false}};
  const LampClock clock(switches);
  CHECK(clock.isOn());
  CHECK(clock.interruptions() == 1);
  CHECK(min(clock.onTime(at(30))) == 30.0);
}

TEST_CASE("a dark run has no clock", "[light][regression]") {
  const LampClock clock(std::span<const LampSwitch>{});
  CHECK_FALSE(clock.isOn());
  CHECK(clock.interruptions() == 0);
  CHECK(clock.onTime(at(10)).seconds() == 0.0);
  CHECK_FALSE(clock.whenOnTimeIs(Duration::fromSeconds(0)));
}

TEST_CASE("the clock agrees with a count minute by minute, and runs back the same way",
          "[light][identity]") {
  std::mt19937_64 random(5);
  for (int round = 0; round < 300; ++round) {
    std::vector<LampSwitch> switches;
    for (std::size_t n = random() % 8; n > 0; --n)
      switches.push_back({at(static_cast<int>(random() % 100)), random() % 2 == 0});
    const LampClock clock(switches);
    std::ranges::stable_sort(switches, [](const LampSwitch& a, const LampSwitch& b) {
      return a.at != b.at ? a.at < b.at : a.on < b.on;
    });
    bool burns = false;
    int counted = 0;
    for (int minute = 0; minute < 110; ++minute) {
      REQUIRE(min(clock.onTime(at(minute))) == counted);
      for (const LampSwitch& each : switches) {
        if (each.at == at(minute)) burns = each.on;
      }
      if (burns) ++counted;
      if (const auto when = clock.whenOnTimeIs(Duration::fromSeconds(60.0 * counted)))
        REQUIRE(min(clock.onTime(*when)) == counted);
    }
    CHECK(clock.isOn() == burns);
  }
}

}  // namespace
}  // namespace vialkeeper
