// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <functional>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "charge/plan.h"
#include "chem/formula.h"
#include "chem/structure.h"
#include "text/fault.h"

namespace vialkeeper::charge {

/// A substance with what its descriptions agree on.
struct Substance {
  std::string formula = {};          ///< Hill; empty where only a molar mass was given
  std::string canonicalSmiles = {};  ///< empty where no structure was given
  std::optional<chem::MolarMassEstimate> molarMass = {};  ///< nothing where nothing was given
  std::string molarMassSource = {};                       ///< for people who ask where it is from
};

/// The substances of a plan, in the order of its components and products.
struct Substances {
  std::vector<Substance> components;
  std::vector<Substance> products;
};

/// Reads one SMILES; in the program the structure engine, in tests whatever they need.
using SmilesReader =
    std::function<std::expected<chem::Structure, chem::StructureFault>(std::string_view)>;

/// The reader over the structure module, which is loaded with the first SMILES and not before.
[[nodiscard]] SmilesReader structureModuleReader();

/// Resolves every substance of the plan: formula and structure to a molar mass, a solvent without a
/// description of its own from the solvent table. All faults are told together: an unreadable
/// formula or SMILES, descriptions that disagree (both are shown), an element without a weight.
[[nodiscard]] text::Checked<Substances> resolveSubstances(const Plan& plan,
                                                          const SmilesReader& readSmiles);

}  // namespace vialkeeper::charge
