// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/completion_list.h"

#include <QScrollBar>
#include <QVBoxLayout>

#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kMostWidth_px = 620;
constexpr int kSide_px = 40;

}  // namespace

CompletionList::CompletionList(FilterCompletion& completion, QWidget& under)
    : DropPanel(under), m_completion(completion), m_list(new QListView) {
  m_list->setObjectName(QStringLiteral("completions"));
  m_list->setAccessibleName(tr("Proposals"));
  m_list->setModel(&completion);
  m_list->setFocusPolicy(Qt::NoFocus);
  m_list->setEditTriggers(QAbstractItemView::NoEditTriggers);
  m_list->setUniformItemSizes(true);
  m_list->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(1, 1, 1, 1);
  column->addWidget(m_list);
  connect(m_list, &QListView::clicked, this,
          [this](const QModelIndex& index) { emit taken(index.row()); });
}

void CompletionList::offer(int fromLeft_px) {
  const int rows = m_completion.rowCount();
  if (rows == 0) {
    hide();
    return;
  }
  m_list->setCurrentIndex({});
  m_list->scrollToTop();
  ensurePolished();
  const int width = m_list->sizeHintForColumn(0) + kSide_px;
  m_list->setFixedSize(std::min(width, Theme::instance().scaled(kMostWidth_px)),
                       rows * m_list->sizeHintForRow(0) + 2);
  drop(fromLeft_px);
}

void CompletionList::move(int by) {
  const int rows = m_completion.rowCount();
  if (rows == 0) return;
  const int from = chosen() < 0 && by < 0 ? rows : chosen();
  m_list->setCurrentIndex(m_completion.index((from + by + rows) % rows));
}

int CompletionList::chosen() const { return m_list->currentIndex().row(); }

}  // namespace vialkeeper::ui
