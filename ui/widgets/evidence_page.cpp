// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/widgets/evidence_page.h"

#include <QComboBox>
#include <QDragEnterEvent>
#include <QFileDialog>
#include <QFileInfo>
#include <QHBoxLayout>
#include <QHeaderView>
#include <QLabel>
#include <QMimeData>
#include <QProgressBar>
#include <QPushButton>
#include <QTableView>
#include <QVBoxLayout>

#include "app/text_files.h"
#include "ui/models/background.h"
#include "ui/models/qt_text.h"
#include "ui/widgets/evidence_preview.h"
#include "ui/widgets/label_style.h"

namespace vialkeeper::ui {

EvidencePage::EvidencePage(OpenRun& run, QWidget* parent)
    : QWidget(parent),
      m_run(run),
      m_model(run),
      m_import(run),
      m_choose(new QPushButton(tr("&Import a table…"))),
      m_kind(new QComboBox),
      m_progress(new QProgressBar),
      m_cancel(new QPushButton(tr("Cancel"))),
      m_message(styledLabel({"quiet"})),
      m_list(new QTableView),
      m_save(new QPushButton(tr("Save the ra&w file…"))),
      m_preview(new EvidencePreview) {
  setAcceptDrops(true);
  layOut();
  wire();
  followImport();
}

void EvidencePage::layOut() {
  m_kind->addItems(EvidenceImport::kinds());
  m_kind->setAccessibleName(tr("Kind of the table"));
  m_progress->setRange(0, 0);
  m_progress->setAccessibleName(tr("Importing"));
  m_message->setWordWrap(true);
  m_message->setObjectName(QStringLiteral("evidenceMessage"));
  m_list->setModel(&m_model);
  m_list->setAccessibleName(tr("Datasets and files of the run"));
  m_list->setSelectionBehavior(QAbstractItemView::SelectRows);
  m_list->setSelectionMode(QAbstractItemView::SingleSelection);
  m_list->setTabKeyNavigation(false);
  m_list->setShowGrid(false);
  m_list->setEditTriggers(QAbstractItemView::NoEditTriggers);
  m_list->verticalHeader()->hide();
  m_list->horizontalHeader()->setDefaultAlignment(Qt::AlignLeft | Qt::AlignVCenter);
  m_list->horizontalHeader()->setHighlightSections(false);
  m_list->horizontalHeader()->setSectionResizeMode(QHeaderView::ResizeToContents);
  m_list->horizontalHeader()->setSectionResizeMode(EvidenceModel::kName, QHeaderView::Stretch);
  auto* label = new QLabel(tr("as a"));
  label->setBuddy(m_kind);
  auto* row = new QHBoxLayout;
  row->setSpacing(8);
  row->addWidget(m_choose);
  row->addWidget(label);
  row->addWidget(m_kind);
  row->addWidget(m_progress, 1);
  row->addWidget(m_cancel);
  row->addWidget(m_message, 1);
  row->addWidget(m_save);
  auto* column = new QVBoxLayout(this);
  column->setContentsMargins(0, 10, 0, 0);
  column->setSpacing(8);
  column->addLayout(row);
  column->addWidget(m_list, 1);
  column->addWidget(m_preview, 3);
}

void EvidencePage::wire() {
  connect(m_choose, &QPushButton::clicked, this, &EvidencePage::chooseFile);
  connect(m_cancel, &QPushButton::clicked, &m_import, &EvidenceImport::cancel);
  connect(m_save, &QPushButton::clicked, this, &EvidencePage::chooseRawFile);
  connect(&m_import, &EvidenceImport::started, this, &EvidencePage::followImport);
  connect(&m_import, &EvidenceImport::cancelled, this, [this] {
    followImport();
    say(tr("Cancelled; nothing was kept."), false);
  });
  connect(&m_import, &EvidenceImport::refused, this, [this](const text::Faults& faults) {
    followImport();
    say(sentences(faults), true);
  });
  connect(&m_import, &EvidenceImport::imported, this,
          [this](const QString& code, const text::Notices& notices) {
            followImport();
            QStringList words{tr("%1 is kept.").arg(code)};
            for (const text::Notice& notice : notices)
              words += toQt(notice.text) + QLatin1Char('.');
            say(words.join(QLatin1Char('\n')), false);
            m_list->selectRow(m_model.rowOfDataset(code));
          });
  connect(m_list->selectionModel(), &QItemSelectionModel::currentRowChanged, this,
          [this](const QModelIndex& current) { preview(current.row()); });
  connect(&m_model, &QAbstractItemModel::modelReset, this, &EvidencePage::followRun);
  connect(&m_run, &OpenRun::opened, this, [this] { say({}, false); });
  connect(&m_run, &OpenRun::reloaded, this, &EvidencePage::followImport);
}

void EvidencePage::followRun() {
  const QString code = m_shown ? m_shown->item.code : QString();
  m_shown.reset();
  m_save->setEnabled(false);
  const int row = code.isEmpty() ? -1 : m_model.rowOfDataset(code);
  if (m_model.rowCount() == 0) {
    ++m_asked;
    m_preview->showNothing(
        tr("No dataset yet. Import a CSV whose header names columns with units, "
           "time [h],amine [mol/L], or drop it here."));
  } else if (isVisible()) {
    m_list->selectRow(std::max(row, 0));
  }
}

void EvidencePage::showEvent(QShowEvent* event) {
  QWidget::showEvent(event);
  if (m_model.rowCount() == 0) followRun();
  if (!m_shown && m_model.rowCount() > 0)
    m_list->selectRow(std::max(m_list->currentIndex().row(), 0));
}

void EvidencePage::followImport() {
  const bool running = m_import.isRunning();
  const QString refusal = m_run.isOpen() ? m_run.refusal(app::Deed::kLinkData) : QString();
  m_choose->setEnabled(!running && m_run.isOpen() && refusal.isEmpty());
  m_choose->setToolTip(refusal);
  m_kind->setEnabled(m_choose->isEnabled());
  m_progress->setVisible(running);
  m_cancel->setVisible(running);
  m_message->setVisible(!running);
  m_save->setEnabled(m_shown != nullptr);
}

void EvidencePage::say(const QString& words, bool fault) {
  m_message->setText(words);
  setStyleProperty(*m_message, "fault", fault);
  setStyleProperty(*m_message, "quiet", !fault);
}

void EvidencePage::chooseFile() {
  const QString file = QFileDialog::getOpenFileName(this, tr("Import a table"), {},
                                                    tr("Tables (*.csv *.txt);;All files (*)"));
  if (!file.isEmpty()) importFile(file);
}

void EvidencePage::importFile(const QString& file) {
  say({}, false);
  m_import.start(file, m_kind->currentText());
}

void EvidencePage::preview(int row) {
  const int asked = ++m_asked;
  m_shown.reset();
  m_save->setEnabled(false);
  const EvidenceModel::Item* item = m_model.itemAt(row);
  if (item == nullptr) return;
  const NotebookLink& link = m_run.link();
  inBackground(
      this,
      [files = &link.workplace().files, book = toUtf8(link.file()),
       item = *item]() -> text::Checked<EvidenceContentPtr> {
        auto notebook = files->open(book, NotebookFiles::Use::kReading);
        if (!notebook) return std::unexpected(notebook.error());
        return readEvidence(**notebook, item);
      },
      [this, asked](const text::Checked<EvidenceContentPtr>& content) {
        if (asked != m_asked) return;
        if (content)
          showContent(*content);
        else
          m_preview->showNothing(sentences(content.error()));
      });
}

void EvidencePage::showContent(EvidenceContentPtr content) {
  m_shown = std::move(content);
  m_save->setEnabled(true);
  m_preview->show(m_shown);
}

text::Checked<void> EvidencePage::saveRaw(const QString& file) const {
  return app::writeFile(toUtf8(file), m_shown->bytes);
}

void EvidencePage::chooseRawFile() {
  if (!m_shown) return;
  const QString file =
      QFileDialog::getSaveFileName(this, tr("Save the raw file"), m_shown->item.rawName);
  if (file.isEmpty()) return;
  if (const auto saved = saveRaw(file); !saved)
    say(sentences(saved.error()), true);
  else
    say(tr("Saved as %1, byte for byte.").arg(QFileInfo(file).fileName()), false);
}

void EvidencePage::dragEnterEvent(QDragEnterEvent* event) {
  const auto urls = event->mimeData()->urls();
  if (m_choose->isEnabled() && urls.size() == 1 && urls.front().isLocalFile())
    event->acceptProposedAction();
}

void EvidencePage::dropEvent(QDropEvent* event) {
  importFile(event->mimeData()->urls().front().toLocalFile());
  event->acceptProposedAction();
}

}  // namespace vialkeeper::ui
