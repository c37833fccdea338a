// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/run_page.h"

#include <QHBoxLayout>
#include <QLabel>
#include <QTabWidget>
#include <QVBoxLayout>

#include "ui/models/qt_text.h"
#include "ui/widgets/charge_page.h"
#include "ui/widgets/evidence_page.h"
#include "ui/widgets/log_page.h"
#include "ui/widgets/message_bar.h"
#include "ui/widgets/result_page.h"
#include "ui/widgets/vial_strip_widget.h"

namespace vialkeeper::ui {

RunPage::RunPage(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_title(new QLabel),
      m_state(new QLabel),
      m_messages(new MessageBar),
      m_pages(new QTabWidget),
      m_charge(new ChargePage(run)),
      m_log(new LogPage(run)) {
  setObjectName(QStringLiteral("page"));
  m_title->setProperty("heading", true);
  m_title->setTextFormat(Qt::PlainText);
  m_title->setTextInteractionFlags(Qt::TextSelectableByMouse);
  m_title->setSizePolicy(QSizePolicy::Ignored, QSizePolicy::Preferred);
  m_state->setObjectName(QStringLiteral("runState"));
  auto* heading = new QHBoxLayout;
  heading->addWidget(m_title, 1);
  heading->addWidget(m_state);
  auto* strip = new VialStripWidget(run);
  m_pages->addTab(m_charge, tr("&Charge"));
  m_pages->addTab(m_log, tr("&Log"));
  m_pages->addTab(new EvidencePage(run), tr("&Evidence"));
  m_pages->addTab(new ResultPage(run), tr("&Result"));
  m_pages->setDocumentMode(true);
  m_pages->setAccessibleName(tr("Pages of the run"));
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(12, 10, 12, 8);
  column->setSpacing(8);
  column->addLayout(heading);
  column->addWidget(m_messages);
  column->addWidget(strip);
  column->addWidget(m_pages, 1);
  connect(&m_run, &OpenRun::reloaded, this, &RunPage::showHeading);
  connect(&m_run, &OpenRun::opened, m_messages, &MessageBar::dismiss);
  connect(&m_run, &OpenRun::conflictFound, this, &RunPage::showConflict);
  connect(&m_run, &OpenRun::refused, this, [this](const text::Faults& faults) {
    m_messages->show(MessageBar::Kind::kFault, sentences(faults));
  });
  connect(strip, &VialStripWidget::entryChosen, this, [this](int entry) {
    showPage(Page::kLog);
    m_log->goToEntry(entry);
  });
}

void RunPage::showPage(Page page) { m_pages->setCurrentIndex(static_cast<int>(page)); }

void RunPage::showHeading() {
  if (!m_run.isOpen()) return;
  m_title->setText(toQt(m_run.run().code) + QStringLiteral("  ") + toQt(m_run.run().title));
  m_state->setText(toQt(toText(m_run.run().state)));
  m_state->setAccessibleName(tr("State of the run: %1").arg(m_state->text()));
}

void RunPage::showConflict(const Conflict& conflict) {
  m_messages->show(MessageBar::Kind::kFault,
                   tr("%1 was changed by somebody else meanwhile.\nHere: %2\nIn the notebook: %3")
                       .arg(conflict.what, conflict.mine, conflict.theirs),
                   {{tr("Record mine"), conflict.takeMine}, {tr("Keep the notebook's"), [] {}}});
}

}  // namespace vialkeeper::ui
