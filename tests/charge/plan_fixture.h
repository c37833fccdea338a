// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <variant>
#include <vector>

#include "charge/charge.h"
#include "charge/plan.h"
#include "charge/substances.h"
#include "charge/weighing.h"
#include "support/sample_plan.h"
#include "text/fault.h"

/// Plans for tests, written as their authors write them. No structures: every substance has a
/// formula.
namespace vialkeeper::tests {

/// A plan of these components with `[liquid]` as given and the first component's key limiting.
/// `head` stands behind the liquid section, for a vial or a seal.
[[nodiscard]] std::string planText(std::string_view liquid,
                                   const std::vector<std::string>& components,
                                   std::string_view head = {});

/// Reads, resolves and computes; a fault on the way fails the test and shows it.
[[nodiscard]] charge::Plan readGoodPlan(const std::string& text);
[[nodiscard]] charge::Substances substancesOf(const charge::Plan& plan);
[[nodiscard]] charge::Charge chargeOf(const charge::Plan& plan);
[[nodiscard]] charge::Charge chargeOf(const std::string& text);

/// The same, where one of the steps must refuse; all of its faults.
[[nodiscard]] text::Faults faultsOfPlan(const std::string& text);

struct Recorded {
  std::string key;
  std::variant<units::Mass, units::Volume> actual;
};
[[nodiscard]] charge::Charge weighed(const charge::Plan& plan,
                                     const std::vector<Recorded>& recorded,
                                     charge::Retarget retarget = charge::Retarget::kNo);

/// The component of that key; the test fails where it is missing.
[[nodiscard]] const charge::ComponentCharge& at(const charge::Charge& charge, std::string_view key);

/// Whether a notice of that code is among them.
[[nodiscard]] bool hasNotice(const text::Notices& notices, std::string_view code);

/// One line per fault, for comparison and for a failing test's output.
[[nodiscard]] std::vector<std::string> toLines(const text::Faults& faults);

}  // namespace vialkeeper::tests
