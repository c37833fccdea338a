// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/workspace.h"

#include <QHBoxLayout>
#include <QLabel>
#include <QPushButton>
#include <QShortcut>
#include <QSplitter>
#include <QStackedWidget>
#include <QVBoxLayout>

#include "ui/models/qt_text.h"
#include "ui/widgets/filter_line.h"
#include "ui/widgets/log_page.h"
#include "ui/widgets/message_bar.h"
#include "ui/widgets/new_run_page.h"
#include "ui/widgets/person_field.h"
#include "ui/widgets/runs_table.h"
#include "ui/widgets/shelf_page.h"

namespace vialkeeper::ui {
namespace {

constexpr int kRunsWidth_px = 424;
constexpr int kRunWidth_px = 856;

QPushButton* barButton(const QString& text) {
  auto* button = new QPushButton(text);
  button->setProperty("flat", true);
  return button;
}

}  // namespace

Workspace::Workspace(std::unique_ptr<NotebookLink> link, QWidget* parent)
    : QWidget(parent),
      m_link(std::move(link)),
      m_run(std::make_unique<OpenRun>(*m_link, m_history)),
      m_search(std::make_unique<RunSearch>(*m_link)),
      m_person(new PersonField(*m_link)),
      m_filter(new FilterLine(*m_search)),
      m_runs(new RunsTable(*m_search)),
      m_messages(new MessageBar),
      m_stack(new QStackedWidget),
      m_nothing(new QLabel(tr("Choose a run with the arrow keys and open it with Enter, "
                              "or set up a new one with Ctrl+N."))),
      m_runPage(new RunPage(*m_run)),
      m_newRun(new NewRunPage(*m_link)),
      m_shelf(new ShelfPage(*m_link)) {
  m_nothing->setAlignment(Qt::AlignCenter);
  m_nothing->setWordWrap(true);
  m_nothing->setProperty("quiet", true);
  for (QWidget* page : {static_cast<QWidget*>(m_nothing), static_cast<QWidget*>(m_runPage),
                        static_cast<QWidget*>(m_newRun), static_cast<QWidget*>(m_shelf)})
    m_stack->addWidget(page);
  auto* split = new QSplitter(Qt::Horizontal);
  split->addWidget(m_runs);
  split->addWidget(m_stack);
  split->setStretchFactor(1, 1);
  split->setSizes({kRunsWidth_px, kRunWidth_px});
  split->setChildrenCollapsible(false);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 0, 0, 0);
  column->setSpacing(0);
  column->addWidget(makeBar());
  column->addWidget(m_messages);
  column->addWidget(split, 1);
  connect(m_runs, &RunsTable::runChosen, this, &Workspace::showRun);
  connect(m_runs, &RunsTable::filterWanted, this, &Workspace::focusFilter);
  connect(m_filter, &FilterLine::runsWanted, this, &Workspace::focusRuns);
  // A field that takes text takes the key itself before it becomes a shortcut.
  auto* slash = new QShortcut(QKeySequence(Qt::Key_Slash), this);
  connect(slash, &QShortcut::activated, this, &Workspace::focusFilter);
  connect(m_newRun, &NewRunPage::created, this, &Workspace::showRun);
  connect(m_newRun, &NewRunPage::cancelled, this, [this] {
    m_stack->setCurrentWidget(m_run->isOpen() ? static_cast<QWidget*>(m_runPage) : m_nothing);
    focusRuns();
  });
  connect(&m_history, &ActionHistory::refused, this, [this](const text::Faults& faults) {
    m_messages->show(MessageBar::Kind::kFault, sentences(faults));
  });
  watchPeople();
  if (m_link->isReadOnly())
    m_messages->show(
        MessageBar::Kind::kNotice,
        tr("This notebook is open for reading only: %1.").arg(m_link->readOnlyReason()));
}

Workspace::~Workspace() = default;

QWidget* Workspace::makeBar() {
  auto* bar = new QFrame;
  bar->setObjectName(QStringLiteral("topBar"));
  auto* name = new QLabel(m_link->name());
  QFont bold = name->font();
  bold.setBold(true);
  name->setFont(bold);
  name->setToolTip(m_link->file());
  auto* shelf = barButton(tr("&Shelf"));
  auto* fresh = barButton(tr("&New run"));
  auto* menu = barButton(tr("&Menu"));
  connect(shelf, &QPushButton::clicked, this, &Workspace::showShelf);
  connect(fresh, &QPushButton::clicked, this, &Workspace::showNewRun);
  connect(menu, &QPushButton::clicked, this,
          [this, menu] { emit menuWanted(menu->mapToGlobal(QPoint(0, menu->height()))); });
  fresh->setEnabled(!m_link->isReadOnly());
  auto* row = new QHBoxLayout(bar);
  row->setContentsMargins(16, 6, 12, 6);
  row->setSpacing(10);
  row->addWidget(name);
  row->addWidget(m_filter, 1);
  for (QPushButton* button : {shelf, fresh, menu}) row->addWidget(button);
  row->addWidget(m_person);
  return bar;
}

void Workspace::watchPeople() {
  connect(m_person, &PersonField::refused, this, [this](const QString& sentence) {
    m_messages->show(MessageBar::Kind::kFault, sentence);
  });
  connect(m_person, &PersonField::strangerTyped, this, [this](const QString& initials) {
    m_messages->show(
        MessageBar::Kind::kNotice,
        tr("Nobody with the initials %1 has worked in this notebook.").arg(initials),
        {{tr("%1 is new here").arg(initials), [this, initials] { m_person->takePerson(initials); }},
         {tr("Back to %1").arg(m_link->person()),
          [this] { m_person->takePerson(m_link->person()); }}});
  });
  if (m_link->person().isEmpty() && !m_link->isReadOnly()) {
    m_messages->show(MessageBar::Kind::kNotice,
                     tr("Type your initials at the top right: they are kept with every entry."));
    m_person->setFocus();
  }
}

void Workspace::showRun(app::RowNumber run) {
  if (const auto opened = m_run->open(run); !opened) {
    m_messages->show(MessageBar::Kind::kFault, sentences(opened.error()));
    m_stack->setCurrentWidget(m_nothing);
    return;
  }
  m_runs->select(run);
  m_stack->setCurrentWidget(m_runPage);
}

void Workspace::showPage(RunPage::Page page) {
  if (!m_run->isOpen()) return;
  m_stack->setCurrentWidget(m_runPage);
  m_runPage->showPage(page);
}

void Workspace::showShelf() {
  m_stack->setCurrentWidget(m_shelf);
  m_shelf->setFocus();
}

void Workspace::showNewRun() {
  if (m_link->isReadOnly()) return;
  m_stack->setCurrentWidget(m_newRun);
  m_newRun->setFocus();
}

void Workspace::cloneSelected() {
  const app::RowNumber selected = m_runs->selectedRun();
  const app::RowNumber run = selected != 0 || !m_run->isOpen() ? selected : m_run->run().n;
  if (run == 0) return;
  showNewRun();
  m_newRun->startFrom(run);
}

void Workspace::focusFilter() { m_filter->setFocus(); }

void Workspace::focusRuns() { m_runs->setFocus(); }

void Workspace::focusEntry() {
  if (!m_run->isOpen()) return;
  showPage(RunPage::Page::kLog);
  m_runPage->logPage().startEntry();
}

}  // namespace vialkeeper::ui
