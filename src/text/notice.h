// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <string>
#include <vector>

namespace vialkeeper::text {

/// A caveat that travels with a valid result: an assumption it carries, a limit it touches.
struct Notice {
  std::string code;  ///< lower-case with hyphens, fixed: scripts match on it
  std::string text;  ///< one sentence for a person
  std::string at;    ///< what it belongs to, `component.nickel`; empty for the whole result

  bool operator==(const Notice&) const = default;
};

using Notices = std::vector<Notice>;

}  // namespace vialkeeper::text
