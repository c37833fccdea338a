// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>
#include <map>
#include <string>

#include "ui/models/card_form.h"
#include "ui/models/shelf_model.h"

class QLabel;
class QLineEdit;
class QPushButton;
class QTableView;

namespace vialkeeper::ui {

class SentenceField;

/// One compartment of the shelf: its cards as a table, the chosen one as a form.
class ShelfCompartmentPage : public QWidget {
  Q_OBJECT

 public:
  ShelfCompartmentPage(NotebookLink& link, const ShelfCompartment& compartment,
                       QWidget* parent = nullptr);

 private:
  QWidget* makeForm();
  QWidget* makeTable();
  void showSelected();
  void showForm();
  void startNew();
  void save();
  void importFile();
  void say(const QString& sentence, bool isFault);
  void clearFaults();
  void showFaults(const text::Faults& faults);

  NotebookLink& m_link;
  ShelfModel m_model;
  CardForm m_form;
  QTableView* m_table;
  QLineEdit* m_filter;
  QLabel* m_heading;
  QPushButton* m_save;
  QLabel* m_sentence;
  std::map<std::string, SentenceField*> m_fields;
};

}  // namespace vialkeeper::ui
