// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QLineEdit>

namespace vialkeeper::ui {

/// A line of text that marks a stretch of it as faulty and leaves room for widgets at its end.
class FilterEdit : public QLineEdit {
  Q_OBJECT

 public:
  explicit FilterEdit(QWidget* parent = nullptr);

  /// Marks from a place on; a length of 0 points at the place itself, -1 takes the mark away.
  void setMark(qsizetype from, qsizetype length);
  /// Widgets that stand at the end, from the left; they become children.
  void setEnd(const QList<QWidget*>& widgets);
  /// Lays the widgets at the end out again: one has changed its text.
  void layOutEnd();
  /// Where the text begins at that place, from the line's left [px].
  [[nodiscard]] int xOf(qsizetype place) const;

 protected:
  void paintEvent(QPaintEvent* event) override;
  void resizeEvent(QResizeEvent* event) override;

 private:
  qsizetype m_from = -1;
  qsizetype m_length = 0;
  QList<QWidget*> m_end;
};

}  // namespace vialkeeper::ui
