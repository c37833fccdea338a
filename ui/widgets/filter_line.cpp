// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/filter_line.h"

namespace vialkeeper::ui {

FilterLine::FilterLine(RunSearch& search, QWidget* parent) : QWidget(parent), m_search(search) {}

}  // namespace vialkeeper::ui
