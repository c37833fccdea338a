// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>

#include "app/plan_charge.h"
#include "text/fault.h"

namespace CLI {
class App;
}

namespace vialkeeper::cli {

/// Options that rescale a plan before anything is worked out.
struct ScaleOptions {
  std::optional<std::string> scaleTo;
  std::optional<std::string> scaleToVial;
};

void addScaleOptions(CLI::App& parser, ScaleOptions& options);

/// Puts the options into the request; the faults of those that cannot be read.
[[nodiscard]] text::Faults readScale(const ScaleOptions& options, app::ChargeRequest& request);

}  // namespace vialkeeper::cli
