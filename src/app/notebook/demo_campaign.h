// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>

#include "app/notebook/notebook.h"

/// The invented notebook: what the desktop, the pictures and the benchmarks stand on.
namespace vialkeeper::app {

/// All runs of the campaign; more than these are filled up in bulk (demo_bulk.h).
inline constexpr int kDemoCampaignRuns = 61;

struct DemoOptions {
  int runs = kDemoCampaignRuns;
  std::uint64_t seed = 20260504;  ///< one whose duplicates agree, but for two pairs
};

/// What was put into the notebook.
struct DemoSummary {
  std::int64_t runs = 0;
  std::int64_t events = 0;
  std::int64_t datasets = 0;
};

/// Fills an empty notebook with the campaign of three invented people, March to May 2026, through
/// the same use cases that a person works with. The same options give the same codes, texts and
/// numbers; ids are made anew. Fewer runs than the campaign has: its first ones. Faults: the
/// notebook is not empty, fewer than one run.
[[nodiscard]] Checked<DemoSummary> makeDemo(Notebook& notebook, const DemoOptions& options);

}  // namespace vialkeeper::app
