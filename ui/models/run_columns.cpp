// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/run_columns.h"

#include <QCoreApplication>
#include <QSettings>
#include <QStringList>
#include <array>

#include "app/notebook/run_text.h"
#include "ui/models/qt_text.h"
#include "units/iso_time.h"

namespace vialkeeper::ui {
namespace {

const QString kKey = QStringLiteral("runs/columns");

struct ColumnFacts {
  RunColumn column;
  const char* key;    ///< in the settings: never changed
  const char* title;  ///< to be translated
  const char* sample;
  bool isNumber = false;
};

constexpr std::array<ColumnFacts, 17> kFacts{{
    {RunColumn::kCode, "code", QT_TRANSLATE_NOOP("runs", "code"), "KW-00042"},
    {RunColumn::kTitle, "title", QT_TRANSLATE_NOOP("runs", "what it is"),
     "Indoline dehydrogenation"},
    {RunColumn::kState, "state", QT_TRANSLATE_NOOP("runs", "state"), "irradiating"},
    {RunColumn::kDate, "date", QT_TRANSLATE_NOOP("runs", "date"), "2026-03-04"},
    {RunColumn::kPerson, "person", QT_TRANSLATE_NOOP("runs", "person"), "KW"},
    {RunColumn::kSeries, "series", QT_TRANSLATE_NOOP("runs", "series"), "acid additives"},
    {RunColumn::kSubstrate, "substrate", QT_TRANSLATE_NOOP("runs", "substrate"),
     "tetrahydroquinoline"},
    {RunColumn::kPhotocatalyst, "photocatalyst", QT_TRANSLATE_NOOP("runs", "photocatalyst"),
     "4CzIPN 0.50 %"},
    {RunColumn::kCocatalyst, "cocatalyst", QT_TRANSLATE_NOOP("runs", "cocatalyst"),
     "nickel(II) bromide glyme 5.0 %"},
    {RunColumn::kAdditive, "additive", QT_TRANSLATE_NOOP("runs", "acid, additive"),
     "trifluoroacetic acid 10 %"},
    {RunColumn::kSolvent, "solvent", QT_TRANSLATE_NOOP("runs", "solvent"), "acetonitrile, water"},
    {RunColumn::kTemperature, "temperature", QT_TRANSLATE_NOOP("runs", "temp."), "35 °C", true},
    {RunColumn::kWavelength, "wavelength", QT_TRANSLATE_NOOP("runs", "light"), "440 nm", true},
    {RunColumn::kLamp, "lamp", QT_TRANSLATE_NOOP("runs", "lamp"), "LED 440 ring"},
    {RunColumn::kVial, "vial", QT_TRANSLATE_NOOP("runs", "vial"), "10 mL crimp vial"},
    {RunColumn::kYield, "yield", QT_TRANSLATE_NOOP("runs", "yield, %"), "71.5 ± 0.5", true},
    {RunColumn::kConversion, "conversion", QT_TRANSLATE_NOOP("runs", "conv., %"), "71.5 ± 0.5",
     true},
}};

const ColumnFacts& factsOf(RunColumn column) { return kFacts.at(static_cast<std::size_t>(column)); }

QString componentsIn(const app::FoundRun& found, std::initializer_list<std::string_view> roles) {
  return toQt(app::componentsText(found, {roles.begin(), roles.size()}));
}

QString yieldOf(const app::RunRecord& run) {
  if (run.yield_percent) return toQt(app::percentText(run.yield_percent, run.uYield_percent));
  // Still to come, or never measured.
  return run.state < app::RunState::kWorkedUp ? QStringLiteral("…") : QStringLiteral("–");
}

}  // namespace

const QList<RunColumn>& allRunColumns() {
  static const QList<RunColumn> all = [] {
    QList<RunColumn> list;
    for (const ColumnFacts& facts : kFacts) list += facts.column;
    return list;
  }();
  return all;
}

const QList<RunColumn>& defaultRunColumns() {
  static const QList<RunColumn> few{RunColumn::kCode, RunColumn::kTitle, RunColumn::kYield};
  return few;
}

QString titleOf(RunColumn column) {
  return QCoreApplication::translate("runs", factsOf(column).title);
}

QString sampleOf(RunColumn column) { return QString::fromUtf8(factsOf(column).sample); }

bool isNumber(RunColumn column) { return factsOf(column).isNumber; }

QString textOf(RunColumn column, const app::FoundRun& found) {
  const app::RunRecord& run = found.run;
  switch (column) {
    case RunColumn::kCode:
      return toQt(run.code);
    case RunColumn::kTitle:
      return toQt(app::titleText(found));
    case RunColumn::kState:
      return toQt(app::toText(run.state));
    case RunColumn::kDate:
      return toQt(units::toIsoText(run.created).substr(0, 10));
    case RunColumn::kPerson:
      return toQt(run.person);
    case RunColumn::kSeries:
      return toQt(run.series);
    case RunColumn::kSubstrate:
      return componentsIn(found, {"substrate", "partner"});
    case RunColumn::kPhotocatalyst:
      return componentsIn(found, {"photocatalyst"});
    case RunColumn::kCocatalyst:
      return componentsIn(found, {"cocatalyst"});
    case RunColumn::kAdditive:
      return componentsIn(found, {"acid", "additive", "base"});
    case RunColumn::kSolvent:
      return componentsIn(found, {"solvent"});
    case RunColumn::kTemperature:
      return toQt(app::measureText(run.temperature_C, "°C"));
    case RunColumn::kWavelength:
      return toQt(app::measureText(run.wavelength_nm, "nm"));
    case RunColumn::kLamp:
      return toQt(run.lamp);
    case RunColumn::kVial:
      return toQt(run.vial);
    case RunColumn::kYield:
      return yieldOf(run);
    case RunColumn::kConversion:
      return toQt(app::percentText(run.conversion_percent, run.uConversion_percent));
  }
  return {};
}

QString spokenOf(RunColumn column, const app::FoundRun& found) {
  const app::RunRecord& run = found.run;
  if (column == RunColumn::kCode) {
    return QCoreApplication::translate("runs", "%1, %2")
        .arg(toQt(run.code), toQt(app::toText(run.state)));
  }
  const bool isShare = column == RunColumn::kYield || column == RunColumn::kConversion;
  QString value = textOf(column, found);
  if (value.isEmpty() || (column == RunColumn::kYield && !run.yield_percent))
    value = QCoreApplication::translate("runs", "none recorded");
  else if (isShare)
    value = QCoreApplication::translate("runs", "%1 percent")
                .arg(value.replace(QStringLiteral("±"),
                                   QCoreApplication::translate("runs", "plus or minus")));
  if (column == RunColumn::kTitle) return value;
  return titleOf(column).section(QLatin1Char(','), 0, 0) + QLatin1Char(' ') + value;
}

std::optional<app::FindOrder> orderAfterClick(RunColumn column, app::FindOrder now) {
  using app::FindOrder;
  // A second click goes back to the usual order, or turns it round where it can be.
  const auto toggled = [now](FindOrder order, FindOrder other) {
    return now == order ? other : order;
  };
  switch (column) {
    case RunColumn::kCode:
      return toggled(FindOrder::kCode, FindOrder::kNewest);
    case RunColumn::kDate:
      return toggled(FindOrder::kNewest, FindOrder::kOldest);
    case RunColumn::kTitle:
      return toggled(FindOrder::kRank, FindOrder::kNewest);
    case RunColumn::kYield:
      return toggled(FindOrder::kYield, FindOrder::kNewest);
    default:
      return std::nullopt;
  }
}

std::optional<OrderMark> markOf(app::FindOrder order) {
  switch (order) {
    case app::FindOrder::kCode:
      return OrderMark{RunColumn::kCode, true};
    case app::FindOrder::kNewest:
      return OrderMark{RunColumn::kDate, false};
    case app::FindOrder::kOldest:
      return OrderMark{RunColumn::kDate, true};
    case app::FindOrder::kRank:
      return OrderMark{RunColumn::kTitle, false};
    case app::FindOrder::kYield:
      return OrderMark{RunColumn::kYield, false};
  }
  return std::nullopt;
}

QString nameOf(app::FindOrder order) {
  const char* name = "";
  switch (order) {
    case app::FindOrder::kCode:
      name = QT_TRANSLATE_NOOP("runs", "by code");
      break;
    case app::FindOrder::kNewest:
      name = QT_TRANSLATE_NOOP("runs", "newest first");
      break;
    case app::FindOrder::kOldest:
      name = QT_TRANSLATE_NOOP("runs", "oldest first");
      break;
    case app::FindOrder::kRank:
      name = QT_TRANSLATE_NOOP("runs", "words that fit best first");
      break;
    case app::FindOrder::kYield:
      name = QT_TRANSLATE_NOOP("runs", "highest yield first");
      break;
  }
  return QCoreApplication::translate("runs", name);
}

QList<RunColumn> chosenRunColumns() {
  const QStringList keys = QSettings().value(kKey).toStringList();
  QList<RunColumn> columns;
  for (const ColumnFacts& facts : kFacts) {
    if (keys.contains(QLatin1String(facts.key))) columns += facts.column;
  }
  return columns.isEmpty() ? defaultRunColumns() : columns;
}

void rememberRunColumns(const QList<RunColumn>& columns) {
  QStringList keys;
  for (const RunColumn column : columns) keys += QLatin1String(factsOf(column).key);
  QSettings().setValue(kKey, keys);
}

}  // namespace vialkeeper::ui
