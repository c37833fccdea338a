// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <nlohmann/json.hpp>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "support/scratch_folder.h"

namespace vialkeeper::tests {

/// What a command left behind.
struct Ran {
  int status = -1;
  std::string out;
  std::string err;

  [[nodiscard]] std::vector<std::string> faults() const;  ///< the lines of `err`
  [[nodiscard]] nlohmann::json json() const;              ///< `out`, which must be one JSON object
};

/// Runs one command line in this process.
[[nodiscard]] Ran run(const std::vector<std::string>& arguments);

/// A sound plan of 49 lines: an indoline, a nickel stock, an acid, acetonitrile and water 9:1.
[[nodiscard]] const std::string& soundPlan();

/// The text with the one place where `what` stands changed into `by`; it must stand there once.
[[nodiscard]] std::string changed(const std::string& text, std::string_view what,
                                  std::string_view by);

/// One change that spoils the sound plan, and the fault that must be told of it.
struct PlanFault {
  const char* name;
  const char* what;   ///< text of the sound plan …
  const char* by;     ///< … and what stands in its place
  const char* place;  ///< LINE:FIELD
  const char* tells;  ///< words of what is wrong
  const char* mend;   ///< words of how to mend it
};

/// Runs `charge` on every spoilt plan: status 1, one line with its place, what and how in this
/// order, nothing on standard output, nothing written.
void checkPlanFaults(std::span<const PlanFault> faults);

/// The same for any command in a folder that holds its files.
void checkOneFault(const ScratchFolder& folder, const std::vector<std::string>& arguments,
                   int status, const std::string& place, const std::string& tells,
                   const std::string& mend);

}  // namespace vialkeeper::tests
