// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// The charge of the open run: one table, one cell that takes amounts, where each number is from.
class ChargePage : public QWidget {
  Q_OBJECT

 public:
  explicit ChargePage(OpenRun& run, QWidget* parent = nullptr);

 private:
  OpenRun& m_run;
};

}  // namespace vialkeeper::ui
