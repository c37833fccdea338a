// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <exception>
#include <iostream>
#include <string>
#include <vector>

#include "cli/command_line.h"

int main(int argc, char** argv) {
  const std::vector<std::string> arguments(argv + 1, argv + argc);
  try {
    return vialkeeper::cli::run(arguments, std::cout, std::cerr);
  } catch (const std::exception& error) {
    // A fault of the program's, not of the input: nothing was printed and nothing written.
    std::cerr << "vialkeeper: internal fault, please report it: " << error.what() << '\n';
    return 70;
  }
}
