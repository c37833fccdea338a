// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

#include "ui/models/open_run.h"

class QLabel;
class QTabWidget;

namespace vialkeeper::ui {

class ChargePage;
class LogPage;
class MessageBar;

/// The open run: its title and state, the strip of its vial, and its pages.
class RunPage : public QWidget {
  Q_OBJECT

 public:
  enum class Page { kCharge, kLog, kEvidence, kResult };

  explicit RunPage(OpenRun& run, QWidget* parent = nullptr);
  void showPage(Page page);
  [[nodiscard]] QTabWidget& pages() { return *m_pages; }
  [[nodiscard]] ChargePage& chargePage() { return *m_charge; }
  [[nodiscard]] LogPage& logPage() { return *m_log; }

 private:
  void showHeading();
  void showConflict(const Conflict& conflict);

  OpenRun& m_run;
  QLabel* m_title;
  QLabel* m_state;
  MessageBar* m_messages;
  QTabWidget* m_pages;
  ChargePage* m_charge;
  LogPage* m_log;
};

}  // namespace vialkeeper::ui
