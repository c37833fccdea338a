// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_slip.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <chrono>
#include <cmath>
#include <span>
#include <utility>

#include "app/notebook/log_line_kinds.h"
#include "units/quantity_text.h"
#include "units/shown.h"

namespace vialkeeper::app {
namespace {

using units::Pressure;
using units::Temperature;
using units::Volume;
using namespace event_kind;

// What unrated glass is taken to hold, and what is usual in a vial [bar gauge].
constexpr double kGlass_bar = 10.0;
constexpr double kUsual_bar = 3.0;
// Barometers between the lowest and the highest place where people work [bar].
constexpr double kLowestBarometer_bar = 0.5;
constexpr double kHighestBarometer_bar = 1.1;
constexpr double kColdest_C = -100.0;
constexpr double kHottest_C = 250.0;
constexpr double kRoom_C = 25.0;
constexpr double kZero_C = -273.15;
// A sample may take a little more than the plan's liquid, for solids dissolve in it.
constexpr double kSpare = 1.05;

/// The first quantity of that kind in the line, as it was typed.
std::optional<units::ReadQuantity> typedIn(std::string_view line, units::Kind kind) {
  constexpr std::string_view kFigures = "0123456789.,";
  constexpr std::string_view kEnds = " \t;,0123456789";
  for (std::size_t at = line.find_first_of("0123456789"); at < line.size();
       at = line.find_first_of("0123456789", at)) {
    const std::size_t figures = std::min(line.find_first_not_of(kFigures, at), line.size());
    const std::size_t unit = std::min(line.find_first_not_of(" \t", figures), line.size());
    const std::size_t end = std::min(line.find_first_of(kEnds, unit), line.size());
    const auto read = units::readQuantityOf({kind}, line.substr(at, end - at),
                                            units::Dialect::kPerson, units::Range::kAny);
    if (read) return *read;
    at = figures;
  }
  return std::nullopt;
}

std::string figure(double number, std::string_view unit) {
  return fmt::format("{:.10g} {}", number, unit);
}

class SlipFinder {
 public:
  SlipFinder(const VialContext& vial, const EventRecord& event) : m_vial(vial), m_event(event) {}

  std::vector<LogSlip> run() {
    lookAtPressure();
    lookAtTemperature();
    lookAtVolume();
    lookAtTime();
    return std::move(m_slips);
  }

 private:
  void question(LogSlipKind kind, std::string what, std::string likely = {},
                std::string_view otherwise = "is the figure right?") {
    std::string ask =
        likely.empty() ? std::string(otherwise) : fmt::format("did you mean {}?", likely);
    m_slips.push_back({kind, std::move(what), std::move(ask), std::move(likely)});
  }

  [[nodiscard]] double limit_bar() const {
    return m_vial.ratedGauge ? m_vial.ratedGauge->bar() : kGlass_bar;
  }

  void lookAtPressure() {
    if (!m_event.pressure_bar || m_event.kind == kGasAdded) return;
    if (m_event.kind == kCollected) return lookAtBarometer();
    const bool isGauge = m_event.pressureKind != "abs";
    const double gauge_bar =
        isGauge ? *m_event.pressure_bar : *m_event.pressure_bar - m_vial.ambient.bar();
    const std::string said = figure(*m_event.pressure_bar, isGauge ? "bar gauge" : "bar abs");
    if (gauge_bar <= limit_bar()) return;
    const std::string what = m_vial.ratedGauge
                                 ? fmt::format("{} is above the vial's rating of {} gauge", said,
                                               units::shown(*m_vial.ratedGauge))
                                 : fmt::format("{} is more than a glass vial holds", said);
    question(LogSlipKind::kPressure, what, likelyPressure(isGauge));
  }

  /// The smallest change of unit or decimal sign that leads to a usual pressure.
  [[nodiscard]] std::string likelyPressure(bool isGauge) const {
    const auto typed = typedIn(m_event.raw, units::Kind::kPressure);
    const double offset_bar = isGauge ? 0.0 : m_vial.ambient.bar();
    // A little above the rating is no slip of the hand.
    if (!typed || typed->symbol != "bar" || typed->number - offset_bar < 2.0 * limit_bar())
      return {};
    const double most_bar = std::min(limit_bar(), kUsual_bar);
    const double least_bar = isGauge ? 0.0 : kLowestBarometer_bar - offset_bar;
    const auto isUsual = [=](double bar) {
      return bar - offset_bar <= most_bar && bar - offset_bar >= least_bar;
    };
    if (isUsual(typed->number / 10.0)) return figure(typed->number / 10.0, "bar");
    if (isUsual(typed->number / 100.0)) return figure(typed->number, "kPa");
    if (isUsual(typed->number / 1000.0)) return figure(typed->number, "mbar");
    return {};
  }

  void lookAtBarometer() {
    const double bar = *m_event.pressure_bar;
    const auto isSound = [](double p_bar) {
      return p_bar >= kLowestBarometer_bar && p_bar <= kHighestBarometer_bar;
    };
    if (isSound(bar)) return;
    std::string likely;
    const auto typed = typedIn(m_event.raw, units::Kind::kPressure);
    for (const auto& [unit, perBar] : {std::pair{"mbar", 1e3}, {"kPa", 1e2}, {"bar", 1.0}}) {
      if (likely.empty() && typed && isSound(typed->number / perBar))
        likely = figure(typed->number, unit);
    }
    question(LogSlipKind::kPressure, figure(bar, "bar") + " is no barometer's reading", likely);
  }

