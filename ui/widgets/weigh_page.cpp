// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/weigh_page.h"

#include <QHBoxLayout>
#include <QKeyEvent>
#include <QLabel>
#include <QLineEdit>
#include <QPushButton>
#include <QStyle>

#include "ui/models/weigh_steps.h"
#include "ui/widgets/slip_answers.h"
#include "ui/widgets/theme.h"

namespace vialkeeper::ui {
namespace {

constexpr double kTargetSize = 6.0;
constexpr double kNameSize = 2.0;
constexpr double kDeviationSize = 1.7;

QLabel* labelOf(const char* property = nullptr) {
  auto* label = new QLabel;
  label->setTextFormat(Qt::PlainText);
  label->setWordWrap(true);
  if (property != nullptr) label->setProperty(property, true);
  return label;
}

void put(QLabel* label, const QString& text) {
  label->setText(text);
  label->setVisible(!text.isEmpty());
}

void setTone(QLabel* label, Tone tone) {
  label->setProperty("fault", tone == Tone::kFault || tone == Tone::kOff);
  label->setProperty("good", tone == Tone::kGood);
  label->style()->unpolish(label);
  label->style()->polish(label);
}

void setSize(QLabel* label, const QFont& base, double factor, QFont::Weight weight) {
  QFont font = base;
  font.setPointSizeF(base.pointSizeF() * factor);
  font.setWeight(weight);
  label->setFont(font);
}

}  // namespace

WeighPage::WeighPage(WeighSteps& steps, QWidget* parent)
    : QWidget(parent),
      m_steps(steps),
      m_progress(labelOf("quiet")),
      m_name(labelOf()),
      m_details(labelOf("quiet")),
      m_target(labelOf()),
      m_tolerance(labelOf()),
      m_notices(labelOf("notice")),
      m_field(new QLineEdit),
      m_deviation(labelOf()),
      m_understood(labelOf()),
      m_question(labelOf("notice")),
      m_answers(new SlipAnswers),
      m_next(labelOf("quiet")),
      m_overview(labelOf("quiet")),
      m_changes(labelOf()),
      m_written(labelOf("good")),
      m_retarget(new QPushButton(tr("Re-target (F5)"))) {
  auto* step = new QVBoxLayout;
  step->setSpacing(8);
  step->addWidget(makeTarget());
  step->addWidget(makeEntry());
  step->addWidget(m_changes);
  step->addStretch(1);
  auto* both = new QHBoxLayout;
  both->setSpacing(24);
  both->addLayout(step, 5);
  both->addWidget(m_overview, 2, Qt::AlignTop);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(4, 8, 4, 8);
  column->setSpacing(8);
  column->addWidget(makeHead());
  column->addLayout(both, 1);
  column->addWidget(m_next);
  connect(&m_steps, &WeighSteps::moved, this, [this] {
    m_field->clear();
    showStep();
    if (isVisible()) m_field->setFocus(Qt::OtherFocusReason);
  });
  connect(&m_steps, &WeighSteps::changed, this, &WeighPage::showStep);
  connect(&m_steps, &WeighSteps::written, this,
          [this](const QString& what) { put(m_written, tr("Recorded: %1").arg(what)); });
  connect(&Theme::instance(), &Theme::changed, this, &WeighPage::setFonts);
  m_written->hide();
  setFonts();
  showStep();
}

QWidget* WeighPage::makeHead() {
  auto* back = new QPushButton(tr("Back to the table (Esc)"));
  back->setProperty("flat", true);
  connect(back, &QPushButton::clicked, this, &WeighPage::left);
  connect(m_retarget, &QPushButton::clicked, &m_steps, &WeighSteps::retarget);
  auto* head = new QWidget;
  auto* row = new QHBoxLayout(head);
  row->setContentsMargins(0, 0, 0, 0);
  row->addWidget(m_progress, 1);
  row->addWidget(m_retarget);
  row->addWidget(back);
  return head;
}

QWidget* WeighPage::makeTarget() {
  m_tolerance->setAlignment(Qt::AlignLeft | Qt::AlignBottom);
  m_target->setWordWrap(false);
  auto* number = new QHBoxLayout;
  number->setSpacing(18);
  number->addWidget(m_target);
  number->addWidget(m_tolerance, 1);
  auto* area = new QWidget;
  auto* column = new QVBoxLayout(area);
  column->setContentsMargins(0, 0, 0, 0);
  column->setSpacing(2);
  column->addWidget(m_name);
  column->addWidget(m_details);
  column->addLayout(number);
  column->addWidget(m_notices);
  return area;
}

QWidget* WeighPage::makeEntry() {
  m_field->setObjectName(QStringLiteral("weighField"));
  m_field->setAccessibleName(tr("What the balance or pipette gave"));
  m_field->installEventFilter(this);
  connect(m_field, &QLineEdit::textEdited, this, [this](const QString& typed) {
    m_written->hide();
    m_steps.setTyped(typed);
  });
  connect(m_field, &QLineEdit::returnPressed, &m_steps, &WeighSteps::record);
  connect(m_answers, &SlipAnswers::accepted, &m_steps, &WeighSteps::accept);
  connect(m_answers, &SlipAnswers::likelyTaken, &m_steps, &WeighSteps::takeLikely);
  auto* area = new QWidget;
  auto* row = new QHBoxLayout;
  row->setSpacing(16);
  row->addWidget(m_field, 5);
  row->addWidget(m_deviation, 6);
  auto* column = new QVBoxLayout(area);
  column->setContentsMargins(0, 4, 0, 0);
  column->setSpacing(4);
  column->addLayout(row);
  column->addWidget(m_understood);
  column->addWidget(m_question);
  column->addWidget(m_answers);
  column->addWidget(m_written);
  return area;
}

void WeighPage::startEntry() {
  m_written->hide();
  m_field->setFocus(Qt::OtherFocusReason);
}

void WeighPage::showStep() {
  const ChargeRow row = m_steps.row();
  m_progress->setText(m_steps.progress() + QStringLiteral("  ·  ") + m_steps.recorded());
  m_name->setText(row.name);
  m_details->setText(row.ratio.isEmpty() ? row.roleLine
                                         : row.roleLine + QStringLiteral(" · ") + row.ratio);
  m_target->setText(row.target);
  m_tolerance->setText(row.alternative.isEmpty()
                           ? row.tolerance
                           : row.tolerance + QLatin1Char('\n') + row.alternative);
  m_field->setPlaceholderText(row.weighed.isEmpty() ? tr("weigh, then Enter")
                                                    : tr("recorded: %1").arg(row.weighed));
  m_field->setAccessibleDescription(
      tr("%1, aim at %2 %3").arg(row.name, row.target, row.tolerance));
  put(m_notices, row.notices.join(QLatin1Char('\n')));
  const QString next = m_steps.nextName();
  m_next->setText(next.isEmpty() ? tr("This is the last one. Up and Down go back and forth.")
                                 : tr("Then: %1. Up and Down go back and forth.").arg(next));
  showReading();
  showTargets();
  showOverview();
}

/// What is done and what is to come, told apart by a sign.
void WeighPage::showOverview() {
  QStringList lines;
  for (const WeighStep& each : m_steps.overview()) {
    const QString sign =
        each.isOn ? QStringLiteral("▸ ")
                  : (each.actual.isEmpty() ? QStringLiteral("   ") : QStringLiteral("✓ "));
    lines += sign + each.name + QStringLiteral("\n     ") +
             (each.actual.isEmpty() ? each.target : tr("%1 of %2").arg(each.actual, each.target));
  }
  m_overview->setText(lines.join(QLatin1Char('\n')));
}

void WeighPage::showReading() {
  setTone(m_deviation, m_steps.tone());
  setTone(m_understood, m_steps.tone() == Tone::kFault ? Tone::kFault : Tone::kPlain);
  m_deviation->setText(m_steps.deviation());
  put(m_understood, m_steps.understood());
  put(m_question, m_steps.question().isEmpty()
                      ? QString()
                      : m_steps.question() + tr("  Tab goes to the answers; or weigh again."));
  const bool asks = !m_steps.question().isEmpty();
  m_answers->setVisible(asks);
  if (asks) m_answers->offer(m_steps.typed().trimmed(), m_steps.likely());
  // The cursor stays in the field: a balance that sends another line, or a second line end, must
  // not answer the question.
}

void WeighPage::showTargets() {
  QStringList lines;
  if (m_steps.isRetargeted()) lines += tr("Targets follow the limiting component as weighed:");
  for (const TargetChange& change : m_steps.targetChanges())
    lines += tr("%1: %2 → %3").arg(change.name, change.before, change.after);
  if (m_steps.isRetargeted() && m_steps.targetChanges().empty())
    lines += tr("no target changes by what can be weighed");
  if (!m_steps.retargetFault().isEmpty()) lines += m_steps.retargetFault();
  setTone(m_changes, m_steps.retargetFault().isEmpty() ? Tone::kPlain : Tone::kFault);
  put(m_changes, lines.join(QLatin1Char('\n')));
}

void WeighPage::setFonts() {
  setSize(m_name, font(), kNameSize, QFont::DemiBold);
  setSize(m_target, font(), kTargetSize, QFont::Bold);
  setSize(m_tolerance, font(), kDeviationSize, QFont::Normal);
  setSize(m_deviation, font(), kDeviationSize, QFont::DemiBold);
}

void WeighPage::changeEvent(QEvent* event) {
  QWidget::changeEvent(event);
  if (event->type() == QEvent::FontChange) setFonts();
}

bool WeighPage::eventFilter(QObject* watched, QEvent* event) {
  if (watched == m_field && event->type() == QEvent::KeyPress) {
    const int key = static_cast<QKeyEvent*>(event)->key();
    if (key == Qt::Key_Up || key == Qt::Key_Down) {
      key == Qt::Key_Up ? m_steps.previous() : m_steps.next();
      return true;
    }
  }
  return QWidget::eventFilter(watched, event);
}

void WeighPage::keyPressEvent(QKeyEvent* event) {
  if (event->key() != Qt::Key_Escape) {
    QWidget::keyPressEvent(event);
  } else if (!m_steps.question().isEmpty()) {
    // First the question goes away, what was typed stays to be mended.
    m_steps.setTyped(m_field->text());
    m_field->setFocus(Qt::OtherFocusReason);
  } else {
    emit left();
  }
}

}  // namespace vialkeeper::ui
