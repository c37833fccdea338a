// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/runs_table.h"

namespace vialkeeper::ui {

RunsTable::RunsTable(RunSearch& search, QWidget* parent) : QWidget(parent), m_search(search) {}

app::RowNumber RunsTable::selectedRun() const { return 0; }
void RunsTable::select(app::RowNumber run) { Q_UNUSED(run) }

}  // namespace vialkeeper::ui
