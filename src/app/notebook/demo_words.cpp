// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_words.h"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>

namespace vialkeeper::app {
namespace {

constexpr auto kCharged = std::to_array<std::string_view>(
    {"clear pale yellow", "bright yellow sln, all dissolved after 2 min stirring",
     "pale yellow, a few grains of Ni salt left", "yellow, slighlty turbid, clears on stirring",
     "all in soln, yellow", "greenish yellow, clear", "clear yellow, stir bar ok"});
constexpr auto kFirst = std::to_array<std::string_view>(
    {"first bublles after 10 min", "colour change yellow to amber within minutes",
     "deep amber, no solid, steady bubbles", "amber, fine bubbles on the stir bar",
     "first gas after a quarter of an hour"});
constexpr auto kEarly = std::to_array<std::string_view>(
    {"deep amber, no solid, steady bubbles", "amber, fine bubbles on the stir bar",
     "orange, bubbling steadily", "amber, clear", "orange-brown, no ppt",
     "bubbles from the bar, none from the wall", "amber film above the liquid"});
constexpr auto kEvening = std::to_array<std::string_view>(
    {"darker, still bubbling", "dark amber, bubbles slower",
     "brown-amber, trace of black on the bar", "no change o/n expected, left stirring",
     "dark amber film at liquid level", "still clear, slow bubbles",
     "rate has dropped, barely a bubble"});
constexpr auto kEnd = std::to_array<std::string_view>(
    {"dark amber, clear, no more bubbles", "brown, clear; black specks on the stir bar",
     "amber film on the glass above liquid level", "brown sln, little dark solid",
     "dark brown, no ppt", "TLC: SM trace, one new spot", "TLC: SM left, product main spot",
     "brown, smells of indole when opened"});
constexpr auto kDark =
    std::to_array<std::string_view>({"foil on, in the 35 C block", "still pale yellow, no bubbles",
                                     "foil checked, tight", "unchanged", "TLC: only SM"});
constexpr auto kNoLight = std::to_array<std::string_view>({"bright yellow still, no bubbles, odd",
                                                           "timer was on OFF, no light all night!",
                                                           "nothing happened, of course"});
constexpr auto kLeak = std::to_array<std::string_view>(
    {"hiss at the septum when the needle came out", "soap bubble on the septum: leaks",
     "septum cored by the second needle"});
constexpr auto kPrecipitate = std::to_array<std::string_view>(
    {"black ppt within 40 min", "mirror on the glass, bar sluggish",
     "black sln, solid settles when stirring stops", "turned black, gas has stopped"});
constexpr auto kPalladium = std::to_array<std::string_view>(
    {"orange, fast bubbles", "darkens quickly, some Pd black on the bar", "grey film on the wall",
     "brown, Pd black, no more bubbles"});

}  // namespace

std::span<const std::string_view> demoObservations(DemoSight sight) {
  switch (sight) {
    case DemoSight::kCharged:
      return kCharged;
    case DemoSight::kFirst:
      return kFirst;
    case DemoSight::kEarly:
      return kEarly;
    case DemoSight::kEvening:
      return kEvening;
    case DemoSight::kDark:
      return kDark;
    case DemoSight::kNoLight:
      return kNoLight;
    case DemoSight::kLeak:
      return kLeak;
    case DemoSight::kPrecipitate:
      return kPrecipitate;
    case DemoSight::kPalladium:
      return kPalladium;
    default:
      return kEnd;
  }
}

std::string DemoHand::number(double value, int places) const {
  // No minus before a zero.
  const double least = 0.5 * std::pow(10.0, -places);
  std::string text = fmt::format("{:.{}f}", std::abs(value) < least ? 0.0 : value, places);
  if (m_person == "MR") std::ranges::replace(text, '.', ',');
  return text;
}

std::string DemoHand::lampOn() {
  if (m_person == "MR") return "Lamp ON";
  return m_random.once(0.2) ? "lamp on; fan at half speed" : "lamp on";
}

std::string DemoHand::lampOff() {
  return m_person == "MR" ? "Lamp OFF" : m_person == "TS" ? "lampoff" : "lamp off";
}

std::string DemoHand::purge() {
  if (m_person == "MR") return "purged with N2 for 10 min";
  return m_person == "TS"     ? "purge N2"
         : m_random.once(0.5) ? "purge N2 10 min"
                              : "purge N2; two needles, 5 min";
}

std::string DemoHand::pressure(double gauge_bar, double celsius) {
  if (m_person == "MR")
    return fmt::format("P {} bar, {} °C", number(gauge_bar, 2), number(celsius, 1));
  if (m_person == "KW")
    return fmt::format("p {} bar {} C", number(gauge_bar, 2), number(celsius, 0));
  if (m_random.once(0.3))
    return fmt::format("p {} bar abs {} C", number(gauge_bar + 1.013, 3), number(celsius, 0));
  return fmt::format("p {} mbar {}C", number(gauge_bar * 1e3, 0), number(celsius, 0));
}

std::string DemoHand::temperature(double celsius) {
  return m_person == "MR" ? fmt::format("T = {} °C", number(celsius, 1))
                          : fmt::format("T {} C", number(celsius, 0));
}

std::string DemoHand::aliquot(std::string_view label) {
  if (m_person == "MR") return fmt::format("sample 50 µL {}", label);
  return m_person == "TS" ? fmt::format("aliquot 50uL {}", label)
                          : fmt::format("aliquot 50 uL {}", label);
}

std::string DemoHand::gasSample() {
  return m_person == "TS" ? fmt::format("gas 250 uL GC run {}", 100 + m_random.below(300))
                          : "gas 250 uL";
}

std::string DemoHand::hydrogen(double fraction) {
  return m_person == "MR" ? fmt::format("H2 {}%", number(100.0 * fraction, 1))
                          : fmt::format("h2 {} %", number(100.0 * fraction, 1));
}

std::string DemoHand::vent() {
  if (m_person == "MR") return "Vented";
  return m_random.once(0.3) ? "vent; hissed" : "vent";
}

std::string DemoHand::observation(DemoSight sight) {
  const auto list = demoObservations(sight);
  const bool story = sight == DemoSight::kPalladium || sight == DemoSight::kPrecipitate ||
                     sight == DemoSight::kLeak;
  return std::string(story ? list[std::min(m_told++, list.size() - 1)] : m_random.pick(list));
}

std::string DemoHand::mass(double mass_mg) {
  return m_person == "TS" ? fmt::format("{}mg", number(mass_mg, 2))
                          : fmt::format("{} mg", number(mass_mg, 2));
}

std::string DemoHand::volume(double volume_uL) {
  if (volume_uL >= 1000.0) return fmt::format("{} mL", number(volume_uL * 1e-3, 2));
  return fmt::format("{} {}", number(volume_uL, 0), m_person == "MR" ? "µL" : "uL");
}

std::string DemoHand::percent(double value, double u) {
  const int places = m_person == "MR" ? 1 : 0;
  return fmt::format("{} ± {} %", number(value, places), number(u, places));
}

}  // namespace vialkeeper::app
