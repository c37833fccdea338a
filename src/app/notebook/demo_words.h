// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <span>
#include <string>
#include <string_view>

#include "app/notebook/demo_random.h"

namespace vialkeeper::app {

/// What is seen of a vial, and when.
enum class DemoSight {
  kCharged,
  kFirst,
  kEarly,
  kEvening,
  kEnd,
  kDark,
  kNoLight,
  kLeak,
  kPrecipitate,
  kPalladium
};

/// Observations in the words of chemists, abbreviations and slips included; none reads as an event.
[[nodiscard]] std::span<const std::string_view> demoObservations(DemoSight sight);

/// How one of the three writes: each in a way of their own.
class DemoHand {
 public:
  DemoHand(std::string person, DemoRandom& random)
      : m_person(std::move(person)), m_random(random) {}

  [[nodiscard]] std::string lampOn();
  [[nodiscard]] std::string lampOff();
  [[nodiscard]] std::string purge();
  [[nodiscard]] std::string pressure(double gauge_bar, double celsius);
  [[nodiscard]] std::string temperature(double celsius);
  [[nodiscard]] std::string aliquot(std::string_view label);
  [[nodiscard]] std::string gasSample();
  [[nodiscard]] std::string hydrogen(double fraction);
  [[nodiscard]] std::string vent();
  /// One of them by chance; where they tell a story, the next of it.
  [[nodiscard]] std::string observation(DemoSight sight);
  /// A mass off the balance, a volume off the pipette.
  [[nodiscard]] std::string mass(double mass_mg);
  [[nodiscard]] std::string volume(double volume_uL);
  /// `71 ± 2 %`
  [[nodiscard]] std::string percent(double value, double u);

 private:
  [[nodiscard]] std::string number(double value, int places) const;

  std::string m_person;
  DemoRandom& m_random;
  std::size_t m_told = 0;
};

}  // namespace vialkeeper::app
