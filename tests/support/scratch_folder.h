// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <map>
#include <string>
#include <string_view>

namespace vialkeeper::tests {

/// A folder of a test's own, gone with it.
class ScratchFolder {
 public:
  ScratchFolder();
  ~ScratchFolder();
  ScratchFolder(const ScratchFolder&) = delete;
  ScratchFolder& operator=(const ScratchFolder&) = delete;

  /// The path of a file in the folder, there or not.
  [[nodiscard]] std::string path(std::string_view name) const;
  /// Puts the bytes there and gives the path.
  std::string write(std::string_view name, std::string_view bytes) const;
  void makeFolder(std::string_view name) const;
  /// What the folder holds: names and bytes, `<folder>` for a folder. Two equal ones: nothing was
  /// written.
  [[nodiscard]] std::map<std::string, std::string> contents() const;
  /// The text with the folder's own path taken out, so that `plan.toml:3: …` remains.
  [[nodiscard]] std::string withoutPath(std::string text) const;

 private:
  std::string m_path;
};

/// The bytes of a file that must be there.
[[nodiscard]] std::string bytesOf(const std::string& path);

}  // namespace vialkeeper::tests
