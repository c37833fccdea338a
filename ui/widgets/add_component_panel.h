// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QFrame>

class QComboBox;
class QLabel;
class QLineEdit;
class QListView;
class QPushButton;
class QWidget;

namespace vialkeeper::ui {

class ComponentDraft;
class ComponentSearch;
class StructureView;

/// What belongs to the line `+ add a component`: the substances found on the shelf, what one is or
/// the fields that describe a new one, its structure, its role and its amount.
class AddComponentPanel : public QFrame {
  Q_OBJECT

 public:
  AddComponentPanel(ComponentSearch& search, ComponentDraft& draft, QWidget* parent = nullptr);
  /// Another text was typed into the line.
  void searchFor(const QString& typed);
  /// Moves in the list by so many rows.
  void moveBy(int rows);
  /// Takes what the list has chosen and goes on to the fields.
  void takeChosen();

 signals:
  void left();

 protected:
  void keyPressEvent(QKeyEvent* event) override;
  bool eventFilter(QObject* watched, QEvent* event) override;

 private:
  QWidget* makeFields();
  void showDraft();
  void describe();

  ComponentSearch& m_search;
  ComponentDraft& m_draft;
  QListView* m_list;
  QWidget* m_describing;
  QLabel* m_known;
  QLineEdit* m_name;
  QLineEdit* m_smiles;
  QLineEdit* m_formula;
  QLineEdit* m_cas;
  QComboBox* m_role;
  QLineEdit* m_amount;
  QLabel* m_reading;
  QPushButton* m_add;
  StructureView* m_structure;
};

}  // namespace vialkeeper::ui
