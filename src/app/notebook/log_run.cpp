// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "app/notebook/log_run.h"

#include <fmt/format.h>

#include <algorithm>
#include <filesystem>

#include "app/notebook/entry_to_replace.h"
#include "app/notebook/log_time.h"
#include "app/notebook/run_life.h"
#include "app/text_files.h"
#include "text/text_fault.h"
#include "text/utf8.h"

namespace vialkeeper::app {
namespace {

constexpr std::size_t kLongestLine = std::size_t{16} << 20U;

Checked<void> checkLine(const std::string& line) {
  if (text::trimmed(line).empty())
    return askedFault("entry", "the entry is empty", "say what happened");
  if (line.size() > kLongestLine)
    return askedFault("entry", "the entry is longer than 16 MB", "attach it as a file");
  if (text::firstInvalidUtf8(line))
    return askedFault("entry", "the entry holds bytes that are not UTF-8", "type it again");
  if (line.find('\0') != std::string::npos)
    return askedFault("entry", "the entry holds a NUL character", "type it again");
  return {};
}

Checked<ReadEntry> readEntry(const RunRecord& run, const LogRequest& request) {
  if (run.state == RunState::kSealed) return readAddendum(request.line);
  ReadEntry entry = readLogLine(request.line);
  if (!entry.doubt || request.accepted) return entry;
  return askedFault("entry",
                    fmt::format("{} looks like {}, but {}", text::quoted(request.line),
                                entry.meant.empty() ? "no entry" : "an entry of " + entry.meant,
                                whatWithPosition(*entry.doubt, request.line)),
                    entry.doubt->mend);
}

Checked<LogTime> timeOf(const LogRequest& request, const units::Moment& now,
                        const units::Moment& otherwise) {
  if (!request.at) return LogTime{otherwise, false, ""};
  const auto time = readLogTime(*request.at, now);
  if (time) return *time;
  return askedFault(
      "--at",
      fmt::format("{}: {}", text::quoted(*request.at), whatWithPosition(time.error(), *request.at)),
      time.error().mend);
}

/// The photo's bytes, read before anything is written.
Checked<std::string> photoBytes(const std::string& file) {
  if (file.empty()) return std::string{};
  return readFile(file);
}

int numberOf(const std::vector<NumberedEvent>& events, RowNumber n) {
  const auto found =
      std::ranges::find_if(events, [n](const NumberedEvent& entry) { return entry.event.n == n; });
  return found == events.end() ? 0 : found->number;
}

/// Writes the event, and the state it implies, in one action.
Checked<LoggedEntry> write(const Desk& desk, const RunRecord& run, const Action& action,
                           ReadEntry entry, bool late) {
  const auto photo = photoBytes(entry.photo);
  if (!photo) return std::unexpected(photo.error());
  entry.event.run = run.n;
  entry.event.person = desk.person;
  RunRecord changed = run;
  changed.state = stateAfter(run.state, triggerOf(entry.event.kind));
  RowNumber n = 0;
  const auto done = desk.notebook.act(action, [&](Writing& writing) -> Checked<void> {
    if (!entry.photo.empty()) {
      const auto attachment = writing.addAttachment(*photo);
      if (!attachment) return std::unexpected(attachment.error());
      entry.event.attachment = *attachment;
      entry.event.attachmentName = std::filesystem::path(entry.photo).filename().string();
    }
    const auto added = writing.addEvent(entry.event);
    if (!added) return std::unexpected(added.error());
    n = *added;
    return changed.state == run.state ? Checked<void>{} : writing.changeRun(changed);
  });
  if (!done) return std::unexpected(done.error());
  const auto events = numberedEvents(desk.notebook, run);
  if (!events) return std::unexpected(events.error());
  entry.event.n = n;
  return LoggedEntry{{numberOf(*events, n), entry.event}, entry.sentence, late};
}

}  // namespace

Checked<std::vector<NumberedEvent>> numberedEvents(Notebook& notebook, const RunRecord& run) {
  const auto events = notebook.events(run.n);
  if (!events) return std::unexpected(events.error());
  std::vector<RowNumber> order;
  for (const EventRecord& event : *events) order.push_back(event.n);
  std::ranges::sort(order);
  std::vector<NumberedEvent> numbered;
  for (const EventRecord& event : *events) {
    const auto place = std::ranges::lower_bound(order, event.n) - order.begin();
    numbered.push_back({static_cast<int>(place) + 1, event});
  }
  return numbered;
}

Checked<LoggedEntry> logLine(const Desk& desk, const RunRecord& run, const LogRequest& request) {
  if (const auto sound = checkLine(request.line); !sound) return std::unexpected(sound.error());
  const Deed deed = run.state == RunState::kSealed ? Deed::kAddAddendum : Deed::kLog;
  if (const auto may = mayDo(run.state, deed, request.reason); !may)
    return std::unexpected(may.error());
  auto entry = readEntry(run, request);
  if (!entry) return std::unexpected(entry.error());
  const Action action = desk.action("log", request.reason);
  const auto time = timeOf(request, action.author.at, action.author.at);
  if (!time) return std::unexpected(time.error());
  entry->event.at = time->at;
  entry->event.logged = action.author.at;
  return write(desk, run, action, *std::move(entry), time->late);
}

Checked<LoggedEntry> correctEvent(const Desk& desk, const RunRecord& run, int number,
                                  const LogRequest& request) {
  if (const auto sound = checkLine(request.line); !sound) return std::unexpected(sound.error());
  if (const auto may = mayDo(run.state, Deed::kCorrectLog, request.reason); !may)
    return std::unexpected(may.error());
  const auto original = entryToReplace(desk.notebook, run, number);
  if (!original) return std::unexpected(original.error());
  auto entry = readEntry(run, request);
  if (!entry) return std::unexpected(entry.error());
  const Action action = desk.action("correct", request.reason);
  const auto time = timeOf(request, action.author.at, original->event.at);
  if (!time) return std::unexpected(time.error());
  entry->event.at = time->at;
  entry->event.logged = action.author.at;
  entry->event.supersedes = original->event.n;
  return write(desk, run, action, *std::move(entry), time->late);
}

}  // namespace vialkeeper::app
