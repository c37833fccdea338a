// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QString>
#include <vector>

#include "app/notebook/log_run.h"

namespace vialkeeper::ui {

/// A photo of the log.
struct PhotoEntry {
  int entry = 0;
  app::RowNumber attachment = 0;
  QString name = {};
  QString when = {};

  bool operator==(const PhotoEntry&) const = default;
};

/// The photos that count, newest first.
[[nodiscard]] std::vector<PhotoEntry> photoEntries(const std::vector<app::NumberedEvent>& events);

/// The line that logs a photo of this file.
[[nodiscard]] QString photoLine(const QString& file);

}  // namespace vialkeeper::ui
