// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/moment_text.h"

#include <QDateTime>

namespace vialkeeper::ui {
namespace {

QDateTime local(const units::Moment& at) {
  const auto offset = std::chrono::duration_cast<std::chrono::seconds>(at.offset);
  return QDateTime::fromMSecsSinceEpoch(at.utc.time_since_epoch().count(), Qt::OffsetFromUTC,
                                        static_cast<int>(offset.count()));
}

}  // namespace

QString clockText(const units::Moment& at) { return local(at).toString(QStringLiteral("HH:mm")); }

QString dayText(const units::Moment& at) { return local(at).toString(QStringLiteral("d MMM")); }

QString dayAndClockText(const units::Moment& at) {
  return local(at).toString(QStringLiteral("d MMM HH:mm"));
}

QString clockBeside(const units::Moment& at, const units::Moment& reference) {
  return isSameDay(at, reference) ? clockText(at) : dayAndClockText(at);
}

bool isSameDay(const units::Moment& a, const units::Moment& b) {
  return local(a).date() == local(b).date();
}

QString momentText(const units::Moment& at) {
  QString text = QString::fromStdString(toIsoText(at)).left(16);
  text.replace(QLatin1Char('T'), QLatin1Char(' '));
  return text;
}

}  // namespace vialkeeper::ui
