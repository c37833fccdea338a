// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/run_search.h"

namespace vialkeeper::ui {

/// The line in which runs are searched, completed from what the notebook holds.
class FilterLine : public QWidget {
  Q_OBJECT

 public:
  explicit FilterLine(RunSearch& search, QWidget* parent = nullptr);

 private:
  RunSearch& m_search;
};

}  // namespace vialkeeper::ui
