// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "chem/module_directories.h"

#include <cstdlib>
#include <system_error>

namespace vialkeeper::chem {

namespace fs = std::filesystem;

std::vector<std::filesystem::path> moduleDirectories() {
  if (const char* named = std::getenv("VIALKEEPER_MODULE_DIR"); named != nullptr && *named != '\0') {
    return {fs::path(named)};
  }
  std::vector<fs::path> directories;
  std::error_code unreadable;
  const fs::path program = fs::read_symlink("/proc/self/exe", unreadable);
  if (!unreadable) {
    directories.push_back(program.parent_path().parent_path() / "lib" / "vialkeeper");
  }
#ifdef VIALKEEPER_MODULE_INSTALL_DIR
  const fs::path installed(VIALKEEPER_MODULE_INSTALL_DIR);  // absolute, or below the prefix
  if (installed.is_absolute()) {
    directories.push_back(installed);
  } else if (!unreadable) {
    directories.push_back(program.parent_path().parent_path() / installed);
  }
#endif
  return directories;
}

}  // namespace vialkeeper::chem
