// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QFrame>
#include <QStringList>

class QLabel;
class QScrollArea;

namespace vialkeeper::ui {

struct CellTrail;

/// Where the number of the chosen cell is from, and what holds for the whole charge.
class TrailPanel : public QFrame {
  Q_OBJECT

 public:
  explicit TrailPanel(QWidget* parent = nullptr);
  void show(const CellTrail& trail, const QStringList& notices);
  /// Everything that is shown, for screen readers and tests.
  [[nodiscard]] QString text() const;
  /// Takes the focus, so that it can be scrolled and read out.
  void read();

 private:
  QLabel* m_heading;
  QLabel* m_steps;
  QLabel* m_sources;
  QLabel* m_notices;
  QScrollArea* m_scroll;
};

}  // namespace vialkeeper::ui
