// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <span>
#include <string>

#include "charge/plan.h"
#include "text/fault.h"

namespace vialkeeper::charge {

/// A key as it stands in the file, also of an entry that is otherwise unreadable.
struct WrittenKey {
  std::string key;
  std::string path;  ///< `component[2]`
  int line = 0;
  bool product = false;
};

/// What does not fit together in a plan: repeated keys, a limiting component that is not there or
/// not absolute, a stock whose solvent is unknown, a basis that the supply cannot serve. Entries
/// that could not be read are known by their keys alone and draw no further faults.
void checkPlan(const Plan& plan, std::span<const WrittenKey> keys, text::Faults& faults);

}  // namespace vialkeeper::charge
