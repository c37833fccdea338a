// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <fmt/format.h>

#include <algorithm>

#include "app/notebook/entry_to_replace.h"
#include "app/notebook/log_line_sentence.h"
#include "app/notebook/log_run.h"
#include "app/notebook/run_life.h"
#include "text/utf8.h"

namespace vialkeeper::app {

Checked<NumberedEvent> entryToReplace(Notebook& notebook, const RunRecord& run, int number) {
  auto events = numberedEvents(notebook, run);
  if (!events) return std::unexpected(events.error());
  const auto original = std::ranges::find(*events, number, &NumberedEvent::number);
  if (original == events->end()) {
    return askedFault("event", fmt::format("{} has no entry {}", run.code, number),
                      "see its numbers with show");
  }
  if (original->event.supersededBy == 0) return std::move(*original);
  const auto later = std::ranges::find_if(*events, [&](const NumberedEvent& entry) {
    return entry.event.n == original->event.supersededBy;
  });
  const int laterNumber = later == events->end() ? 0 : later->number;
  if (later != events->end() && later->event.kind == event_kind::kWithdrawn) {
    return askedFault("event",
                      fmt::format("entry {} was withdrawn, by entry {}", number, laterNumber),
                      "correct that one to have it stand again");
  }
  return askedFault("event",
                    fmt::format("entry {} was corrected already, by entry {}", number, laterNumber),
                    "correct that one");
}

Checked<LoggedEntry> withdrawEntry(const Desk& desk, const RunRecord& run, int number,
                                   const std::string& reason) {
  if (const auto may = mayDo(run.state, Deed::kCorrectLog, reason); !may)
    return std::unexpected(may.error());
  if (text::firstInvalidUtf8(reason) || reason.find('\0') != std::string::npos)
    return askedFault("--reason", "the reason holds bytes that are no text", "type it again");
  const auto original = entryToReplace(desk.notebook, run, number);
  if (!original) return std::unexpected(original.error());
  if (original->event.kind == event_kind::kWithdrawn) {
    return askedFault("event", fmt::format("entry {} says itself that one was withdrawn", number),
                      "correct it with the line that shall stand");
  }
  const Action action = desk.action("withdraw", reason);
  EventRecord event{
      .run = run.n,
      .kind = std::string(event_kind::kWithdrawn),
      .raw = fmt::format("withdraw {}{}{}", number, reason.empty() ? "" : "; ", reason),
      .at = original->event.at,
      .logged = action.author.at,
      .person = desk.person,
      .supersedes = original->event.n,
      .note = reason};
  const auto done = desk.notebook.act(action, [&](Writing& writing) -> Checked<void> {
    const auto n = writing.addEvent(event);
    if (!n) return std::unexpected(n.error());
    event.n = *n;
    return {};
  });
  if (!done) return std::unexpected(done.error());
  const auto events = numberedEvents(desk.notebook, run);
  if (!events) return std::unexpected(events.error());
  const auto written = std::ranges::find_if(
      *events, [&](const NumberedEvent& entry) { return entry.event.n == event.n; });
  const std::string sentence = fmt::format("entry {} {}", number, eventSentence(event));
  return LoggedEntry{
      {written == events->end() ? 0 : written->number, std::move(event)}, sentence, false};
}

}  // namespace vialkeeper::app
