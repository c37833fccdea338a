// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/gauge.h"

#include <QHBoxLayout>
#include <QLabel>
#include <QPainter>
#include <QVBoxLayout>

#include "ui/widgets/label_style.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr double kTube_share = 0.5;  // of the bar's width; the limit's line is wider

}  // namespace

GaugeBar::GaugeBar(QWidget* parent) : QWidget(parent) {
  setSizePolicy(QSizePolicy::Fixed, QSizePolicy::MinimumExpanding);
}

QSize GaugeBar::sizeHint() const {
  return {Theme::instance().scaled(22), Theme::instance().scaled(90)};
}

void GaugeBar::show(const GaugeView& view) {
  m_view = view;
  update();
}

void GaugeBar::paintEvent(QPaintEvent*) {
  QPainter painter(this);
  painter.setRenderHint(QPainter::Antialiasing);
  const double width = this->width() * kTube_share;
  const QRectF tube(QPointF(this->width() / 2.0 - width / 2.0, 2.0), QSizeF(width, height() - 4.0));
  painter.setPen(QPen(colour("line"), 1.0));
  painter.setBrush(colour("filter"));
  painter.drawRoundedRect(tube, width / 2.0, width / 2.0);
  if (m_view.reading) {
    QRectF column = tube;
    column.setTop(tube.bottom() - std::max(*m_view.reading * tube.height(), width));
    painter.setPen(Qt::NoPen);
    painter.setBrush(m_view.overLimit ? colour("limit") : colour("hydrogen"));
    painter.drawRoundedRect(column, width / 2.0, width / 2.0);
  }
  if (m_view.limit) {
    const double y = tube.bottom() - *m_view.limit * tube.height();
    painter.setPen(QPen(colour("limit"), 2.0));
    painter.drawLine(QPointF(0.0, y), QPointF(this->width(), y));
  }
}

Gauge::Gauge(QWidget* parent)
    : QWidget(parent),
      m_bar(new GaugeBar),
      m_limit(styledLabel({"small", "fault"})),
      m_forecast(styledLabel({"small", "quiet"})),
      m_value(styledLabel({"heading"})),
      m_detail(styledLabel({"small", "quiet"})) {
  setSizePolicy(QSizePolicy::Fixed, QSizePolicy::Preferred);
  auto* words = new QVBoxLayout;
  words->setSpacing(1);
  words->addWidget(m_limit);
  words->addWidget(m_forecast);
  words->addStretch(1);
  words->addWidget(m_value);
  words->addWidget(m_detail);
  auto* row = new QHBoxLayout(this);
  row->setContentsMargins(0, 0, 0, 0);
  row->setSpacing(8);
  row->addWidget(m_bar);
  row->addLayout(words);
}

void Gauge::show(const GaugeView& view) {
  m_bar->show(view);
  m_limit->setText(view.overLimit ? tr("over the %1").arg(view.limitWords) : view.limitWords);
  m_forecast->setText(view.forecast);
  m_value->setText(view.value);
  m_detail->setText(view.detail);
  setStyleProperty(*m_value, "huge", Theme::instance().isHoodMode());
  setStyleProperty(*m_value, "fault", view.overLimit);
  setAccessibleName(tr("Pressure of the vial"));
  setAccessibleDescription(
      QStringLiteral("%1 %2, %3, %4").arg(view.value, view.detail, m_limit->text(), view.forecast));
  setToolTip(tr("At full extent: %1").arg(view.forecast));
}

}  // namespace vialkeeper::ui
