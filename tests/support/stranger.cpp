// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "support/stranger.h"

#include <grp.h>
#include <sys/wait.h>
#include <unistd.h>

#include <array>
#include <exception>
#include <stdexcept>

namespace vialkeeper::tests {
namespace {

constexpr unsigned kNobody = 65534;

bool giveRightsUp() {
  if (::geteuid() != 0) return true;
  return ::setgroups(0, nullptr) == 0 && ::setgid(kNobody) == 0 && ::setuid(kNobody) == 0;
}

[[noreturn]] void answer(int pipe, const std::function<std::string()>& work) {
  std::string text;
  try {
    text = work();
  } catch (const std::exception& error) {
    text = std::string("died: ") + error.what();
  }
  for (std::size_t done = 0; done < text.size();) {
    const ssize_t count = ::write(pipe, text.data() + done, text.size() - done);
    if (count <= 0) ::_exit(1);
    done += static_cast<std::size_t>(count);
  }
  ::_exit(0);  // nothing of the test framework runs in the child
}

}  // namespace

std::string inChild(const std::function<std::string()>& work) {
  std::array<int, 2> ends{};
  if (::pipe(ends.data()) != 0) throw std::runtime_error("no pipe");
  const pid_t pid = ::fork();
  if (pid == 0) {
    ::close(ends[0]);
    answer(ends[1], work);
  }
  ::close(ends[1]);
  std::string text;
  std::array<char, 4096> block{};
  for (ssize_t count = 0; (count = ::read(ends[0], block.data(), block.size())) > 0;)
    text.append(block.data(), static_cast<std::size_t>(count));
  ::close(ends[0]);
  int status = 0;
  ::waitpid(pid, &status, 0);
  return status == 0 ? text : "died: status " + std::to_string(status);
}

std::string asStranger(const std::function<std::string()>& work) {
  return inChild([&work] { return giveRightsUp() ? work() : "died: the rights stay"; });
}

}  // namespace vialkeeper::tests
