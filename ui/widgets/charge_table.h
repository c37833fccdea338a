// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QTableView>
#include <map>
#include <string>

namespace vialkeeper::ui {

class ChargeDelegate;
class ChargeTableModel;
class SlipAnswers;

/// The charge as a table that is worked in with the keyboard: F2, Enter or typing edits, Enter
/// takes, Esc gives up, Tab goes on to the next cell that can be written in, Del removes.
class ChargeTable : public QTableView {
  Q_OBJECT

 public:
  explicit ChargeTable(ChargeTableModel& model, QWidget* parent = nullptr);
  [[nodiscard]] std::string currentKey() const;
  void goTo(const std::string& key, int column);
  /// The widest a column has to be, and what it has: for a check that nothing is cut off.
  [[nodiscard]] bool showsAllTexts() const;

 signals:
  /// Another cell is current; where its number is from may be asked.
  void cellChosen();
  /// Where the number of the current cell is from is asked for.
  void trailWanted();

 protected:
  void keyPressEvent(QKeyEvent* event) override;
  void closeEditor(QWidget* editor, QAbstractItemDelegate::EndEditHint hint) override;
  void resizeEvent(QResizeEvent* event) override;
  void changeEvent(QEvent* event) override;
  void updateGeometries() override;
  void currentChanged(const QModelIndex& current, const QModelIndex& previous) override;
  void focusInEvent(QFocusEvent* event) override;

 private:
  void layOut();
  void placeAnswers();
  void rememberPlace();
  void returnToPlace();
  [[nodiscard]] QModelIndex editableFrom(const QModelIndex& from, int step) const;
  SlipAnswers* answersFor(const std::string& key);

  ChargeTableModel& m_model;
  ChargeDelegate* m_delegate;
  std::map<std::string, SlipAnswers*> m_answers;
  std::string m_placeKey;
  int m_placeColumn = 0;
};

}  // namespace vialkeeper::ui
