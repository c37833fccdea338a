// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>

#include "charge/devices.h"
#include "units/quantity.h"

namespace vialkeeper::charge {

/// A stock solution that would replace a weighing below the balance's minimum weight.
struct StockProposal {
  std::string solventKey;  ///< the solvent component whose share it would come out of
  units::Concentration concentration;
  units::Volume flask;
  units::Mass stockMass;   ///< to weigh into the flask
  units::Volume transfer;  ///< of the stock, into the vial
  std::string pipette;
};

/// What a proposal must serve.
struct StockRequest {
  units::Amount amount;             ///< wanted in the vial
  units::Mass suppliedMassPerMole;  ///< M/w for one mole: what is weighed for 1 mol
  units::Mass minimumWeight;        ///< of the balance the stock is weighed on
  units::Volume room;               ///< most that the transfer may take of its solvent
};

/// The stock that costs the least material, and among those the most dilute: a round concentration
/// in a standard flask, weighed above the minimum weight, of which the transfer lies between 20 %
/// and 100 % of a pipette's nominal volume and within the room. Nothing where none satisfies all.
[[nodiscard]] std::optional<StockProposal> proposeStock(const StockRequest& request);

}  // namespace vialkeeper::charge
