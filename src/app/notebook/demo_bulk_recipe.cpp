// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_bulk_recipe.h"

#include <fmt/format.h>

#include <algorithm>

#include "app/notebook/demo_bulk.h"
#include "app/notebook/demo_chemistry.h"
#include "app/notebook/demo_series.h"
#include "app/notebook/fold_name.h"
#include "app/notebook/component_records.h"
#include "app/notebook/run_plan.h"
#include "app/plan_charge.h"

namespace vialkeeper::app {
namespace {

// Places of the components in a bulk plan.
enum Place : std::size_t {
  kAmine,
  kPhotocatalyst,
  kCocatalyst,
  kAcid,
  kAdditive,
  kStandard,
  kAcetonitrile,
  kWater
};

const BulkRecipe kReference;

/// Finds substances on the shelf and collects those that are missing.
class Stocking {
 public:
  explicit Stocking(const std::vector<std::pair<std::string, RowNumber>>& names) {
    for (const auto& [name, n] : names) m_known.emplace(foldName(name), n);
  }

  /// A public substance by its formula and CAS number.
  Checked<BulkSubstance> known(const DemoSubstance& substance) {
    SubstanceDraft draft{.name = std::string(substance.name),
                         .formula = std::string(substance.formula),
                         .cas = std::string(substance.cas)};
    auto record = describeSubstance(draft);
    if (!record) return std::unexpected(record.error());
    return place(*std::move(record),
                 fmt::format("formula = \"{}\"\ncas = \"{}\"", substance.formula, substance.cas));
  }

  BulkSubstance invented(const std::string& name, double molarMass_g_mol) {
    SubstanceRecord record{.name = name,
                           .molarMass_g_mol = molarMass_g_mol,
                           .uMolarMass_g_mol = 0.01,
                           .note = "invented"};
    return place(std::move(record), fmt::format("molar_mass = \"{:.2f} g/mol\"", molarMass_g_mol));
  }

  const std::vector<SubstanceRecord>& missing() const { return m_missing; }
  RowNumber& numberOf(const std::string& name) { return m_known[foldName(name)]; }

 private:
  BulkSubstance place(SubstanceRecord record, std::string identity) {
    BulkSubstance substance{record.name, std::move(identity),
                            record.molarMass_g_mol.value_or(100.0), 0};
    const auto [found, isNew] = m_known.emplace(foldName(record.name), 0);
    substance.n = found->second;
    if (isNew) m_missing.push_back(std::move(record));
    return substance;
  }

