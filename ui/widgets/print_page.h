// SPDX-FileCopyrightText: The Vialkeeper developers
// SPDX-License-Identifier: GPL-3.0-or-later
#pragma once

#include <QWidget>
#include <vector>

#include "ui/models/open_run.h"
#include "ui/widgets/printed_pages.h"

class QComboBox;
class QLabel;
class QScrollArea;
class QVBoxLayout;

namespace vialkeeper::ui {

class MessageBar;

/// The weighing sheet or the label as it will be printed, and its ways out: a PDF or a printer.
class PrintPage : public QWidget {
  Q_OBJECT

 public:
  explicit PrintPage(OpenRun& run, QWidget* parent = nullptr);
  void choose(Printed what);
  [[nodiscard]] int pages() const;

 public slots:
  void saveAsPdf();
  void print();

 signals:
  void left();

 protected:
  void keyPressEvent(QKeyEvent* event) override;
  void showEvent(QShowEvent* event) override;

 private:
  QWidget* makeHead();
  [[nodiscard]] Printed chosen() const;
  void showPages();
  void clear();

  OpenRun& m_run;
  MessageBar* m_messages;
  QComboBox* m_choice;
  QScrollArea* m_scroll;
  QVBoxLayout* m_column;
  std::vector<QLabel*> m_pictures;
  QSizeF m_size_mm;  ///< of the paper
};

}  // namespace vialkeeper::ui