  void lookAtTemperature() {
    if (!m_event.temperature_C) return;
    const double said_C = *m_event.temperature_C;
    if (said_C >= kColdest_C && said_C <= kHottest_C) return;
    question(
        LogSlipKind::kTemperature,
        fmt::format("{} is {} than a vial gets", units::shown(Temperature::fromCelsius(said_C)),
                    said_C < kColdest_C ? "colder" : "hotter"),
        likelyTemperature());
  }

  /// The other unit or another decimal sign, whichever comes closer to what was planned.
  [[nodiscard]] std::string likelyTemperature() const {
    const auto typed = typedIn(m_event.raw, units::Kind::kTemperature);
    if (!typed) return {};
    const double planned_C = m_vial.planned ? m_vial.planned->celsius() : kRoom_C;
    std::string likely;
    double closest = 100.0;
    const auto offer = [&](double celsius, std::string text) {
      if (std::abs(celsius - planned_C) >= closest) return;
      closest = std::abs(celsius - planned_C);
      likely = std::move(text);
    };
    if (typed->symbol == "K") {
      offer(typed->number, figure(typed->number, "°C"));
    } else {
      offer(typed->number + kZero_C, figure(typed->number, "K"));
      offer(typed->number / 10.0, figure(typed->number / 10.0, "°C"));
    }
    return likely;
  }

  [[nodiscard]] std::optional<double> free_uL() const {
    if (!m_vial.vial) return std::nullopt;
    return std::max(0.0, m_vial.vial->microlitres() - m_vial.displaced.microlitres() -
                             m_vial.liquid.microlitres());
  }

  void lookAtVolume() {
    if (!m_event.volume_uL) return;
    const Volume volume = Volume::fromMicrolitres(*m_event.volume_uL);
    const auto against = [&](LogSlipKind kind, double limit_uL, const std::string& than) {
      if (*m_event.volume_uL <= limit_uL * (1.0 + 1e-9)) return;
      question(kind,
               fmt::format("{} is more than {} ({})", units::shown(volume), than,
                           units::shown(Volume::fromMicrolitres(limit_uL))),
               likelyVolume(limit_uL));
    };
    const auto free = free_uL();
    if (m_event.kind == kLiquidSample) {
      const double liquid_uL = m_vial.liquid.microlitres();
      if (*m_event.volume_uL > kSpare * liquid_uL)
        against(LogSlipKind::kLiquidSample, liquid_uL, "the vial's liquid");
    } else if (m_event.kind == kGasSample && m_vial.vial) {
      against(LogSlipKind::kGasSample, m_vial.vial->microlitres(), "the vial");
    } else if (m_event.kind == kLiquidAdded && free) {
      against(LogSlipKind::kLiquidAdded, *free, "the room left in the vial");
    } else if ((m_event.kind == kGasAdded || m_event.kind == kCollected) && free) {
      // The gas as it would be at the vial's highest pressure.
      double own_bar = m_vial.ambient.bar();
      if (m_event.kind == kGasAdded && m_event.pressure_bar) {
        own_bar = m_event.pressureKind == "abs" ? *m_event.pressure_bar
                                                : *m_event.pressure_bar + m_vial.ambient.bar();
      }
      const double most_uL = *free * (limit_bar() + m_vial.ambient.bar()) /
                             std::max(own_bar, 0.1 * m_vial.ambient.bar());
      against(LogSlipKind::kGasAmount, most_uL, "the vial could ever hold");
    }
  }

  /// The same figure in a smaller unit, if that fits; what is little too much is no slip of units.
  [[nodiscard]] std::string likelyVolume(double limit_uL) const {
    const auto typed = typedIn(m_event.raw, units::Kind::kVolume);
    if (!typed || *m_event.volume_uL < 4.0 * limit_uL) return {};
    constexpr auto kUnits =
        std::to_array<std::pair<std::string_view, double>>({{"mL", 1e-6}, {"uL", 1e-9}});
    for (const auto& [unit, si] : kUnits) {
      const double volume = typed->number * si;
      if (volume < 0.9 * typed->si && volume * 1e9 <= 0.5 * limit_uL)
        return figure(typed->number, unit);
    }
    return {};
  }

  void lookAtTime() {
    // People say minutes; the record knows seconds.
    const auto minute = std::chrono::floor<std::chrono::minutes>(m_vial.created.utc);
    if (m_event.at.utc >= minute) return;
    question(LogSlipKind::kTime,
             fmt::format("{} is before the run was set up ({})", toIsoText(m_event.at),
                         toIsoText(m_vial.created)),
             {}, "is the time right?");
  }

  const VialContext& m_vial;
  const EventRecord& m_event;
  std::vector<LogSlip> m_slips;
};

}  // namespace

std::string_view toText(LogSlipKind kind) {
  switch (kind) {
    case LogSlipKind::kPressure:
      return "slip-pressure";
    case LogSlipKind::kTemperature:
      return "slip-temperature";
    case LogSlipKind::kLiquidSample:
      return "slip-liquid-sample";
    case LogSlipKind::kGasSample:
      return "slip-gas-sample";
    case LogSlipKind::kLiquidAdded:
      return "slip-liquid-added";
    case LogSlipKind::kGasAmount:
      return "slip-gas-amount";
    case LogSlipKind::kTime:
      return "slip-time";
  }
  return "";
}

std::vector<LogSlip> logSlips(const VialContext& vial, const EventRecord& event) {
  return SlipFinder(vial, event).run();
}

}  // namespace vialkeeper::app
