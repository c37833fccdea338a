// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "app/plan_charge.h"
#include "cli/verb.h"

namespace vialkeeper::cli {

/// Whether the word names a run of the notebook: one is named, and no file of that name is there.
[[nodiscard]] bool isRunCode(const std::string& source, const CommonOptions& common);

/// The charge of a plan file, or of a run of the notebook with what is recorded of it. What the
/// request asks besides (a weighed file, another scale) is for plan files only.
[[nodiscard]] text::Checked<app::PlannedRun> plannedFrom(const std::string& source,
                                                         app::ChargeRequest request,
                                                         const CommonOptions& common);

}  // namespace vialkeeper::cli
