// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/open_run.h"
#include "ui/models/seal_work.h"

class QLabel;
class QLineEdit;
class QPushButton;

namespace vialkeeper::ui {

/// The signatures of the open run, and the passphrase with which the next one is given.
class SealPanel : public QWidget {
  Q_OBJECT

 public:
  explicit SealPanel(OpenRun& run, QWidget* parent = nullptr);

 private:
  void show();
  void act();
  void say(const QString& sentence, bool isFault);
  [[nodiscard]] QString signatures() const;

  OpenRun& m_run;
  SealWork m_work;
  QLabel* m_state;
  QLineEdit* m_passphrase;
  QPushButton* m_act;
  QLabel* m_sentence;
};

}  // namespace vialkeeper::ui
