// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/balance_reading.h"

#include <QRegularExpression>

namespace vialkeeper::ui {
namespace {

/// No control or format characters, every blank a plain one and none doubled.
QString withoutControls(const QString& line) {
  QString plain;
  for (const QChar c : line) {
    if (c.isSpace())
      plain += QLatin1Char(' ');
    else if (c.category() != QChar::Other_Control && c.category() != QChar::Other_Format)
      plain += c;
  }
  return plain.simplified();
}

const QRegularExpression& lineForm() {
  // Marks, sign, figures, unit, and a mark behind that some balances set.
  static const QRegularExpression form(QStringLiteral(
      "^(?<marks>(?:(?:[A-Za-z]{1,2}|\\?)[ ,:]+){0,3})(?<sign>[+-]?) ?"
      "(?:0*(?=\\d))?(?<figures>\\d+(?:[.,]\\d*)?|[.,]\\d+) ?(?<unit>[A-Za-zµμ]*)(?<end> ?[?]?)$"));
  return form;
}

bool isUnsteady(const QString& marks) {
  static const QRegularExpression mark(QStringLiteral("\\b(US|SD|D)\\b|\\?"),
                                       QRegularExpression::CaseInsensitiveOption);
  return marks.contains(mark);
}

bool areKnown(const QString& marks) {
  static const QRegularExpression known(
      QStringLiteral("^(?:(?:N|NT|G|GS|S|ST|SD|US|D|\\?)[ ,:]+)*$"),
      QRegularExpression::CaseInsensitiveOption);
  return known.match(marks).hasMatch();
}

}  // namespace

BalanceReading readBalanceLine(const QString& line, const QString& unit) {
  const QString plain = withoutControls(line);
  const QRegularExpressionMatch match = lineForm().match(plain);
  if (!match.hasMatch() || !areKnown(match.captured(u"marks"))) return {.text = plain};
  const QString sign =
      match.captured(u"sign") == QStringLiteral("-") ? QStringLiteral("-") : QString();
  QString ownUnit = match.captured(u"unit");
  BalanceReading reading;
  reading.unsteady =
      isUnsteady(match.captured(u"marks")) || match.captured(u"end").contains(QLatin1Char('?'));
  reading.unitAdded = ownUnit.isEmpty() && !unit.isEmpty();
  if (reading.unitAdded) ownUnit = unit;
  reading.text = (sign + match.captured(u"figures") + QLatin1Char(' ') + ownUnit).trimmed();
  return reading;
}

}  // namespace vialkeeper::ui
