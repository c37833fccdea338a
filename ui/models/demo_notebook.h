// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>

#include "text/fault.h"
#include "ui/models/notebook_files.h"

namespace vialkeeper::ui {

/// The file of the invented notebook, in the user's data folder; made if it is not there yet.
/// Takes seconds. A demo that was not finished is never seen: it gets its name at the end.
[[nodiscard]] text::Checked<QString> demoNotebook(NotebookFiles& files);

}  // namespace vialkeeper::ui
