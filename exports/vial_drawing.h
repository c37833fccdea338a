// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "exports/page_painter.h"

namespace vialkeeper::exports {

/// The vial's width for a height of 1.
inline constexpr double kVialAspect = 0.52;

/// A closed crimp vial with a stir bar. The liquid stands where the given share of the drawn
/// vial's own volume is below it, so that the shoulder is reckoned with; a share outside 0 to 1
/// is taken as the nearer end.
void drawVial(PagePainter& painter, double x_mm, double y_mm, double height_mm, double fill);

}  // namespace vialkeeper::exports
