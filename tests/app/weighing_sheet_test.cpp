// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "app/sheet_bench.h"
#include "support/scratch_folder.h"

using namespace vialkeeper;
using namespace vialkeeper::tests;

namespace {

app::SheetContent sheetOf(const std::string& plan) { return app::weighingSheet(planned(plan)); }

/// The row of the indoline on another balance.
app::SheetRow amineOn(const std::string& balance) {
  return rowOf(sheetOf(replaced(sheetPlan(), "device = \"balance-0.01mg\"\n", balance)),
               "indoline");
}

}  // namespace

// 0.400 mmol × 119.167 g/mol ÷ 0.98 = 48.640 mg, and 2 % of it 0.9728 mg
TEST_CASE("a target is rounded to the balance's last digit, its tolerance down to it",
          "[app][sheet][identity]") {
  const auto fine = amineOn("device = \"balance-0.01mg\"\n");
  CHECK(fine.target == "48.64");
  CHECK(fine.unit == "mg");
  CHECK(fine.tolerance == "± 0.97 mg");
  CHECK(fine.device == "balance-0.01mg");
  const auto middle = amineOn("device = \"balance-0.1mg\"\n");
  CHECK(middle.target == "48.6");
  CHECK(middle.tolerance == "± 0.9 mg");
  const auto coarse = amineOn("device = \"balance-1mg\"\n");
  CHECK(coarse.target == "49");
  CHECK(coarse.tolerance == "± 1 mg");  // 2 % would be finer than the balance reads
  const auto inlined = amineOn(
      "device = { kind = \"balance\", readability = \"2 mg\", repeatability = \"2 mg\" }\n");
  CHECK(inlined.target == "49");
  CHECK(inlined.device == "balance");
  const auto none = amineOn("");
  CHECK(none.target == "48.64");
  CHECK(none.tolerance == "± 0.97 mg");
  CHECK(none.device.empty());
}

TEST_CASE("a component's own tolerance is printed", "[app][sheet]") {
  const std::string plan = replaced(sheetPlan(), "amount = ", "tolerance_percent = 0.5\namount = ");
  CHECK(rowOf(sheetOf(plan), "indoline").tolerance == "± 0.24 mg");
}

TEST_CASE("stocks and solvents are measured by volume, neat liquids by what their device measures",
          "[app][sheet]") {
  const auto sheet = sheetOf(sheetPlan());
  const auto stock = rowOf(sheet, "nickel(II) chloride hexahydrate");
  CHECK(stock.target == "200.0");
  CHECK(stock.unit == "µL");
  CHECK(stock.tolerance == "± 4.0 µL");
  CHECK(stock.alternative.empty());
  CHECK(stock.supply == "stock 0.100 mol/L in water");
  CHECK(stock.ratio == "5.00 mol%");
  CHECK(stock.amount == "0.0200 mmol");
  CHECK(stock.cas == "7791-20-0");
  CHECK(stock.molarMass == "237.68 g/mol");

  // 0.2 mmol × 107.156 g/mol ÷ 0.99 = 21.648 mg, ÷ 0.920 g/mL = 23.53 µL
  const auto byPipette = rowOf(sheet, "2,6-lutidine");
  CHECK(byPipette.target == "23.5");
  CHECK(byPipette.unit == "µL");
  CHECK(byPipette.alternative == "= 21.6 mg");
  // 0.4 mmol × 170.34 g/mol = 68.14 mg, ÷ 0.749 g/mL = 90.97 µL
  const auto byBalance = rowOf(sheet, "dodecane");
  CHECK(byBalance.target == "68.1");
  CHECK(byBalance.unit == "mg");
  CHECK(byBalance.alternative == "= 91.0 µL");

  const auto solvent = rowOf(sheet, "acetonitrile");
  CHECK(solvent.unit == "µL");
  CHECK(solvent.alternative.empty());
  CHECK(solvent.amount.empty());
  CHECK(solvent.ratio == "4 parts");
  CHECK(rowOf(sheet, "water").ratio == "1 part");
}

