// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <string>
#include <string_view>
#include <variant>
#include <vector>

#include "charge/charge.h"
#include "charge/plan.h"
#include "charge/substances.h"
#include "text/fault.h"
#include "text/text_fault.h"

namespace vialkeeper::charge {

/// One recorded mass or volume of the material as supplied.
struct Weighing {
  std::string key;
  std::variant<units::Mass, units::Volume> actual;
  std::string asWritten;
  int line = 0;  ///< of the file it came from; 0 where there is none
};

using Weighings = std::vector<Weighing>;

/// Reads a weighed file, `key,actual`. Faults, all together: what readCsv refuses, other columns, a
/// key that the plan does not have or that stands twice, a quantity that cannot be read, a volume
/// of a solid, a mass of a gas or of a stock without density.
[[nodiscard]] text::Checked<Weighings> readWeighings(std::string_view bytes,
                                                     const std::string& file, const Plan& plan);

/// Whether the quantity is of a kind in which the component can be recorded; else why not.
[[nodiscard]] std::expected<void, text::TextFault> checkRecordable(
    const ComponentPlan& component, const std::variant<units::Mass, units::Volume>& actual);

enum class Retarget { kNo, kYes };

/// The charge with what was weighed and pipetted. Amounts are judged against the limiting component
/// as weighed, or as planned where it was not; concentrations against the recorded volumes, planned
/// ones where nothing is recorded. With Retarget::kYes every target but the limiting one's is
/// worked out again from its weighed amount first. Fault: a re-target without a weighing of the
/// limiting component; all that computeCharge refuses.
[[nodiscard]] text::Checked<Charge> chargeAsWeighed(const Plan& plan, const Substances& substances,
                                                    const Weighings& weighings,
                                                    Retarget retarget = Retarget::kNo);

}  // namespace vialkeeper::charge
