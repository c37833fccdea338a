// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_vial.h"

#include <algorithm>
#include <cmath>

namespace vialkeeper::app {
namespace {

constexpr double kAmbient_bar = 1.013;
constexpr double kWaterVapour21_bar = 0.0249;
constexpr double kGas_barMlPerMmolK = 0.0831446;  // R

}  // namespace

DemoVial::DemoVial(const DemoVialStart& start)
    : m_headspace_mL(start.headspace_mL),
      m_vapour21_bar(start.vapour21_bar),
      m_vapour35_bar(start.vapour35_bar) {
  m_inert_mmol = (kAmbient_bar - vapour_bar()) / barPerMmol();
}

double DemoVial::barPerMmol() const {
  return kGas_barMlPerMmolK * (m_celsius + 273.15) / m_headspace_mL;
}

double DemoVial::vapour_bar() const {
  return m_vapour21_bar * std::pow(m_vapour35_bar / m_vapour21_bar, (m_celsius - 21.0) / 14.0);
}

double DemoVial::absolute_bar() const {
  return (m_inert_mmol + m_hydrogen_mmol) * barPerMmol() + vapour_bar();
}

double DemoVial::gauge_bar() const { return absolute_bar() - kAmbient_bar; }

double DemoVial::hydrogenFraction() const {
  return m_hydrogen_mmol * barPerMmol() / absolute_bar();
}

void DemoVial::loseShare(double share) {
  const double kept = 1.0 - std::clamp(share, 0.0, 1.0);
  m_inert_mmol *= kept;
  m_hydrogen_mmol *= kept;
}

void DemoVial::pass(double hours, double evolved_mmol) {
  m_hydrogen_mmol += evolved_mmol;
  const double above = std::max(0.0, gauge_bar());
  loseShare(above / absolute_bar() * (1.0 - std::exp(-m_leak_perHour * hours)));
}

void DemoVial::takeGas(double volume_uL) { loseShare(volume_uL * 1e-3 / m_headspace_mL); }

void DemoVial::vent() {
  // The gas leaves with its vapour; the liquid makes up for that at once.
  const double dry_bar = absolute_bar() - vapour_bar();
  loseShare(1.0 - std::max(0.0, kAmbient_bar - vapour_bar()) / dry_bar);
}

double DemoVial::ventedVolume_mL() const {
  const double lost_mmol = std::max(0.0, gauge_bar()) / barPerMmol();
  return lost_mmol * kGas_barMlPerMmolK * 294.15 / (kAmbient_bar - kWaterVapour21_bar);
}

}  // namespace vialkeeper::app
