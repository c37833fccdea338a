// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>
#include <catch2/catch.hpp>
#include <ctime>
#include <memory>
#include <string>
#include <string_view>
#include <vector>

#include "chem/fingerprint.h"
#include "chem/structure.h"

using namespace vialkeeper::chem;

namespace {

StructureEngine& engine() {
  const auto loaded = structureEngine();
  if (!loaded) FAIL(loaded.error().what << ": " << loaded.error().mend);
  return **loaded;
}

std::unique_ptr<Pattern> patternOf(std::string_view smiles) {
  auto pattern = engine().readPattern(smiles);
  if (!pattern) FAIL(smiles << ": " << pattern.error().what);
  return std::move(*pattern);
}

std::string fingerprintOf(std::string_view smiles) {
  const auto fingerprint = engine().fingerprint(smiles);
  if (!fingerprint) FAIL(smiles << ": " << fingerprint.error().what);
  return *fingerprint;
}

bool contains(std::string_view text, std::string_view part) {
  return text.find(part) != std::string_view::npos;
}

constexpr const char* k4CzIpn =
    "N#Cc1c(n2c3ccccc3c3ccccc32)c(C#N)c(n2c3ccccc3c3ccccc32)c(n2c3ccccc3c3ccccc32)"
    "c1n1c2ccccc2c2ccccc21";
constexpr const char* kIndole = "c1ccc2[nH]ccc2c1";
constexpr const char* kIndoline = "C1Cc2ccccc2N1";
constexpr const char* kTetrahydroquinoline = "C1CNc2ccccc2C1";
constexpr const char* kIrPpy3 =
    "c1ccn2->[Ir]34(<-n5ccccc5-c5ccccc35)(<-n3ccccc3-c3ccccc43)c3ccccc3-c2c1";

/// Substrates, products, catalysts, acids, bases, salts, solvents, and cages and chains that are
/// hard on the fingerprint.
const std::vector<std::string>& molecules() {
  static const std::vector<std::string> all{
      // N-heterocycles and what hydrogen leaves behind
      kIndole, kIndoline, kTetrahydroquinoline, "Cn1ccc2ccccc21", "CN1CCc2ccccc21",
      "c1ccc2ncccc2c1", "C1NCCc2ccccc21", "c1ccc2cnccc2c1", "C1=NCCc2ccccc21",
      "C1CN(c2ccccc2)Cc2ccccc21", "C1CN(c2ccccc2)C(c2c[nH]c3ccccc23)c2ccccc21", "CC1CCc2ccccc2N1",
      "Cc1ccc2ccccc2n1", "COc1ccc2[nH]ccc2c1", "Cc1c[nH]c2ccccc12", "CC(=O)N1CCc2ccccc21",
      "C1CCNCC1", "c1ccncc1", "C1CCNC1", "c1cc[nH]c1", "Cn1cccc1", "c1ccc2c(c1)[nH]c1ccccc12",
      "CCn1c2ccccc2c2ccccc21", "c1ccc2c(c1)Cc1ccccc1N2", "c1ccc2nc3ccccc3cc2c1", "C1Nc2ccccc2N1",
      "c1ccc2[nH]cnc2c1", "Cn1cnc2c1c(=O)n(C)c(=O)n2C", "O=c1cccc[nH]1", "O=C1NC(=O)c2ccccc21",
      // carbocycles, alcohols, amines, carbonyls
      "c1ccccc1", "Cc1ccccc1", "Nc1ccccc1", "CN(C)c1ccccc1", "N#Cc1ccccc1", "OCc1ccccc1",
      "O=Cc1ccccc1", "CC(O)c1ccccc1", "CC(=O)c1ccccc1", "C1CCc2ccccc2C1", "c1ccc2ccccc2c1",
      "c1ccc(-c2ccccc2)cc1", "C=Cc1ccccc1", "NCc1ccccc1", "OC1CCCCC1", "O=C1CCCCC1",
      // acids, bases and salts
      "CC(C)(C)C(=O)O", "CC(=O)O", "OC(=O)c1ccccc1", "OC(=O)C(F)(F)F", "[Na+].CC(=O)[O-]",
      "CCN(CC)CC", "C1CN2CCN1CC2", "C1CCN2CCCN=C2CC1", "[NH4+].[Cl-]", "F[P-](F)(F)(F)(F)F",
      "Cc1ccc(S(=O)(=O)O)cc1", "OP(=O)(Oc1ccccc1)Oc1ccccc1", "C[N+](=O)[O-]",
      // catalysts
      k4CzIpn, kIrPpy3, "CC(=O)O[Pd]OC(C)=O", "[Pd]",
      "[Ru+2].[Cl-].[Cl-].c1ccnc(c1)-c1ccccn1.c1ccnc(c1)-c1ccccn1.c1ccnc(c1)-c1ccccn1",
      "C[n+]1c2ccccc2c(-c2c(C)cc(C)cc2C)c2ccccc21", "ON=C(C)C(C)=NO", "CC1(C)CCCC(C)(C)N1[O]",
      // solvents, isotopologues, hydrogens that stay atoms
      "CC#N", "CN(C)C=O", "CO", "O", "[2H]O[2H]", "[2H]C([2H])([2H])C#N", "[H][H]",
      "[H]/N=C(/C)c1ccccc1", "ClCCl", "CS(C)=O", "C1CCOC1",
      // cages, spiro and long chains
      "C12C3C4C1C5C4C3C25", "C1C2CC3CC1CC(C2)C3", "C1CC2CCC1CC2", "C1CCC2(CC1)CCCC2",
      "C1=CC2C=CC1C=C2", "C[C@]12CC[C@H]3[C@@H](CCc4cc(O)ccc34)[C@@H]1CC[C@@H]2O",
      "CCCCCCCCCCCCCCCCCCCCCCCCCCCCCCCCCCCCCCCC", "OCCOCCOCCOCCOCCOCCOCCOCCOCCO",
      std::string(150, 'C') + "C(=O)O"};
  return all;
}

const std::vector<std::string>& parts() {
  static const std::vector<std::string> all{kIndole,
                                            kIndoline,
                                            kTetrahydroquinoline,
                                            "n1ccc2ccccc12",
                                            "[H]n1ccc2ccccc12",
                                            "c1ccc2ncccc2c1",
                                            "n1c2ccccc2c2ccccc12",
                                            "N#Cc1ccccc1",
                                            "c1ccccc1N",
                                            "c1ccccc1",
                                            "C(=O)O",
                                            "C(=O)[O-]",
                                            "[H]OC=O",
                                            "C#N",
                                            "CN",
                                            "C=N",
                                            "NC=O",
                                            "C1CCNCC1",
                                            "C1CCCCC1",
                                            "CCCCCCCC",
                                            "C1CCC1",
                                            "C1CCCCCCC1",
                                            "[Pd]",
                                            "[Ir]",
                                            "n1ccccc1-c1ccccc1",
                                            "F",
                                            "[2H]C",
                                            "[2H]",
                                            "S(=O)=O",
                                            "P",
                                            "[Cl-]",
                                            "c1ccccc1.C(=O)O",
                                            "C",
                                            "O",
                                            "[H]N([H])C",
                                            "N=O",
                                            "[O-][N+]=O",
                                            "[H][H]",
                                            "[O]N",
                                            "C1CN2CCN1CC2",
                                            "C=C"};
  return all;
}

}  // namespace

