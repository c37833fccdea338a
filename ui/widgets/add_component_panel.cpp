// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/add_component_panel.h"

#include <QComboBox>
#include <QGridLayout>
#include <QKeyEvent>
#include <QLabel>
#include <QLineEdit>
#include <QListView>
#include <QPushButton>
#include <algorithm>

#include "ui/models/component_draft.h"
#include "ui/models/component_search.h"
#include "ui/widgets/found_substance_delegate.h"
#include "ui/widgets/structure_view.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

QLineEdit* fieldOf(QGridLayout& grid, int row, int column, const QString& label,
                   const QString& hint) {
  auto* field = new QLineEdit;
  auto* name = new QLabel(label);
  name->setBuddy(field);
  name->setProperty("quiet", true);
  field->setPlaceholderText(hint);
  grid.addWidget(name, row, column);
  grid.addWidget(field, row, column + 1);
  return field;
}

/// Text from a model: what the person is typing stays as it is.
void put(QLineEdit* field, const QString& text) {
  if (!field->hasFocus() && field->text() != text) field->setText(text);
}

}  // namespace

AddComponentPanel::AddComponentPanel(ComponentSearch& search, ComponentDraft& draft,
                                     QWidget* parent)
    : QFrame(parent),
      m_search(search),
      m_draft(draft),
      m_list(new QListView),
      m_describing(new QWidget),
      m_known(new QLabel),
      m_role(new QComboBox),
      m_amount(new QLineEdit),
      m_reading(new QLabel),
      m_add(new QPushButton(tr("Add"))),
      m_structure(new StructureView) {
  setObjectName(QStringLiteral("trail"));
  m_list->setModel(&m_search);
  m_list->setItemDelegate(new FoundSubstanceDelegate(m_list));
  m_list->setAccessibleName(tr("Substances found on the shelf"));
  m_list->setObjectName(QStringLiteral("foundList"));
  m_list->installEventFilter(this);
  auto* row = new QHBoxLayout(this);
  row->setContentsMargins(10, 8, 10, 8);
  row->setSpacing(14);
  row->addWidget(m_list, 3);
  row->addWidget(makeFields(), 5);
  row->addWidget(m_structure, 2);
  connect(m_list, &QListView::clicked, this, &AddComponentPanel::takeChosen);
  connect(&m_draft, &ComponentDraft::changed, this, &AddComponentPanel::showDraft);
  connect(m_role, &QComboBox::currentTextChanged, &m_draft, &ComponentDraft::setRole);
  connect(m_amount, &QLineEdit::textEdited, &m_draft, &ComponentDraft::setAmount);
  connect(m_amount, &QLineEdit::returnPressed, &m_draft, &ComponentDraft::add);
  connect(m_add, &QPushButton::clicked, &m_draft, &ComponentDraft::add);
  for (QLineEdit* field : {m_name, m_smiles, m_formula, m_cas})
    connect(field, &QLineEdit::textEdited, this, &AddComponentPanel::describe);
  showDraft();
}

QWidget* AddComponentPanel::makeFields() {
  auto* describing = new QGridLayout(m_describing);
  describing->setContentsMargins(0, 0, 0, 0);
  describing->setVerticalSpacing(4);
  m_name = fieldOf(*describing, 0, 0, tr("Na&me"), tr("as you call it"));
  m_cas = fieldOf(*describing, 0, 2, tr("C&AS"), tr("75-98-9"));
  m_smiles = fieldOf(*describing, 1, 0, tr("SMI&LES"), tr("or a formula"));
  m_formula = fieldOf(*describing, 1, 2, tr("&Formula"), tr("C5H10O2"));
  m_known->setWordWrap(true);
  m_role->addItems(ComponentDraft::roles());
  auto* roleName = new QLabel(tr("R&ole"));
  roleName->setBuddy(m_role);
  roleName->setProperty("quiet", true);
  auto* amountName = new QLabel(tr("Amoun&t"));
  amountName->setBuddy(m_amount);
  amountName->setProperty("quiet", true);
  m_amount->setMinimumWidth(Theme::instance().scaled(90));
  m_amount->setObjectName(QStringLiteral("newAmount"));
  m_reading->setWordWrap(true);
  m_reading->setTextFormat(Qt::PlainText);
  m_add->setProperty("main", true);
  auto* fields = new QWidget;
  auto* choice = new QHBoxLayout;
  choice->addWidget(roleName);
  choice->addWidget(m_role, 1);
  choice->addWidget(amountName);
  choice->addWidget(m_amount, 1);
  choice->addWidget(m_add);
  auto* column = new QVBoxLayout(fields);
  column->setContentsMargins(0, 0, 0, 0);
  column->setSpacing(6);
  column->addWidget(m_known);
  column->addWidget(m_describing);
  column->addLayout(choice);
  column->addWidget(m_reading);
  column->addStretch(1);
  return fields;
}

