// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "app/notebook/demo_log.h"

/// The files that an invented run's instruments would have left.
namespace vialkeeper::app {

/// CSV of concentrations at the aliquots, `time [h],amine [mol/L],…`, with 1.5 % of noise.
[[nodiscard]] std::string demoCourseCsv(const DemoRunSpec& run, const DemoOutcome& outcome,
                                        const DemoLog& log, DemoRandom& random);

/// CSV of the recorded pressure, absolute: `time [h],pressure [bar],temperature [degC]`.
[[nodiscard]] std::string demoTraceCsv(const DemoLog& log);

}  // namespace vialkeeper::app
