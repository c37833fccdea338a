// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

class QPushButton;

namespace vialkeeper::ui {

/// The two answers to a question about a weighing: it is as typed, or the likely one was meant.
class SlipAnswers : public QWidget {
  Q_OBJECT

 public:
  explicit SlipAnswers(QWidget* parent = nullptr);
  /// `likely` may be empty: then there is only the first answer.
  void offer(const QString& typed, const QString& likely);
  void focusFirst();

 signals:
  void accepted();
  void likelyTaken();

 private:
  QPushButton* m_likely;
  QPushButton* m_accept;
};

}  // namespace vialkeeper::ui
