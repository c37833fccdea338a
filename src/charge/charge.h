// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "charge/plan.h"
#include "charge/stock_proposal.h"
#include "charge/substances.h"
#include "chem/formula.h"
#include "stats/uncertain.h"
#include "text/fault.h"
#include "text/notice.h"
#include "units/quantity.h"

/// The charge: what goes into the vial. From a plan to what to weigh and pipette, and from what was
/// weighed and pipetted to what the vial really holds.
namespace vialkeeper::charge {

/// What a component really brought, from the recorded mass or volume.
struct AsCharged {
  std::optional<units::Mass> mass = {};  ///< what was recorded is set, the other is not
  std::optional<units::Volume> volume = {};
  std::optional<stats::Uncertain> amount_mol = {};  ///< nothing where the molar mass is not known
  std::optional<stats::Uncertain> equiv = {};
  std::optional<stats::Uncertain> molPercent = {};
  std::optional<stats::Uncertain> concentration_mol_m3 = {};
  std::optional<double> offTargetPercent =
      {};  ///< 100 (actual/target − 1); nothing for a target of zero
};

/// One component of the charge. Amounts carry the doubt that the device will give at the target.
struct ComponentCharge {
  std::string key;
  Role role = Role::kOther;
  std::string name;
  Substance substance;
  std::optional<stats::Uncertain> amount_mol = {};  ///< of a solvent: what is added pure
  std::optional<double> equiv = {};
  std::optional<double> molPercent = {};
  std::optional<units::Concentration> concentration = {};
  std::optional<units::Mass> targetMass = {};      ///< solids and neat liquids
  std::optional<units::Volume> targetVolume = {};  ///< neat liquids, stocks and gases
  double tolerancePercent = 0.0;
  std::optional<units::Volume> liquidVolume =
      {};                                      ///< room it takes in the liquid; nothing for gases
  std::optional<units::Density> density = {};  ///< that was used, the plan's or the table's
  std::string densitySource = {};
  std::optional<StockProposal> proposal = {};
  std::optional<AsCharged> charged = {};
  text::Notices notices = {};
};

struct Charge {
  std::string limiting;
  units::Amount limitingAmount;  ///< planned, or as weighed after a re-target
  units::Volume totalLiquid;
  std::optional<double> fill;  ///< share of the vial that the liquid takes; nothing without a vial
  bool retargeted = false;
  std::vector<ComponentCharge> components;
  text::Notices notices;  ///< of the whole charge

  [[nodiscard]] const ComponentCharge* find(std::string_view key) const;
};

/// Works out the charge of a plan.
///
/// Model (calculations.md 1): n = m w/M for neat material, n = c V for a stock, n = p V/(R T) for a
/// gas. The liquid's volumes add up (ideal mixing); solids take no room unless their density is
/// given. Shares divide the total less neat liquids, solvents of fixed volume, solids with a
/// density and stocks in a solvent without a share; what stocks bring of a solvent counts towards
/// its share. `limitingAmount`, where given, takes the place of the planned amount of the limiting
/// component for everything that follows it: the re-target. The limiting component's own target
/// stays. Faults: a molar mass or density that is needed and not known, stocks that bring more than
/// the share of their solvent, volumes above the total, a liquid that leaves no headspace.
[[nodiscard]] text::Checked<Charge> computeCharge(
    const Plan& plan, const Substances& substances,
    std::optional<units::Amount> limitingAmount = std::nullopt);

/// Amount of the limiting component as planned.
[[nodiscard]] text::Checked<units::Amount> plannedLimitingAmount(const Plan& plan,
                                                                 const Substances& substances);

}  // namespace vialkeeper::charge
