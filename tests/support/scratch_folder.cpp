// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "support/scratch_folder.h"

#include <cstdlib>
#include <filesystem>
#include <fstream>
#include <iterator>
#include <stdexcept>

namespace vialkeeper::tests {

namespace fs = std::filesystem;

ScratchFolder::ScratchFolder()
    : m_path((fs::temp_directory_path() / "vialkeeper-test-XXXXXX").string()) {
  if (::mkdtemp(m_path.data()) == nullptr)
    throw std::runtime_error("no temporary folder can be made");
}

ScratchFolder::~ScratchFolder() {
  std::error_code ignored;
  fs::permissions(m_path, fs::perms::owner_all, fs::perm_options::add, ignored);
  fs::remove_all(m_path, ignored);
}

std::string ScratchFolder::path(std::string_view name) const {
  return m_path + "/" + std::string(name);
}

std::string ScratchFolder::write(std::string_view name, std::string_view bytes) const {
  std::ofstream file(path(name), std::ios::binary);
  file << bytes;
  file.close();
  if (!file) throw std::runtime_error("cannot write " + path(name));
  return path(name);
}

void ScratchFolder::makeFolder(std::string_view name) const { fs::create_directory(path(name)); }

std::map<std::string, std::string> ScratchFolder::contents() const {
  std::map<std::string, std::string> all;
  for (const auto& entry : fs::recursive_directory_iterator(m_path)) {
    all[entry.path().string()] = entry.is_directory() ? "<folder>" : bytesOf(entry.path().string());
  }
  return all;
}

std::string ScratchFolder::withoutPath(std::string text) const {
  const std::string prefix = m_path + "/";
  for (std::size_t at = text.find(prefix); at != std::string::npos; at = text.find(prefix, at)) {
    text.erase(at, prefix.size());
  }
  return text;
}

std::string bytesOf(const std::string& path) {
  std::ifstream file(path, std::ios::binary);
  if (!file) throw std::runtime_error("cannot read " + path);
  return {std::istreambuf_iterator<char>(file), std::istreambuf_iterator<char>()};
}

}  // namespace vialkeeper::tests
