// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/result_page.h"

#include <QHBoxLayout>
#include <QHeaderView>
#include <QKeyEvent>
#include <QLabel>
#include <QPlainTextEdit>
#include <QPushButton>
#include <QScrollArea>
#include <QTableView>
#include <QVBoxLayout>

#include "ui/models/history_model.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/seal_panel.h"
#include "ui/widgets/sentence_field.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kLifeWidth_px = 330;
constexpr int kConclusionHeight_px = 96;

QLabel* heading(const QString& text) {
  auto* label = new QLabel(text);
  QFont bold = label->font();
  bold.setBold(true);
  label->setFont(bold);
  return label;
}

QTableView* historyTable(OpenRun& run, QWidget* parent) {
  auto* table = new QTableView(parent);
  table->setObjectName(QStringLiteral("history"));
  table->setAccessibleName(ResultPage::tr("Trail of the run"));
  table->setModel(new HistoryModel(run, table));
  table->setSelectionBehavior(QAbstractItemView::SelectRows);
  table->setSelectionMode(QAbstractItemView::SingleSelection);
  table->setTabKeyNavigation(false);
  table->setShowGrid(false);
  table->verticalHeader()->hide();
  table->horizontalHeader()->setDefaultAlignment(Qt::AlignLeft | Qt::AlignVCenter);
  table->horizontalHeader()->setSectionResizeMode(QHeaderView::ResizeToContents);
  table->horizontalHeader()->setSectionResizeMode(HistoryModel::kChanges, QHeaderView::Stretch);
  return table;
}

}  // namespace

ResultPage::ResultPage(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_form(run),
      m_conclusion(new QPlainTextEdit),
      m_conclusionFault(new QLabel),
      m_reason(new SentenceField(tr("Reason for the next step, where one is wanted"))),
      m_moves(new QVBoxLayout) {
  auto* row = new QHBoxLayout;
  row->setSpacing(28);
  row->addWidget(makeForm(), 1);
  row->addWidget(makeLife());
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 10, 0, 0);
  column->addLayout(row);
  column->addWidget(heading(tr("Trail")));
  column->addWidget(historyTable(run, this), 1);
  connect(&m_form, &ResultForm::changed, this, &ResultPage::show);
}

void ResultPage::addField(QVBoxLayout& column, ResultForm::Field field, const QString& label,
                          const QString& hint) {
  auto* line = new SentenceField(label);
  line->setHint(hint);
  connect(line, &SentenceField::committed, this,
          [this, field](const QString& typed) { commit(field, typed); });
  m_fields[field] = line;
  column.addWidget(line);
}

QWidget* ResultPage::makeForm() {
  auto* form = new QWidget;
  auto* column = new QVBoxLayout(form);
  column->setContentsMargins(0, 0, 0, 0);
  column->setSpacing(6);
  addField(*column, ResultForm::Field::kTitle, tr("&Title"), {});
  addField(*column, ResultForm::Field::kAim, tr("&Aim"), tr("what this run is to show"));
  auto* numbers = new QVBoxLayout;
  auto* yields = new QHBoxLayout;
  yields->setSpacing(16);
  for (const auto& [field, label] :
       {std::pair{ResultForm::Field::kYield, tr("&Yield")},
        std::pair{ResultForm::Field::kConversion, tr("Con&version")}}) {
    addField(*numbers, field, label, tr("71 % or 71 ± 2 %"));
    numbers->removeWidget(m_fields[field]);
    yields->addWidget(m_fields[field], 0, Qt::AlignTop);
  }
  delete numbers;
  column->addLayout(yields);
  auto* label = new QLabel(tr("Conclus&ion"));
  label->setBuddy(m_conclusion);
  label->setProperty("quiet", true);
  label->setProperty("small", true);
  m_conclusion->setAccessibleName(tr("Conclusion"));
  m_conclusion->setTabChangesFocus(true);
  m_conclusion->setFixedHeight(Theme::instance().scaled(kConclusionHeight_px));
  m_conclusion->installEventFilter(this);
  m_conclusionFault->setProperty("fault", true);
  m_conclusionFault->setWordWrap(true);
  m_conclusionFault->hide();
  column->addWidget(label);
  column->addWidget(m_conclusion);
  column->addWidget(m_conclusionFault);
  column->addStretch();
  return form;
}

