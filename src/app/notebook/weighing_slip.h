// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

#include "charge/charge.h"
#include "charge/plan.h"
#include "units/quantity.h"

namespace vialkeeper::app {

using Recorded = std::variant<units::Mass, units::Volume>;

enum class SlipKind {
  kUnit,           ///< a factor of 1000 or 10^6: the unit's prefix
  kDecimalSign,    ///< a factor of 10 or 100
  kOtherQuantity,  ///< a mass where a volume is usual, or the reverse
  kOffTarget,      ///< more than 25 % off
};

/// One question to ask before a recorded quantity is taken.
struct SlipQuestion {
  SlipKind kind;
  std::string
      what;  ///< what is odd, without a full stop: `26.9 g is 1000 times the target of 26.8 mg`
  std::string ask;                 ///< `did you mean 26.9 mg?`
  std::optional<Recorded> likely;  ///< the value that was probably meant
  std::string likelyText;          ///< the same as it would be typed: `26.9 mg`; empty without one
};

/// Looks whether what was recorded for a component looks like a slip: a power of ten from its
/// target (10, 100, 1000 or 10^6 times, either way, within 25 %), of the other quantity than its
/// supply or device suggests, or more than 25 % off. At most one question of each sort; none where
/// all is well. `target` and `plan` are the same component; a stock that is weighed is judged by
/// its density. `asWritten` is what was typed; where it can be read, the answer keeps its figures.
[[nodiscard]] std::vector<SlipQuestion> questionWeighing(const charge::ComponentPlan& plan,
                                                         const charge::ComponentCharge& target,
                                                         const Recorded& actual,
                                                         std::string_view asWritten);

}  // namespace vialkeeper::app
