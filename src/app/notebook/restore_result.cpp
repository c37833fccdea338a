// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <stdexcept>

#include "app/notebook/run_life.h"
#include "app/notebook/run_results.h"

namespace vialkeeper::app {
namespace {

bool isSameOutcome(const RunRecord& a, const RunRecord& b) {
  return a.yield_percent == b.yield_percent && a.uYield_percent == b.uYield_percent &&
         a.conversion_percent == b.conversion_percent &&
         a.uConversion_percent == b.uConversion_percent;
}

/// What is put back must be allowed in the state in which it was so, the state itself by the run's
/// life.
text::Faults refusals(const RunRecord& run, const RunRecord& before, const std::string& reason) {
  text::Faults faults;
  const auto add = [&faults](const Checked<void>& may) {
    if (!may) faults.insert(faults.end(), may.error().begin(), may.error().end());
  };
  if (run.state == RunState::kSealed) {
    add(mayDo(run.state, Deed::kRecordResult, reason));
    return faults;
  }
  if (before.state != run.state) add(mayTransition(run.state, before.state, reason));
  if (!faults.empty()) return faults;
  // A step back comes first, then the outcome of the state it leads to.
  if (!isSameOutcome(run, before) &&
      permissionOf(run.state, Deed::kRecordResult) == Permission::kNo)
    add(mayDo(before.state, Deed::kRecordResult, reason));
  if (run.conclusion != before.conclusion &&
      permissionOf(run.state, Deed::kConclude) == Permission::kNo)
    add(mayDo(before.state, Deed::kConclude, reason));
  if ((run.title != before.title || run.aim != before.aim) &&
      permissionOf(run.state, Deed::kWriteHeadings) == Permission::kNo)
    add(mayDo(before.state, Deed::kWriteHeadings, reason));
  return faults;
}

}  // namespace

Checked<RunRecord> restoreResult(const Desk& desk, const RunRecord& run, const RunRecord& before,
                                 const std::string& reason) {
  if (run.n != before.n) throw std::logic_error("restoreResult: two different runs");
  if (auto faults = refusals(run, before, reason); !faults.empty())
    return std::unexpected(std::move(faults));
  RunRecord changed = run;
  changed.state = before.state;
  changed.title = before.title;
  changed.aim = before.aim;
  changed.conclusion = before.conclusion;
  changed.yield_percent = before.yield_percent;
  changed.uYield_percent = before.uYield_percent;
  changed.conversion_percent = before.conversion_percent;
  changed.uConversion_percent = before.uConversion_percent;
  const auto done = desk.notebook.act(desk.action("result", reason),
                                      [&](Writing& writing) { return writing.changeRun(changed); });
  if (!done) return std::unexpected(done.error());
  return desk.notebook.run(run.n);
}

}  // namespace vialkeeper::app