QWidget* ResultPage::makeLife() {
  auto* life = new QWidget;
  life->setFixedWidth(Theme::instance().scaled(kLifeWidth_px));
  auto* column = new QVBoxLayout(life);
  column->setContentsMargins(0, 0, 0, 0);
  column->setSpacing(8);
  column->addWidget(heading(tr("State")));
  column->addLayout(m_moves);
  column->addWidget(m_reason);
  column->addWidget(heading(tr("Seal")));
  column->addWidget(new SealPanel(m_run));
  column->addStretch();
  return life;
}

bool ResultPage::eventFilter(QObject* watched, QEvent* event) {
  if (watched == m_conclusion && event->type() == QEvent::FocusOut) commitConclusion();
  if (watched == m_conclusion && event->type() == QEvent::KeyPress) {
    const auto* key = static_cast<QKeyEvent*>(event);
    const bool isEnter = key->key() == Qt::Key_Return || key->key() == Qt::Key_Enter;
    if (isEnter && key->modifiers().testFlag(Qt::ControlModifier)) {
      commitConclusion();
      return true;
    }
  }
  return QWidget::eventFilter(watched, event);
}

void ResultPage::commit(ResultForm::Field field, const QString& typed) {
  const Outcome outcome = m_form.commit(field, typed);
  if (!outcome.faults.empty()) m_fields[field]->setFault(sentences(outcome.faults, false));
}

void ResultPage::commitConclusion() {
  if (!m_run.isOpen() || m_conclusion->isReadOnly()) return;
  const Outcome outcome = m_form.commit(ResultForm::Field::kConclusion, m_conclusion->toPlainText());
  m_conclusionFault->setText(sentences(outcome.faults, false));
  m_conclusionFault->setVisible(!outcome.faults.empty());
  setFaulty(*m_conclusion, !outcome.faults.empty());
}

void ResultPage::show() {
  if (!m_run.isOpen()) return;
  for (const auto& [field, line] : m_fields) {
    if (!line->isBeingTyped()) line->setText(m_form.text(field));
    line->setRefusal(m_form.refusal(field));
  }
  const QString refusal = m_form.refusal(ResultForm::Field::kConclusion);
  m_conclusion->setReadOnly(!refusal.isEmpty());
  m_conclusion->setToolTip(refusal);
  if (!m_conclusion->hasFocus() && !m_conclusionFault->isVisible())
    m_conclusion->setPlainText(m_form.text(ResultForm::Field::kConclusion));
  showMoves();
}

void ResultPage::showMoves() {
  while (QLayoutItem* item = m_moves->takeAt(0)) {
    if (item->widget() != nullptr) item->widget()->deleteLater();
    delete item;
  }
  auto* present = new QLabel(tr("The run is %1.").arg(toQt(toText(m_run.run().state))));
  m_moves->addWidget(present);
  bool wantsReason = false;
  for (const ResultForm::Move& each : m_form.moves()) {
    const QString name = toQt(toText(each.to));
    auto* button =
        new QPushButton(each.wantsReason ? tr("%1 (with a reason)").arg(name) : name);
    button->setAccessibleName(tr("Move the run to %1").arg(name));
    connect(button, &QPushButton::clicked, this, [this, each] { move(each); });
    m_moves->addWidget(button);
    wantsReason = wantsReason || each.wantsReason;
  }
  m_reason->setVisible(wantsReason);
}

void ResultPage::move(const ResultForm::Move& step) {
  const Outcome outcome = m_form.moveTo(step.to, m_reason->text());
  if (outcome.done)
    m_reason->setText({});
  else
    m_reason->setFault(sentences(outcome.faults, false));
}

}  // namespace vialkeeper::ui
