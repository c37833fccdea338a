// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <memory>

#include "app/notebook/dataset_import.h"
#include "ui/models/open_run.h"

namespace vialkeeper::ui {

/// Brings a table of numbers into the notebook for the open run, in another thread and through a
/// connection of its own. One at a time.
class EvidenceImport : public QObject {
  Q_OBJECT

 public:
  explicit EvidenceImport(OpenRun& run, QObject* parent = nullptr);
  ~EvidenceImport() override;

  /// The kinds that a table may be of, the likeliest first.
  [[nodiscard]] static QStringList kinds();
  [[nodiscard]] bool isRunning() const { return m_job != nullptr; }
  [[nodiscard]] QString file() const { return m_file; }

  /// Starts, unless one is running. Ends in imported(), refused() or cancelled().
  void start(const QString& file, const QString& kind);
  /// Stops it before it is written; what is written already stays and is told as imported.
  void cancel();

 signals:
  void started(const QString& file);
  void imported(const QString& code, const vialkeeper::text::Notices& notices);
  void refused(const vialkeeper::text::Faults& faults);
  void cancelled();

 private:
  struct Job;
  void finish(const text::Checked<app::ImportedDataset>& result, bool wasCancelled);

  OpenRun& m_run;
  QString m_file;
  std::shared_ptr<Job> m_job;
};

}  // namespace vialkeeper::ui
