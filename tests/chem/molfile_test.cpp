// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>
#include <random>

#include "chem/structure.h"
#include "support/molfiles.h"

namespace vialkeeper {
namespace {

chem::StructureEngine& engine() {
  const auto opened = chem::structureEngine();
  REQUIRE(opened);
  return **opened;
}

std::string canonical(std::string_view smiles) { return engine().read(smiles)->canonicalSmiles; }

std::string readMolfile(const std::string& molfile) {
  const auto smiles = engine().readMolfile(molfile);
  return smiles ? *smiles : "fault: " + smiles.error().what;
}

TEST_CASE("a molfile of either version is the structure that its SMILES is",
          "[chem][structure][independent]") {
  // Drawn by hand after the CTfile formats (BIOVIA, 2020).
  CHECK(readMolfile(tests::ethanolMolfile()) == canonical("CCO"));
  CHECK(readMolfile(tests::acetonitrileMolfile()) == canonical("CC#N"));
}

TEST_CASE("a wedge is read as the centre that it means", "[chem][structure][independent]") {
  // Hydroxyl up and towards the reader, carboxyl right, methyl left: R by the rules of Cahn, Ingold
  // and Prelog; (R)-lactic acid is C[C@@H](O)C(=O)O.
  CHECK(readMolfile(tests::lacticAcidMolfile()) == canonical("C[C@@H](O)C(=O)O"));
}

TEST_CASE("a molfile that is no substance is refused in words", "[chem][structure][regression]") {
  std::string query = tests::ethanolMolfile();
  query.replace(query.find(" O "), 3, " A ");
  CHECK(readMolfile(query) == "fault: atom 3 stands for any of several");
  std::string any = tests::ethanolMolfile();
  any.replace(any.find("  2  3  1"), 9, "  2  3  8");
  CHECK(readMolfile(any) == "fault: bond 2 stands for any of several");
  std::string valence = tests::ethanolMolfile();
  valence.replace(valence.find("  2  3  1"), 9, "  2  3  3");
  CHECK(readMolfile(valence).starts_with("fault: atom 3 of the molfile has more bonds"));
  CHECK(readMolfile("").starts_with("fault: "));
  CHECK(readMolfile("no\nmolfile\nat all\n") ==
        "fault: the molfile is no structure that can be read");
  CHECK(readMolfile("\n\n\n  0  0  0  0  0  0  0  0  0  0999 V2000\nM  END\n") ==
        "fault: the molfile has no atoms");
  std::string large = tests::acetonitrileMolfile();
  large.replace(large.find("COUNTS 3"), 8, "COUNTS 30000");
  CHECK(readMolfile(large) == "fault: the structure has more than 1000 atoms");
}

TEST_CASE("no bytes bring the reader of molfiles down", "[chem][structure][identity]") {
  std::mt19937_64 random(17);
  for (const std::string& sound : {tests::ethanolMolfile(), tests::acetonitrileMolfile()}) {
    for (int round = 0; round < 400; ++round) {
      std::string molfile = sound;
      for (std::size_t edits = 1 + random() % 3; edits > 0; --edits)
        molfile[random() % molfile.size()] = static_cast<char>(random() % 256);
      const auto smiles = engine().readMolfile(molfile);
      if (smiles) {
        REQUIRE(engine().read(*smiles)->canonicalSmiles == *smiles);
      } else {
        REQUIRE_FALSE(smiles.error().what.empty());
      }
    }
  }
}

}  // namespace
}  // namespace vialkeeper
