// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <expected>
#include <string>
#include <vector>

namespace vialkeeper::text {

/// Who has to act on a fault. The command line's exit status follows from it.
enum class FaultKind {
  kInput,     ///< a file or value of the user's is at fault
  kUsage,     ///< the command line itself is at fault
  kNotebook,  ///< the notebook file is locked, damaged, newer or missing
};

/// One thing that is wrong, in the three parts every message has: where, what, how to mend it.
struct Fault {
  FaultKind kind = FaultKind::kInput;
  std::string file = {};   ///< empty where no file is involved
  int line = 0;            ///< counted from 1; 0 where unknown
  std::string field = {};  ///< `component.amine.amount`, `reaction.limiting`, an option's name
  std::string what = {};   ///< what is wrong, without a full stop
  std::string mend = {};   ///< what to do about it, without a full stop
};

/// All faults of one file or call: they are told together, never one at a time.
using Faults = std::vector<Fault>;

/// A value, or every reason why there is none.
template <class T>
using Checked = std::expected<T, Faults>;

/// The fault as one line, `FILE:LINE:FIELD: WHAT: HOW TO MEND`, with as many of the place's
/// parts as exist. Line breaks and control characters in any part are shown escaped, so that
/// one fault is always one line.
[[nodiscard]] std::string toLine(const Fault& fault);

}  // namespace vialkeeper::text
