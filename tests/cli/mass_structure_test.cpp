// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/command_bench.h"
#include "cli/json_fields.h"

using namespace vialkeeper::tests;

TEST_CASE("a structure has the mass of its formula", "[cli][json][mass][structures][identity]") {
  const std::pair<const char*, const char*> pairs[] = {{"C1Cc2ccccc2N1", "C8H9N"},
                                                       {"[2H]O[2H]", "D2O"},
                                                       {"CC(C)(C)C(=O)O", "C5H10O2"},
                                                       {"[NH4+].[Cl-]", "NH4Cl"}};
  for (const auto& [smiles, formula] : pairs) {
    INFO(smiles);
    const Ran bySmiles = run({"mass", "--smiles", smiles, "--json"});
    REQUIRE(bySmiles.status == 0);
    CHECK(bySmiles.out == run({"mass", formula, "--json"}).out);
    checkOneObject(bySmiles.out);
  }
}

TEST_CASE("a structure that cannot be is the fault of --smiles", "[cli][faults][structures]") {
  const ScratchFolder folder;
  checkOneFault(folder, {"mass", "--smiles", "C1CC"}, 2, "--smiles", "'C1CC': ring 1 at position 2",
                "write the same number");
  checkOneFault(folder, {"mass", "--smiles", "C(C)(C)(C)(C)C"}, 2, "--smiles", "has more bonds",
                "check its bonds");
  checkOneFault(folder, {"mass", "--smiles", "[Tc]"}, 2, "--smiles",
                "Tc has no standard atomic weight", "give the molar mass");
}
