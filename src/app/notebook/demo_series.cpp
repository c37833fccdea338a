// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/demo_series.h"

#include <fmt/format.h>

#include <algorithm>

namespace vialkeeper::app {
namespace {

using Acid = DemoAcidKind;
using Metal = DemoMetalKind;
using Solvent = DemoSolventKind;
using Substrate = DemoSubstrateKind;

constexpr double kFirstSlot = 12.4;  // lamp on at about one, off when people come in
constexpr double kSlot = 0.6;

/// Collects the runs; what a series has in common is set once.
class Campaign {
 public:
  std::vector<DemoRunSpec> run() {
    acids();
    acidLoading();
    catalystLoading();
    nickelLoading();
    palladium();
    solvents();
    sameExcess();
    substrates();
    scaleUp();
    lastDays();
    std::ranges::stable_sort(m_runs, {},
                             [](const DemoRunSpec& run) { return run.day * 24.0 + run.hour; });
    return std::move(m_runs);
  }

 private:
  void begin(std::string person, std::string series, std::string aim) {
    m_person = std::move(person);
    m_base = DemoRecipe();
    m_base.series = std::move(series);
    m_aim = fmt::format("{} {}", kDemoMark, aim);
  }

  DemoRunSpec& add(int day, int slot, std::string title, DemoRecipe recipe,
                   std::string conclusion) {
    recipe.title = std::move(title);
    m_runs.push_back({.day = day,
                      .hour = kFirstSlot + kSlot * slot,
                      .person = m_person,
                      .recipe = std::move(recipe),
                      .aim = m_aim,
                      .conclusion = std::move(conclusion)});
    return m_runs.back();
  }

  DemoRecipe withAcid(Acid acid, double molPercent) const {
    DemoRecipe recipe = m_base;
    recipe.acid = acid;
    recipe.acid_molPercent = molPercent;
    return recipe;
  }

  DemoRecipe withLoadings(double catalyst, double metal) const {
    DemoRecipe recipe = m_base;
    recipe.catalyst_molPercent = catalyst;
    recipe.metal_molPercent = metal;
    return recipe;
  }

  void acids() {
    begin("KW", "acid additives",
          "Which carboxylic acid helps the nickel to give off hydrogen, and is it needed at all?");
    add(0, 0, "Indoline, no acid", withAcid(Acid::kNone, 0), "Slow without acid, but not nothing.");
    add(0, 1, "Indoline, pivalic acid 10 mol%", withAcid(Acid::kPivalic, 10),
        "Best so far, standard from now on.")
        .trace = true;
    add(1, 0, "Indoline, pivalic acid 10 mol%, again", withAcid(Acid::kPivalic, 10), "Repeats.")
        .course = true;
    add(2, 0, "Indoline, acetic acid 10 mol%", withAcid(Acid::kAcetic, 10),
        "Helps, less than PivOH.");
    add(2, 1, "Indoline, acetic acid 10 mol%, again", withAcid(Acid::kAcetic, 10), "Repeats.");
    add(3, 0, "Indoline, benzoic acid 10 mol%", withAcid(Acid::kBenzoic, 10),
        "Between none and AcOH; sln darker than the others.");
    add(3, 1, "Indoline, hexanoic acid 10 mol%", withAcid(Acid::kHexanoic, 10),
        "Close to PivOH, smells worse.");
    add(7, 0, "Indoline, TFA 10 mol%", withAcid(Acid::kTrifluoroacetic, 10),
        "Too strong an acid: protonates the amine, we think.");
    DemoRecipe dark = m_base;
    dark.light_h = 0.0;
    add(7, 1, "Indoline blank in the dark, pivalic acid 10 mol%", dark,
        "Nothing in the dark. Good.");
    m_person = "MR";
    add(8, 0, "Indoline blank without photocatalyst", withLoadings(0, 5),
        "No photocatalyst, no reaction.");
    DemoRecipe bare = m_base;
    bare.metal = Metal::kNone;
    add(8, 1, "Indoline blank without nickel", bare, "Little without nickel.");
  }

