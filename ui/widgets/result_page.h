// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>
#include <map>

#include "ui/models/open_run.h"
#include "ui/models/result_form.h"

class QLabel;
class QPlainTextEdit;
class QPushButton;
class QVBoxLayout;

namespace vialkeeper::ui {

class SentenceField;

/// What came of the open run: yield, conversion, conclusion, its state, the seal, and its trail.
class ResultPage : public QWidget {
  Q_OBJECT

 public:
  explicit ResultPage(OpenRun& run, QWidget* parent = nullptr);

 private:
  QWidget* makeForm();
  QWidget* makeLife();
  void addField(QVBoxLayout& column, ResultForm::Field field, const QString& label,
                const QString& hint);
  void commit(ResultForm::Field field, const QString& typed);
  void commitConclusion();
  void show();
  void showMoves();
  void move(const ResultForm::Move& move);
  bool eventFilter(QObject* watched, QEvent* event) override;

  OpenRun& m_run;
  ResultForm m_form;
  std::map<ResultForm::Field, SentenceField*> m_fields;
  QPlainTextEdit* m_conclusion;
  QLabel* m_conclusionFault;
  SentenceField* m_reason;
  QVBoxLayout* m_moves;
};

}  // namespace vialkeeper::ui
