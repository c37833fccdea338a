// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/structure.h"

#include <unistd.h>

#include <algorithm>
#include <catch2/catch.hpp>
#include <cstdio>
#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <string>
#include <string_view>
#include <vector>

#include "chem/rdkit/structure_module.h"

using namespace vialkeeper::chem;

namespace {

StructureEngine& engine() {
  const auto loaded = structureEngine();
  if (!loaded) FAIL(loaded.error().what << ": " << loaded.error().mend);
  return **loaded;
}

Structure read(std::string_view smiles) {
  const auto structure = engine().read(smiles);
  if (!structure) FAIL(smiles << ": " << structure.error().what);
  return *structure;
}

Identity identify(std::string_view smiles) {
  const auto identity = engine().identify(smiles);
  if (!identity) FAIL(smiles << ": " << identity.error().what);
  return *identity;
}

StructureFault faultOf(std::string_view smiles) {
  const auto structure = engine().read(smiles);
  if (structure) FAIL("read as " << structure->canonicalSmiles << ": " << smiles);
  CHECK_FALSE(structure.error().what.empty());
  CHECK_FALSE(structure.error().mend.empty());
  CHECK_FALSE(engine().identify(smiles));
  CHECK_FALSE(engine().extent(smiles));
  CHECK_FALSE(engine().drawSvg(smiles, 100, 100));
  return structure.error();
}

std::string svgOf(std::string_view smiles, int width_px, int height_px) {
  const auto svg = engine().drawSvg(smiles, width_px, height_px);
  if (!svg) FAIL(smiles << ": " << svg.error().what);
  return *svg;
}

StructureEngine::Extent extentOf(std::string_view smiles) {
  const auto extent = engine().extent(smiles);
  if (!extent) FAIL(smiles << ": " << extent.error().what);
  return *extent;
}

std::string repeated(std::string_view part, int times) {
  std::string text;
  for (int i = 0; i < times; ++i) text += part;
  return text;
}

bool contains(std::string_view text, std::string_view part) {
  return text.find(part) != std::string_view::npos;
}

/// The number behind `scale(` in a drawing [px per px at full size].
double scaleOf(const std::string& svg) {
  const std::size_t found = svg.find("scale(");
  REQUIRE(found != std::string::npos);
  return std::strtod(svg.c_str() + found + 6, nullptr);
}

/// An environment variable's value for the life of this object.
class WithModuleDirectory {
 public:
  explicit WithModuleDirectory(const std::string& directory) {
    if (const char* before = std::getenv(kName)) m_before = before;
    setenv(kName, directory.c_str(), 1);
  }
  WithModuleDirectory(const WithModuleDirectory&) = delete;
  WithModuleDirectory& operator=(const WithModuleDirectory&) = delete;
  ~WithModuleDirectory() {
    if (m_before.empty()) {
      unsetenv(kName);
    } else {
      setenv(kName, m_before.c_str(), 1);
    }
  }

 private:
  static constexpr const char* kName = "VIALKEEPER_MODULE_DIR";
  std::string m_before;
};

/// What is written to the standard error stream while work() runs, by libraries included.
template <class Work>
std::string standardErrorOf(Work work) {
  std::FILE* file = std::tmpfile();
  REQUIRE(file != nullptr);
  std::fflush(stderr);
  const int before = dup(STDERR_FILENO);
  dup2(fileno(file), STDERR_FILENO);
  work();
  std::fflush(stderr);
  dup2(before, STDERR_FILENO);
  close(before);
  std::rewind(file);
  std::string text;
  for (int c = std::fgetc(file); c != EOF; c = std::fgetc(file)) text += static_cast<char>(c);
  std::fclose(file);
  return text;
}

constexpr std::string_view k4CzIpn =
    "N#Cc1c(n2c3ccccc3c3ccccc32)c(C#N)c(n2c3ccccc3c3ccccc32)c(n2c3ccccc3c3ccccc32)"
    "c1n1c2ccccc2c2ccccc21";

}  // namespace

