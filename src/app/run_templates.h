// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <span>

#include "text/embedded_file.h"

namespace vialkeeper::app {

/// The plans to start from that come with the program, linked in; their names are those of the
/// files in templates/runs.
[[nodiscard]] std::span<const text::EmbeddedFile> runTemplates();

}  // namespace vialkeeper::app
