// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include "ui/charts/plot_widget.h"
#include "ui/models/dataset_preview.h"
#include "ui/models/reading_series.h"

namespace vialkeeper::ui {

/// The readings of a log in the theme's colours, as a plot.
[[nodiscard]] PlotContent readingPlot(const ReadingSeries& readings);

/// A dataset's columns against its first one.
[[nodiscard]] PlotContent datasetPlot(const EvidenceContent& content);

}  // namespace vialkeeper::ui