  void acidLoading() {
    begin("KW", "pivalic acid loading", "Where is the best loading of pivalic acid?");
    add(9, 0, "Indoline, pivalic acid 2 mol%", withAcid(Acid::kPivalic, 2), "Not enough.");
    add(9, 1, "Indoline, pivalic acid 5 mol%", withAcid(Acid::kPivalic, 5),
        "Nearly as good as 10.");
    add(10, 0, "Indoline, pivalic acid 5 mol%, again", withAcid(Acid::kPivalic, 5), "Repeats.");
    add(10, 1, "Indoline, pivalic acid 10 mol%, third", withAcid(Acid::kPivalic, 10),
        "Three agree; take the mean as the reference.")
        .course = true;
    add(14, 0, "Indoline, pivalic acid 15 mol%", withAcid(Acid::kPivalic, 15),
        "Past the best, if only just.");
    add(14, 1, "Indoline, pivalic acid 20 mol%", withAcid(Acid::kPivalic, 20),
        "Worse again: acid slows it above 10 mol%.");
    add(15, 0, "Indoline, pivalic acid 20 mol%, again", withAcid(Acid::kPivalic, 20),
        "Repeats, so the drop is real.");
    DemoRunSpec& leak =
        add(15, 1, "Indoline, pivalic acid 5 mol%, third", withAcid(Acid::kPivalic, 5),
            "FAILED for gas: septum leaks from the second needle on. NMR yield is fine, pressure "
            "is not to be used.");
    leak.fate = DemoFate::kLeak;
    leak.trace = true;
  }

  void catalystLoading() {
    begin("MR", "photocatalyst loading", "How little photocatalyst will do?");
    add(16, 0, "Indoline, 4CzIPN 0.5 mol%", withLoadings(0.5, 5), "Slower, and it fades overnight.")
        .course = true;
    add(16, 1, "Indoline, 4CzIPN 1 mol%", withLoadings(1, 5),
        "As KW's, so it does not hang on the hand.");
    add(17, 0, "Indoline, 4CzIPN 2 mol%", withLoadings(2, 5), "Little gain over 1 mol%.").course =
        true;
    add(17, 1, "Indoline, 4CzIPN 0.5 mol%, again", withLoadings(0.5, 5), "Repeats.");
    add(21, 0, "Indoline, 4CzIPN 2 mol%, again", withLoadings(2, 5),
        "FAILED: timer was set to off, lamp never came on. To be repeated.")
        .fate = DemoFate::kNoLamp;
    add(22, 0, "Indoline, 4CzIPN 2 mol%, third", withLoadings(2, 5),
        "This one had light. Saturates above 1 mol%.");
  }

  void nickelLoading() {
    begin("MR", "nickel loading", "Nickel from 1 to 10 mol% at 10 mol% of pivalic acid.");
    add(23, 0, "Indoline, NiBr2 glyme 1 mol%", withLoadings(1, 1), "Starved of nickel.");
    add(24, 0, "Indoline, NiBr2 glyme 2 mol%", withLoadings(1, 2), "Half way.");
    add(24, 1, "Indoline, NiBr2 glyme 10 mol%", withLoadings(1, 10),
        "A little better than 5; more black on the bar.")
        .course = true;
    // Over the night in which the clocks go forward.
    add(26, 0, "Indoline, NiBr2 glyme 10 mol%, again", withLoadings(1, 10),
        "Repeats. Weekend run, clocks went forward.");
    add(29, 0, "Indoline, NiBr2 glyme 1 mol%, again", withLoadings(1, 1), "Repeats.");
  }