TEST_CASE("a part is found where a chemist sees it and nowhere else", "[chem][identity]") {
  struct Known {
    const char* part;
    const char* whole;
    bool isIn;
  };
  const auto known = GENERATE(values<Known>({
      {kIndole, kIndole, true},
      {kIndole, "Cn1ccc2ccccc21", true},
      {kIndole, "C1=CNC2=CC=CC=C12", true},  // indole with capitals
      {"C1=CNC2=CC=CC=C12", "Cn1ccc2ccccc21", true},
      {kIndole, kIndoline, false},
      {kIndoline, kIndole, false},
      {kIndole, "c1ccc2c(c1)[nH]c1ccccc12", true},  // carbazole
      {kIndole, "C1CN(c2ccccc2)C(c2c[nH]c3ccccc23)c2ccccc21", true},
      {kIndoline, "CC(=O)N1CCc2ccccc21", true},
      {kIndoline, kTetrahydroquinoline, false},
      {kTetrahydroquinoline, "CC1CCc2ccccc2N1", true},
      {kTetrahydroquinoline, "c1ccc2ncccc2c1", false},
      {kTetrahydroquinoline, "C1NCCc2ccccc21", false},  // tetrahydroisoquinoline
      {"C1NCCc2ccccc21", "C1CN(c2ccccc2)Cc2ccccc21", true},
      {"C(=O)O", "CC(C)(C)C(=O)O", true},
      {"C(=O)O", "CC(C)(C)CO", false},
      {"C(=O)O", "CC(=O)OCC", true},
      {"C(=O)O", "[Na+].CC(=O)[O-]", true},
      {"C(=O)[O-]", "[Na+].CC(=O)[O-]", true},
      {"C(=O)[O-]", "CC(=O)O", false},
      {"N#Cc1ccccc1", k4CzIpn, true},
      {"c1ccc2c(c1)[nH]c1ccccc12", k4CzIpn, true},
      {"N#CC", "N#Cc1ccccc1", true},
      {"c1ccccc1N", k4CzIpn, true},
      {"c1ccccc1N", "Nc1ccccc1", true},
      {"c1ccccc1N", "NCc1ccccc1", false},
      {"C1CCCCC1", "c1ccccc1", false},
      {"C=C", "c1ccccc1", false},
      {"c1ccncc1", "c1ccc2ncccc2c1", true},
      {"c1ccccc1-c1ccccn1", kIrPpy3, true},
      {"N[Pd]", "N->[Pd](<-N)(Cl)Cl", false},
      {"N->[Pd]", "N->[Pd](<-N)(Cl)Cl", true},
      {"[Pd]", "CC(=O)O[Pd]OC(C)=O", true},
      {"[Pd]", "[Pd+2].[Cl-].[Cl-]", true},
      {"CN(=O)=O", "CC[N+](=O)[O-]", true},  // both ways to write a nitro group
      {"[N+](=O)[O-]", "C[N+](=O)[O-]", true},
      {"c1ccccc1.C(=O)O", "OC(=O)c1ccccc1", true},
      {"c1ccccc1.C(=O)O", "OC(=O)C.c1ccccc1", true},
      {"c1ccccc1.C(=O)O", "OC(=O)C1CCCCC1", false},
      {"CCC", "CC", false},
      {"C.C", "C", false},
      {" CO ", " CCO ", true},
  }));
  INFO(known.part << " in " << known.whole);
  CHECK(patternOf(known.part)->isIn(known.whole) == known.isIn);
}

