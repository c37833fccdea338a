// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

#include "app/notebook/notebook.h"

namespace vialkeeper::app {

/// One input or result in which runs differ: a value for every run, `–` where it has none.
struct Difference {
  std::string what;                 ///< `acid: pivalic acid`, `temperature`
  std::vector<std::string> values;  ///< in the order of the runs
};

struct RunComparison {
  std::vector<RunRecord> runs;
  std::vector<Difference> inputs;    ///< components, conditions, lots; amounts only where beyond 2u
  std::vector<Difference> outcomes;  ///< yield, conversion
  int sameInputs = 0;                ///< inputs in which all runs agree
};

/// Sets runs side by side. Components are matched by role and substance; loadings as charged, else
/// as planned, differ where they are further apart than twice their combined uncertainty, or 0.1 %
/// where none is known.
[[nodiscard]] Checked<RunComparison> compareRuns(Notebook& notebook,
                                              const std::vector<RunRecord>& runs);

}  // namespace vialkeeper::app
