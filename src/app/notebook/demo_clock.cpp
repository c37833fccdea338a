// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_clock.h"

#include <chrono>
#include <cmath>

namespace vialkeeper::app {
namespace {

using namespace std::chrono_literals;
using std::chrono::milliseconds;
using std::chrono::sys_days;
using Utc = std::chrono::sys_time<milliseconds>;

constexpr sys_days kFirstDay{2026y / 3 / 2};
constexpr Utc kForward{sys_days{2026y / 3 / 29} + 1h};
constexpr Utc kBack{sys_days{2026y / 10 / 25} + 1h};

std::chrono::minutes offsetAt(Utc utc) { return utc >= kForward && utc < kBack ? 120min : 60min; }

milliseconds toMinutes(double hours) {
  return std::chrono::minutes(static_cast<std::int64_t>(std::llround(hours * 60.0)));
}

sys_days localDay(const units::Moment& moment) {
  return std::chrono::floor<std::chrono::days>(moment.utc + moment.offset);
}

}  // namespace

units::Moment demoMoment(int day, double hour) {
  const Utc wall = kFirstDay + std::chrono::days(day) + toMinutes(hour);
  const Utc winter = wall - 60min;
  const Utc utc = offsetAt(winter) == 60min ? winter : wall - 120min;
  return {utc, offsetAt(utc)};
}

units::Moment laterBy(const units::Moment& moment, double hours) {
  const Utc utc = moment.utc + toMinutes(hours);
  return {utc, offsetAt(utc)};
}

std::string demoTimeText(const units::Moment& happened, const units::Moment& now) {
  const std::string text = toIsoText(happened);
  const std::string clock = text.substr(11, 5);
  if (happened.offset != now.offset) return text;
  if (localDay(happened) == localDay(now)) return clock;
  return localDay(happened) + std::chrono::days(1) == localDay(now) ? "yesterday " + clock : text;
}

}  // namespace vialkeeper::app
