// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/timeline_widget.h"

#include <QAccessible>
#include <QFontMetricsF>
#include <QHelpEvent>
#include <QKeyEvent>
#include <QPainter>
#include <QToolTip>
#include <cmath>
#include <limits>

#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr double kSide_px = 8.0;
constexpr double kReach_px = 10.0;

}  // namespace

TimelineWidget::TimelineWidget(QWidget* parent) : QWidget(parent) {
  setFocusPolicy(Qt::StrongFocus);
  setSizePolicy(QSizePolicy::Expanding, QSizePolicy::Fixed);
  setAccessibleName(tr("Line of time"));
}

QSize TimelineWidget::minimumSizeHint() const {
  const QFontMetricsF metrics(font());
  return {Theme::instance().scaled(180),
          static_cast<int>(std::ceil(2.0 * metrics.height() + Theme::instance().scaled(26)))};
}

QSize TimelineWidget::sizeHint() const {
  return {Theme::instance().scaled(380), minimumSizeHint().height()};
}

void TimelineWidget::show(const TimelineView& view) {
  const int entry = currentEntry();
  m_view = view;
  m_current = -1;
  for (std::size_t i = 0; i < m_view.marks.size(); ++i)
    if (m_view.marks[i].entry == entry) m_current = static_cast<int>(i);
  update();
}

int TimelineWidget::currentEntry() const {
  return m_current < 0 ? 0 : m_view.marks[static_cast<std::size_t>(m_current)].entry;
}

QRectF TimelineWidget::bar() const {
  const QFontMetricsF metrics(font());
  return {kSide_px, metrics.height() + Theme::instance().scaled(8), width() - 2.0 * kSide_px,
          static_cast<double>(Theme::instance().scaled(14))};
}

double TimelineWidget::pixel(double share) const { return bar().left() + share * bar().width(); }

QPoint TimelineWidget::placeOf(int entry) const {
  for (const TimelineView::Mark& mark : m_view.marks)
    if (mark.entry == entry) return QPointF(pixel(mark.at), bar().center().y()).toPoint();
  return {};
}

int TimelineWidget::markAt(const QPointF& at) const {
  int nearest = -1;
  double least = kReach_px;
  for (std::size_t i = 0; i < m_view.marks.size(); ++i) {
    const double distance = std::abs(pixel(m_view.marks[i].at) - at.x());
    if (distance > least) continue;
    least = distance;
    nearest = static_cast<int>(i);
  }
  return nearest;
}

void TimelineWidget::moveTo(int mark) {
  if (m_view.marks.empty()) return;
  m_current = std::clamp(mark, 0, static_cast<int>(m_view.marks.size()) - 1);
  const QString sentence = m_view.marks[static_cast<std::size_t>(m_current)].sentence;
  setAccessibleDescription(sentence);
  QAccessibleEvent told(this, QAccessible::DescriptionChanged);
  QAccessible::updateAccessibility(&told);
  QToolTip::showText(mapToGlobal(placeOf(currentEntry())), sentence, this);
  update();
}

void TimelineWidget::focusInEvent(QFocusEvent* event) {
  QWidget::focusInEvent(event);
  if (m_current < 0 && event->reason() != Qt::MouseFocusReason)
    moveTo(static_cast<int>(m_view.marks.size()) - 1);
  update();
}

void TimelineWidget::keyPressEvent(QKeyEvent* event) {
  switch (event->key()) {
    case Qt::Key_Left:
      return moveTo(m_current - 1);
    case Qt::Key_Right:
      return moveTo(m_current + 1);
    case Qt::Key_Home:
      return moveTo(0);
    case Qt::Key_End:
      return moveTo(static_cast<int>(m_view.marks.size()) - 1);
    case Qt::Key_Return:
    case Qt::Key_Enter:
      if (currentEntry() != 0) emit entryChosen(currentEntry());
      return;
    default:
      QWidget::keyPressEvent(event);
  }
}

void TimelineWidget::mousePressEvent(QMouseEvent* event) {
  const int mark = markAt(event->position());
  if (mark < 0) return;
  m_current = mark;
  update();
  emit entryChosen(currentEntry());
}

