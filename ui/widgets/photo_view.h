// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QImage>
#include <QWidget>

#include "ui/models/open_run.h"
#include "ui/models/photo_entries.h"

class QLabel;
class QPushButton;

namespace vialkeeper::ui {

/// One photo, as large as there is room. Escape or the button goes back.
class PhotoView : public QWidget {
  Q_OBJECT

 public:
  explicit PhotoView(OpenRun& run, QWidget* parent = nullptr);
  void show(const PhotoEntry& photo);

 signals:
  void backWanted();

 protected:
  void resizeEvent(QResizeEvent* event) override;
  void keyPressEvent(QKeyEvent* event) override;

 private:
  void fit();

  OpenRun& m_run;
  QImage m_image;
  QLabel* m_title;
  QLabel* m_picture;
  QPushButton* m_back;
};

}  // namespace vialkeeper::ui
