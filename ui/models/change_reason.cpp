// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/change_reason.h"

#include <QStringList>
#include <utility>

namespace vialkeeper::ui {

ChangeReason::ChangeReason(OpenRun& run, QObject* parent) : QObject(parent), m_run(run) {
  connect(&m_run, &OpenRun::opened, this, &ChangeReason::forget);
}

bool ChangeReason::allows(app::Deed deed, const QString& what, std::function<void()> then) {
  if (!m_run.wantsReason(deed) || !m_text.isEmpty()) return true;
  m_waiting.push_back({what, std::move(then)});
  emit changed();
  return false;
}

QString ChangeReason::waitingFor() const {
  QStringList all;
  for (const Waiting& each : m_waiting) all += each.what;
  all.removeDuplicates();
  return all.join(QStringLiteral(", "));
}

void ChangeReason::give(const QString& reason) {
  if (reason.trimmed().isEmpty()) return;
  m_text = reason.trimmed();
  const auto waiting = std::exchange(m_waiting, {});
  for (const Waiting& each : waiting) each.then();
  emit changed();
}

void ChangeReason::giveUp() {
  m_waiting.clear();
  emit givenUp();
  emit changed();
}

void ChangeReason::forget() {
  m_text.clear();
  m_waiting.clear();
  emit changed();
}

}  // namespace vialkeeper::ui
