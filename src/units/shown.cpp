// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "units/shown.h"

#include <fmt/format.h>

#include <algorithm>
#include <charconv>
#include <cmath>

namespace vialkeeper::units {

std::string toSignificant(double value, int digits) {
  if (value == 0.0 || !std::isfinite(value)) return fmt::format("{}", value);
  // Rounding may carry into the next power of ten (9.996 to three digits is 10.0, not 10.00).
  const std::string scientific = fmt::format("{:.{}e}", value, digits - 1);
  double rounded = value;
  std::from_chars(scientific.data(), scientific.data() + scientific.size(), rounded);
  const int exponent = static_cast<int>(std::floor(std::log10(std::abs(rounded)) + 1e-12));
  if (exponent < -4 || exponent > 6) return scientific;
  return fmt::format("{:.{}f}", rounded, std::max(digits - 1 - exponent, 0));
}

std::string shown(Mass mass, int digits) {
  const double mg = mass.milligrams();
  if (std::abs(mg) >= 1e4) return toSignificant(mass.grams(), digits) + " g";
  if (mg != 0.0 && std::abs(mg) < 0.1) return toSignificant(mg * 1e3, digits) + " µg";
  return toSignificant(mg, digits) + " mg";
}

std::string shown(Volume volume, int digits) {
  const double uL = volume.microlitres();
  if (std::abs(uL) >= 1e4) return toSignificant(volume.millilitres(), digits) + " mL";
  return toSignificant(uL, digits) + " µL";
}

std::string shown(Amount amount, int digits) {
  const double mmol = amount.millimoles();
  if (mmol != 0.0 && std::abs(mmol) < 1e-3) return toSignificant(mmol * 1e3, digits) + " µmol";
  return toSignificant(mmol, digits) + " mmol";
}

std::string shown(Concentration c, int digits) {
  const double molPerL = c.molPerLitre();
  if (std::abs(molPerL) < 0.1) return toSignificant(molPerL * 1e3, digits) + " mM";
  return toSignificant(molPerL, digits) + " mol/L";
}

std::string shown(Temperature temperature) {
  const double degC = std::round(temperature.celsius() * 10.0) / 10.0;
  return fmt::format("{} °C", degC == 0.0 ? 0.0 : degC);
}

std::string shown(Pressure pressure, int digits) {
  return toSignificant(pressure.bar(), digits) + " bar";
}

std::string shown(Duration duration) {
  auto seconds = std::llround(duration.seconds());
  if (seconds >= 3600) seconds = 60 * std::llround(duration.seconds() / 60.0);
  const long long hours = seconds / 3600;
  const long long minutes = seconds % 3600 / 60;
  if (hours > 0)
    return minutes == 0 ? fmt::format("{} h", hours) : fmt::format("{} h {} min", hours, minutes);
  return seconds % 60 == 0 ? fmt::format("{} min", minutes)
                           : fmt::format("{} min {} s", minutes, seconds % 60);
}

}  // namespace vialkeeper::units
