// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/shelf_compartment_page.h"

#include <QFile>
#include <QFileDialog>
#include <QHBoxLayout>
#include <QHeaderView>
#include <QLabel>
#include <QLineEdit>
#include <QPushButton>
#include <QScrollArea>
#include <QStyle>
#include <QTableView>
#include <QVBoxLayout>

#include "ui/models/qt_text.h"
#include "ui/widgets/sentence_field.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr int kFormWidth_px = 300;

/// The name of a field in a fault: `vial.volume`, `volume` and `--volume` all mean `volume`.
std::string fieldOf(const std::string& place) {
  const std::size_t dot = place.find_last_of('.');
  std::string name = dot == std::string::npos ? place : place.substr(dot + 1);
  while (name.starts_with('-')) name.erase(0, 1);
  return name;
}

}  // namespace

ShelfCompartmentPage::ShelfCompartmentPage(NotebookLink& link, const ShelfCompartment& compartment,
                                           QWidget* parent)
    : QWidget(parent),
      m_link(link),
      m_model(link, compartment),
      m_form(link, compartment),
      m_table(new QTableView),
      m_filter(new QLineEdit),
      m_heading(new QLabel),
      m_save(new QPushButton(tr("Sa&ve"))),
      m_sentence(new QLabel) {
  auto* row = new QHBoxLayout(this);
  row->setContentsMargins(0, 10, 0, 0);
  row->setSpacing(20);
  row->addWidget(makeTable(), 1);
  row->addWidget(makeForm());
  connect(&m_form, &CardForm::changed, this, &ShelfCompartmentPage::showForm);
  m_form.startNew();
}

QWidget* ShelfCompartmentPage::makeTable() {
  auto* left = new QWidget;
  m_filter->setPlaceholderText(tr("only those that hold…"));
  m_filter->setAccessibleName(tr("Narrow the table: %1").arg(m_model.compartment().title));
  m_filter->setClearButtonEnabled(true);
  connect(m_filter, &QLineEdit::textChanged, &m_model, &ShelfModel::setFilter);
  m_table->setModel(&m_model);
  m_table->setAccessibleName(m_model.compartment().title);
  m_table->setSelectionBehavior(QAbstractItemView::SelectRows);
  m_table->setSelectionMode(QAbstractItemView::SingleSelection);
  m_table->setTabKeyNavigation(false);
  m_table->setShowGrid(false);
  m_table->verticalHeader()->hide();
  m_table->horizontalHeader()->setDefaultAlignment(Qt::AlignLeft | Qt::AlignVCenter);
  m_table->horizontalHeader()->setSectionResizeMode(QHeaderView::ResizeToContents);
  connect(m_table->selectionModel(), &QItemSelectionModel::currentRowChanged, this,
          &ShelfCompartmentPage::showSelected);
  auto* fresh = new QPushButton(tr("Ne&w"));
  auto* import = new QPushButton(m_model.compartment().kind ? tr("Import CSV…")
                                                            : tr("Import CSV or SDF…"));
  connect(fresh, &QPushButton::clicked, this, &ShelfCompartmentPage::startNew);
  connect(import, &QPushButton::clicked, this, &ShelfCompartmentPage::importFile);
  for (QPushButton* button : {fresh, import}) button->setEnabled(!m_link.isReadOnly());
  auto* top = new QHBoxLayout;
  top->addWidget(m_filter, 1);
  top->addWidget(fresh);
  top->addWidget(import);
  auto* column = new QVBoxLayout(left);
  column->setContentsMargins(0, 0, 0, 0);
  column->addLayout(top);
  column->addWidget(m_table, 1);
  return left;
}

