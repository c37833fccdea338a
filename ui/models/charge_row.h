// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <QStringList>
#include <string>
#include <vector>

#include "app/notebook/run_plan.h"

namespace vialkeeper::ui {

/// What a text in the table says besides its words.
enum class Tone { kPlain, kQuiet, kGood, kOff, kFault };

/// One component as the table shows it: every text final.
struct ChargeRow {
  std::string key;
  QString name;
  QString roleLine;  ///< role and supply
  QString amount;    ///< as written
  QString mmol;
  QString ratio;
  QString target;       ///< `26.6 mg`
  QString unit;         ///< of the target, `mg`
  QString tolerance;    ///< `± 0.5 mg`
  QString alternative;  ///< of a neat liquid the same in the other unit
  QString weighed;      ///< as typed; empty where nothing is recorded
  QString weighedBy;    ///< `KW, 2026-03-04 09:12`
  QString charged;
  QString deviation;  ///< `1.3 % above`
  Tone chargedTone = Tone::kPlain;
  QStringList notices;
  bool isLimiting = false;
};

/// The components of a run in the plan's order.
[[nodiscard]] std::vector<ChargeRow> chargeRows(const app::RunSheet& sheet);
[[nodiscard]] ChargeRow chargeRow(const app::RunSheet& sheet, std::size_t component);

/// How far from its target something is: `1.3 % above`, `on target`.
[[nodiscard]] QString deviationText(double offTargetPercent);

/// What is in the vial, in lines for below the table: volumes, fill, headspace.
[[nodiscard]] QStringList vialLines(const app::RunSheet& sheet);
/// What a colleague would say before it is closed.
[[nodiscard]] QStringList cautionLines(const app::RunSheet& sheet);

}  // namespace vialkeeper::ui
