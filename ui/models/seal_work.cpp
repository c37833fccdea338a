// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#include "ui/models/seal_work.h"

#include "app/notebook/seal_run.h"
#include "ui/models/background.h"
#include "ui/models/qt_text.h"

namespace vialkeeper::ui {

SealWork::SealWork(NotebookLink& link, QObject* parent) : QObject(parent), m_link(link) {}

bool SealWork::hasKey() const {
  const auto key = m_link.notebook().signingKey(toUtf8(m_link.person()));
  return key && key->has_value();
}

std::vector<app::SealRecord> SealWork::seals(app::RowNumber run) const {
  return m_link.notebook().seals(run).value_or(std::vector<app::SealRecord>{});
}

void SealWork::start(Work work, const QString& sentence) {
  if (m_busy) return;
  m_busy = true;
  emit busyChanged();
  inBackground(
      this,
      [workplace = m_link.workplace(), file = toUtf8(m_link.file()),
       person = toUtf8(m_link.person()), work = std::move(work)]() -> text::Checked<void> {
        auto notebook = workplace.files.open(file, NotebookFiles::Use::kWriting);
        if (!notebook) return std::unexpected(notebook.error());
        return work(app::Desk{**notebook, workplace.clock, person}, workplace.signer);
      },
      [this, sentence](const text::Checked<void>& result) {
        m_busy = false;
        m_link.lookForChanges();
        emit busyChanged();
        if (result)
          emit done(sentence);
        else
          emit refused(sentences(result.error(), false));
      });
}

void SealWork::makeKey(const QString& passphrase) {
  start(
      [passphrase = toUtf8(passphrase)](const app::Desk& desk,
                                        app::Signer& signer) -> text::Checked<void> {
        const auto made = app::makeSigningKey(desk, signer, passphrase, app::OldKey::kKept);
        if (!made) return std::unexpected(made.error());
        return {};
      },
      tr("%1 has a signing key now. Without its passphrase nobody can sign for %1.")
          .arg(m_link.person()));
}

namespace {

/// A use case that signs one run.
auto onRun(app::RowNumber n, std::string passphrase, auto useCase) {
  return [n, passphrase = std::move(passphrase), useCase](
             const app::Desk& desk, app::Signer& signer) -> text::Checked<void> {
    const auto run = desk.notebook.run(n);
    if (!run) return std::unexpected(run.error());
    return useCase(desk, signer, *run, passphrase);
  };
}

}  // namespace

void SealWork::seal(app::RowNumber run, const QString& passphrase) {
  start(onRun(run, toUtf8(passphrase), app::sealRun),
        tr("The run is sealed: from now on it takes addenda only."));
}

void SealWork::countersign(app::RowNumber run, const QString& passphrase) {
  start(onRun(run, toUtf8(passphrase), app::countersignRun), tr("The run is countersigned."));
}

}  // namespace vialkeeper::ui
