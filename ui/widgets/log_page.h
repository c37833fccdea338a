// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/log_entry_model.h"
#include "ui/models/log_table_model.h"
#include "ui/models/open_run.h"
#include "ui/widgets/stamp_row.h"

class QSplitter;
class QStackedWidget;

namespace vialkeeper::ui {

class EntriesTable;
class EntryLine;
class PhotoStrip;
class PhotoView;
class ReadingChart;

/// The log of the open run: stamps, the one line, the chart of readings, the entries.
class LogPage : public QWidget {
  Q_OBJECT

 public:
  explicit LogPage(OpenRun& run, QWidget* parent = nullptr);

  /// Shows an entry and selects it.
  void goToEntry(int entry);
  /// Puts the cursor into the one line.
  void startEntry();
  void press(Stamp stamp);
  /// Logs photos of these files; a sentence says which are none.
  void addPhotos(const QStringList& files);

  [[nodiscard]] StampRow& stamps() { return *m_stamps; }
  [[nodiscard]] EntryLine& entryLine() { return *m_line; }
  [[nodiscard]] EntriesTable& entries() { return *m_table; }
  [[nodiscard]] ReadingChart& chart() { return *m_chart; }

 protected:
  void dragEnterEvent(QDragEnterEvent* event) override;
  void dropEvent(QDropEvent* event) override;

 private:
  void layOut();
  void wire();
  void follow();
  void followTheme();
  void choosePhotos();

  OpenRun& m_run;
  LogEntryModel m_entry;
  LogTableModel m_entries;
  StampRow* m_stamps;
  EntryLine* m_line;
  QStackedWidget* m_stack;
  QSplitter* m_split;
  QWidget* m_chartRow;
  ReadingChart* m_chart;
  PhotoStrip* m_photos;
  PhotoView* m_photo;
  EntriesTable* m_table;
};

}  // namespace vialkeeper::ui
