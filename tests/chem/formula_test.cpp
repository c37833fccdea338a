// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/formula.h"

#include <catch2/catch.hpp>

using namespace vialkeeper;
using chem::AtomKind;
using chem::Composition;
using chem::parseFormula;
using chem::toHillFormula;

namespace {

Composition parsed(const std::string& formula) {
  INFO(formula);
  const auto composition = parseFormula(formula);
  REQUIRE(composition);
  return *composition;
}

struct Same {
  const char* formula;
  const char* hill;
};

}  // namespace

TEST_CASE("formulas in Hill's order are those that are printed as examples of it",
          "[chem][published]") {
  // Hill, J. Am. Chem. Soc. 22 (1900) 478; the list BrH, BrI, CH3I, C2H5Br, HI of the encyclopedias
  // on his system (seen at en-academic.com dic.nsf/enwiki/8164 and wikidoc.org).
  for (const auto& [formula, hill] : std::vector<Same>{{"HBr", "BrH"},
                                                       {"IBr", "BrI"},
                                                       {"CH3I", "CH3I"},
                                                       {"CH3CH2Br", "C2H5Br"},
                                                       {"HI", "HI"}}) {
    CHECK(toHillFormula(parsed(formula)) == hill);
  }
  // Without carbon all by symbol; with carbon and no hydrogen the rest by symbol.
  CHECK(toHillFormula(parsed("H2SO4")) == "H2O4S");
  CHECK(toHillFormula(parsed("CCl4")) == "CCl4");
  CHECK(toHillFormula(parsed("NaOH")) == "HNaO");
  CHECK(toHillFormula(parsed("CoCO3")) == "CCoO3");
}

TEST_CASE("brackets nest, multiply and may be of three kinds", "[chem]") {
  for (const auto& [formula, hill] : std::vector<Same>{{"Ca3(PO4)2", "Ca3O8P2"},
                                                       {"Mg(OH)2", "H2MgO2"},
                                                       {"K3[Fe(C2O4)3]", "C6FeK3O12"},
                                                       {"Al2{[(OH)2]3(SO4)}2", "Al2H12O20S2"},
                                                       {"((((C))))", "C"},
                                                       {"(CH3)3CCO2H", "C5H10O2"},
                                                       {"[Ru(C10H8N2)3](PF6)2", "C30H24F12N6P2Ru"},
                                                       {"C", "C"},
                                                       {"Co", "Co"},
                                                       {"CO", "CO"},
                                                       {"No", "No"},
                                                       {"NO", "NO"},
                                                       {"HOH", "H2O"}}) {
    CHECK(toHillFormula(parsed(formula)) == hill);
  }
}

TEST_CASE("hydrates are read with every joining point and merged", "[chem]") {
  const Composition blue = parsed("CuH10O9S");
  for (const char* formula :
       {"CuSO4·5H2O", "CuSO4*5H2O", "CuSO4.5H2O", "CuSO4∙5H2O", "CuSO4⋅5H2O", "CuSO4•5H2O",
        "5H2O·CuSO4", "CuSO₄·5H₂O", "CuSO4·2H2O·3H2O", "CuSO4·5(H2O)", "CuSO4·1H2O·4H2O"}) {
    INFO(formula);
    CHECK(parsed(formula) == blue);
  }
  CHECK(parsed("H2PtCl6·6H2O") == parsed("H14Cl6O6Pt"));
  CHECK(parsed("C4H10O2·NiBr2") == parsed("C4H10Br2NiO2"));
}

TEST_CASE("a hemihydrate has half atoms, and twice of it is whole", "[chem][identity]") {
  const Composition half = parsed("CaSO4·0.5H2O");
  CHECK(half.atoms.at({"H", 0}) == 1.0);
  CHECK(half.atoms.at({"O", 0}) == 4.5);
  CHECK(parsed("CaSO4.0.5H2O") == half);
  CHECK(toHillFormula(half) == "CaHO4.5S");
  const auto one = chem::molarMass(half);
  const auto two = chem::molarMass(parsed("Ca2S2O8·H2O"));
  REQUIRE(one);
  REQUIRE(two);
  CHECK(2.0 * one->value.si() == Approx(two->value.si()).epsilon(1e-14));
}