  void palladium() {
    begin("TS", "palladium", "Is palladium faster than nickel, and does it live?");
    m_base.metal = Metal::kPalladium;
    m_base.solvent = Solvent::kDmf;
    add(30, 0, "Indoline, Pd(OAc)2 1 mol% in DMF", withLoadings(1, 1), "Fast start, then dies.")
        .trace = true;
    add(30, 1, "Indoline, Pd(OAc)2 2 mol% in DMF", withLoadings(1, 2),
        "Same shape: Pd black after some hours.")
        .course = true;
    add(31, 0, "Indoline, Pd(OAc)2 5 mol% in DMF", withLoadings(1, 5),
        "FAILED: black precipitate within the hour, mirror on the glass. No use at this loading.")
        .fate = DemoFate::kPrecipitate;
    add(35, 0, "Indoline, Pd(OAc)2 2 mol% in DMF, again", withLoadings(1, 2),
        "Repeats. Back to nickel.");
  }

  DemoRecipe inSolvent(Solvent solvent) const {
    DemoRecipe recipe = m_base;
    recipe.solvent = solvent;
    if (solvent == Solvent::kEthanolWater) recipe.metal = Metal::kNickelChloride;
    return recipe;
  }

  void solvents() {
    begin("TS", "solvents", "Does it want water, and which solvent with it?");
    add(36, 0, "Indoline in dry acetonitrile", inSolvent(Solvent::kMecn),
        "Water does help, compare 9:1.");
    add(36, 1, "Indoline in DMF", inSolvent(Solvent::kDmf), "Works, slower.");
    add(37, 0, "Indoline in ethanol", inSolvent(Solvent::kEthanol),
        "Poor; photocatalyst not all dissolved at first.");
    add(37, 1, "Indoline in ethanol and water 4:1", inSolvent(Solvent::kEthanolWater),
        "Greener, but two thirds of the yield.")
        .course = true;
    add(38, 0, "Indoline in DMF and water 9:1", inSolvent(Solvent::kDmfWater),
        "Water helps here, too.");
    add(42, 0, "Indoline in ethanol and water 4:1, again", inSolvent(Solvent::kEthanolWater),
        "Repeats.");
  }

  void sameExcess() {
    begin("KW", "same excess 0.050 mol/L",
          "Does the catalyst die, or does the product inhibit? Same excess, second run from 40 % "
          "extent.");
    m_base.substrate = Substrate::kCoupling;
    m_base.acid = Acid::kNone;
    m_base.solvent = Solvent::kMecn;
    m_base.largeVial = true;
    m_base.liquid_mL = 4.0;
    m_base.light_h = 12.0;
    m_base.metal_molPercent = 4.0;
    DemoRecipe standard = m_base;
    standard.substrate_mmol = 0.4;
    standard.partner_mol_L = 0.15;
    DemoRecipe second = m_base;
    second.substrate_mmol = 0.24;
    second.partner_mol_L = 0.11;
    // The same concentrations of both catalysts as in the standard run.
    second.catalyst_molPercent = 1.0 / 0.6;
    second.metal_molPercent = 4.0 / 0.6;
    const auto early = [this](int day, std::string title, const DemoRecipe& recipe,
                              std::string conclusion) {
      DemoRunSpec& run = add(day, 0, std::move(title), recipe, std::move(conclusion));
      run.hour = 6.7;
      run.course = true;
    };
    early(43, "Coupling with indole, standard run", standard, "Good data, 10 points.");
    early(44, "Coupling with indole, second run", second,
          "Runs ahead of the standard where they should overlay: the catalyst dies.");
    early(45, "Coupling with indole, standard run, again", standard, "Overlays the first.");
    early(49, "Coupling with indole, second run, again", second, "Same picture.");
  }

  DemoRecipe of(Substrate substrate) const {
    DemoRecipe recipe = m_base;
    recipe.substrate = substrate;
    recipe.largeVial = demoSubstrate(substrate).hydrogens > 1.0;
    return recipe;
  }

