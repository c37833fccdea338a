// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/writer_mark.h"

#include <fcntl.h>
#include <fmt/format.h>
#include <unistd.h>

#include <array>
#include <cerrno>
#include <fstream>

namespace vialkeeper::db {
namespace {

std::string markFile(const std::string& notebook) { return notebook + "-writer"; }

/// Takes a write lock on the first byte for this open file alone.
bool lock(int descriptor) {
  struct flock range {};
  range.l_type = F_WRLCK;
  range.l_whence = SEEK_SET;
  range.l_len = 1;
  return ::fcntl(descriptor, F_OFD_SETLK, &range) == 0;
}

}  // namespace

WriterMark::WriterMark(const std::string& notebook) : m_file(markFile(notebook)) {
  std::array<char, 256> host{};
  (void)::gethostname(host.data(), host.size() - 1);
  std::ofstream(m_file, std::ios::trunc) << "process " << ::getpid() << " on " << host.data();
}

WriterMark::~WriterMark() { ::unlink(m_file.c_str()); }

std::string writerOf(const std::string& notebook) {
  std::ifstream file(markFile(notebook));
  std::string line;
  std::getline(file, line);
  return line.substr(0, 200);
}

std::string lockingFault(const std::string& notebook) {
  const std::string probe = fmt::format("{}-lock-{}", notebook, ::getpid());
  const int first = ::open(probe.c_str(), O_RDWR | O_CREAT | O_CLOEXEC, 0600);
  if (first < 0) {
    return errno == EACCES || errno == EROFS || errno == EPERM
               ? "the folder may not be written"
               : "no file can be made in the folder";
  }
  const int second = ::open(probe.c_str(), O_RDWR | O_CLOEXEC);
  const bool firstLocked = lock(first);
  const bool secondLocked = second >= 0 && lock(second);
  ::close(first);
  if (second >= 0) ::close(second);
  ::unlink(probe.c_str());
  if (!firstLocked)
    return "the folder's file system does not lock files, so two writers could spoil the notebook";
  if (secondLocked) return "locks on the folder's file system do not keep a second writer out";
  return {};
}

}  // namespace vialkeeper::db
