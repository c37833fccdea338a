// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <iosfwd>
#include <optional>
#include <string>

#include "app/notebook/desk.h"

namespace vialkeeper::cli {

/// What a command finds around it; tests bring their own.
struct Surroundings {
  app::Clock& clock;
  std::function<std::optional<std::string>(const std::string& name)> environment;
  std::istream& in;
};

/// The process's own clock, environment and standard input.
[[nodiscard]] Surroundings& processSurroundings();

}  // namespace vialkeeper::cli