TEST_CASE("charges are told from counts as chemists tell them", "[chem]") {
  struct Charged {
    const char* formula;
    const char* atoms;
    int charge;
  };
  for (const auto& [formula, atoms, charge] :
       std::vector<Charged>{{"Ca2+", "Ca", 2},
                            {"Na+", "Na", 1},
                            {"Cl-", "Cl", -1},
                            {"Fe3+", "Fe", 3},
                            {"O2-", "O", -2},
                            {"H+", "H", 1},
                            {"D+", "D", 1},
                            {"NH4+", "NH4", 1},
                            {"H3O+", "H3O", 1},
                            {"PF6-", "PF6", -1},
                            {"BF4-", "BF4", -1},
                            {"ClO4-", "ClO4", -1},
                            {"HCO3-", "HCO3", -1},
                            {"SO4^2-", "SO4", -2},
                            {"SO42-", "SO4", -2},
                            {"PO43-", "PO4", -3},
                            {"Cr2O72-", "Cr2O7", -2},
                            {"S2O32-", "S2O3", -2},
                            {"P2O74-", "P2O7", -4},
                            {"S8O11-", "S8O11", -1},
                            {"S8O15-", "S8O15", -1},
                            {"Hg22+", "Hg2", 2},
                            {"[Fe(CN)6]4-", "Fe(CN)6", -4},
                            {"Fe(CN)6^3-", "Fe(CN)6", -3},
                            {"[Fe(CN)6]^4-", "Fe(CN)6", -4},
                            {"[Ru(C10H8N2)3]2+", "Ru(C10H8N2)3", 2},
                            {"[I3]-", "I3", -1},
                            {"[O2]-", "O2", -1},
                            {"C8H12+", "C8H12", 1},
                            {"C10H14+", "C10H14", 1},
                            {"C60-", "C60", -1},
                            {"SO₄²⁻", "SO4", -2},
                            {"Ca²⁺", "Ca", 2},
                            {"NH₄⁺", "NH4", 1},
                            {"[Fe(CN)₆]⁴⁻", "Fe(CN)6", -4},
                            {"SO4^2−", "SO4", -2},
                            {"V10O28^6-", "V10O28", -6},
                            {"PW12O40^3-", "PW12O40", -3},
                            {"Na^+", "Na", 1},
                            {"C^12-", "C", -12}}) {
    INFO(formula);
    const Composition composition = parsed(formula);
    CHECK(composition.charge == charge);
    CHECK(composition.atoms == parsed(atoms).atoms);
  }
}

TEST_CASE("isotopes are atoms of a kind of their own", "[chem]") {
  CHECK(parsed("D2O").atoms == std::map<AtomKind, double>{{{"H", 2}, 2.0}, {{"O", 0}, 1.0}});
  CHECK(parsed("T2O").atoms.at({"H", 3}) == 2.0);
  CHECK(parsed("CDCl3") == parsed("C[2H]Cl3"));
  CHECK(parsed("[13C]6H12O6").atoms.at({"C", 13}) == 6.0);
  CHECK(parsed("[13C6]H12O6") == parsed("[13C]6H12O6"));
  CHECK(parsed("[13CH3]OH").atoms ==
        std::map<AtomKind, double>{{{"C", 13}, 1.0}, {{"H", 0}, 4.0}, {{"O", 0}, 1.0}});
  CHECK(parsed("[13CH3]2").atoms == std::map<AtomKind, double>{{{"C", 13}, 2.0}, {{"H", 0}, 6.0}});
  CHECK(parsed("C[13C]H4").atoms.at({"C", 0}) == 1.0);
  CHECK(parsed("Dy").atoms.contains({"Dy", 0}));
  CHECK(parsed("Ti").atoms.contains({"Ti", 0}));
}

TEST_CASE("heavy hydrogen stands with hydrogen, other nuclides in brackets behind their element",
          "[chem]") {
  for (const auto& [formula, hill] : std::vector<Same>{{"D2O", "D2O"},
                                                       {"CDCl3", "CDCl3"},
                                                       {"CH3OD", "CH3DO"},
                                                       {"[13C]6H12O6", "[13C]6H12O6"},
                                                       {"[13CH3]OH", "[13C]H4O"},
                                                       {"CH3[13C]H2OH", "C[13C]H6O"},
                                                       {"H2[18O]", "H2[18O]"},
                                                       {"T2O", "T2O"},
                                                       {"[15N]H4+", "H4[15N]+"},
                                                       {"[Fe(CN)6]4-", "C6FeN6^4-"}}) {
    CHECK(toHillFormula(parsed(formula)) == hill);
  }
}

TEST_CASE("a mass number that contradicts D or T is refused", "[chem]") {
  CHECK(parsed("[2D]2O") == parsed("D2O"));
  CHECK_FALSE(parseFormula("[13D]2O"));
  CHECK_FALSE(parseFormula("[2T]2O"));
}
