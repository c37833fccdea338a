// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/command_bench.h"

using namespace vialkeeper::tests;

namespace {

constexpr PlanFault kFaults[] = {
    {"a ring that is not closed", R"(formula = "C8H9N")", R"(smiles = "C1Cc2ccccc2N")",
     "21:component.amine.smiles", "'C1Cc2ccccc2N': ring 1 at position 2 is opened and never closed",
     "write the same number"},
    {"an atom with too many bonds", R"(formula = "C8H9N")", R"(smiles = "CC(C)(C)(C)C")",
     "21:component.amine.smiles",
     "'CC(C)(C)(C)C': the atom C at position 2 has more bonds than its element and charge allow",
     "check its bonds"},
    {"a structure and a formula that disagree, both shown", R"(formula = "C8H9N")",
     "formula = \"C8H9N\"\nsmiles = \"c1ccc2[nH]ccc2c1\"", "22:component.amine.smiles",
     "the structure is C8H7N but the formula says C8H9N", "correct the one that is wrong"},
};

}  // namespace

TEST_CASE("a structure that cannot be is refused with the place", "[cli][faults][structures]") {
  checkPlanFaults(kFaults);
}
