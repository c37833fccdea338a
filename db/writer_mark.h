// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

namespace vialkeeper::db {

/// A small file beside the notebook that says who is writing, while someone is. It locks nothing
/// (SQLite does); it only lets the one who waits be told for whom.
class WriterMark {
 public:
  explicit WriterMark(const std::string& notebook);
  WriterMark(const WriterMark&) = delete;
  WriterMark& operator=(const WriterMark&) = delete;
  ~WriterMark();

 private:
  std::string m_file;
};

/// `process 4711 on lab-3`, or empty where nobody left a mark.
[[nodiscard]] std::string writerOf(const std::string& notebook);

/// Why a notebook may not be written, and what would change that; both empty where it may.
struct WritingObstacle {
  std::string what;
  std::string mend;
};

/// Whether the notebook's folder may be written and its locks keep a second writer out: tries one
/// on a file of its own.
[[nodiscard]] WritingObstacle folderObstacle(const std::string& notebook);

/// The same, and whether the file itself may be written.
[[nodiscard]] WritingObstacle writingObstacle(const std::string& notebook);

}  // namespace vialkeeper::db
