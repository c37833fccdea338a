// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "app/notebook/run_plan.h"
#include "text/notice.h"

namespace vialkeeper::app {

/// The notice `title-kept`: the title is still the plan's, though it speaks of what was set
/// otherwise; of a component by key, role or name, or of a figure in the same unit. Added at most
/// once.
void noteKeptTitle(const NewRun& wanted, const charge::Plan& plan, text::Notices& notices);

}  // namespace vialkeeper::app