  void substrates() {
    begin("MR", "substrates", "How far do the standard conditions reach?");
    add(50, 0, "5-Methoxyindoline, standard conditions", of(Substrate::kMethoxy),
        "Electron-rich: fastest of the indolines.");
    add(50, 1, "5-Bromoindoline, standard conditions", of(Substrate::kBromo),
        "Slower; no debromination seen in the NMR.");
    add(51, 0, "2-Methylindoline, standard conditions", of(Substrate::kMethyl),
        "A methyl next to N costs a third of the rate.");
    m_person = "TS";
    add(52, 0, "Tetrahydroquinoline, standard conditions", of(Substrate::kQuinoline),
        "Two H2 each; half-way imine not seen.")
        .trace = true;
    add(52, 1, "6-Methoxytetrahydroquinoline, standard conditions",
        of(Substrate::kMethoxyQuinoline), "Better than the parent.");
    add(56, 0, "Tetrahydroquinoline, standard conditions, again", of(Substrate::kQuinoline),
        "Repeats.");
    add(57, 0, "2-Methyltetrahydroquinoline, standard conditions", of(Substrate::kMethylQuinoline),
        "Slow. 48 h next time.");
  }

  void scaleUp() {
    begin("KW", "scale-up",
          "Five times the indoline in the 20 mL vial: vent before the limit, collect the gas.");
    DemoRecipe large = m_base;
    large.substrate_mmol = 1.0;
    large.liquid_mL = 5.0;
    large.largeVial = true;
    large.catalyst_molPercent = 0.5;
    for (const int day : {63, 65}) {
      DemoRunSpec& run =
          add(day, 0, day == 63 ? "Indoline, 1 mmol" : "Indoline, 1 mmol, again", large,
              day == 63 ? "Scales. Vented twice, well below the limit."
                        : "Repeats; the rest of the gas went over the burette.");
      run.vents = true;
      run.trace = day == 65;
    }
  }

  void lastDays() {
    begin("MR", "pivalic acid loading", "The optimum again with the new lot of nickel.");
    add(77, 0, "Indoline, pivalic acid 8 mol%, new nickel", withAcid(Acid::kPivalic, 8),
        "New lot behaves.");
    add(84, 0, "Indoline, pivalic acid 12 mol%, new nickel", withAcid(Acid::kPivalic, 12), "")
        .state = RunState::kWorkedUp;
    begin("TS", "substrates", "Longer under the lamp, for the slow ones.");
    DemoRecipe slow = of(Substrate::kMethylQuinoline);
    slow.light_h = 44.0;
    add(84, 1, "2-Methyltetrahydroquinoline, 44 h", slow, "").state = RunState::kWorkedUp;
    slow.substrate = Substrate::kQuinoline;
    add(87, 1, "Tetrahydroquinoline, 44 h", slow, "").state = RunState::kIrradiating;
    begin("KW", "scale-up", "1 mmol with 10 mol% of hexanoic acid, which is liquid and cheap.");
    add(88, 0, "Indoline, hexanoic acid 10 mol%, before scale-up", withAcid(Acid::kHexanoic, 10),
        "")
        .state = RunState::kIrradiating;
    add(88, 2, "Indoline, hexanoic acid 5 mol%", withAcid(Acid::kHexanoic, 5), "").state =
        RunState::kCharged;
    add(88, 3, "Indoline, hexanoic acid 20 mol%", withAcid(Acid::kHexanoic, 20), "").state =
        RunState::kPlanned;
    add(88, 4, "Indoline, hexanoic acid 2 mol%", withAcid(Acid::kHexanoic, 2), "").state =
        RunState::kPlanned;
  }

  std::vector<DemoRunSpec> m_runs;
  std::string m_person;
  std::string m_aim;
  DemoRecipe m_base;
};

}  // namespace

std::vector<DemoRunSpec> demoCampaign() { return Campaign().run(); }

}  // namespace vialkeeper::app
