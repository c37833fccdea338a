// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/writer_mark.h"

#include <fcntl.h>
#include <fmt/format.h>
#include <unistd.h>

#include <array>
#include <cerrno>
#include <cstring>
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

WritingObstacle folderObstacle(const std::string& notebook) {
  constexpr const char* kElsewhere = "keep the notebook in a folder of this computer";
  const std::string probe = fmt::format("{}-lock-{}", notebook, ::getpid());
  const int first = ::open(probe.c_str(), O_RDWR | O_CREAT | O_CLOEXEC, 0600);
  if (first < 0) {
    switch (errno) {
      case EACCES:
      case EROFS:
      case EPERM:
        return {"its folder may not be written, where a change keeps its journal",
                "get permission to write in the folder, or work on a copy in a folder of yours"};
      case ENOSPC:
      case EDQUOT:
        return {"the disk is full", "free some room"};
      default:
        return {std::string("no file can be made in its folder: ") + std::strerror(errno),
                "check folder and disk"};
    }
  }
  const int second = ::open(probe.c_str(), O_RDWR | O_CLOEXEC);
  const bool firstLocked = lock(first);
  const bool secondLocked = second >= 0 && lock(second);
  ::close(first);
  if (second >= 0) ::close(second);
  ::unlink(probe.c_str());
  if (!firstLocked) {
    return {"the folder's file system does not lock files, so two writers could spoil the notebook",
            kElsewhere};
  }
  if (secondLocked)
    return {"locks on the folder's file system do not keep a second writer out", kElsewhere};
  return {};
}

WritingObstacle writingObstacle(const std::string& notebook) {
  if (WritingObstacle obstacle = folderObstacle(notebook); !obstacle.what.empty()) return obstacle;
  // Asked, not tried: a descriptor of the file, when closed, would take SQLite's locks with it.
  if (::faccessat(AT_FDCWD, notebook.c_str(), W_OK, AT_EACCESS) == 0) return {};
  return {"the file may not be written",
          "get permission to write the file, or work on a copy of yours"};
}

}  // namespace vialkeeper::db
