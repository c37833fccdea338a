// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/evidence_import.h"

#include <QFileInfo>
#include <atomic>
#include <mutex>

#include "app/text_files.h"
#include "ui/models/background.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {
namespace {

/// The time at which the import was asked for; the window's clock stays in its thread.
class AskedTime final : public app::Clock {
 public:
  explicit AskedTime(units::Moment at) : m_at(at) {}
  [[nodiscard]] units::Moment now() override { return m_at; }

 private:
  units::Moment m_at;
};

std::unexpected<text::Faults> stopped() {
  return std::unexpected(
      text::Faults{{.what = "the import was cancelled", .mend = "import again"}});
}

}  // namespace

/// What the two threads share.
struct EvidenceImport::Job {
  std::atomic<bool> cancelled = false;
  std::mutex mutex;
  app::Notebook* writing = nullptr;  ///< while it may be interrupted

  void cancel() {
    cancelled = true;
    const std::scoped_lock lock(mutex);
    if (writing != nullptr) writing->interrupt();
  }
  void setWriting(app::Notebook* notebook) {
    const std::scoped_lock lock(mutex);
    writing = notebook;
  }
};

EvidenceImport::EvidenceImport(OpenRun& run, QObject* parent) : QObject(parent), m_run(run) {}

EvidenceImport::~EvidenceImport() {
  if (m_job) m_job->cancel();
}

QStringList EvidenceImport::kinds() {
  return {QStringLiteral("course"), QStringLiteral("pressure"), QStringLiteral("headspace"),
          QStringLiteral("quench"), QStringLiteral("decay")};
}

void EvidenceImport::start(const QString& file, const QString& kind) {
  if (isRunning() || !m_run.isOpen()) return;
  m_file = file;
  m_job = std::make_shared<Job>();
  emit started(file);
  const NotebookLink& link = m_run.link();
  inBackground(
      this,
      [job = m_job, files = &link.workplace().files, book = toUtf8(link.file()),
       run = m_run.run().n, person = toUtf8(link.person()), at = link.now(), path = toUtf8(file),
       kind = toUtf8(kind)]() -> text::Checked<app::ImportedDataset> {
        const auto bytes = app::readFile(path);
        if (!bytes) return std::unexpected(bytes.error());
        auto notebook = files->open(book, NotebookFiles::Use::kWriting);
        if (!notebook) return std::unexpected(notebook.error());
        const auto record = (*notebook)->run(run);
        if (!record) return std::unexpected(record.error());
        if (job->cancelled) return stopped();
        AskedTime clock(at);
        job->setWriting(notebook->get());
        auto imported =
            app::importDataset({**notebook, clock, person}, *record, *bytes, path, kind);
        job->setWriting(nullptr);
        return imported;
      },
      [this, job = m_job](const text::Checked<app::ImportedDataset>& result) {
        finish(result, job->cancelled);
      });
}

void EvidenceImport::cancel() {
  if (m_job) m_job->cancel();
}

void EvidenceImport::finish(const text::Checked<app::ImportedDataset>& result, bool wasCancelled) {
  m_job.reset();
  if (result) {
    m_run.link().lookForChanges();
    emit imported(toQt(result->record.code), result->notices);
  } else if (wasCancelled) {
    emit cancelled();
  } else {
    emit refused(result.error());
  }
}

}  // namespace vialkeeper::ui
