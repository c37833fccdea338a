// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/weigh_steps.h"

#include <algorithm>

#include "ui/models/qt_text.h"

namespace vialkeeper::ui {

WeighSteps::WeighSteps(OpenRun& run, ChangeReason& reason, QObject* parent)
    : QObject(parent), m_run(run), m_reason(reason) {
  connect(&m_run, &OpenRun::reloaded, this, &WeighSteps::follow);
  connect(&m_run, &OpenRun::opened, this, [this] {
    m_at = 0;
    m_retargeted.reset();
    m_changes.clear();
    m_retargetFault.clear();
  });
  connect(&m_reason, &ChangeReason::givenUp, this, &WeighSteps::judge);
  follow();
}

void WeighSteps::follow() {
  const std::string on = key();
  m_order.clear();
  if (m_run.isOpen()) m_order = app::weighingOrder(m_run.sheet());
  const auto found = std::ranges::find(m_order, on);
  m_at = found == m_order.end() ? std::clamp(m_at, 0, std::max(0, count() - 1))
                                : static_cast<int>(found - m_order.begin());
  if (m_retargeted) workOutTargets();
  judge();
}

std::string WeighSteps::key() const {
  return isEmpty() ? std::string() : m_order[static_cast<std::size_t>(m_at)];
}

bool WeighSteps::isRecorded(const std::string& key) const {
  const auto& components = m_run.sheet().components;
  const auto found = std::ranges::find(components, key, &app::ComponentRecord::key);
  return found != components.end() && !found->actualText.empty();
}

void WeighSteps::start() {
  const auto open =
      std::ranges::find_if(m_order, [this](const std::string& each) { return !isRecorded(each); });
  go(open == m_order.end() ? 0 : static_cast<int>(open - m_order.begin()));
}

void WeighSteps::startAt(const std::string& key) {
  const auto found = std::ranges::find(m_order, key);
  if (found != m_order.end()) go(static_cast<int>(found - m_order.begin()));
}

QString WeighSteps::progress() const { return tr("%1 of %2").arg(m_at + 1).arg(count()); }

QString WeighSteps::recorded() const {
  const auto done =
      std::ranges::count_if(m_order, [this](const std::string& each) { return isRecorded(each); });
  return done == count() ? tr("all recorded") : tr("%1 recorded").arg(done);
}

ChargeRow WeighSteps::row() const {
  return isEmpty() ? ChargeRow{} : chargeRow(sheet(), sheet().planned.plan.indexOf(key()));
}

std::vector<WeighStep> WeighSteps::overview() const {
  std::vector<WeighStep> steps;
  for (const std::string& each : m_order) {
    const ChargeRow row = chargeRow(sheet(), sheet().planned.plan.indexOf(each));
    steps.push_back({row.name, row.target, row.weighed, each == key()});
  }
  return steps;
}

QString WeighSteps::nextName() const {
  if (m_at + 1 >= count()) return {};
  const auto* next = sheet().planned.plan.find(m_order[static_cast<std::size_t>(m_at + 1)]);
  return next == nullptr ? QString() : toQt(next->name);
}

void WeighSteps::go(int to) {
  if (isEmpty()) return;
  m_at = std::clamp(to, 0, count() - 1);
  m_typed.clear();
  judge();
  emit moved();
}

void WeighSteps::next() { go(m_at + 1); }
void WeighSteps::previous() { go(m_at - 1); }

void WeighSteps::setTyped(const QString& line) {
  m_typed = line;
  judge();
}

void WeighSteps::say(const QString& understood, Tone tone) {
  m_understood = understood;
  m_tone = tone;
  m_deviation.clear();
  m_question.clear();
  m_likely.clear();
}

void WeighSteps::ask(const std::vector<app::SlipQuestion>& questions) {
  QStringList asked;
  for (const app::SlipQuestion& question : questions)
    asked += toQt(question.what) + QStringLiteral(": ") + toQt(question.ask);
  m_question = asked.join(QLatin1Char('\n'));
  m_likely = questions.empty() ? QString() : toQt(questions.front().likelyText);
}

/// With every key: what the line would mean.
void WeighSteps::judge() {
  if (isEmpty() || m_typed.trimmed().isEmpty()) {
    say({}, Tone::kQuiet);
    emit changed();
    return;
  }
  const BalanceReading reading = readBalanceLine(m_typed, row().unit);
  const auto meant = app::previewWeighing(sheet(), key(), toUtf8(reading.text));
  if (!meant) {
    say(sentences(meant.error(), false), Tone::kFault);
  } else {
    const bool within = meant->withinTolerance;
    QString read = tr("read as %1").arg(reading.text);
    if (reading.unitAdded) read += tr(" (no unit came: taken as %1)").arg(row().unit);
    if (!meant->asCharged.empty()) read += QStringLiteral(" · ") + toQt(meant->asCharged);
    say(read, within ? Tone::kGood : Tone::kOff);
    if (meant->offTargetPercent)
      m_deviation = deviationText(*meant->offTargetPercent) +
                    (within ? tr(", within tolerance") : tr(", beyond tolerance"));
  }
  emit changed();
}

void WeighSteps::record() {
  if (m_typed.trimmed().isEmpty() || isEmpty()) return;
  recordTyped(m_typed, false);
}

void WeighSteps::accept() { recordTyped(m_typed, true); }

void WeighSteps::takeLikely() {
  if (!m_likely.isEmpty()) recordTyped(QString(m_likely), false);
}

void WeighSteps::recordTyped(const QString& line, bool accepted) {
  const ChargeRow on = row();
  const BalanceReading reading = readBalanceLine(line, on.unit);
  if (reading.unsteady && !accepted) {
    say(tr("The balance says that it was not at rest: wait until it is, and send the weight "
           "again."),
        Tone::kFault);
    emit changed();
    return;
  }
  if (const QString refusal = m_run.refusal(app::Deed::kWeigh); !refusal.isEmpty()) {
    say(refusal, Tone::kFault);
    emit changed();
    return;
  }
  const auto again = [this, key = on.key, line, accepted] {
    startAt(key);
    m_typed = line;
    recordTyped(line, accepted);
  };
  if (!m_reason.allows(app::Deed::kWeigh, tr("weigh %1").arg(on.name), again)) {
    say(tr("Not recorded yet: say above why it is changed."), Tone::kFault);
    emit changed();
    return;
  }
  takeOutcome(reading.text, m_run.weigh(on.key, reading.text, {m_reason.text(), accepted}));
}

void WeighSteps::takeOutcome(const QString& text, const Outcome& outcome) {
  if (outcome.done) {
    emit written(row().name + QStringLiteral(": ") + text);
    next();
    return;
  }
  if (!outcome.faults.empty())
    say(sentences(outcome.faults, false), Tone::kFault);
  else
    ask(outcome.questions);
  emit changed();
}

void WeighSteps::retarget() {
  workOutTargets();
  judge();
}

void WeighSteps::workOutTargets() {
  m_changes.clear();
  m_retargetFault.clear();
  m_retargeted.reset();
  if (!m_run.isOpen()) return;
  auto followed = app::loadRun(m_run.link().notebook(), m_run.run(), charge::Retarget::kYes);
  if (!followed) {
    m_retargetFault = sentences(followed.error(), false);
    return;
  }
  const std::vector<ChargeRow> before = chargeRows(m_run.sheet());
  const std::vector<ChargeRow> after = chargeRows(*followed);
  for (std::size_t i = 0; i < before.size() && i < after.size(); ++i) {
    if (before[i].target != after[i].target)
      m_changes.push_back({before[i].name, before[i].target, after[i].target});
  }
  m_retargeted = *std::move(followed);
}

}  // namespace vialkeeper::ui
