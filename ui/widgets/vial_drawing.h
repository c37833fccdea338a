// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>
#include <optional>

#include "ui/models/strip_view.h"

namespace vialkeeper::ui {

/// The vial to scale: the liquid stands as high as its share of the vial's volume.
class VialDrawing : public QWidget {
  Q_OBJECT

 public:
  explicit VialDrawing(QWidget* parent = nullptr);
  void show(const std::optional<VialView>& vial, bool lampIsOn);
  [[nodiscard]] QSize sizeHint() const override;
  [[nodiscard]] QSize minimumSizeHint() const override { return sizeHint(); }

 protected:
  void paintEvent(QPaintEvent* event) override;

 private:
  std::optional<VialView> m_vial;
  bool m_lampIsOn = false;
};

}  // namespace vialkeeper::ui
