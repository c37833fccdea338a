// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/reading_chart.h"

#include <QButtonGroup>
#include <QHBoxLayout>
#include <QPushButton>
#include <QVBoxLayout>

#include "ui/charts/plot_widget.h"
#include "ui/charts/reading_plot.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

QPushButton* choice(const QString& text) {
  auto* button = new QPushButton(text);
  button->setCheckable(true);
  button->setProperty("choice", true);
  return button;
}

}  // namespace

ReadingChart::ReadingChart(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_plot(new PlotWidget),
      m_clock(choice(tr("clock time"))),
      m_lampOn(choice(tr("lamp-on time"))) {
  m_plot->setAccessibleName(tr("Chart of pressure and temperature"));
  m_plot->setMinimumHeight(Theme::instance().scaled(90));
  m_clock->setChecked(true);
  auto* group = new QButtonGroup(this);
  group->addButton(m_clock);
  group->addButton(m_lampOn);
  auto* choices = new QHBoxLayout;
  choices->setSpacing(4);
  choices->addWidget(m_clock);
  choices->addWidget(m_lampOn);
  choices->addStretch(1);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 0, 0, 0);
  column->setSpacing(2);
  column->addWidget(m_plot, 1);
  column->addLayout(choices);
  connect(m_clock, &QPushButton::clicked, this, [this] { setAxis(ReadingAxis::kClock); });
  connect(m_lampOn, &QPushButton::clicked, this, [this] { setAxis(ReadingAxis::kLampOn); });
  connect(&m_run, &OpenRun::opened, this, [this] { refresh(true); });
  connect(&m_run, &OpenRun::reloaded, this, [this] { refresh(false); });
  connect(&Theme::instance(), &Theme::changed, this, [this] { refresh(false); });
  connect(m_plot, &PlotWidget::refused, &m_run, &OpenRun::refused);
  connect(m_plot, &PlotWidget::pointClicked, this, [this](int series, int point) {
    const ReadingCurve& curve = series == 0 ? m_readings.pressure : m_readings.temperature;
    const auto at = static_cast<std::size_t>(point);
    if (at < curve.entries.size() && curve.entries[at] != 0) emit entryChosen(curve.entries[at]);
  });
}

void ReadingChart::setAxis(ReadingAxis axis) {
  m_axis = axis;
  (axis == ReadingAxis::kClock ? m_clock : m_lampOn)->setChecked(true);
  refresh(true);
}

void ReadingChart::showEvent(QShowEvent* event) {
  QWidget::showEvent(event);
  refresh(false);
}

void ReadingChart::refresh(bool showAll) {
  m_showAll = m_showAll || showAll;
  if (!m_run.isOpen() || !isVisible()) return;
  m_readings = readingSeries(m_run.strip(), m_axis);
  m_plot->setContent(readingPlot(m_readings), m_showAll);
  m_showAll = false;
}

}  // namespace vialkeeper::ui
