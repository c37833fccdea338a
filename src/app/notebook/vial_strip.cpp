// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/vial_strip.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <chrono>
#include <iterator>
#include <ratio>
#include <span>
#include <utility>

#include "app/notebook/log_line_kinds.h"
#include "app/notebook/log_line_sentence.h"

namespace vialkeeper::app {
namespace {

using units::Moment;

constexpr auto kLetters =
    std::to_array<std::pair<std::string_view, std::string_view>>({{event_kind::kLampOn, "l"},
                                                                  {event_kind::kLampOff, "l"},
                                                                  {event_kind::kPressure, "p"},
                                                                  {event_kind::kTemperature, "T"},
                                                                  {event_kind::kHeadspace, "h"},
                                                                  {event_kind::kGasSample, "g"},
                                                                  {event_kind::kLiquidSample, "s"},
                                                                  {event_kind::kVent, "v"},
                                                                  {event_kind::kCollected, "c"},
                                                                  {event_kind::kPurge, "u"},
                                                                  {event_kind::kGasAdded, "+"},
                                                                  {event_kind::kLiquidAdded, "+"},
                                                                  {event_kind::kPhoto, "f"},
                                                                  {event_kind::kObservation, "n"}});

std::string letterOf(std::string_view kind) {
  const auto* found =
      std::ranges::find(kLetters, kind, [](const auto& entry) { return entry.first; });
  return found == kLetters.end() ? std::string{} : std::string(found->second);
}

/// Whether the entry says what happened in the vial: not one that another took the place of, not
/// that a record was taken back or an addendum written.
bool counts(const EventRecord& event) {
  return event.supersededBy == 0 && event.kind != event_kind::kWithdrawn &&
         event.kind != event_kind::kAddendum;
}

bool readsPressure(const EventRecord& event) {
  return event.pressure_bar &&
         (event.kind == event_kind::kPressure || event.kind == event_kind::kHeadspace);
}

/// The temperature of gas that is added or collected is its own, not the vial's.
bool readsTemperature(const EventRecord& event) {
  return event.temperature_C && event.kind != event_kind::kGasAdded &&
         event.kind != event_kind::kCollected;
}

double hoursBetween(const Moment& begin, const Moment& end) {
  return std::chrono::duration<double, std::ratio<3600>>(end.utc - begin.utc).count();
}

bool isOver(RunState state) { return state >= RunState::kWorkedUp; }

class StripMaker {
 public:
  StripMaker(const RunSheet& sheet, const std::vector<NumberedEvent>& events, const Moment& now)
      : m_sheet(sheet), m_plan(sheet.planned.plan), m_now(now) {
    std::ranges::copy_if(events, std::back_inserter(m_events),
                         [](const NumberedEvent& entry) { return counts(entry.event); });
    std::ranges::stable_sort(m_events, {},
                             [](const NumberedEvent& entry) { return entry.event.at.utc; });
  }

  VialStrip make() {
    fill();
    clockLamp();
    beginLine();
    for (const NumberedEvent& entry : m_events) take(entry);
    endLine();
    return std::move(m_strip);
  }

 private:
  void fill() {
    if (m_plan.vial) {
      double liquid_uL = m_sheet.planned.charge.totalLiquid.microlitres();
      for (const auto& [number, event] : m_events) {
        if (event.kind == event_kind::kLiquidSample) liquid_uL -= event.volume_uL.value_or(0.0);
        if (event.kind == event_kind::kLiquidAdded) liquid_uL += event.volume_uL.value_or(0.0);
      }
      const auto liquid = units::Volume::fromMicrolitres(std::max(liquid_uL, 0.0));
      m_strip.filling = VialFilling{m_plan.vial->volume, liquid, m_plan.vial->displaced,
                                    m_plan.vial->volume - m_plan.vial->displaced - liquid};
      if (m_plan.vial->ratedGauge) {
        m_strip.rated_bar = m_plan.vial->ratedGauge->bar();
        m_strip.limit_bar = m_plan.vial->derating * *m_strip.rated_bar;
      }
    }
    const charge::IrradiationPlan& light = m_plan.irradiation;
    if (light.wavelength) m_strip.light = fmt::format("{:.4g} nm", light.wavelength->nanometres());
    if (!light.lamp.empty()) m_strip.light += (m_strip.light.empty() ? "" : ", ") + light.lamp;
    m_strip.planned = light.duration;
  }

