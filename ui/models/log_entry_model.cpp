// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/log_entry_model.h"

#include <algorithm>

#include "app/notebook/log_time.h"
#include "ui/models/moment_text.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

/// The place of bytes of a text in its characters.
std::pair<int, int> inCharacters(const std::string& utf8, std::size_t offset, std::size_t length) {
  const std::string_view text = utf8;
  const std::size_t begin = std::min(offset, text.size());
  const auto characters = [&](std::size_t from, std::size_t bytes) {
    return static_cast<int>(toQt(text.substr(from, bytes)).size());
  };
  return {characters(0, begin), characters(begin, std::min(length, text.size() - begin))};
}

QString doubtSentence(const text::TextFault& doubt, const std::string& utf8) {
  QString sentence = toQt(text::whatWithPosition(doubt, utf8));
  if (!doubt.mend.empty()) sentence += QStringLiteral(": ") + toQt(doubt.mend);
  return sentence;
}

}  // namespace

LogEntryModel::LogEntryModel(OpenRun& run, QObject* parent) : QObject(parent), m_run(run) {
  connect(&m_run, &OpenRun::opened, this, &LogEntryModel::followRun);
  connect(&m_run, &OpenRun::reloaded, this, &LogEntryModel::readAgain);
  if (m_run.isOpen()) m_runNumber = m_run.run().n;
}

void LogEntryModel::followRun() {
  const app::RowNumber opened = m_run.isOpen() ? m_run.run().n : 0;
  if (opened == m_runNumber) return;
  if (m_task == Task::kNew) m_drafts.insert(m_runNumber, m_line);
  m_runNumber = opened;
  clear();
  setLine(m_drafts.take(opened));
}

app::Deed LogEntryModel::deed() const {
  if (m_task != Task::kNew) return app::Deed::kCorrectLog;
  const bool sealed = m_run.isOpen() && m_run.run().state == app::RunState::kSealed;
  return sealed ? app::Deed::kAddAddendum : app::Deed::kLog;
}

bool LogEntryModel::wantsReason() const { return m_run.wantsReason(deed()); }

QString LogEntryModel::refusal() const {
  if (m_run.permission(deed()) != app::Permission::kNo) return {};
  return m_run.refusal(deed());
}

const app::EventRecord* LogEntryModel::original() const {
  const auto found = std::ranges::find(m_run.events(), m_entry, &app::NumberedEvent::number);
  return found == m_run.events().end() ? nullptr : &found->event;
}

QString LogEntryModel::taskSentence() const {
  const app::EventRecord* entry = original();
  if (m_task == Task::kNew || entry == nullptr) return {};
  const QString what =
      tr("“%1” of %2").arg(toQt(entry->raw).simplified().left(60), dayAndClockText(entry->at));
  return m_task == Task::kCorrection
             ? tr("Correcting %1. It stays visible, struck through.").arg(what)
             : tr("Taking back %1. It stays visible.").arg(what);
}

bool LogEntryModel::canKeepAsText() const { return m_lineInDoubt && m_task != Task::kWithdrawal; }

void LogEntryModel::setLine(const QString& line) {
  if (line == m_line) return;
  m_questioned = false;
  m_line = line;
  readAgain();
}

void LogEntryModel::begin(const QString& line) {
  m_begun = line;
  m_line = line;
  readAgain();
}

void LogEntryModel::setAt(const QString& at) {
  if (at == m_at) return;
  m_questioned = false;
  m_at = at;
  readAgain();
}

void LogEntryModel::setReason(const QString& reason) {
  if (reason == m_reason) return;
  m_reason = reason;
  emit changed();
}

void LogEntryModel::start(Task task, const app::NumberedEvent& entry) {
  m_task = task;
  m_entry = entry.number;
  m_line = toQt(entry.event.raw);
  m_at.clear();
  m_reason.clear();
  readAgain();
}

void LogEntryModel::startCorrection(int number) {
  const auto entry = std::ranges::find(m_run.events(), number, &app::NumberedEvent::number);
  if (entry == m_run.events().end()) return;
  if (entry->event.supersededBy != 0) {
    emit failed(tr("Another entry stands in the place of this one: correct that one."));
    return;
  }
  if (m_run.permission(app::Deed::kCorrectLog) == app::Permission::kNo) {
    emit failed(m_run.refusal(app::Deed::kCorrectLog));
    return;
  }
  start(Task::kCorrection, *entry);
}

void LogEntryModel::startWithdrawal(int number) {
  const auto entry = std::ranges::find(m_run.events(), number, &app::NumberedEvent::number);
  if (entry == m_run.events().end()) return;
  if (m_run.wantsReason(app::Deed::kCorrectLog)) {
    start(Task::kWithdrawal, *entry);
    return;
  }
  tell(m_run.withdraw(number));
}

