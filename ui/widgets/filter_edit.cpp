// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/filter_edit.h"

#include <QFontMetrics>
#include <QPainter>

#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kGap_px = 6;
constexpr int kMarkHeight_px = 3;

}  // namespace

FilterEdit::FilterEdit(QWidget* parent) : QLineEdit(parent) {
  connect(this, &QLineEdit::cursorPositionChanged, this, qOverload<>(&QWidget::update));
}

void FilterEdit::setMark(qsizetype from, qsizetype length) {
  m_from = from;
  m_length = length;
  update();
}

void FilterEdit::setEnd(const QList<QWidget*>& widgets) {
  m_end = widgets;
  for (QWidget* widget : m_end) {
    widget->setParent(this);
    widget->setCursor(Qt::ArrowCursor);
  }
  layOutEnd();
}

void FilterEdit::layOutEnd() {
  int right = width() - kGap_px;
  for (auto each = m_end.rbegin(); each != m_end.rend(); ++each) {
    const QSize size = (*each)->sizeHint();
    right -= size.width();
    (*each)->setGeometry(right, (height() - size.height()) / 2, size.width(), size.height());
    right -= kGap_px;
  }
  setTextMargins(0, 0, width() - right, 0);
}

int FilterEdit::xOf(qsizetype place) const {
  // The line may be scrolled; where its cursor is drawn tells by how much.
  const QFontMetrics metrics(font());
  const int cursor = cursorRect().center().x();
  const auto widthBefore = [&](qsizetype at) { return metrics.horizontalAdvance(text().left(at)); };
  return cursor + widthBefore(place) - widthBefore(cursorPosition());
}

void FilterEdit::paintEvent(QPaintEvent* event) {
  QLineEdit::paintEvent(event);
  if (m_from < 0) return;
  const int left = xOf(m_from);
  const int least = QFontMetrics(font()).averageCharWidth();
  const int right = std::max(m_length > 0 ? xOf(m_from + m_length) : left, left + least);
  QPainter painter(this);
  const int y = height() - kMarkHeight_px - 3;
  painter.fillRect(QRect(left, y, right - left, kMarkHeight_px), colour("limit"));
}

void FilterEdit::resizeEvent(QResizeEvent* event) {
  QLineEdit::resizeEvent(event);
  layOutEnd();
}

}  // namespace vialkeeper::ui