  void clockLamp() {
    std::vector<light::LampSwitch> switches;
    for (const auto& [number, event] : m_events) {
      const bool on = event.kind == event_kind::kLampOn;
      if (on || event.kind == event_kind::kLampOff) switches.push_back({event.at.utc, on});
    }
    m_clock = light::LampClock(switches);
    m_strip.lampIsOn = m_clock.isOn();
    m_strip.lampOn = m_clock.onTime(m_now.utc);
    m_strip.interruptions = m_clock.interruptions();
  }

  void beginLine() {
    if (m_events.empty()) return;
    const auto lampOn = std::ranges::find_if(m_events, [](const NumberedEvent& entry) {
      return entry.event.kind == event_kind::kLampOn;
    });
    m_strip.begin = (lampOn == m_events.end() ? m_events.begin() : lampOn)->event.at;
    for (const light::LampInterval& interval : m_clock.intervals()) {
      const double from_h = hours(interval.on);
      const double to_h = interval.off ? hours(*interval.off) : hours(m_now.utc);
      m_strip.lamp.push_back({from_h, std::max(from_h, to_h), !interval.off});
    }
  }

  [[nodiscard]] double hours(light::Instant at) const {
    return hoursBetween(*m_strip.begin, {at, {}});
  }

  /// A pressure over ambient; nothing where an absolute one meets no known ambient pressure.
  [[nodiscard]] std::optional<double> gauge_bar(const EventRecord& event) const {
    if (event.pressureKind != "abs") return event.pressure_bar;
    if (!m_plan.seal) return std::nullopt;
    return *event.pressure_bar - m_plan.seal->ambient.bar();
  }

  void take(const NumberedEvent& entry) {
    const EventRecord& event = entry.event;
    const double at_h = hours(event.at.utc);
    const double lampOn_h = m_clock.onTime(event.at.utc).hours();
    m_strip.marks.push_back(
        {entry.number, event.kind, letterOf(event.kind), eventSentence(event), event.at, at_h});
    if (readsPressure(event)) {
      const std::string kind = event.pressureKind.empty() ? "gauge" : event.pressureKind;
      m_strip.pressure = LastReading{*event.pressure_bar, kind, event.at, entry.number};
      m_strip.pressureGauge_bar = gauge_bar(event);
      if (m_strip.pressureGauge_bar)
        m_strip.pressures.push_back({at_h, lampOn_h, *m_strip.pressureGauge_bar, entry.number});
    }
    if (readsTemperature(event)) {
      m_strip.temperature = LastReading{*event.temperature_C, {}, event.at, entry.number};
      m_strip.temperatures.push_back({at_h, lampOn_h, *event.temperature_C, entry.number});
    }
  }

  void endLine() {
    const double planned_h = m_strip.planned ? m_strip.planned->hours() : 0.0;
    if (!m_strip.begin) {
      m_strip.end_h = planned_h;
      return;
    }
    m_strip.end_h = m_strip.marks.back().hours;
    // The line of a run that is over does not grow with the calendar.
    const bool goesOn = m_strip.lampIsOn || !isOver(m_sheet.run.state);
    const double now_h = hours(m_now.utc);
    if (goesOn) m_strip.end_h = std::max(m_strip.end_h, now_h);
    if (!m_strip.planned) return;
    if (m_clock.intervals().empty()) {
      m_strip.end_h = std::max(m_strip.end_h, planned_h);
    } else if (const auto end = m_clock.whenOnTimeIs(*m_strip.planned)) {
      m_strip.end_h = std::max(m_strip.end_h, hours(*end));
    } else if (goesOn) {  // the lamp is out: at the earliest
      m_strip.end_h = std::max(m_strip.end_h, now_h + planned_h - m_strip.lampOn.hours());
    }
  }

  const RunSheet& m_sheet;
  const charge::Plan& m_plan;
  Moment m_now;
  std::vector<NumberedEvent> m_events;
  light::LampClock m_clock{std::span<const light::LampSwitch>{}};
  VialStrip m_strip;
};

}  // namespace

VialStrip vialStrip(const RunSheet& sheet, const std::vector<NumberedEvent>& events,
                    const Moment& now) {
  return StripMaker(sheet, events, now).make();
}

}  // namespace vialkeeper::app