TEST_CASE("the notices of a component stand in its row, those of the charge below",
          "[app][sheet]") {
  const auto sheet = sheetOf(sheetPlan());
  CHECK(anyHolds(rowOf(sheet, "dodecane").notices,
                 "below the least that balance-0.1mg may weigh to 0.1 %, 200 mg"));
  CHECK(anyHolds(rowOf(sheet, "2,6-lutidine").notices, "takes 2 equal strokes"));
  CHECK(rowOf(sheet, "indoline").notices.empty());
  CHECK(anyHolds(sheet.notices, "volumes of liquids are taken to add up"));
}

TEST_CASE("what was recorded stands in the box, else it is empty", "[app][sheet]") {
  const ScratchFolder folder;
  const app::ChargeRequest request{
      .weighedFile = folder.write("w.csv", "key,actual\namine,48.91 mg\nnickel,198 uL\n")};
  const auto sheet = app::weighingSheet(planned(sheetPlan(), request));
  CHECK(rowOf(sheet, "indoline").actual == "48.91 mg");
  CHECK(rowOf(sheet, "nickel(II) chloride hexahydrate").actual == "198.0 µL");
  CHECK(rowOf(sheet, "water").actual.empty());
}

TEST_CASE("the head names the run, the foot the plan file", "[app][sheet]") {
  const auto sheet = sheetOf(sheetPlan());
  CHECK(sheet.title == "Indoline dehydrogenation");
  CHECK(sheet.series == "bases");
  CHECK(sheet.date.empty());
  CHECK(sheet.chemist.empty());
  CHECK_THAT(sheet.footer, Catch::Matchers::StartsWith("Vialkeeper ") &&
                               Catch::Matchers::EndsWith(" · plan.toml"));
  const auto dated = sheetOf(replaced(
      sheetPlan(), "series = ", "date = \"2026-02-28\"\nchemist = \"bench 4\"\nseries = "));
  CHECK(dated.date == "2026-02-28");
  CHECK(dated.chemist == "bench 4");
  CHECK(sheetOf(replaced(sheetPlan(), "title = \"Indoline dehydrogenation\"\n", "")).title ==
        "Untitled run");
}

TEST_CASE("the scheme has reactants, products, gas, loadings and conditions", "[app][sheet]") {
  const auto scheme = sheetOf(sheetPlan()).scheme;
  CHECK(!scheme.isEmpty());
  REQUIRE(scheme.reactants.size() == 1);
  CHECK(scheme.reactants[0].label == "indoline");
  REQUIRE(scheme.products.size() == 1);
  CHECK(scheme.products[0].label == "indole");
  CHECK(scheme.gases == std::vector<std::string>{"H₂"});
  CHECK(scheme.above == std::vector<std::string>{"nickel(II) chloride hexahydrate (5.00 mol%)",
                                                 "2,6-lutidine (0.500 equiv)"});
  CHECK(scheme.below ==
        std::vector<std::string>{"acetonitrile/water 4:1, 0.200 mol/L", "440 nm, 35 °C, 20 h"});
}

TEST_CASE("the vial's box tells volumes, rating, gas and light", "[app][sheet]") {
  const auto vial = sheetOf(sheetPlan()).vial;
  CHECK(vial.fill == Approx(2.0 / 11.6));
  CHECK(vial.lines == std::vector<std::string>{
                          "10 mL crimp vial",
                          "2.00 mL liquid, 17 % of 11.6 mL",
                          "9.45 mL headspace",
                          "rated 2.00 bar gauge, used to 50 %",
                          "closed under N₂ at 21 °C, 1.013 bar absolute",
                          "LED 440, 440 nm, 35 °C, 20 h",
                      });
  CHECK(!vial.forecast);
  CHECK(anyHolds(
      sheetOf(replaced(sheetPlan(), "duration = \"20 h\"", "duration = \"0 h\"")).vial.lines,
      "no light"));
}

TEST_CASE("hazard statements stand in the order of addition with their wording", "[app][sheet]") {
  const auto hazards = sheetOf(sheetPlan()).hazards;
  REQUIRE(hazards.size() == 2);
  CHECK(hazards[0].name == "indoline");
  CHECK(hazards[0].statements == std::vector<std::string>{"H315 Causes skin irritation", "H999"});
  CHECK(hazards[1].name == "acetonitrile");
  CHECK(hazards[1].statements == std::vector<std::string>{"H225 Highly flammable liquid and vapour",
                                                          "H319 Causes serious eye irritation"});
}
