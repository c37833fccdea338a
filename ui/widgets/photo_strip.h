// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QHash>
#include <QImage>
#include <QWidget>
#include <vector>

#include "ui/models/open_run.h"
#include "ui/models/photo_entries.h"

class QVBoxLayout;

namespace vialkeeper::ui {

/// The photos of the log as thumbnails, newest first; read in another thread. Hidden without any.
class PhotoStrip : public QWidget {
  Q_OBJECT

 public:
  explicit PhotoStrip(OpenRun& run, QWidget* parent = nullptr);
  [[nodiscard]] const std::vector<PhotoEntry>& photos() const { return m_photos; }

 signals:
  void photoChosen(const vialkeeper::ui::PhotoEntry& photo);

 private:
  void follow();
  void rebuild();
  void loadMissing();

  OpenRun& m_run;
  std::vector<PhotoEntry> m_photos;
  QHash<app::RowNumber, QImage> m_thumbnails;
  QVBoxLayout* m_column;
};

}  // namespace vialkeeper::ui
