// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "charge/amount_cell.h"

#include <catch2/catch.hpp>
#include <random>

#include "charge/plan_edit.h"
#include "charge/plan_fixture.h"

namespace vialkeeper {
namespace {

using charge::Basis;
using charge::Role;

std::string read(std::string_view typed, Role role = Role::kAdditive,
                 Basis present = Basis::kAmount) {
  const auto cell = charge::readAmountCell(typed, role, present);
  if (!cell) return "fault at " + std::to_string(cell.error().offset) + ": " + cell.error().what;
  return cell->field + " = " + cell->value + " (" + cell->shown + ")";
}

TEST_CASE("an amount takes its basis from its unit", "[charge][amount-cell][regression]") {
  CHECK(read("5 mol%") == "mol_percent = 5 (5 mol%)");
  CHECK(read("  5mol %") == "mol_percent = 5 (5 mol%)");
  CHECK(read("1.20 equiv") == "equiv = 1.20 (1.20 equiv)");
  CHECK(read("1,2 eq") == "equiv = 1.2 (1.2 equiv)");
  CHECK(read("26.6 mg") == "mass = 26.6 mg (26.6 mg)");
  CHECK(read("50 µL") == "volume = 50 uL (50 µL)");
  CHECK(read("50 ul") == "volume = 50 uL (50 µL)");
  CHECK(read("0.200 mmol") == "amount = 0.200 mmol (0.200 mmol)");
  CHECK(read("0.1 M") == "concentration = 0.1 M (0.1 M)");
  CHECK(read("9 parts", Role::kSolvent) == "share = 9 (9 parts)");
  CHECK(read("1 part", Role::kSolvent) == "share = 1 (1 part)");
  CHECK(read("0,200 mmol") == "amount = 0.200 mmol (0.200 mmol)");
  CHECK(read("1,25 mg") == "mass = 1.25 mg (1.25 mg)");
  CHECK(read(".5 equiv") == "equiv = 0.5 (0.5 equiv)");
  CHECK(read("05 mol%") == "mol_percent = 5 (5 mol%)");
}

TEST_CASE("a bare number keeps the basis of a cell that has no unit either",
          "[charge][amount-cell][regression]") {
  CHECK(read("7.5", Role::kAcid, Basis::kMolPercent) == "mol_percent = 7.5 (7.5 mol%)");
  CHECK(read("2", Role::kAcid, Basis::kEquiv) == "equiv = 2 (2 equiv)");
  CHECK(read("3", Role::kSolvent, Basis::kShare) == "share = 3 (3 parts)");
  CHECK(read("26.6", Role::kAcid, Basis::kMass) == "fault at 4: the unit is missing");
  CHECK(read("3", Role::kAcid, Basis::kShare) == "fault at 1: the unit is missing");
}

TEST_CASE("what is no amount is refused at its place", "[charge][amount-cell][regression]") {
  CHECK(read("") == "fault at 0: no amount here");
  CHECK(read("much").starts_with("fault at 0: no number"));
  CHECK(read("-5 mol%") == "fault at 0: a negative value");
  CHECK(read("-5", Role::kAcid, Basis::kEquiv) == "fault at 0: a negative amount");
  CHECK(read("0", Role::kAcid, Basis::kEquiv) == "fault at 0: an amount of zero");
  CHECK(read(" 0 mg").starts_with("fault at 1: zero"));
  CHECK(read("5 bar").starts_with("fault at 2: bar is a pressure"));
  CHECK(read("5 mgg").starts_with("fault at 2: unit 'mgg' is not known"));
  CHECK(read("5 %").starts_with("fault at 2: %"));
  CHECK(read("9 parts") == "fault at 0: parts are for solvents only");
  CHECK(read("1,000 mg") == "fault at 0: the comma may be a decimal or a thousands sign");
  CHECK(read("5 mg and more").starts_with("fault at 2"));
  CHECK(read("5 \xFF").starts_with("fault at 2"));
}

TEST_CASE("a cell reads back what it shows", "[charge][amount-cell][identity]") {
  for (const auto typed : {"5 mol%", "1.20 equiv", "26.6 mg", "50 µL", "0.200 mmol", "0.1 M"}) {
    const auto cell = charge::readAmountCell(typed, Role::kAcid, Basis::kAmount);
    REQUIRE(cell);
    CHECK(cell->shown == typed);
    CHECK(charge::readAmountCell(cell->shown, Role::kAcid, Basis::kAmount)->value == cell->value);
  }
}

TEST_CASE("the cells of a plan can be typed in again and mean the same plan",
          "[charge][amount-cell][identity]") {
  const std::string text = tests::samplePlanText();
  const charge::Plan plan = tests::readGoodPlan(text);
  for (const charge::ComponentPlan& component : plan.components) {
    const std::string shown = charge::amountCellText(component);
    INFO(component.key << ": " << shown);
    const auto cell = charge::readAmountCell(shown, component.role, component.amount.basis);
    REQUIRE(cell);
    CHECK(cell->basis == component.amount.basis);
    const auto edited =
        charge::withField(text, "component." + component.key + "." + cell->field, cell->value);
    REQUIRE(edited);
    const auto again = tests::readGoodPlan(*edited);
    CHECK(again.find(component.key)->amount.value == component.amount.value);
  }
}

TEST_CASE("no text makes the reader of cells fail otherwise than by a fault in its range",
          "[charge][amount-cell][identity]") {
  std::mt19937_64 random(11);
  const std::string letters = "0123456789.,eE+- µmolg%LuMparteqiv\xC2\xB5\t";
  for (int round = 0; round < 20000; ++round) {
    std::string text;
    for (std::size_t length = random() % 10; length > 0; --length)
      text += letters[random() % letters.size()];
    const auto cell = charge::readAmountCell(text, Role::kSolvent, Basis::kShare);
    INFO(text);
    if (cell) {
      REQUIRE_FALSE(cell->value.empty());
    } else {
      REQUIRE(cell.error().offset + cell.error().length <= text.size());
    }
  }
}

}  // namespace
}  // namespace vialkeeper