TEST_CASE("hydrogens are asked for where they are written as atoms", "[chem][identity]") {
  CHECK(patternOf("[H]n1ccc2ccccc12")->isIn(kIndole));
  CHECK_FALSE(patternOf("[H]n1ccc2ccccc12")->isIn("Cn1ccc2ccccc21"));
  CHECK(patternOf("[NH2]c1ccccc1")->isIn("CN(C)c1ccccc1"));
  CHECK_FALSE(patternOf("[H]N([H])c1ccccc1")->isIn("CNc1ccccc1"));
  CHECK(patternOf("[H]N([H])c1ccccc1")->isIn("Nc1ccccc1"));
  CHECK(patternOf("[H]Nc1ccccc1")->isIn("Nc1ccccc1"));  // at least one
  CHECK(patternOf("[H]OC=O")->isIn("CC(=O)O"));
  CHECK_FALSE(patternOf("[H]OC=O")->isIn("CC(=O)OC"));
  CHECK(patternOf("[H]OC=O")->isIn("CC(=O)O[2H]"));  // deuterium is hydrogen
  CHECK_FALSE(patternOf("[2H]O")->isIn("CO"));
  CHECK(patternOf("[2H]O")->isIn("[2H]OC"));
  // Another match of the same part may have the hydrogen that the first has not.
  CHECK(patternOf("[H]OC")->isIn("COCCO"));
  CHECK(patternOf("[H]OC")->isIn("OCCOC"));
  // Hydrogens that stay atoms in a structure for the sake of its geometry, and in a part.
  CHECK(patternOf("[H]N=C")->isIn("[H]/N=C(/C)c1ccccc1"));
  CHECK(patternOf("[H]/N=C(/C)C")->isIn("N=C(C)CC"));
  CHECK(patternOf("[H][H]")->isIn("[H][H]"));
  CHECK_FALSE(patternOf("[H][H]")->isIn("C"));
}

