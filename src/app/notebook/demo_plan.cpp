// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include "app/notebook/demo_chemistry.h"

namespace vialkeeper::app {
namespace {

std::string_view hazardsOf(std::string_view liquid) {
  if (liquid == "mecn") return R"("H225", "H302", "H312", "H332", "H319")";
  return liquid == "dmf" ? R"("H226", "H312", "H332", "H319", "H360D")" : R"("H225", "H319")";
}

class PlanWriter {
 public:
  PlanWriter(const DemoRecipe& recipe, bool withStructures)
      : m_recipe(recipe),
        m_substrate(demoSubstrate(recipe.substrate)),
        m_withStructures(withStructures) {}

  std::string run() {
    head();
    component("amine", "substrate", m_substrate.substance);
    m_text += fmt::format("amount = \"{:.3f} mmol\"\nsupply = {}\ndevice = \"balance-0.01mg\"\n",
                          m_recipe.substrate_mmol, m_substrate.supply);
    if (m_recipe.partner_mol_L > 0.0) partner();
    if (m_recipe.catalyst_molPercent > 0.0) catalyst();
    if (m_recipe.metal != DemoMetalKind::kNone) metal();
    if (m_recipe.acid != DemoAcidKind::kNone) acid();
    solvents();
    return std::move(m_text);
  }

 private:
  void head() {
    const bool lit = m_recipe.light_h > 0.0;
    m_text = fmt::format(
        R"(# Invented demonstration data; the substances' own data are public.
format = "vialkeeper-plan/1"
title  = "{}"
series = "{}"

[reaction]
limiting = "amine"
products = [ {{ key = "{}", name = "{}", {}, per_limiting = 1.0 }} ]
gases    = [ {{ species = "H2", per_limiting = {:.1f} }} ]

[vial]
name = "{}"
volume = "{}"
u_volume = "{}"
displaced = "0.15 mL"
rated_gauge = "2.0 bar"

[seal]
atmosphere = "N2"
temperature = "21 degC"
pressure = "1.013 bar"

[irradiation]
lamp = "{}"
{}temperature = "35 degC"
duration = "{:g} h"

[liquid]
total = "{:.1f} mL"
)",
        m_recipe.title, m_recipe.series, m_substrate.productKey, m_substrate.product.name,
        identity(m_substrate.product, ", "), m_substrate.hydrogens,
        m_recipe.largeVial ? "20 mL crimp vial" : "10 mL crimp vial",
        m_recipe.largeVial ? "21.5 mL" : "11.6 mL", m_recipe.largeVial ? "0.2 mL" : "0.1 mL",
        lit ? "LED 440" : "none, vial wrapped in foil", lit ? "wavelength = \"440 nm\"\n" : "",
        m_recipe.light_h, m_recipe.liquid_mL);
  }

  std::string identity(const DemoSubstance& substance, std::string_view between) const {
    const bool structure = m_withStructures && !substance.smiles.empty();
    std::string text = fmt::format("{} = \"{}\"", structure ? "smiles" : "formula",
                                   structure ? substance.smiles : substance.formula);
    if (!substance.cas.empty()) text += fmt::format("{}cas = \"{}\"", between, substance.cas);
    return text;
  }

  void component(std::string_view key, std::string_view role, const DemoSubstance& substance) {
    m_text += fmt::format("\n[[component]]\nkey = \"{}\"\nrole = \"{}\"\nname = \"{}\"\n{}\n", key,
                          role, substance.name, identity(substance, "\n"));
  }

  void partner() {
    component("indole", "partner", demoPartner());
    m_text += fmt::format(
        "concentration = \"{:.3f} mol/L\"\nsupply = {{ kind = \"solid\", assay = 0.99, u_assay = "
        "0.005 }}\n"
        "device = \"balance-0.01mg\"\nhazards = [\"H302\", \"H311\", \"H318\", \"H400\"]\n",
        m_recipe.partner_mol_L);
  }

  void catalyst() {
    component("pc", "photocatalyst", demoCatalyst());
    m_text +=
        fmt::format("mol_percent = {:g}\nsupply = {}\ndevice = \"pipette-1000uL\"\n",
                    m_recipe.catalyst_molPercent, demoSolvent(m_recipe.solvent).catalystStock);
  }

  void metal() {
    const DemoMetal& metal = demoMetal(m_recipe.metal);
    component(metal.key, "cocatalyst", metal.substance);
    m_text += fmt::format("mol_percent = {:g}\nsupply = {}\ndevice = \"{}\"\n",
                          m_recipe.metal_molPercent, metal.supply, metal.device);
  }

  void acid() {
    component("acid", "acid", demoAcid(m_recipe.acid).substance);
    m_text += fmt::format("mol_percent = {:g}\nsupply = {}\ndevice = \"pipette-1000uL\"\n",
                          m_recipe.acid_molPercent, demoSolvent(m_recipe.solvent).acidStock);
  }

  void solvents() {
    const DemoSolvent& solvent = demoSolvent(m_recipe.solvent);
    component(solvent.main, "solvent", demoLiquid(solvent.main));
    m_text += fmt::format("share = {:g}\ndevice = \"pipette-1000uL\"\nhazards = [{}]\n",
                          solvent.mainShare, hazardsOf(solvent.main));
    if (solvent.waterShare <= 0.0) return;
    component("water", "solvent", demoLiquid("water"));
    m_text += fmt::format("share = {:g}\ndevice = \"pipette-1000uL\"\n", solvent.waterShare);
  }

  const DemoRecipe& m_recipe;
  const DemoSubstrate& m_substrate;
  bool m_withStructures;
  std::string m_text;
};

}  // namespace

std::string demoPlanText(const DemoRecipe& recipe, bool withStructures) {
  return PlanWriter(recipe, withStructures).run();
}

}  // namespace vialkeeper::app
