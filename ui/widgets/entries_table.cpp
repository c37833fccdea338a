// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/entries_table.h"

#include <QContextMenuEvent>
#include <QHeaderView>
#include <QKeyEvent>
#include <QMenu>

#include "ui/widgets/entry_delegate.h"

namespace vialkeeper::ui {
namespace {

constexpr int kMostOfRemark_percent = 32;
constexpr int kSides_px = 18;

}  // namespace

EntriesTable::EntriesTable(LogTableModel& model, QWidget* parent)
    : QTableView(parent), m_model(model) {
  setModel(&model);
  setItemDelegate(new EntryDelegate(*this));
  setAccessibleName(tr("Entries of the log"));
  setSelectionBehavior(QAbstractItemView::SelectRows);
  setSelectionMode(QAbstractItemView::SingleSelection);
  setEditTriggers(QAbstractItemView::NoEditTriggers);
  setTabKeyNavigation(false);
  setShowGrid(false);
  setWordWrap(true);
  setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  setVerticalScrollMode(QAbstractItemView::ScrollPerPixel);
  verticalHeader()->hide();
  verticalHeader()->setSectionResizeMode(QHeaderView::Fixed);
  horizontalHeader()->setDefaultAlignment(Qt::AlignLeft | Qt::AlignVCenter);
  horizontalHeader()->setHighlightSections(false);
  horizontalHeader()->setSectionResizeMode(QHeaderView::Fixed);
  horizontalHeader()->setMinimumSectionSize(10);
  connect(&model, &QAbstractItemModel::modelAboutToBeReset, this,
          [this] { m_keptEntry = currentEntry(); });
  connect(&model, &QAbstractItemModel::modelReset, this, &EntriesTable::restoreCurrent);
  connect(this, &QTableView::doubleClicked, this, [this](const QModelIndex& index) {
    emit correctionWanted(m_model.entryAt(index.row()));
  });
}

void EntriesTable::restoreCurrent() {
  fitColumns();
  const int row = m_model.rowOf(m_keptEntry);
  if (row >= 0) selectRow(row);
}

int EntriesTable::currentEntry() const {
  return currentIndex().isValid() ? m_model.entryAt(currentIndex().row()) : 0;
}

void EntriesTable::goToEntry(int entry) {
  const int row = m_model.rowOf(entry);
  if (row < 0) return;
  selectRow(row);
  scrollTo(m_model.index(row, 0), QAbstractItemView::PositionAtCenter);
  setFocus(Qt::OtherFocusReason);
}

void EntriesTable::fitColumns() {
  const int room = viewport()->width();
  int rest = room;
  for (const int column : {LogTableModel::kWhen, LogTableModel::kKind, LogTableModel::kWho}) {
    const int width =
        std::max(sizeHintForColumn(column), horizontalHeader()->sectionSizeHint(column));
    setColumnWidth(column, width);
    rest -= width;
  }
  int remark = horizontalHeader()->sectionSizeHint(LogTableModel::kRemark);
  for (int row = 0; row < m_model.rowCount(); ++row) {
    const QString text = m_model.index(row, LogTableModel::kRemark).data().toString();
    remark = std::max(remark, fontMetrics().horizontalAdvance(text) + kSides_px);
  }
  remark = std::min(remark, room * kMostOfRemark_percent / 100);
  setColumnWidth(LogTableModel::kRemark, remark);
  setColumnWidth(LogTableModel::kReading, std::max(rest - remark, room / 4));
  resizeRowsToContents();
}

void EntriesTable::resizeEvent(QResizeEvent* event) {
  QTableView::resizeEvent(event);
  if (event->size().width() != event->oldSize().width()) fitColumns();
}

void EntriesTable::changeEvent(QEvent* event) {
  QTableView::changeEvent(event);
  if (event->type() == QEvent::FontChange || event->type() == QEvent::StyleChange) fitColumns();
}

void EntriesTable::keyPressEvent(QKeyEvent* event) {
  const int entry = currentEntry();
  switch (event->key()) {
    case Qt::Key_Return:
    case Qt::Key_Enter:
    case Qt::Key_F2:
      if (entry != 0) emit correctionWanted(entry);
      return;
    case Qt::Key_Delete:
      if (entry != 0) emit withdrawalWanted(entry);
      return;
    case Qt::Key_Escape:
      return emit upWanted();
    case Qt::Key_Up:
      if (currentIndex().row() <= 0) return emit upWanted();
      break;
    default:
      break;
  }
  QTableView::keyPressEvent(event);
}

void EntriesTable::contextMenuEvent(QContextMenuEvent* event) {
  const int entry = m_model.entryAt(indexAt(event->pos()).row());
  if (entry == 0) return;
  auto* menu = new QMenu(this);
  menu->setAttribute(Qt::WA_DeleteOnClose);
  menu->addAction(tr("Correct\tF2"), this, [this, entry] { emit correctionWanted(entry); });
  menu->addAction(tr("Take back\tDel"), this, [this, entry] { emit withdrawalWanted(entry); });
  menu->popup(event->globalPos());
}

}  // namespace vialkeeper::ui
