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
#include "charge/plan_reader.h"
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
  entry.event.n = n;
  return LoggedEntry{{}, std::move(entry.event), std::move(entry.sentence), late};
}

/// The liquid of the plan less the samples and with what was added.
Checked<units::Volume> liquidAfter(Notebook& notebook, const RunRecord& run) {
  const auto events = notebook.events(run.n);
  if (!events) return std::unexpected(events.error());
  double liquid_uL = run.liquid_mL * 1e3;
  for (const EventRecord& event : *events) {
    if (event.supersededBy != 0 || !event.volume_uL) continue;
    if (event.kind == event_kind::kLiquidSample) liquid_uL -= *event.volume_uL;
    if (event.kind == event_kind::kLiquidAdded) liquid_uL += *event.volume_uL;
  }
  return units::Volume::fromMicrolitres(std::max(0.0, liquid_uL));
}

/// What is odd about an entry; the notebook is asked for what the entry can be held against only.
Checked<std::vector<LogSlip>> slipsOf(Notebook& notebook, const RunRecord& run,
                                      const EventRecord& event) {
  const bool ofLiquid =
      event.kind == event_kind::kLiquidSample || event.kind == event_kind::kLiquidAdded;
  if (!event.pressure_bar && !event.temperature_C && !event.volume_uL)
    return logSlips({.created = run.created}, event);
  const auto vial =
      vialContext(notebook, run, ofLiquid ? LiquidNow::kFollowed : LiquidNow::kAsPlanned);
  if (!vial) return std::unexpected(vial.error());
  return logSlips(*vial, event);
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

Checked<VialContext> vialContext(Notebook& notebook, const RunRecord& run, LiquidNow liquid) {
  VialContext context{.liquid = units::Volume::fromMillilitres(run.liquid_mL),
                      .created = run.created};
  if (run.temperature_C) context.planned = units::Temperature::fromCelsius(*run.temperature_C);
  if (liquid == LiquidNow::kFollowed) {
    const auto now = liquidAfter(notebook, run);
    if (!now) return std::unexpected(now.error());
    context.liquid = *now;
  }
  const auto planText = notebook.attachment(run.plan);
  if (!planText) return std::unexpected(planText.error());
  // A plan that cannot be read says nothing of the vial; the line is kept all the same.
  const auto plan = charge::readPlan(*planText, run.code);
  if (!plan) return context;
  if (plan->seal) context.ambient = plan->seal->ambient;
  if (!plan->vial) return context;
  context.vial = plan->vial->volume;
  context.displaced = plan->vial->displaced;
  context.ratedGauge = plan->vial->ratedGauge;
  return context;
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
  if (!request.accepted && run.state != RunState::kSealed) {
    auto slips = slipsOf(desk.notebook, run, entry->event);
    if (!slips) return std::unexpected(slips.error());
    if (!slips->empty()) return LoggedEntry{*std::move(slips), {}, {}};
  }
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
  if (!request.accepted) {
    auto slips = slipsOf(desk.notebook, run, entry->event);
    if (!slips) return std::unexpected(slips.error());
    // A time that was taken over from the original was answered for with that.
    if (!request.at)
      std::erase_if(*slips, [](const LogSlip& s) { return s.kind == LogSlipKind::kTime; });
    if (!slips->empty()) return LoggedEntry{*std::move(slips), {}, {}};
  }
  return write(desk, run, action, *std::move(entry), time->late);
}

}  // namespace vialkeeper::app
