// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/open_run.h"
#include "ui/models/reading_series.h"

class QPushButton;

namespace vialkeeper::ui {

class PlotWidget;

/// The chart of the log's readings with its switch: clock time or lamp-on time. A click on a point
/// goes to its entry.
class ReadingChart : public QWidget {
  Q_OBJECT

 public:
  explicit ReadingChart(OpenRun& run, QWidget* parent = nullptr);
  [[nodiscard]] PlotWidget& plot() { return *m_plot; }
  void setAxis(ReadingAxis axis);

 signals:
  void entryChosen(int entry);

 protected:
  void showEvent(QShowEvent* event) override;

 private:
  void refresh(bool showAll);

  OpenRun& m_run;
  ReadingSeries m_readings;
  PlotWidget* m_plot;
  QPushButton* m_clock;
  QPushButton* m_lampOn;
  ReadingAxis m_axis = ReadingAxis::kClock;
  bool m_showAll = true;  ///< with the next content
};

}  // namespace vialkeeper::ui
