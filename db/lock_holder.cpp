// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/lock_holder.h"

#include <fmt/format.h>
#include <sys/stat.h>
#include <sys/sysmacros.h>
#include <unistd.h>

#include <fstream>
#include <sstream>

namespace vialkeeper::db {
namespace {

/// The file as /proc/locks names it: device and inode.
std::string placeOf(const std::string& file) {
  struct stat status {};
  if (::stat(file.c_str(), &status) != 0) return {};
  return fmt::format("{:02x}:{:02x}:{}", major(status.st_dev), minor(status.st_dev), status.st_ino);
}

std::string programOf(int process) {
  std::ifstream stream(fmt::format("/proc/{}/comm", process));
  std::string name;
  std::getline(stream, name);
  return name;
}

}  // namespace

LockHolder lockHolderOf(const std::string& file) {
  LockHolder found;
  const std::string place = placeOf(file);
  std::ifstream stream("/proc/locks");
  // 1: POSIX  ADVISORY  WRITE 4711 08:01:131 1073741825 1073741825; one that waits has `->` second.
  for (std::string line; !place.empty() && std::getline(stream, line);) {
    std::istringstream words(line);
    std::string number, kind, rule, access, where;
    int process = 0;
    if (!(words >> number >> kind >> rule >> access >> process >> where)) continue;
    const bool writing = access == "WRITE";
    if (where != place || process <= 0 || process == ::getpid()) continue;
    if (found.process == 0 || (writing && !found.writing)) found = {{}, process, writing};
  }
  if (found.process != 0) found.program = programOf(found.process);
  return found;
}

}  // namespace vialkeeper::db
