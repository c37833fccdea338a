// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <string_view>
#include <utility>
#include <vector>

#include "text/fault.h"

namespace vialkeeper::chem {

/// One record of an SD file: a molfile with data items.
struct SdRecord {
  int number = 0;       ///< counted from 1
  int line = 0;         ///< of the file, where the record begins
  std::string molfile;  ///< up to `M  END`, with line feeds
  std::string title;    ///< the first line, without blanks around it
  std::vector<std::pair<std::string, std::string>> items =
      {};  ///< name and value; the lines of a value are separated by line feeds

  /// The value of the first item whose name is the same but for case, blanks, hyphens and
  /// underscores; empty where there is none.
  [[nodiscard]] std::string_view item(std::string_view name) const;
};

/// The records of an SD file (BIOVIA CTfile formats), structures unread. Line ends of any kind.
/// Faults, together: bytes that are no text, a record without `M  END`, no record at all.
[[nodiscard]] text::Checked<std::vector<SdRecord>> readSdFile(std::string_view bytes,
                                                              const std::string& file);

}  // namespace vialkeeper::chem
