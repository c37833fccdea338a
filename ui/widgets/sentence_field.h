// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

class QLabel;
class QLineEdit;

namespace vialkeeper::ui {

/// A line with its label above and a sentence below: what is wrong with what was typed, which stays
/// in the line until it is mended.
class SentenceField : public QWidget {
  Q_OBJECT

 public:
  explicit SentenceField(const QString& label, QWidget* parent = nullptr);

  [[nodiscard]] QString text() const;
  /// What the notebook holds; takes the sentence away.
  void setText(const QString& text);
  void setHint(const QString& hint);
  void setFault(const QString& sentence);
  [[nodiscard]] QString fault() const;
  /// Why the line cannot be changed; empty where it can.
  void setRefusal(const QString& reason);
  [[nodiscard]] QLineEdit& line() { return *m_line; }
  /// Whether somebody is typing here, so that it must not be written over.
  [[nodiscard]] bool isBeingTyped() const;

 signals:
  /// Enter was pressed, or the line left with another text.
  void committed(const QString& text);

 private:
  void commit();

  QLabel* m_label;
  QLineEdit* m_line;
  QLabel* m_sentence;
  QString m_last;
};

/// Gives a line edit the look of one whose text was refused, or takes it away.
void setFaulty(QWidget& field, bool faulty);

}  // namespace vialkeeper::ui