bool TimelineWidget::event(QEvent* event) {
  if (event->type() != QEvent::ToolTip) return QWidget::event(event);
  auto* help = static_cast<QHelpEvent*>(event);
  const int mark = markAt(help->pos());
  if (mark < 0)
    QToolTip::hideText();
  else
    QToolTip::showText(help->globalPos(), m_view.marks[static_cast<std::size_t>(mark)].sentence,
                       this);
  return true;
}

void TimelineWidget::paintLamp(QPainter& painter) const {
  const QRectF line = bar();
  painter.setPen(QPen(colour("line"), 2.0));
  painter.drawLine(QPointF(line.left(), line.center().y()),
                   QPointF(line.right(), line.center().y()));
  if (m_view.planned) {
    painter.setPen(QPen(colour("quiet"), 1.0, Qt::DashLine));
    painter.setBrush(Qt::NoBrush);
    painter.drawRoundedRect(QRectF(QPointF(pixel(m_view.planned->from), line.top()),
                                   QPointF(pixel(m_view.planned->to), line.bottom())),
                            3.0, 3.0);
  }
  painter.setPen(QPen(colour("lamp"), 1.2));
  painter.setBrush(colour("lampFill"));
  for (const TimelineView::Interval& each : m_view.lamp) {
    QRectF on(QPointF(pixel(each.from), line.top()), QPointF(pixel(each.to), line.bottom()));
    on.setWidth(std::max(on.width(), 2.0));
    painter.drawRoundedRect(on, 3.0, 3.0);
  }
}

void TimelineWidget::paintTicks(QPainter& painter) const {
  const QFontMetricsF metrics(font());
  const double baseline = bar().bottom() + metrics.ascent() + 4.0;
  painter.setPen(colour("quiet"));
  double free = -std::numeric_limits<double>::infinity();
  for (const TimelineView::Tick& tick : m_view.ticks) {
    const double width = metrics.horizontalAdvance(tick.word);
    const double left = std::clamp(pixel(tick.at) - width / 2.0, 0.0, this->width() - width);
    if (left < free) continue;
    painter.drawText(QPointF(left, baseline), tick.word);
    free = left + width + 6.0;
  }
}

void TimelineWidget::paintMarks(QPainter& painter) const {
  const QFontMetricsF metrics(font());
  const QRectF line = bar();
  double free = -std::numeric_limits<double>::infinity();
  for (std::size_t i = 0; i < m_view.marks.size(); ++i) {
    const TimelineView::Mark& mark = m_view.marks[i];
    const bool current = static_cast<int>(i) == m_current && hasFocus();
    const double x = pixel(mark.at);
    const QColor ink = mark.removesGas ? colour("limit") : colour("text");
    painter.setPen(QPen(current ? colour("focus") : ink, current ? 2.5 : 1.2));
    painter.drawLine(QPointF(x, metrics.height() + 1.0), QPointF(x, line.top()));
    // Letters that would run into each other move a little; one that has no room is left out, its
    // line stays.
    const double width = metrics.horizontalAdvance(mark.letter);
    const double left = std::max(std::min(x - width / 2.0, this->width() - width - 2.0), free);
    if (mark.letter.isEmpty() || (left > x + width && !current)) continue;
    painter.drawText(QPointF(left, metrics.ascent()), mark.letter);
    free = left + width + 1.0;
  }
}

void TimelineWidget::paintEvent(QPaintEvent*) {
  QPainter painter(this);
  painter.setRenderHint(QPainter::Antialiasing);
  paintLamp(painter);
  paintTicks(painter);
  paintMarks(painter);
  if (m_view.marks.empty()) {
    painter.setPen(colour("quiet"));
    painter.drawText(QRectF(bar().left(), 0.0, bar().width(), QFontMetricsF(font()).height()),
                     Qt::AlignLeft, tr("nothing logged yet"));
  }
  if (!hasFocus()) return;
  painter.setBrush(Qt::NoBrush);
  painter.setPen(QPen(colour("focus"), 2.0));
  painter.drawRoundedRect(QRectF(rect()).adjusted(1, 1, -1, -1), 4.0, 4.0);
}

}  // namespace vialkeeper::ui