QWidget* ShelfCompartmentPage::makeForm() {
  auto* inner = new QWidget;
  auto* column = new QVBoxLayout(inner);
  column->setContentsMargins(0, 0, 8, 0);
  QFont bold = m_heading->font();
  bold.setBold(true);
  m_heading->setFont(bold);
  m_heading->setWordWrap(true);
  column->addWidget(m_heading);
  for (const CardForm::Field& field : m_form.fields()) {
    auto* line =
        new SentenceField(field.required ? tr("%1, needed").arg(field.label) : field.label);
    line->setHint(field.hint);
    line->setRefusal(m_link.readOnlyReason());
    connect(&line->line(), &QLineEdit::textEdited, this,
            [this, name = field.name](const QString& text) { m_form.setText(name, text); });
    connect(&line->line(), &QLineEdit::returnPressed, this, &ShelfCompartmentPage::save);
    m_fields[field.name] = line;
    column->addWidget(line);
  }
  m_save->setProperty("main", true);
  m_save->setEnabled(!m_link.isReadOnly());
  connect(m_save, &QPushButton::clicked, this, &ShelfCompartmentPage::save);
  m_sentence->setWordWrap(true);
  m_sentence->setTextFormat(Qt::PlainText);
  column->addWidget(m_save);
  column->addWidget(m_sentence);
  column->addStretch();
  auto* scroll = new QScrollArea;
  scroll->setWidget(inner);
  scroll->setWidgetResizable(true);
  scroll->setFrameShape(QFrame::NoFrame);
  scroll->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  scroll->setFocusPolicy(Qt::NoFocus);
  scroll->setFixedWidth(Theme::instance().scaled(kFormWidth_px));
  return scroll;
}

void ShelfCompartmentPage::showSelected() {
  // What is being typed is never written over.
  if (m_form.isChanged()) return;
  const int row = m_table->currentIndex().row();
  if (const auto* substance = m_model.substance(row)) m_form.show(*substance);
  if (const auto* card = m_model.card(row)) m_form.show(*card);
}

void ShelfCompartmentPage::showForm() {
  const QString word = m_model.compartment().word;
  m_heading->setText(m_form.isNew() ? tr("New %1").arg(word) : m_form.text("name"));
  for (const auto& [name, line] : m_fields) line->setText(m_form.text(name));
  say({}, false);
}

void ShelfCompartmentPage::startNew() {
  m_form.startNew();
  m_table->clearSelection();
  m_fields.at("name")->line().setFocus();
}

void ShelfCompartmentPage::clearFaults() {
  for (const auto& [name, line] : m_fields) line->setFault({});
}

void ShelfCompartmentPage::showFaults(const text::Faults& faults) {
  text::Faults elsewhere;
  for (const text::Fault& fault : faults) {
    const auto field = m_fields.find(fieldOf(fault.field));
    if (field == m_fields.end())
      elsewhere.push_back(fault);
    else
      field->second->setFault(sentences({fault}, false));
  }
  say(elsewhere.empty() ? tr("Nothing was saved: see the fields.") : sentences(elsewhere), true);
}

void ShelfCompartmentPage::save() {
  clearFaults();
  const auto saved = m_form.save();
  if (!saved) {
    showFaults(saved.error());
    return;
  }
  say(tr("%1 is on the shelf.").arg(toQt(*saved)), false);
  if (const int row = m_model.rowOf(*saved); row >= 0) m_table->selectRow(row);
}

void ShelfCompartmentPage::importFile() {
  const QString kinds = m_model.compartment().kind ? tr("Tables (*.csv)")
                                                   : tr("Tables and structures (*.csv *.sdf *.sd)");
  const QString name = QFileDialog::getOpenFileName(this, tr("Import"), {}, kinds);
  if (name.isEmpty()) return;
  QFile file(name);
  if (!file.open(QIODevice::ReadOnly)) {
    say(tr("%1 cannot be read: %2.").arg(name, file.errorString()), true);
    return;
  }
  const auto imported = m_form.importFile(name, file.readAll().toStdString());
  if (!imported) {
    say(sentences(imported.error()), true);
    return;
  }
  say(tr("%1 added; %2 were on the shelf already.").arg(imported->added).arg(imported->known),
      false);
}

void ShelfCompartmentPage::say(const QString& sentence, bool isFault) {
  m_sentence->setText(sentence);
  m_sentence->setProperty("fault", isFault);
  m_sentence->setProperty("good", !isFault);
  m_sentence->style()->unpolish(m_sentence);
  m_sentence->style()->polish(m_sentence);
}

}  // namespace vialkeeper::ui
