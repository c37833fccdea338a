// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QLineEdit>
#include <QTimer>
#include <QWidget>

#include "ui/models/log_entry_model.h"
#include "ui/models/log_stamps.h"

class QLabel;
class QPushButton;

namespace vialkeeper::ui {

/// The field of the one line: takes a picture from the clipboard too. While it is empty, undo and
/// redo are the window's.
class EntryField : public QLineEdit {
  Q_OBJECT

 public:
  using QLineEdit::QLineEdit;

 signals:
  void pictureFilePasted(const QString& file);
  void downWanted();
  void escaped();

 protected:
  bool event(QEvent* event) override;
  void keyPressEvent(QKeyEvent* event) override;

 private:
  bool pastePicture();
};

/// The one line with its reading below, the time it is for, and a reason where one is wanted.
class EntryLine : public QWidget {
  Q_OBJECT

 public:
  explicit EntryLine(LogEntryModel& model, QWidget* parent = nullptr);
  void focusLine();
  /// Begins an entry: what was typed can be had back with undo.
  void begin(const StampDeed& deed);
  [[nodiscard]] EntryField& field() { return *m_line; }
  [[nodiscard]] QLineEdit& time() { return *m_at; }
  [[nodiscard]] QLineEdit& reason() { return *m_reason; }
  [[nodiscard]] QString reading() const;

 public slots:
  /// Sentences of a command that failed, until the next key.
  void showFailure(const QString& sentences);

 signals:
  void downWanted();
  void pictureFilePasted(const QString& file);

 private:
  void layOut();
  void wire();
  void follow();
  void showReading();
  void forgetMessages();
  void commit();
  void giveUp();

  LogEntryModel& m_model;
  EntryField* m_line;
  QLineEdit* m_at;
  QPushButton* m_log;
  QLabel* m_task;
  QPushButton* m_cancel;
  QLabel* m_reading;
  QPushButton* m_keep;
  QWidget* m_reasonRow;
  QLineEdit* m_reason;
  QTimer m_clock;
  QString m_failure;
  bool m_written = false;  ///< nothing was typed since something was logged
};

}  // namespace vialkeeper::ui
