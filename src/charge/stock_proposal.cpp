// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/stock_proposal.h"

#include <cmath>
#include <utility>
#include <vector>

namespace vialkeeper::charge {
namespace {

/// The smallest pipette of which the volume is 20 % to 100 % of the nominal, or nullptr.
const Device* pipetteFor(units::Volume volume) {
  for (const Device& device : builtInDevices()) {
    const Pipette* pipette = device.pipette();
    if (pipette != nullptr && volume >= 0.2 * pipette->nominal && volume <= pipette->nominal)
      return &device;
  }
  return nullptr;
}

/// Less material first; equal masses differ by rounding alone, then the more dilute stock.
bool isBetter(const StockProposal& a, const StockProposal& b) {
  constexpr double kRounding = 1e-9;
  if (std::abs(a.stockMass / b.stockMass - 1.0) > kRounding) return a.stockMass < b.stockMass;
  return a.concentration < b.concentration;
}

/// Round concentrations from 0.1 mM to 1 mol/L: below, no flask holds a weighable mass; above,
/// little dissolves.
std::vector<units::Concentration> roundConcentrations() {
  std::vector<units::Concentration> list;
  for (const double decade_mM : {0.1, 1.0, 10.0, 100.0}) {
    for (const double step : {1.0, 2.0, 2.5, 5.0}) {
      list.push_back(units::Concentration::fromMolPerLitre(decade_mM * step / 1e3));
    }
  }
  list.push_back(units::Concentration::fromMolPerLitre(1.0));
  return list;
}

}  // namespace

std::optional<StockProposal> proposeStock(const StockRequest& request) {
  std::optional<StockProposal> best;
  for (const units::Concentration concentration : roundConcentrations()) {
    const units::Volume transfer = request.amount / concentration;
    const Device* pipette = transfer > request.room ? nullptr : pipetteFor(transfer);
    if (pipette == nullptr) continue;
    for (const Flask& flask : flasks()) {
      const units::Mass mass =
          (concentration * flask.nominal).moles() * request.suppliedMassPerMole;
      if (mass < request.minimumWeight || transfer > flask.nominal) continue;
      StockProposal candidate{.solventKey = {},
                              .concentration = concentration,
                              .flask = flask.nominal,
                              .stockMass = mass,
                              .transfer = transfer,
                              .pipette = pipette->name};
      if (!best || isBetter(candidate, *best)) best = std::move(candidate);
    }
  }
  return best;
}

}  // namespace vialkeeper::charge
