// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/system_clock.h"

#include <chrono>
#include <ctime>

namespace vialkeeper::app {

units::Moment SystemClock::now() {
  const auto utc = std::chrono::floor<std::chrono::milliseconds>(std::chrono::system_clock::now());
  const std::time_t seconds = std::chrono::system_clock::to_time_t(utc);
  std::tm local{};
  ::localtime_r(&seconds, &local);
  return {utc, std::chrono::minutes{local.tm_gmtoff / 60}};
}

std::string fileStamp(const units::Moment& now) {
  std::string stamp;
  for (const char c : toIsoText(now).substr(0, 19)) {
    if (c >= '0' && c <= '9') stamp += c;
    if (c == 'T') stamp += '-';
  }
  return stamp;
}

}  // namespace vialkeeper::app