TEST_CASE("InChIKeys of common substances are those of the public registries",
          "[chem][published]") {
  struct Known {
    const char* smiles;
    const char* key;
  };
  // From memory of PubChem and ChemSpider records, except where a source is named.
  const auto known = GENERATE(values<Known>({
      {"O", "XLYOFNOQVPJJNP-UHFFFAOYSA-N"},                       // water
      {"C", "VNWKTOKETHGBQD-UHFFFAOYSA-N"},                       // methane
      {"[H][H]", "UFHFLCQGNIYNRP-UHFFFAOYSA-N"},                  // hydrogen
      {"N#N", "IJGRMHOSHXDMSA-UHFFFAOYSA-N"},                     // nitrogen
      {"O=O", "MYMOFIZGZYHOMD-UHFFFAOYSA-N"},                     // oxygen
      {"CCO", "LFQSCWFLJHTTHZ-UHFFFAOYSA-N"},                     // ethanol
      {"CC#N", "WEVYAHXRMPXWCK-UHFFFAOYSA-N"},                    // acetonitrile
      {"c1ccccc1", "UHOVQNZJYSORNB-UHFFFAOYSA-N"},                // benzene
      {"c1ccc2[nH]ccc2c1", "SIKJAQJRHWYJAI-UHFFFAOYSA-N"},        // indole
      {"C1Cc2ccccc2N1", "LPAGFVYQRIESJQ-UHFFFAOYSA-N"},           // indoline
      {"c1ccc2ncccc2c1", "SMWDFEZZVXVKRB-UHFFFAOYSA-N"},          // quinoline
      {"CC(C)(C)C(=O)O", "IUGYQRQAERSCNH-UHFFFAOYSA-N"},          // pivalic acid
      {"CCN(CC)CC", "ZMANZCXQSJIPKH-UHFFFAOYSA-N"},               // triethylamine
      {"OC(=O)c1ccccc1", "WPYMKLBDIGXBTP-UHFFFAOYSA-N"},          // benzoic acid
      {"CN(C)C=O", "ZMXDDKWLCZADIW-UHFFFAOYSA-N"},                // dimethylformamide
      {"C[N+](=O)[O-]", "LYGJENNIWJXYER-UHFFFAOYSA-N"},           // nitromethane
      {"CN(=O)=O", "LYGJENNIWJXYER-UHFFFAOYSA-N"},                // the same in the old way
      {"[NH4+]", "QGZKDVFQNNGYKY-UHFFFAOYSA-O"},                  // ammonium
      {"[Na+].[Cl-]", "FAPWRFPIFSIZLT-UHFFFAOYSA-M"},             // sodium chloride
      {"N.N.[Cl-].[Cl-].[Pt+2]", "LXZZYRPGZAFOLE-UHFFFAOYSA-L"},  // cisplatin
      {"N->[Pt](<-N)(Cl)Cl", "LXZZYRPGZAFOLE-UHFFFAOYSA-L"},      // the same with bonds
      {"CC(=O)O[Pd]OC(C)=O", "YJVFFLUZDVXJQI-UHFFFAOYSA-L"},      // palladium(II) acetate
      {"[Ru+2].[Cl-].[Cl-].c1ccnc(c1)-c1ccccn1.c1ccnc(c1)-c1ccccn1.c1ccnc(c1)-c1ccccn1",
       "SJFYGUKHUNLZTK-UHFFFAOYSA-L"},  // [Ru(bpy)3]Cl2
      {"c1ccn2->[Ir]34(<-n5ccccc5-c5ccccc35)(<-n3ccccc3-c3ccccc43)c3ccccc3-c2c1",
       "QKBWDYLFYVXTGE-UHFFFAOYSA-N"},  // [Ir(ppy)3]
      // BenchChem's page of 4CzTPN, the isomer of 4CzIPN with its nitriles opposite each other.
      {"N#Cc1c(n2c3ccccc3c3ccccc32)c(n2c3ccccc3c3ccccc32)c(C#N)c(n2c3ccccc3c3ccccc32)"
       "c1n1c2ccccc2c2ccccc21",
       "OYNJAUIAADXAOW-UHFFFAOYSA-N"},
  }));
  INFO(known.smiles);
  CHECK(identify(known.smiles).inchiKey == known.key);
}

