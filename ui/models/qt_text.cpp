// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/qt_text.h"

#include <QStringList>

namespace vialkeeper::ui {

QString sentences(const text::Faults& faults, bool withPlace) {
  QStringList lines;
  for (const text::Fault& fault : faults) {
    QString line;
    if (withPlace && !fault.field.empty()) line += toQt(fault.field) + QStringLiteral(": ");
    line += toQt(fault.what);
    if (!fault.mend.empty()) line += QStringLiteral(": ") + toQt(fault.mend);
    lines += line + QLatin1Char('.');
  }
  return lines.join(QLatin1Char('\n'));
}

}  // namespace vialkeeper::ui
