// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <cstdint>
#include <optional>
#include <string>
#include <utility>

namespace vialkeeper::db {

/// A notebook file that a connection of this process has open, for as long as the object lives.
///
/// The system drops all locks that a process holds on a file as soon as the process closes any
/// handle to it (POSIX advisory locks). SQLite knows that of its own handles; a file that we read
/// ourselves beside it would take the lock from under a transaction. So the bytes of a file are
/// only ever read through firstBytes(), which leaves a file alone that is open.
class OpenFile {
 public:
  explicit OpenFile(const std::string& file);
  ~OpenFile();
  OpenFile(const OpenFile&) = delete;
  OpenFile& operator=(const OpenFile&) = delete;

 private:
  std::optional<std::pair<std::uint64_t, std::uint64_t>> m_identity;
};

/// The first bytes of a file, fewer where it is shorter; nothing where a connection of this process
/// has it open, which has looked at them.
[[nodiscard]] std::optional<std::string> firstBytes(const std::string& file, std::size_t count);

}  // namespace vialkeeper::db
