// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "app/sheet_bench.h"

using namespace vialkeeper;
using namespace vialkeeper::tests;

namespace {

constexpr const char* kStock =
    "supply = { kind = \"stock\", concentration = \"0.10 mol/L\", solvent = \"water\" }\n"
    "device = \"pipette-100uL\"\n";

}  // namespace

// 1 mL of 0.10 mol/L holds 0.1 mmol × 237.68 g/mol = 23.768 mg, less than the 40 mg that the finest
// balance weighs to 0.1 %; 2 mL hold 47.54 mg. A vial takes 200 µL, so 2 mL serve ten.
TEST_CASE("a stock of the plan has a sheet with flask, mass and transfer",
          "[app][stock][identity]") {
  const auto sheets =
      app::stockSheets(planned(replaced(sheetPlan(), "device = \"balance-0.1mg\"\n", "")));
  REQUIRE(sheets.size() == 1);
  const auto& sheet = sheets.front();
  CHECK(sheet.title == "Stock solution: nickel(II) chloride hexahydrate in water");
  CHECK(sheet.cas == "7791-20-0");
  CHECK(sheet.molarMass == "237.68 g/mol");
  CHECK(sheet.concentration == "0.100 mol/L");
  CHECK(sheet.solvent == "water");
  CHECK(sheet.flask == "2 mL volumetric flask, class A");
  CHECK(sheet.target == "47.54");
  CHECK(sheet.unit == "mg");
  CHECK(sheet.tolerance == "± 0.95 mg");
  CHECK(sheet.transfer == "200 µL into each vial");
  CHECK(sheet.serves == "enough for 10 vials");
  CHECK(sheet.formula == "c = m ÷ (237.68 g/mol × 2 mL)");
  CHECK(sheet.assay.empty());
  CHECK(sheet.steps.size() == 5);
  CHECK(anyHolds(sheet.steps, "Weigh 47.54 mg nickel(II) chloride hexahydrate (± 0.95 mg)"));
  CHECK(anyHolds(sheet.cautions, "Check the solubility"));
  CHECK(sheet.notices.empty());
  CHECK_THAT(sheet.forRun, Catch::Matchers::EndsWith(" Indoline dehydrogenation"));
  CHECK_THAT(sheet.qrText, Catch::Matchers::EndsWith(" nickel"));
}

TEST_CASE("a stock that is only proposed says so and counts the assay", "[app][stock]") {
  const std::string plan = replaced(sheetPlan(), kStock,
                                    "supply = { kind = \"solid\", assay = 0.97 }\n"
                                    "device = \"balance-0.01mg\"\n");
  const auto sheets = app::stockSheets(planned(replaced(plan, "device = \"balance-0.1mg\"\n", "")));
  REQUIRE(sheets.size() == 1);
  const auto& sheet = sheets.front();
  CHECK(anyHolds(sheet.notices, "proposed by Vialkeeper"));
  CHECK(sheet.assay == "assay 97 %");
  CHECK_THAT(sheet.formula, Catch::Matchers::StartsWith("c = m × 0.97 ÷ (237.68 g/mol × "));
  CHECK(sheet.solvent == "acetonitrile");
}

TEST_CASE("the stock of a component with hazards carries them", "[app][stock]") {
  const std::string plan =
      replaced(sheetPlan(), kStock, std::string(kStock) + "hazards = [\"H317\"]\n");
  const auto sheets = app::stockSheets(planned(plan));
  REQUIRE(!sheets.empty());
  REQUIRE(sheets.front().hazards.size() == 1);
  CHECK(anyHolds(sheets.front().hazards.front().statements,
                 "H317 May cause an allergic skin reaction"));
}

TEST_CASE("a plan that neither has nor needs a stock has no stock sheet", "[app][stock]") {
  const std::string plan = replaced(sheetPlan(), kStock, "supply = { kind = \"solid\" }\n");
  CHECK(app::stockSheets(planned(replaced(plan, "device = \"balance-0.1mg\"\n", ""))).empty());
}
