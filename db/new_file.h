// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>

#include "text/fault.h"

namespace vialkeeper::db {

/// A file that is made under a name of its own beside the one it is to have, and gets that name
/// when it is whole: until then, and if the program is ended, nothing stands there. Gone with this
/// object if it never got its name.
class NewFile {
 public:
  explicit NewFile(std::string named);
  NewFile(const NewFile&) = delete;
  NewFile& operator=(const NewFile&) = delete;
  ~NewFile();

  /// Fault: there is a file of that name, the folder is missing or may not be written.
  [[nodiscard]] text::Checked<void> check() const;
  /// The name under which it is made.
  [[nodiscard]] const std::string& temporary() const { return m_temporary; }
  /// Flushes it and gives it its name. Fault: a file of that name came about meanwhile; it is never
  /// replaced.
  [[nodiscard]] text::Checked<void> giveName();

 private:
  std::string m_named;
  std::string m_temporary;
};

}  // namespace vialkeeper::db
