// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <vector>

#include "app/notebook/substance_cards.h"

/// What the invented campaign is made of. The substances and their data are public; what happens to
/// them is invented.
namespace vialkeeper::app {

struct DemoSubstance {
  std::string_view name;
  std::string_view formula;
  std::string_view smiles;  ///< empty for salts that are written by their formula
  std::string_view cas;
  std::string_view synonyms;  ///< separated by semicolons
};

/// A substrate, what becomes of it, and how fast beside indoline.
struct DemoSubstrate {
  DemoSubstance substance;
  DemoSubstance product;
  std::string_view productKey;
  std::string_view supply;  ///< as a plan writes it
  double hydrogens = 1.0;   ///< given off by each molecule
  double rate = 1.0;
};

/// A cocatalyst: its supply as a plan writes it, how active it is and how fast it dies [1/h].
struct DemoMetal {
  DemoSubstance substance;
  std::string_view key;
  std::string_view supply;
  std::string_view device;
  double rate = 1.0;
  double death_perHour = 0.06;
};

/// An acid: how much it helps at its best, beside pivalic acid.
struct DemoAcid {
  DemoSubstance substance;
  double help = 1.0;
};

/// A solvent or mixture: its lines in a plan, and where the stocks of catalyst and acid are made
/// up.
struct DemoSolvent {
  std::string_view name;  ///< as a title says it
  std::string_view main;  ///< key of the larger part
  double mainShare = 1.0;
  double waterShare = 0.0;
  std::string_view catalystStock;  ///< supply as a plan writes it
  std::string_view acidStock;
  double rate = 1.0;
  double vapour21_bar = 0.098;
  double vapour35_bar = 0.184;
};

enum class DemoSubstrateKind {
  kIndoline,
  kMethoxy,
  kBromo,
  kMethyl,
  kQuinoline,
  kMethoxyQuinoline,
  kMethylQuinoline,
  kCoupling
};
enum class DemoMetalKind { kNone, kNickelBromide, kNickelChloride, kPalladium };
enum class DemoAcidKind { kNone, kPivalic, kAcetic, kBenzoic, kHexanoic, kTrifluoroacetic };
enum class DemoSolventKind { kMecnWater, kMecn, kDmf, kDmfWater, kEthanol, kEthanolWater };

[[nodiscard]] const DemoSubstance& demoCatalyst();  ///< the photocatalyst of all runs
[[nodiscard]] const DemoSubstance& demoPartner();   ///< of a coupling
[[nodiscard]] const DemoSubstance& demoLiquid(
    std::string_view key);  ///< mecn, dmf, ethanol or water
[[nodiscard]] const DemoSubstrate& demoSubstrate(DemoSubstrateKind kind);
[[nodiscard]] const DemoMetal& demoMetal(DemoMetalKind kind);  ///< not of kNone
[[nodiscard]] const DemoAcid& demoAcid(DemoAcidKind kind);     ///< not of kNone
[[nodiscard]] const DemoSolvent& demoSolvent(DemoSolventKind kind);

/// One invented run's plan, before it is a text.
struct DemoRecipe {
  DemoSubstrateKind substrate = DemoSubstrateKind::kIndoline;
  DemoMetalKind metal = DemoMetalKind::kNickelBromide;
  DemoAcidKind acid = DemoAcidKind::kPivalic;
  DemoSolventKind solvent = DemoSolventKind::kMecnWater;
  double substrate_mmol = 0.2;
  double partner_mol_L = 0.0;        ///< of a coupling
  double catalyst_molPercent = 1.0;  ///< 0: none
  double metal_molPercent = 5.0;
  double acid_molPercent = 10.0;
  double liquid_mL = 2.0;
  bool largeVial = false;
  double light_h = 20.0;  ///< 0: in the dark
  std::string title = {};
  std::string series = {};
};

/// Whether the plan of one run becomes that of the other by setting amounts and headings alone.
[[nodiscard]] bool hasSameFrame(const DemoRecipe& a, const DemoRecipe& b);
/// Whether two runs were charged alike: duplicates.
[[nodiscard]] bool isDuplicate(const DemoRecipe& a, const DemoRecipe& b);

/// The plan as a person would write it. `withStructures`: SMILES, else formulas, for a program
/// without the structure module.
[[nodiscard]] std::string demoPlanText(const DemoRecipe& recipe, bool withStructures);

/// Cards for the shelf, with the synonyms by which people look for them.
[[nodiscard]] std::vector<SubstanceDraft> demoShelf(bool withStructures);

/// Volume of the gas over the liquid in the recipe's vial [mL].
[[nodiscard]] double demoHeadspace_mL(const DemoRecipe& recipe);

}  // namespace vialkeeper::app
