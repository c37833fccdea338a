// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/sentence_field.h"

#include <QLabel>
#include <QLineEdit>
#include <QStyle>
#include <QVBoxLayout>

namespace vialkeeper::ui {

void setFaulty(QWidget& field, bool faulty) {
  if (field.property("faulty").toBool() == faulty) return;
  field.setProperty("faulty", faulty);
  field.style()->unpolish(&field);
  field.style()->polish(&field);
}

SentenceField::SentenceField(const QString& label, QWidget* parent)
    : QWidget(parent), m_label(new QLabel(label)), m_line(new QLineEdit), m_sentence(new QLabel) {
  m_label->setBuddy(m_line);
  m_label->setProperty("quiet", true);
  m_label->setProperty("small", true);
  QString name = label;
  m_line->setAccessibleName(name.remove(QLatin1Char('&')));
  m_sentence->setProperty("fault", true);
  m_sentence->setProperty("small", true);
  m_sentence->setWordWrap(true);
  m_sentence->setTextFormat(Qt::PlainText);
  m_sentence->hide();
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 0, 0, 0);
  column->setSpacing(2);
  column->addWidget(m_label);
  column->addWidget(m_line);
  column->addWidget(m_sentence);
  connect(m_line, &QLineEdit::editingFinished, this, &SentenceField::commit);
}

QString SentenceField::text() const { return m_line->text(); }

void SentenceField::setText(const QString& text) {
  m_last = text;
  m_line->setText(text);
  m_line->setCursorPosition(0);
  setFault({});
}

void SentenceField::setHint(const QString& hint) { m_line->setPlaceholderText(hint); }

void SentenceField::setFault(const QString& sentence) {
  m_sentence->setText(sentence);
  m_sentence->setVisible(!sentence.isEmpty());
  m_line->setAccessibleDescription(sentence);
  setFaulty(*m_line, !sentence.isEmpty());
}

QString SentenceField::fault() const { return m_sentence->text(); }

void SentenceField::setRefusal(const QString& reason) {
  m_line->setReadOnly(!reason.isEmpty());
  m_line->setToolTip(reason);
}

bool SentenceField::isBeingTyped() const {
  return !fault().isEmpty() || (m_line->hasFocus() && m_line->text() != m_last);
}

void SentenceField::commit() {
  if (m_line->isReadOnly() || m_line->text() == m_last) return;
  emit committed(m_line->text());
}

}  // namespace vialkeeper::ui
