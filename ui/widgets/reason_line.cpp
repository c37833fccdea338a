// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/reason_line.h"

#include <QHBoxLayout>
#include <QKeyEvent>
#include <QLabel>
#include <QLineEdit>
#include <QPushButton>

#include "ui/models/change_reason.h"

namespace vialkeeper::ui {

ReasonLine::ReasonLine(ChangeReason& reason, QWidget* parent)
    : QFrame(parent), m_reason(reason), m_question(new QLabel), m_field(new QLineEdit) {
  setObjectName(QStringLiteral("messageBar"));
  m_question->setWordWrap(true);
  m_question->setTextFormat(Qt::PlainText);
  m_question->setBuddy(m_field);
  m_field->setObjectName(QStringLiteral("reasonField"));
  m_field->setPlaceholderText(tr("why, in a few words; Enter goes on"));
  auto* give = new QPushButton(tr("Go on"));
  auto* leave = new QPushButton(tr("Leave it"));
  leave->setProperty("flat", true);
  auto* row = new QHBoxLayout(this);
  row->setContentsMargins(10, 6, 10, 6);
  row->addWidget(m_question, 3);
  row->addWidget(m_field, 4);
  row->addWidget(give);
  row->addWidget(leave);
  connect(m_field, &QLineEdit::returnPressed, this, [this] { m_reason.give(m_field->text()); });
  connect(give, &QPushButton::clicked, this, [this] { m_reason.give(m_field->text()); });
  connect(leave, &QPushButton::clicked, &m_reason, &ChangeReason::giveUp);
  connect(&m_reason, &ChangeReason::changed, this, &ReasonLine::follow);
  hide();
}

void ReasonLine::follow() {
  const bool asks = m_reason.isAsked();
  const bool was = !isHidden();
  m_question->setText(tr("The vial is charged already. Why %1?").arg(m_reason.waitingFor()));
  m_field->setAccessibleName(m_question->text());
  setVisible(asks);
  if (asks) {
    m_field->setFocus(Qt::OtherFocusReason);
  } else if (was) {
    m_field->clear();
    emit finished();
  }
}

void ReasonLine::keyPressEvent(QKeyEvent* event) {
  if (event->key() == Qt::Key_Escape)
    m_reason.giveUp();
  else
    QFrame::keyPressEvent(event);
}

}  // namespace vialkeeper::ui
