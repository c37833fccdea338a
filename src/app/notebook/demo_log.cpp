// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_log.h"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <numeric>

#include "app/notebook/demo_vial.h"
#include "app/notebook/demo_words.h"

namespace vialkeeper::app {
namespace {

constexpr double kMinute = 1.0 / 60.0;
constexpr double kTraceStep_h = 4.0 / 60.0;
constexpr double kVentAbove_bar = 0.3;
constexpr double kRoom_C = 21.0;
constexpr double kBlock_C = 35.0;

DemoVialStart startOf(const DemoRunSpec& run) {
  const DemoSolvent& solvent = demoSolvent(run.recipe.solvent);
  return {.headspace_mL = demoHeadspace_mL(run.recipe),
          .vapour21_bar = solvent.vapour21_bar,
          .vapour35_bar = solvent.vapour35_bar};
}

/// When the vial is looked at while the lamp is on [h].
std::vector<double> visits(const DemoRunSpec& run) {
  const double light_h = run.recipe.light_h;
  if (light_h == 12.0) return {0.5, 1.0, 2.0, 3.0, 4.0, 5.0, 6.0, 8.0, 10.0};
  if (light_h > 24.0) return {0.5, 2.0, 4.0, 20.0, 24.0, 28.0};
  if (run.vents) return {0.5, 1.0, 2.0, 3.0, 4.0, 5.0};
  return run.course ? std::vector{0.5, 1.0, 2.0, 3.0, 4.0, 5.0} : std::vector{0.5, 1.0, 2.0, 4.0};
}

class LogWriter {
 public:
  LogWriter(const DemoRunSpec& run, const DemoOutcome& outcome, DemoRandom& random)
      : m_run(run),
        m_outcome(outcome),
        m_random(random),
        m_hand(run.person, random),
        m_vial(startOf(run)) {}

  DemoLog run() {
    say(-0.30, m_hand.observation(DemoSight::kCharged));
    say(-0.20, m_hand.purge());
    if (m_run.fate == DemoFate::kNoLamp) {
      withoutLamp();
    } else if (m_run.recipe.light_h <= 0.0) {
      inTheDark();
    } else {
      underTheLamp();
    }
    order();
    return std::move(m_log);
  }

 private:
  /// Later than planned by some minutes, as things go.
  double about(double hour) { return hour + std::floor(m_random.between(0.0, 6.0)) * kMinute; }

  std::size_t say(double hour, std::string line) {
    m_log.entries.push_back({.happened_h = hour, .written_h = hour, .line = std::move(line)});
    return m_log.entries.size() - 1;
  }

  void correct(std::size_t wrong, double hour, std::string line, std::string reason) {
    DemoEntry entry{
        .happened_h = m_log.entries[wrong].happened_h, .written_h = hour, .line = std::move(line)};
    entry.corrects = wrong;
    entry.reason = std::move(reason);
    m_log.entries.push_back(std::move(entry));
  }

  void advance(double hour) {
    while (m_now_h < hour) {
      const double step = std::min(kTraceStep_h, hour - m_now_h);
      const double evolved = m_outcome.hydrogenAt(m_now_h + step) - m_outcome.hydrogenAt(m_now_h);
      m_now_h += step;
      const double target = m_warm ? kBlock_C : kRoom_C;
      m_vial.setTemperature(target + (m_vial.celsius() - target) * std::exp(-step / 0.12));
      m_vial.pass(step, evolved);
      if (m_run.trace) record();
    }
  }

  void record() {
    const double due = static_cast<double>(m_log.trace.size()) * kTraceStep_h;
    if (m_now_h + 1e-9 < due) return;
    m_log.trace.push_back({m_now_h, m_vial.absolute_bar() + 0.002 * m_random.normal(),
                           m_vial.celsius() + 0.1 * m_random.normal()});
  }

  void readPressure(double hour) {
    advance(hour);
    const double gauge_bar = std::max(0.0, m_vial.gauge_bar() + 0.004 * m_random.normal());
    const double celsius = m_vial.celsius() + 0.2 * m_random.normal();
    const std::string line = m_hand.pressure(gauge_bar, celsius);
    if (m_run.person == "KW" && gauge_bar > 0.15 && m_random.once(0.04)) {
      const std::size_t wrong =
          say(hour, fmt::format("p {:.1f} bar {:.0f} C", gauge_bar * 10.0, celsius));
      m_log.entries[wrong].accepted = true;
      correct(wrong, hour + 2 * kMinute, line, "decimal point");
    } else {
      say(hour, line);
    }
  }

  void takeAliquot(double hour) {
    advance(hour);
    m_log.aliquots_h.push_back(hour);
    m_vial.takeLiquid(50.0);
    const std::string line = m_hand.aliquot(fmt::format("S{}", m_log.aliquots_h.size()));
    if (m_run.person != "MR" && m_random.once(0.04)) {
      const std::size_t wrong =
          say(hour, fmt::format("aliqout 50 uL S{}", m_log.aliquots_h.size()));
      m_log.entries[wrong].accepted = true;
      correct(wrong, hour + kMinute, line, "typo, it was a sample");
    } else {
      say(hour, line);
    }
  }

  void letGasOut(double hour) {
    advance(hour);
    if (m_vented++ % 2 == 0) {
      say(hour, m_hand.vent());
    } else {
      say(hour, fmt::format("collected {:.1f} mL 21 C", m_vial.ventedVolume_mL()));
    }
    m_vial.vent();
    readPressure(hour + 2 * kMinute);
  }

