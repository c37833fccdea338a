// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/charts/plot_widget.h"

namespace vialkeeper::ui {

class PlotWidget::Chart {
 public:
  PlotContent content;
};

PlotWidget::PlotWidget(QWidget* parent) : QWidget(parent), m_chart(std::make_unique<Chart>()) {}
PlotWidget::~PlotWidget() = default;
void PlotWidget::setContent(PlotContent content, bool) { m_chart->content = std::move(content); }
const PlotContent& PlotWidget::content() const { return m_chart->content; }
void PlotWidget::showAll() {}
std::pair<double, double> PlotWidget::xView() const { return {0.0, 1.0}; }
void PlotWidget::setXView(double, double) {}
void PlotWidget::resizeEvent(QResizeEvent*) {}
void PlotWidget::keyPressEvent(QKeyEvent*) {}
bool PlotWidget::eventFilter(QObject*, QEvent*) { return false; }

}  // namespace vialkeeper::ui
