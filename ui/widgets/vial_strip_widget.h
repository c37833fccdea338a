// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QTimer>
#include <QWidget>

#include "ui/models/open_run.h"

class QLabel;

namespace vialkeeper::ui {

class Gauge;
class LatestEntries;
class TimelineWidget;
class VialDrawing;

/// The vial of the open run: drawn to scale, its gauge, the lamp's clock, the line of time. Ticks
/// while the lamp is on and somebody can see it.
class VialStripWidget : public QWidget {
  Q_OBJECT

 public:
  explicit VialStripWidget(OpenRun& run, QWidget* parent = nullptr);
  [[nodiscard]] TimelineWidget& timeline() { return *m_timeline; }
  [[nodiscard]] bool isTicking() const { return m_ticks.isActive(); }

 signals:
  /// A mark on the line of time was chosen.
  void entryChosen(int entry);

 protected:
  void showEvent(QShowEvent* event) override;
  void hideEvent(QHideEvent* event) override;

 private:
  void refresh();

  OpenRun& m_run;
  QTimer m_ticks;
  VialDrawing* m_vial;
  Gauge* m_gauge;
  QLabel* m_clock;
  QLabel* m_light;
  TimelineWidget* m_timeline;
  QWidget* m_divider;
  LatestEntries* m_latest;
};

}  // namespace vialkeeper::ui
