// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/charge_table.h"

#include <QHeaderView>
#include <QKeyEvent>
#include <algorithm>

#include "ui/models/charge_table_model.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/charge_delegate.h"
#include "ui/widgets/slip_answers.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kLeastName = 190;
constexpr int kLeastAmount = 96;
constexpr int kLeastWeighed = 84;

}  // namespace

ChargeTable::ChargeTable(ChargeTableModel& model, QWidget* parent)
    : QTableView(parent), m_model(model), m_delegate(new ChargeDelegate(model, *this)) {
  setModel(&model);
  setItemDelegate(m_delegate);
  setAccessibleName(tr("Charge: what goes into the vial"));
  setShowGrid(false);
  setWordWrap(true);
  setTextElideMode(Qt::ElideNone);
  setTabKeyNavigation(false);
  setSelectionBehavior(SelectRows);
  setSelectionMode(SingleSelection);
  setEditTriggers(DoubleClicked | EditKeyPressed | AnyKeyPressed);
  setVerticalScrollMode(ScrollPerPixel);
  setHorizontalScrollMode(ScrollPerPixel);
  verticalHeader()->hide();
  verticalHeader()->setSectionResizeMode(QHeaderView::Fixed);
  verticalHeader()->setMinimumSectionSize(1);
  horizontalHeader()->setSectionResizeMode(QHeaderView::Fixed);
  horizontalHeader()->setHighlightSections(false);
  horizontalHeader()->setMinimumSectionSize(1);
  connect(&model, &QAbstractItemModel::modelAboutToBeReset, this, &ChargeTable::rememberPlace);
  connect(&model, &QAbstractItemModel::modelReset, this, [this] {
    layOut();
    returnToPlace();
  });
  connect(&model, &QAbstractItemModel::dataChanged, this, &ChargeTable::layOut);
  connect(&Theme::instance(), &Theme::changed, this, &ChargeTable::layOut);
  layOut();
}

std::string ChargeTable::currentKey() const { return m_model.keyOf(currentIndex().row()); }

void ChargeTable::goTo(const std::string& key, int column) {
  const int row = m_model.rowOf(key);
  if (row >= 0) setCurrentIndex(m_model.index(row, column));
}

void ChargeTable::rememberPlace() {
  m_placeKey = currentKey();
  m_placeColumn = currentIndex().isValid() ? currentIndex().column() : ChargeTableModel::kAmount;
}

void ChargeTable::returnToPlace() {
  if (m_model.rowCount() == 0) return;
  const int row = std::max(0, m_model.rowOf(m_placeKey));
  setCurrentIndex(m_model.index(row, m_placeColumn));
}

/// Columns as wide as their texts, the names get the rest; rows as high as their sentences.
void ChargeTable::layOut() {
  const ChargeFonts fonts = m_delegate->fonts();
  const Theme& theme = Theme::instance();
  int taken = 0;
  for (int column = 1; column < ChargeTableModel::kColumns; ++column) {
    int width = horizontalHeader()->sectionSizeHint(column);
    if (column == ChargeTableModel::kAmount) width = std::max(width, theme.scaled(kLeastAmount));
    if (column == ChargeTableModel::kWeighed) width = std::max(width, theme.scaled(kLeastWeighed));
    for (int row = 0; row < m_model.rowCount(); ++row)
      width = std::max(width, ChargeRowLayout::widthOf(m_model.index(row, column), fonts));
    setColumnWidth(column, width);
    taken += width;
  }
  setColumnWidth(0, std::max(theme.scaled(kLeastName), viewport()->width() - taken));
  for (int row = 0; row < m_model.rowCount(); ++row)
    setRowHeight(row, m_delegate->layoutOf(row).height());
  // As high as it is full: what stands below follows at once.
  setMaximumHeight(horizontalHeader()->sizeHint().height() + verticalHeader()->length() +
                   2 * frameWidth());
  placeAnswers();
}

SlipAnswers* ChargeTable::answersFor(const std::string& key) {
  SlipAnswers*& answers = m_answers[key];
  if (answers == nullptr) {
    answers = new SlipAnswers(viewport());
    connect(answers, &SlipAnswers::accepted, this, [this, key] {
      setFocus();
      m_model.acceptTyped(m_model.rowOf(key));
    });
    connect(answers, &SlipAnswers::likelyTaken, this, [this, key] {
      setFocus();
      m_model.takeLikely(m_model.rowOf(key));
    });
  }
  return answers;
}

