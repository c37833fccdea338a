// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/runs_table.h"

#include <QActionGroup>
#include <QHeaderView>
#include <QKeyEvent>
#include <QLabel>
#include <QMenu>
#include <QStackedLayout>
#include <QTableView>

#include "ui/widgets/run_row_delegate.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kLeastTitle_px = 205;
constexpr int kMostUsualLines = 2;

}  // namespace

RunsTable::RunsTable(RunSearch& search, QWidget* parent)
    : QWidget(parent),
      m_search(search),
      m_model(search),
      m_view(new QTableView),
      m_nothing(new QLabel),
      m_stack(new QStackedLayout(this)) {
  setUpView();
  m_nothing->setObjectName(QStringLiteral("nothingFound"));
  m_nothing->setAlignment(Qt::AlignHCenter | Qt::AlignTop);
  m_nothing->setWordWrap(true);
  m_nothing->setMargin(Theme::instance().scaled(24));
  m_nothing->setProperty("quiet", true);
  m_nothing->setTextFormat(Qt::PlainText);
  m_stack->addWidget(m_view);
  m_stack->addWidget(m_nothing);
  setFocusProxy(m_view);
  watchModel();
  connect(&Theme::instance(), &Theme::changed, this, &RunsTable::layOut);
  showOrder();
  showFound();
}

void RunsTable::setUpView() {
  m_view->setObjectName(QStringLiteral("runsTable"));
  m_view->setAccessibleName(tr("Runs"));
  m_view->setModel(&m_model);
  m_view->setItemDelegate(new RunRowDelegate(m_view));
  m_view->setSelectionBehavior(QAbstractItemView::SelectRows);
  m_view->setSelectionMode(QAbstractItemView::SingleSelection);
  m_view->setEditTriggers(QAbstractItemView::NoEditTriggers);
  m_view->setTabKeyNavigation(false);
  m_view->setShowGrid(false);
  m_view->setVerticalScrollMode(QAbstractItemView::ScrollPerPixel);
  m_view->setHorizontalScrollMode(QAbstractItemView::ScrollPerPixel);
  m_view->verticalHeader()->hide();
  m_view->verticalHeader()->setSectionResizeMode(QHeaderView::Fixed);
  // Always there, so that the columns need not give way when it comes.
  m_view->setVerticalScrollBarPolicy(Qt::ScrollBarAlwaysOn);
  QHeaderView& head = *m_view->horizontalHeader();
  head.setSectionResizeMode(QHeaderView::Fixed);
  head.setSectionsClickable(true);
  head.setHighlightSections(false);
  head.setSortIndicatorShown(true);
  m_view->setContextMenuPolicy(Qt::CustomContextMenu);
  head.setContextMenuPolicy(Qt::CustomContextMenu);
  m_view->installEventFilter(this);
  m_view->viewport()->installEventFilter(this);
  connect(&head, &QHeaderView::sectionClicked, this, &RunsTable::headClicked);
  connect(m_view, &QWidget::customContextMenuRequested, this,
          [this](const QPoint& at) { showMenu(m_view->viewport()->mapToGlobal(at)); });
  connect(&head, &QWidget::customContextMenuRequested, this,
          [this, &head](const QPoint& at) { showMenu(head.mapToGlobal(at)); });
  connect(m_view, &QTableView::activated, this, [this](const QModelIndex& index) {
    if (const app::RowNumber run = m_model.runAt(index.row()); run != 0) emit runChosen(run);
  });
}

void RunsTable::watchModel() {
  const auto begin = [this] { m_isRefreshing = true; };
  connect(&m_model, &QAbstractItemModel::modelAboutToBeReset, this, begin);
  connect(&m_model, &QAbstractItemModel::rowsAboutToBeRemoved, this, begin);
  connect(m_view->selectionModel(), &QItemSelectionModel::currentRowChanged, this,
          [this](const QModelIndex& current) {
            if (!m_isRefreshing && current.isValid()) m_wanted = m_model.runAt(current.row());
          });
  // The model hears of it first.
  connect(&m_search, &RunSearch::found, this, [this](bool isSameQuestion) {
    if (isSameQuestion) layOutRows();
    showFound();
  });
  connect(&m_search, &RunSearch::moreFound, this, &RunsTable::layOutRows);
  connect(&m_search, &RunSearch::hintChanged, this, [this] { m_nothing->setText(nothingFound()); });
  connect(&m_search, &RunSearch::orderChanged, this, &RunsTable::showOrder);
  connect(&m_model, &QAbstractItemModel::modelReset, this, [this] {
    layOut();
    showOrder();
    selectWanted();
  });
}

app::RowNumber RunsTable::selectedRun() const {
  const QModelIndexList rows = m_view->selectionModel()->selectedRows();
  return rows.isEmpty() ? 0 : m_model.runAt(rows.front().row());
}

void RunsTable::select(app::RowNumber run) {
  m_wanted = run;
  selectWanted();
}

void RunsTable::showFound() {
  m_nothing->setText(nothingFound());
  const bool nothing = m_search.wasAnswered() && m_search.runs().empty();
  m_stack->setCurrentWidget(nothing ? static_cast<QWidget*>(m_nothing) : m_view);
  selectWanted();
}

void RunsTable::selectWanted() {
  m_isRefreshing = true;
  const int row = m_model.rowOf(m_wanted);
  if (row < 0) {
    m_view->setCurrentIndex({});
  } else if (row != m_view->currentIndex().row() || selectedRun() != m_wanted) {
    m_view->setCurrentIndex(m_model.index(row, 0));
  }
  m_isRefreshing = false;
}

