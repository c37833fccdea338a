// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/text_files.h"

#include <fcntl.h>
#include <fmt/format.h>
#include <sys/stat.h>
#include <unistd.h>

#include <array>
#include <cerrno>
#include <cstring>
#include <filesystem>
#include <string_view>
#include <utility>

namespace vialkeeper::app {
namespace {

constexpr std::size_t kLargest = std::size_t{64} << 20U;

/// A file descriptor that closes itself.
class Descriptor {
 public:
  explicit Descriptor(int number) : m_number(number) {}
  Descriptor(const Descriptor&) = delete;
  Descriptor& operator=(const Descriptor&) = delete;
  ~Descriptor() {
    if (m_number >= 0) ::close(m_number);
  }
  [[nodiscard]] int number() const { return m_number; }
  [[nodiscard]] bool isOpen() const { return m_number >= 0; }
  [[nodiscard]] bool close() { return ::close(std::exchange(m_number, -1)) == 0; }

 private:
  int m_number;
};

std::unexpected<text::Faults> fault(const std::string& path, std::string what, std::string mend) {
  return std::unexpected(
      text::Faults{{.file = path, .what = std::move(what), .mend = std::move(mend)}});
}

std::unexpected<text::Faults> systemFault(const std::string& path, int error, bool writing) {
  switch (error) {
    case ENOENT:
      return writing ? fault(path, "the folder does not exist", "make it first or name another")
                     : fault(path, "there is no such file", "check the path");
    case ENOTDIR:
      return fault(path, "a part of the path is not a folder", "check the path");
    case EISDIR:
      return fault(path, "this is a folder, not a file", "name a file");
    case EACCES:
    case EPERM:
    case EROFS:
      return fault(path, writing ? "no permission to write here" : "no permission to read the file",
                   "choose another place, or ask for the permission");
    case ENOSPC:
    case EDQUOT:
      return fault(path, "the disk is full", "free some room; nothing was written");
    default:
      return fault(path, std::strerror(error), "check the path and the disk");
  }
}

bool writeAll(int descriptor, const std::string& bytes) {
  std::size_t done = 0;
  while (done < bytes.size()) {
    const ssize_t count = ::write(descriptor, bytes.data() + done, bytes.size() - done);
    if (count < 0 && errno == EINTR) continue;
    if (count < 0) return false;
    done += static_cast<std::size_t>(count);
  }
  return true;
}

}  // namespace

text::Checked<std::string> readFile(const std::string& path) {
  const Descriptor file(::open(path.c_str(), O_RDONLY | O_CLOEXEC | O_NONBLOCK));
  if (!file.isOpen()) return systemFault(path, errno, false);
  struct stat status {};
  if (::fstat(file.number(), &status) != 0) return systemFault(path, errno, false);
  if (S_ISDIR(status.st_mode)) return systemFault(path, EISDIR, false);
  std::string bytes;
  std::array<char, std::size_t{1} << 16U> block{};
  while (true) {
    const ssize_t count = ::read(file.number(), block.data(), block.size());
    if (count < 0 && errno == EINTR) continue;
    if (count < 0) return systemFault(path, errno, false);
    if (count == 0) return bytes;
    bytes.append(block.data(), static_cast<std::size_t>(count));
    if (bytes.size() > kLargest) {
      return fault(path, "the file is larger than 64 MiB", "check that this is the right file");
    }
  }
}

text::Checked<void> writeFile(const std::string& named, const std::string& bytes) {
  struct stat status {};
  std::string path = named;
  if (::stat(named.c_str(), &status) == 0) {
    if (S_ISDIR(status.st_mode)) return systemFault(named, EISDIR, true);
    if (!S_ISREG(status.st_mode))
      return fault(named, "this is a device, not a file", "name a file");
    // Behind a link it is the file that is replaced, not the link.
    std::error_code unresolved;
    const auto resolved = std::filesystem::canonical(named, unresolved);
    if (!unresolved) path = resolved.string();
  }
  const std::string temporary = fmt::format("{}.part-{}", path, ::getpid());
  Descriptor file(::open(temporary.c_str(), O_WRONLY | O_CREAT | O_EXCL | O_CLOEXEC, 0666));
  if (!file.isOpen()) return systemFault(path, errno, true);
  const bool written =
      writeAll(file.number(), bytes) && ::fsync(file.number()) == 0 && file.close();
  if (!written || ::rename(temporary.c_str(), path.c_str()) != 0) {
    const int error = errno;
    ::unlink(temporary.c_str());
    return systemFault(path, error, true);
  }
  return {};
}

text::Checked<void> writePdf(const std::string& path, const std::string& bytes) {
  struct stat status {};
  if (::stat(path.c_str(), &status) == 0 && S_ISREG(status.st_mode) && status.st_size > 0) {
    const Descriptor file(::open(path.c_str(), O_RDONLY | O_CLOEXEC));
    std::array<char, 5> head{};
    const bool pdf = file.isOpen() && ::read(file.number(), head.data(), head.size()) == 5 &&
                     std::string_view(head.data(), head.size()) == "%PDF-";
    if (!pdf) return fault(path, "there is a file of this name that is no PDF", "name another; nothing was changed");
  }
  return writeFile(path, bytes);
}

}  // namespace vialkeeper::app
