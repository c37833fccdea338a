// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace vialkeeper::app {
struct PlannedRun;
}

/// What the printed pages say, ready to be laid out: every text is final, every number rounded.
namespace vialkeeper::app {

/// One species of the reaction scheme: its structure, or where it has none its name alone.
struct SchemeMember {
  std::string smiles;  ///< empty: the label is all there is to draw
  std::string label;   ///< shown below the structure
};

struct SchemeContent {
  std::vector<SchemeMember> reactants;
  std::vector<SchemeMember> products;
  std::vector<std::string> gases;  ///< `H₂`, behind the products
  std::vector<std::string> above;  ///< catalysts and additives with their loadings, over the arrow
  std::vector<std::string> below;  ///< solvent, light, temperature, time, under the arrow

  [[nodiscard]] bool isEmpty() const {
    return reactants.empty() || (products.empty() && gases.empty());
  }
};

/// One line of the table, in the order of addition.
struct SheetRow {
  std::string name;
  std::string role;
  std::string cas;          ///< empty where not known
  std::string molarMass;    ///< `119.17 g/mol`; empty where not known
  std::string supply;       ///< `solid, 98 %`, `stock 2.0 mM in acetonitrile`
  std::string ratio;        ///< `1 equiv`, `5 mol%`, `9 parts`
  std::string amount;       ///< `0.200 mmol`; empty where not known
  std::string target;       ///< the number to aim at, `26.6`
  std::string unit;         ///< `mg`
  std::string alternative;  ///< of a neat liquid the same in the other unit, `= 25.8 µL`
  std::string tolerance;    ///< `± 0.5 mg`
  std::string device;       ///< `balance-0.01mg`; empty where none is named
  std::vector<std::string> notices;
  std::string actual;  ///< recorded value with unit, empty for the box to be filled in
};

/// The forecast of the gas side; the sheet has a place for it and leaves it blank without one.
struct ForecastContent {
  std::string headline;
  std::string verdict;
  std::vector<std::string> lines;
};

struct VialContent {
  double fill = 0.0;               ///< share of the vial below the liquid's surface, 0 to 1
  std::vector<std::string> lines;  ///< volumes, fill, atmosphere, lamp, temperature, time
  std::optional<ForecastContent> forecast;
};

/// The hazard statements of one substance.
struct HazardContent {
  std::string name;
  std::vector<std::string> statements;  ///< `H302 Harmful if swallowed`
};

struct SheetContent {
  std::string title;
  std::string code;  ///< the run's code, or the mark of the plan where it has none yet
  bool codeIsMark = false;
  std::string qrText;
  std::string series;
  std::string date;     ///< empty: a line to fill in
  std::string chemist;  ///< empty: a line to fill in
  SchemeContent scheme;
  std::vector<SheetRow> rows;
  std::vector<std::string> notices;  ///< of the whole charge
  VialContent vial;
  std::vector<HazardContent> hazards;
  std::vector<std::string> cautions;
  std::string footer;  ///< program, version, plan file
};

/// How to make one stock solution.
struct StockSheetContent {
  std::string title;   ///< `Stock 2.0 mM 4CzIPN in acetonitrile`
  std::string forRun;  ///< code and title of the run it is for
  std::string code;
  std::string qrText;
  std::string name;
  std::string cas;
  std::string molarMass;
  std::string assay;
  std::string concentration;
  std::string solvent;
  std::string flask;   ///< `10 mL volumetric flask, class A`
  std::string target;  ///< mass to weigh, `15.8`
  std::string unit;
  std::string tolerance;
  std::string transfer;  ///< `200 µL into each vial`
  std::string serves;    ///< `enough for 49 vials`
  std::string formula;   ///< how the actual concentration follows from the actual mass
  std::vector<std::string> steps;
  std::vector<std::string> notices;
  std::vector<HazardContent> hazards;
  std::vector<std::string> cautions;
  std::string footer;
};

/// The label of one vial: what must be known of it on a rack and behind glass.
struct LabelContent {
  std::string code;
  std::string title;
  std::string qrText;
  std::vector<std::string>
      lines;               ///< contents in a few words: substrate, catalysts, solvent, atmosphere
  std::string conditions;  ///< `440 nm, 35 °C, 20 h`
  std::string hazards;     ///< codes of all components, each once: `H225 H302 H315`
  std::string caution;     ///< one short line: `gives off H₂: pressure`
  std::string person;
  std::string date;
};

/// The weighing sheet of a planned run, with recorded values where there are some.
[[nodiscard]] SheetContent weighingSheet(const PlannedRun& run);

/// A sheet for every stock solution that the plan uses and for every one that was proposed.
[[nodiscard]] std::vector<StockSheetContent> stockSheets(const PlannedRun& run);

/// The label of the vial of a planned run.
[[nodiscard]] LabelContent vialLabel(const PlannedRun& run);

/// The components in the order of addition, as places in the plan: those that the plan lists first,
/// then solids, neat liquids, stocks, solvents, gases, each in the plan's order.
[[nodiscard]] std::vector<std::size_t> additionOrder(const PlannedRun& run);

/// What stands for a run that has no code yet: eight hexadecimal digits of its plan's text, so that
/// paper and file can be matched (FNV-1a, 64 bits, folded).
[[nodiscard]] std::string planMark(std::string_view planText);

}  // namespace vialkeeper::app
