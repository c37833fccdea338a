// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>

#include "units/iso_time.h"

namespace vialkeeper::ui {

/// A moment by the clock of the place where it was noted: `2026-03-04 14:20`.
[[nodiscard]] inline QString momentText(const units::Moment& moment) {
  QString text = QString::fromStdString(toIsoText(moment)).left(16);
  text.replace(QLatin1Char('T'), QLatin1Char(' '));
  return text;
}

/// Its time of day alone: `14:20`.
[[nodiscard]] inline QString clockText(const units::Moment& moment) {
  return momentText(moment).mid(11);
}

}  // namespace vialkeeper::ui