TEST_CASE("InChIKeys tell stereoisomers and isotopologues apart", "[chem][published]") {
  struct Known {
    const char* smiles;
    const char* key;
  };
  // From memory of PubChem records.
  const auto known = GENERATE(values<Known>({
      {"C[C@H](N)C(=O)O", "QNAYBMKLOCPYGJ-REOHCLBHSA-N"},                         // L-alanine
      {"N[C@@H](C)C(=O)O", "QNAYBMKLOCPYGJ-REOHCLBHSA-N"},                        // and again
      {"[H][C@@](C)(N)C(=O)O", "QNAYBMKLOCPYGJ-REOHCLBHSA-N"},                    // H written
      {"C[C@@H](N)C(=O)O", "QNAYBMKLOCPYGJ-UWTATZPHSA-N"},                        // D-alanine
      {"CC(N)C(=O)O", "QNAYBMKLOCPYGJ-UHFFFAOYSA-N"},                             // alanine
      {"C/C=C/C", "IAQRGUVFOMOMEM-ONEGZZNKSA-N"},                                 // (E)-2-butene
      {"C/C=C\\C", "IAQRGUVFOMOMEM-ARJAWSKDSA-N"},                                // (Z)-2-butene
      {"CC=CC", "IAQRGUVFOMOMEM-UHFFFAOYSA-N"},                                   // 2-butene
      {"OC[C@H]1OC(O)[C@H](O)[C@@H](O)[C@@H]1O", "WQZGKKKJIJFFOK-GASJEMHNSA-N"},  // D-glucose
      {"[2H]O[2H]", "XLYOFNOQVPJJNP-ZSJDYOACSA-N"},                               // heavy water
      {"[2H]C([2H])([2H])C#N", "WEVYAHXRMPXWCK-FIBGUPNXSA-N"},                    // CD3CN
  }));
  INFO(known.smiles);
  CHECK(identify(known.smiles).inchiKey == known.key);
}

TEST_CASE("standard InChIs are printed as the InChI Trust prints them", "[chem][published]") {
  // From memory: the InChI Trust's "About the InChI standard" shows ethanol and L-ascorbic acid.
  CHECK(identify("CCO").inchi == "InChI=1S/C2H6O/c1-2-3/h3H,2H2,1H3");
  CHECK(identify("OC[C@H](O)[C@H]1OC(=O)C(O)=C1O").inchi ==
        "InChI=1S/C6H8O6/c7-1-2(8)5-3(9)4(10)6(11)12-5/h2,5,7-10H,1H2/t2-,5+/m0/s1");
}

TEST_CASE("formulas stand in Hill order with isotopes and charge", "[chem][identity]") {
  struct Known {
    const char* smiles;
    const char* formula;
    int heavyAtoms;
  };
  const auto known = GENERATE(values<Known>({
      {"O", "H2O", 1},
      {"CCO", "C2H6O", 3},
      {"[H][H]", "H2", 0},
      {"OS(=O)(=O)O", "H2O4S", 5},
      {"FC(Cl)Br", "CHBrClF", 4},
      {k4CzIpn.data(), "C56H32N6", 62},
      // Isotopes, as atoms of their own and as counted hydrogens' neighbours.
      {"[2H]O[2H]", "D2O", 1},
      {"[2H]O", "HDO", 1},
      {"[3H]O[3H]", "T2O", 1},
      {"[2H]C([2H])([2H])C#N", "C2D3N", 3},
      {"[13CH4]", "[13C]H4", 1},
      {"[13CH3]CO", "C[13C]H6O", 3},
      {"[2H][13CH2]O[3H]", "[13C]H2DTO", 2},
      {"[15NH3]", "H3[15N]", 1},
      {"N[15NH2]", "H4N[15N]", 2},
      // Charges; a caret where the count before the sign could be taken for the charge.
      {"[NH4+]", "H4N+", 1},
      {"CC(=O)[O-]", "C2H3O2-", 4},
      {"[O-]C(=O)C(=O)[O-]", "C2O4^2-", 6},
      {"[Fe+3]", "Fe^3+", 1},
      {"[H+]", "H+", 0},
      {"[N-]=[N+]=[N-]", "N3^-", 3},
      {"[I-]I", "I2^-", 2},
      {"F[P-](F)(F)(F)(F)F", "F6P-", 7},
      // Fragments are one formula, and their charges cancel.
      {"[NH4+].[Cl-]", "ClH4N", 2},
      {"OC(=O)C(=O)O.O.O", "C2H6O6", 8},
      {"[Na+].[BH4-]", "BH4Na", 2},
      {"[Na+].[H-]", "HNa", 1},
      {"[Na+].[H-][Al]", "AlHNa", 2},  // the charge of a bonded hydride is not lost
      {"[K+].[K+].[K+].[Fe+3].[O-]C(=O)C(=O)[O-].[O-]C(=O)C(=O)[O-].[O-]C(=O)C(=O)[O-].O.O.O",
       "C6H6FeK3O15", 25},
  }));
  INFO(known.smiles);
  const Structure structure = read(known.smiles);
  CHECK(structure.formula == known.formula);
  CHECK(structure.heavyAtoms == known.heavyAtoms);
}

