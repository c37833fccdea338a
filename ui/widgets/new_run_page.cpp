// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/new_run_page.h"

namespace vialkeeper::ui {

NewRunPage::NewRunPage(NotebookLink& link, QWidget* parent) : QWidget(parent), m_link(link) {}

void NewRunPage::startFrom(app::RowNumber run) { Q_UNUSED(run) }

}  // namespace vialkeeper::ui