void AddComponentPanel::searchFor(const QString& typed) {
  m_search.setText(typed);
  if (m_search.rowCount() > 0) m_list->setCurrentIndex(m_search.index(0, 0));
  m_draft.clear();
}

void AddComponentPanel::moveBy(int rows) {
  const int to =
      std::clamp(m_list->currentIndex().row() + rows, 0, std::max(0, m_search.rowCount() - 1));
  m_list->setCurrentIndex(m_search.index(to, 0));
}

void AddComponentPanel::takeChosen() {
  const int row = m_list->currentIndex().row();
  if (row < 0) return;
  if (const auto substance = m_search.substance(row)) {
    m_draft.takeFromShelf(*substance);
    m_role->setFocus(Qt::OtherFocusReason);
    return;
  }
  m_draft.startNew(m_search.text());
  (m_draft.name().isEmpty() ? m_name : m_smiles)->setFocus(Qt::OtherFocusReason);
}

void AddComponentPanel::describe() {
  m_draft.describe(m_name->text(), m_smiles->text(), m_formula->text(), m_cas->text());
}

void AddComponentPanel::showDraft() {
  const bool hasOne = !m_draft.isEmpty() || m_describing->isAncestorOf(focusWidget());
  m_describing->setVisible(hasOne && m_draft.isNew());
  m_known->setVisible(!hasOne || !m_draft.isNew());
  m_known->setText(!hasOne ? tr("Choose with the arrow keys and Enter.")
                           : m_draft.name() + QStringLiteral("  ") + m_draft.formula());
  put(m_name, m_draft.name());
  put(m_smiles, m_draft.smiles());
  put(m_formula, m_draft.formula());
  put(m_cas, m_draft.cas());
  for (QWidget* widget : {static_cast<QWidget*>(m_role), static_cast<QWidget*>(m_amount),
                          static_cast<QWidget*>(m_add)})
    widget->setEnabled(hasOne);
  m_role->setCurrentText(m_draft.role());
  if (!hasOne) m_amount->clear();
  m_amount->setPlaceholderText(m_draft.usualAmount());
  m_reading->setText(m_draft.reading());
  m_reading->setProperty("fault", m_draft.isFaulty());
  m_reading->style()->unpolish(m_reading);
  m_reading->style()->polish(m_reading);
  m_structure->setSmiles(m_draft.smiles());
}

bool AddComponentPanel::eventFilter(QObject* watched, QEvent* event) {
  if (watched == m_list && event->type() == QEvent::KeyPress) {
    const int key = static_cast<QKeyEvent*>(event)->key();
    if (key == Qt::Key_Return || key == Qt::Key_Enter) {
      takeChosen();
      return true;
    }
  }
  return QFrame::eventFilter(watched, event);
}

void AddComponentPanel::keyPressEvent(QKeyEvent* event) {
  const bool isEnter = event->key() == Qt::Key_Return || event->key() == Qt::Key_Enter;
  if (event->key() == Qt::Key_Escape)
    emit left();
  else if (isEnter && m_role->hasFocus())
    m_amount->setFocus(Qt::TabFocusReason);
  else if (isEnter && m_describing->isAncestorOf(focusWidget()))
    m_role->setFocus(Qt::TabFocusReason);
  else
    QFrame::keyPressEvent(event);
}

}  // namespace vialkeeper::ui
