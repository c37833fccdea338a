// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <QStringList>
#include <string>

#include "app/notebook/run_plan.h"

namespace vialkeeper::ui {

/// Where a number of the charge is from.
struct CellTrail {
  QString heading;      ///< `pivalic acid, weigh or pipette: 200 µL`
  QStringList steps;    ///< formula with its inputs, one step a line
  QStringList sources;  ///< of constants, uncertainty, who typed it
};

/// The trail of one cell, by the table's column.
[[nodiscard]] CellTrail cellTrail(const app::RunSheet& sheet, const std::string& key, int column);

/// What holds for the charge as a whole.
[[nodiscard]] QStringList chargeNotices(const app::RunSheet& sheet);

}  // namespace vialkeeper::ui
