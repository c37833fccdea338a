// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/trail_panel.h"

#include <QLabel>
#include <QScrollArea>
#include <QScrollBar>
#include <QVBoxLayout>

#include "ui/models/charge_trail.h"

namespace vialkeeper::ui {
namespace {

QLabel* textLabel(const char* property) {
  auto* label = new QLabel;
  label->setWordWrap(true);
  label->setTextFormat(Qt::PlainText);
  label->setTextInteractionFlags(Qt::TextSelectableByMouse);
  if (property != nullptr) {
    label->setProperty(property, true);
    label->setProperty("small", true);
  }
  return label;
}

void put(QLabel* label, const QStringList& lines) {
  label->setText(lines.join(QLatin1Char('\n')));
  label->setVisible(!lines.isEmpty());
}

}  // namespace

TrailPanel::TrailPanel(QWidget* parent)
    : QFrame(parent),
      m_heading(textLabel(nullptr)),
      m_steps(textLabel(nullptr)),
      m_sources(textLabel("quiet")),
      m_notices(textLabel("notice")),
      m_scroll(new QScrollArea) {
  setObjectName(QStringLiteral("trail"));
  QFont bold = m_heading->font();
  bold.setBold(true);
  m_heading->setFont(bold);
  auto* inside = new QWidget;
  auto* column = new QVBoxLayout(inside);
  column->setContentsMargins(12, 8, 12, 8);
  column->setSpacing(4);
  for (QLabel* label : {m_heading, m_steps, m_sources, m_notices}) column->addWidget(label);
  column->addStretch(1);
  m_scroll->setWidget(inside);
  m_scroll->setWidgetResizable(true);
  m_scroll->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
  m_scroll->viewport()->setAutoFillBackground(false);
  inside->setAutoFillBackground(false);
  auto* frame = new QVBoxLayout(this);
  frame->setContentsMargins(1, 1, 1, 1);
  frame->addWidget(m_scroll);
}

void TrailPanel::show(const CellTrail& trail, const QStringList& notices) {
  m_heading->setText(trail.heading);
  put(m_steps, trail.steps);
  put(m_sources, trail.sources);
  put(m_notices, notices);
  m_scroll->setAccessibleName(tr("Where it is from: %1").arg(text()));
  m_scroll->verticalScrollBar()->setValue(0);
}

QString TrailPanel::text() const {
  QStringList all;
  for (const QLabel* label : {m_heading, m_steps, m_sources, m_notices}) {
    if (!label->text().isEmpty()) all += label->text();
  }
  return all.join(QLatin1Char('\n'));
}

void TrailPanel::read() { m_scroll->setFocus(Qt::OtherFocusReason); }

}  // namespace vialkeeper::ui
