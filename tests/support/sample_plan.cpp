// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "support/sample_plan.h"

#include <algorithm>
#include <array>
#include <cstddef>
#include <vector>

namespace vialkeeper::tests {

std::string samplePlanText() {
  return R"(format = "vialkeeper-plan/1"
title  = "Indoline dehydrogenation, acid additive 3"
series = "acid additives"
date = "2026-03-04"
chemist = "A. N. Other"

[reaction]
limiting = "amine"
products = [ { key = "imine", name = "indole", formula = "C8H7N", per_limiting = 1.0 } ]
gases    = [ { species = "H2", per_limiting = 1.0 } ]

[vial]
name = "10 mL crimp vial"
volume = "11.6 mL"
u_volume = "0.1 mL"
displaced = "0.15 mL"
rated_gauge = "2.0 bar"
derating = 0.5

[seal]
atmosphere = { N2 = 0.9, O2 = 0.1 }
temperature = "21 degC"
pressure = "1.013 bar"
saturated = true
ambient = "1.01325 bar"

[irradiation]
lamp = "LED 440"
wavelength = "440 nm"
temperature = "35 degC"
duration = "20 h"

[liquid]
total = "2.0 mL"

[instruments]
u_pressure = "5 mbar"
u_pressure_shared = "2 mbar"
u_temperature = "0.5 K"

[[component]]
key = "amine"
role = "substrate"
name = "indoline"
formula = "C8H9N"
cas = "496-15-1"
amount = "0.200 mmol"
supply = { kind = "liquid", density = "1.063 g/mL", assay = 0.99 }
device = "balance-0.01mg"
hazards = ["H302", "H315"]

[[component]]
key = "pc"
role = "photocatalyst"
name = "4CzIPN"
formula = "C56H32N6"
mol_percent = 1
supply = { kind = "stock", concentration = "4.0 mM", solvent = "mecn" }
device = "pipette-1000uL"

[[component]]
key = "nickel"
role = "cocatalyst"
name = "nickel(II) bromide glyme"
formula = "C4H10Br2NiO2"
mol_percent = 5
supply = { kind = "solid", assay = 0.97 }
device = { kind = "balance", readability = "0.01 mg", repeatability = "0.02 mg" }
tolerance_percent = 3

[[component]]
key = "mecn"
role = "solvent"
name = "acetonitrile"
share = 9
device = "pipette-1000uL"

[[component]]
key = "water"
role = "solvent"
name = "water"
share = 1
)";
}

std::string mutated(const std::string& text, std::mt19937_64& random) {
  static const std::array<std::string, 26> pieces = {
      "\"", "[",   "]",   "[[",   "]]",  "{",      "}",    "=",          ",",
      ".",  "#",   "\n",  "\r\n", "'''", "\"\"\"", "\\",   "0",          "-",
      "e9", "nan", "inf", " mg",  "µ",   "\xC2",   "\x01", "share = 1\n"};
  std::string bytes = text;
  const std::size_t edits = random() % 2 == 0 ? 1 : 1 + random() % 4;
  for (std::size_t edit = 0; edit < edits && !bytes.empty(); ++edit) {
    const std::size_t place = random() % bytes.size();
    const std::size_t length = 1 + random() % 12;
    switch (random() % 8) {
      case 0:
        bytes.erase(place, length);
        break;
      case 1:
        bytes.insert(place, pieces[random() % pieces.size()]);
        break;
      case 2:
        bytes.insert(place, bytes.substr(random() % bytes.size(), length));
        break;
      case 3:
        bytes[place] = static_cast<char>(random() % 256);
        break;
      case 4:
        bytes.replace(place, length, pieces[random() % pieces.size()]);
        break;
      case 5:
      case 6: {  // another digit
        const std::size_t digit = bytes.find_first_of("0123456789", place);
        if (digit != std::string::npos) bytes[digit] = static_cast<char>('0' + random() % 10);
        break;
      }
      default: {  // a whole line again, somewhere else
        const std::size_t begin = bytes.rfind('\n', place) + 1;
        const std::size_t end = std::min(bytes.find('\n', place), bytes.size());
        const std::string line = bytes.substr(begin, end - begin) + "\n";
        bytes.insert(bytes.rfind('\n', random() % bytes.size()) + 1, line);
      }
    }
  }
  return bytes;
}

}  // namespace vialkeeper::tests
