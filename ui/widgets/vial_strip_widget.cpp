// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/vial_strip_widget.h"

#include <QFrame>
#include <QHBoxLayout>
#include <QLabel>
#include <QVBoxLayout>

#include "ui/models/strip_view.h"
#include "ui/widgets/gauge.h"
#include "ui/widgets/label_style.h"
#include "ui/widgets/latest_entries.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/timeline_widget.h"
#include "ui/widgets/vial_drawing.h"

namespace vialkeeper::ui {
namespace {

constexpr int kTick_ms = 1000;

QFrame* divider() {
  auto* line = new QFrame;
  line->setFrameShape(QFrame::VLine);
  line->setObjectName(QStringLiteral("divider"));
  return line;
}

}  // namespace

VialStripWidget::VialStripWidget(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_vial(new VialDrawing),
      m_gauge(new Gauge),
      m_clock(styledLabel({"strong"})),
      m_light(styledLabel({"quiet", "small"})),
      m_timeline(new TimelineWidget),
      m_divider(divider()),
      m_latest(new LatestEntries) {
  auto* strip = new QFrame;
  strip->setObjectName(QStringLiteral("strip"));
  m_clock->setObjectName(QStringLiteral("lampClock"));
  auto* time = new QVBoxLayout;
  time->setSpacing(2);
  time->addWidget(m_clock);
  time->addWidget(m_light);
  time->addStretch(1);
  time->addWidget(m_timeline);
  auto* row = new QHBoxLayout(strip);
  row->setContentsMargins(12, 8, 12, 8);
  row->setSpacing(14);
  row->addWidget(m_vial);
  row->addWidget(m_gauge);
  row->addLayout(time, 1);
  row->addWidget(m_divider);
  row->addWidget(m_latest);
  auto* whole = new QVBoxLayout(this);
  whole->setContentsMargins(0, 0, 0, 0);
  whole->addWidget(strip);
  setSizePolicy(QSizePolicy::Preferred, QSizePolicy::Fixed);
  m_ticks.setInterval(kTick_ms);
  connect(&m_ticks, &QTimer::timeout, this, &VialStripWidget::refresh);
  connect(&m_run, &OpenRun::reloaded, this, &VialStripWidget::refresh);
  connect(&Theme::instance(), &Theme::changed, this, &VialStripWidget::refresh);
  connect(m_timeline, &TimelineWidget::entryChosen, this, &VialStripWidget::entryChosen);
}

void VialStripWidget::showEvent(QShowEvent* event) {
  QWidget::showEvent(event);
  refresh();
}

void VialStripWidget::hideEvent(QHideEvent* event) {
  QWidget::hideEvent(event);
  m_ticks.stop();
}

void VialStripWidget::refresh() {
  if (!m_run.isOpen() || !isVisible()) {
    m_ticks.stop();
    return;
  }
  const StripView view = stripView(m_run.strip());
  m_vial->show(view.vial, view.lamp.isOn);
  m_gauge->show(view.gauge);
  m_clock->setText(view.lamp.clock);
  m_light->setText(view.lamp.detail);
  m_timeline->show(view.timeline);
  m_latest->show(view.latest);
  const bool hood = Theme::instance().isHoodMode();
  setStyleProperty(*m_clock, "heading", hood);
  m_latest->setVisible(!hood);
  m_divider->setVisible(!hood);
  if (view.lamp.isOn == m_ticks.isActive()) return;
  if (view.lamp.isOn)
    m_ticks.start();
  else
    m_ticks.stop();
}

}  // namespace vialkeeper::ui
