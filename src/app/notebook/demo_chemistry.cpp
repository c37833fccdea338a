// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_chemistry.h"

#include <algorithm>
#include <array>
#include <tuple>
#include <utility>

namespace vialkeeper::app {
namespace {

constexpr std::string_view kSolid = R"({ kind = "solid", assay = 0.98, u_assay = 0.005 })";

constexpr DemoSubstance kCatalyst{"4CzIPN", "C56H32N6",
                                  "N#Cc1c(n2c3ccccc3c3ccccc32)c(C#N)c(n2c3ccccc3c3ccccc32)c("
                                  "n2c3ccccc3c3ccccc32)c1n1c2ccccc2c2ccccc21",
                                  "1416881-52-1", "tetracarbazolyl isophthalonitrile"};

constexpr DemoSubstance kIndole{"indole", "C8H7N", "c1ccc2[nH]ccc2c1", "120-72-9", ""};

using Liquid = std::pair<std::string_view, DemoSubstance>;

constexpr auto kLiquids = std::to_array<Liquid>({
    {"mecn", {"acetonitrile", "C2H3N", "CC#N", "75-05-8", "MeCN"}},
    {"dmf", {"DMF", "C3H7NO", "CN(C)C=O", "68-12-2", "N,N-dimethylformamide"}},
    {"ethanol", {"ethanol", "C2H6O", "CCO", "64-17-5", "EtOH"}},
    {"water", {"water", "H2O", "O", "7732-18-5", "H2O"}},
});

// In the order of DemoSubstrateKind.
constexpr auto kSubstrates = std::to_array<DemoSubstrate>({
    {{"indoline", "C8H9N", "C1Cc2ccccc2N1", "496-15-1", "2,3-dihydroindole"},
     kIndole,
     "imine",
     R"({ kind = "liquid", density = "1.063 g/mL", u_density = "0.002 g/mL", assay = 0.99, u_assay = 0.005 })",
     1.0,
     1.0},
    {{"5-methoxyindoline", "C9H11NO", "COc1ccc2NCCc2c1", "21857-45-4", ""},
     {"5-methoxyindole", "C9H9NO", "COc1ccc2[nH]ccc2c1", "1006-94-6", ""},
     "imine",
     kSolid,
     1.0,
     1.3},
    {{"5-bromoindoline", "C8H8BrN", "Brc1ccc2NCCc2c1", "22190-33-6", ""},
     {"5-bromoindole", "C8H6BrN", "Brc1ccc2[nH]ccc2c1", "10075-50-0", ""},
     "imine",
     kSolid,
     1.0,
     0.72},
    {{"2-methylindoline", "C9H11N", "CC1Cc2ccccc2N1", "6872-06-6", ""},
     {"2-methylindole", "C9H9N", "Cc1cc2ccccc2[nH]1", "95-20-5", ""},
     "imine",
     R"({ kind = "liquid", density = "1.023 g/mL", u_density = "0.003 g/mL", assay = 0.98, u_assay = 0.005 })",
     1.0,
     0.62},
    {{"1,2,3,4-tetrahydroquinoline", "C9H11N", "C1CNc2ccccc2C1", "635-46-1", "THQ"},
     {"quinoline", "C9H7N", "c1ccc2ncccc2c1", "91-22-5", ""},
     "quinoline",
     R"({ kind = "liquid", density = "1.061 g/mL", u_density = "0.002 g/mL", assay = 0.98, u_assay = 0.005 })",
     2.0,
     0.66},
    {{"6-methoxy-1,2,3,4-tetrahydroquinoline", "C10H13NO", "COc1ccc2NCCCc2c1", "120-15-0",
      "6-MeO-THQ"},
     {"6-methoxyquinoline", "C10H9NO", "COc1ccc2ncccc2c1", "5263-87-6", ""},
     "quinoline",
     kSolid,
     2.0,
     0.9},
    {{"2-methyl-1,2,3,4-tetrahydroquinoline", "C10H13N", "CC1CCc2ccccc2N1", "1780-19-4",
      "tetrahydroquinaldine"},
     {"2-methylquinoline", "C10H9N", "Cc1ccc2ccccc2n1", "91-63-4", "quinaldine"},
     "quinoline",
     R"({ kind = "liquid", density = "1.02 g/mL", u_density = "0.01 g/mL", assay = 0.97, u_assay = 0.01 })",
     2.0,
     0.5},
    {{"2-phenyl-1,2,3,4-tetrahydroisoquinoline", "C15H15N", "C1CN(c2ccccc2)Cc2ccccc21", "3340-78-1",
      "N-phenyl THIQ"},
     {"1-(1H-indol-3-yl)-2-phenyl-1,2,3,4-tetrahydroisoquinoline", "C23H20N2",
      "C1CN(c2ccccc2)C(c2c[nH]c3ccccc23)c2ccccc21", "", ""},
     "coupled",
     kSolid,
     1.0,
     1.0},
});

// In the order of DemoMetalKind, kNone left out.
constexpr auto kMetals = std::to_array<DemoMetal>({
    {{"nickel(II) bromide glyme", "C4H10Br2NiO2", "", "28923-39-9", "NiBr2;NiBr2 glyme;NiBr2(dme)"},
     "nickel",
     R"({ kind = "solid", assay = 0.97, u_assay = 0.01 })",
     "balance-0.01mg",
     1.0,
     0.06},
    {{"nickel(II) chloride hexahydrate", "NiCl2·6H2O", "", "7791-20-0", "NiCl2 hexahydrate"},
     "nickel",
     R"({ kind = "stock", concentration = "0.10 mol/L", u_concentration = "0.001 mol/L", solvent = "water" })",
     "pipette-200uL",
     0.85,
     0.06},
    {{"palladium(II) acetate", "C4H6O4Pd", "", "3375-31-3", "Pd(OAc)2"},
     "palladium",
     R"({ kind = "stock", concentration = "10 mM", u_concentration = "0.1 mM", solvent = "dmf" })",
     "pipette-1000uL",
     1.25,
     0.13},
});

// In the order of DemoAcidKind, kNone left out.
constexpr auto kAcids = std::to_array<DemoAcid>({
    {{"pivalic acid", "C5H10O2", "CC(C)(C)C(=O)O", "75-98-9", "PivOH;trimethylacetic acid"}, 1.0},
    {{"acetic acid", "C2H4O2", "CC(=O)O", "64-19-7", "AcOH"}, 0.7},
    {{"benzoic acid", "C7H6O2", "O=C(O)c1ccccc1", "65-85-0", "BzOH"}, 0.55},
    {{"hexanoic acid", "C6H12O2", "CCCCCC(=O)O", "142-62-1", "caproic acid"}, 0.8},
    {{"trifluoroacetic acid", "C2HF3O2", "O=C(O)C(F)(F)F", "76-05-1", "TFA"}, 0.1},
});

constexpr std::string_view kInMecn =
    R"({ kind = "stock", concentration = "4.0 mM", u_concentration = "0.04 mM", solvent = "mecn" })";
constexpr std::string_view kInDmf =
    R"({ kind = "stock", concentration = "4.0 mM", u_concentration = "0.04 mM", solvent = "dmf" })";
constexpr std::string_view kStrongInDmf =
    R"({ kind = "stock", concentration = "10 mM", u_concentration = "0.1 mM", solvent = "DMF" })";
constexpr std::string_view kAcidInMecn =
    R"({ kind = "stock", concentration = "0.10 mol/L", u_concentration = "0.001 mol/L", solvent = "mecn" })";
constexpr std::string_view kAcidInDmf =
    R"({ kind = "stock", concentration = "0.10 mol/L", u_concentration = "0.001 mol/L", solvent = "dmf" })";
constexpr std::string_view kAcidInEthanol =
    R"({ kind = "stock", concentration = "0.10 mol/L", u_concentration = "0.001 mol/L", solvent = "ethanol" })";

// In the order of DemoSolventKind.
constexpr auto kSolvents = std::to_array<DemoSolvent>({
    {"acetonitrile and water 9:1", "mecn", 9, 1, kInMecn, kAcidInMecn, 1.0, 0.096, 0.181},
    {"acetonitrile", "mecn", 1, 0, kInMecn, kAcidInMecn, 0.7, 0.098, 0.184},
    {"DMF", "dmf", 1, 0, kInDmf, kAcidInDmf, 0.6, 0.004, 0.008},
    {"DMF and water 9:1", "dmf", 9, 1, kInDmf, kAcidInDmf, 0.78, 0.012, 0.026},
    {"ethanol", "ethanol", 1, 0, kStrongInDmf, kAcidInEthanol, 0.4, 0.062, 0.138},
    {"ethanol and water 4:1", "ethanol", 4, 1, kStrongInDmf, kAcidInEthanol, 0.58, 0.060, 0.132},
});

SubstanceDraft draftOf(const DemoSubstance& substance, bool withStructures) {
  SubstanceDraft draft{.name = std::string(substance.name), .cas = std::string(substance.cas)};
  const bool structure = withStructures && !substance.smiles.empty();
  (structure ? draft.smiles : draft.formula) = structure ? substance.smiles : substance.formula;
  for (std::string_view rest = substance.synonyms; !rest.empty();) {
    const std::size_t end = std::min(rest.find(';'), rest.size());
    draft.synonyms.emplace_back(rest.substr(0, end));
    rest.remove_prefix(std::min(end + 1, rest.size()));
  }
  return draft;
}

}  // namespace

const DemoSubstance& demoCatalyst() { return kCatalyst; }
const DemoSubstance& demoPartner() { return kIndole; }
const DemoSubstance& demoLiquid(std::string_view key) {
  return std::ranges::find(kLiquids, key, &Liquid::first)->second;
}
const DemoSubstrate& demoSubstrate(DemoSubstrateKind kind) {
  return kSubstrates.at(static_cast<std::size_t>(kind));
}
const DemoMetal& demoMetal(DemoMetalKind kind) {
  return kMetals.at(static_cast<std::size_t>(kind) - 1);
}
const DemoAcid& demoAcid(DemoAcidKind kind) {
  return kAcids.at(static_cast<std::size_t>(kind) - 1);
}
const DemoSolvent& demoSolvent(DemoSolventKind kind) {
  return kSolvents.at(static_cast<std::size_t>(kind));
}

bool hasSameFrame(const DemoRecipe& a, const DemoRecipe& b) {
  const auto frame = [](const DemoRecipe& recipe) {
    return std::tuple(recipe.substrate, recipe.metal, recipe.acid, recipe.solvent,
                      recipe.partner_mol_L, recipe.catalyst_molPercent > 0.0, recipe.liquid_mL,
                      recipe.largeVial, recipe.light_h > 0.0);
  };
  return frame(a) == frame(b);
}

bool isDuplicate(const DemoRecipe& a, const DemoRecipe& b) {
  const auto amounts = [](const DemoRecipe& recipe) {
    return std::tuple(recipe.substrate_mmol, recipe.catalyst_molPercent, recipe.metal_molPercent,
                      recipe.acid_molPercent, recipe.light_h);
  };
  return hasSameFrame(a, b) && amounts(a) == amounts(b);
}

std::vector<SubstanceDraft> demoShelf(bool withStructures) {
  std::vector<SubstanceDraft> drafts{draftOf(kCatalyst, withStructures),
                                     draftOf(kIndole, withStructures)};
  for (const auto& [key, liquid] : kLiquids) drafts.push_back(draftOf(liquid, withStructures));
  for (const DemoSubstrate& substrate : kSubstrates)
    drafts.push_back(draftOf(substrate.substance, withStructures));
  for (const DemoMetal& metal : kMetals) drafts.push_back(draftOf(metal.substance, withStructures));
  for (const DemoAcid& acid : kAcids) drafts.push_back(draftOf(acid.substance, withStructures));
  return drafts;
}

double demoHeadspace_mL(const DemoRecipe& recipe) {
  constexpr double kStirBar_mL = 0.15;
  return (recipe.largeVial ? 21.5 : 11.6) - kStirBar_mL - recipe.liquid_mL;
}

}  // namespace vialkeeper::app
