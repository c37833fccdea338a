// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/charge_trail.h"

#include "charge/trail.h"
#include "ui/models/charge_row.h"
#include "ui/models/charge_table_model.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

using Column = ChargeTableModel::Column;

/// The steps of the core; sources and uncertainties stand apart, as they are read second.
void sortInto(const std::vector<std::string>& steps, CellTrail& trail) {
  for (const std::string& step : steps) {
    const bool second = step.starts_with("u = ") || step.starts_with("molar mass: ") ||
                        step.starts_with("density: ");
    (second ? trail.sources : trail.steps) += toQt(step);
  }
}

QString shownIn(const ChargeRow& row, int column) {
  switch (column) {
    case Column::kAmount:
      return row.amount;
    case Column::kMillimoles:
      return row.mmol.isEmpty() ? row.mmol : row.mmol + QStringLiteral(" mmol");
    case Column::kRatio:
      return row.ratio;
    case Column::kTarget:
      return row.target;
    case Column::kWeighed:
      return row.weighed;
    case Column::kCharged:
      return row.charged;
    default:
      return {};
  }
}

}  // namespace

CellTrail cellTrail(const app::RunSheet& sheet, const std::string& key, int column) {
  const charge::Plan& plan = sheet.planned.plan;
  if (plan.find(key) == nullptr) return {};
  const ChargeRow row = chargeRow(sheet, plan.indexOf(key));
  const QString shown = shownIn(row, column);
  CellTrail trail;
  trail.heading = shown.isEmpty() ? row.name : row.name + QStringLiteral(": ") + shown;
  if (column == Column::kWeighed || column == Column::kCharged) {
    if (row.weighed.isEmpty()) {
      trail.steps +=
          QStringLiteral("nothing is recorded yet; aim at %1 %2").arg(row.target, row.tolerance);
      return trail;
    }
    sortInto(charge::chargedTrailOf(plan, sheet.planned.charge, key), trail);
    trail.sources += QStringLiteral("%1 was typed by %2").arg(row.weighed, row.weighedBy);
    return trail;
  }
  sortInto(charge::trailOf(plan, sheet.planned.charge, key), trail);
  return trail;
}

QStringList chargeNotices(const app::RunSheet& sheet) {
  QStringList notices;
  for (const text::Notice& notice : sheet.planned.charge.notices) notices += toQt(notice.text);
  return notices;
}

}  // namespace vialkeeper::ui
