// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <chrono>
#include <string>
#include <vector>

#include "app/notebook/desk.h"
#include "cli/command_bench.h"
#include "support/scratch_folder.h"

/// A notebook for tests, reached by its verbs alone.
namespace vialkeeper::tests {

/// A clock that stands still until it is moved.
class HandClock final : public app::Clock {
 public:
  [[nodiscard]] units::Moment now() override { return m_now; }
  void goOn(std::chrono::minutes by) { m_now.utc += by; }

 private:
  units::Moment m_now{
      std::chrono::sys_days{std::chrono::year{2026} / 3 / 4} + std::chrono::hours{13},
      std::chrono::minutes{60}};
};

/// A notebook of KW with one run of the sound plan, `KW-0001`, set up on 2026-03-04 at 14:00+01:00.
class Book {
 public:
  Book();

  /// Runs a verb as KW.
  Ran verb(const std::vector<std::string>& arguments);
  /// Runs a verb as somebody, or as nobody in particular.
  Ran verbAs(const std::string& person, const std::vector<std::string>& arguments);
  /// The same with something on standard input.
  Ran verbWithInput(const std::string& person, const std::vector<std::string>& arguments,
                    const std::string& input);

  [[nodiscard]] const ScratchFolder& folder() const { return m_folder; }
  [[nodiscard]] HandClock& clock() { return m_clock; }

 private:
  ScratchFolder m_folder;
  HandClock m_clock;
  std::string m_file;
};

}  // namespace vialkeeper::tests
