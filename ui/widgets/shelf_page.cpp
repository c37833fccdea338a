// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/shelf_page.h"

namespace vialkeeper::ui {

ShelfPage::ShelfPage(NotebookLink& link, QWidget* parent) : QWidget(parent), m_link(link) {}

}  // namespace vialkeeper::ui
