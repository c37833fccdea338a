// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "app/notebook/desk.h"

namespace vialkeeper::app {

/// A clock that stands where the story has got to.
class DemoClock final : public Clock {
 public:
  [[nodiscard]] units::Moment now() override { return m_now; }
  void set(const units::Moment& now) { m_now = now; }

 private:
  units::Moment m_now{};
};

/// A time of the campaign, counted from Monday 2 March 2026, 00:00 by the clock on the wall. The
/// wall goes forward by an hour on 29 March 2026, 01:00 UTC, and back on 25 October.
[[nodiscard]] units::Moment demoMoment(int day, double hour);

/// So many hours later, with the offset that holds then.
[[nodiscard]] units::Moment laterBy(const units::Moment& moment, double hours);

/// How a person says in a log at `now` when something happened: `14:20`, `yesterday 17:05`, else in
/// full.
[[nodiscard]] std::string demoTimeText(const units::Moment& happened, const units::Moment& now);

}  // namespace vialkeeper::app
