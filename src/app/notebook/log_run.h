// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <vector>

#include "app/notebook/desk.h"
#include "app/notebook/log_line.h"
#include "app/notebook/log_slip.h"

namespace vialkeeper::app {

/// An entry of the log with its number in the run, by which people correct it: 1, 2, 3 in the order
/// of writing down.
struct NumberedEvent {
  int number = 0;
  EventRecord event;
};

/// The run's entries in the order in which they happened.
[[nodiscard]] Checked<std::vector<NumberedEvent>> numberedEvents(Notebook& notebook,
                                                                 const RunRecord& run);

/// A line to be logged.
struct LogRequest {
  std::string line;
  std::optional<std::string> at = {};  ///< when it happened, as a person writes it; nothing: now
  bool accepted = false;  ///< keep a doubtful line as an observation, a likely slip as it is
  std::string reason = {};
};

struct LoggedEntry {
  std::vector<LogSlip> questions;  ///< if there are any, nothing was logged
  EventRecord event;
  std::string sentence;  ///< how it was understood
  bool late = false;     ///< back-dated by more than a day
};

/// How much of the vial's liquid is known.
enum class LiquidNow { kAsPlanned, kFollowed };

/// What a run's lines are held against (log_slip.h). Followed, the liquid is that of the plan less
/// the samples and with what was added; for that all entries are read.
[[nodiscard]] Checked<VialContext> vialContext(Notebook& notebook, const RunRecord& run,
                                               LiquidNow liquid);

/// Logs one line, reading of the run only what that line needs. What can hardly be (log_slip.h) is
/// questioned unless it is accepted. A line that looks like a shorthand but cannot be read is a
/// fault that points at the place, unless it is accepted as text. `lamp on` moves a planned or
/// charged run to irradiating; a photo is kept byte for byte; a sealed run takes addenda only.
[[nodiscard]] Checked<LoggedEntry> logLine(const Desk& desk, const RunRecord& run,
                                           const LogRequest& request);

/// Puts a new entry in the place of one that was wrong; both stay visible. Its time is that of the
/// original unless another is given.
[[nodiscard]] Checked<LoggedEntry> correctEvent(const Desk& desk, const RunRecord& run, int number,
                                                const LogRequest& request);

/// Takes an entry back, as a new entry in its place that says so: both stay visible, and the gas
/// ledger counts neither. How logging is undone. The kind of the new entry is `withdrawn`.
/// Faults as correctEvent's.
[[nodiscard]] Checked<LoggedEntry> withdrawEntry(const Desk& desk, const RunRecord& run, int number,
                                                 const std::string& reason);

}  // namespace vialkeeper::app
