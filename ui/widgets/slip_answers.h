// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QElapsedTimer>
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

 protected:
  void showEvent(QShowEvent* event) override;

 private:
  /// A device that sends two line ends must not answer with the second.
  [[nodiscard]] bool isMeant() const;

  QElapsedTimer m_shown;
  QPushButton* m_likely;
  QPushButton* m_accept;
};

}  // namespace vialkeeper::ui
