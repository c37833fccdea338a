// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

class QLabel;
class QLineEdit;
class QPushButton;

namespace vialkeeper::ui {

class SlipAnswers;
class WeighSteps;

/// Weighing at the balance: one component at a time, its target to be read from two metres, one
/// field that a balance, a keyboard wedge or a person types into.
class WeighPage : public QWidget {
  Q_OBJECT

 public:
  explicit WeighPage(WeighSteps& steps, QWidget* parent = nullptr);
  /// Empties the field and puts the cursor there.
  void startEntry();
  [[nodiscard]] QLineEdit& field() { return *m_field; }

 signals:
  void left();

 protected:
  void keyPressEvent(QKeyEvent* event) override;
  bool eventFilter(QObject* watched, QEvent* event) override;
  void changeEvent(QEvent* event) override;

 private:
  QWidget* makeHead();
  QWidget* makeTarget();
  QWidget* makeEntry();
  void showStep();
  void showReading();
  void showTargets();
  void showOverview();
  void setFonts();

  WeighSteps& m_steps;
  QLabel* m_progress;
  QLabel* m_name;
  QLabel* m_details;
  QLabel* m_target;
  QLabel* m_tolerance;
  QLabel* m_notices;
  QLineEdit* m_field;
  QLabel* m_deviation;
  QLabel* m_understood;
  QLabel* m_question;
  SlipAnswers* m_answers;
  QLabel* m_next;
  QLabel* m_overview;
  QLabel* m_changes;
  QLabel* m_written;
  QPushButton* m_retarget;
};

}  // namespace vialkeeper::ui
