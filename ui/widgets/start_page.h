// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>

class QLabel;
class QVBoxLayout;

namespace vialkeeper::ui {

/// The first thing to be seen where no notebook is open: three choices and the notebooks before.
class StartPage : public QWidget {
  Q_OBJECT

 public:
  explicit StartPage(QWidget* parent = nullptr);
  /// A sentence under the choices: why a notebook could not be opened, or that one is being made.
  void showMessage(const QString& message, bool isFault);
  void showRecent();

 signals:
  void newWanted();
  void openWanted();
  void demoWanted();
  void fileChosen(const QString& file);

 private:
  QLabel* m_message;
  QVBoxLayout* m_recent;
};

}  // namespace vialkeeper::ui
