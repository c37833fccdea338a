// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/log_stamps.h"

#include <QCoreApplication>

namespace vialkeeper::ui {
namespace {

QString tr(const char* text) { return QCoreApplication::translate("Stamp", text); }

StampDeed begun(const QString& before, const QString& after, const QString& typed) {
  const QString figure = typed.trimmed();
  if (!figure.isEmpty() && figure.front().isDigit()) {
    const QString line = before + figure;
    return {StampDeed::How::kBegin, line, static_cast<int>(line.size())};
  }
  return {StampDeed::How::kBegin, before + after, static_cast<int>(before.size())};
}

StampDeed logged(const QString& line) { return {StampDeed::How::kLog, line, 0}; }

}  // namespace

QString stampWord(Stamp stamp, bool lampIsOn) {
  switch (stamp) {
    case Stamp::kLamp:
      return lampIsOn ? tr("Lamp off") : tr("Lamp on");
    case Stamp::kPressure:
      return tr("Pressure");
    case Stamp::kTemperature:
      return tr("Temperature");
    case Stamp::kSample:
      return tr("Sample");
    case Stamp::kGasSample:
      return tr("Gas sample");
    case Stamp::kVent:
      return tr("Vent");
    case Stamp::kPurge:
      return tr("Purge");
    case Stamp::kPhoto:
      return tr("Photo");
    case Stamp::kNote:
      break;
  }
  return tr("Note");
}

QString stampMeaning(Stamp stamp) {
  switch (stamp) {
    case Stamp::kLamp:
      return QStringLiteral("lamp");
    case Stamp::kPressure:
      return QStringLiteral("gas");
    case Stamp::kSample:
    case Stamp::kGasSample:
      return QStringLiteral("sample");
    case Stamp::kVent:
    case Stamp::kPurge:
      return QStringLiteral("removal");
    default:
      return {};
  }
}

QString stampKey(Stamp stamp) { return QStringLiteral("Alt+%1").arg(static_cast<int>(stamp) + 1); }

StampDeed stampDeed(Stamp stamp, const app::VialStrip& strip, const QString& typed) {
  switch (stamp) {
    case Stamp::kLamp:
      return logged(strip.lampIsOn ? QStringLiteral("lamp off") : QStringLiteral("lamp on"));
    case Stamp::kPressure: {
      QString after = QStringLiteral(" bar");
      if (strip.pressure && strip.pressure->kind == "abs") after += QStringLiteral(" abs");
      if (strip.temperature)
        after += QStringLiteral(" %1 C").arg(strip.temperature->value, 0, 'g', 6);
      return begun(QStringLiteral("p "), after, typed);
    }
    case Stamp::kTemperature:
      return begun(QStringLiteral("T "), QStringLiteral(" C"), typed);
    case Stamp::kSample:
      return begun(QStringLiteral("aliquot "), QStringLiteral(" uL"), typed);
    case Stamp::kGasSample:
      return begun(QStringLiteral("gas "), QStringLiteral(" uL"), typed);
    case Stamp::kVent:
      return logged(QStringLiteral("vent"));
    case Stamp::kPurge:
      return logged(QStringLiteral("purge"));
    case Stamp::kPhoto:
      return {StampDeed::How::kChooseFile, {}, 0};
    case Stamp::kNote:
      break;
  }
  return begun(QStringLiteral("note "), {}, {});
}

}  // namespace vialkeeper::ui
