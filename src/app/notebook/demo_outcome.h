// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <vector>

#include "app/notebook/demo_chemistry.h"
#include "app/notebook/demo_random.h"

namespace vialkeeper::app {

/// What becomes of an invented vial.
enum class DemoFate { kSound, kLeak, kNoLamp, kPrecipitate };

/// How an invented run goes: its extent under the lamp and what is found at the end.
/// Model: dx/dt = k a(t) (1 − x), a = exp(−d t) for a catalyst that dies; k saturates with the
/// loadings of photocatalyst and cocatalyst and is largest at 10 mol% of acid; a coupling saturates
/// with its partner. The scatter between duplicates is 5 % of k. Nothing of this is measured.
class DemoOutcome {
 public:
  DemoOutcome(const DemoRecipe& recipe, DemoFate fate, DemoRandom& random);

  /// After so many hours of light; the last value stays.
  [[nodiscard]] double extentAt(double light_h) const;
  /// Hydrogen given off until then [mmol].
  [[nodiscard]] double hydrogenAt(double light_h) const {
    return m_hydrogen_mmol * extentAt(light_h);
  }

  [[nodiscard]] double conversion_percent() const { return m_conversion_percent; }
  [[nodiscard]] double yield_percent() const { return m_yield_percent; }
  /// Product for each substrate that is gone.
  [[nodiscard]] double selectivity() const { return m_selectivity; }

 private:
  void integrate(const DemoRecipe& recipe, double rate_perHour, double death_perHour);

  std::vector<double> m_extents;  ///< minute by minute
  double m_hydrogen_mmol = 0.0;   ///< at full extent
  double m_selectivity = 0.95;
  double m_conversion_percent = 0.0;
  double m_yield_percent = 0.0;
};

}  // namespace vialkeeper::app