TEST_CASE("isotopes and charges count where the part names them", "[chem][identity]") {
  CHECK(patternOf("CC#N")->isIn("[2H]C([2H])([2H])C#N"));
  CHECK(patternOf("[2H]CC#N")->isIn("[2H]C([2H])([2H])C#N"));
  CHECK_FALSE(patternOf("[13CH3]O")->isIn("CO"));
  CHECK(patternOf("CO")->isIn("[13CH3]O"));
  CHECK(patternOf("n1ccccc1")->isIn("C[n+]1ccccc1"));
  CHECK_FALSE(patternOf("C[n+]1ccccc1")->isIn("c1ccncc1"));
}

TEST_CASE("stereochemistry and radicals do not count", "[chem][identity]") {
  CHECK(patternOf("C[C@H](N)C(=O)O")->isIn("C[C@@H](N)C(=O)O"));
  CHECK(patternOf("C/C=C/C")->isIn("C/C=C\\C"));
  CHECK(patternOf("[CH2]c1ccccc1")->isIn("CCc1ccccc1"));
  CHECK(patternOf("[O]N")->isIn("CC1(C)CCCC(C)(C)N1[O]"));
}

TEST_CASE("a nitrogen of an aromatic ring may be left open", "[chem][identity]") {
  struct Open {
    const char* open;
    const char* closed;
  };
  const auto same = GENERATE(values<Open>({
      {"n1cccc1", "[nH]1cccc1"},
      {"n1ccc2ccccc12", kIndole},
      {"n1c2ccccc2c2ccccc12", "c1ccc2c(c1)[nH]c1ccccc12"},
      {"n1cncc1", "[nH]1cncc1"},
      {"n1cccc1.n1cccc1", "[nH]1cccc1.[nH]1cccc1"},
      {"n1cccc1-c1cccn1", "[nH]1cccc1-c1ccc[nH]1"},
      {"c1ccc2c(c1)ncn2", "c1ccc2c(c1)nc[nH]2"},
  }));
  INFO(same.open);
  const auto open = patternOf(same.open);
  const auto closed = patternOf(same.closed);
  CHECK(open->fingerprint() == closed->fingerprint());
  for (const std::string& molecule : molecules()) {
    INFO(molecule);
    CHECK(open->isIn(molecule) == closed->isIn(molecule));
  }
  CHECK_FALSE(engine().read(same.open));  // as a substance it is still a mistake
}

TEST_CASE("every structure is a part of itself and of its salts", "[chem][identity]") {
  for (const std::string& molecule : molecules()) {
    INFO(molecule);
    const auto pattern = patternOf(molecule);
    CHECK(pattern->isIn(molecule));
    CHECK(pattern->isIn("[Na+].[Cl-]." + molecule));
    CHECK(mayContain(fingerprintOf(molecule), pattern->fingerprint()));
    CHECK(pattern->isIn(engine().read(molecule)->canonicalSmiles));
  }
}

TEST_CASE("the fingerprint never hides a structure that has the part", "[chem][identity]") {
  REQUIRE(molecules().size() >= 60);
  REQUIRE(parts().size() >= 20);
  std::vector<std::string> fingerprints;
  for (const std::string& molecule : molecules()) fingerprints.push_back(fingerprintOf(molecule));
  std::vector<std::string> asked = parts();
  asked.insert(asked.end(), molecules().begin(), molecules().end());
  int with = 0;
  int without = 0;
  int ruledOut = 0;
  for (const std::string& part : asked) {
    const auto pattern = patternOf(part);
    for (std::size_t i = 0; i < molecules().size(); ++i) {
      const bool may = mayContain(fingerprints[i], pattern->fingerprint());
      if (pattern->isIn(molecules()[i])) {
        ++with;
        INFO(part << " in " << molecules()[i]);
        CHECK(may);
      } else {
        ++without;
        ruledOut += may ? 0 : 1;
      }
    }
  }
  CHECK(with > 500);
  // It is worth its bytes: nearly all structures without the part need not be read.
  INFO(ruledOut << " of " << without);
  CHECK(ruledOut > without * 9 / 10);
}

