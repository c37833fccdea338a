// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <algorithm>
#include <array>
#include <cstddef>
#include <optional>
#include <string_view>

#include "app/notebook/log_line_kinds.h"
#include "app/notebook/records.h"
#include "text/fault.h"

/// The life of a run: which state follows which, and what may be done in each. docs/run-life.md
/// shows the same tables; a test compares the two.
namespace vialkeeper::app {

enum class Permission { kNo, kWithReason, kYes };

/// What somebody does to a run besides moving it on.
enum class Deed {
  kChangePlan,     ///< the plan's inputs: amounts, vial, seal, irradiation
  kWeigh,          ///< record or correct what the balance or pipette gave
  kLog,            ///< add an entry, back-dated ones among them
  kCorrectLog,     ///< supersede an entry
  kLinkData,       ///< import a dataset for the run, link one to it
  kRecordResult,   ///< yield and conversion
  kWriteHeadings,  ///< title, series, aim
  kConclude,       ///< the conclusion
  kAddAddendum,
  kCountersign,
};

/// What moves a run on without being asked for.
enum class Trigger { kNone, kFirstWeighing, kLampOn, kResult };

struct Transition {
  RunState from;
  RunState to;
  Permission permission;
  Trigger impliedBy = Trigger::kNone;
};

inline constexpr std::size_t kRunStateCount = 6;

/// What may be done, state by state in the order of RunState.
struct DeedRule {
  Deed deed;
  std::string_view name;  ///< as in the docs
  std::array<Permission, kRunStateCount> in;
};

/// All transitions that there are; those that a trigger implies are free.
inline constexpr auto kTransitions = [] {
  using enum RunState;
  using enum Permission;
  return std::to_array<Transition>({
      {kPlanned, kCharged, kYes, Trigger::kFirstWeighing},
      {kPlanned, kIrradiating, kYes, Trigger::kLampOn},
      {kPlanned, kClosed, kWithReason},
      {kCharged, kPlanned, kWithReason},
      {kCharged, kIrradiating, kYes, Trigger::kLampOn},
      {kCharged, kWorkedUp, kYes, Trigger::kResult},
      {kCharged, kClosed, kWithReason},
      {kIrradiating, kCharged, kWithReason},
      {kIrradiating, kWorkedUp, kYes, Trigger::kResult},
      {kIrradiating, kClosed, kWithReason},
      {kWorkedUp, kIrradiating, kWithReason},
      {kWorkedUp, kClosed, kYes},
      {kClosed, kWorkedUp, kWithReason},
      {kClosed, kSealed, kYes},
  });
}();

inline constexpr auto kDeedRules = [] {
  constexpr auto Y = Permission::kYes;
  constexpr auto R = Permission::kWithReason;
  constexpr auto N = Permission::kNo;
  // planned, charged, irradiating, worked up, closed, sealed
  return std::to_array<DeedRule>({
      {Deed::kChangePlan, "change the plan", {Y, R, R, R, N, N}},
      {Deed::kWeigh, "record a weighing", {Y, Y, R, R, N, N}},
      {Deed::kLog, "add a log entry", {Y, Y, Y, Y, N, N}},
      {Deed::kCorrectLog, "correct a log entry", {Y, Y, Y, R, N, N}},
      {Deed::kLinkData, "link data", {Y, Y, Y, Y, N, N}},
      {Deed::kRecordResult, "record a result", {N, Y, Y, Y, N, N}},
      {Deed::kWriteHeadings, "change title, series or aim", {Y, Y, Y, Y, N, N}},
      {Deed::kConclude, "write the conclusion", {Y, Y, Y, Y, N, N}},
      {Deed::kAddAddendum, "write an addendum", {N, N, N, N, N, Y}},
      {Deed::kCountersign, "countersign", {N, N, N, N, N, Y}},
  });
}();

/// The permission of a transition; kNo where there is none.
[[nodiscard]] constexpr Permission permissionOf(RunState from, RunState to) {
  for (const Transition& transition : kTransitions) {
    if (transition.from == from && transition.to == to) return transition.permission;
  }
  return Permission::kNo;
}

[[nodiscard]] constexpr Permission permissionOf(RunState state, Deed deed) {
  for (const DeedRule& rule : kDeedRules) {
    if (rule.deed == deed) return rule.in[static_cast<std::size_t>(state)];
  }
  return Permission::kNo;
}

/// The state after a trigger: the same one where it moves nothing. A trigger never moves a run
/// back.
[[nodiscard]] constexpr RunState stateAfter(RunState state, Trigger trigger) {
  for (const Transition& transition : kTransitions) {
    if (trigger != Trigger::kNone && transition.from == state && transition.impliedBy == trigger)
      return transition.to;
  }
  return state;
}

/// What a log event of this kind triggers.
[[nodiscard]] constexpr Trigger triggerOf(std::string_view eventKind) {
  return eventKind == event_kind::kLampOn ? Trigger::kLampOn : Trigger::kNone;
}

/// Whether the run may go from one state to the other. `reason` is what the user gave; blanks are
/// none. Fault: the transition does not exist, or wants a reason; the field is `state`.
[[nodiscard]] text::Checked<void> mayTransition(RunState from, RunState to,
                                                std::string_view reason = {});

/// Whether something may be done to a run in this state.
/// Fault: it may not, or not without a reason; the field is `state`.
[[nodiscard]] text::Checked<void> mayDo(RunState state, Deed deed, std::string_view reason = {});

}  // namespace vialkeeper::app
