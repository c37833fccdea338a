// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>

#include "app/notebook/records.h"
#include "ui/models/notebook_link.h"

namespace vialkeeper::ui {

/// Keys and signatures of the open notebook. Drawing a key from a passphrase takes half a second on
/// purpose, so it is done in another thread by a connection of its own.
class SealWork : public QObject {
  Q_OBJECT

 public:
  explicit SealWork(NotebookLink& link, QObject* parent = nullptr);

  [[nodiscard]] bool isBusy() const { return m_busy; }
  /// Whether the person at the desk has a signing key.
  [[nodiscard]] bool hasKey() const;
  [[nodiscard]] std::vector<app::SealRecord> seals(app::RowNumber run) const;

  void makeKey(const QString& passphrase);
  void seal(app::RowNumber run, const QString& passphrase);
  void countersign(app::RowNumber run, const QString& passphrase);

 signals:
  void busyChanged();
  void done(const QString& sentence);
  void refused(const QString& sentence);

 private:
  using Work = std::function<text::Checked<void>(const app::Desk&, app::Signer&)>;
  void start(Work work, const QString& sentence);

  NotebookLink& m_link;
  bool m_busy = false;
};

}  // namespace vialkeeper::ui
