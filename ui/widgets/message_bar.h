// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QFrame>
#include <QString>
#include <functional>
#include <vector>

class QHBoxLayout;
class QLabel;

namespace vialkeeper::ui {

/// One message over the page that needs no answer before work goes on: what happened and, as
/// buttons, what can be done about it. The newest takes the place of the one before.
class MessageBar : public QFrame {
  Q_OBJECT

 public:
  enum class Kind { kNotice, kFault, kGood };
  struct Answer {
    QString text;
    std::function<void()> act;
  };

  explicit MessageBar(QWidget* parent = nullptr);
  void show(Kind kind, const QString& message, std::vector<Answer> answers = {});
  [[nodiscard]] QString message() const;

 public slots:
  void dismiss();

 private:
  QLabel* m_word;
  QLabel* m_message;
  QHBoxLayout* m_answers;
};

}  // namespace vialkeeper::ui
