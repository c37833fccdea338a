// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

namespace vialkeeper::app {

/// What an invented vial starts from, sealed at 21 °C and ambient pressure over its liquid.
struct DemoVialStart {
  double headspace_mL = 9.45;
  double vapour21_bar = 0.098;  ///< of the liquid at 21 °C
  double vapour35_bar = 0.184;  ///< and at 35 °C
};

/// The gas over an invented reaction, so that the readings in its log agree with each other: ideal
/// gas in the headspace beside the vapour of the liquid; hydrogen in the liquid is left out.
class DemoVial {
 public:
  explicit DemoVial(const DemoVialStart& start);

  /// Time passes: hydrogen comes in, a leak lets gas out.
  void pass(double hours, double evolved_mmol);
  void setTemperature(double celsius) { m_celsius = celsius; }
  void takeGas(double volume_uL);
  void takeLiquid(double volume_uL) { m_headspace_mL += volume_uL * 1e-3; }
  void vent();
  /// From now on the gas above ambient is lost at this rate [1/h].
  void leak(double rate_perHour) { m_leak_perHour = rate_perHour; }

  [[nodiscard]] double absolute_bar() const;
  [[nodiscard]] double gauge_bar() const;
  [[nodiscard]] double celsius() const { return m_celsius; }
  /// Mole fraction of hydrogen in the headspace.
  [[nodiscard]] double hydrogenFraction() const;
  /// Volume over water at 21 °C and 1.013 bar of the gas that a vent would let out [mL].
  [[nodiscard]] double ventedVolume_mL() const;

 private:
  [[nodiscard]] double vapour_bar() const;
  [[nodiscard]] double barPerMmol() const;
  void loseShare(double share);

  double m_headspace_mL;
  double m_vapour21_bar;
  double m_vapour35_bar;
  double m_leak_perHour = 0.0;
  double m_celsius = 21.0;
  double m_inert_mmol = 0.0;
  double m_hydrogen_mmol = 0.0;
};

}  // namespace vialkeeper::app