TEST_CASE("a large structure keeps all its bits", "[chem][identity]") {
  // RDKit stops a search after 1000 matches unless told otherwise; the end must still be seen.
  const std::string end = GENERATE(as<std::string>(), "SPF", "N=NN", "[Se]SF", "S(=O)(=O)C=C");
  std::string branched;
  for (int i = 0; i < 60; ++i) branched += "CC(C)(C)";
  for (const std::string& start : {std::string(520, 'C'), branched}) {
    const std::string chain = start + "C" + end;
    INFO(chain);
    CHECK(mayContain(fingerprintOf(chain), patternOf("C" + end)->fingerprint()));
  }
}

TEST_CASE("a fingerprint of another release is not believed", "[chem][safety]") {
  const std::string pattern = patternOf("C=O")->fingerprint();
  const std::string alkane = fingerprintOf("CCCC");
  REQUIRE_FALSE(mayContain(alkane, pattern));
  std::string other = alkane;
  other.back() = other.back() == '9' ? '8' : '9';
  CHECK(mayContain(other, pattern));
  CHECK(mayContain(alkane.substr(0, kFingerprintBytes), pattern));
}

TEST_CASE("a fingerprint is 256 bytes with the release behind and does not depend on the writing",
          "[chem][identity]") {
  const std::string release = fingerprintOf("CCO").substr(kFingerprintBytes);
  CHECK(release.find_first_not_of("0123456789.") == std::string::npos);
  CHECK(release.size() > 4);
  CHECK(patternOf("CCO")->fingerprint().substr(kFingerprintBytes) == release);
  CHECK(fingerprintOf("CCO") == fingerprintOf("[H]OC([H])([H])C"));
  CHECK(fingerprintOf(kIndole) == fingerprintOf("C1=CNC2=CC=CC=C12"));
  CHECK(fingerprintOf(kIndole) != fingerprintOf(kIndoline));
  CHECK(fingerprintOf("CC(=O)O") == patternOf("CC(=O)O")->fingerprint());
}

TEST_CASE("all bits of a part must be in the structure", "[chem][identity]") {
  using namespace std::string_view_literals;
  CHECK(mayContain("\xFF\x01"sv, "\x80\x01"sv));
  CHECK(mayContain("\x80\x01"sv, "\x80\x01"sv));
  CHECK(mayContain("\x80\x01"sv, "\0\0"sv));
  CHECK_FALSE(mayContain("\x7F\x01"sv, "\x80\x01"sv));
  CHECK_FALSE(mayContain("\xFF\x01"sv, "\x80\x02"sv));
  // A fingerprint that was never made rules nothing out.
  CHECK(mayContain(""sv, "\x80\x02"sv));
  CHECK(mayContain(""sv, ""sv));
}

TEST_CASE("a text that is no part is refused with its place", "[chem]") {
  struct Bad {
    std::string smiles;
    std::string said;
  };
  const auto bad = GENERATE(values<Bad>({
      {"", "empty"},
      {"C*", "\"*\" at position 2 is SMARTS"},
      {"[#6]C", "\"#\" at position 2 is SMARTS"},
      {"C~C", "\"~\" at position 2 is SMARTS"},
      {"[C;H3]", "\";\" at position 3 is SMARTS"},
      {"[!C]", "\"!\" at position 2 is SMARTS"},
      {"C(C", "parenthesis at position 2"},
      {"Hello", "\"H\" at position 1"},
      {"CC>>CO", "reaction arrow"},
      {"c1cccc1", "no arrangement of alternating double bonds"},  // a benzene with a carbon missing
      {"c1cccc1.n1cccc1", "no arrangement of alternating double bonds"},
      {"cc", "the atom c at position 1 is aromatic"},
      {"C(C)(C)(C)(C)C", "the atom C at position 1 has more bonds"},
      {std::string("C\0C", 3), "position 2"},
      {std::string(1001, 'C'), "more than 1000 atoms"},
  }));
  INFO(bad.smiles);
  const auto pattern = engine().readPattern(bad.smiles);
  REQUIRE_FALSE(pattern);
  INFO(pattern.error().what);
  CHECK(contains(pattern.error().what, bad.said));
  CHECK_FALSE(pattern.error().mend.empty());
  CHECK_FALSE(engine().fingerprint(bad.smiles));
  CHECK_FALSE(patternOf("C")->isIn(bad.smiles));
}

