// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "app/notebook/log_run.h"

namespace vialkeeper::app {

/// The entry of that number, whose place a new one may take. Fault: there is none, or another has
/// its place already; the field is `event`.
[[nodiscard]] Checked<NumberedEvent> entryToReplace(Notebook& notebook, const RunRecord& run,
                                                    int number);

}  // namespace vialkeeper::app
