// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/evidence_page.h"

namespace vialkeeper::ui {

EvidencePage::EvidencePage(OpenRun& run, QWidget* parent) : QWidget(parent), m_run(run) {}

}  // namespace vialkeeper::ui