TEST_CASE("a part of many pieces that is not there is missed at once", "[chem]") {
  const std::string chain = std::string(150, 'C') + "S";
  CHECK_FALSE(patternOf("C.C.C.C.C.C.C.C.C.C.N")->isIn(chain));
  CHECK_FALSE(patternOf("C.C.C.C.C.C.C.C.C.C=S")->isIn(chain));
  CHECK(patternOf("C.C.C.C.C.C.C.C.C.CS")->isIn(chain));
}

TEST_CASE("patterns are kept apart and outlive each other", "[chem]") {
  auto first = patternOf("C#N");
  const auto second = patternOf("C=O");
  CHECK(first->isIn("CC#N"));
  CHECK_FALSE(second->isIn("CC#N"));
  first.reset();
  CHECK(second->isIn("CC(=O)C"));
}

// Hidden: run with `structure_tests "[speed]"`.
TEST_CASE("the time of a search over 4000 structures", "[.][speed]") {
  // Of the processor, so that other work on the machine does not count.
  const auto now = [] { return 1e3 * static_cast<double>(std::clock()) / CLOCKS_PER_SEC; };
  // N-substituted, ring-substituted heterocycles of 10 to 70 atoms, every fortieth a 4CzIPN.
  std::vector<std::string> targets;
  const std::vector<std::string> cores{"c1ccc2n({})ccc2c1", "C1Cc2ccccc2N1{}", "C1CN({})c2ccccc2C1",
                                       "c1ccc2c(c1)n({})c1ccccc12", "O=C(O)c1ccccc1{}"};
  const std::vector<std::string> ends{"C",       "CC#N",    "c3ccccc3",  "CC(=O)O",
                                      "C(=O)OC", "CCN(C)C", "Cc3ccncc3", "S(=O)(=O)C"};
  for (std::size_t i = 0; targets.size() < 4'000; ++i) {
    if (i % 40 == 39) {
      targets.emplace_back(k4CzIpn);
      continue;
    }
    std::string target = cores[i % cores.size()];
    const std::size_t place = target.find("{}");
    const std::string chain = std::string(i / 40 % 20 + 1, 'C') + ends[i / 5 % ends.size()];
    targets.push_back(target.replace(place, 2, chain));
  }
  auto start = now();
  std::vector<std::string> fingerprints;
  for (const std::string& target : targets) fingerprints.push_back(fingerprintOf(target));
  WARN("4000 fingerprints made in " << (now() - start) << " ms");
  for (const char* part : {kIndole, kTetrahydroquinoline, "N#Cc1ccccc1", "C(=O)O", "[Pd]"}) {
    start = now();
    const auto pattern = patternOf(part);
    const double read = now() - start;
    start = now();
    const auto plain =
        std::count_if(targets.begin(), targets.end(),
                      [&](const std::string& target) { return pattern->isIn(target); });
    const double withoutFilter = now() - start;
    start = now();
    long candidates = 0;
    for (const std::string& fingerprint : fingerprints) {
      candidates += mayContain(fingerprint, pattern->fingerprint()) ? 1 : 0;
    }
    const double filter = now() - start;
    start = now();
    long found = 0;
    for (std::size_t i = 0; i < targets.size(); ++i) {
      if (!mayContain(fingerprints[i], pattern->fingerprint())) continue;
      found += pattern->isIn(targets[i]) ? 1 : 0;
    }
    const double both = now() - start;
    CHECK(found == plain);
    WARN(part << ": " << found << " found, " << candidates << " candidates; pattern read in "
              << read << " ms, all searched in " << withoutFilter << " ms, filter alone " << filter
              << " ms, filtered and searched " << both << " ms");
  }
}