TEST_CASE("all ways to write one substance have one canonical SMILES", "[chem][identity]") {
  const auto same = GENERATE(values<std::vector<std::string>>({
      {"OCC", "C(O)C", "[CH3][CH2][OH]", "C(C)O", "[H]OC([H])([H])C", " CCO ", "C1.C1O"},
      {"c1ccccc1C", "CC1=CC=CC=C1", "Cc1ccccc1", "C1=CC=CC(C)=C1"},
      {"N[C@@H](C)C(=O)O", "C[C@H](N)C(=O)O", "OC(=O)[C@@H](N)C"},
      {"F/C=C/F", "F\\C=C\\F", "C(/F)=C\\F"},
      {"[Cl-].[Na+]", "[Na+].[Cl-]"},
      {std::string(k4CzIpn),
       "n1(c2ccccc2c2ccccc12)-c1c(C#N)c(-n2c3ccccc3c3ccccc23)c(-n2c3ccccc3c3ccccc23)"
       "c(-n2c3ccccc3c3ccccc23)c1C#N",
       "C1=CC=C2C(=C1)C3=CC=CC=C3N2C4=C(C(=C(C(=C4C#N)N5C6=CC=CC=C6C7=CC=CC=C75)"
       "N8C9=CC=CC=C9C1=CC=CC=C18)N1C2=CC=CC=C2C2=CC=CC=C21)C#N"},
  }));
  const std::string canonical = read(same.front()).canonicalSmiles;
  const std::string key = identify(same.front()).inchiKey;
  for (const std::string& smiles : same) {
    INFO(smiles);
    CHECK(read(smiles).canonicalSmiles == canonical);
    CHECK(identify(smiles).inchiKey == key);
  }
  CHECK(read(canonical).canonicalSmiles == canonical);
}

TEST_CASE("different substances have different canonical SMILES", "[chem][identity]") {
  std::vector<std::string> canonical;
  for (const char* smiles : {"CCO", "COC", "[2H]OCC", "C[13CH2]O", "C[C@H](N)C(=O)O",
                             "C[C@@H](N)C(=O)O", "CC(N)C(=O)O", "F/C=C/F", "F/C=C\\F", "FC=CF"}) {
    canonical.push_back(read(smiles).canonicalSmiles);
  }
  std::sort(canonical.begin(), canonical.end());
  CHECK(std::adjacent_find(canonical.begin(), canonical.end()) == canonical.end());
}

