// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QList>
#include <QString>
#include <optional>

#include "app/notebook/find_query.h"

/// What a table of runs can show of one.
namespace vialkeeper::ui {

enum class RunColumn {
  kCode,
  kTitle,
  kState,
  kDate,
  kPerson,
  kSeries,
  kSubstrate,
  kPhotocatalyst,
  kCocatalyst,
  kAdditive,
  kSolvent,
  kTemperature,
  kWavelength,
  kLamp,
  kVial,
  kYield,
  kConversion
};

/// All of them, in the order in which a table shows those that are chosen.
[[nodiscard]] const QList<RunColumn>& allRunColumns();
[[nodiscard]] const QList<RunColumn>& defaultRunColumns();

/// The head of the column: `yield, %`.
[[nodiscard]] QString titleOf(RunColumn column);
/// The longest text that the column usually holds: it sets the width.
[[nodiscard]] QString sampleOf(RunColumn column);
[[nodiscard]] bool isNumber(RunColumn column);
[[nodiscard]] QString textOf(RunColumn column, const app::FoundRun& found);
/// For screen readers: with what it is and in words, `yield 71 plus or minus 2 percent`.
[[nodiscard]] QString spokenOf(RunColumn column, const app::FoundRun& found);

/// The order that a click on the column's head asks for; nothing where runs are not put in order by
/// it.
[[nodiscard]] std::optional<app::FindOrder> orderAfterClick(RunColumn column, app::FindOrder now);
/// The column whose head shows that the runs are in this order, and whether upwards.
struct OrderMark {
  RunColumn column;
  bool ascending;
};
[[nodiscard]] std::optional<OrderMark> markOf(app::FindOrder order);
/// `newest first`
[[nodiscard]] QString nameOf(app::FindOrder order);

/// The user's choice, kept in the settings.
[[nodiscard]] QList<RunColumn> chosenRunColumns();
void rememberRunColumns(const QList<RunColumn>& columns);

}  // namespace vialkeeper::ui
