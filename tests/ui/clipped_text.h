// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QStringList>

class QWidget;

namespace vialkeeper::tests {

/// Every text under `window` that is visible and has no room: labels and buttons that are narrower
/// or lower than their text, cells of tables that are smaller than what their delegate wants to
/// show, tabs and headings that would be elided. One line each: what, where, how much is missing.
[[nodiscard]] QStringList clippedTexts(const QWidget& window);

}  // namespace vialkeeper::tests
