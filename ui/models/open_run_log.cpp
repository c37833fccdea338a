// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include <algorithm>
#include <memory>

#include "ui/models/open_run.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

constexpr const char* kUndoReason = "undone";
constexpr const char* kRedoReason = "done again";

/// The entry that stands in the log for one of ours; its number follows what was written last.
using EntryInLog = std::shared_ptr<int>;

/// The request with which an entry is written again as it was.
app::LogRequest asItWas(const app::EventRecord& event) {
  return {.line = event.raw, .at = toIsoText(event.at), .accepted = true};
}

std::optional<std::string> timeTyped(const QString& at) {
  return at.isEmpty() ? std::nullopt : std::optional(toUtf8(at));
}

/// The number of an entry in its run's log; 0 where it is not there.
int numberOf(app::Notebook& notebook, const app::RunRecord& run, const app::EventRecord& event) {
  const auto events = app::numberedEvents(notebook, run);
  if (!events) return 0;
  const auto found = std::ranges::find_if(
      *events, [&](const app::NumberedEvent& each) { return each.event.n == event.n; });
  return found == events->end() ? 0 : found->number;
}

/// Takes the entry back.
auto withdrawing(app::Desk desk, EntryInLog entry, const char* why) {
  return [desk, entry, why](const app::RunRecord& present) {
    auto withdrawn = app::withdrawEntry(desk, present, *entry, why);
    if (withdrawn) *entry = numberOf(desk.notebook, present, withdrawn->event);
    return withdrawn;
  };
}

/// Puts something else in the entry's place.
auto replacing(app::Desk desk, EntryInLog entry, app::LogRequest request, const char* why) {
  request.reason = why;
  return [desk, entry, request](const app::RunRecord& present) {
    auto corrected = app::correctEvent(desk, present, *entry, request);
    if (corrected) *entry = numberOf(desk.notebook, present, corrected->event);
    return corrected;
  };
}

}  // namespace

Outcome OpenRun::log(const QString& line, const QString& at, const CommandOptions& options) {
  const app::LogRequest request{.line = toUtf8(line),
                                .at = timeTyped(at),
                                .accepted = options.accepted,
                                .reason = toUtf8(options.reason)};
  const auto logged = app::logLine(m_link.desk(), run(), request);
  if (!logged) return Outcome::failure(logged.error());
  if (!logged->questions.empty()) return {.slips = logged->questions};
  const auto entry = std::make_shared<int>(numberOf(m_link.notebook(), run(), logged->event));
  const app::LogRequest written = asItWas(logged->event);
  m_history.add(
      {tr("log “%1”").arg(line.left(40)),
       [this, n = run().n, entry] {
         return onRun(n, withdrawing(m_link.desk(), entry, kUndoReason));
       },
       [this, n = run().n, entry, written] {
         return onRun(n, replacing(m_link.desk(), entry, written, kRedoReason));
       }});
  return finished();
}

Outcome OpenRun::correct(int number, const QString& line, const QString& at,
                         const CommandOptions& options) {
  const auto original = std::ranges::find(m_events, number, &app::NumberedEvent::number);
  const app::LogRequest earlier =
      original == m_events.end() ? app::LogRequest{} : asItWas(original->event);
  const app::LogRequest request{.line = toUtf8(line),
                                .at = timeTyped(at),
                                .accepted = options.accepted,
                                .reason = toUtf8(options.reason)};
  const auto corrected = app::correctEvent(m_link.desk(), run(), number, request);
  if (!corrected) return Outcome::failure(corrected.error());
  if (!corrected->questions.empty()) return {.slips = corrected->questions};
  const auto entry = std::make_shared<int>(numberOf(m_link.notebook(), run(), corrected->event));
  const app::LogRequest later = asItWas(corrected->event);
  m_history.add(
      {tr("correct entry %1").arg(number),
       [this, n = run().n, entry, earlier] {
         return onRun(n, replacing(m_link.desk(), entry, earlier, kUndoReason));
       },
       [this, n = run().n, entry, later] {
         return onRun(n, replacing(m_link.desk(), entry, later, kRedoReason));
       }});
  return finished();
}

Outcome OpenRun::withdraw(int number, const CommandOptions& options) {
  const auto original = std::ranges::find(m_events, number, &app::NumberedEvent::number);
  if (original == m_events.end()) return Outcome::success();
  const app::LogRequest earlier = asItWas(original->event);
  const auto withdrawn =
      app::withdrawEntry(m_link.desk(), run(), number, toUtf8(options.reason));
  if (!withdrawn) return Outcome::failure(withdrawn.error());
  const auto entry = std::make_shared<int>(numberOf(m_link.notebook(), run(), withdrawn->event));
  m_history.add(
      {tr("withdraw entry %1").arg(number),
       [this, n = run().n, entry, earlier] {
         return onRun(n, replacing(m_link.desk(), entry, earlier, kUndoReason));
       },
       [this, n = run().n, entry] {
         return onRun(n, withdrawing(m_link.desk(), entry, kRedoReason));
       }});
  return finished();
}

}  // namespace vialkeeper::ui