  DemoSight sightNow() const {
    if (m_run.fate == DemoFate::kPrecipitate) return DemoSight::kPrecipitate;
    if (m_run.recipe.metal == DemoMetalKind::kPalladium) return DemoSight::kPalladium;
    if (m_now_h > m_run.recipe.light_h) return DemoSight::kEnd;
    if (m_now_h < 0.8) return DemoSight::kFirst;
    return m_now_h < 3.0 ? DemoSight::kEarly : DemoSight::kEvening;
  }

  void visit(double planned_h) {
    const double hour = about(planned_h);
    readPressure(hour);
    if (m_run.course) takeAliquot(hour + 2 * kMinute);
    if (m_run.vents && m_vial.gauge_bar() > kVentAbove_bar) letGasOut(hour + 4 * kMinute);
    if (planned_h == 0.5 || m_random.once(0.35))
      say(hour + 6 * kMinute, m_hand.observation(sightNow()));
    if (m_run.fate == DemoFate::kLeak && planned_h == 2.0) {
      say(hour + 7 * kMinute, m_hand.gasSample());
      m_vial.takeGas(250.0);
      m_vial.leak(0.5);
      say(hour + 8 * kMinute, m_hand.observation(DemoSight::kLeak));
    }
  }

  void underTheLamp() {
    const double light_h = m_run.recipe.light_h;
    say(0.0, m_hand.lampOn());
    m_warm = true;
    for (const double hour : visits(m_run)) visit(hour);
    if (light_h == 20.0 && !m_run.vents && m_random.once(0.4))
      late(7.0 + 0.25 * static_cast<double>(m_random.below(5)), light_h - 0.3);
    readPressure(light_h - 3 * kMinute);
    if (m_run.course) takeAliquot(light_h - kMinute);
    advance(light_h);
    say(light_h, m_hand.lampOff());
    m_warm = false;
    afterwards(light_h);
  }

  /// An evening's reading that came into the book the next morning.
  void late(double happened_h, double written_h) {
    const std::size_t before = m_log.entries.size();
    readPressure(happened_h);
    for (std::size_t i = before; i < m_log.entries.size(); ++i) {
      m_log.entries[i].written_h = written_h + static_cast<double>(i - before) * kMinute;
    }
  }

  void afterwards(double off_h) {
    const double hour = about(off_h + 0.6);
    advance(off_h + 4 * kMinute);
    say(off_h + 4 * kMinute,
        m_hand.observation(m_run.fate == DemoFate::kLeak ? DemoSight::kLeak : sightNow()));
    advance(hour);
    readPressure(hour);
    if (m_run.fate != DemoFate::kLeak && m_random.once(0.6)) {
      say(hour + 2 * kMinute, m_hand.gasSample());
      say(hour + 25 * kMinute,
          m_hand.hydrogen(m_vial.hydrogenFraction() * (1.0 + 0.02 * m_random.normal())));
      m_vial.takeGas(250.0);
    }
    if (m_run.vents) {
      letGasOut(hour + 26 * kMinute);
    } else {
      say(hour + 26 * kMinute, m_hand.vent());
    }
    if (!m_run.course) say(hour + 30 * kMinute, m_hand.aliquot("for NMR"));
    if (m_random.once(0.3)) say(hour + 40 * kMinute, m_hand.observation(DemoSight::kEnd));
  }

  void inTheDark() {
    m_warm = true;
    say(0.0, "foil on, in the 35 C block");
    readPressure(about(1.0));
    say(about(4.0), "still pale yellow, no bubbles");
    readPressure(20.0);
    say(20.1, "unchanged after 20 h");
    say(20.2, m_hand.aliquot("for NMR"));
  }

  void withoutLamp() {
    readPressure(about(1.0));
    say(1.2, std::string(demoObservations(DemoSight::kNoLight)[0]));
    say(19.6, std::string(demoObservations(DemoSight::kNoLight)[1]));
    readPressure(19.7);
  }

  /// Puts the entries in the order of writing down and moves the references with them.
  void order() {
    std::vector<std::size_t> places(m_log.entries.size());
    std::iota(places.begin(), places.end(), std::size_t{0});
    std::ranges::stable_sort(places, {},
                             [this](std::size_t i) { return m_log.entries[i].written_h; });
    std::vector<std::size_t> placeOf(places.size());
    for (std::size_t i = 0; i < places.size(); ++i) placeOf[places[i]] = i;
    std::vector<DemoEntry> ordered;
    for (const std::size_t i : places) {
      ordered.push_back(std::move(m_log.entries[i]));
      if (ordered.back().corrects) ordered.back().corrects = placeOf[*ordered.back().corrects];
    }
    m_log.entries = std::move(ordered);
  }

  const DemoRunSpec& m_run;
  const DemoOutcome& m_outcome;
  DemoRandom& m_random;
  DemoHand m_hand;
  DemoVial m_vial;
  DemoLog m_log;
  double m_now_h = 0.0;
  bool m_warm = false;
  int m_vented = 0;
};

}  // namespace

DemoLog demoLog(const DemoRunSpec& run, const DemoOutcome& outcome, DemoRandom& random) {
  return LogWriter(run, outcome, random).run();
}

}  // namespace vialkeeper::app
