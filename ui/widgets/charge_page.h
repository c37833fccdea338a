// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/change_reason.h"
#include "ui/models/charge_table_model.h"
#include "ui/models/component_draft.h"
#include "ui/models/component_search.h"
#include "ui/models/open_run.h"
#include "ui/models/weigh_steps.h"

class QLabel;
class QLineEdit;
class QPushButton;
class QStackedWidget;

namespace vialkeeper::ui {

class AddComponentPanel;
class ChargeTable;
class PrintPage;
class TrailPanel;
class WeighPage;

/// The charge of the open run: one table, one cell that takes amounts, where each number is from;
/// in its place the balance's view or the printed pages.
class ChargePage : public QWidget {
  Q_OBJECT

 public:
  explicit ChargePage(OpenRun& run, QWidget* parent = nullptr);

  [[nodiscard]] ChargeTable& table() { return *m_table; }
  [[nodiscard]] ChargeTableModel& model() { return m_model; }
  [[nodiscard]] TrailPanel& trail() { return *m_trail; }
  [[nodiscard]] QLineEdit& addLine() { return *m_addLine; }
  [[nodiscard]] WeighPage& weighPage() { return *m_weigh; }
  [[nodiscard]] PrintPage& printPage() { return *m_print; }

 public slots:
  void startWeighing();
  void showTable();
  void showPrinted();
  /// Puts the cursor into the line that adds a component.
  void startAdding();

 protected:
  bool eventFilter(QObject* watched, QEvent* event) override;

 private:
  QWidget* makeTablePage();
  QWidget* makeLine();
  QWidget* makeVialText();
  void addShortcuts();
  void follow();
  void showTrail();
  void leaveAdding();
  void showFoot();

  OpenRun& m_run;
  ChangeReason m_reason;
  ChargeTableModel m_model;
  WeighSteps m_steps;
  ComponentSearch m_search;
  ComponentDraft m_draft;
  QStackedWidget* m_stack;
  ChargeTable* m_table;
  QLineEdit* m_addLine;
  QPushButton* m_weighButton;
  QStackedWidget* m_foot;
  TrailPanel* m_trail;
  AddComponentPanel* m_adding;
  QLabel* m_volumes;
  QLabel* m_conditions;
  QLabel* m_cautions;
  WeighPage* m_weigh;
  PrintPage* m_print;
};

}  // namespace vialkeeper::ui
