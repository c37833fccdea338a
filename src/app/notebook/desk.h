// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <optional>
#include <string>
#include <string_view>

#include "app/notebook/notebook.h"
#include "app/notebook/records.h"
#include "text/fault.h"

namespace vialkeeper::app {

/// The port to the clock on the wall.
class Clock {
 public:
  Clock() = default;
  Clock(const Clock&) = delete;
  Clock& operator=(const Clock&) = delete;
  virtual ~Clock() = default;
  [[nodiscard]] virtual units::Moment now() = 0;
};

/// Where a person works: a notebook, a clock, and who it is.
struct Desk {
  Notebook& notebook;
  Clock& clock;
  std::string person;

  [[nodiscard]] Author author() const { return {person, clock.now()}; }
  [[nodiscard]] Action action(std::string name, std::string reason = {}) const {
    return {author(), std::move(name), std::move(reason)};
  }
};

/// Whether these are initials: 1 to 8 capital letters and digits, a letter first.
[[nodiscard]] bool areInitials(std::string_view text);

/// Whether initials that a notebook does not know may be those of somebody new.
enum class Newcomer { kQuestioned, kWelcome };

/// Who works: the initials that were given, else the only person of the notebook. A notebook that
/// knows nobody takes the first initials without question.
/// Fault: initials that are none (1 to 8 capital letters and digits), initials that a notebook with
/// people does not know unless a newcomer is welcome, or nobody named where there are several or
/// none.
[[nodiscard]] Checked<std::string> whoWorks(Notebook& notebook,
                                            const std::optional<std::string>& given,
                                            Newcomer newcomer = Newcomer::kQuestioned);

/// A fault of what was asked, at a place.
[[nodiscard]] std::unexpected<text::Faults> askedFault(std::string field, std::string what,
                                                       std::string mend);

/// The run of that code. Fault: there is none; the nearest code is offered.
[[nodiscard]] Checked<RunRecord> runOfCode(Notebook& notebook, std::string_view code);

}  // namespace vialkeeper::app
