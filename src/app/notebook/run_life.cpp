// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/run_life.h"

#include <fmt/format.h>

#include <string>

#include "app/notebook/log_line_words.h"

namespace vialkeeper::app {
namespace {

std::unexpected<text::Faults> refused(std::string what, std::string mend) {
  return std::unexpected(
      text::Faults{{.field = "state", .what = std::move(what), .mend = std::move(mend)}});
}

bool isGiven(std::string_view reason) { return skipBlanks(reason, 0) < trimmedEnd(reason); }

/// `charged or, with a reason, closed`: where a run may go from here.
std::string waysFrom(RunState from) {
  std::string free;
  std::string reasoned;
  for (const Transition& transition : kTransitions) {
    if (transition.from != from) continue;
    std::string& list = transition.permission == Permission::kYes ? free : reasoned;
    list += fmt::format("{}{}", list.empty() ? "" : " or ", toText(transition.to));
  }
  if (reasoned.empty()) return free;
  return free.empty() ? reasoned + " with a reason"
                      : fmt::format("{}, or with a reason {}", free, reasoned);
}

/// The nearest state in which the deed is free, or at least possible, as advice.
std::string whereInstead(RunState state, Deed deed) {
  if (state == RunState::kSealed) return "write an addendum: it stands beside the sealed record";
  if (deed == Deed::kAddAddendum) {
    return state == RunState::kClosed ? "seal the run, or open it again with a reason"
                                      : "add a log entry";
  }
  if (deed == Deed::kCountersign) return "seal the run first";
  if (state == RunState::kClosed)
    return "open the run again: from closed to worked up, with a reason";
  return "record what was weighed or that the lamp is on, so that the run has begun";
}

std::string_view nameOf(Deed deed) {
  return std::ranges::find(kDeedRules, deed, &DeedRule::deed)->name;
}

}  // namespace

text::Checked<void> mayTransition(RunState from, RunState to, std::string_view reason) {
  if (from == to)
    return refused(fmt::format("the run is {} already", toText(to)), "nothing is to be done");
  const Permission permission = permissionOf(from, to);
  if (permission == Permission::kYes || (permission == Permission::kWithReason && isGiven(reason)))
    return {};
  if (permission == Permission::kWithReason) {
    return refused(fmt::format("from {} to {} takes a reason", toText(from), toText(to)),
                   "say why in a few words: it is kept with the change");
  }
  if (from == RunState::kSealed) {
    return refused("a sealed run stays sealed",
                   "write an addendum: it stands beside the sealed record");
  }
  return refused(fmt::format("a run cannot go from {} to {}", toText(from), toText(to)),
                 fmt::format("from here it may become {}", waysFrom(from)));
}

text::Checked<void> mayDo(RunState state, Deed deed, std::string_view reason) {
  const Permission permission = permissionOf(state, deed);
  if (permission == Permission::kYes || (permission == Permission::kWithReason && isGiven(reason)))
    return {};
  if (permission == Permission::kWithReason) {
    return refused(
        fmt::format("to {} takes a reason once the run is {}", nameOf(deed), toText(state)),
        "say why in a few words: it is kept with the change");
  }
  return refused(fmt::format("nobody can {} while the run is {}", nameOf(deed), toText(state)),
                 whereInstead(state, deed));
}

}  // namespace vialkeeper::app
