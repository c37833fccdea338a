// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <functional>
#include <memory>
#include <string>

#include "app/notebook/notebook.h"
#include "text/fault.h"

namespace vialkeeper::db {

/// Makes a new notebook file. Fault: there is a file of that name, the folder is missing or
/// read-only, locks do not work there.
[[nodiscard]] text::Checked<std::unique_ptr<app::Notebook>> createNotebook(const std::string& file);

/// Makes a notebook and fills it: the file gets its name once `fill` is through, so that none that
/// is half made stands there, whatever happens. Fault: as createNotebook(), or what `fill` says.
[[nodiscard]] text::Checked<void> makeNotebook(
    const std::string& file, const std::function<text::Checked<void>(app::Notebook&)>& fill);

enum class OpenFor { kReading, kWriting };

/// Opens a notebook file. A file of an older form is brought to the newest after a copy was made
/// beside it; a newer one, one that may not be written, or one on a folder where locks do not work
/// opens for reading only, and says why. `stamp` names that copy. Fault: no such file, no notebook,
/// damaged.
[[nodiscard]] text::Checked<std::unique_ptr<app::Notebook>> openNotebook(const std::string& file,
                                                                         OpenFor use,
                                                                         const std::string& stamp);

}  // namespace vialkeeper::db
