// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>

#include "app/notebook/desk.h"

namespace vialkeeper::app {

/// What is to be changed of a run's outcome and headings; what is not given stays.
struct ResultRequest {
  std::optional<std::string> yield = {};       ///< `71 %` or `71 ± 2 %`
  std::optional<std::string> conversion = {};  ///< the same
  std::optional<std::string> conclusion = {};
  std::optional<std::string> aim = {};
  std::optional<std::string> title = {};
  std::optional<std::string> state = {};  ///< `worked-up`, `closed`, …
  std::string reason = {};
};

/// Records results, words and the next state in one action. A result moves a charged or irradiating
/// run to worked up. Faults, together: a percentage that cannot be read or lies outside 0 to 110,
/// an unknown state, a step that the run's life does not allow or for which it wants a reason.
[[nodiscard]] Checked<RunRecord> recordResult(const Desk& desk, const RunRecord& run,
                                              const ResultRequest& request);

/// Puts results, headings, conclusion and state of a run back to what `before` has, as a new
/// change: how recordResult is undone. Fault: the run is sealed now, or the way back in its life
/// does not exist.
[[nodiscard]] Checked<RunRecord> restoreResult(const Desk& desk, const RunRecord& run,
                                               const RunRecord& before, const std::string& reason);

}  // namespace vialkeeper::app
