// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/new_run_page.h"

#include <QFileDialog>
#include <QHeaderView>
#include <QKeyEvent>
#include <QLabel>
#include <QLineEdit>
#include <QListView>
#include <QPushButton>
#include <QScrollArea>
#include <QShortcut>
#include <QStyle>
#include <QTableView>
#include <QVBoxLayout>

#include "ui/models/qt_text.h"
#include "ui/widgets/theme.h"
#include "ui/widgets/two_line_delegate.h"

namespace vialkeeper::ui {
namespace {

constexpr int kSourcesWidth_px = 300;

QLabel* wordsLabel(const char* property, const QString& name) {
  auto* label = new QLabel;
  label->setObjectName(name);
  label->setProperty(property, true);
  label->setWordWrap(true);
  label->setTextFormat(Qt::PlainText);
  label->hide();
  return label;
}

void showWords(QLabel& label, const QString& words) {
  label.setText(words);
  label.setVisible(!words.isEmpty());
}

}  // namespace

NewRunPage::NewRunPage(NotebookLink& link, QWidget* parent)
    : QWidget(parent),
      m_model(link),
      m_list(new QListView),
      m_table(new QTableView),
      m_vial(wordsLabel("quiet", QStringLiteral("newRunVial"))),
      m_notices(wordsLabel("notice", QStringLiteral("newRunNotices"))),
      m_caution(wordsLabel("quiet", QStringLiteral("newRunCaution"))),
      m_create(new QPushButton(tr("&Create the run"))) {
  setObjectName(QStringLiteral("newRunPage"));
  auto* row = new QHBoxLayout(this);
  row->setContentsMargins(16, 12, 16, 12);
  row->setSpacing(24);
  row->addWidget(makeSources());
  row->addWidget(makeForm(), 1);
  setFocusProxy(m_source.line);
  for (const int key : {Qt::Key_Return, Qt::Key_Enter}) {
    auto* shortcut = new QShortcut(QKeySequence(Qt::CTRL | key), this);
    shortcut->setContext(Qt::WidgetWithChildrenShortcut);
    connect(shortcut, &QShortcut::activated, this, &NewRunPage::create);
  }
  connect(m_create, &QPushButton::clicked, this, &NewRunPage::create);
  for (const Entry& entry : {m_title, m_series, m_aim})
    connect(entry.line, &QLineEdit::returnPressed, this, &NewRunPage::create);
  connect(&m_model, &NewRunModel::chosen, this, &NewRunPage::showChosen);
  connect(&m_model, &NewRunModel::previewed, this, &NewRunPage::showPreview);
}

NewRunPage::Entry NewRunPage::addEntry(QVBoxLayout& column, const QString& label,
                                       const QString& name) {
  auto* words = new QLabel(label);
  auto* line = new QLineEdit;
  line->setObjectName(name);
  line->setAccessibleName(QString(label).remove(QLatin1Char('&')));
  line->installEventFilter(this);
  words->setBuddy(line);
  auto* fault = wordsLabel("fault", name + QStringLiteral("Fault"));
  column.addWidget(words);
  column.addWidget(line);
  column.addWidget(fault);
  return {line, fault};
}

QWidget* NewRunPage::makeSources() {
  auto* box = new QWidget;
  box->setFixedWidth(Theme::instance().scaled(kSourcesWidth_px));
  auto* column = new QVBoxLayout(box);
  column->setContentsMargins(0, 0, 0, 0);
  auto* heading = new QLabel(tr("New run"));
  heading->setProperty("heading", true);
  column->addWidget(heading);
  m_source = addEntry(*column, tr("Start &from: words, or the code of any run"),
                      QStringLiteral("newRunSource"));
  m_list->setObjectName(QStringLiteral("newRunSources"));
  m_list->setAccessibleName(tr("What to start from"));
  m_list->setModel(&m_model.sources());
  m_list->setItemDelegate(new TwoLineDelegate(RunSources::kWhereRole, m_list));
  m_list->setEditTriggers(QAbstractItemView::NoEditTriggers);
  m_list->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  m_list->setVerticalScrollMode(QAbstractItemView::ScrollPerPixel);
  m_list->setResizeMode(QListView::Adjust);
  // Always there: rows are as high as their texts at this width.
  m_list->setVerticalScrollBarPolicy(Qt::ScrollBarAlwaysOn);
  m_list->installEventFilter(this);
  column->addWidget(m_list, 1);
  auto* file = new QPushButton(tr("A &plan file…"));
  column->addWidget(file, 0, Qt::AlignLeft);
  connect(file, &QPushButton::clicked, this, &NewRunPage::chooseFile);
  connect(m_source.line, &QLineEdit::textEdited, this, [this](const QString& typed) {
    m_model.sources().setFilter(typed);
    chooseFirst();
  });
  connect(m_list->selectionModel(), &QItemSelectionModel::currentChanged, this,
          [this](const QModelIndex& current) { m_model.choose(current.row()); });
  return box;
}

QWidget* NewRunPage::makeForm() {
  auto* inner = new QWidget;
  auto* column = new QVBoxLayout(inner);
  column->setContentsMargins(0, 0, 4, 0);
  m_title = addEntry(*column, tr("&Title"), QStringLiteral("newRunTitle"));
  m_series = addEntry(*column, tr("&Series"), QStringLiteral("newRunSeries"));
  m_aim = addEntry(*column, tr("&Aim: what the run is to show"), QStringLiteral("newRunAim"));
  auto* buttons = new QHBoxLayout;
  m_create->setProperty("main", true);
  m_create->setToolTip(tr("Enter, or Ctrl+Enter from anywhere on this page"));
  auto* away = new QPushButton(tr("Give &up"));
  connect(away, &QPushButton::clicked, this, &NewRunPage::cancel);
  buttons->addWidget(m_create);
  buttons->addWidget(away);
  buttons->addStretch();
  column->addSpacing(4);
  column->addLayout(buttons);
  column->addSpacing(10);
  makeTable();
  column->addWidget(m_table);
  for (QLabel* label : {m_notices, m_vial, m_caution}) column->addWidget(label);
  column->addStretch(1);
  auto* scroll = new QScrollArea;
  scroll->setWidget(inner);
  scroll->setWidgetResizable(true);
  scroll->setFocusPolicy(Qt::NoFocus);
  return scroll;
}

void NewRunPage::makeTable() {
  m_table->setObjectName(QStringLiteral("newRunCharge"));
  m_table->setAccessibleName(tr("The charge"));
  m_table->setModel(&m_model.preview());
  m_table->setSelectionMode(QAbstractItemView::NoSelection);
  m_table->setFocusPolicy(Qt::TabFocus);
  m_table->setTabKeyNavigation(false);
  m_table->setShowGrid(false);
  m_table->verticalHeader()->hide();
  m_table->setVerticalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  m_table->setSizeAdjustPolicy(QAbstractScrollArea::AdjustToContents);
  m_table->horizontalHeader()->setSectionResizeMode(QHeaderView::ResizeToContents);
  m_table->horizontalHeader()->setSectionResizeMode(ChargePreview::kComponent,
                                                    QHeaderView::Stretch);
  m_table->verticalHeader()->setSectionResizeMode(QHeaderView::ResizeToContents);
  m_table->setColumnHidden(ChargePreview::kRole, true);
}

void NewRunPage::showEvent(QShowEvent* event) {
  QWidget::showEvent(event);
  if (m_isFresh && !event->spontaneous()) startAfresh();
}

void NewRunPage::startAfresh() {
  m_isFresh = false;
  for (const Entry& entry : {m_source, m_title, m_series, m_aim}) {
    entry.line->clear();
    entry.line->setModified(false);
  }
  clearFaults();
  m_model.reset();
  chooseFirst();
}

void NewRunPage::chooseFirst() {
  const QModelIndex first = m_model.sources().index(0);
  m_list->setCurrentIndex(first);
  if (!first.isValid()) m_model.choose(-1);
}

void NewRunPage::startFrom(app::RowNumber run) {
  startAfresh();
  if (const auto offered = m_model.sources().offerRun(run); !offered) {
    showFault(m_source, sentences(offered.error()));
    return;
  }
  chooseFirst();
  m_title.line->setFocus();
  m_title.line->selectAll();
}

void NewRunPage::chooseFile() {
  const QString file =
      QFileDialog::getOpenFileName(this, tr("A plan to start from"), {}, tr("Plans (*.toml)"));
  if (file.isEmpty()) return;
  if (const auto offered = m_model.sources().offerFile(file); !offered) {
    showFault(m_source, sentences(offered.error()));
    return;
  }
  m_source.line->clear();
  chooseFirst();
  m_title.line->setFocus();
  m_title.line->selectAll();
}

void NewRunPage::showChosen() {
  clearFaults();
  const NewRunModel::Words& words = m_model.suggested();
  // What somebody typed is theirs.
  const auto suggest = [](const Entry& entry, const QString& text) {
    if (entry.line->isModified()) return;
    entry.line->setText(text);
    entry.line->setCursorPosition(0);
  };
  suggest(m_title, words.title);
  suggest(m_series, words.series);
  suggest(m_aim, words.aim);
}

void NewRunPage::showPreview() {
  showFault(m_source, m_model.sourceFault());
  m_table->setVisible(m_model.preview().rowCount() > 0);
  showWords(*m_notices, m_model.notices().join(QLatin1Char('\n')));
  showWords(*m_vial, m_model.isWorking() ? tr("Working out the charge…") : m_model.vial());
  showWords(*m_caution, m_model.caution());
}

void NewRunPage::showFault(const Entry& entry, const QString& sentence) {
  showWords(*entry.fault, sentence);
  entry.line->setProperty("faulty", !sentence.isEmpty());
  entry.line->setAccessibleDescription(sentence);
  entry.line->style()->unpolish(entry.line);
  entry.line->style()->polish(entry.line);
}

void NewRunPage::clearFaults() {
  for (const Entry& entry : {m_source, m_title, m_series, m_aim}) showFault(entry, {});
}

void NewRunPage::create() {
  clearFaults();
  const auto made =
      m_model.create({m_title.line->text(), m_series.line->text(), m_aim.line->text()});
  if (made) {
    m_isFresh = true;
    emit created(*made);
    return;
  }
  const auto entryOf = [this](NewRunModel::Field field) -> const Entry& {
    return field == NewRunModel::Field::kTitle    ? m_title
           : field == NewRunModel::Field::kSeries ? m_series
                                                  : m_source;
  };
  for (const NewRunModel::FieldFault& fault : made.error()) {
    const Entry& entry = entryOf(fault.field);
    const QString before = entry.fault->text();
    showFault(entry,
              before.isEmpty() ? fault.sentence : before + QLatin1Char('\n') + fault.sentence);
  }
  entryOf(made.error().front().field).line->setFocus();
}

void NewRunPage::cancel() {
  m_isFresh = true;
  emit cancelled();
}

bool NewRunPage::eventFilter(QObject* watched, QEvent* event) {
  if (event->type() != QEvent::KeyPress) return QWidget::eventFilter(watched, event);
  const auto* key = static_cast<QKeyEvent*>(event);
  if (key->key() == Qt::Key_Escape) {
    cancel();
    return true;
  }
  const bool isSource = watched == m_source.line;
  const bool isEnter = key->key() == Qt::Key_Return || key->key() == Qt::Key_Enter;
  if (isEnter && key->modifiers() == Qt::NoModifier && (isSource || watched == m_list)) {
    m_title.line->setFocus();
    m_title.line->selectAll();
    return true;
  }
  if (isSource && (key->key() == Qt::Key_Down || key->key() == Qt::Key_Up)) {
    const int row = m_list->currentIndex().row() + (key->key() == Qt::Key_Down ? 1 : -1);
    if (const QModelIndex next = m_model.sources().index(row); next.isValid())
      m_list->setCurrentIndex(next);
    return true;
  }
  return QWidget::eventFilter(watched, event);
}

}  // namespace vialkeeper::ui
