// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/slip_answers.h"

#include <QHBoxLayout>
#include <QPushButton>

namespace vialkeeper::ui {
namespace {

constexpr int kSoonest_ms = 250;

}  // namespace

SlipAnswers::SlipAnswers(QWidget* parent)
    : QWidget(parent), m_likely(new QPushButton), m_accept(new QPushButton) {
  m_likely->setProperty("main", true);
  for (QPushButton* button : {m_likely, m_accept}) button->setAutoDefault(true);
  auto* row = new QHBoxLayout(this);
  row->setContentsMargins(0, 2, 0, 2);
  row->addWidget(m_likely);
  row->addWidget(m_accept);
  row->addStretch(1);
  connect(m_likely, &QPushButton::clicked, this, [this] {
    if (isMeant()) emit likelyTaken();
  });
  connect(m_accept, &QPushButton::clicked, this, [this] {
    if (isMeant()) emit accepted();
  });
}

void SlipAnswers::offer(const QString& typed, const QString& likely) {
  m_likely->setVisible(!likely.isEmpty());
  m_likely->setText(tr("I meant %1").arg(likely));
  m_accept->setText(tr("Yes, record %1").arg(typed));
}

void SlipAnswers::showEvent(QShowEvent* event) {
  QWidget::showEvent(event);
  m_shown.start();
}

bool SlipAnswers::isMeant() const { return m_shown.isValid() && m_shown.elapsed() >= kSoonest_ms; }

void SlipAnswers::focusFirst() {
  (m_likely->isVisibleTo(this) ? m_likely : m_accept)->setFocus(Qt::OtherFocusReason);
}

}  // namespace vialkeeper::ui
