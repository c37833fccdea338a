// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/surroundings.h"

#include <cstdlib>
#include <iostream>

#include "app/system_clock.h"

namespace vialkeeper::cli {

Surroundings& processSurroundings() {
  static app::SystemClock clock;
  static Surroundings surroundings{clock,
                                   [](const std::string& name) -> std::optional<std::string> {
                                     const char* value = std::getenv(name.c_str());
                                     return value != nullptr ? std::optional<std::string>(value)
                                                             : std::nullopt;
                                   },
                                   std::cin};
  return surroundings;
}

}  // namespace vialkeeper::cli
