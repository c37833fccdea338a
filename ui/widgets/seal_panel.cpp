// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/seal_panel.h"

#include <QLabel>
#include <QLineEdit>
#include <QPushButton>
#include <QStyle>
#include <QVBoxLayout>

#include "ui/models/moment_text.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {

SealPanel::SealPanel(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_work(run.link()),
      m_state(new QLabel),
      m_passphrase(new QLineEdit),
      m_act(new QPushButton),
      m_sentence(new QLabel) {
  for (QLabel* label : {m_state, m_sentence}) {
    label->setWordWrap(true);
    label->setTextFormat(Qt::PlainText);
  }
  m_passphrase->setEchoMode(QLineEdit::Password);
  m_passphrase->setAccessibleName(tr("Passphrase of your signing key"));
  m_passphrase->setPlaceholderText(tr("passphrase, at least 8 characters"));
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 0, 0, 0);
  for (QWidget* part : {static_cast<QWidget*>(m_state), static_cast<QWidget*>(m_passphrase),
                        static_cast<QWidget*>(m_act), static_cast<QWidget*>(m_sentence)})
    column->addWidget(part);
  connect(m_act, &QPushButton::clicked, this, &SealPanel::act);
  connect(m_passphrase, &QLineEdit::returnPressed, this, &SealPanel::act);
  connect(&m_run, &OpenRun::reloaded, this, &SealPanel::show);
  connect(&m_run, &OpenRun::opened, this, [this] { say({}, false); });
  connect(&m_run.link(), &NotebookLink::personChanged, this, &SealPanel::show);
  connect(&m_work, &SealWork::busyChanged, this, &SealPanel::show);
  connect(&m_work, &SealWork::done, this, [this](const QString& text) { say(text, false); });
  connect(&m_work, &SealWork::refused, this, [this](const QString& text) { say(text, true); });
}

QString SealPanel::signatures() const {
  QString lines;
  for (const app::SealRecord& seal : m_work.seals(m_run.run().n))
    lines += tr("%1, %2, signed %3\n")
                 .arg(toQt(seal.person), toQt(seal.meaning), momentText(seal.signedAt));
  return lines.trimmed();
}

void SealPanel::show() {
  if (!m_run.isOpen()) return;
  const app::RunState state = m_run.run().state;
  const bool canSign = (state == app::RunState::kClosed || state == app::RunState::kSealed) &&
                       !m_run.link().isReadOnly();
  m_passphrase->setVisible(canSign);
  m_act->setVisible(canSign);
  m_act->setEnabled(!m_work.isBusy());
  if (state == app::RunState::kSealed) m_state->setText(signatures());
  if (state == app::RunState::kClosed)
    m_state->setText(tr("A seal signs the run and all it links to. It is never opened again."));
  if (state < app::RunState::kClosed) m_state->setText(tr("A closed run can be sealed."));
  if (!canSign) return;
  if (m_work.isBusy())
    m_act->setText(tr("Working…"));
  else if (!m_work.hasKey())
    m_act->setText(tr("Make a signing key for %1").arg(m_run.link().person()));
  else
    m_act->setText(state == app::RunState::kClosed ? tr("Seal the run") : tr("Countersign"));
}

void SealPanel::act() {
  if (m_work.isBusy() || !m_run.isOpen()) return;
  const QString passphrase = m_passphrase->text();
  m_passphrase->clear();
  say({}, false);
  if (!m_work.hasKey())
    m_work.makeKey(passphrase);
  else if (m_run.run().state == app::RunState::kClosed)
    m_work.seal(m_run.run().n, passphrase);
  else
    m_work.countersign(m_run.run().n, passphrase);
}

void SealPanel::say(const QString& sentence, bool isFault) {
  m_sentence->setText(sentence);
  m_sentence->setVisible(!sentence.isEmpty());
  m_sentence->setProperty(isFault ? "fault" : "good", true);
  m_sentence->setProperty(isFault ? "good" : "fault", false);
  m_sentence->style()->unpolish(m_sentence);
  m_sentence->style()->polish(m_sentence);
}

}  // namespace vialkeeper::ui
