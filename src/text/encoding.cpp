// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/encoding.h"

#include <algorithm>

#include "text/utf8.h"

namespace vialkeeper::text {
namespace {

int lineOf(std::string_view bytes, std::size_t offset) {
  return 1 + static_cast<int>(std::ranges::count(bytes.substr(0, offset), '\n'));
}

}  // namespace

Faults encodingFaults(std::string_view bytes, const std::string& file) {
  if (bytes.starts_with("\xFF\xFE") || bytes.starts_with("\xFE\xFF")) {
    return {{.file = file, .line = 1, .what = "the file is UTF-16", .mend = "save it as UTF-8"}};
  }
  Faults faults;
  if (const auto nul = bytes.find('\0'); nul != std::string_view::npos) {
    faults.push_back({.file = file,
                      .line = lineOf(bytes, nul),
                      .what = "a NUL byte in a text file",
                      .mend = "save it as plain text in UTF-8"});
  }
  if (const auto bad = firstInvalidUtf8(bytes)) {
    faults.push_back({.file = file,
                      .line = lineOf(bytes, *bad),
                      .what = "bytes that are not UTF-8",
                      .mend = "save the file in the encoding UTF-8"});
  }
  return faults;
}

std::string_view withoutByteOrderMark(std::string_view bytes) {
  if (bytes.starts_with("\xEF\xBB\xBF")) bytes.remove_prefix(3);
  return bytes;
}

}  // namespace vialkeeper::text