TEST_CASE("a text that is no SMILES is refused with its place", "[chem]") {
  struct Bad {
    std::string smiles;
    std::string said;
  };
  const auto bad = GENERATE(values<Bad>({
      {"", "empty"},
      {" \t", "empty"},
      {"CCO garbage", "behind the SMILES at position 5"},
      {"CCO\nCCN", "behind the SMILES at position 5"},
      {"CCO |$;;a$|", "extension of SMILES (|...|) at position 5"},
      {"C|C", "extension of SMILES at position 2"},
      {"C{+n}C", "extension of SMILES at position 2"},
      {"CC>>CO", "reaction arrow at position 3"},
      {"C>O>C", "reaction arrow at position 2"},
      {"[Na+]>>C", "reaction arrow at position 6"},
      {"C->>C", "reaction arrow at position 3"},
      {"*CC", "\"*\" at position 1"},
      {"C[*:1]", "\"*\" at position 3"},
      {"C~C", "search pattern"},
      {"[#6]", "search pattern"},
      {"[C;H3]C", "search pattern"},
      {"C(C", "parenthesis at position 2 is never closed"},
      {"CC)C", "parenthesis at position 3 closes no branch"},
      {"(C)C", "starts with a branch"},
      {"C()C", "branch at position 2 is empty"},
      {"C[Na", "square bracket at position 2 is never closed"},
      {"Na]", "square bracket at position 3 closes nothing"},
      {"C[]", "square brackets at position 2 are empty"},
      {"CX", "\"X\" at position 2"},
      {"Hello", "\"H\" at position 1"},
      {"H2O", "\"H\" at position 1"},
      {"C[Xx]", "no element is named in [Xx] at position 2"},
      {"[D]O", "no element is named in [D] at position 1"},
      {"[NaCl]", "\"C\" at position 4"},
      {"C1CC", "ring 1 at position 2 is opened"},
      {"C%12CC", "ring 12 at position 2 is opened"},
      {"C11", "ring at position 2 is closed at its own atom"},
      {"C%", "% at position 2"},
      {"CC=", "\"=\" at position 3"},
      {"=C", "\"=\" at position 1"},
      {"CCO.", "\".\" at position 4"},
      {"C==C", "follow each other at position 2"},
  }));
  INFO(bad.smiles);
  const StructureFault fault = faultOf(bad.smiles);
  INFO(fault.what);
  CHECK(contains(fault.what, bad.said));
}

TEST_CASE("bytes outside printable ASCII are refused with their place", "[chem]") {
  CHECK(contains(faultOf(std::string_view("CC\0O", 4)).what, "position 3"));
  CHECK(contains(faultOf(std::string_view("\0", 1)).what, "position 1"));
  CHECK(contains(faultOf("C\xC2\xB5").what, "position 2"));
  CHECK(contains(faultOf("CC\x7F").what, "position 3"));
  CHECK(contains(faultOf("\xFF").what, "position 1"));
}

TEST_CASE("a structure whose valences do not add up is refused with its atom", "[chem]") {
  struct Bad {
    const char* smiles;
    const char* said;
  };
  const auto bad = GENERATE(values<Bad>({
      {"OC(C)(C)(C)C", "the atom C at position 2 has more bonds"},
      {"[H]N([H])(C)C", "the atom N at position 4 has more bonds"},
      {"CC[OH2]", "the atom [OH2] at position 3 has more bonds"},
      {"c1cccc1", "no arrangement of alternating double bonds"},
      {"Cn1cccc1.n1cccc1", "with n at position 10"},
      {"Cc", "the atom c at position 2 is aromatic"},
      {"C:C", "aromatic bond"},
      {"N[H+]", "the atom [H+] at position 2 has more bonds"},  // its charge would be lost
      {"Co1CCCC1", "the atom o at position 2 has more bonds"},
      {"[999C]", "no nuclide [999C]"},
      {"[C+9]", "larger charge than it has electrons"},
      {"[CH5]C", "the atom [CH5] at position 1 has more bonds"},
      {"C.[c]", "the atom [c] at position 3 is aromatic"},
  }));
  INFO(bad.smiles);
  const StructureFault fault = faultOf(bad.smiles);
  INFO(fault.what);
  CHECK(contains(fault.what, bad.said));
}

