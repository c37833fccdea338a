// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "app/plan_charge.h"
#include "app/sheet_content.h"

/// Texts that the weighing sheet and the stock sheet have in common.
namespace vialkeeper::app {

/// A target as it is printed: the number no finer than the device reads.
struct TargetText {
  std::string number;
  std::string unit;
  std::string alternative;  ///< of a neat liquid the same in the other unit
  std::string tolerance;
};

/// Solids by mass, stocks, gases and solvents by volume, neat liquids by what their device
/// measures.
[[nodiscard]] TargetText targetText(const charge::ComponentPlan& plan,
                                    const charge::ComponentCharge& charge);

/// A mass with its tolerance, no finer than the balance's last digit.
[[nodiscard]] TargetText massTarget(units::Mass mass, double tolerancePercent,
                                    const charge::Balance* balance);

[[nodiscard]] std::string molarMassText(
    const charge::Substance& substance);                            ///< `119.17 g/mol`, or empty
[[nodiscard]] std::string speciesText(const std::string& species);  ///< `H₂`
[[nodiscard]] std::string atmosphereText(
    const charge::SealPlan& seal);  ///< `N₂`, `90 % N₂, 10 % O₂`
[[nodiscard]] std::string lightText(
    const charge::IrradiationPlan& irradiation);  ///< `440 nm, 35 °C, 20 h`

/// The run's code, or `plan 3f9a2c1b`.
[[nodiscard]] std::string sheetCode(const PlannedRun& run);
[[nodiscard]] std::string footerOf(const PlannedRun& run);

/// Statements with their wording; a code that the table lacks stands alone.
[[nodiscard]] HazardContent hazardOf(const charge::ComponentPlan& component);
[[nodiscard]] std::vector<HazardContent> hazardsOf(const PlannedRun& run);

/// The usual cautions that the plan calls for: pressure, hydrogen, light, and who decides.
[[nodiscard]] std::vector<std::string> cautionsOf(const charge::Plan& plan);

}  // namespace vialkeeper::app
