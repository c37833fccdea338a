// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// The log of the open run: stamps, the one line, the chart of readings, the entries.
class LogPage : public QWidget {
  Q_OBJECT

 public:
  explicit LogPage(OpenRun& run, QWidget* parent = nullptr);

  /// Shows an entry and selects it.
  void goToEntry(int entry);
  /// Puts the cursor into the one line.
  void startEntry();

 private:
  OpenRun& m_run;
};

}  // namespace vialkeeper::ui
