// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

/// Constants of nature, all exact since the SI of 2019 (SI Brochure, 9th edition; CODATA 2018).
/// Not taken from GSL: the table of GSL 2.7 is older than the revision.
namespace vialkeeper::units {

inline constexpr double kAvogadro_1_mol = 6.02214076e23;
inline constexpr double kBoltzmann_J_K = 1.380649e-23;
inline constexpr double kMolarGas_J_mol_K = kAvogadro_1_mol * kBoltzmann_J_K;
inline constexpr double kPlanck_J_s = 6.62607015e-34;
inline constexpr double kLightSpeed_m_s = 299792458.0;
inline constexpr double kStandardAtmosphere_Pa = 101325.0;

}  // namespace vialkeeper::units
