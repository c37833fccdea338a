// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <string>
#include <vector>

#include "app/notebook/demo_campaign.h"

namespace vialkeeper::app {

/// Substances that bulk runs are charged with, the most used first, and words of their
/// observations: what a benchmark may look for.
struct DemoVocabulary {
  std::vector<std::string> photocatalysts;
  std::vector<std::string> cocatalysts;
  std::vector<std::string> acids;
  std::vector<std::string> additives;
  std::vector<std::string> words;
};

[[nodiscard]] const DemoVocabulary& demoVocabulary();

/// Adds so many plain invented runs of exactly 8 components and 10 events each, 500 in one action,
/// dated before the campaign. About 300 substances are used as a group would: few often, most
/// seldom. The charge is worked out once a variant and scaled with the loadings; each run's plan
/// agrees with its record. People and substances that are missing are added. Fault: a negative
/// number.
[[nodiscard]] Checked<DemoSummary> fillWithRuns(Notebook& notebook, std::int64_t runs,
                                                const DemoOptions& options);

}  // namespace vialkeeper::app
