// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/run_search.h"

namespace vialkeeper::ui {

/// The runs that were found, with chosen columns.
class RunsTable : public QWidget {
  Q_OBJECT

 public:
  explicit RunsTable(RunSearch& search, QWidget* parent = nullptr);

  /// The run of the selected row; 0 where none is.
  [[nodiscard]] vialkeeper::app::RowNumber selectedRun() const;
  /// Selects a run if it is among those shown.
  void select(vialkeeper::app::RowNumber run);

 signals:
  void runChosen(vialkeeper::app::RowNumber run);

 private:
  RunSearch& m_search;
};

}  // namespace vialkeeper::ui
