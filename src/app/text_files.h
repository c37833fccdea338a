// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "text/fault.h"

namespace vialkeeper::app {

/// The bytes of a file that a person named. Faults: there is no such file, it is a folder, it may
/// not be read, it is larger than 64 MiB.
[[nodiscard]] text::Checked<std::string> readFile(const std::string& path);

/// Writes a file so that it is there whole or not at all: to a temporary name beside it, flushed to
/// the disk, then renamed. Faults: the folder is missing or not writable, the disk is full.
[[nodiscard]] text::Checked<void> writeFile(const std::string& path, const std::string& bytes);

/// Writes a PDF as writeFile does, over an older PDF if one is there, but over nothing else: a notebook, a
/// plan or a picture is never replaced by a page. Fault: the file that is there is no PDF.
[[nodiscard]] text::Checked<void> writePdf(const std::string& path, const std::string& bytes);

}  // namespace vialkeeper::app