void LogEntryModel::clear() {
  m_questioned = false;
  m_task = Task::kNew;
  m_entry = 0;
  m_begun.clear();
  m_line.clear();
  m_at.clear();
  m_reason.clear();
  readAgain();
}

void LogEntryModel::readAgain() {
  if (m_task != Task::kNew && original() == nullptr) {
    m_task = Task::kNew;
    m_entry = 0;
  }
  read();
  emit changed();
}

void LogEntryModel::read() {
  m_doubtPlace.reset();
  m_sentence.clear();
  m_lineInDoubt = false;
  m_standing = Standing::kEmpty;
  if (!m_run.isOpen() || m_line.trimmed().isEmpty()) return;
  if (m_task == Task::kWithdrawal) {
    m_standing = Standing::kReads;
    return;
  }
  if (m_line == m_begun && app::readLogLine(toUtf8(m_line)).doubt) {
    m_standing = Standing::kUnfinished;
    m_sentence = tr("goes on: type the figure");
    return;
  }
  if (const auto time = readTime()) readLine(*time);
}

std::optional<QString> LogEntryModel::readTime() {
  const units::Moment now = m_run.link().now();
  if (m_at.trimmed().isEmpty()) {
    const app::EventRecord* entry = original();
    if (m_task == Task::kCorrection && entry != nullptr)
      return tr("then (%1)").arg(dayAndClockText(entry->at));
    return tr("now (%1)").arg(clockText(now));
  }
  const std::string typed = toUtf8(m_at);
  const auto time = app::readLogTime(typed, now);
  if (time) return toQt(time->sentence) + (time->late ? tr(", marked as late") : QString());
  m_standing = Standing::kBadTime;
  m_sentence = doubtSentence(time.error(), typed);
  m_doubtPlace = inCharacters(typed, time.error().offset, time.error().length);
  return std::nullopt;
}

void LogEntryModel::readLine(const QString& time) {
  const std::string typed = toUtf8(m_line);
  const bool sealed = deed() == app::Deed::kAddAddendum;
  const app::ReadEntry entry = sealed ? app::readAddendum(typed) : app::readLogLine(typed);
  if (!entry.doubt) {
    m_standing = Standing::kReads;
    m_sentence = tr("reads as: %1, %2").arg(toQt(entry.sentence), time);
    return;
  }
  m_lineInDoubt = true;
  m_standing = entry.isUnfinished() ? Standing::kUnfinished : Standing::kDoubtful;
  m_doubtPlace = inCharacters(typed, entry.doubt->offset, entry.doubt->length);
  const QString doubt = doubtSentence(*entry.doubt, typed);
  if (m_standing == Standing::kUnfinished)
    m_sentence = tr("goes on: %1").arg(doubt);
  else if (entry.meant.empty())
    m_sentence = tr("not clear: %1").arg(doubt);
  else
    m_sentence = tr("looks like %1, but %2").arg(toQt(entry.meant), doubt);
}

Outcome LogEntryModel::tell(Outcome outcome) {
  if (!outcome.slips.empty()) {
    QStringList questions;
    for (const app::LogSlip& slip : outcome.slips)
      questions += toQt(slip.what) + QStringLiteral(": ") + toQt(slip.ask);
    m_questioned = true;
    emit failed(questions.join(QLatin1Char('\n')));
    emit changed();
  }
  if (!outcome.faults.empty()) {
    QString words = sentences(outcome.faults, false);
    if (const std::string& file = outcome.faults.front().file; !file.empty())
      words = toQt(file) + QStringLiteral(": ") + words;
    emit failed(words);
  }
  if (outcome.done) {
    int newest = 0;
    for (const app::NumberedEvent& entry : m_run.events()) newest = std::max(newest, entry.number);
    emit written(newest);
  }
  return outcome;
}

Outcome LogEntryModel::commit(bool keepAsText) {
  if (!m_run.isOpen()) return {};
  if (m_line.trimmed().isEmpty()) return {};
  const CommandOptions options{.reason = m_reason, .accepted = keepAsText};
  Outcome outcome;
  switch (m_task) {
    case Task::kNew:
      outcome = m_run.log(m_line, m_at, options);
      break;
    case Task::kCorrection:
      outcome = m_run.correct(m_entry, m_line, m_at, options);
      break;
    case Task::kWithdrawal:
      outcome = m_run.withdraw(m_entry, options);
      break;
  }
  if (outcome.done) clear();
  return tell(std::move(outcome));
}

Outcome LogEntryModel::logAtOnce(const QString& line) {
  if (!m_run.isOpen()) return {};
  return tell(m_run.log(line));
}

}  // namespace vialkeeper::ui
