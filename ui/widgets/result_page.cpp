// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/result_page.h"

namespace vialkeeper::ui {

ResultPage::ResultPage(OpenRun& run, QWidget* parent) : QWidget(parent), m_run(run) {}

}  // namespace vialkeeper::ui
