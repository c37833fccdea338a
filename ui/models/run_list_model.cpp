// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/run_list_model.h"

#include <iterator>

#include "ui/models/qt_text.h"

namespace vialkeeper::ui {

RunListModel::RunListModel(RunSearch& search, QObject* parent)
    : QAbstractTableModel(parent), m_search(search), m_columns(chosenRunColumns()) {
  m_runs = search.runs();
  connect(&m_search, &RunSearch::found, this, &RunListModel::replace);
  connect(&m_search, &RunSearch::moreFound, this, &RunListModel::append);
}

int RunListModel::rowCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_runs.size());
}

int RunListModel::columnCount(const QModelIndex& parent) const {
  return parent.isValid() ? 0 : static_cast<int>(m_columns.size());
}

QVariant RunListModel::data(const QModelIndex& index, int role) const {
  if (!checkIndex(index, CheckIndexOption::IndexIsValid)) return {};
  const app::FoundRun& found = m_runs[static_cast<std::size_t>(index.row())];
  const RunColumn column = m_columns[index.column()];
  switch (role) {
    case Qt::DisplayRole:
      return textOf(column, found);
    case Qt::AccessibleTextRole:
      return spokenOf(column, found);
    case Qt::TextAlignmentRole:
      return static_cast<int>((isNumber(column) ? Qt::AlignRight : Qt::AlignLeft) |
                              Qt::AlignVCenter);
    case kRunRole:
      return QVariant::fromValue<qint64>(found.run.n);
    case kColumnRole:
      return static_cast<int>(column);
    case kIsRunningRole:
      return found.run.state == app::RunState::kIrradiating;
    case kStateRole:
      return toQt(app::toText(found.run.state));
    default:
      return {};
  }
}

QVariant RunListModel::headText(RunColumn column, int role) const {
  const auto next = orderAfterClick(column, m_search.order());
  switch (role) {
    case Qt::DisplayRole:
      return titleOf(column);
    case Qt::TextAlignmentRole:
      return static_cast<int>((isNumber(column) ? Qt::AlignRight : Qt::AlignLeft) |
                              Qt::AlignVCenter);
    case Qt::ToolTipRole:
    case Qt::AccessibleDescriptionRole:
      return next ? tr("Click for %1").arg(nameOf(*next)) : QString();
    default:
      return {};
  }
}

QVariant RunListModel::headerData(int section, Qt::Orientation orientation, int role) const {
  if (orientation != Qt::Horizontal || section < 0 || section >= m_columns.size()) return {};
  return headText(m_columns[section], role);
}

bool RunListModel::canFetchMore(const QModelIndex& parent) const {
  return !parent.isValid() && m_search.canFetchMore();
}

void RunListModel::fetchMore(const QModelIndex& parent) {
  if (!parent.isValid()) m_search.fetchMore();
}

void RunListModel::setColumns(const QList<RunColumn>& columns) {
  if (columns == m_columns) return;
  beginResetModel();
  m_columns = columns;
  endResetModel();
  rememberRunColumns(m_columns);
}

void RunListModel::setShown(RunColumn column, bool shown) {
  QList<RunColumn> columns;
  for (const RunColumn each : allRunColumns()) {
    if (each == column ? shown : m_columns.contains(each)) columns += each;
  }
  if (!columns.isEmpty()) setColumns(columns);
}

void RunListModel::showDefaultColumns() { setColumns(defaultRunColumns()); }

int RunListModel::rowOf(app::RowNumber run) const {
  const auto found =
      std::ranges::find_if(m_runs, [run](const app::FoundRun& each) { return each.run.n == run; });
  return found == m_runs.end() ? -1 : static_cast<int>(std::distance(m_runs.begin(), found));
}

app::RowNumber RunListModel::runAt(int row) const {
  return row < 0 || row >= rowCount() ? 0 : m_runs[static_cast<std::size_t>(row)].run.n;
}

void RunListModel::replace(bool isSameQuestion) {
  if (isSameQuestion) {
    replaceMiddle(m_search.runs());
    return;
  }
  beginResetModel();
  m_runs = m_search.runs();
  endResetModel();
}

/// Only what lies between the runs that begin and end both lists alike is taken out and put in, so
/// that what is selected stays so.
void RunListModel::replaceMiddle(const std::vector<app::FoundRun>& runs) {
  const auto same = [](const app::FoundRun& a, const app::FoundRun& b) {
    return a.run.n == b.run.n;
  };
  const auto [oldFront, newFront] =
      std::mismatch(m_runs.begin(), m_runs.end(), runs.begin(), runs.end(), same);
  const auto [oldBack, newBack] =
      std::mismatch(m_runs.rbegin(), std::make_reverse_iterator(oldFront), runs.rbegin(),
                    std::make_reverse_iterator(newFront), same);
  const int first = static_cast<int>(std::distance(m_runs.begin(), oldFront));
  const int gone = static_cast<int>(std::distance(oldFront, oldBack.base()));
  const int come = static_cast<int>(std::distance(newFront, newBack.base()));
  if (gone > 0) {
    beginRemoveRows({}, first, first + gone - 1);
    m_runs.erase(oldFront, oldBack.base());
    endRemoveRows();
  }
  if (come > 0) {
    beginInsertRows({}, first, first + come - 1);
    m_runs.insert(m_runs.begin() + first, newFront, newBack.base());
    endInsertRows();
  }
  m_runs = runs;
  if (!m_runs.empty()) emit dataChanged(index(0, 0), index(rowCount() - 1, columnCount() - 1));
}

void RunListModel::append(int first) {
  const auto& runs = m_search.runs();
  beginInsertRows({}, first, static_cast<int>(runs.size()) - 1);
  m_runs.insert(m_runs.end(), runs.begin() + first, runs.end());
  endInsertRows();
}

}  // namespace vialkeeper::ui
