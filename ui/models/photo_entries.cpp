// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/photo_entries.h"

#include "ui/models/moment_text.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {

std::vector<PhotoEntry> photoEntries(const std::vector<app::NumberedEvent>& events) {
  std::vector<PhotoEntry> photos;
  for (auto entry = events.rbegin(); entry != events.rend(); ++entry) {
    const app::EventRecord& event = entry->event;
    if (event.attachment == 0 || event.supersededBy != 0) continue;
    photos.push_back(
        {entry->number, event.attachment, toQt(event.attachmentName), dayAndClockText(event.at)});
  }
  return photos;
}

QString photoLine(const QString& file) { return QStringLiteral("photo %1").arg(file); }

}  // namespace vialkeeper::ui