  std::map<std::string, RowNumber> m_known;
  std::vector<SubstanceRecord> m_missing;
};

constexpr DemoSubstance kTrimethoxybenzene{"1,3,5-trimethoxybenzene", "C9H12O3", "", "621-23-8",
                                           ""};

Checked<std::vector<BulkSubstance>> listOf(Stocking& stocking,
                                           std::vector<DemoSubstance> publicOnes,
                                           const std::vector<std::string>& names,
                                           double molarMass_g_mol) {
  std::vector<BulkSubstance> list;
  for (const std::string& name : names) {
    const auto found = std::ranges::find(publicOnes, name, &DemoSubstance::name);
    if (found == publicOnes.end()) {
      list.push_back(
          stocking.invented(name, molarMass_g_mol + 1.01 * static_cast<double>(list.size())));
      continue;
    }
    auto known = stocking.known(*found);
    if (!known) return std::unexpected(known.error());
    list.push_back(*std::move(known));
  }
  return list;
}

/// All lists filled, numbers still missing.
Checked<BulkShelf> collect(Stocking& stocking) {
  const DemoVocabulary& vocabulary = demoVocabulary();
  std::vector<DemoSubstance> metals;
  for (const auto kind :
       {DemoMetalKind::kNickelBromide, DemoMetalKind::kNickelChloride, DemoMetalKind::kPalladium}) {
    metals.push_back(demoMetal(kind).substance);
  }
  std::vector<DemoSubstance> acids;
  for (const auto kind : {DemoAcidKind::kPivalic, DemoAcidKind::kAcetic, DemoAcidKind::kBenzoic,
                          DemoAcidKind::kHexanoic, DemoAcidKind::kTrifluoroacetic}) {
    acids.push_back(demoAcid(kind).substance);
  }
  BulkShelf shelf;
  text::Faults faults;
  const auto take = [&faults](auto& into, auto&& from) {
    if (from) {
      into = *std::move(from);
    } else {
      faults.insert(faults.end(), from.error().begin(), from.error().end());
    }
  };
  take(shelf.photocatalysts, listOf(stocking, {demoCatalyst()}, vocabulary.photocatalysts, 412.35));
  take(shelf.cocatalysts, listOf(stocking, metals, vocabulary.cocatalysts, 265.18));
  take(shelf.acids, listOf(stocking, acids, vocabulary.acids, 88.11));
  take(shelf.additives, listOf(stocking, {}, vocabulary.additives, 131.22));
  for (const auto kind : {DemoSubstrateKind::kIndoline, DemoSubstrateKind::kMethyl,
                          DemoSubstrateKind::kBromo, DemoSubstrateKind::kMethoxy}) {
    take(shelf.substrates.emplace_back(), stocking.known(demoSubstrate(kind).substance));
  }
  take(shelf.standard, stocking.known(kTrimethoxybenzene));
  take(shelf.acetonitrile, stocking.known(demoLiquid("mecn")));
  take(shelf.water, stocking.known(demoLiquid("water")));
  if (!faults.empty()) return std::unexpected(std::move(faults));
  return shelf;
}

void scale(ComponentRecord& component, double factor) {
  for (std::optional<double>* number :
       {&component.planned_mmol, &component.planned_molPercent, &component.planned_mol_L,
        &component.target_mg, &component.target_uL}) {
    if (*number) **number *= factor;
  }
}

}  // namespace

Checked<BulkShelf> stockBulkShelf(Notebook& notebook, const Action& action) {
  const auto names = notebook.substanceNames();
  if (!names) return std::unexpected(names.error());
  Stocking stocking(*names);
  auto shelf = collect(stocking);
  if (!shelf) return shelf;
  const auto done = notebook.act(action, [&](Writing& writing) -> Checked<void> {
    for (const SubstanceRecord& record : stocking.missing()) {
      const auto n = writing.addSubstance(record);
      if (!n) return std::unexpected(n.error());
      stocking.numberOf(record.name) = *n;
    }
    return {};
  });
  if (!done) return std::unexpected(done.error());
  for (auto* list : {&shelf->substrates, &shelf->photocatalysts, &shelf->cocatalysts, &shelf->acids,
                     &shelf->additives}) {
    for (BulkSubstance& substance : *list) substance.n = stocking.numberOf(substance.name);
  }
  for (BulkSubstance* substance : {&shelf->standard, &shelf->acetonitrile, &shelf->water}) {
    substance->n = stocking.numberOf(substance->name);
  }
  return shelf;
}

std::string bulkPlanText(const BulkShelf& shelf, const BulkRecipe& recipe) {
  const auto component = [](std::string_view key, std::string_view role,
                            const BulkSubstance& substance, std::string_view rest) {
    return fmt::format("\n[[component]]\nkey = \"{}\"\nrole = \"{}\"\nname = \"{}\"\n{}\n{}\n", key,
                       role, substance.name, substance.identity, rest);
  };
  const auto stock = [](double molPercent, std::string_view concentration) {
    return fmt::format(
        "mol_percent = {:g}\nsupply = {{ kind = \"stock\", concentration = \"{}\", solvent = "
        "\"mecn\" }}",
        molPercent, concentration);
  };
  std::string text = fmt::format(
      "# {}\nformat = \"vialkeeper-plan/1\"\ntitle = \"{}\"\nseries = "
      "\"{}\"\n\n[reaction]\nlimiting = \"amine\"\n"
      "gases = [ {{ species = \"H2\", per_limiting = 1.0 }} ]\n\n[vial]\nname = \"10 mL crimp "
      "vial\"\nvolume = \"11.6 mL\"\n"
      "displaced = \"0.15 mL\"\nrated_gauge = \"2.0 bar\"\n\n[seal]\natmosphere = "
      "\"N2\"\ntemperature = \"21 degC\"\n"
      "pressure = \"1.013 bar\"\n\n[irradiation]\nlamp = \"LED 440\"\nwavelength = \"440 "
      "nm\"\ntemperature = \"35 degC\"\n"
      "duration = \"20 h\"\n\n[liquid]\ntotal = \"2.0 mL\"\n",
      kDemoMark, recipe.title, recipe.series);
  text += component("amine", "substrate", shelf.substrates[recipe.substrate],
                    "amount = \"0.200 mmol\"\nsupply = { kind = \"stock\", concentration = \"1.0 "
                    "mol/L\", solvent = \"mecn\" }");
  text += component("pc", "photocatalyst", shelf.photocatalysts[recipe.photocatalyst],
                    stock(recipe.photocatalyst_molPercent, "8.0 mM"));
  text += component("metal", "cocatalyst", shelf.cocatalysts[recipe.cocatalyst],
                    fmt::format("mol_percent = {:g}\nsupply = {{ kind = \"solid\" }}",
                                recipe.cocatalyst_molPercent));
  text += component("acid", "acid", shelf.acids[recipe.acid],
                    stock(recipe.acid_molPercent, "0.20 mol/L"));
  text += component("additive", "additive", shelf.additives[recipe.additive],
                    stock(recipe.additive_molPercent, "0.20 mol/L"));
  text += component("standard", "standard", shelf.standard, stock(25.0, "0.20 mol/L"));
  text += component("mecn", "solvent", shelf.acetonitrile, "share = 9");
  text += component("water", "solvent", shelf.water, "share = 1");
  return text;
}

Checked<BulkCharge> BulkCharge::of(const BulkShelf& shelf) {
  BulkCharge charge;
  for (std::size_t i = 0; i < shelf.substrates.size(); ++i) {
    BulkRecipe recipe = kReference;
    recipe.substrate = i;
    recipe.title = recipe.series = "reference";
    const auto planned = planCharge(bulkPlanText(shelf, recipe), "demo", {});
    if (!planned) return std::unexpected(planned.error());
    Variant variant;
    variant.run = {.vial = planned->plan.vial->name,
                   .lamp = planned->plan.irradiation.lamp,
                   .atmosphere = planned->plan.seal->atmosphereAsWritten,
                   .wavelength_nm = 440.0,
                   .temperature_C = 35.0,
                   .duration_h = 20.0,
                   .limitingKey = planned->plan.limiting,
                   .limiting_mmol = planned->charge.limitingAmount.millimoles(),
                   .liquid_mL = planned->charge.totalLiquid.millilitres()};
    for (std::size_t c = 0; c < planned->plan.components.size(); ++c) {
      variant.components.push_back(plannedRecord(
          planned->plan.components[c], planned->charge.components[c], static_cast<int>(c)));
    }
    charge.m_variants.push_back(std::move(variant));
  }
  return charge;
}

std::vector<ComponentRecord> BulkCharge::components(const BulkShelf& shelf,
                                                    const BulkRecipe& recipe) const {
  std::vector<ComponentRecord> components = m_variants[recipe.substrate].components;
  double moreStock_uL = 0.0;
  const auto vary = [&](Place place, const BulkSubstance& substance, double factor) {
    ComponentRecord& component = components[place];
    const double before_uL = component.target_uL.value_or(0.0);
    scale(component, factor);
    moreStock_uL += component.target_uL.value_or(0.0) - before_uL;
    component.name = substance.name;
    component.substance = substance.n;
  };
  vary(kAmine, shelf.substrates[recipe.substrate], 1.0);
  vary(kPhotocatalyst, shelf.photocatalysts[recipe.photocatalyst],
       recipe.photocatalyst_molPercent / kReference.photocatalyst_molPercent);
  vary(kCocatalyst, shelf.cocatalysts[recipe.cocatalyst],
       recipe.cocatalyst_molPercent / kReference.cocatalyst_molPercent);
  vary(kAcid, shelf.acids[recipe.acid], recipe.acid_molPercent / kReference.acid_molPercent);
  vary(kAdditive, shelf.additives[recipe.additive],
       recipe.additive_molPercent / kReference.additive_molPercent);
  vary(kStandard, shelf.standard, 1.0);
  vary(kWater, shelf.water, 1.0);
  *components[kCocatalyst].target_mg *= shelf.cocatalysts[recipe.cocatalyst].molarMass_g_mol /
                                        shelf.cocatalysts[kReference.cocatalyst].molarMass_g_mol;
  // What the stocks bring of acetonitrile is not added pure.
  const double pure_uL = *components[kAcetonitrile].target_uL;
  vary(kAcetonitrile, shelf.acetonitrile, 1.0 - moreStock_uL / pure_uL);
  return components;
}

}  // namespace vialkeeper::app
