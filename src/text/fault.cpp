// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "text/fault.h"

#include "text/utf8.h"

namespace vialkeeper::text {

std::string toLine(const Fault& fault) {
  std::string line;
  if (!fault.file.empty()) line += oneLine(fault.file) + ":";
  if (fault.line > 0) line += std::to_string(fault.line) + ":";
  if (!fault.field.empty()) line += oneLine(fault.field) + ":";
  if (!line.empty()) line += " ";
  line += oneLine(fault.what);
  if (!fault.mend.empty()) line += ": " + oneLine(fault.mend);
  return line;
}

}  // namespace vialkeeper::text
