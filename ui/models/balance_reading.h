// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>

namespace vialkeeper::ui {

/// A line that a balance, a keyboard wedge or a person typed, as the text that is recorded.
struct BalanceReading {
  QString text;            ///< `3.12 mg`; what cannot be made out stays as it came
  bool unitAdded = false;  ///< the line had none: the target's was taken
  bool unsteady = false;   ///< the balance marked it as not at rest
};

/// Takes out of a line what balances put around a number: control characters, the marks of a net or
/// steady weight (`N`, `G`, `S S`, `ST,NT,`), blanks and zeros in front of the figures, a plus. A
/// bare number gets `unit`, unless that is empty. Decimal sign and figures stay as they came, and a
/// text that is no such line stays whole: whether it is a quantity is the core's to say.
[[nodiscard]] BalanceReading readBalanceLine(const QString& line, const QString& unit);

}  // namespace vialkeeper::ui
