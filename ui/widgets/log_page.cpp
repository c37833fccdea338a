// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/log_page.h"

namespace vialkeeper::ui {

LogPage::LogPage(OpenRun& run, QWidget* parent) : QWidget(parent), m_run(run) {}

void LogPage::goToEntry(int entry) { Q_UNUSED(entry) }
void LogPage::startEntry() { setFocus(); }

}  // namespace vialkeeper::ui