void ChargeTable::placeAnswers() {
  for (auto& [key, answers] : m_answers) {
    if (m_model.rowOf(key) < 0) answers->hide();
  }
  for (int row = 0; row < m_model.rowCount(); ++row) {
    const std::string key = m_model.keyOf(row);
    const QModelIndex weighed = m_model.index(row, ChargeTableModel::kWeighed);
    if (weighed.data(ChargeTableModel::kQuestionRole).toString().isEmpty()) {
      if (m_answers.contains(key)) m_answers[key]->hide();
      continue;
    }
    SlipAnswers* answers = answersFor(key);
    const bool isNew = !answers->isVisible();
    answers->offer(weighed.data().toString(),
                   weighed.data(ChargeTableModel::kLikelyRole).toString());
    answers->setGeometry(m_delegate->layoutOf(row).answers().translated(columnViewportPosition(0),
                                                                        rowViewportPosition(row)));
    answers->show();
    if (isNew && isVisible()) answers->focusFirst();
  }
}

void ChargeTable::updateGeometries() {
  QTableView::updateGeometries();
  placeAnswers();
}

void ChargeTable::resizeEvent(QResizeEvent* event) {
  QTableView::resizeEvent(event);
  layOut();
}

void ChargeTable::changeEvent(QEvent* event) {
  QTableView::changeEvent(event);
  if (event->type() == QEvent::FontChange || event->type() == QEvent::StyleChange) layOut();
}

void ChargeTable::focusInEvent(QFocusEvent* event) {
  if (!currentIndex().isValid() && m_model.rowCount() > 0)
    setCurrentIndex(m_model.index(0, ChargeTableModel::kAmount));
  QTableView::focusInEvent(event);
}

void ChargeTable::currentChanged(const QModelIndex& current, const QModelIndex& previous) {
  QTableView::currentChanged(current, previous);
  emit cellChosen();
}

/// The next cell that can be written in, row by row; invalid at the end.
QModelIndex ChargeTable::editableFrom(const QModelIndex& from, int step) const {
  const int cells = m_model.rowCount() * ChargeTableModel::kColumns;
  int at = from.row() * ChargeTableModel::kColumns + from.column() + step;
  for (; at >= 0 && at < cells; at += step) {
    const QModelIndex index =
        m_model.index(at / ChargeTableModel::kColumns, at % ChargeTableModel::kColumns);
    if (m_model.flags(index) & Qt::ItemIsEditable) return index;
  }
  return {};
}

void ChargeTable::closeEditor(QWidget* editor, QAbstractItemDelegate::EndEditHint hint) {
  const bool goesOn = hint == QAbstractItemDelegate::EditNextItem;
  const bool goesBack = hint == QAbstractItemDelegate::EditPreviousItem;
  QTableView::closeEditor(editor, QAbstractItemDelegate::NoHint);
  if (hint == QAbstractItemDelegate::RevertModelCache) m_model.forget(currentIndex());
  if (!goesOn && !goesBack) return;
  const QModelIndex next = editableFrom(currentIndex(), goesOn ? 1 : -1);
  if (!next.isValid()) return;
  setCurrentIndex(next);
  edit(next);
}

void ChargeTable::keyPressEvent(QKeyEvent* event) {
  const QModelIndex at = currentIndex();
  const bool editing = state() == EditingState;
  const bool plain = !editing && at.isValid();
  const bool isEnter = event->key() == Qt::Key_Return || event->key() == Qt::Key_Enter;
  if (plain && isEnter) {
    if (m_model.flags(at) & Qt::ItemIsEditable)
      edit(at);
    else
      emit trailWanted();
    return;
  }
  if (plain && event->key() == Qt::Key_Delete) {
    if (at.column() == ChargeTableModel::kWeighed)
      m_model.clearWeighing(at.row());
    else
      m_model.remove(at.row());
    return;
  }
  if (plain && event->key() == Qt::Key_Escape && m_model.forgetRow(at.row())) return;
  QTableView::keyPressEvent(event);
}

bool ChargeTable::showsAllTexts() const {
  const ChargeFonts fonts = m_delegate->fonts();
  if (horizontalHeader()->length() > viewport()->width()) return false;
  for (int column = 0; column < ChargeTableModel::kColumns; ++column) {
    if (columnWidth(column) < horizontalHeader()->sectionSizeHint(column)) return false;
    for (int row = 0; row < m_model.rowCount(); ++row) {
      if (rowHeight(row) < m_delegate->layoutOf(row).height()) return false;
      const bool wraps = column == ChargeTableModel::kComponent;
      if (!wraps &&
          columnWidth(column) < ChargeRowLayout::widthOf(m_model.index(row, column), fonts))
        return false;
    }
  }
  return true;
}

}  // namespace vialkeeper::ui
