// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <array>
#include <map>
#include <string>
#include <vector>

#include "app/notebook/demo_random.h"
#include "app/notebook/notebook.h"

namespace vialkeeper::app {

/// A substance that bulk runs use: on the shelf, and how a plan describes it.
struct BulkSubstance {
  std::string name;
  std::string identity;  ///< the plan's lines: `formula = "…"` or `molar_mass = "…"`
  double molarMass_g_mol = 0.0;
  RowNumber n = 0;
};

/// All of them, the most used of each kind first.
struct BulkShelf {
  std::vector<BulkSubstance> substrates;
  std::vector<BulkSubstance> photocatalysts;
  std::vector<BulkSubstance> cocatalysts;
  std::vector<BulkSubstance> acids;
  std::vector<BulkSubstance> additives;
  BulkSubstance standard;
  BulkSubstance acetonitrile;
  BulkSubstance water;
};

/// Puts on the shelf what is not there yet, in one action, and looks the rest up.
[[nodiscard]] Checked<BulkShelf> stockBulkShelf(Notebook& notebook, const Action& action);

/// What is varied from one bulk run to the next: places in the shelf's lists and loadings [mol%].
struct BulkRecipe {
  std::size_t substrate = 0;
  std::size_t photocatalyst = 0;
  std::size_t cocatalyst = 0;
  std::size_t acid = 0;
  std::size_t additive = 0;
  double photocatalyst_molPercent = 1.0;
  double cocatalyst_molPercent = 5.0;
  double acid_molPercent = 10.0;
  double additive_molPercent = 10.0;
  std::string title = {};
  std::string series = {};
};

[[nodiscard]] std::string bulkPlanText(const BulkShelf& shelf, const BulkRecipe& recipe);

/// The charge of bulk runs: worked out once for every substrate, then scaled.
class BulkCharge {
 public:
  /// Fault: the plan of a variant cannot be charged.
  [[nodiscard]] static Checked<BulkCharge> of(const BulkShelf& shelf);

  /// A run's record with what its plan says: vial, lamp, amounts.
  [[nodiscard]] const RunRecord& run(std::size_t substrate) const {
    return m_variants[substrate].run;
  }
  /// The 8 components as planned.
  [[nodiscard]] std::vector<ComponentRecord> components(const BulkShelf& shelf,
                                                        const BulkRecipe& recipe) const;

 private:
  struct Variant {
    RunRecord run;
    std::vector<ComponentRecord> components;
  };
  std::vector<Variant> m_variants;
};

}  // namespace vialkeeper::app
