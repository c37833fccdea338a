// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "units/quantity.h"

namespace vialkeeper::chem {

/// A solvent of the reference table.
struct Solvent {
  std::string name;
  std::vector<std::string> synonyms;
  std::string cas;
  std::string formula;
  std::string smiles;
  std::optional<units::Density> densityAt20C;
  std::optional<units::Density> densityAt25C;
  std::optional<double> viscosityAt25C_mPa_s;
  bool recalled = false;  ///< the numbers come from memory: what rests on them carries a notice
  std::string source;
};

[[nodiscard]] std::span<const Solvent> solvents();

/// The solvent of that name, synonym (letters' case ignored) or CAS number, or nullptr.
[[nodiscard]] const Solvent* findSolvent(std::string_view nameOrCas);

/// A density from the table, and whether the temperature lies where it may be used.
struct DensityAt {
  units::Density value;
  bool withinValidity = true;
};

/// Density of the liquid [g/mL] at a temperature: linear through the values at 20 and 25 °C, or the
/// one that is known. Valid from 15 to 30 °C; with one value, within 3 K of it. Nothing if the
/// table has none.
[[nodiscard]] std::optional<DensityAt> densityAt(const Solvent& solvent,
                                                 units::Temperature temperature);

/// Saturated vapour pressure from an Antoine equation of the table.
struct VapourPressure {
  units::Pressure value;
  std::string set;  ///< which of the solvent's sets
  std::string source;
  bool withinValidity = true;
  bool recalled = false;
};

/// Vapour pressure of the pure solvent: among the sets whose range holds the temperature the first
/// in preference; outside all ranges the set that ends nearest, marked as outside its validity.
/// Nothing where the table has no set for the solvent.
/// \f$ \log_{10}(p/\mathrm{bar}) = A - B/(T/\mathrm{K} + C) \f$
[[nodiscard]] std::optional<VapourPressure> vapourPressure(const Solvent& solvent,
                                                           units::Temperature temperature);

}  // namespace vialkeeper::chem
