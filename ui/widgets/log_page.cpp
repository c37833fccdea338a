// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/log_page.h"

#include <QDragEnterEvent>
#include <QFileDialog>
#include <QHBoxLayout>
#include <QImageReader>
#include <QMimeData>
#include <QSplitter>
#include <QStackedWidget>
#include <QVBoxLayout>

#include "ui/models/photo_entries.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/entries_table.h"
#include "ui/widgets/entry_line.h"
#include "ui/widgets/photo_strip.h"
#include "ui/widgets/photo_view.h"
#include "ui/widgets/reading_chart.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kChartHeight_px = 190;
constexpr int kTableHeight_px = 220;

QStringList localFiles(const QMimeData& dropped) {
  QStringList files;
  for (const QUrl& url : dropped.urls())
    if (url.isLocalFile()) files += url.toLocalFile();
  return files;
}

}  // namespace

LogPage::LogPage(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_entry(run),
      m_entries(run),
      m_stamps(new StampRow),
      m_line(new EntryLine(m_entry)),
      m_stack(new QStackedWidget),
      m_split(new QSplitter(Qt::Vertical)),
      m_chartRow(new QWidget),
      m_chart(new ReadingChart(run)),
      m_photos(new PhotoStrip(run)),
      m_photo(new PhotoView(run)),
      m_table(new EntriesTable(m_entries)) {
  setAcceptDrops(true);
  layOut();
  wire();
  followTheme();
  follow();
}

void LogPage::layOut() {
  auto* chartRow = new QHBoxLayout(m_chartRow);
  chartRow->setContentsMargins(0, 0, 0, 0);
  chartRow->addWidget(m_chart, 1);
  chartRow->addWidget(m_photos);
  m_split->addWidget(m_chartRow);
  m_split->addWidget(m_table);
  m_split->setStretchFactor(0, 2);
  m_split->setStretchFactor(1, 3);
  m_split->setSizes({kChartHeight_px, kTableHeight_px});
  m_split->setChildrenCollapsible(false);
  m_stack->addWidget(m_split);
  m_stack->addWidget(m_photo);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 10, 0, 0);
  column->setSpacing(8);
  column->addWidget(m_stamps);
  column->addWidget(m_line);
  column->addWidget(m_stack, 1);
  setTabOrder(m_stamps, m_line);
}

void LogPage::wire() {
  connect(m_stamps, &StampRow::stamped, this, &LogPage::press);
  connect(m_line, &EntryLine::downWanted, this, [this] {
    m_table->setFocus();
    if (m_table->currentEntry() == 0 && m_entries.rowCount() > 0) m_table->selectRow(0);
  });
  connect(m_line, &EntryLine::pictureFilePasted, this,
          [this](const QString& file) { addPhotos({file}); });
  connect(m_table, &EntriesTable::upWanted, this, &LogPage::startEntry);
  connect(m_table, &EntriesTable::correctionWanted, this, [this](int entry) {
    m_entry.startCorrection(entry);
    m_line->focusLine();
  });
  connect(m_table, &EntriesTable::withdrawalWanted, this, [this](int entry) {
    m_entry.startWithdrawal(entry);
    if (m_entry.task() == LogEntryModel::Task::kWithdrawal) m_line->reason().setFocus();
  });
  connect(m_photos, &PhotoStrip::photoChosen, this, [this](const PhotoEntry& photo) {
    m_stack->setCurrentWidget(m_photo);
    m_photo->show(photo);
  });
  connect(m_photo, &PhotoView::backWanted, this, [this] { m_stack->setCurrentWidget(m_split); });
  connect(m_chart, &ReadingChart::entryChosen, this, &LogPage::goToEntry);
  connect(&m_run, &OpenRun::opened, this, [this] { m_stack->setCurrentWidget(m_split); });
  connect(&m_run, &OpenRun::reloaded, this, &LogPage::follow);
  connect(&Theme::instance(), &Theme::changed, this, &LogPage::followTheme);
}

void LogPage::follow() {
  if (!m_run.isOpen()) return;
  m_stamps->showLamp(m_run.strip().lampIsOn);
  m_stamps->setEnabled(m_run.permission(app::Deed::kLog) == app::Permission::kYes);
}

void LogPage::followTheme() {
  // At the hood the figures count: what is read from afar takes the chart's room.
  m_chartRow->setVisible(!Theme::instance().isHoodMode());
}

void LogPage::goToEntry(int entry) {
  m_stack->setCurrentWidget(m_split);
  m_table->goToEntry(entry);
}

void LogPage::startEntry() { m_line->focusLine(); }

void LogPage::press(Stamp stamp) {
  if (!m_run.isOpen()) return;
  const StampDeed deed = stampDeed(stamp, m_run.strip(), m_entry.line());
  switch (deed.how) {
    case StampDeed::How::kLog:
      m_entry.logAtOnce(deed.line);
      break;
    case StampDeed::How::kBegin:
      m_line->begin(deed);
      break;
    case StampDeed::How::kChooseFile:
      choosePhotos();
      break;
  }
}

void LogPage::choosePhotos() {
  addPhotos(QFileDialog::getOpenFileNames(
      this, tr("Photos for the log"), {},
      tr("Pictures (*.jpg *.jpeg *.png *.webp *.tif *.tiff *.bmp *.heic);;All files (*)")));
}

void LogPage::addPhotos(const QStringList& files) {
  for (const QString& file : files) {
    if (!m_entry.logAtOnce(photoLine(file)).done) return;
  }
}

void LogPage::dragEnterEvent(QDragEnterEvent* event) {
  const bool may = m_run.isOpen() && m_run.permission(app::Deed::kLog) == app::Permission::kYes;
  if (may && !localFiles(*event->mimeData()).isEmpty()) event->acceptProposedAction();
}

void LogPage::dropEvent(QDropEvent* event) {
  addPhotos(localFiles(*event->mimeData()));
  event->acceptProposedAction();
}

}  // namespace vialkeeper::ui
