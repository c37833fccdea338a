// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <iosfwd>
#include <span>
#include <string>

#include "cli/surroundings.h"

namespace vialkeeper::cli {

/// Runs one command line and gives its exit status: 0 done, 1 the input is at fault, 2 the command
/// line, 3 the notebook. On a fault nothing stands on `out` and every fault is a line on `err`.
/// `arguments` are those behind the program's name.
int run(std::span<const std::string> arguments, std::ostream& out, std::ostream& err,
        Surroundings& around = processSurroundings());

}  // namespace vialkeeper::cli
