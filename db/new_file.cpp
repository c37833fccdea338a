// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/new_file.h"

#include <fcntl.h>
#include <fmt/format.h>
#include <sys/stat.h>
#include <unistd.h>

#include <cerrno>
#include <cstdio>
#include <cstring>
#include <filesystem>
#include <utility>

namespace vialkeeper::db {
namespace {

namespace fs = std::filesystem;

std::unexpected<text::Faults> fault(const std::string& file, std::string what, std::string mend) {
  return std::unexpected(text::Faults{{.kind = text::FaultKind::kNotebook,
                                       .file = file,
                                       .what = std::move(what),
                                       .mend = std::move(mend)}});
}

std::unexpected<text::Faults> isThereFault(const std::string& file) {
  return fault(file, "there is a file of this name already", "name another; nothing was changed");
}

void flushToDisk(const std::string& file) {
  const int descriptor = ::open(file.c_str(), O_RDONLY | O_CLOEXEC);
  if (descriptor < 0) return;
  ::fsync(descriptor);
  ::close(descriptor);
}

/// 0, or the error. A file system without the one call that never replaces gets a second name and
/// loses the first.
int renameWithoutReplacing(const std::string& from, const std::string& to) {
  if (::renameat2(AT_FDCWD, from.c_str(), AT_FDCWD, to.c_str(), RENAME_NOREPLACE) == 0) return 0;
  if (errno != EINVAL && errno != ENOSYS) return errno;
  if (::link(from.c_str(), to.c_str()) != 0) return errno;
  ::unlink(from.c_str());
  return 0;
}

}  // namespace

NewFile::NewFile(std::string named)
    : m_named(std::move(named)), m_temporary(fmt::format("{}.part-{}", m_named, ::getpid())) {}

NewFile::~NewFile() {
  for (const char* suffix : {"", "-journal"}) ::unlink((m_temporary + suffix).c_str());
}

text::Checked<void> NewFile::check() const {
  struct stat status {};
  if (::lstat(m_named.c_str(), &status) == 0) return isThereFault(m_named);
  std::error_code ignored;
  const fs::path folder = fs::absolute(m_named, ignored).parent_path();
  if (!fs::exists(folder, ignored))
    return fault(m_named, "the folder does not exist", "make it first");
  if (!fs::is_directory(folder, ignored))
    return fault(m_named, "a part of the path is not a folder", "check the path");
  if (::faccessat(AT_FDCWD, folder.c_str(), W_OK | X_OK, AT_EACCESS) != 0) {
    return fault(m_named, "the folder may not be written",
                 "name another folder, or get permission to write in this one");
  }
  return {};
}

text::Checked<void> NewFile::giveName() {
  flushToDisk(m_temporary);
  if (const int error = renameWithoutReplacing(m_temporary, m_named); error == EEXIST) {
    return isThereFault(m_named);
  } else if (error != 0) {
    return fault(m_named, std::string("the file could not get its name: ") + std::strerror(error),
                 "check the folder");
  }
  std::error_code ignored;
  flushToDisk(fs::absolute(m_named, ignored).parent_path().string());
  return {};
}

}  // namespace vialkeeper::db
