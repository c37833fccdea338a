// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "db/open_files.h"

#include <sys/stat.h>

#include <fstream>
#include <map>
#include <mutex>

namespace vialkeeper::db {
namespace {

using Identity = std::pair<std::uint64_t, std::uint64_t>;  // device and inode

struct Registry {
  std::mutex mutex;
  std::map<Identity, int> open;
};

Registry& registry() {
  static Registry instance;
  return instance;
}

std::optional<Identity> identityOf(const std::string& file) {
  struct stat status {};
  if (::stat(file.c_str(), &status) != 0) return std::nullopt;
  return Identity{status.st_dev, status.st_ino};
}

}  // namespace

OpenFile::OpenFile(const std::string& file) {
  const std::scoped_lock guard(registry().mutex);
  m_identity = identityOf(file);
  if (m_identity) ++registry().open[*m_identity];
}

OpenFile::~OpenFile() {
  if (!m_identity) return;
  const std::scoped_lock guard(registry().mutex);
  const auto found = registry().open.find(*m_identity);
  if (--found->second == 0) registry().open.erase(found);
}

std::optional<std::string> firstBytes(const std::string& file, std::size_t count) {
  // Held while the file is read: nobody may open it for SQLite meanwhile.
  const std::scoped_lock guard(registry().mutex);
  const auto identity = identityOf(file);
  if (identity && registry().open.contains(*identity)) return std::nullopt;
  std::ifstream stream(file, std::ios::binary);
  std::string bytes(count, '\0');
  stream.read(bytes.data(), static_cast<std::streamsize>(count));
  bytes.resize(static_cast<std::size_t>(stream.gcount()));
  return bytes;
}

}  // namespace vialkeeper::db
