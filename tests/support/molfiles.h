// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

/// Molfiles drawn by hand.
namespace vialkeeper::tests {

/// V2000.
[[nodiscard]] inline std::string ethanolMolfile() {
  return "ethanol\n  by hand\n\n"
         "  3  2  0  0  0  0  0  0  0  0999 V2000\n"
         "    0.0000    0.0000    0.0000 C   0  0\n"
         "    1.3000    0.7500    0.0000 C   0  0\n"
         "    2.6000    0.0000    0.0000 O   0  0\n"
         "  1  2  1  0\n"
         "  2  3  1  0\n"
         "M  END\n";
}

/// V3000.
[[nodiscard]] inline std::string acetonitrileMolfile() {
  return "acetonitrile\n  by hand\n\n"
         "  0  0  0     0  0            999 V3000\n"
         "M  V30 BEGIN CTAB\n"
         "M  V30 COUNTS 3 2 0 0 0\n"
         "M  V30 BEGIN ATOM\n"
         "M  V30 1 C 0 0 0 0\n"
         "M  V30 2 C 1.5 0 0 0\n"
         "M  V30 3 N 2.7 0 0 0\n"
         "M  V30 END ATOM\n"
         "M  V30 BEGIN BOND\n"
         "M  V30 1 1 1 2\n"
         "M  V30 2 3 2 3\n"
         "M  V30 END BOND\n"
         "M  V30 END CTAB\n"
         "M  END\n";
}

/// V2000 with a wedge; hydrogens of the hydroxyl are written as atoms.
[[nodiscard]] inline std::string lacticAcidMolfile() {
  return "lactic acid\n  by hand\n\n"
         "  7  6  0  0  1  0  0  0  0  0999 V2000\n"
         "    0.0000    0.0000    0.0000 C   0  0\n"
         "    0.0000    1.5000    0.0000 O   0  0\n"
         "   -1.3000   -0.7500    0.0000 C   0  0\n"
         "    1.3000   -0.7500    0.0000 C   0  0\n"
         "    1.3000   -2.2500    0.0000 O   0  0\n"
         "    2.6000    0.0000    0.0000 O   0  0\n"
         "    1.0000    2.2000    0.0000 H   0  0\n"
         "  1  2  1  1\n"
         "  1  3  1  0\n"
         "  1  4  1  0\n"
         "  4  5  2  0\n"
         "  4  6  1  0\n"
         "  2  7  1  0\n"
         "M  END\n";
}

}  // namespace vialkeeper::tests
