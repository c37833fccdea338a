// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>

#include "text/fault.h"

namespace vialkeeper::exports {

/// Sees to it that Qt can measure and draw text, and returns the font family to print in.
/// The desktop's application object is used where there is one; else one without a display is
/// made on the first call, silently and without a change to the process's locale, and kept.
/// Must first be called on the thread that runs main().
/// Fault: this system has no font.
[[nodiscard]] text::Checked<QString> startGuiSession();

}  // namespace vialkeeper::exports
