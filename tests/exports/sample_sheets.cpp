// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "exports/sample_sheets.h"

#include <fmt/format.h>

namespace vialkeeper::exports::samples {
namespace {

using app::SheetRow;

constexpr const char* kIndoline = "C1Cc2ccccc2N1";
constexpr const char* kIndole = "c1ccc2[nH]ccc2c1";

std::vector<SheetRow> typicalRows() {
  return {
      {.name = "nickel(II) bromide glyme",
       .role = "catalyst",
       .cas = "28923-39-9",
       .molarMass = "308.6 g/mol",
       .supply = "solid, 98 %",
       .ratio = "5 mol%",
       .amount = "10.0 µmol",
       .target = "3.15",
       .unit = "mg",
       .alternative = "",
       .tolerance = "± 0.05 mg",
       .device = "balance-0.01mg",
       .notices =
           {"The least this balance weighs to 1 % is 8.2 mg: a stock of 20 mM, 500 µL into each "
            "vial, would do better."},
       .actual = ""},
      {.name = "indoline",
       .role = "substrate",
       .cas = "496-15-1",
       .molarMass = "119.17 g/mol",
       .supply = "liquid, 99 %",
       .ratio = "1 equiv",
       .amount = "0.200 mmol",
       .target = "24.1",
       .unit = "mg",
       .alternative = "= 22.6 µL",
       .tolerance = "± 0.5 mg",
       .device = "balance-0.01mg",
       .notices = {},
       .actual = "24.26 mg"},
      {.name = "pivalic acid",
       .role = "additive",
       .cas = "75-98-9",
       .molarMass = "102.13 g/mol",
       .supply = "stock 0.10 M in acetonitrile",
       .ratio = "10 mol%",
       .amount = "20.0 µmol",
       .target = "200",
       .unit = "µL",
       .alternative = "",
       .tolerance = "± 4 µL",
       .device = "pipette-200",
       .notices = {},
       .actual = ""},
      {.name = "4CzIPN",
       .role = "photocatalyst",
       .cas = "1416881-52-1",
       .molarMass = "788.9 g/mol",
       .supply = "stock 2.0 mM in acetonitrile",
       .ratio = "1 mol%",
       .amount = "2.00 µmol",
       .target = "1000",
       .unit = "µL",
       .alternative = "",
       .tolerance = "± 10 µL",
       .device = "pipette-1000",
       .notices = {"Keep it in the dark until the lamp goes on."},
       .actual = ""},
      {.name = "acetonitrile",
       .role = "solvent",
       .cas = "75-05-8",
       .molarMass = "",
       .supply = "dry, 99.9 %",
       .ratio = "9 parts",
       .amount = "",
       .target = "577",
       .unit = "µL",
       .alternative = "",
       .tolerance = "± 10 µL",
       .device = "pipette-1000",
       .notices = {},
       .actual = ""},
      {.name = "water",
       .role = "solvent",
       .cas = "7732-18-5",
       .molarMass = "",
       .supply = "degassed",
       .ratio = "1 part",
       .amount = "",
       .target = "200",
       .unit = "µL",
       .alternative = "",
       .tolerance = "± 4 µL",
       .device = "pipette-200",
       .notices = {},
       .actual = ""},
  };
}

/// A name of 200 characters without a place to break it.
std::string unbreakable() {
  std::string name = "α";
  while (name.size() < 200) name += "methylphenylazasilacyclo";
  return name.substr(0, 201);  // 200 characters: α takes two bytes
}

}  // namespace

app::SheetContent typicalSheet() {
  app::SheetContent sheet;
  sheet.title = "Indoline dehydrogenation, pivalic acid 10 mol%";
  sheet.code = "KW-0042";
  sheet.qrText = "KW-0042";
  sheet.series = "acid additives";
  sheet.date = "2026-03-04";
  sheet.chemist = "K. Weiss";
  sheet.scheme = {
      .reactants = {{kIndoline, "indoline"}},
      .products = {{kIndole, "indole"}},
      .gases = {"H₂"},
      .above = {"4CzIPN (1 mol%)", "nickel(II) bromide glyme (5 mol%)", "pivalic acid (10 mol%)"},
      .below = {"acetonitrile/water 9:1, 0.10 M", "440 nm, 35 °C, 20 h"}};
  sheet.rows = typicalRows();
  sheet.vial = {
      .fill = 0.172,
      .lines = {"crimp vial 11.6 mL", "2.00 mL liquid, 17 % of 11.6 mL", "9.52 mL headspace",
                "rated 2.0 bar gauge, used to 50 %", "closed under N₂ at 22 °C, 1.013 bar absolute",
                "lamp B-440, 440 nm, 35 °C, 20 h"},
      .forecast = {}};
  sheet.hazards = {
      {"indoline",
       {"H302 Harmful if swallowed", "H315 Causes skin irritation",
        "H319 Causes serious eye irritation"}},
      {"nickel(II) bromide glyme",
       {"H317 May cause an allergic skin reaction", "H341 Suspected of causing genetic defects",
        "H350i May cause cancer by inhalation"}},
      {"acetonitrile",
       {"H225 Highly flammable liquid and vapour",
        "H302 + H312 + H332 Harmful if swallowed, in contact with skin or if inhaled",
        "H319 Causes serious eye irritation"}}};
  sheet.cautions = {
      "A sealed vial that gives off gas builds up pressure: use a vial rated for it, a new "
      "septum and a shield.",
      "Hydrogen burns in air from 4 to 77 vol%: open the vial in a hood, away from ignition "
      "sources.",
      "Bright light harms the eyes: shield the lamp, wear goggles that block its colour.",
      "An estimate: the maker’s rating, local codes and your safety officer decide."};
  sheet.footer = "Vialkeeper 0.1.0 · indoline-acids.toml";
  return sheet;
}

app::SheetContent templateSheet() {
  app::SheetContent sheet = typicalSheet();
  sheet.code = "plan 32e6253f";
  sheet.codeIsMark = true;
  sheet.qrText = sheet.code;
  sheet.date.clear();
  sheet.chemist.clear();
  sheet.rows[0].notices = {
      "3.18 mg is below the least that balance-0.01mg may weigh to 0.1 %, 40.0 mg",
      "make 10 mL of a 20 mM stock in acetonitrile (63.6 mg of nickel(II) bromide glyme) and take "
      "500 µL with pipette-1000uL; try first that it dissolves"};
  sheet.rows[1].actual.clear();
  sheet.rows[3].notices.clear();
  sheet.rows[4].notices = {"1080 µL takes 2 equal strokes of pipette-1000uL"};
  sheet.notices = {
      "volumes of liquids are taken to add up; mixing may change the total by some per cent",
      "solids without a density are taken to displace nothing: nickel"};
  sheet.hazards = {{"nickel(II) bromide glyme",
                    {"H302 Harmful if swallowed", "H317 May cause an allergic skin reaction",
                     "H350i May cause cancer by inhalation"}},
                   {"indoline",
                    {"H315 Causes skin irritation", "H319 Causes serious eye irritation",
                     "H335 May cause respiratory irritation"}},
                   {"pivalic acid",
                    {"H302 Harmful if swallowed", "H312 Harmful in contact with skin",
                     "H315 Causes skin irritation", "H318 Causes serious eye damage"}},
                   {"acetonitrile",
                    {"H225 Highly flammable liquid and vapour", "H302 Harmful if swallowed",
                     "H312 Harmful in contact with skin", "H332 Harmful if inhaled",
                     "H319 Causes serious eye irritation"}}};
  return sheet;
}

app::SheetContent bareSheet() {
  app::SheetContent sheet;
  sheet.title = "Untitled run";
  sheet.code = "plan 3f9a2c1b";
  sheet.codeIsMark = true;
  sheet.qrText = "plan 3f9a2c1b";
  sheet.rows.resize(1);
  sheet.rows[0].name = "indoline";
  sheet.rows[0].target = "24.1";
  sheet.rows[0].unit = "mg";
  return sheet;
}

app::SheetContent hugeSheet() {
  app::SheetContent sheet = typicalSheet();
  sheet.title =
      "Survey of β-carbolines, Δ9-dihydroindolizines and their N-aryl relatives under blue "
      "light, λ = 440 nm, with every additive of the shelf and two internal standards";
  sheet.scheme.reactants.push_back(
      {"N#Cc1c(n2c3ccccc3c3ccccc32)c(C#N)c(n2c3ccccc3c3ccccc32)c(n2c3ccccc3c3"
       "ccccc32)c1n1c2ccccc2c2ccccc21",
       "1,2,3,5-tetrakis(carbazol-9-yl)-4,6-dicyanobenzene"});
  sheet.scheme.reactants.push_back({"", "a partner without a structure"});
  for (int i = 0; i < 25; ++i) {
    SheetRow row = typicalRows()[static_cast<std::size_t>(i) % 6];
    row.name = fmt::format("row{:02}", i);
    while (row.name.size() < 200) row.name += " N-(4-methoxyphenyl)-2,3-dihydroindole-carboxamide";
    row.name.resize(200);
    if (i == 3) row.name = fmt::format("row{:02}{}", i, unbreakable().substr(6));
    row.notices.clear();
    for (int n = 0; n < (i == 5 ? 12 : i % 3 == 0 ? 1 : 0); ++n) {
      row.notices.push_back(fmt::format(
          "note{:02}{:02} The target lies below what this balance weighs to one per cent; a stock "
          "of 20 mM, "
          "of which 500 µL go into each vial, would be weighed more exactly and serves 49 vials.",
          i, n));
    }
    sheet.rows.push_back(std::move(row));
  }
  sheet.rows.erase(sheet.rows.begin(), sheet.rows.begin() + 6);
  sheet.notices = {
      "The liquid fills more of the vial than the plan's limit of 40 %: less headspace, more "
      "pressure."};
  for (int i = 0; i < 12; ++i) {
    sheet.hazards.push_back(
        {fmt::format("hazard{:02} 2-methyl-2,3-dihydro-1H-indole", i),
         {"H225 Highly flammable liquid and vapour", "H302 Harmful if swallowed",
          "H315 Causes skin irritation", "H319 Causes serious eye irritation",
          "H335 May cause respiratory irritation"}});
  }
  return sheet;
}

app::StockSheetContent typicalStock() {
  app::StockSheetContent stock;
  stock.title = "Stock 2.0 mM 4CzIPN in acetonitrile";
  stock.forRun = "KW-0042 Indoline dehydrogenation, pivalic acid 10 mol%";
  stock.code = "KW-0042";
  stock.qrText = "KW-0042 stock photocatalyst";
  stock.name = "4CzIPN";
  stock.cas = "1416881-52-1";
  stock.molarMass = "788.9 g/mol";
  stock.assay = "98 %";
  stock.concentration = "2.0 mM";
  stock.solvent = "acetonitrile";
  stock.flask = "10 mL volumetric flask, class A";
  stock.target = "16.10";
  stock.unit = "mg";
  stock.tolerance = "± 0.16 mg";
  stock.transfer = "1000 µL into each vial";
  stock.serves = "enough for 9 vials";
  stock.formula = "c = m × 0.98 ÷ (788.9 g/mol × 10.00 mL) = m × 0.1242 mM/mg";
  stock.steps = {"Weigh the solid into the flask and write down what the balance shows.",
                 "Add about 8 mL of acetonitrile and swirl until all has dissolved; warm to 30 °C "
                 "if it has not "
                 "after five minutes, and let it cool to 20 °C again.",
                 "Fill to the mark, close, turn over ten times.",
                 "Stick the label on the flask; keep it in the dark under N₂."};
  stock.notices = {"4CzIPN bleaches in daylight: wrap the flask in foil."};
  stock.hazards = {{"4CzIPN", {"H413 May cause long lasting harmful effects to aquatic life"}},
                   {"acetonitrile",
                    {"H225 Highly flammable liquid and vapour",
                     "H302 + H312 + H332 Harmful if swallowed, in contact with skin or if inhaled",
                     "H319 Causes serious eye irritation"}}};
  stock.cautions = {"Acetonitrile: away from flames, in the hood.",
                    "The label's codes do not replace the safety data sheet."};
  stock.footer = "Vialkeeper 0.1.0 · indoline-acids.toml";
  return stock;
}

app::StockSheetContent hugeStock() {
  app::StockSheetContent stock = typicalStock();
  stock.name = unbreakable();
  stock.title = "Stock 2.0 mM " + unbreakable();
  stock.solvent =
      "acetonitrile, degassed with argon for half an hour, over molecular sieves of 3 Å, of the "
      "shelf "
      "in room 12";
  for (int i = 0; i < 30; ++i) {
    stock.steps.push_back(
        fmt::format("step{:02} Rinse the funnel with a little of the solvent, wait until the "
                    "level has settled, and add the rest drop by drop at 20 °C.",
                    i));
  }
  return stock;
}

app::LabelContent typicalLabel() {
  return {.code = "KW-0042",
          .title = "Indoline dehydrogenation, pivalic acid 10 mol%",
          .qrText = "KW-0042",
          .lines = {"indoline 1 equiv, 4CzIPN 1 mol%, nickel(II) bromide glyme 5 mol%",
                    "acetonitrile/water under N₂"},
          .conditions = "440 nm, 35 °C, 20 h",
          .hazards = "H225 H302 H312 H315 H317 H319 H350i",
          .caution = "gives off H₂: pressure",
          .person = "K. Weiss",
          .date = "2026-03-04"};
}

app::LabelContent hugeLabel() {
  app::LabelContent label = typicalLabel();
  label.code = "KW-0042-again-and-again-7";
  label.qrText = "urn:uuid:0190f3a2-7c1e-7b5d-9d3e-5f6a7b8c9d0e";
  label.title = unbreakable() + " with every additive of the shelf";
  for (int i = 0; i < 40; ++i) label.lines[0] += fmt::format(", additive number {} 5 mol%", i);
  label.hazards =
      "H225 H226 H301 H302 H304 H311 H312 H314 H315 H317 H318 H319 H332 H334 H335 H341 H350i "
      "H360D H372 H410";
  label.caution = "gives off H₂ and CO: pressure, poison, open it in the hood only";
  label.person = "Maria-Magdalena von Hohenstein-Württemberg";
  return label;
}

}  // namespace vialkeeper::exports::samples
