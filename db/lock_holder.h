// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

namespace vialkeeper::db {

/// A program that holds a lock on a file.
struct LockHolder {
  std::string program;   ///< `python3`; empty where the system does not tell
  int process = 0;       ///< 0: nobody was found
  bool writing = false;  ///< a lock that keeps readers out too, or is about to
};

/// Who else holds a lock on the file, a writer before a reader, as the system's list of locks tells
/// it. The file is not opened: closing it would drop the locks that this process has on it. Nobody
/// where there is no such list (another system, another computer's lock on a share).
[[nodiscard]] LockHolder lockHolderOf(const std::string& file);

}  // namespace vialkeeper::db
