// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// The vial of the open run: drawn to scale, its gauge, the lamp's clock, the line of time.
class VialStripWidget : public QWidget {
  Q_OBJECT

 public:
  explicit VialStripWidget(OpenRun& run, QWidget* parent = nullptr);

 signals:
  /// A mark on the line of time was chosen.
  void entryChosen(int entry);

 private:
  OpenRun& m_run;
};

}  // namespace vialkeeper::ui
