// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <catch2/catch.hpp>

#include "cli/command_bench.h"

using namespace vialkeeper::tests;

namespace {

constexpr PlanFault kFaults[] = {
    {"no volume of the vial", "volume = \"11.6 mL\"\n", "", "7:vial.volume", "this is missing",
     "give the brim-full volume of the closed vial"},
    {"a stir bar larger than the vial", R"(volume = "11.6 mL")",
     "volume = \"11.6 mL\"\ndisplaced = \"12 mL\"", "9:vial.displaced",
     "stir bar and probe displace more than the vial holds", "check both volumes"},
    {"fractions that do not sum to 1", R"(atmosphere = "N2")",
     "atmosphere = { N2 = 0.9, O2 = 0.2 }", "11:seal.atmosphere", "the fractions sum to 1.1",
     "make them sum to 1"},
    {"an unknown atmosphere", R"(atmosphere = "N2")", R"(atmosphere = "He")", "11:seal.atmosphere",
     "'He' is no atmosphere", R"(write "N2", "Ar", "air" or fractions such as { N2 = 0.9, O2 =)"},
    {"an unknown gas in the atmosphere", R"(atmosphere = "N2")", "atmosphere = { SF6 = 1.0 }",
     "11:seal.atmosphere.SF6", "this field is not known here",
     "known here are H2, N2, O2, Ar, CO2, CO, CH4"},
    {"a fraction of the atmosphere above one", R"(atmosphere = "N2")", "atmosphere = { N2 = 1.5 }",
     "11:seal.atmosphere.N2", "1.5 lies outside the range", "give a number from 0 and at most 1"},
    {"an unknown evolved gas", R"(species = "H2")", R"(species = "He")",
     "6:reaction.gases[1].species", "'He' is no gas of the table",
     "choose among H2, N2, O2, Ar, CO2, CO, CH4"},
    {"an evolved gas twice", R"({ species = "H2", per_limiting = 1.0 })",
     R"({ species = "H2" }, { species = "H2" })", "6:reaction.gases[2].species",
     "H2 is listed twice", "list every gas once"},
    {"saturated in quotation marks", "saturated = true", R"(saturated = "yes")",
     "14:seal.saturated", "this is neither true nor false",
     "write true or false, without quotation marks"},
    {"no temperature of the seal", "temperature = \"21 degC\"\n", "", "10:seal.temperature",
     "this is missing", "give the temperature at sealing"},
    {"a seal without its pressure", "pressure = \"1.013 bar\"\n", "", "10:seal.pressure",
     "this is missing", "give the absolute pressure at sealing"},
    {"a seal without its atmosphere", "atmosphere = \"N2\"\n", "", "10:seal.atmosphere",
     "this is missing", R"(write "N2", "Ar", "air" or fractions such as { N2 = 0.9, O2 =)"},
    {"total and limiting_concentration", R"(total = "2.0 mL")",
     "total = \"2.0 mL\"\nlimiting_concentration = \"0.1 mol/L\"",
     "17:liquid.limiting_concentration", "the volume of the liquid is fixed twice",
     "keep total or limiting_concentration"},
    {"neither total nor limiting_concentration", "total = \"2.0 mL\"\n", "", "15:liquid",
     "nothing fixes the volume of the liquid", "give total or limiting_concentration"},
    {"no headspace", R"(volume = "11.6 mL")", R"(volume = "2.0 mL")", "16:liquid.total",
     "2000 µL of liquid leave no headspace in a vial of 2000 µL",
     "take a larger vial or less liquid"},
    {"volumes above the total", "share = 9", R"(volume = "2.1 mL")", "16:liquid.total",
     "the liquids come to 100 µL more than the total of 2000 µL",
     "raise the total or lower the volumes"},
    {"a stock without share above the total",
     R"(supply = { kind = "stock", concentration = "0.10 mol/L", solvent = "water" })",
     R"(supply = { kind = "stock", concentration = "2.0 mM", solvent = "DMF" })", "16:liquid.total",
     "the liquids come to 3000 µL more than the total of 2000 µL",
     "raise the total or lower the volumes"},
    {"a stock above the share of its solvent", R"("0.10 mol/L", solvent)", R"("20 mM", solvent)",
     "31:component.nickel.mol_percent",
     "the stock nickel brings 300 µL more of water than its share of 200 µL",
     "make the stock more concentrated, or the liquid's volume larger"},
};

}  // namespace

TEST_CASE("a vial, seal or liquid that cannot be is refused with the place", "[cli][faults]") {
  checkPlanFaults(kFaults);
}
