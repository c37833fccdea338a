// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/strip_view.h"

class QLabel;

namespace vialkeeper::ui {

/// The bar of a gauge: how far the reading is from the limit.
class GaugeBar : public QWidget {
  Q_OBJECT

 public:
  explicit GaugeBar(QWidget* parent = nullptr);
  void show(const GaugeView& view);
  [[nodiscard]] QSize sizeHint() const override;

 protected:
  void paintEvent(QPaintEvent* event) override;

 private:
  GaugeView m_view;
};

/// The vial's pressure: bar, limit, forecast, and the last reading in large figures.
class Gauge : public QWidget {
  Q_OBJECT

 public:
  explicit Gauge(QWidget* parent = nullptr);
  void show(const GaugeView& view);

 private:
  GaugeBar* m_bar;
  QLabel* m_limit;
  QLabel* m_forecast;
  QLabel* m_value;
  QLabel* m_detail;
};

}  // namespace vialkeeper::ui
