// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "units/quantity.h"

/// Quantities as people read them: a fitting unit, few digits, no exponent where none is needed.
namespace vialkeeper::units {

/// A number to so many significant digits, trailing zeros kept (`0.200`); with an exponent only
/// below 1e-4 and from 1e7.
[[nodiscard]] std::string toSignificant(double value, int digits);

[[nodiscard]] std::string shown(Mass mass, int digits = 3);  ///< mg; g from 10 g, µg below 0.1 mg
[[nodiscard]] std::string shown(Volume volume, int digits = 3);      ///< µL; mL from 10 mL
[[nodiscard]] std::string shown(Amount amount, int digits = 3);      ///< mmol; µmol below 1 µmol
[[nodiscard]] std::string shown(Concentration c, int digits = 3);    ///< mol/L; mM below 0.1 mol/L
[[nodiscard]] std::string shown(Temperature temperature);            ///< °C
[[nodiscard]] std::string shown(Pressure pressure, int digits = 3);  ///< bar
[[nodiscard]] std::string shown(Duration duration);                  ///< h and min, or min and s

}  // namespace vialkeeper::units