QString RunsTable::nothingFound() const {
  if (m_search.total() == 0 && m_search.text().trimmed().isEmpty())
    return tr("No runs yet. Ctrl+N sets one up.");
  QString words = tr("No run matches.");
  if (!m_search.hint().isEmpty()) words += QStringLiteral("\n\n") + m_search.hint();
  return words;
}

void RunsTable::layOut() {
  layOutColumns();
  layOutRows();
}

void RunsTable::layOutColumns() {
  int rest = m_view->viewport()->width();
  int titleColumn = -1;
  for (int i = 0; i < m_model.columnCount(); ++i) {
    const RunColumn column = m_model.columns()[i];
    if (column == RunColumn::kTitle) {
      titleColumn = i;
      continue;
    }
    const bool isCode = column == RunColumn::kCode;
    const int width = std::max(RunRowDelegate::widthFor(sampleOf(column), font(), isCode),
                               m_view->horizontalHeader()->sectionSizeHint(i));
    m_view->setColumnWidth(i, width);
    rest -= width;
  }
  if (titleColumn >= 0)
    m_view->setColumnWidth(titleColumn, std::max(Theme::instance().scaled(kLeastTitle_px), rest));
}

void RunsTable::layOutRows() {
  const int title = static_cast<int>(m_model.columns().indexOf(RunColumn::kTitle));
  const bool hasCode = m_model.columns().contains(RunColumn::kCode);
  const int width = title < 0 ? 0 : m_view->columnWidth(title);
  std::vector<int> lines;
  int usual = 1;
  for (int row = 0; row < m_model.rowCount(); ++row) {
    const QModelIndex index = m_model.index(row, std::max(0, title));
    int needed = title < 0 ? 1 : RunRowDelegate::linesOf(index.data().toString(), font(), width);
    if (hasCode && index.data(RunListModel::kIsRunningRole).toBool()) needed = std::max(needed, 2);
    lines.push_back(needed);
    usual = std::max(usual, std::min(needed, kMostUsualLines));
  }
  QHeaderView& heights = *m_view->verticalHeader();
  heights.setMinimumSectionSize(1);
  heights.setDefaultSectionSize(RunRowDelegate::heightOf(usual, font()));
  for (int row = 0; row < m_model.rowCount(); ++row) {
    const int height =
        RunRowDelegate::heightOf(std::max(usual, lines[static_cast<std::size_t>(row)]), font());
    if (heights.sectionSize(row) != height) heights.resizeSection(row, height);
  }
}

bool RunsTable::eventFilter(QObject* watched, QEvent* event) {
  if (watched == m_view->viewport()) {
    if (event->type() == QEvent::Resize) layOut();
  } else if (event->type() == QEvent::FocusIn && !m_view->currentIndex().isValid() &&
             m_model.rowCount() > 0) {
    m_view->selectRow(0);
  } else if (event->type() == QEvent::FocusIn || event->type() == QEvent::FocusOut) {
    m_view->viewport()->update();
  } else if (event->type() == QEvent::KeyPress) {
    const auto* key = static_cast<QKeyEvent*>(event);
    if (key->key() == Qt::Key_Up && m_view->currentIndex().row() <= 0) {
      emit filterWanted();
      return true;
    }
  }
  return QWidget::eventFilter(watched, event);
}

void RunsTable::headClicked(int section) {
  const auto order = orderAfterClick(m_model.columns()[section], m_search.order());
  if (order) m_search.setOrder(*order);
  showOrder();
}

void RunsTable::showOrder() {
  const auto mark = markOf(m_search.order());
  const int section = mark ? static_cast<int>(m_model.columns().indexOf(mark->column)) : -1;
  m_view->horizontalHeader()->setSortIndicator(
      section, mark && mark->ascending ? Qt::AscendingOrder : Qt::DescendingOrder);
}

void RunsTable::showMenu(const QPoint& at) {
  auto* menu = new QMenu(this);
  menu->setAttribute(Qt::WA_DeleteOnClose);
  menu->setObjectName(QStringLiteral("runsMenu"));
  fillMenu(*menu);
  menu->popup(at);
}

void RunsTable::fillMenu(QMenu& menu) {
  if (const app::RowNumber run = selectedRun(); run != 0)
    menu.addAction(tr("Open"), this, [this, run] { emit runChosen(run); });
  QMenu& orders = *menu.addMenu(tr("Order"));
  auto* group = new QActionGroup(&orders);
  using app::FindOrder;
  for (const FindOrder order : {FindOrder::kNewest, FindOrder::kOldest, FindOrder::kRank,
                                FindOrder::kYield, FindOrder::kCode}) {
    QAction* action = orders.addAction(nameOf(order));
    action->setCheckable(true);
    action->setChecked(order == m_search.order());
    group->addAction(action);
    connect(action, &QAction::triggered, this, [this, order] { m_search.setOrder(order); });
  }
  menu.addSeparator();
  for (const RunColumn column : allRunColumns()) {
    QAction* action = menu.addAction(titleOf(column));
    action->setCheckable(true);
    action->setChecked(m_model.columns().contains(column));
    connect(action, &QAction::triggered, this,
            [this, column](bool shown) { m_model.setShown(column, shown); });
  }
  menu.addSeparator();
  menu.addAction(tr("The usual columns"), this, [this] { m_model.showDefaultColumns(); });
}

}  // namespace vialkeeper::ui
