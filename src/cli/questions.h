// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "text/fault.h"

namespace vialkeeper::cli {

/// What a use case asks before it takes a likely slip, as faults; `--yes` is the answer.
template <class Question>
[[nodiscard]] text::Faults questionsAsFaults(const std::string& place,
                                             const std::vector<Question>& questions) {
  text::Faults faults;
  for (const Question& question : questions) {
    faults.push_back({.field = place,
                      .what = question.what,
                      .mend = question.ask + " If it is right, add --yes"});
  }
  return faults;
}

}  // namespace vialkeeper::cli
