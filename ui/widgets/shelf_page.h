// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/notebook_link.h"

class QTabWidget;

namespace vialkeeper::ui {

/// Substances, lots, stocks, vials, lamps, balances and pipettes: a table and a form for each.
class ShelfPage : public QWidget {
  Q_OBJECT

 public:
  explicit ShelfPage(NotebookLink& link, QWidget* parent = nullptr);
  [[nodiscard]] QTabWidget& compartments() { return *m_tabs; }

 private:
  QTabWidget* m_tabs;
};

}  // namespace vialkeeper::ui
