// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "app/notebook/log_run.h"
#include "app/notebook/run_plan.h"
#include "light/lamp_clock.h"

/// What the strip above an open run shows of its vial: volumes, the last readings against the
/// limit, the lamp's clock, and the log as marks on a line of time.
namespace vialkeeper::app {

/// The vial as it is drawn to scale. Volumes are those of the plan, less and more what the log
/// took out and put in.
struct VialFilling {
  units::Volume vial;
  units::Volume liquid;
  units::Volume displaced;  ///< stir bar and probes
  units::Volume headspace;
};

/// The last pressure or temperature that was read.
struct LastReading {
  double value = 0.0;     ///< bar or °C
  std::string kind = {};  ///< `gauge` or `abs`; of a pressure only
  units::Moment at{};
  int entry = 0;  ///< its number in the log
};

/// One event on the line of time.
struct TimelineMark {
  int entry = 0;
  std::string kind;
  std::string letter;    ///< `p`, `s`, `v`: what stands over the mark
  std::string sentence;  ///< for the tip: `pressure 0.42 bar gauge at 35 °C`
  units::Moment at{};
  double hours = 0.0;  ///< since the line's beginning
};

struct TimelineInterval {
  double from_h = 0.0;
  double to_h = 0.0;
  bool open = false;  ///< the lamp still burns; `to_h` is now
};

/// A point of the chart of readings.
struct ReadingPoint {
  double clock_h = 0.0;   ///< since the line's beginning
  double lampOn_h = 0.0;  ///< lamp-on time then
  double value = 0.0;     ///< bar gauge, or °C
  int entry = 0;
};

struct VialStrip {
  std::optional<VialFilling> filling = {};  ///< nothing where the plan names no vial
  std::optional<double> limit_bar = {};     ///< rated gauge × derating; nothing: no rating known
  std::optional<double> rated_bar = {};
  std::optional<LastReading> pressure = {};      ///< as it was read
  std::optional<double> pressureGauge_bar = {};  ///< the same over ambient, where that is known
  std::optional<LastReading> temperature = {};
  bool lampIsOn = false;
  units::Duration lampOn = units::Duration::fromSeconds(0.0);
  std::optional<units::Duration> planned = {};
  int interruptions = 0;
  std::string light = {};  ///< `440 nm, LED 440`
  std::optional<units::Moment> begin =
      {};              ///< of the line: the first lamp on, else the first entry
  double end_h = 0.0;  ///< of the line: planned end, now, or the last entry, what is latest
  std::vector<TimelineInterval> lamp = {};
  std::vector<TimelineMark> marks = {};
  std::vector<ReadingPoint> pressures = {};  ///< gauge; absolute readings less ambient
  std::vector<ReadingPoint> temperatures = {};
};

/// Superseded and withdrawn entries count for nothing. Pure.
[[nodiscard]] VialStrip vialStrip(const RunSheet& sheet, const std::vector<NumberedEvent>& events,
                                  const units::Moment& now);

}  // namespace vialkeeper::app
