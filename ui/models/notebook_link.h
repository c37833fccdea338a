// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QObject>
#include <QString>
#include <QTimer>
#include <memory>

#include "app/notebook/desk.h"
#include "app/notebook/signer.h"
#include "ui/models/notebook_files.h"

namespace vialkeeper::ui {

/// What the desktop works with besides notebooks; all of it outlives every window.
struct Workplace {
  NotebookFiles& files;
  app::Clock& clock;
  app::Signer& signer;
};

/// The notebook that is open in the window, who works in it, and word of every change of it.
class NotebookLink : public QObject {
  Q_OBJECT

 public:
  NotebookLink(Workplace workplace, std::unique_ptr<app::Notebook> notebook, QString file,
               QString person, QObject* parent = nullptr);

  [[nodiscard]] app::Notebook& notebook() { return *m_notebook; }
  [[nodiscard]] app::Desk desk() { return {*m_notebook, m_workplace.clock, m_person.toStdString()}; }
  [[nodiscard]] const Workplace& workplace() const { return m_workplace; }
  [[nodiscard]] units::Moment now() const { return m_workplace.clock.now(); }

  [[nodiscard]] QString file() const { return m_file; }
  /// The file's name without its folder.
  [[nodiscard]] QString name() const;
  [[nodiscard]] QString person() const { return m_person; }
  void setPerson(const QString& initials);
  /// Why nothing can be changed; empty where it can.
  [[nodiscard]] QString readOnlyReason() const;
  [[nodiscard]] bool isReadOnly() const { return !readOnlyReason().isEmpty(); }

  /// Another connection to the same file, for work in another thread.
  [[nodiscard]] text::Checked<std::unique_ptr<app::Notebook>> openAnother(
      NotebookFiles::Use use) const;

  /// Counts up with every change that was seen, by whomever.
  [[nodiscard]] qint64 generation() const { return m_generation; }
  /// Whether the file holds changes that changed() has not told of yet.
  [[nodiscard]] bool hasUnseenChanges();

 public slots:
  /// Looks whether the file changed and tells; called every second and after every own action.
  void lookForChanges();

 signals:
  /// The notebook holds something else than before.
  void changed();
  void personChanged();

 private:
  Workplace m_workplace;
  std::unique_ptr<app::Notebook> m_notebook;
  QString m_file;
  QString m_person;
  std::int64_t m_mark = 0;
  qint64 m_generation = 0;
  QTimer m_watch;
};

}  // namespace vialkeeper::ui
