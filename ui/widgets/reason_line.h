// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QFrame>

class QLabel;
class QLineEdit;

namespace vialkeeper::ui {

class ChangeReason;

/// The line that asks why a run that is past its plan is changed; seen only while it asks.
class ReasonLine : public QFrame {
  Q_OBJECT

 public:
  explicit ReasonLine(ChangeReason& reason, QWidget* parent = nullptr);

 signals:
  /// The reason was given or nothing is asked any more: work goes on where it was.
  void finished();

 protected:
  void keyPressEvent(QKeyEvent* event) override;

 private:
  void follow();

  ChangeReason& m_reason;
  QLabel* m_question;
  QLineEdit* m_field;
};

}  // namespace vialkeeper::ui
