// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/vial_strip_widget.h"

namespace vialkeeper::ui {

VialStripWidget::VialStripWidget(OpenRun& run, QWidget* parent) : QWidget(parent), m_run(run) {}

}  // namespace vialkeeper::ui
