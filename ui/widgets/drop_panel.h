// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QFrame>

namespace vialkeeper::ui {

/// A panel that hangs below a widget, over whatever lies there; it never takes the focus by itself
/// and moves nothing.
class DropPanel : public QFrame {
  Q_OBJECT

 public:
  explicit DropPanel(QWidget& under, QWidget* parent = nullptr);
  /// Shows the panel, so wide at the least, this far from the left of the widget.
  void drop(int fromLeft_px = 0);

 private:
  bool eventFilter(QObject* watched, QEvent* event) override;
  void place();

  QWidget& m_under;
  int m_fromLeft_px = 0;
};

}  // namespace vialkeeper::ui
