// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/strip_view.h"

namespace vialkeeper::ui {

/// The line of time: when the lamp was on, what is still planned, and a mark for every entry. A
/// mark is chosen by a click, or with Left, Right, Home, End and Enter.
class TimelineWidget : public QWidget {
  Q_OBJECT

 public:
  explicit TimelineWidget(QWidget* parent = nullptr);
  void show(const TimelineView& view);
  [[nodiscard]] QSize sizeHint() const override;
  [[nodiscard]] QSize minimumSizeHint() const override;
  /// The entry under the cursor; 0 before the cursor was moved.
  [[nodiscard]] int currentEntry() const;
  /// Where a mark stands, for those who point at it.
  [[nodiscard]] QPoint placeOf(int entry) const;

 signals:
  void entryChosen(int entry);

 protected:
  void paintEvent(QPaintEvent* event) override;
  void keyPressEvent(QKeyEvent* event) override;
  void mousePressEvent(QMouseEvent* event) override;
  bool event(QEvent* event) override;
  void focusInEvent(QFocusEvent* event) override;

 private:
  [[nodiscard]] QRectF bar() const;
  [[nodiscard]] double pixel(double share) const;
  [[nodiscard]] int markAt(const QPointF& at) const;
  void moveTo(int mark);
  void paintLamp(QPainter& painter) const;
  void paintTicks(QPainter& painter) const;
  void paintMarks(QPainter& painter) const;

  TimelineView m_view;
  int m_current = -1;
};

}  // namespace vialkeeper::ui
