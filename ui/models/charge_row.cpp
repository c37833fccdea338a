// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/charge_row.h"

#include <algorithm>
#include <cmath>

#include "app/sheet_content.h"
#include "app/sheet_parts.h"
#include "charge/amount_cell.h"
#include "charge/trail.h"
#include "ui/models/qt_text.h"
#include "units/shown.h"

namespace vialkeeper::ui {
namespace {

constexpr double kNothingOff_percent = 0.05;

bool hasNotice(const charge::ComponentCharge& component, std::string_view code) {
  return std::ranges::find(component.notices, code, &text::Notice::code) != component.notices.end();
}

/// The ratio that really went in, in the unit of the planned one.
QString chargedText(const charge::ComponentPlan& plan, const charge::ComponentCharge& component) {
  const charge::AsCharged& charged = *component.charged;
  if (plan.isSolvent() || !charged.equiv || !charged.molPercent) {
    if (charged.volume) return toQt(units::shown(*charged.volume));
    return charged.mass ? toQt(units::shown(*charged.mass)) : QString();
  }
  charge::ComponentCharge asCharged = component;
  asCharged.equiv = charged.equiv->value();
  asCharged.molPercent = charged.molPercent->value();
  return toQt(charge::ratioText(plan, asCharged));
}

void fillInCharged(const charge::ComponentPlan& plan, const charge::ComponentCharge& component,
                   ChargeRow& row) {
  if (!component.charged) return;
  row.charged = chargedText(plan, component);
  if (!component.charged->offTargetPercent) return;
  row.deviation = deviationText(*component.charged->offTargetPercent);
  row.chargedTone = hasNotice(component, "off-target") ? Tone::kOff : Tone::kGood;
}

void fillInWeighed(const app::RunSheet& sheet, ChargeRow& row) {
  const auto record = std::ranges::find(sheet.components, row.key, &app::ComponentRecord::key);
  if (record == sheet.components.end()) return;
  row.weighed = toQt(record->actualText);
  if (record->weighed)
    row.weighedBy =
        toQt(record->weighedBy) + QStringLiteral(", ") +
        toQt(toIsoText(*record->weighed).substr(0, 16)).replace(QLatin1Char('T'), QLatin1Char(' '));
}

}  // namespace

QString deviationText(double offTargetPercent) {
  const double size = std::abs(offTargetPercent);
  if (size < kNothingOff_percent) return QStringLiteral("on target");
  return QStringLiteral("%1 % %2")
      .arg(size, 0, 'f', size < 100.0 ? 1 : 0)
      .arg(offTargetPercent > 0.0 ? QStringLiteral("above") : QStringLiteral("below"));
}

ChargeRow chargeRow(const app::RunSheet& sheet, std::size_t component) {
  const charge::Plan& plan = sheet.planned.plan;
  const charge::ComponentPlan& planned = plan.components[component];
  const charge::ComponentCharge& result = *sheet.planned.charge.find(planned.key);
  const app::TargetText target = app::targetText(planned, result);
  ChargeRow row;
  row.key = planned.key;
  row.name = toQt(planned.name);
  row.isLimiting = planned.key == plan.limiting;
  row.roleLine =
      toQt(toText(planned.role)) + QStringLiteral(" · ") + toQt(charge::supplyText(plan, planned));
  if (row.isLimiting) row.roleLine += QStringLiteral(" · limiting");
  row.amount = toQt(charge::amountCellText(planned));
  if (result.amount_mol && !planned.isSolvent())
    row.mmol = toQt(
        units::toSignificant(units::Amount::fromMoles(result.amount_mol->value()).millimoles(), 3));
  row.ratio = toQt(charge::ratioText(planned, result));
  row.target = toQt(target.number) + QLatin1Char(' ') + toQt(target.unit);
  row.unit = toQt(target.unit);
  row.tolerance = toQt(target.tolerance);
  row.alternative = toQt(target.alternative);
  for (const text::Notice& notice : result.notices) row.notices += toQt(notice.text);
  fillInCharged(planned, result, row);
  fillInWeighed(sheet, row);
  return row;
}

std::vector<ChargeRow> chargeRows(const app::RunSheet& sheet) {
  std::vector<ChargeRow> rows;
  for (std::size_t i = 0; i < sheet.planned.plan.components.size(); ++i)
    rows.push_back(chargeRow(sheet, i));
  return rows;
}

QStringList vialLines(const app::RunSheet& sheet) {
  QStringList lines;
  for (const std::string& line : app::weighingSheet(sheet.planned).vial.lines) lines += toQt(line);
  return lines;
}

QStringList cautionLines(const app::RunSheet& sheet) {
  QStringList lines;
  for (const std::string& line : app::cautionsOf(sheet.planned.plan)) lines += toQt(line);
  return lines;
}

}  // namespace vialkeeper::ui
