// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/message_bar.h"

#include <QHBoxLayout>
#include <QLabel>
#include <QPushButton>
#include <QStyle>

namespace vialkeeper::ui {
namespace {

QString nameOf(MessageBar::Kind kind) {
  switch (kind) {
    case MessageBar::Kind::kFault:
      return QStringLiteral("fault");
    case MessageBar::Kind::kGood:
      return QStringLiteral("good");
    case MessageBar::Kind::kNotice:
      break;
  }
  return QStringLiteral("notice");
}

QString wordOf(MessageBar::Kind kind) {
  switch (kind) {
    case MessageBar::Kind::kFault:
      return MessageBar::tr("Not done");
    case MessageBar::Kind::kGood:
      return MessageBar::tr("Done");
    case MessageBar::Kind::kNotice:
      break;
  }
  return MessageBar::tr("Note");
}

}  // namespace

MessageBar::MessageBar(QWidget* parent)
    : QFrame(parent), m_word(new QLabel), m_message(new QLabel), m_answers(new QHBoxLayout) {
  setObjectName(QStringLiteral("messageBar"));
  m_word->setObjectName(QStringLiteral("messageWord"));
  QFont bold = m_word->font();
  bold.setBold(true);
  m_word->setFont(bold);
  m_message->setWordWrap(true);
  m_message->setTextFormat(Qt::PlainText);
  m_message->setTextInteractionFlags(Qt::TextSelectableByMouse);
  auto* row = new QHBoxLayout(this);
  row->setContentsMargins(16, 6, 8, 6);
  row->addWidget(m_word, 0, Qt::AlignTop);
  row->addWidget(m_message, 1);
  row->addLayout(m_answers);
  auto* away = new QPushButton(tr("Dismiss"));
  away->setProperty("flat", true);
  connect(away, &QPushButton::clicked, this, &MessageBar::dismiss);
  row->addWidget(away, 0, Qt::AlignTop);
  hide();
}

void MessageBar::show(Kind kind, const QString& message, std::vector<Answer> answers) {
  setProperty("kind", nameOf(kind));
  style()->unpolish(this);
  style()->polish(this);
  m_word->setText(wordOf(kind));
  m_message->setText(message);
  setAccessibleName(wordOf(kind) + QStringLiteral(": ") + message);
  while (QLayoutItem* item = m_answers->takeAt(0)) {
    if (item->widget() != nullptr) item->widget()->deleteLater();
    delete item;
  }
  for (const Answer& answer : answers) {
    auto* button = new QPushButton(answer.text);
    connect(button, &QPushButton::clicked, this, [this, act = answer.act] {
      dismiss();
      act();
    });
    m_answers->addWidget(button, 0, Qt::AlignTop);
  }
  QFrame::show();
}

QString MessageBar::message() const { return isVisibleTo(parentWidget()) ? m_message->text() : QString(); }

void MessageBar::dismiss() { hide(); }

}  // namespace vialkeeper::ui
