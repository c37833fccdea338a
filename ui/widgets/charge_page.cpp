// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/charge_page.h"

#include <QHBoxLayout>
#include <QKeyEvent>
#include <QLabel>
#include <QLineEdit>
#include <QPushButton>
#include <QScrollArea>
#include <QShortcut>
#include <QStackedWidget>

#include "ui/models/charge_trail.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/add_component_panel.h"
#include "ui/widgets/charge_table.h"
#include "ui/widgets/print_page.h"
#include "ui/widgets/reason_line.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/trail_panel.h"
#include "ui/widgets/weigh_page.h"

namespace vialkeeper::ui {
namespace {

constexpr int kLeastFoot = 148;
constexpr int kMostFoot = 190;
constexpr int kAlmostAll = 1000;  ///< a stretch that leaves the others what it cannot take
constexpr int kVolumeLines = 3;

}  // namespace

ChargePage::ChargePage(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_reason(run),
      m_model(run, m_reason),
      m_steps(run, m_reason),
      m_search(run.link()),
      m_draft(run, m_reason),
      m_stack(new QStackedWidget),
      m_table(new ChargeTable(m_model)),
      m_addLine(new QLineEdit),
      m_weighButton(new QPushButton(tr("&Weigh (F4)"))),
      m_foot(new QStackedWidget),
      m_trail(new TrailPanel),
      m_adding(new AddComponentPanel(m_search, m_draft)),
      m_volumes(new QLabel),
      m_conditions(new QLabel),
      m_cautions(new QLabel),
      m_weigh(new WeighPage(m_steps)),
      m_print(new PrintPage(run)) {
  auto* reason = new ReasonLine(m_reason);
  m_stack->addWidget(makeTablePage());
  m_stack->addWidget(m_weigh);
  m_stack->addWidget(m_print);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 4, 0, 0);
  column->setSpacing(4);
  column->addWidget(reason);
  column->addWidget(m_stack, 1);
  connect(reason, &ReasonLine::finished, this, [this] {
    if (m_stack->currentWidget() == m_weigh)
      m_weigh->startEntry();
    else
      m_table->setFocus(Qt::OtherFocusReason);
  });
  connect(m_weigh, &WeighPage::left, this, &ChargePage::showTable);
  connect(m_print, &PrintPage::left, this, &ChargePage::showTable);
  connect(&m_run, &OpenRun::reloaded, this, &ChargePage::follow);
  connect(&m_run, &OpenRun::opened, this, [this] {
    leaveAdding();
    m_stack->setCurrentIndex(0);
  });
  setFocusProxy(m_table);
  addShortcuts();
  follow();
}

QWidget* ChargePage::makeTablePage() {
  auto* foot = new QWidget;
  auto* panels = new QHBoxLayout(foot);
  panels->setContentsMargins(0, 0, 0, 0);
  panels->setSpacing(16);
  panels->addWidget(m_trail, 11);
  panels->addWidget(makeVialText(), 10);
  m_foot->addWidget(foot);
  m_foot->addWidget(m_adding);
  const auto setHeights = [this] {
    m_foot->setMinimumHeight(Theme::instance().scaled(kLeastFoot));
    m_foot->setMaximumHeight(Theme::instance().scaled(kMostFoot));
  };
  setHeights();
  connect(&Theme::instance(), &Theme::changed, this, setHeights);
  connect(m_table, &ChargeTable::cellChosen, this, &ChargePage::showTrail);
  connect(m_table, &ChargeTable::trailWanted, this, [this] {
    leaveAdding();
    m_trail->read();
  });
  connect(m_adding, &AddComponentPanel::left, this, [this] {
    leaveAdding();
    m_table->setFocus(Qt::OtherFocusReason);
  });
  connect(&m_draft, &ComponentDraft::added, this, [this](const QString& key) {
    leaveAdding();
    m_table->goTo(toUtf8(key), ChargeTableModel::kAmount);
    m_table->setFocus(Qt::OtherFocusReason);
  });
  auto* page = new QWidget;
  auto* column = new QVBoxLayout(page);
  column->setContentsMargins(0, 0, 0, 0);
  column->setSpacing(6);
  column->addWidget(m_table, kAlmostAll);
  column->addWidget(makeLine());
  column->addWidget(m_foot, 10);
  column->addStretch(1);
  return page;
}

QWidget* ChargePage::makeLine() {
  m_addLine->setObjectName(QStringLiteral("addLine"));
  m_addLine->setPlaceholderText(tr("+ add a component: name, CAS or SMILES"));
  m_addLine->setAccessibleName(tr("Add a component: name, CAS number or SMILES"));
  m_addLine->installEventFilter(this);
  connect(m_addLine, &QLineEdit::textEdited, this, [this](const QString& typed) {
    m_adding->searchFor(typed);
    showFoot();
  });
  connect(m_addLine, &QLineEdit::returnPressed, m_adding, &AddComponentPanel::takeChosen);
  auto* print = new QPushButton(tr("P&rint…"));
  connect(print, &QPushButton::clicked, this, &ChargePage::showPrinted);
  connect(m_weighButton, &QPushButton::clicked, this, &ChargePage::startWeighing);
  auto* line = new QWidget;
  auto* row = new QHBoxLayout(line);
  row->setContentsMargins(0, 0, 0, 0);
  row->addWidget(m_addLine, 1);
  row->addWidget(m_weighButton);
  row->addWidget(print);
  return line;
}

QWidget* ChargePage::makeVialText() {
  for (QLabel* label : {m_volumes, m_conditions, m_cautions}) {
    label->setWordWrap(true);
    label->setTextFormat(Qt::PlainText);
    label->setTextInteractionFlags(Qt::TextSelectableByMouse);
  }
  m_conditions->setProperty("small", true);
  m_cautions->setProperty("quiet", true);
  m_cautions->setProperty("small", true);
  auto* inside = new QWidget;
  auto* column = new QVBoxLayout(inside);
  column->setContentsMargins(0, 2, 4, 2);
  column->setSpacing(4);
  column->addWidget(m_volumes);
  column->addWidget(m_conditions);
  column->addWidget(m_cautions);
  column->addStretch(1);
  auto* scroll = new QScrollArea;
  scroll->setWidget(inside);
  scroll->setWidgetResizable(true);
  scroll->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  scroll->setAccessibleName(tr("The vial's volumes and what to look out for"));
  return scroll;
}

void ChargePage::addShortcuts() {
  const auto add = [this](const QKeySequence& keys, auto act) {
    auto* shortcut = new QShortcut(keys, this);
    shortcut->setContext(Qt::WindowShortcut);
    connect(shortcut, &QShortcut::activated, this, act);
  };
  add(QKeySequence(Qt::Key_F4), [this] { startWeighing(); });
  add(QKeySequence(Qt::Key_F5), [this] {
    if (m_stack->currentWidget() != m_weigh) startWeighing();
    m_steps.retarget();
  });
  add(QKeySequence(Qt::CTRL | Qt::Key_I), [this] {
    showTable();
    leaveAdding();
    m_trail->read();
  });
  add(QKeySequence(Qt::Key_Insert), [this] { startAdding(); });
}

void ChargePage::follow() {
  if (!m_run.isOpen()) return;
  const QStringList volumes = vialLines(m_run.sheet());
  m_volumes->setText(volumes.mid(0, kVolumeLines).join(QStringLiteral(" · ")));
  m_conditions->setText(volumes.mid(kVolumeLines).join(QStringLiteral(" · ")));
  m_cautions->setText(cautionLines(m_run.sheet()).join(QLatin1Char(' ')));
  const QString noChange = m_run.refusal(app::Deed::kChangePlan);
  m_addLine->setReadOnly(!noChange.isEmpty());
  m_addLine->setPlaceholderText(noChange.isEmpty() ? tr("+ add a component: name, CAS or SMILES")
                                                   : noChange.section(QLatin1Char('\n'), 0, 0));
  const QString noWeighing = m_run.refusal(app::Deed::kWeigh);
  m_weighButton->setEnabled(noWeighing.isEmpty());
  m_weighButton->setToolTip(noWeighing);
  showTrail();
}

void ChargePage::showTrail() {
  if (!m_run.isOpen() || m_model.rowCount() == 0) return;
  const QModelIndex at = m_table->currentIndex();
  const int row = std::max(0, at.row());
  m_trail->show(cellTrail(m_run.sheet(), m_model.keyOf(row), at.column()),
                chargeNotices(m_run.sheet()));
}

void ChargePage::showFoot() { m_foot->setCurrentIndex(m_addLine->text().isEmpty() ? 0 : 1); }

void ChargePage::startAdding() {
  showTable();
  m_addLine->setFocus(Qt::OtherFocusReason);
}

void ChargePage::leaveAdding() {
  m_addLine->clear();
  m_adding->searchFor({});
  showFoot();
}

void ChargePage::startWeighing() {
  if (!m_run.isOpen() || m_steps.isEmpty() || !m_weighButton->isEnabled()) return;
  leaveAdding();
  m_stack->setCurrentWidget(m_weigh);
  m_steps.start();
  m_weigh->startEntry();
}

void ChargePage::showTable() {
  m_stack->setCurrentIndex(0);
  m_table->setFocus(Qt::OtherFocusReason);
}

void ChargePage::showPrinted() {
  if (!m_run.isOpen()) return;
  m_stack->setCurrentWidget(m_print);
  m_print->choose(Printed::kSheetA4);
}

bool ChargePage::eventFilter(QObject* watched, QEvent* event) {
  if (watched == m_addLine && event->type() == QEvent::KeyPress) {
    const int key = static_cast<QKeyEvent*>(event)->key();
    if (key == Qt::Key_Up || key == Qt::Key_Down) {
      m_adding->moveBy(key == Qt::Key_Up ? -1 : 1);
      return true;
    }
    if (key == Qt::Key_Escape) {
      leaveAdding();
      m_table->setFocus(Qt::OtherFocusReason);
      return true;
    }
  }
  return QWidget::eventFilter(watched, event);
}

}  // namespace vialkeeper::ui
