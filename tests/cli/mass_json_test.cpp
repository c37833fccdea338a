// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/command_bench.h"
#include "cli/json_fields.h"

using namespace vialkeeper::tests;

namespace {

struct MassCase {
  const char* written;
  const char* formula;
  double mass_g_mol;
  double margin;
};

}  // namespace

// Source: IUPAC/CIAAW abridged standard atomic weights 2021, five digits (Pure Appl. Chem. 94
// (2022) 573, Table 1): H 1.0080, C 12.011, N 14.007, O 15.999, S 32.06, Cl 35.45, Ni 58.693,
// Cu 63.546; deuterium and carbon-13 by their atomic masses (AME2020) 2.014102 and 13.003355.
// Summed by hand; the margin is half a unit in the last digit that the sum holds.
TEST_CASE("mass answers with Hill formula, molar mass and its uncertainty",
          "[cli][json][mass][published]") {
  const MassCase cases[] = {
      {"C8H9N", "C8H9N", 8 * 12.011 + 9 * 1.008 + 14.007, 0.005},
      {"D2O", "D2O", 2 * 2.014102 + 15.999, 0.001},
      {"CuSO4·5H2O", "CuH10O9S", 63.546 + 32.06 + 9 * 15.999 + 10 * 1.008, 0.01},
      {"CuSO4.5H2O", "CuH10O9S", 63.546 + 32.06 + 9 * 15.999 + 10 * 1.008, 0.01},
      {"CuSO4*5H2O", "CuH10O9S", 63.546 + 32.06 + 9 * 15.999 + 10 * 1.008, 0.01},
      {"NiCl2·6H2O", "Cl2H12NiO6", 58.693 + 2 * 35.45 + 12 * 1.008 + 6 * 15.999, 0.01},
      {"[13C]H4", "[13C]H4", 13.003355 + 4 * 1.008, 0.001},
      {"H2O", "H2O", 2 * 1.008 + 15.999, 0.001},
      {"(CH3)3CCO2H", "C5H10O2", 5 * 12.011 + 10 * 1.008 + 2 * 15.999, 0.005},
      {"  H2  ", "H2", 2 * 1.008, 0.001},
      {"C₆H₆", "C6H6", 6 * 12.011 + 6 * 1.008, 0.005},
  };
  for (const MassCase& each : cases) {
    INFO(each.written);
    const Ran ran = run({"mass", each.written, "--json"});
    REQUIRE(ran.status == 0);
    CHECK(ran.err.empty());
    checkOneObject(ran.out);
    const auto json = ran.json();
    CHECK(json.size() == 4);
    checkTexts(json, "formula");
    checkNumbers(json, "molar_mass_g_mol u_molar_mass_g_mol");
    checkNotices(json);
    CHECK(json["notices"].empty());
    CHECK(json["formula"] == each.formula);
    CHECK(json["molar_mass_g_mol"].get<double>() == Approx(each.mass_g_mol).margin(each.margin));
    CHECK(json["u_molar_mass_g_mol"].get<double>() > 0.0);
    CHECK(json["u_molar_mass_g_mol"].get<double>() < 0.02);
  }
}

TEST_CASE("a trailing charge is read in every spelling and takes or leaves electrons",
          "[cli][json][mass][identity]") {
  const double neutral = run({"mass", "Fe", "--json"}).json()["molar_mass_g_mol"].get<double>();
  for (const char* written : {"Fe2+", "Fe^2+", "Fe\u00B2\u207A"}) {
    INFO(written);
    const Ran ran = run({"mass", written, "--json"});
    REQUIRE(ran.status == 0);
    CHECK_THAT(ran.json()["formula"].get<std::string>(), Catch::Matchers::StartsWith("Fe"));
    CHECK(ran.json()["molar_mass_g_mol"].get<double>() <= neutral);
    CHECK(ran.json()["molar_mass_g_mol"].get<double>() == Approx(neutral).margin(0.002));
  }
  for (const char* written : {"Cl-", "NH4+", "SO4^2-", "[Fe(CN)6]4-"}) {
    INFO(written);
    CHECK(run({"mass", written, "--json"}).status == 0);
  }
}

TEST_CASE("the option --json may stand before or behind the verb and the bytes stay the same",
          "[cli][json][mass]") {
  const Ran behind = run({"mass", "CuSO4·5H2O", "--json"});
  CHECK(run({"--json", "mass", "CuSO4·5H2O"}).out == behind.out);
  CHECK(run({"mass", "--json", "CuSO4·5H2O"}).out == behind.out);
  CHECK(run({"mass", "CuSO4·5H2O", "--json"}).out == behind.out);
}

TEST_CASE("without --json the mass is one line for people", "[cli][mass]") {
  const Ran ran = run({"mass", "D2O"});
  CHECK(ran.status == 0);
  CHECK_THAT(ran.out, Catch::Matchers::StartsWith("D2O  20.027"));
  CHECK(ran.out.find('\n') == ran.out.size() - 1);
}
