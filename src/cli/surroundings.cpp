// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "cli/surroundings.h"

#include <chrono>
#include <cstdlib>
#include <ctime>
#include <iostream>

namespace vialkeeper::cli {

units::Moment SystemClock::now() {
  const auto utc = std::chrono::floor<std::chrono::milliseconds>(std::chrono::system_clock::now());
  const std::time_t seconds = std::chrono::system_clock::to_time_t(utc);
  std::tm local{};
  ::localtime_r(&seconds, &local);
  return {utc, std::chrono::minutes{local.tm_gmtoff / 60}};
}

Surroundings& processSurroundings() {
  static SystemClock clock;
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