TEST_CASE("counts that would wrap round in a byte or two are refused", "[chem]") {
  // RDKit alone reads the first as methane, the second and third as a neutral carbon atom.
  CHECK(contains(faultOf("[CH260]").what, "number of hydrogens of [CH260] at position 1"));
  CHECK(contains(faultOf("C[C+256]").what, "charge of [C+256] at position 2"));
  CHECK(contains(faultOf("[C" + repeated("+", 256) + "]").what, "charge"));
  CHECK(contains(faultOf("[65549CH4]").what, "mass number"));
  CHECK(contains(faultOf("[U-16]").what, "charge"));
  CHECK(read("[Sn++]").formula == "Sn^2+");
  CHECK(read("N[Co@OH12](O)(F)(Cl)(Br)I").formula == "BrClCoFH3INO");
  CHECK(read("[Hf+4]").formula == "Hf^4+");
  CHECK(read("[15NH4+]").formula == "H4[15N]+");
}

TEST_CASE("a SMILES is read up to its limits and refused beyond", "[chem]") {
  CHECK(read(repeated("C", 1000)).formula == "C1000H2002");
  CHECK(contains(faultOf(repeated("C", 1001)).what, "more than 1000 atoms"));
  CHECK(contains(faultOf(repeated("C", 10'001)).what, "10001 characters"));
  // As long as allowed, but few atoms: the length alone is no reason.
  const std::string longest = "C" + repeated("[C@@H+0:1]", 999) + "CCCCCCCCC";
  REQUIRE(longest.size() == 10'000);
  CHECK(contains(faultOf(longest).what, "more than 1000 atoms"));
  CHECK(read(repeated("[CH2]", 1000)).formula == "C1000H2000");
  CHECK(contains(faultOf(repeated("(", 10'000)).what, "starts with a branch"));
  CHECK(contains(faultOf(repeated("[", 10'000)).what, "never closed"));
  CHECK(contains(faultOf(repeated("C(", 999)).what, "never closed"));
  CHECK(contains(faultOf("C" + repeated("(C)", 260)).what, "more bonds"));
  CHECK(read("C" + repeated("(C", 499) + repeated(")", 499)).heavyAtoms == 500);
}

TEST_CASE("an InChI that the library cannot make is left empty", "[chem]") {
  // More neighbours than libinchi's 20.
  const Identity identity = identify("[U]" + repeated("(F)", 21));
  CHECK(identity.inchi.empty());
  CHECK(identity.inchiKey.empty());
}

TEST_CASE("nothing is written to the error stream, whatever is read", "[chem]") {
  const std::string written = standardErrorOf([] {
    for (const char* smiles : {"CCX", "C(C", "C1CC", "CN(C)(C)(C)C", "c1cccc1", "[C@H](C)C",
                               "C/C=C", "[c]", "[CH99]", "CCO", "[Pt]", "CC=[N+]=[N-]"}) {
      static_cast<void>(engine().read(smiles));
      static_cast<void>(engine().identify(smiles));
      static_cast<void>(engine().drawSvg(smiles, 100, 100));
    }
  });
  CHECK(written.empty());
}

TEST_CASE("a drawing is an SVG of paths alone, black on nothing", "[chem]") {
  const std::string_view smiles =
      GENERATE(std::string_view("C1Cc2ccccc2N1"), std::string_view("C"),
               std::string_view("C[C@H](N)C(=O)[O-]"), std::string_view("[CH3]"),
               std::string_view("[2H]C([2H])([2H])C#N"), std::string_view("[NH4+].[Cl-]"),
               std::string_view("N->[Pt](<-N)(Cl)Cl"), k4CzIpn);
  INFO(smiles);
  const std::string svg = svgOf(smiles, 320, 240);
  CHECK(svg.starts_with("<svg xmlns='http://www.w3.org/2000/svg' width='320' height='240'"));
  CHECK(svg.ends_with("</svg>\n"));
  CHECK(contains(svg, "<path d='M "));
  for (const char* unwanted : {"<text", "<rect", "<metadata", "rdkit", "font", "class=", "#F"}) {
    INFO(unwanted);
    CHECK_FALSE(contains(svg, unwanted));
  }
  std::size_t colours = 0;
  for (std::size_t i = svg.find('#'); i != std::string::npos; i = svg.find('#', i + 1)) {
    ++colours;
    CHECK(svg.substr(i, 7) == "#000000");
  }
  CHECK(colours > 0);
  CHECK(svg.size() < 60'000);
}

TEST_CASE("all structures are drawn at one scale unless they do not fit", "[chem][identity]") {
  for (const char* smiles : {"C", "CC", "[H][H]", "C1Cc2ccccc2N1", k4CzIpn.data()}) {
    INFO(smiles);
    const auto extent = extentOf(smiles);
    CHECK(scaleOf(svgOf(smiles, 600, 600)) == 1.0);
    CHECK(scaleOf(svgOf(smiles, extent.width_px, extent.height_px)) == 1.0);
    CHECK(scaleOf(svgOf(smiles, extent.width_px / 2, 600)) == Approx(0.5).margin(0.03));
  }
}

TEST_CASE("extents follow from a bond length of 28 px", "[chem][identity]") {
  // Ethane is one level line of 28 px without labels; its height is the line's width.
  CHECK(extentOf("CC").width_px == Approx(29).margin(1));
  CHECK(extentOf("CC").height_px <= 3);
  // Benzene: a hexagon of side 28 px is 56 px from corner to corner, 48.5 px from side to side.
  const auto benzene = extentOf("c1ccccc1");
  CHECK(std::max(benzene.width_px, benzene.height_px) == Approx(57).margin(2));
  CHECK(std::min(benzene.width_px, benzene.height_px) == Approx(50).margin(2));
  // A chain grows by 28 px times sin 60 degrees for each carbon.
  const int growth = extentOf("CCCCCCCCCCCC").width_px - extentOf("CCCCCCCC").width_px;
  CHECK(growth == Approx(4 * 28 * 0.866).margin(1.5));
}

TEST_CASE("a crowded structure is laid out without atoms on each other", "[chem]") {
  // RDKit's own layout of 4CzIPN is 242 px by 260 px with carbazoles drawn over each other.
  const auto extent = extentOf(k4CzIpn);
  CHECK(extent.width_px * extent.height_px > 250 * 300);
}

TEST_CASE("a drawing of an impossible size is refused", "[chem]") {
  CHECK_FALSE(engine().drawSvg("CCO", 0, 100));
  CHECK_FALSE(engine().drawSvg("CCO", 100, -1));
  CHECK_FALSE(engine().drawSvg("CCO", 10'001, 100));
  CHECK(engine().drawSvg("CCO", 1, 1));
  CHECK(engine().drawSvg("CCO", 10'000, 10'000));
}

TEST_CASE("a drawing is the same whenever it is made", "[chem][identity]") {
  const std::string first = svgOf("C[C@H](N)C(=O)O", 200, 150);
  static_cast<void>(svgOf(k4CzIpn, 200, 150));  // chooses another layout in between
  CHECK(svgOf("C[C@H](N)C(=O)O", 200, 150) == first);
}

TEST_CASE("a missing, broken or foreign structure module is told in one sentence", "[chem]") {
  const auto directory = std::filesystem::temp_directory_path() /
                         ("vialkeeper-structure-test-" + std::to_string(getpid()));
  std::filesystem::create_directory(directory);
  {
    const WithModuleDirectory set(directory.string());
    const auto missing = openStructureModule(kReaderModule);
    REQUIRE_FALSE(missing);
    CHECK(contains(missing.error().what, directory.string()));
    CHECK(contains(missing.error().mend, "VIALKEEPER_MODULE_DIR"));

    std::ofstream(directory / kReaderModule.file) << "not a shared object";
    const auto broken = openStructureModule(kReaderModule);
    REQUIRE_FALSE(broken);
    CHECK(contains(broken.error().what, "does not load"));
    CHECK(contains(broken.error().mend, "librdkit1"));
  }
  std::filesystem::remove_all(directory);
  const auto foreign = openStructureModule(kReaderModule, kStructureModuleAbi + 1);
  REQUIRE_FALSE(foreign);
  CHECK(contains(foreign.error().what, "another version"));
  CHECK(openStructureModule(kReaderModule));
}
