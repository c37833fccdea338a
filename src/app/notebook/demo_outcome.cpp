// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_outcome.h"

#include <algorithm>
#include <cmath>

namespace vialkeeper::app {
namespace {

constexpr double kReference_perHour =
    0.14;  // indoline, 1 mol%, 5 mol% nickel, 10 mol% pivalic acid
constexpr double kCoupling_perHour = 0.34;
constexpr double kBestAcid_molPercent = 10.0;

/// Michaelis–Menten-like, 1 at the reference loading.
double saturating(double loading, double half, double reference) {
  return loading / (loading + half) * (reference + half) / reference;
}

double acidFactor(const DemoRecipe& recipe) {
  if (recipe.acid == DemoAcidKind::kNone) return 0.25;
  const double relative = recipe.acid_molPercent / kBestAcid_molPercent;
  return 0.25 + 0.75 * demoAcid(recipe.acid).help * relative * std::exp(1.0 - relative);
}

double rateOf(const DemoRecipe& recipe) {
  const bool coupling = recipe.substrate == DemoSubstrateKind::kCoupling;
  double rate = coupling ? kCoupling_perHour : kReference_perHour * acidFactor(recipe);
  rate *= demoSubstrate(recipe.substrate).rate * demoSolvent(recipe.solvent).rate;
  rate *=
      recipe.catalyst_molPercent > 0.0 ? saturating(recipe.catalyst_molPercent, 0.6, 1.0) : 0.015;
  if (recipe.metal == DemoMetalKind::kNone) return rate * 0.1;
  const double reference = recipe.metal == DemoMetalKind::kPalladium ? 2.0 : 5.0;
  return rate * demoMetal(recipe.metal).rate *
         saturating(recipe.metal_molPercent, 0.5 * reference, reference);
}

}  // namespace

DemoOutcome::DemoOutcome(const DemoRecipe& recipe, DemoFate fate, DemoRandom& random) {
  double rate = rateOf(recipe) * (1.0 + 0.05 * random.normal());
  double death =
      recipe.metal == DemoMetalKind::kNone ? 0.06 : demoMetal(recipe.metal).death_perHour;
  death *= 1.0 + 0.1 * random.normal();
  if (fate == DemoFate::kPrecipitate) death = 0.8;
  if (fate == DemoFate::kNoLamp) rate = 0.0;
  integrate(recipe, rate, death);
  const double end = extentAt(recipe.light_h);
  m_selectivity = 0.955 + 0.01 * random.normal();
  m_hydrogen_mmol = 0.97 * demoSubstrate(recipe.substrate).hydrogens * recipe.substrate_mmol;
  m_conversion_percent = std::clamp(100.0 * end + 0.8 * random.normal(), 0.0, 100.0);
  m_yield_percent =
      std::clamp(100.0 * end * m_selectivity + 0.8 * random.normal(), 0.0, m_conversion_percent);
}

void DemoOutcome::integrate(const DemoRecipe& recipe, double rate_perHour, double death_perHour) {
  constexpr double kStep_h = 1.0 / 60.0;
  const auto steps = static_cast<std::size_t>(std::lround(recipe.light_h / kStep_h));
  const double start_mol_L = recipe.substrate_mmol / recipe.liquid_mL;
  double extent = 0.0;
  m_extents.push_back(extent);
  for (std::size_t i = 0; i < steps; ++i) {
    const double middle_h = (static_cast<double>(i) + 0.5) * kStep_h;
    double rate = rate_perHour * std::exp(-death_perHour * middle_h);
    if (recipe.partner_mol_L > 0.0) {
      const double partner_mol_L = recipe.partner_mol_L - start_mol_L * extent;
      rate *= partner_mol_L / (partner_mol_L + 0.05);
    }
    extent = 1.0 - (1.0 - extent) * std::exp(-rate * kStep_h);
    m_extents.push_back(extent);
  }
}

double DemoOutcome::extentAt(double light_h) const {
  const double at = std::clamp(light_h * 60.0, 0.0, static_cast<double>(m_extents.size() - 1));
  const auto below = std::min(static_cast<std::size_t>(at), m_extents.size() - 1);
  const auto above = std::min(below + 1, m_extents.size() - 1);
  return std::lerp(m_extents[below], m_extents[above], at - static_cast<double>(below));
}

}  // namespace vialkeeper::app
