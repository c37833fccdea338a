// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// What came of the open run: yield, conversion, conclusion, its state, the seal.
class ResultPage : public QWidget {
  Q_OBJECT

 public:
  explicit ResultPage(OpenRun& run, QWidget* parent = nullptr);

 private:
  OpenRun& m_run;
};

}  // namespace vialkeeper::ui
