// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <string>
#include <string_view>

#include "text/fault.h"

/// Between the core's UTF-8 and Qt's texts.
namespace vialkeeper::ui {

[[nodiscard]] inline QString toQt(std::string_view utf8) {
  return QString::fromUtf8(utf8.data(), static_cast<qsizetype>(utf8.size()));
}
[[nodiscard]] inline std::string toUtf8(const QString& text) { return text.toStdString(); }

/// Faults as a person reads them in the window, one sentence a line: what is wrong, and how to mend
/// it. The place is left out where the sentence stands beside it.
[[nodiscard]] QString sentences(const text::Faults& faults, bool withPlace = true);

}  // namespace vialkeeper::ui
