// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/shelf_page.h"

#include <QLabel>
#include <QTabWidget>
#include <QVBoxLayout>

#include "ui/models/shelf_model.h"
#include "ui/widgets/shelf_compartment_page.h"

namespace vialkeeper::ui {

ShelfPage::ShelfPage(NotebookLink& link, QWidget* parent)
    : QWidget(parent), m_tabs(new QTabWidget) {
  setObjectName(QStringLiteral("page"));
  auto* title = new QLabel(tr("Shelf"));
  title->setProperty("heading", true);
  m_tabs->setDocumentMode(true);
  m_tabs->setAccessibleName(tr("Compartments of the shelf"));
  for (const ShelfCompartment& compartment : shelfCompartments())
    m_tabs->addTab(new ShelfCompartmentPage(link, compartment), compartment.title);
  setFocusProxy(m_tabs);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(16, 10, 16, 8);
  column->addWidget(title);
  column->addWidget(m_tabs, 1);
}

}  // namespace vialkeeper::ui
